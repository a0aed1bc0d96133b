// Layers, areas and roles edited: every state between is a study that can be read.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  addCorner,
  addPolygon,
  polygonsOf,
  removeCorner,
  removePolygon,
  setCorner,
  setPolygon,
} from '../../../src/desk/areas.ts';
import { roleOf, setRole } from '../../../src/desk/electrodes.ts';
import { moveLayer, removeLayer, splitLayer } from '../../../src/desk/layers.ts';
import type { JsonPath } from '../../../src/desk/path.ts';
import { addRevision, nextMark } from '../../../src/desk/revisions.ts';
import { setValue } from '../../../src/desk/set-value.ts';
import { demo, loaded, small, smallStudy, textOf } from './drafts.ts';

const LAYERS: JsonPath = ['soil', 'layers'];

describe('layers', () => {
  const three = small({
    ...smallStudy,
    soil: {
      layers: [
        { resistivity_ohm_m: 10, thickness_m: 1 },
        { resistivity_ohm_m: 20, thickness_m: 4 },
        { resistivity_ohm_m: 30 },
      ],
    },
  });

  test('split, the ground is the same as before', () => {
    expect(loaded(splitLayer(three, LAYERS, 1)).study.soil.layers).toEqual([
      { resistivity_ohm_m: 10, thickness_m: 1 },
      { resistivity_ohm_m: 20, thickness_m: 2 },
      { resistivity_ohm_m: 20, thickness_m: 2 },
      { resistivity_ohm_m: 30 },
    ]);
    expect(loaded(splitLayer(three, LAYERS, 2)).study.soil.layers?.slice(2)).toEqual([
      { resistivity_ohm_m: 30, thickness_m: 4 },
      { resistivity_ohm_m: 30 },
    ]);
    expect(loaded(splitLayer(small(), LAYERS, 0)).study.soil.layers).toEqual([
      { resistivity_ohm_m: 100, thickness_m: 1 },
      { resistivity_ohm_m: 100 },
    ]);
    expect(splitLayer(small({}), LAYERS, 0).study.soil).toEqual({ layers: [{}] });
  });

  test('removed and moved, the last one has no thickness and the others have one', () => {
    expect(removeLayer(three, LAYERS, 2).study.soil).toEqual({
      layers: [{ resistivity_ohm_m: 10, thickness_m: 1 }, { resistivity_ohm_m: 20 }],
    });
    expect(moveLayer(three, LAYERS, 0, 2).study.soil).toEqual({
      layers: [
        { resistivity_ohm_m: 20, thickness_m: 4 },
        { resistivity_ohm_m: 30, thickness_m: 1 },
        { resistivity_ohm_m: 10 },
      ],
    });
    expect(moveLayer(three, LAYERS, 2, 0).study.soil).toEqual({
      layers: [
        { resistivity_ohm_m: 30, thickness_m: 4 },
        { resistivity_ohm_m: 10, thickness_m: 1 },
        { resistivity_ohm_m: 20 },
      ],
    });
    expect(moveLayer(three, LAYERS, 0, 3)).toBe(three);
  });

  test('whatever is done to them, the study loads', () => {
    const step = fc.record({
      kind: fc.constantFrom('split', 'remove', 'move'),
      at: fc.nat(5),
      to: fc.nat(5),
    });
    fc.assert(
      fc.property(fc.array(step, { maxLength: 8 }), (steps) => {
        let draft = three;
        for (const { kind, at, to } of steps) {
          const count = loaded(draft).study.soil.layers?.length ?? 0;
          if (kind === 'split' && at < count && count < 10) draft = splitLayer(draft, LAYERS, at);
          if (kind === 'remove' && count > 1) draft = removeLayer(draft, LAYERS, at);
          if (kind === 'move') draft = moveLayer(draft, LAYERS, at, to);
        }
        expect(loaded(draft).study.soil.layers?.length).toBeGreaterThan(0);
      }),
      { seed: 20_240_608, numRuns: 200 },
    );
  });
});

describe('areas', () => {
  const start = setValue(small(), ['title'], 'A');
  const square = [
    [0, 0],
    [8, 0],
    [8, 8],
    [0, 8],
  ] as const;

  test('are added and removed without a trace', () => {
    for (const kind of ['touch', 'step'] as const) {
      const more = addPolygon(start, kind, square);
      expect(polygonsOf(more, kind)).toEqual([square]);
      expect(loaded(more).study.areas).toEqual({ [kind]: [square] });
      expect(textOf(removePolygon(more, kind, 0), 'study.json')).toBe(textOf(start, 'study.json'));
    }
  });

  test('of the covering stand in the demonstration study', () => {
    expect(polygonsOf(demo('aldermoor'), 'covering')[0]).toHaveLength(6);
  });

  test('have corners that are moved, added and removed', () => {
    const more = addPolygon(start, 'step', square);
    expect(polygonsOf(setCorner(more, 'step', 0, 2, [9, 9]), 'step')[0]?.[2]).toEqual([9, 9]);
    const five = addCorner(more, 'step', 0, 4, [-1, 4]);
    expect(polygonsOf(five, 'step')[0]).toEqual([...square, [-1, 4]]);
    expect(textOf(removeCorner(five, 'step', 0, 4), 'study.json')).toBe(textOf(more, 'study.json'));
    const triangle = removeCorner(more, 'step', 0, 0);
    expect(polygonsOf(triangle, 'step')[0]).toHaveLength(3);
    expect(polygonsOf(removeCorner(triangle, 'step', 0, 0), 'step')).toEqual([]);
    expect(polygonsOf(setPolygon(more, 'step', 0, square.slice(1)), 'step')).toEqual([square.slice(1)]);
  });
});

describe('roles', () => {
  test('are set, changed and taken back', () => {
    const draft = demo('aldermoor');
    expect([roleOf(draft, 'fence'), roleOf(draft, 'gate')]).toEqual(['floating', undefined]);
    expect(roleOf(setRole(draft, 'fence', 'energised'), 'fence')).toBe('energised');
    expect(setRole(draft, 'gate', 'floating').study.electrodes).toHaveLength(3);
    expect(setRole(draft, 'fence', undefined).study.electrodes).toHaveLength(1);
    expect(setRole(draft, 'gate', undefined)).toBe(draft);
  });
});

describe('revisions', () => {
  test('are marked one after another', () => {
    const marks = ['A', 'Y', 'Z', 'AZ', 'ZZ', '1', 'P09', 'draft', ''];
    expect(marks.map(nextMark)).toEqual(['B', 'Z', 'AA', 'BA', 'AAA', '2', 'P10', 'A', 'A']);
    const two = addRevision(addRevision(small(), { date: '2024-05-02', text: ' ' }), { by: 'N.' });
    expect(loaded(two).study.revisions).toEqual([
      { mark: 'A', date: '2024-05-02' },
      { mark: 'B', by: 'N.' },
    ]);
  });
});
