// Lists every comparison of a voltage with its limit: touch, step and floating metal of each case, and other seasons.
import type { ElectrodeResult, Results, WorstTouch } from '@ohmstead/study';
import { type Compared, findingOf } from './finding.ts';

export interface VerdictRow extends Compared {
  /** place in results.cases */
  readonly caseIndex: number;
  readonly caseName: string;
  readonly kind: 'touch' | 'step' | 'floating';
  /** `touch`, `step`, `touch at fence`, `touch, dry summer` */
  readonly subject: string;
  /** where another season than the soil as given governs, its name */
  readonly season: string | undefined;
  /** what people stand on there, which the limit belongs to; undefined where the study has no covering */
  readonly footing: 'covering' | 'bare soil' | undefined;
  /** worst/limit */
  readonly share: number;
  readonly x: number;
  readonly y: number;
}

type Place = Pick<VerdictRow, 'kind' | 'subject' | 'season' | 'footing' | 'x' | 'y'>;
type Voltages = Pick<VerdictRow, 'worst' | 'uncertainty' | 'limit'>;

/** What people stand on at a place; nothing to be told apart without a covering. */
export function footingOf({ limits }: Pick<Results, 'limits'>, onCovering: boolean): VerdictRow['footing'] {
  if (limits.surfacing_thickness_m === null) return undefined;
  return onCovering ? 'covering' : 'bare soil';
}

function row(caseIndex: number, caseName: string, place: Place, volts: Voltages): VerdictRow {
  const { worst, uncertainty, limit } = volts;
  return {
    caseIndex,
    caseName,
    ...place,
    ...volts,
    share: worst / limit,
    finding: findingOf(worst, uncertainty, limit),
  };
}

/**
 * Voltage between floating metal and the soil within reach of it, V, against the touch limit of the ground there: the
 * covering where it lies, bare soil elsewhere. Its uncertainty is its own and that of the rise; both are numerical.
 */
function floatingRow(results: Results, index: number, metal: ElectrodeResult): VerdictRow | undefined {
  if (metal.touch_ratio === null) return undefined;
  const of = results.cases[index];
  const onCovering = metal.touch_on_covering === true;
  const ratio = Math.abs(metal.touch_ratio);
  const place: Place = {
    kind: 'floating',
    subject: `touch at ${metal.name}`,
    season: undefined,
    footing: footingOf(results, onCovering),
    x: metal.touch_x_m ?? Number.NaN,
    y: metal.touch_y_m ?? Number.NaN,
  };
  return row(index, of.name, place, {
    worst: ratio * of.gpr_V,
    uncertainty: (metal.touch_uncertainty_ratio ?? 0) * of.gpr_V + ratio * of.gpr_uncertainty_V,
    limit: (onCovering ? of.covering_touch_limit_V : null) ?? of.bare_touch_limit_V,
  });
}

function measuredRow(
  index: number,
  caseName: string,
  of: WorstTouch,
  place: Pick<Place, 'kind' | 'season' | 'footing'>,
): VerdictRow {
  const subject = place.season === undefined ? place.kind : `${place.kind}, ${place.season}`;
  const volts: Voltages = { worst: of.worst_V, uncertainty: of.uncertainty_V, limit: of.limit_V };
  return row(index, caseName, { ...place, subject, x: of.x_m, y: of.y_m }, volts);
}

/** What governs in another season than the soil as given, which has its own rows. */
function seasonRows(results: Results, index: number): readonly VerdictRow[] {
  const governing = results.envelope[index];
  if (governing === undefined) return [];
  const names = new Set(results.seasons.map((season) => season.name));
  return (['touch', 'step'] as const)
    .filter((kind) => names.has(governing[kind].season))
    .map((kind) =>
      measuredRow(index, governing.name, governing[kind], {
        kind,
        season: governing[kind].season,
        footing: footingOf(results, governing[kind].on_covering),
      }),
    );
}

/** Every comparison, case by case in the order of the results: touch, step, floating metal, governing seasons. */
export function verdictRows(results: Results): readonly VerdictRow[] {
  return results.cases.flatMap((of, index) => {
    const direct = (['touch', 'step'] as const).map((kind) =>
      measuredRow(index, of.name, of[kind], {
        kind,
        season: undefined,
        footing: footingOf(results, of[kind].on_covering),
      }),
    );
    const floating = results.electrodes.flatMap((metal) => floatingRow(results, index, metal) ?? []);
    return [...direct, ...floating, ...seasonRows(results, index)];
  });
}

/** Place of the case that, in the soil as given, comes nearest to or farthest beyond a limit; the first of equals. */
export function governingCase(results: Results): number {
  const rows = verdictRows(results).filter((r) => r.kind !== 'floating' && r.season === undefined);
  const worst = rows.reduce((a, b) => (b.share > a.share ? b : a), rows[0]);
  return worst.caseIndex;
}
