// Edges that no closed path runs through.
import { expect, test } from 'vitest';
import { bridges } from '../../src/numerics/bridges.ts';

function bridgesOf(nodeCount: number, edges: readonly (readonly [number, number])[]): number[] {
  return Array.from(bridges({ nodeCount, from: edges.map(([u]) => u), to: edges.map(([, v]) => v) }));
}

test('two triangles joined by one edge, with a tail', () => {
  const edges = [[0, 1], [1, 2], [2, 0], [2, 3], [3, 4], [4, 5], [5, 3], [4, 6]] as const; // biome-ignore format: one line
  expect(bridgesOf(7, edges)).toEqual([0, 0, 0, 1, 0, 0, 0, 1]);
});

test('triangles that share a node have none; a tree has nothing else', () => {
  expect(bridgesOf(5, [[0, 1], [1, 2], [2, 0], [2, 3], [3, 4], [4, 2]])).toEqual([0, 0, 0, 0, 0, 0]); // biome-ignore format: one line
  expect(bridgesOf(6, [[0, 1], [1, 2], [1, 3], [4, 5]])).toEqual([1, 1, 1, 1]); // biome-ignore format: one line
});

test('a path of 200 000 nodes needs no deep call stack', () => {
  const edges = Array.from({ length: 199_999 }, (_, i) => [i, i + 1] as const);
  expect(bridgesOf(200_000, edges).every((flag) => flag === 1)).toBe(true);
});
