// What drawing does to the draft: rows that it leaves chosen, words for undo, and rows that still stand after it.
import { describe, expect, test } from 'vitest';
import { polygonsOf } from '../../../src/desk/areas.ts';
import { conductorsAt } from '../../../src/desk/conductor-edits.ts';
import { beginHistory, commit, undo } from '../../../src/desk/history.ts';
import { floatingElectrodes } from '../../../src/plan/floating.ts';
import { planItems, standing } from '../../../src/plan/plan-conductors.ts';
import {
  copied,
  deleted,
  drawnInto,
  laidAt,
  type Making,
  makingOf,
  moved,
  pasted,
  remade,
} from '../../../src/plan/plan-edits.ts';
import { demo, loaded, small } from '../desk/drafts.ts';

const draft = small();
const row = (line: number) => ({ file: 'conductors.csv', line });
const making: Making = { depth: 0.7, diameter: 0.014, rodLength: 2.5, nx: 2, ny: 3, material: undefined };

describe('what is drawn', () => {
  test('a conductor is laid as it is made, is chosen, and is told', () => {
    const edit = drawnInto(draft, { kind: 'conductor', from: [1, 2], to: [4, 6] }, making)!;
    expect(edit.label).toBe('conductor L-01 drawn');
    expect(edit.rows).toEqual([row(6)]);
    expect(conductorsAt(edit.draft, edit.rows)).toMatchObject([
      { id: 'L-01', x1: 1, y1: 2, depth1: 0.7, x2: 4, y2: 6, depth2: 0.7, diameter: 0.014 },
    ]);
    // it reads as a study: loading one at fault throws
    expect(loaded(edit.draft).study.title).toBe('Small square');
  });

  test('a rod goes down from the depth of its top', () => {
    const edit = drawnInto(draft, { kind: 'rod', at: [10, 0] }, making)!;
    expect(edit.label).toBe('rod R-01 drawn');
    expect(conductorsAt(edit.draft, edit.rows)).toMatchObject([{ x1: 10, x2: 10, depth1: 0.7, depth2: 3.2 }]);
  });

  test('a mesh of two by three has four conductors one way and three the other', () => {
    const edit = drawnInto(draft, { kind: 'mesh', from: [0, 0], to: [8, 6] }, making)!;
    expect(edit.label).toBe('mesh of 2 by 3 drawn');
    expect(edit.rows).toHaveLength(7);
  });

  test('an area goes to the areas of its kind and leaves nothing chosen', () => {
    const corners = [
      [0, 0],
      [9, 0],
      [9, 9],
    ] as const;
    const edit = drawnInto(draft, { kind: 'area', area: 'step', corners }, making)!;
    expect([edit.label, edit.rows]).toEqual(['step area drawn', []]);
    expect(polygonsOf(edit.draft, 'step')).toEqual([corners]);
  });

  test('a profile is no part of the draft', () => {
    expect(drawnInto(draft, { kind: 'profile', from: [0, 0], to: [1, 1] }, making)).toBeUndefined();
  });
});

describe('what is chosen', () => {
  test('is moved, stays chosen, and the move is told in the units displayed', () => {
    const edit = moved(draft, [row(2), row(3)], { dx: 1.5, dy: -2 }, 'SI');
    expect(edit.label).toBe('2 conductors moved 1.5\u202fm east and 2\u202fm south');
    expect(edit.rows).toEqual([row(2), row(3)]);
    expect(conductorsAt(edit.draft, [row(2)])).toMatchObject([{ x1: 1.5, y1: -2, x2: 11.5, y2: -2 }]);
    expect(moved(draft, [row(2)], { dx: 3.048, dy: 0 }, 'US').label).toBe(
      'conductor A moved 10\u202fft east',
    );
  });

  test('is copied, and the copies are chosen', () => {
    const edit = copied(draft, [row(2)], { dx: 0, dy: 5 });
    expect(edit.label).toBe('conductor A copied');
    expect(edit.rows).toEqual([row(6)]);
    expect(conductorsAt(edit.draft, edit.rows)).toMatchObject([{ id: 'A-2', y1: 5 }]);
  });

  test('is deleted, and nothing is chosen', () => {
    const edit = deleted(draft, [row(2), row(4)]);
    expect([edit.label, edit.rows]).toEqual(['2 conductors deleted', []]);
    expect(planItems(edit.draft).map(({ conductor }) => conductor.id)).toEqual(['B', 'D']);
  });

  test('is pasted after it was deleted, under its own id, and again under a free one', () => {
    const kept = conductorsAt(draft, [row(2)]);
    const cut = deleted(draft, [row(2)]).draft;
    const once = pasted(cut, kept, { dx: 0.5, dy: 0.5 });
    const twice = pasted(once.draft, kept, { dx: 1, dy: 1 });
    expect(once.label).toBe('conductor A copied');
    expect(conductorsAt(once.draft, once.rows)).toMatchObject([{ id: 'A', x1: 0.5, y1: 0.5, x2: 10.5 }]);
    expect(conductorsAt(twice.draft, twice.rows)).toMatchObject([{ id: 'A-2', x1: 1, y1: 1 }]);
  });

  test('is made of something else, or laid deeper as a whole', () => {
    const thick = remade(draft, [row(2), row(3)], { diameter: 0.02 });
    expect(thick.label).toBe('2 conductors changed');
    expect(conductorsAt(thick.draft, thick.rows).map(({ diameter }) => diameter)).toEqual([0.02, 0.02]);
    const rod = drawnInto(draft, { kind: 'rod', at: [0, 0] }, making)!;
    const deep = laidAt(rod.draft, rod.rows, 1);
    expect(conductorsAt(deep.draft, deep.rows)).toMatchObject([{ depth1: 1, depth2: 3.5 }]);
  });

  test('no longer stands where undo has taken it back', () => {
    const edit = drawnInto(draft, { kind: 'rod', at: [5, 5] }, making)!;
    const history = commit(beginHistory(draft, 'opened'), edit.draft, edit.label);
    expect(standing(history.present.draft, edit.rows)).toEqual(edit.rows);
    expect(standing(undo(history).present.draft, [...edit.rows, row(2)])).toEqual([row(2)]);
    expect(standing(draft, [{ file: 'gone.csv', line: 2 }])).toEqual([]);
  });
});

describe('what is drawn next', () => {
  test('is made as the last conductor and rod that do not float', () => {
    const aldermoor = demo('aldermoor');
    const floating = floatingElectrodes(aldermoor);
    expect([...floating]).toEqual(['fence']);
    const items = planItems(aldermoor);
    const own = items.filter(({ conductor }) => conductor.electrode !== 'fence');
    const last = own.findLast(({ rod }) => !rod)!.conductor;
    const rod = own.findLast((one) => one.rod)!.conductor;
    expect(makingOf(items, floating)).toMatchObject({
      depth: last.depth1,
      diameter: last.diameter,
      electrode: last.electrode,
      rodLength: rod.depth2 - rod.depth1,
    });
  });

  test('has usual sizes where there is nothing yet', () => {
    expect(makingOf([], new Set())).toMatchObject({ depth: 0.6, diameter: 0.012, rodLength: 3 });
  });
});
