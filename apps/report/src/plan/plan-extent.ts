// What the whole plan is: the ground that is mapped and every conductor drawn since.
import { latticeExtent } from '@ohmstead/sheet';
import type { Outcome } from '@ohmstead/study';
import type { PlanItem } from './plan-conductors.ts';
import type { Extent } from './view.ts';

export function planExtent(outcome: Outcome, items: readonly PlanItem[]): Extent {
  const map = outcome.cases[0]?.map;
  const ground = map === undefined ? [] : [latticeExtent(map)];
  const xs = [...ground.flatMap(({ x }) => x), ...items.flatMap(({ conductor: { x1, x2 } }) => [x1, x2])];
  const ys = [...ground.flatMap(({ y }) => y), ...items.flatMap(({ conductor: { y1, y2 } }) => [y1, y2])];
  const range = (values: readonly number[]): readonly [number, number] =>
    values.length === 0
      ? [0, 1]
      : [
          values.reduce((a, b) => Math.min(a, b), Number.POSITIVE_INFINITY),
          values.reduce((a, b) => Math.max(a, b), Number.NEGATIVE_INFINITY),
        ];
  return { x: range(xs), y: range(ys) };
}
