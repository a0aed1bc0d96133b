import { describe, expect, it } from 'vitest';
import { gridBars, rodBar } from '../../../core/test/support/electrodes.ts';
import { type Outcome, solveStudy } from '../../src/index.ts';
import { studyOf } from '../support/studies.ts';

const study = studyOf(
  [...gridBars(20, 20, 2, 2, 0.5, 0.005), rodBar(0, 0, 0.5, 3.5, 0.008)],
  [[100, 2], [300]],
  { seasons: [{ name: 'dry', top: { depth_m: 0.8, resistivity_ohm_m: 2000 } }] },
); // biome-ignore format: two layers

describe('the early outcome', async () => {
  const given: Outcome[] = [];
  const whole = await solveStudy(study, { onFirst: (first) => void given.push(first) });
  const [first] = given;

  it('is given once, from fewer segments, without what is solved beside', () => {
    expect(given).toHaveLength(1);
    expect(first!.results.electrode.segment_count).toBeLessThan(whole.results.electrode.segment_count);
    expect(first!.results.seasons).toEqual([]);
    expect(whole.results.seasons).toHaveLength(1);
  });

  it('states an uncertainty that covers the final resistance and touch voltage', () => {
    const [early, late] = [first!.results, whole.results];
    expect(Math.abs(early.electrode.resistance_ohm - late.electrode.resistance_ohm)).toBeLessThan(
      early.electrode.resistance_uncertainty_ohm,
    );
    const [a, b] = [early.cases[0]!.touch, late.cases[0]!.touch];
    expect(a.worst_V).not.toBe(b.worst_V);
    expect(Math.abs(a.worst_V - b.worst_V)).toBeLessThan(a.uncertainty_V + b.uncertainty_V);
  });

  it('leaves the final outcome as it is without it', async () => {
    const alone = await solveStudy(study);
    expect(JSON.stringify(alone.results.cases)).toBe(JSON.stringify(whole.results.cases));
    expect(first!.cases[0]!.map.nx).toBeLessThan(whole.cases[0]!.map.nx);
  });
});
