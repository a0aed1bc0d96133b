// Tables of a soil that was fitted to readings: the fit, its layers, readings, curve, and what it leaves open.
import type {
  EquivalentUniform,
  GroundReading,
  GroundResult,
  LayerCountTrial,
  Outcome,
  SoundingPoint,
  Spread,
} from '@ohmstead/study';
import { type Column, csvOf, type TableFile } from './csv.ts';

interface LayerRow {
  readonly layer: number;
  readonly quantity: 'resistivity_ohm_m' | 'thickness_m';
  readonly of: Spread;
}

const SPREAD: readonly Column<{ readonly of: Spread }>[] = [
  { name: 'best_fit', value: (r) => r.of.best },
  { name: 'soils_5_percent', value: (r) => r.of.low },
  { name: 'soils_median', value: (r) => r.of.median },
  { name: 'soils_95_percent', value: (r) => r.of.high },
];

const LAYER_COLUMNS: readonly Column<LayerRow>[] = [
  { name: 'layer', value: (r) => r.layer },
  { name: 'quantity', value: (r) => r.quantity },
  ...SPREAD,
];

function layerRows({ fit }: GroundResult): readonly LayerRow[] {
  return fit.layers.flatMap(({ resistivity_ohm_m, thickness_m }, k) => [
    { layer: k + 1, quantity: 'resistivity_ohm_m' as const, of: resistivity_ohm_m },
    ...(thickness_m === null ? [] : [{ layer: k + 1, quantity: 'thickness_m' as const, of: thickness_m }]),
  ]);
}

const READING_COLUMNS: readonly Column<GroundReading>[] = [
  { name: 'line', value: (r) => r.line },
  { name: 'traverse', value: (r) => r.traverse },
  { name: 'spacing_m', value: (r) => r.spacing_m },
  { name: 'apparent_resistivity_ohm_m', value: (r) => r.apparent_resistivity_ohm_m },
  { name: 'model_ohm_m', value: (r) => r.model_ohm_m },
  { name: 'misfit_percent', value: (r) => r.misfit_percent },
  { name: 'outlier', value: (r) => r.outlier },
];

const SOUNDING_COLUMNS: readonly Column<SoundingPoint>[] = [
  { name: 'spacing_m', value: (p) => p.spacing_m },
  { name: 'best_fit_ohm_m', value: (p) => p.fitted_ohm_m },
  { name: 'soils_5_percent_ohm_m', value: (p) => p.low_ohm_m },
  { name: 'soils_95_percent_ohm_m', value: (p) => p.high_ohm_m },
];

function trialsCsv({ fit }: GroundResult): string {
  const columns: readonly Column<LayerCountTrial>[] = [
    { name: 'layer_count', value: (t) => t.layer_count },
    { name: 'rms_percent', value: (t) => t.rms_percent },
    { name: 'criterion', value: (t) => t.criterion },
    { name: 'proposed', value: (t) => t.layer_count === fit.layer_count_proposed },
    { name: 'taken', value: (t) => t.layer_count === fit.layer_count },
    { name: 'criterion_in_words', value: () => fit.layer_count_criterion },
  ];
  return csvOf(columns, fit.trials);
}

const FAMILY_COLUMNS: readonly Column<GroundResult>[] = [
  { name: 'survey_file', value: ({ fit }) => fit.survey_file },
  { name: 'outcome', value: ({ fit }) => fit.outcome },
  { name: 'rms_percent', value: ({ fit }) => fit.rms_percent },
  { name: 'resolved_depth_m', value: ({ fit }) => fit.resolved_depth_m },
  { name: 'resolved_depth_rule', value: ({ fit }) => fit.resolved_depth_rule },
  { name: 'family_count', value: ({ fit }) => fit.family.count },
  { name: 'family_seed', value: ({ fit }) => fit.family.seed },
  { name: 'family_method', value: ({ fit }) => fit.family.method },
];

interface ConsequenceRow {
  readonly case: string;
  readonly quantity: 'resistance_ohm' | 'gpr_V' | 'touch_V' | 'step_V';
  readonly of: Spread;
  readonly limit: number | null;
}

const CONSEQUENCE_COLUMNS: readonly Column<ConsequenceRow>[] = [
  { name: 'case', value: (r) => r.case },
  { name: 'quantity', value: (r) => r.quantity },
  ...SPREAD,
  { name: 'limit_V', value: (r) => r.limit },
];

function consequenceRows({ results }: Outcome, { consequence }: GroundResult): readonly ConsequenceRow[] {
  const resistance: ConsequenceRow = {
    case: results.cases[0]?.name ?? '',
    quantity: 'resistance_ohm',
    of: consequence.resistance_ohm,
    limit: null,
  };
  const cases = consequence.cases.flatMap((of, k): readonly ConsequenceRow[] => [
    { case: of.name, quantity: 'gpr_V', of: of.gpr_V, limit: null },
    { case: of.name, quantity: 'touch_V', of: of.touch_V, limit: results.cases[k]?.touch.limit_V ?? null },
    { case: of.name, quantity: 'step_V', of: of.step_V, limit: results.cases[k]?.step.limit_V ?? null },
  ]);
  return [resistance, ...cases];
}

const UNIFORM_COLUMNS: readonly Column<EquivalentUniform>[] = [
  { name: 'name', value: (e) => e.name },
  { name: 'resistivity_ohm_m', value: (e) => e.resistivity_ohm_m },
  { name: 'resistance_ohm', value: (e) => e.resistance_ohm },
  { name: 'deviation_percent', value: (e) => e.deviation_percent },
  { name: 'source', value: (e) => e.source },
];

/** Tables of the ground, only those that have rows: none of a fit where the soil was given. */
export function groundTables(outcome: Outcome): readonly TableFile[] {
  const { ground, equivalent_uniform: uniform } = outcome.results;
  const hand =
    uniform.length > 0 ? [{ name: 'equivalent-uniform.csv', csv: csvOf(UNIFORM_COLUMNS, uniform) }] : [];
  if (ground === null) return hand;
  return [
    ...hand,
    { name: 'ground-consequence.csv', csv: csvOf(CONSEQUENCE_COLUMNS, consequenceRows(outcome, ground)) },
    { name: 'ground-family.csv', csv: csvOf(FAMILY_COLUMNS, [ground]) },
    { name: 'ground-layers.csv', csv: csvOf(LAYER_COLUMNS, layerRows(ground)) },
    { name: 'ground-readings.csv', csv: csvOf(READING_COLUMNS, ground.fit.readings) },
    { name: 'ground-trials.csv', csv: trialsCsv(ground) },
    { name: 'sounding.csv', csv: csvOf(SOUNDING_COLUMNS, ground.fit.sounding) },
  ];
}
