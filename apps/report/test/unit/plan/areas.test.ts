// Areas on the plan: which are shown, what of them lies under a pointer, and what editing does.
import type { Outcome, Point } from '@ohmstead/study';
import { describe, expect, test } from 'vitest';
import { addPolygon, polygonsOf } from '../../../src/desk/areas.ts';
import type { Draft } from '../../../src/desk/draft.ts';
import { setValue } from '../../../src/desk/set-value.ts';
import {
  areaGiven,
  areaRemoved,
  cornerRemoved,
  cornerSet,
  cornersPasted,
} from '../../../src/plan/area-edits.ts';
import {
  areaAt,
  areaOf,
  edgeMiddles,
  gripAt,
  type PlanArea,
  planAreas,
  supposedArea,
} from '../../../src/plan/plan-areas.ts';
import { small } from '../desk/drafts.ts';

const square: readonly Point[] = [
  [0, 0],
  [10, 0],
  [10, 8],
  [0, 8],
];
const triangle: readonly Point[] = [
  [20, 0],
  [30, 0],
  [20, 9],
];
const draft = [square, triangle].reduce<Draft>(
  (next, corners) => addPolygon(next, 'touch', corners),
  small(),
);

function touch(of: Draft, polygon: number): PlanArea {
  return areaOf(planAreas(of), { kind: 'touch', polygon })!;
}

describe('areas shown', () => {
  test('are numbered where there are several of a kind', () => {
    const all = addPolygon(addPolygon(draft, 'step', square), 'covering', triangle);
    expect(planAreas(all).map(({ name }) => name)).toEqual([
      'touch area 1',
      'touch area 2',
      'step area',
      'covered area',
    ]);
  });

  test('leave out one with a corner that cannot be read, and keep the numbers of the others', () => {
    const broken = setValue(draft, ['areas', 'touch', 0, 1], ['x', 0]);
    expect(planAreas(broken).map(({ name, polygon }) => [name, polygon])).toEqual([['touch area 2', 1]]);
  });

  test('are supposed where the study gives none', () => {
    const outcome = (given: boolean, surfacing: object | undefined): Outcome =>
      ({
        study: { surfacing },
        plan: {
          touchArea: [square],
          stepArea: [triangle],
          areasGiven: { touch: given, step: given },
        },
        // an outcome has far more; only this is read
      }) as unknown as Outcome;
    expect(supposedArea(outcome(false, undefined), 'touch')).toEqual([square]);
    expect(supposedArea(outcome(false, undefined), 'step')).toEqual([triangle]);
    expect(supposedArea(outcome(true, undefined), 'touch')).toEqual([]);
    expect(supposedArea(outcome(false, undefined), 'covering')).toEqual([]);
    expect(supposedArea(outcome(false, {}), 'covering')).toEqual([square]);
    expect(supposedArea(outcome(false, { areas: [] }), 'covering')).toEqual([]);
  });
});

describe('under a pointer', () => {
  test('the middles of edges, the one that closes the area first', () => {
    expect(edgeMiddles(square)).toEqual([
      [0, 4],
      [5, 0],
      [10, 4],
      [5, 8],
    ]);
  });

  test('a corner is taken up, or the middle of an edge for a new one between its ends', () => {
    expect(gripAt(square, [9.8, 0.3], 0.5)).toEqual({ corner: 1, fresh: false, at: [10, 0] });
    expect(gripAt(square, [5.2, 0], 0.5)).toEqual({ corner: 1, fresh: true, at: [5, 0] });
    expect(gripAt(square, [0, 4], 0.5)).toEqual({ corner: 4, fresh: true, at: [0, 4] });
    expect(gripAt(square, [3, 0], 0.5)).toBeUndefined();
    // a corner before the middle of an edge that is nearer
    expect(gripAt(square, [6, 0], 5)?.fresh).toBe(false);
  });

  test('an area is found by its edge, the closing one too, and not by its inside', () => {
    const areas = planAreas(draft);
    expect(areaAt(areas, [3, 0.2], 0.5)?.polygon).toBe(0);
    expect(areaAt(areas, [0.2, 3], 0.5)?.polygon).toBe(0);
    expect(areaAt(areas, [25, -0.4], 0.5)?.polygon).toBe(1);
    expect(areaAt(areas, [5, 4], 0.5)).toBeUndefined();
  });
});

describe('editing', () => {
  test('moves a corner', () => {
    const edit = cornerSet(draft, touch(draft, 0), { corner: 2, fresh: false }, [12, 9], 'SI');
    expect(edit.label).toMatch(/^corner 3 of the touch area 1 moved to \(12\.0,.9\.0\).m$/u);
    expect(polygonsOf(edit.draft, 'touch')[0]).toEqual([
      [0, 0],
      [10, 0],
      [12, 9],
      [0, 8],
    ]);
    expect(polygonsOf(edit.draft, 'touch')[1]).toEqual(triangle);
  });

  test('adds a corner on an edge, on the closing one after the last', () => {
    const grip = gripAt(square, [0, 4], 0.1)!;
    const edit = cornerSet(draft, touch(draft, 0), grip, [-2, 4], 'SI');
    expect(edit.label).toMatch(/^corner added to the touch area 1 at /);
    expect(polygonsOf(edit.draft, 'touch')[0]).toEqual([...square, [-2, 4]]);
  });

  test('removes a corner; a triangle goes whole', () => {
    const one = cornerRemoved(draft, touch(draft, 0), 0);
    expect(one.label).toBe('corner 1 of the touch area 1 removed');
    expect(polygonsOf(one.draft, 'touch')[0]).toEqual(square.slice(1));
    const whole = cornerRemoved(draft, touch(draft, 1), 0);
    expect(whole.label).toBe('touch area 2 removed');
    expect(polygonsOf(whole.draft, 'touch')).toEqual([square]);
  });

  test('removes an area', () => {
    const { draft: next, label } = areaRemoved(draft, touch(draft, 0));
    expect([label, polygonsOf(next, 'touch')]).toEqual(['touch area 1 removed', [triangle]]);
  });

  test('gives what was supposed', () => {
    const { draft: next, label } = areaGiven(small(), 'step', [square, triangle]);
    expect([label, polygonsOf(next, 'step')]).toEqual([
      'step area given as it was supposed',
      [square, triangle],
    ]);
  });

  test('takes pasted corners, or says why not', () => {
    const edit = cornersPasted(draft, touch(draft, 1), '1\t2\n3\t4\n5\t0\n', 'SI');
    if ('complaints' in edit) throw new Error(edit.complaints.join('\n'));
    expect(edit.label).toBe('corners of the touch area 2 pasted');
    expect(polygonsOf(edit.draft, 'touch')[1]).toEqual([
      [1, 2],
      [3, 4],
      [5, 0],
    ]);
    const refused = cornersPasted(draft, touch(draft, 1), '1\tfar\n', 'SI');
    expect('complaints' in refused && refused.complaints.join()).toMatch(/far/);
  });
});
