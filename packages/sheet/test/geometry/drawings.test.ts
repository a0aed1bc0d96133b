// What the figures show: shares of the limit, lines in volts, leakage by class, the profile.
import type { Outcome } from '@ohmstead/study';
import { describe, expect, it } from 'vitest';
import { conductorCurrents, LEAKAGE_STEPS, leakageDrawing } from '../../src/geometry/leakage.ts';
import { mapDrawing } from '../../src/geometry/map-drawing.ts';
import { insideEvenOdd } from '../../src/geometry/polygon.ts';
import { profileDrawing } from '../../src/geometry/profile-drawing.ts';
import { fixtureOutcome } from '../fixture.ts';

const outcome = fixtureOutcome({ spacing: 1 });

describe('a map', () => {
  it('fills by share of the limit, and what is beyond holds the worst place', () => {
    const drawing = mapDrawing(outcome, 0, 'touch', false);
    const { touch } = outcome.results.cases[0];
    expect(drawing.whole).toBe(touch.limit_V);
    expect(drawing.edges).toEqual([0.2, 0.4, 0.6, 0.8]);
    expect(drawing.beyond?.level).toBe(1);
    expect(insideEvenOdd(drawing.beyond?.rings ?? [], touch.x_m, touch.y_m)).toBe(true);
    expect(drawing.roundVolts).toBeUndefined();
  });

  it('judges touch by magnitude: metal lower than the surface is no better than metal higher', () => {
    const turned: Outcome = {
      ...outcome,
      cases: outcome.cases.map((c) => ({ ...c, map: { ...c.map, touch: c.map.touch.map((v) => -v) } })),
    };
    expect(mapDrawing(turned, 0, 'touch', false).beyond?.rings).toEqual(
      mapDrawing(outcome, 0, 'touch', false).beyond?.rings,
    );
  });

  it('draws lines at round volts where little of the limit is reached', () => {
    const drawing = mapDrawing(outcome, 2, 'step', false);
    expect(drawing.roundVolts).toBeGreaterThan(0);
    for (const { level } of drawing.lines) {
      expect((level * drawing.whole) / (drawing.roundVolts ?? 1)).toBeCloseTo(
        Math.round((level * drawing.whole) / (drawing.roundVolts ?? 1)),
        9,
      );
    }
  });

  it('tells the potential as share of the rise, without a limit', () => {
    const drawing = mapDrawing(outcome, 0, 'potential', false);
    expect(drawing.whole).toBe(outcome.results.cases[0].gpr_V);
    expect(drawing.edges).toHaveLength(9);
    expect(drawing.beyond).toBeUndefined();
  });

  it('thins a large lattice for a small figure and keeps the picture', () => {
    const fine = fixtureOutcome({ spacing: 0.5 });
    const small = mapDrawing(fine, 0, 'touch', true);
    const { touch } = fine.results.cases[0];
    expect(insideEvenOdd(small.beyond?.rings ?? [], touch.x_m, touch.y_m)).toBe(true);
    expect(small.bands[3].rings.flat().length).toBeLessThan(
      mapDrawing(fine, 0, 'touch', false).bands[3].rings.flat().length,
    );
  });
});

describe('leakage', () => {
  it('sums to the injected current over energised metal and to nothing over floating', () => {
    const currents = conductorCurrents(outcome);
    const sum = (role: string): number =>
      outcome.plan.conductors.reduce((total, c, k) => total + (c.role === role ? currents[k].leakage : 0), 0);
    expect(sum('energised')).toBeCloseTo(1, 9);
    expect(sum('floating')).toBeCloseTo(0, 9);
  });

  it('draws every level segment once, in the class of its leakage', () => {
    const drawing = leakageDrawing(outcome);
    const { segments, plan } = outcome;
    const level = Array.from(segments.conductor).filter((c) => !plan.conductors[c].rod).length;
    expect(drawing.classes.reduce((n, g) => n + g.out.length + g.in.length, 0)).toBe(level);
    expect(drawing.classes.map((g) => g.upTo)).toEqual(LEAKAGE_STEPS);
    expect(drawing.classes.some((g) => g.in.length > 0)).toBe(true);
    expect(drawing.rods).toHaveLength(10);
  });

  it('leaves out insulated metal', () => {
    const bare = leakageDrawing(outcome).classes.flatMap((g) => [...g.out, ...g.in]).length;
    const conductors = outcome.plan.conductors.map((c, k) => (k === 0 ? { ...c, insulated: true } : c));
    const jacketed = leakageDrawing({ ...outcome, plan: { ...outcome.plan, conductors } });
    expect(jacketed.classes.flatMap((g) => [...g.out, ...g.in])).toHaveLength(bare - 12);
  });
});

describe('a profile', () => {
  const drawing = profileDrawing(outcome, 0);

  it('runs along x with the coordinate of the plan', () => {
    expect(drawing.axis).toEqual({ kind: 'x', start: -8 });
    expect(drawing.range).toEqual([-8, 68]);
  });

  it('puts the limit line the limit below the metal, on assessed ground only', () => {
    const { touch } = outcome.results.cases[0];
    expect(drawing.limit).toHaveLength(1);
    const [run] = drawing.limit;
    expect(run[0][0]).toBeGreaterThanOrEqual(0);
    expect(run[run.length - 1][0]).toBeLessThanOrEqual(36);
    expect(drawing.assessedMetal[0][5][1] - run[5][1]).toBeCloseTo(touch.limit_V, 9);
  });

  it('hatches where the surface lies below the limit line, and nowhere when all is within', () => {
    const { gpr_V, touch } = outcome.results.cases[0];
    expect(drawing.beyond).toHaveLength(1);
    for (const [, level] of drawing.beyond[0])
      expect(level).toBeLessThanOrEqual(gpr_V - touch.limit_V + 1e-6);
    expect(profileDrawing(outcome, 2).beyond).toHaveLength(0);
  });

  it('marks the worst place between surface and metal', () => {
    const { touch } = outcome.results.cases[0];
    expect(drawing.worst?.along).toBeCloseTo(touch.x_m, 9);
    expect((drawing.worst?.metal ?? 0) - (drawing.worst?.surface ?? 0)).toBeCloseTo(touch.worst_V, 0);
  });

  it('marks no worst place on a line that passes it by or ends before it', () => {
    const [first] = outcome.cases;
    const worstOn = (from: readonly [number, number], to: readonly [number, number]): unknown =>
      profileDrawing({ ...outcome, cases: [{ ...first, profile: { ...first.profile, from, to } }] }, 0).worst;
    const { from, to } = first.profile;
    const { x_m } = outcome.results.cases[0].touch;
    expect(worstOn(from, to)).toBeDefined();
    expect(worstOn([from[0], from[1] + 1], [to[0], to[1] + 1])).toBeUndefined();
    expect(worstOn(from, [x_m - 1, to[1]])).toBeUndefined();
    expect(worstOn([x_m + 1, from[1]], to)).toBeUndefined();
  });
});
