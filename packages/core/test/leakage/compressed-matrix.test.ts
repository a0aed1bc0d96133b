import { describe, expect, it } from 'vitest';
import { joinConductors } from '../../src/geometry/joints.ts';
import { segmentMesh } from '../../src/geometry/segmentation.ts';
import { compressedLeakageMatrix } from '../../src/leakage/compressed-matrix.ts';
import { leakageMatrix } from '../../src/leakage/leakage-matrix.ts';
import { crossApproximation } from '../../src/numerics/cross-approximation.ts';
import { soilImages } from '../../src/soil/image-list.ts';
import { solveGraph } from '../../src/solve/solution.ts';
import { type Bar, conductorTable, gridBars, rodBar } from '../support/electrodes.ts';
import { randomNumbers } from '../support/random.ts';
import { soil } from '../support/soils.ts';

function meshOf(bars: readonly Bar[], interfaces: readonly number[], level: number) {
  const table = conductorTable(bars);
  return { table, mesh: segmentMesh(table, joinConductors(table), interfaces, level) };
}

describe('cross approximation', () => {
  it('gives a smooth block to its tolerance at a small rank', () => {
    const kernel = (r: number, c: number): number => 1 / Math.hypot(3 + 0.02 * c + 0.01 * r, 0.05 * (r - c));
    for (const tolerance of [1e-3, 1e-6, 1e-9]) {
      const product = crossApproximation(60, 40, kernel, tolerance, 24)!;
      let error = 0;
      let norm = 0;
      for (let r = 0; r < 60; r++)
        for (let c = 0; c < 40; c++) {
          let value = 0;
          for (let k = 0; k < product.rank; k++) value += product.u[k * 60 + r]! * product.v[k * 40 + c]!;
          error += (value - kernel(r, c)) ** 2;
          norm += kernel(r, c) ** 2;
        }
      expect(Math.sqrt(error / norm)).toBeLessThan(3 * tolerance);
      expect(product.rank).toBeLessThan(12);
    }
  });

  it('finds the exact rank of a product, and gives up on a block that has none', () => {
    const product = crossApproximation(
      30,
      30,
      (r, c) => (r + 1) * (c + 2) + Math.sin(r) * Math.cos(c),
      1e-12,
      15,
    )!;
    expect(product.rank).toBe(2);
    const random = randomNumbers(3);
    const noise = Float64Array.from({ length: 900 }, random);
    expect(crossApproximation(30, 30, (r, c) => noise[30 * r + c]!, 1e-9, 15)).toBeUndefined();
  });
});

describe('the compressed leakage matrix', () => {
  const bars = [
    ...gridBars(90, 60, 12, 8, 0.5, 0.005),
    rodBar(0, 0, 0.5, 6, 0.008),
    rodBar(90, 60, 0.5, 6, 0.008),
  ];
  const { table, mesh } = meshOf(bars, [2], 1);
  const images = soilImages(soil([100, 2], [900]));
  const whole = leakageMatrix(mesh, images);
  const compressed = compressedLeakageMatrix(mesh, images);

  it('multiplies like the whole one, to 1e-5', () => {
    const x = Float64Array.from({ length: whole.size }, randomNumbers(21));
    const [a, b] = [new Float64Array(whole.size), new Float64Array(whole.size)];
    whole.multiply(x, a);
    compressed.multiply(x, b);
    const norm = Math.sqrt(a.reduce((sum, v) => sum + v * v, 0));
    const error = Math.sqrt(a.reduce((sum, v, i) => sum + (v - b[i]!) ** 2, 0));
    expect(error / norm).toBeLessThan(1e-5);
    expect(Array.from(compressed.diagonal)).toEqual(Array.from(whole.diagonal));
  });

  it('gives resistance within 1e-5 of the whole one’s, and a symmetric product', async () => {
    const ohm = new Float64Array(table.count).fill(1e-3);
    const [a, b] = await Promise.all(
      [whole, compressed].map(
        async (matrix) => (await solveGraph(mesh, matrix, [0], ohm, 'resistive')).units[0]!,
      ),
    );
    expect(Math.abs(b!.resistance / a!.resistance - 1)).toBeLessThan(1e-5);
    expect(Math.abs(b!.balance)).toBeLessThan(1e-9);
    const random = randomNumbers(5);
    const [x, y] = [
      Float64Array.from({ length: mesh.count }, random),
      Float64Array.from({ length: mesh.count }, random),
    ];
    const [rx, ry] = [new Float64Array(mesh.count), new Float64Array(mesh.count)];
    compressed.multiply(x, rx);
    compressed.multiply(y, ry);
    const across = (p: Float64Array, q: Float64Array): number => p.reduce((sum, v, i) => sum + v * q[i]!, 0);
    expect(Math.abs(across(y, rx) / across(x, ry) - 1)).toBeLessThan(1e-12);
  });

  it('grows with the segments to a power of less than 1.35 in memory and entries computed', () => {
    const counts = [12, 24, 48].map((across) => {
      const { mesh: grown } = meshOf(gridBars(5 * across, 5 * across, across, across, 0.5, 0.005), [], 0);
      const { stored, evaluations } = compressedLeakageMatrix(grown, soilImages(soil([100])));
      return { n: grown.count, stored, evaluations };
    });
    const [, middle, large] = counts;
    const power = (pick: 'stored' | 'evaluations'): number =>
      Math.log(large![pick] / middle![pick]) / Math.log(large!.n / middle!.n);
    expect(power('stored')).toBeLessThan(1.35);
    expect(power('evaluations')).toBeLessThan(1.35);
  });
});
