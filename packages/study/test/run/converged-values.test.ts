// Resistance and worst touch and step voltages against converged values of an independent solver, and whether the
// stated uncertainty covers the difference.
// Source of every number: independent computation (Galerkin thin wire on graded meshes, Richardson extrapolation; single
// rods as solid cylinders, confirmed by axisymmetric finite elements). Trust: resistance 5e-4, touch and step 5e-3; in a
// layer of 2 000 Ω·m over 100 twice that.
import { describe, expect, it } from 'vitest';
import { type Bar, gridBars, rodBar } from '../../../core/test/support/electrodes.ts';
import { fieldAt, type Results, solveStudy } from '../../src/index.ts';
import { type Layers, studyOf } from '../support/studies.ts';

const RESISTANCE_TRUST = 5e-4;
const VOLTAGE_TRUST = 5e-3;

async function resultsOf(bars: readonly Bar[], layers: Layers, mesh?: number): Promise<Results> {
  // the references tell the worst place of the corner mesh; rods at the corners make its neighbours worse
  const areas = mesh === undefined ? undefined : { touch: [[[0, 0], [mesh, 0], [mesh, mesh], [0, mesh]] as const] }; // biome-ignore format: a square
  return (await solveStudy(studyOf(bars, layers, { areas }))).results;
}

function expectWithin(value: number, reference: number, share: number, what: string): void {
  expect(Math.abs(value / reference - 1), `${what}: ${value} against ${reference}`).toBeLessThan(share);
}

/** The stated uncertainty must cover the difference, allowing for what the reference itself is trusted to. */
function expectCovered(
  value: number,
  uncertainty: number,
  reference: number,
  trust: number,
  what: string,
): void {
  expect(Math.abs(value - reference), `${what}: ${value} ± ${uncertainty} against ${reference}`).toBeLessThan(
    uncertainty + trust * reference,
  );
}

interface GridCase {
  readonly bars: readonly Bar[];
  /** side of a mesh, m */
  readonly mesh: number;
  readonly layers: Layers;
  readonly resistance: number;
  /** largest touch voltage in the corner mesh, % of the rise */
  readonly touch: number;
  /** over the metre from the corner outward along the diagonal, % of the rise */
  readonly step: number;
  readonly resistanceShare: number;
  readonly touchShare: number;
  readonly trustFactor?: number;
}

async function checkGrid(one: GridCase): Promise<void> {
  const results = await resultsOf(one.bars, one.layers, one.mesh);
  const { touch, step, gpr_V } = results.cases[0]!;
  const { resistance_ohm, resistance_uncertainty_ohm } = results.electrode;
  const trust = one.trustFactor ?? 1;
  expectWithin(resistance_ohm, one.resistance, one.resistanceShare, 'resistance');
  expectCovered(
    resistance_ohm,
    resistance_uncertainty_ohm,
    one.resistance,
    trust * RESISTANCE_TRUST,
    'resistance',
  );
  const ratio = (100 * touch.worst_V) / gpr_V;
  expectWithin(ratio, one.touch, one.touchShare, 'worst touch');
  expectCovered(ratio, (100 * touch.uncertainty_V) / gpr_V, one.touch, trust * VOLTAGE_TRUST, 'worst touch');
  const out = Math.SQRT1_2;
  const [corner, beyond] = await fieldAt(studyOf(one.bars, one.layers), [
    { x_m: 0, y_m: 0, depth_m: 0 },
    { x_m: -out, y_m: -out, depth_m: 0 },
  ]);
  const cornerStep = (100 * (corner!.potential_V - beyond!.potential_V)) / gpr_V;
  expectWithin(cornerStep, one.step, 0.01 * trust, 'step at the corner');
  // the worst step is nowhere less than the corner's own
  expect((100 * step.worst_V) / gpr_V, 'worst step').toBeGreaterThan(one.step * (1 - 0.01 * trust));
  expect(results.checks.current_balance).toBeLessThan(1e-9);
  expect(results.checks.residual).toBeLessThan(1e-9);
}

const grid = (side: number, across: number): Bar[] => gridBars(side, side, across, across, 0.5, 0.005);

describe('square grids in uniform soil of 100 Ω·m: resistance to 0.2 %, worst touch to 1 %', () => {
  it.each([
    [20, 1, 3.0055, 53.4, 17.44],
    [20, 4, 2.6231, 35.65, 16.4],
    [20, 16, 2.3583, 24.67, 15.51],
    [20, 64, 2.2031, 22.05, 15.04],
    [60, 1, 1.1488, 59.31, 15.32],
    [60, 4, 0.97722, 42.17, 14.19],
    [60, 16, 0.85491, 29.88, 12.87],
    [60, 36, 0.8072, 24.26, 12.23],
    [60, 100, 0.76657, 18.38, 11.57],
  ])('%i m, %i meshes', async (side, meshes, resistance, touch, step) => {
    const bars = grid(side, Math.sqrt(meshes));
    await checkGrid({
      bars,
      mesh: side / Math.sqrt(meshes),
      layers: [[100]],
      resistance,
      touch,
      step,
      resistanceShare: 2e-3,
      touchShare: 1e-2,
    });
  });

  it('gives the step at the corner that the reference gives', async () => {
    const corner = Math.SQRT1_2;
    const [at, out] = await fieldAt(studyOf(grid(20, 4), [[100]]), [
      { x_m: 0, y_m: 0, depth_m: 0 },
      { x_m: -corner, y_m: -corner, depth_m: 0 },
    ]);
    const resistance = (await resultsOf(grid(20, 4), [[100]])).electrode.resistance_ohm;
    expectWithin((100 * (at!.potential_V - out!.potential_V)) / resistance, 15.51, 5e-3, 'corner step');
  });
});

describe('a 20 m grid of 16 meshes in two layers, upper 100 Ω·m: resistance to 0.3 %, worst touch to 1 %', () => {
  const table: readonly (readonly [h: number, ...rows: (readonly [lower: number, r: number, touch: number, step: number])[]])[] = [
    [0.3, [5.2632, 0.12879, 26.02, 18.94], [33.333, 0.80546, 25.19, 17.66], [300, 6.7097, 26.83, 12.06], [1900, 33.895, 32.2, 6.09]],
    [0.6, [5.2632, 0.42214, 77.51, 13.91], [33.333, 1.0361, 41.86, 15.57], [300, 5.7291, 15.33, 13.57], [1900, 21.999, 7.19, 8.4]],
    [1, [5.2632, 0.58265, 79.92, 22.87], [33.333, 1.1477, 44.64, 18.68], [300, 5.3394, 15.33, 12.17], [1900, 18.086, 7.22, 7.05]],
    [3, [5.2632, 0.91992, 56.75, 25.42], [33.333, 1.401, 38.33, 20.25], [300, 4.3983, 16.35, 11.13], [1900, 10.875, 8.41, 6.18]],
    [10, [5.2632, 1.5374, 35.72, 21.61], [33.333, 1.8307, 30.53, 18.89], [300, 3.3204, 18.38, 11.75], [1900, 5.7378, 11.16, 7.26]],
    [30, [5.2632, 2.0287, 28.53, 17.89], [33.333, 2.1495, 26.99, 16.94], [300, 2.7187, 21.47, 13.52], [1900, 3.5656, 16.43, 10.35]],
  ]; // biome-ignore format: one row a thickness
  const cases = table.flatMap(([h, ...rows]) =>
    rows.map(([lower, r, touch, step]) => [h, lower, r, touch, step] as const),
  );
  it.each(cases)('h %f m over %f Ω·m', async (h, lower, resistance, touch, step) => {
    const layers: Layers = [[100, h], [lower]];
    await checkGrid({
      bars: grid(20, 4),
      mesh: 5,
      layers,
      resistance,
      touch,
      step,
      resistanceShare: 3e-3,
      touchShare: 1e-2,
    });
  });
});

describe('a rod of 3 m, radius 7 mm, from the surface: to 0.5 %', () => {
  const thicknesses = [0.5, 1, 2, 2.9, 3.5, 5, 10];
  const rows: readonly (readonly [lower: number, ...ohm: number[]])[] = [
    [10, 3.8868, 4.5709, 7.2637, 19.17, 30.446, 31.821, 32.94],
    [50, 18.243, 19.763, 23.876, 30.152, 32.291, 32.916, 33.445],
    [200, 59.544, 53.132, 43.743, 37.584, 36.084, 35.288, 34.567],
    [1000, 154.75, 102.45, 62.238, 46.321, 42.513, 39.565, 36.65],
  ];
  const cases = rows.flatMap(([lower, ...ohm]) => ohm.map((r, k) => [lower, thicknesses[k]!, r] as const));
  it.each(cases)('100 Ω·m over %f Ω·m at %f m: %f Ω', async (lower, h, resistance) => {
    const { electrode } = await resultsOf([rodBar(0, 0, 0, 3, 0.007)], [[100, h], [lower]]);
    expectWithin(electrode.resistance_ohm, resistance, 5e-3, 'rod');
    expectCovered(
      electrode.resistance_ohm,
      electrode.resistance_uncertainty_ohm,
      resistance,
      RESISTANCE_TRUST,
      'rod',
    );
  });
});

describe('three to six layers: grids to 0.3 % and 1 %, rods and frozen ground to 0.5 %', () => {
  const corners = (side: number, bottom: number): Bar[] =>
    [[0, 0], [side, 0], [0, side], [side, side]].map(([x, y]) => rodBar(x!, y!, 0.5, bottom, 0.008)); // biome-ignore format: four corners
  const soils: readonly (readonly [Layers, number, number, ...(readonly [number, number, number])[]])[] = [
    [[[100, 2], [20, 6], [500]], 14.1, 4.9466, [2.1638, 25.05, 11.95], [1.719, 14.01, 7.59], [1.1286, 17.78, 7.42]],
    [[[50, 2], [500, 4], [50]], 27.977, 8.8202, [2.2578, 18.46, 13.7], [1.5629, 13.23, 12.04], [0.66958, 16.53, 11.83]],
    [[[1000, 2], [200, 6], [50]], 125.88, 14.35, [8.9192, 58.94, 24.99], [3.0293, 45.28, 20.22], [2.0559, 73.51, 23.75]],
    [[[200, 1], [50, 3], [800, 4], [20]], 23.985, 6.1851, [2.8863, 37.02, 16.96], [1.2986, 26.63, 13.87], [0.79537, 41.38, 16.43]],
  ]; // biome-ignore format: one row a soil
  const named = soils.map((row) => [row[0].map(([resistivity]) => resistivity).join('/'), row] as const);

  it.each(named)('rods in %s Ω·m', async (_, [layers, a, b]) => {
    for (const [bottom, radius, resistance] of [
      [3, 0.007, a],
      [10, 0.008, b],
    ] as const) {
      const { electrode } = await resultsOf([rodBar(0, 0, 0, bottom, radius)], layers); // biome-ignore format: two rods
      expectWithin(electrode.resistance_ohm, resistance, 5e-3, 'rod');
      expectCovered(
        electrode.resistance_ohm,
        electrode.resistance_uncertainty_ohm,
        resistance,
        RESISTANCE_TRUST,
        'rod',
      );
    }
  });

  it.each(named)(
    '20 m grid, the same with rods, 60 m grid in %s Ω·m',
    async (_, [layers, , , plain, rodded, large]) => {
      const electrodes = [grid(20, 4), [...grid(20, 4), ...corners(20, 10)], grid(60, 6)];
      for (const [k, [resistance, touch, step]] of [plain!, rodded!, large!].entries()) {
        await checkGrid({
          bars: electrodes[k]!,
          mesh: k === 2 ? 10 : 5,
          layers,
          resistance,
          touch,
          step,
          resistanceShare: 3e-3,
          touchShare: 1e-2,
        });
      }
    },
  );

  it('20 m grid with 3 m rods in ground frozen in six layers', async () => {
    const layers: Layers = [[2000, 0.2], [1500, 0.2], [1000, 0.2], [500, 0.2], [250, 0.2], [100]]; // biome-ignore format: six layers
    const bars = [...grid(20, 4), ...corners(20, 3.5)];
    await checkGrid({
      bars,
      mesh: 5,
      layers,
      resistance: 4.3963,
      touch: 59.35,
      step: 19.81,
      resistanceShare: 5e-3,
      touchShare: 1e-2,
      trustFactor: 2,
    });
  });
});
