// Two states of a study beside each other: inputs, conductors, metal and results, only what differs.
import { type ConductorDifferences, conductorDifferences } from './compare-conductors.ts';
import { inputDifferences } from './compare-inputs.ts';
import { resultDifferences } from './compare-results.ts';
import { type Difference, differing } from './difference.ts';
import type { Pin } from './pins.ts';
import { type MetalSum, makeKey, planQuantities } from './plan-quantities.ts';
import { quantityText } from './quantity-text.ts';

export interface Comparison {
  readonly inputs: readonly Difference[];
  readonly conductors: ConductorDifferences;
  /** metres of conductor and number and metres of rods, by diameter and material */
  readonly metal: readonly Difference[];
  readonly results: readonly Difference[];
}

/** Metres are compared to a millimetre. Reason: sums of the same lengths in another order differ in their last digits. */
const LENGTH_DECIMALS = 3;

function metalLines(
  noun: 'conductor' | 'rod',
  before: readonly MetalSum[],
  after: readonly MetalSum[],
): readonly Difference[] {
  const [was, is] = [before, after].map((sums) => new Map(sums.map((sum) => [makeKey(sum), sum])));
  const keys = new Set([...(is?.keys() ?? []), ...(was?.keys() ?? [])]);
  return [...keys].flatMap((key): readonly Difference[] => {
    const [a, b] = [was?.get(key), is?.get(key)];
    const one = b ?? a;
    if (one === undefined) return [];
    const made = `${one.material}, ${quantityText('diameter', one.diameter)}`;
    const metres = (sum: MetalSum | undefined): number => Number((sum?.length ?? 0).toFixed(LENGTH_DECIMALS));
    const count =
      noun === 'conductor'
        ? []
        : differing({ what: `rods of ${made}`, kind: 'count', before: a?.count ?? 0, after: b?.count ?? 0 });
    const what = noun === 'conductor' ? `length of conductor of ${made}` : `length of rods of ${made}`;
    return [...count, ...differing({ what, kind: 'length', before: metres(a), after: metres(b) })];
  });
}

/**
 * Compares two states.
 * @param before usually a pinned state
 * @param after the state worked at, or another pinned one
 * @returns what differs, nothing of what is the same; equal states give four empty lists
 */
export function compareStates(before: Pin, after: Pin): Comparison {
  const [was, is] = [planQuantities(before.conductors), planQuantities(after.conductors)];
  return {
    inputs: inputDifferences(before.draft.study, after.draft.study),
    conductors: conductorDifferences(before.conductors, after.conductors),
    metal: [
      ...metalLines('conductor', was.conductors, is.conductors),
      ...metalLines('rod', was.rods, is.rods),
    ],
    results: resultDifferences(before.results, after.results),
  };
}
