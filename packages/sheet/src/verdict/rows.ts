// Lists every comparison of a voltage with its limit: touch, step and floating metal of each case.
import type { CaseResult, ElectrodeResult, Results } from '@ohmstead/study';
import { type Compared, findingOf } from './finding.ts';

export interface VerdictRow extends Compared {
  /** place in results.cases */
  readonly caseIndex: number;
  readonly caseName: string;
  readonly kind: 'touch' | 'step' | 'floating';
  /** `touch`, `step`, `touch at fence` */
  readonly subject: string;
  /** worst/limit */
  readonly share: number;
  readonly x: number;
  readonly y: number;
}

type Place = Pick<VerdictRow, 'kind' | 'subject' | 'x' | 'y'>;
type Voltages = Pick<VerdictRow, 'worst' | 'uncertainty' | 'limit'>;

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
 * Voltage between floating metal and the soil within reach of it, V, against the touch limit of the case. Its
 * uncertainty is that of the metal's own potential and of the rise; both are numerical.
 */
function floatingRow(index: number, of: CaseResult, metal: ElectrodeResult): VerdictRow | undefined {
  if (metal.touch_ratio === null) return undefined;
  const ratio = Math.abs(metal.touch_ratio);
  const place: Place = {
    kind: 'floating',
    subject: `touch at ${metal.name}`,
    x: metal.touch_x_m ?? Number.NaN,
    y: metal.touch_y_m ?? Number.NaN,
  };
  return row(index, of.name, place, {
    worst: ratio * of.gpr_V,
    uncertainty: metal.potential_uncertainty_ratio * of.gpr_V + ratio * of.gpr_uncertainty_V,
    limit: of.touch.limit_V,
  });
}

/** Every comparison, case by case in the order of the results: touch, step, then floating metal. */
export function verdictRows(results: Results): readonly VerdictRow[] {
  return results.cases.flatMap((of, index) => {
    const direct = (['touch', 'step'] as const).map((kind) => {
      const { worst_V, uncertainty_V, limit_V, x_m, y_m } = of[kind];
      const place: Place = { kind, subject: kind, x: x_m, y: y_m };
      return row(index, of.name, place, { worst: worst_V, uncertainty: uncertainty_V, limit: limit_V });
    });
    const floating = results.electrodes.flatMap((metal) => floatingRow(index, of, metal) ?? []);
    return [...direct, ...floating];
  });
}

/** Place of the case that comes nearest to or farthest beyond a limit; the first where two are equal. */
export function governingCase(results: Results): number {
  const rows = verdictRows(results).filter((r) => r.kind !== 'floating');
  const worst = rows.reduce((a, b) => (b.share > a.share ? b : a), rows[0]);
  return worst.caseIndex;
}
