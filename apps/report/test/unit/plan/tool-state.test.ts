// What each tool draws from the points that it is given.
import type { Point } from '@ohmstead/study';
import { describe, expect, test } from 'vitest';
import { close, type Drawn, hold, TOOLS, type Tool, take } from '../../../src/plan/tool-state.ts';

/** Gives a tool points one after the other. */
function given(
  tool: Tool,
  points: readonly Point[],
): { readonly taken: readonly Point[]; readonly drawn: readonly Drawn[] } {
  let state = hold(tool);
  const drawn: Drawn[] = [];
  for (const at of points) {
    const next = take(state, at);
    state = next.state;
    if (next.drawn !== undefined) drawn.push(next.drawn);
  }
  return { taken: state.taken, drawn };
}

const square: readonly Point[] = [
  [0, 0],
  [10, 0],
  [10, 10],
  [0, 10],
];

describe('tools', () => {
  test('select takes no points', () => {
    expect(given('select', square)).toEqual({ taken: [], drawn: [] });
  });

  test('rod draws one at every point', () => {
    const { taken, drawn } = given('rod', square);
    expect(taken).toEqual([]);
    expect(drawn).toEqual(square.map((at) => ({ kind: 'rod', at })));
  });

  test('conductor goes on from where the last one ended, and not from a point to itself', () => {
    const { taken, drawn } = given('conductor', [
      [0, 0],
      [5, 0],
      [5, 0],
      [5, 8],
    ]);
    expect(drawn).toEqual([
      { kind: 'conductor', from: [0, 0], to: [5, 0] },
      { kind: 'conductor', from: [5, 0], to: [5, 8] },
    ]);
    expect(taken).toEqual([[5, 8]]);
  });

  test.each(['mesh', 'profile'] as const)('%s is drawn between two points and begins anew', (kind) => {
    expect(
      given(kind, [
        [0, 0],
        [6, 4],
      ]),
    ).toEqual({ taken: [], drawn: [{ kind, from: [0, 0], to: [6, 4] }] });
  });

  test('a mesh has two sides; a profile may run due east', () => {
    const flat: readonly Point[] = [
      [0, 0],
      [6, 0],
    ];
    expect(given('mesh', flat)).toEqual({ taken: [[0, 0]], drawn: [] });
    expect(given('profile', flat).drawn).toHaveLength(1);
  });

  test.each([
    ['touch area', 'touch'],
    ['step area', 'step'],
    ['covered area', 'covering'],
  ] as const)('%s is closed on its first corner, or when told', (tool, area) => {
    const drawn = [{ kind: 'area', area, corners: square }];
    expect(given(tool, [...square, square[0]!])).toEqual({ taken: [], drawn });
    const open = given(tool, square);
    expect(open).toEqual({ taken: square, drawn: [] });
    expect(close({ tool, taken: open.taken })).toEqual({ state: hold(tool), drawn: drawn[0] });
  });

  test('an area of two corners is none, and a corner on the last one is none', () => {
    expect(given('touch area', [square[0]!, square[1]!, square[1]!]).taken).toHaveLength(2);
    expect(given('touch area', [square[0]!, square[1]!, square[0]!])).toEqual({ taken: [], drawn: [] });
  });

  test('closing drops what anything else has begun', () => {
    for (const tool of TOOLS.filter((one) => !one.endsWith('area')))
      expect(close({ tool, taken: square })).toEqual({ state: hold(tool), drawn: undefined });
  });
});
