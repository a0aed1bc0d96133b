// What a sounding shows: staircase over the whole axis, readings by traverse, what lies off the scale, the electrode's size.
import type { SoilFit } from '@ohmstead/study';
import { describe, expect, it } from 'vitest';
import { diagonalOf, shallowestOf } from '../../src/geometry/electrode-size.ts';
import { decades } from '../../src/geometry/log-axis.ts';
import { atLeastDecades, soundingDrawing } from '../../src/geometry/sounding-drawing.ts';
import { fixtureOutcome } from '../fixture.ts';
import { type GroundOptions, withGround } from '../fixture-ground.ts';

const outcome = fixtureOutcome({ spacing: 6 });

function fitOf(options: GroundOptions = {}): SoilFit {
  const { ground } = withGround(outcome, options).results;
  if (ground === null) throw new Error('the fixture has no ground');
  return ground.fit;
}

function layered(...layers: readonly (readonly [rho: number, thickness: number | null])[]): SoilFit {
  const spread = (best: number) => ({ best, low: best, median: best, high: best });
  return {
    ...fitOf(),
    layers: layers.map(([rho, thickness]) => ({
      resistivity_ohm_m: spread(rho),
      thickness_m: thickness === null ? null : spread(thickness),
    })),
  };
}

describe('the staircase of the layers', () => {
  it('steps at the depth of each interface, from one end of the axis to the other', () => {
    const { stairs, spacing } = soundingDrawing(layered([200, 1.5], [120, 2.5], [60, null]), 0);
    expect(stairs).toEqual([
      [spacing[0], 200],
      [1.5, 200],
      [1.5, 120],
      [4, 120],
      [4, 60],
      [spacing[1], 60],
    ]);
  });

  it('leaves out layers above the axis and below it', () => {
    const { stairs, spacing } = soundingDrawing(layered([200, 0.1], [120, 500], [60, null]), 0);
    expect(stairs).toEqual([
      [spacing[0], 120],
      [spacing[1], 120],
    ]);
  });

  it('does not flatten the readings for a layer far off their scale, and names it', () => {
    const near = soundingDrawing(layered([200, 1.5], [60, null]), 0);
    const far = soundingDrawing(layered([200, 1.5], [90_000, 0.1], [60, null]), 0);
    expect(near.offScale).toEqual([]);
    expect(far.offScale).toEqual([90_000]);
    expect(far.resistivity).toEqual(near.resistivity);
  });
});

describe('readings', () => {
  it('carry their traverse, in the order of the survey', () => {
    const { traverses, marks } = soundingDrawing(fitOf({ traverses: ['west', 'east'] }), 0);
    expect(traverses).toEqual(['west', 'east']);
    expect(marks.map((mark) => mark.traverse)).toEqual([0, 0, 0, 0, 0, 0, 0, 1, 1, 1, 1, 1, 1, 1]);
  });
});

describe('the axes', () => {
  it('hold every reading, the curve and the band', () => {
    const { marks, curve, band, spacing, resistivity } = soundingDrawing(fitOf(), 0);
    const points = [
      ...marks.map(({ reading }) => [reading.spacing_m, reading.apparent_resistivity_ohm_m]),
      ...curve,
      ...band.flatMap(([x, low, high]) => [
        [x, low],
        [x, high],
      ]),
    ];
    for (const [x, rho] of points) {
      expect(x).toBeGreaterThanOrEqual(spacing[0]);
      expect(x).toBeLessThanOrEqual(spacing[1]);
      expect(rho).toBeGreaterThan(resistivity[0]);
      expect(rho).toBeLessThan(resistivity[1]);
    }
  });

  it('reach as far as an electrode that is larger than the survey, but not to any size', () => {
    expect(soundingDrawing(fitOf(), 90).spacing[1]).toBeGreaterThan(90);
    expect(soundingDrawing(fitOf(), 90).diagonal).toBe(90);
    const huge = soundingDrawing(fitOf(), 5000);
    expect(huge.diagonal).toBeUndefined();
    expect(huge.spacing[1]).toBeLessThan(100);
  });

  it('are widened evenly where resistivities hardly differ', () => {
    const [low, high] = atLeastDecades([90, 110], 1);
    expect(decades(low, high)).toBeCloseTo(1, 9);
    expect(low * high).toBeCloseTo(90 * 110, 6);
    expect(atLeastDecades([1, 1000], 1)).toEqual([1, 1000]);
  });
});

describe('the size of the electrode', () => {
  it('is that of the energised metal: the fence round it does not count', () => {
    const { conductors } = outcome.plan;
    expect(diagonalOf(conductors)).toBeCloseTo(75, 9);
    expect(shallowestOf(conductors)).toBe(0.6);
    expect(diagonalOf([])).toBe(0);
    expect(shallowestOf([])).toBeUndefined();
  });
});
