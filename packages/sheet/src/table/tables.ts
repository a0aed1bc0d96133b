// Every table of a sheet as a CSV file.
import type { MeshLevel, Outcome } from '@ohmstead/study';
import { uniqueSlugs } from '../format/slug.ts';
import { otherDoubts } from '../verdict/doubts.ts';
import { casesCsv, limitsCsv, profileCsv, seasonsCsv } from './case-tables.ts';
import { type Column, csvOf, type TableFile } from './csv.ts';
import { conductorsCsv, electrodesCsv, segmentsCsv, snapsCsv } from './electrode-tables.ts';
import { groundTables } from './ground-tables.ts';

interface LayerRow {
  readonly season: string;
  readonly layer: number;
  readonly top: number;
  readonly resistivity: number;
  readonly thickness: number | null;
}

function layersIn(season: string, layers: Outcome['results']['soil']['layers']): readonly LayerRow[] {
  let top = 0;
  return layers.map(({ resistivity_ohm_m, thickness_m }, k) => {
    const row: LayerRow = {
      season,
      layer: k + 1,
      top,
      resistivity: resistivity_ohm_m,
      thickness: thickness_m,
    };
    top += thickness_m ?? 0;
    return row;
  });
}

function layerRows({ results }: Outcome): readonly LayerRow[] {
  const seasons = results.seasons.flatMap((season) => layersIn(season.name, season.layers));
  return [...layersIn('as given', results.soil.layers), ...seasons];
}

const LAYER_COLUMNS: readonly Column<LayerRow>[] = [
  { name: 'season', value: (l) => l.season },
  { name: 'layer', value: (l) => l.layer },
  { name: 'top_depth_m', value: (l) => l.top },
  { name: 'thickness_m', value: (l) => l.thickness },
  { name: 'resistivity_ohm_m', value: (l) => l.resistivity },
];

const MESH_COLUMNS: readonly Column<MeshLevel>[] = [
  { name: 'segment_count', value: (m) => m.segment_count },
  { name: 'resistance_ohm', value: (m) => m.resistance_ohm },
  { name: 'worst_touch_ratio', value: (m) => m.worst_touch_ratio },
  { name: 'worst_step_ratio', value: (m) => m.worst_step_ratio },
];

interface Remark {
  readonly kind: 'assumption' | 'warning' | 'doubt of the fit';
  readonly code: string;
  readonly message: string;
}

const REMARK_COLUMNS: readonly Column<Remark>[] = [
  { name: 'kind', value: (r) => r.kind },
  { name: 'code', value: (r) => r.code },
  { name: 'message', value: (r) => r.message },
];

function remarks({ results }: Outcome): readonly Remark[] {
  return [
    ...results.assumptions.map((a): Remark => ({ kind: 'assumption', ...a })),
    ...otherDoubts(results).map((w): Remark => ({ kind: 'warning', ...w })),
    ...(results.ground?.fit.doubts ?? []).map((d): Remark => ({ kind: 'doubt of the fit', ...d })),
  ];
}

/**
 * Every table as CSV (RFC 4180, units in the column names, numbers in full precision), sorted by name. Text cells that
 * begin with = + - @ carry a leading apostrophe, so that no spreadsheet evaluates them; take it off when reading back.
 * @param outcome of a solved study
 * @returns files such as `cases.csv` and `profile-33-kv-bus.csv`; the same outcome gives the same bytes
 */
export function tables(outcome: Outcome): readonly TableFile[] {
  const { results, cases } = outcome;
  const profiles = uniqueSlugs(cases.map((c) => c.name)).map(
    (of, k): TableFile => ({
      name: `profile-${of}.csv`,
      csv: profileCsv(outcome, k),
    }),
  );
  const files: TableFile[] = [
    { name: 'assumptions.csv', csv: csvOf(REMARK_COLUMNS, remarks(outcome)) },
    { name: 'cases.csv', csv: casesCsv(outcome) },
    { name: 'conductors.csv', csv: conductorsCsv(outcome) },
    { name: 'electrodes.csv', csv: electrodesCsv(outcome) },
    { name: 'limits.csv', csv: limitsCsv(outcome) },
    { name: 'mesh.csv', csv: csvOf(MESH_COLUMNS, results.mesh) },
    { name: 'segments.csv', csv: segmentsCsv(outcome) },
    { name: 'snaps.csv', csv: snapsCsv(outcome) },
    { name: 'soil.csv', csv: csvOf(LAYER_COLUMNS, layerRows(outcome)) },
    ...profiles,
    ...groundTables(outcome),
    ...(results.seasons.length > 0 ? [{ name: 'seasons.csv', csv: seasonsCsv(outcome) }] : []),
  ];
  return files.sort((a, b) => (a.name < b.name ? -1 : 1));
}
