import { describe, expect, it } from 'vitest';
import { type Bar, gridBars, rodBar } from '../../../core/test/support/electrodes.ts';
import { InputFaults, solveStudy } from '../../src/index.ts';
import { studyOf } from '../support/studies.ts';

const grid = gridBars(20, 20, 2, 2, 0.5, 0.005);
const faultsOf = async (work: Promise<unknown>): Promise<readonly string[]> => {
  try {
    await work;
  } catch (error) {
    if (error instanceof InputFaults) return error.message.split('\n');
    throw error;
  }
  return [];
};

describe('solving a study', () => {
  it('scales every voltage with the current of the case, decrement and division included', async () => {
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
    const [one, shared] = (await solveStudy(studyOf(grid, [[100]], { cases }))).results.cases;
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

  it('finds a worst touch voltage that no place of a fine lattice exceeds, and a worst step likewise', async () => {
    const outcome = await solveStudy(studyOf([...grid, rodBar(0, 0, 0.5, 3, 0.008)], [[100, 1], [400]])); // biome-ignore format: two layers
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

  it('puts a case that names no place at the node nearest the centroid and says so', async () => {
    const { results } = await solveStudy(studyOf(grid, [[100]]));
    expect(results.cases[0]!.inject).toEqual({ x_m: 10, y_m: 10, depth_m: 0.5 });
    expect(results.assumptions.map((a) => a.code)).toContain('injection-at-centroid');
  });

  it('gives each place of injection its own resistance when the metal has one', async () => {
    const cases = [
      { name: 'corner', grid_current_A: 1, duration_s: 0.5, inject: { x_m: 0, y_m: 0, depth_m: 0.5 } },
      { name: 'middle', grid_current_A: 1, duration_s: 0.5, inject: { x_m: 10, y_m: 10, depth_m: 0.5 } },
    ];
    const loaded = studyOf(grid, [[10]], { cases, metal: 'resistive' });
    loaded.conductors.resistancePerMetre.fill(2e-2);
    const [corner, middle] = (await solveStudy(loaded)).results.cases;
    expect(corner!.resistance_ohm).toBeGreaterThan(1.05 * middle!.resistance_ohm);
  });

  it('warns by id of metal that nothing joins, and of ends that stop short', async () => {
    const loose: Bar = { from: [30, 0, 0.5], to: [40, 0, 0.5], radius: 0.005 };
    const short: Bar = { from: [20.08, 10, 0.5], to: [25, 10, 0.5], radius: 0.005 };
    const { results } = await solveStudy(studyOf([...grid, loose, short], [[100]]));
    const messages = results.warnings.map((w) => `${w.code}: ${w.message}`);
    expect(messages).toContain(
      'piece-not-joined: no metal joins 7 to the place of a fault: solved as floating',
    );
    expect(messages.join()).toMatch(
      /near-miss: an end of 8 stops 80 mm short of 3 at \(20\.\d\d, 10\.00\) m/,
    );
  });

  it('tells faults of the drawing with file, line and id, all of them', async () => {
    const bars: Bar[] = [...grid, grid[0]!, { from: [3, 3, 0.5], to: [3, 3, 0.5], radius: 0.005 }];
    const lines = await faultsOf(solveStudy(studyOf(bars, [[100]])));
    expect(lines.join('\n')).toMatch(/conductors\.csv:8: 7: .*1/);
    expect(lines.join('\n')).toMatch(/conductors\.csv:9: 8: /);
    expect(lines).toHaveLength(2);
  });

  it('refuses floating metal that touches the energised electrode', async () => {
    const fence: Bar = { from: [20, 0, 0.5], to: [30, 0, 0.5], radius: 0.005 };
    const electrodes = [...grid.map(() => undefined), 'fence'];
    const lines = await faultsOf(
      solveStudy(studyOf([...grid, fence], [[100]], { electrodes, floating: ['fence'] })),
    );
    expect(lines).toHaveLength(1);
    expect(lines[0]).toMatch(/^conductors\.csv:8: 7: /);
  });

  it('does not take a scrap near the centroid for the electrode', async () => {
    const scrap: Bar = { from: [4, 4, 0.5], to: [6, 4, 0.5], radius: 0.005 };
    const { results } = await solveStudy(studyOf([...grid, scrap], [[100]]));
    const alone = (await solveStudy(studyOf(grid, [[100]]))).results.electrode.resistance_ohm;
    expect(Math.abs(results.electrode.resistance_ohm / alone - 1)).toBeLessThan(1e-2);
    expect(results.electrodes.map((e) => [e.role, e.conductor_count])).toEqual([
      ['energised', 6],
      ['floating', 1],
    ]);
  });

  it('refuses cases that enter separate electrodes, naming the case', async () => {
    const away = gridBars(10, 10, 1, 1, 0.5, 0.005).map(
      (b): Bar => ({
        ...b,
        from: [b.from[0] + 60, b.from[1], b.from[2]],
        to: [b.to[0] + 60, b.to[1], b.to[2]],
      }),
    );
    const cases = [
      { name: 'here', grid_current_A: 1, duration_s: 0.5, inject: { x_m: 0, y_m: 0, depth_m: 0.5 } },
      { name: 'there', grid_current_A: 1, duration_s: 0.5, inject: { x_m: 60, y_m: 0, depth_m: 0.5 } },
    ];
    expect(await faultsOf(solveStudy(studyOf([...grid, ...away], [[100]], { cases })))).toEqual([
      'study.json: cases[1].inject: case there enters metal that nothing joins to that of case here; give each its own study, with the other electrode floating',
    ]);
  });

  it('assesses areas that lie between the points of its map', async () => {
    const square = [[[3.1, 3.1], [3.3, 3.1], [3.3, 3.3], [3.1, 3.3]]] as const; // biome-ignore format: a square
    const { results } = await solveStudy(studyOf(grid, [[100]], { areas: { touch: square, step: square } }));
    const { touch, step } = results.cases[0]!;
    for (const { x_m, y_m } of [touch, step]) {
      expect(x_m).toBeGreaterThanOrEqual(3.1 - 1e-9);
      expect(y_m).toBeLessThanOrEqual(3.3 + 1e-9);
    }
    expect(touch.worst_V).toBeGreaterThan(0);
  });

  it('judges by the covering where it lies and by bare soil elsewhere', async () => {
    const cases = [{ name: 'fault', grid_current_A: 300, duration_s: 0.5 }];
    const bare = (await solveStudy(studyOf(grid, [[100]], { cases }))).results.cases[0]!;
    const loaded = studyOf(grid, [[100]], { cases });
    const surfaced = (areas?: typeof loaded.study.areas) => ({
      ...loaded,
      study: {
        ...loaded.study,
        surfacing: { resistivity_ohm_m: 3000, thickness_m: 0.1, areas: areas?.touch },
      },
    });
    const covered = (await solveStudy(surfaced())).results.cases[0]!;
    expect(covered.touch.on_covering).toBe(true);
    expect(covered.touch.limit_V).toBeGreaterThan(2 * bare.touch.limit_V);
    expect(covered.bare_touch_limit_V).toBe(bare.touch.limit_V);
    // the worst pace leaves the covering, which ends at the grid's edge
    expect(covered.step.on_covering).toBe(false);
    expect(covered.step.limit_V).toBe(bare.step.limit_V);
    const everywhere = [[[-9, -9], [29, -9], [29, 29], [-9, 29]]] as const; // biome-ignore format: a square
    const wide = (await solveStudy(surfaced({ touch: everywhere }))).results.cases[0]!;
    expect(wide.step.on_covering).toBe(true);
    expect(wide.step.limit_V).toBeGreaterThan(2 * bare.step.limit_V);
  });

  it('states an uncertainty that covers a mesh much finer, step voltage included, over a conducting layer near the grid', async () => {
    const bars = gridBars(60, 60, 2, 2, 0.5, 0.005);
    const cut = bars.flatMap(({ from, to, radius }) =>
      Array.from({ length: 24 }, (_, k): Bar => {
        const at = (t: number): [number, number, number] => [
          from[0] + (to[0] - from[0]) * t,
          from[1] + (to[1] - from[1]) * t,
          0.5,
        ];
        return { from: at(k / 24), to: at((k + 1) / 24), radius };
      }),
    );
    const layers = [[100, 0.6], [5]] as const; // biome-ignore format: two layers
    const coarse = (await solveStudy(studyOf(bars, layers))).results.cases[0]!;
    const fine = (await solveStudy(studyOf(cut, layers))).results.cases[0]!;
    expect(Math.abs(coarse.step.worst_V - fine.step.worst_V)).toBeLessThan(
      coarse.step.uncertainty_V + fine.step.uncertainty_V,
    );
    expect(Math.abs(coarse.touch.worst_V - fine.touch.worst_V)).toBeLessThan(
      coarse.touch.uncertainty_V + fine.touch.uncertainty_V,
    );
    expect(coarse.step.uncertainty_V / coarse.step.worst_V).toBeLessThan(0.05);
  });

  it('refuses a study in which nothing bare is energised', async () => {
    const loaded = studyOf(grid, [[100]]);
    loaded.conductors.insulated.fill(1);
    expect(await faultsOf(solveStudy(loaded))).toEqual([
      'study.json: conductors: no conductor of an energised electrode is bare: no current can enter the ground',
    ]);
  });

  it('refuses an electrode too large for the memory there is, with both figures', async () => {
    const large = studyOf(gridBars(300, 300, 60, 60, 0.5, 0.005), [[100]]);
    const [line] = await faultsOf(solveStudy(large, { memoryBytes: 2e7 }));
    const [, segments, needed] =
      /needs (\d+) segments and about (\d+\.\d) GB of memory; this machine has 0\.0 GB/.exec(line!)!;
    expect(Number(segments)).toBeGreaterThan(10_000);
    expect(Number(needed)).toBeGreaterThan(0);
  });

  it('gives the same results to the last bit each time', async () => {
    const study = studyOf(grid, [[100, 1], [400]]); // biome-ignore format: two layers
    expect(JSON.stringify((await solveStudy(study)).results)).toBe(
      JSON.stringify((await solveStudy(study)).results),
    );
  });
});
