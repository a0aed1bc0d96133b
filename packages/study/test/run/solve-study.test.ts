import { describe, expect, it } from 'vitest';
import { type Bar, gridBars, rodBar } from '../../../core/test/support/electrodes.ts';
import { InputFaults, solveStudy } from '../../src/index.ts';
import { studyOf } from '../support/studies.ts';

const grid = gridBars(20, 20, 2, 2, 0.5, 0.005);
const faultsOf = (work: () => unknown): readonly string[] => {
  try {
    work();
  } catch (error) {
    if (error instanceof InputFaults) return error.message.split('\n');
    throw error;
  }
  return [];
};

describe('solving a study', () => {
  it('scales every voltage with the current of the case, decrement and division included', () => {
    const cases = [
      { name: 'one', grid_current_A: 1, duration_s: 0.5 },
      {
        name: 'shared',
        fault_current_A: 1000,
        division_factor: 0.6,
        x_over_r: 20,
        frequency_hz: 60,
        duration_s: 0.5,
      },
    ];
    const [one, shared] = solveStudy(studyOf(grid, [[100]], { cases })).results.cases;
    // decrement factor 1.052: IEEE Std 80-2000, table 10, X/R 20, 0.5 s, 60 Hz (from memory)
    expect(shared!.decrement_factor).toBeCloseTo(1.052, 3);
    expect(shared!.grid_current_A).toBeCloseTo(600 * shared!.decrement_factor, 9);
    for (const pick of [
      (c: typeof one) => c!.gpr_V,
      (c: typeof one) => c!.touch.worst_V,
      (c: typeof one) => c!.step.worst_V,
    ])
      expect(pick(shared) / pick(one) / shared!.grid_current_A).toBeCloseTo(1, 12);
  });

  it('finds a worst touch voltage that no place of a fine lattice exceeds, and a worst step likewise', () => {
    const outcome = solveStudy(studyOf([...grid, rodBar(0, 0, 0.5, 3, 0.008)], [[100, 1], [400]])); // biome-ignore format: two layers
    const { map } = outcome.cases[0]!;
    const { touch, step } = outcome.results.cases[0]!;
    for (let j = 0; j < map.ny; j++)
      for (let i = 0; i < map.nx; i++) {
        const [x, y] = [map.x0 + i * map.dx, map.y0 + j * map.dy];
        if (x < 0 || y < 0 || x > 20 || y > 20) continue;
        expect(Math.abs(map.touch[j * map.nx + i]!)).toBeLessThan(touch.worst_V + map.error + 1e-9);
        expect(map.step[j * map.nx + i]!).toBeLessThan(step.worst_V + 2 * map.error + 1e-9);
      }
    expect(Math.hypot(step.from.x_m - step.to.x_m, step.from.y_m - step.to.y_m)).toBeCloseTo(1, 12);
  });

  it('puts a case that names no place at the node nearest the centroid and says so', () => {
    const { results } = solveStudy(studyOf(grid, [[100]]));
    expect(results.cases[0]!.inject).toEqual({ x_m: 10, y_m: 10, depth_m: 0.5 });
    expect(results.assumptions.map((a) => a.code)).toContain('injection-at-centroid');
  });

  it('gives each place of injection its own resistance when the metal has one', () => {
    const cases = [
      { name: 'corner', grid_current_A: 1, duration_s: 0.5, inject: { x_m: 0, y_m: 0, depth_m: 0.5 } },
      { name: 'middle', grid_current_A: 1, duration_s: 0.5, inject: { x_m: 10, y_m: 10, depth_m: 0.5 } },
    ];
    const loaded = studyOf(grid, [[10]], { cases, metal: 'resistive' });
    loaded.conductors.resistancePerMetre.fill(2e-2);
    const [corner, middle] = solveStudy(loaded).results.cases;
    expect(corner!.resistance_ohm).toBeGreaterThan(1.05 * middle!.resistance_ohm);
  });

  it('warns by id of metal that nothing joins, and of ends that stop short', () => {
    const loose: Bar = { from: [30, 0, 0.5], to: [40, 0, 0.5], radius: 0.005 };
    const short: Bar = { from: [20.08, 10, 0.5], to: [25, 10, 0.5], radius: 0.005 };
    const { results } = solveStudy(studyOf([...grid, loose, short], [[100]]));
    const messages = results.warnings.map((w) => `${w.code}: ${w.message}`);
    expect(messages).toContain(
      'piece-not-joined: no metal joins 7 to the place of a fault: solved as floating',
    );
    expect(messages.join()).toMatch(
      /near-miss: an end of 8 stops 80 mm short of 3 at \(20\.\d\d, 10\.00\) m/,
    );
  });

  it('tells faults of the drawing with file, line and id, all of them', () => {
    const bars: Bar[] = [...grid, grid[0]!, { from: [3, 3, 0.5], to: [3, 3, 0.5], radius: 0.005 }];
    const lines = faultsOf(() => solveStudy(studyOf(bars, [[100]])));
    expect(lines.join('\n')).toMatch(/conductors\.csv:8: 7: .*1/);
    expect(lines.join('\n')).toMatch(/conductors\.csv:9: 8: /);
    expect(lines).toHaveLength(2);
  });

  it('refuses floating metal that touches the energised electrode', () => {
    const fence: Bar = { from: [20, 0, 0.5], to: [30, 0, 0.5], radius: 0.005 };
    const electrodes = [...grid.map(() => undefined), 'fence'];
    const lines = faultsOf(() =>
      solveStudy(studyOf([...grid, fence], [[100]], { electrodes, floating: ['fence'] })),
    );
    expect(lines).toHaveLength(1);
    expect(lines[0]).toMatch(/^conductors\.csv:8: 7: /);
  });

  it('refuses a study in which nothing bare is energised', () => {
    const loaded = studyOf(grid, [[100]]);
    loaded.conductors.insulated.fill(1);
    expect(faultsOf(() => solveStudy(loaded))).toEqual([
      'study.json: conductors: no conductor of an energised electrode is bare: no current can enter the ground',
    ]);
  });

  it('refuses an electrode too large to hold, with the figure', () => {
    const lines = faultsOf(() => solveStudy(studyOf(gridBars(600, 600, 90, 90, 0.5, 0.005), [[100]])));
    expect(lines[0]).toMatch(/needs \d+ segments, about \d\.\d GB; at most 60000/);
  });

  it('gives the same results to the last bit each time', () => {
    const study = studyOf(grid, [[100, 1], [400]]); // biome-ignore format: two layers
    expect(JSON.stringify(solveStudy(study).results)).toBe(JSON.stringify(solveStudy(study).results));
  });
});
