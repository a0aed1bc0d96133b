// Sets what the soil's ignorance does to touch and step voltage against the limits: a band of soils, not an uncertainty.
import type { Results, Spread } from '@ohmstead/study';
import { bandQuantity } from '../format/fitted.ts';
import { quantity } from '../format/number.ts';
import { capital, countWord } from '../format/words.ts';
import { footingOf, type VerdictRow } from './rows.ts';

/** Where the band and the best fit lie: `open` where the limit has soils of the band or the best fit on either side. */
export type Reach = 'within' | 'beyond' | 'open';

export interface SoilBandRow {
  /** place in results.cases */
  readonly caseIndex: number;
  readonly caseName: string;
  readonly kind: 'touch' | 'step';
  /** V */
  readonly of: Spread;
  /** numerical, of the best fit, V */
  readonly uncertainty: number;
  /** of the best fit's soil, V */
  readonly limit: number;
  /** what people stand on there; undefined where the study has no covering */
  readonly footing: VerdictRow['footing'];
  readonly reach: Reach;
}

function reachOf({ best, low, high }: Spread, limit: number): Reach {
  const values = [best, low, high];
  if (!values.every(Number.isFinite) || !(limit > 0)) return 'open';
  if (values.every((value) => value <= limit)) return 'within';
  return values.every((value) => value > limit) ? 'beyond' : 'open';
}

/** Touch and step of every case over the soils that the readings allow; empty where the soil was given. */
export function soilBandRows(results: Results): readonly SoilBandRow[] {
  const { ground, cases } = results;
  if (ground === null) return [];
  return ground.consequence.cases.flatMap((of, caseIndex) => {
    const result = cases[caseIndex];
    if (result === undefined) return [];
    return (['touch', 'step'] as const).map((kind): SoilBandRow => {
      const spread = kind === 'touch' ? of.touch_V : of.step_V;
      const { limit_V: limit, uncertainty_V: uncertainty } = result[kind];
      return {
        caseIndex,
        caseName: result.name,
        kind,
        of: spread,
        uncertainty,
        limit,
        footing: footingOf(results, result[kind].on_covering),
        reach: reachOf(spread, limit),
      };
    });
  });
}

/** Where the soils stand, as the end of a row: `some reach beyond the limit`. */
export function reachWords({ reach, of, limit }: SoilBandRow): string {
  switch (reach) {
    case 'within':
      return 'within the limit';
    case 'beyond':
      return 'beyond the limit';
    case 'open':
      if (of.low > limit) return 'beyond the limit, best fit within';
      if (of.high <= limit) return 'within the limit, best fit beyond';
      return of.best > limit ? 'open: some within the limit' : 'open: some beyond the limit';
  }
}

/** Cases of which the readings leave a limit open. */
export function casesLeftOpen(results: Results): number {
  return new Set(
    soilBandRows(results)
      .filter((row) => row.reach === 'open')
      .map((row) => row.caseIndex),
  ).size;
}

function sentence(row: SoilBandRow): string {
  const soils = `${bandQuantity(row.of, 'V')} over the soils that the readings allow (5–95\u202f%)`;
  return `${row.caseName}: the readings leave the worst ${row.kind} voltage open across its limit of ${quantity(row.limit, 'V')}: ${quantity(row.of.best, 'V')} at the best fit, ${soils}.`;
}

/** At most this many are told at the top; People has them all. */
const MOST_SENTENCES = 2;

/** Limits that the readings leave open, one sentence each, those that reach highest above their limit first. */
export function soilBandSentences(results: Results): readonly string[] {
  const share = (row: SoilBandRow): number => Math.max(row.of.best, row.of.high) / row.limit;
  const open = soilBandRows(results)
    .filter((row) => row.reach === 'open')
    .sort((a, b) => share(b) - share(a) || a.caseIndex - b.caseIndex);
  const more = open.length - MOST_SENTENCES;
  const lines = open.slice(0, MOST_SENTENCES).map(sentence);
  return more > 0
    ? [...lines, `${capital(countWord(more))} more that the readings leave open under People.`]
    : lines;
}
