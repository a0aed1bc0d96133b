// Tables of the metal: electrodes, conductors with their currents, segments, contacts that were bridged.
import type { ElectrodeResult, Outcome, PlanConductor, Results } from '@ohmstead/study';
import { conductorCurrents } from '../geometry/leakage.ts';
import { type Column, csvOf } from './csv.ts';

const ELECTRODE_COLUMNS: readonly Column<ElectrodeResult>[] = [
  { name: 'electrode', value: (e) => e.name },
  { name: 'role', value: (e) => e.role },
  { name: 'piece_count', value: (e) => e.piece_count },
  { name: 'conductor_count', value: (e) => e.conductor_count },
  { name: 'rod_count', value: (e) => e.rod_count },
  { name: 'conductor_length_m', value: (e) => e.conductor_length_m },
  { name: 'potential_ratio', value: (e) => e.potential_ratio },
  { name: 'potential_uncertainty_ratio', value: (e) => e.potential_uncertainty_ratio },
  { name: 'leakage_ratio', value: (e) => e.leakage_ratio },
  { name: 'touch_ratio', value: (e) => e.touch_ratio },
  { name: 'touch_x_m', value: (e) => e.touch_x_m },
  { name: 'touch_y_m', value: (e) => e.touch_y_m },
];

/** One row an electrode; ratios are of the rise and of the injected current. */
export function electrodesCsv(outcome: Outcome): string {
  return csvOf(ELECTRODE_COLUMNS, outcome.results.electrodes);
}

const ENDS: readonly Column<PlanConductor>[] = [
  { name: 'conductor', value: (c) => c.id },
  { name: 'electrode', value: (c) => c.electrode },
  { name: 'role', value: (c) => c.role },
  { name: 'x1_m', value: (c) => c.x1 },
  { name: 'y1_m', value: (c) => c.y1 },
  { name: 'depth1_m', value: (c) => c.depth1 },
  { name: 'x2_m', value: (c) => c.x2 },
  { name: 'y2_m', value: (c) => c.y2 },
  { name: 'depth2_m', value: (c) => c.depth2 },
  { name: 'diameter_mm', value: (c) => c.diameter * 1000 },
  { name: 'material', value: (c) => c.material },
  { name: 'insulated', value: (c) => c.insulated },
  { name: 'rod', value: (c) => c.rod },
];

/** One row a conductor; currents per ampere injected by the first case. */
export function conductorsCsv(outcome: Outcome): string {
  const currents = conductorCurrents(outcome);
  const { conductors } = outcome.plan;
  const columns: readonly Column<number>[] = [
    ...ENDS.map(({ name, value }): Column<number> => ({ name, value: (k) => value(conductors[k]) })),
    { name: 'length_m', value: (k) => currents[k].length },
    { name: 'leakage_A_per_A', value: (k) => currents[k].leakage },
    { name: 'mean_leakage_A_per_m_A', value: (k) => currents[k].leakage / currents[k].length },
    { name: 'largest_current_A_per_A', value: (k) => currents[k].along },
  ];
  return csvOf(columns, [...conductors.keys()]);
}

/** One row a segment of the solution; currents per ampere injected by the first case. */
export function segmentsCsv({ segments, plan }: Outcome): string {
  const columns: readonly Column<number>[] = [
    { name: 'conductor', value: (s) => plan.conductors[segments.conductor[s]].id },
    { name: 'x1_m', value: (s) => segments.x1[s] },
    { name: 'y1_m', value: (s) => segments.y1[s] },
    { name: 'depth1_m', value: (s) => segments.depth1[s] },
    { name: 'x2_m', value: (s) => segments.x2[s] },
    { name: 'y2_m', value: (s) => segments.y2[s] },
    { name: 'depth2_m', value: (s) => segments.depth2[s] },
    { name: 'leakage_A_per_m_A', value: (s) => segments.leakage[s] },
    { name: 'current_along_A_per_A', value: (s) => segments.along[s] },
  ];
  return csvOf(
    columns,
    Array.from({ length: segments.count }, (_, s) => s),
  );
}

const SNAP_COLUMNS: readonly Column<Results['snaps'][number]>[] = [
  { name: 'conductor', value: (s) => s.id },
  { name: 'other_conductor', value: (s) => s.other_id },
  { name: 'x_m', value: (s) => s.x_m },
  { name: 'y_m', value: (s) => s.y_m },
  { name: 'depth_m', value: (s) => s.depth_m },
  { name: 'distance_m', value: (s) => s.distance_m },
];

/** One row a contact that was bridged. */
export function snapsCsv(outcome: Outcome): string {
  return csvOf(SNAP_COLUMNS, outcome.results.snaps);
}
