// Sets of things that belong together.
import { expect, test } from 'vitest';
import { rootOf, singletons, unite } from '../../src/numerics/union-find.ts';

test('things united through others share the smallest member as root', () => {
  const sets = singletons(6);
  unite(sets, 5, 3);
  unite(sets, 1, 4);
  unite(sets, 3, 4);
  expect([0, 1, 2, 3, 4, 5].map((i) => rootOf(sets, i))).toEqual([0, 1, 2, 1, 1, 1]);
});
