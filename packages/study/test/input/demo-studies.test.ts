// The studies of the test data: they load, and are what their description says.
import { describe, expect, test } from 'vitest';
import { loadStudy } from '../../src/input/load-study.ts';
import { loadPoints } from '../../src/input/points-csv.ts';
import type { LoadedStudy } from '../../src/study.ts';
import { folderSource } from './folder-source.ts';

function rows(loaded: LoadedStudy, of: (i: number) => boolean): readonly number[] {
  return Array.from({ length: loaded.conductors.count }, (_, i) => i).filter(of);
}

describe('Aldermoor', () => {
  const loaded = loadStudy(folderSource('aldermoor'));
  const { conductors, study } = loaded;
  const main = rows(loaded, (i) => conductors.electrode[i] === 'main');
  const fence = rows(loaded, (i) => conductors.electrode[i] === 'fence');

  test('is an L of 60 by 45 m with a fence 2 m outside', () => {
    const span = (indices: readonly number[]): readonly number[] => [
      Math.min(...indices.flatMap((i) => [conductors.x1[i], conductors.x2[i]])),
      Math.max(...indices.flatMap((i) => [conductors.x1[i], conductors.x2[i]])),
      Math.min(...indices.flatMap((i) => [conductors.y1[i], conductors.y2[i]])),
      Math.max(...indices.flatMap((i) => [conductors.y1[i], conductors.y2[i]])),
    ];
    expect(span(main)).toEqual([0, 60, 0, 45]);
    expect(span(fence)).toEqual([-2, 62, -2, 47]);
    expect(main.length + fence.length).toBe(conductors.count);
    const inNotch = main.filter(
      (i) => Math.max(conductors.x1[i], conductors.x2[i]) > 36 && conductors.y1[i] > 24,
    );
    expect(inNotch).toEqual([]);
  });

  test('has rods, two layers, a covering and three cases', () => {
    const vertical = (i: number): boolean =>
      conductors.x1[i] === conductors.x2[i] && conductors.y1[i] === conductors.y2[i];
    const rods = main.filter(vertical);
    expect(rods).toHaveLength(12);
    for (const i of rods) expect(conductors.depth2[i] - conductors.depth1[i]).toBeCloseTo(5, 12);
    expect(study.soil.layers).toHaveLength(2);
    expect(study.surfacing?.thickness_m).toBe(0.1);
    expect(study.cases).toHaveLength(3);
    expect(study.electrodes).toEqual([
      { name: 'main', role: 'energised' },
      { name: 'fence', role: 'floating' },
    ]);
  });

  test('leaves nothing to assume', () => {
    expect(loaded.notes).toEqual([]);
  });

  test('asks for the potential along a way out of the yard', () => {
    const points = loadPoints(folderSource('aldermoor'), 'points.csv');
    expect(points.count).toBe(13);
    expect(points.depth.every((depth) => depth === 0)).toBe(true);
    expect(points.notes).toEqual([]);
  });
});

describe('Brackwater', () => {
  const loaded = loadStudy(folderSource('brackwater'));
  const { conductors, study, survey } = loaded;

  test('is a ring of 25 by 15 m with six rods of 4 m', () => {
    expect([Math.max(...conductors.x1, ...conductors.x2), Math.min(...conductors.x1)]).toEqual([25, 0]);
    expect([Math.max(...conductors.y1, ...conductors.y2), Math.min(...conductors.y1)]).toEqual([15, 0]);
    const rods = rows(loaded, (i) => conductors.depth2[i] > conductors.depth1[i]);
    expect(rods).toHaveLength(6);
    for (const i of rods) expect(conductors.depth2[i] - conductors.depth1[i]).toBeCloseTo(4, 12);
  });

  test('has its soil from a survey of two traverses, and two seasons', () => {
    expect(study.soil).toEqual({ survey: 'survey.csv', layer_count: 'auto' });
    const traverses = new Set(survey?.readings.map(({ traverse }) => traverse));
    expect([...traverses]).toEqual(['north fence', 'field']);
    expect(survey?.readings).toHaveLength(14);
    expect(survey?.readings.every(({ array }) => array.kind === 'wenner' && array.pinDepth > 0)).toBe(true);
    expect(study.seasons?.map(({ name }) => name)).toEqual(['frozen to 0.5 m', 'dry to 1 m']);
  });

  test('leaves nothing to assume, and two readings to doubt', () => {
    expect(loaded.notes).toEqual([]);
    expect(survey?.cautions.map(({ row, code }) => [row, code])).toEqual([
      [2, 'deep-pins'],
      [9, 'deep-pins'],
    ]);
  });
});

describe('square of 70 m', () => {
  const { conductors, study } = loadStudy(folderSource('square-70m'));

  // IEEE Std 80-2000, annex B.1: 70 m by 70 m, 7 m spacing, 1540 m of conductor at 0.5 m (from memory)
  test('has 1540 m of conductor 10 mm in diameter, 0.5 m deep', () => {
    let length = 0;
    for (let i = 0; i < conductors.count; i++) {
      length += Math.hypot(conductors.x2[i] - conductors.x1[i], conductors.y2[i] - conductors.y1[i]);
    }
    expect(length).toBe(1540);
    expect(conductors.radius.every((radius) => radius === 0.005)).toBe(true);
    expect([...conductors.depth1, ...conductors.depth2].every((depth) => depth === 0.5)).toBe(true);
  });

  test('has one case in two layers', () => {
    expect(study.soil.layers).toEqual([
      { resistivity_ohm_m: 300, thickness_m: 6.096 },
      { resistivity_ohm_m: 100 },
    ]);
    expect(study.cases).toHaveLength(1);
  });
});
