import { describe, expect, it } from 'vitest';
import { joinConductors } from '../../src/geometry/joints.ts';
import { segmentMesh } from '../../src/geometry/segmentation.ts';
import type { SegmentMesh } from '../../src/geometry/segments.ts';
import { planBlocks, plannedBytes } from '../../src/leakage/block-plan.ts';
import {
  assembleMatrix,
  compressedLeakageMatrix,
  joinParts,
  startPart,
} from '../../src/leakage/compressed-matrix.ts';
import { leakageBlocks, leakageMatrix } from '../../src/leakage/leakage-matrix.ts';
import { partMatrix } from '../../src/leakage/part-matrix.ts';
import { blockRoom } from '../../src/numerics/dense-blocks.ts';
import { factorPacked } from '../../src/numerics/packed-cholesky.ts';
import { type SoilImages, soilImages } from '../../src/soil/image-list.ts';
import { solveGraph } from '../../src/solve/solution.ts';
import { type Bar, conductorTable, gridBars, rodBar } from '../support/electrodes.ts';
import { randomNumbers } from '../support/random.ts';
import { soil } from '../support/soils.ts';

function meshOf(bars: readonly Bar[], interfaces: readonly number[], level: number): SegmentMesh {
  const table = conductorTable(bars);
  return segmentMesh(table, joinConductors(table), interfaces, level);
}

const layered = soilImages(soil([100, 2], [900]));
const uniform = soilImages(soil([100]));

/** Two grids one above the other, rods through the interface, a slope, and a far piece. */
const yard: Bar[] = [
  ...gridBars(90, 60, 9, 6, 0.5, 0.005),
  ...gridBars(40, 30, 7, 3, 0.9, 0.011),
  rodBar(0, 0, 0.5, 6, 0.008),
  rodBar(90, 60, 0.5, 6, 0.008),
  rodBar(45, 30, 0.5, 6, 0.008),
  { from: [90, 0, 0.5], to: [101, -7, 1.7], radius: 0.005 },
  { from: [700, 500, 0.6], to: [760, 520, 0.6], radius: 0.005 },
];

/** Spacings that grow from 1 m to 60 m. */
const unequal: Bar[] = [0, 1, 3, 7, 15, 31, 63, 123].flatMap((at): Bar[] => [
  { from: [at, 0, 0.5], to: [at, 123, 0.5], radius: 0.005 },
  { from: [0, at, 0.5], to: [123, at, 0.5], radius: 0.005 },
]);

const line: Bar[] = Array.from(
  { length: 40 },
  (_, k): Bar => ({ from: [50 * k, 0, 0.8], to: [50 * (k + 1), 0, 0.8], radius: 0.005 }),
);

/** Wires a few radii apart: boxes of leaves lie in one another. */
const bundle: Bar[] = Array.from(
  { length: 6 },
  (_, k): Bar => ({ from: [0, 0.03 * k, 0.6], to: [300, 0.03 * k, 0.6], radius: 0.005 }),
);

const few: Bar[] = gridBars(6, 4, 1, 1, 0.5, 0.005);

const cases: [name: string, mesh: SegmentMesh, images: SoilImages][] = [
  ['grids, rods and a slope in two layers', meshOf(yard, [2], 1), layered],
  ['unequal spacing', meshOf(unequal, [2], 1), layered],
  ['a line of 2 km', meshOf(line, [2], 1), layered],
  ['wires close to each other', meshOf(bundle, [], 4), uniform],
  ['all in one leaf', meshOf(few, [], 0), uniform],
];

describe.each(cases)('the compressed leakage matrix of %s', (name, mesh, images) => {
  const whole = leakageMatrix(mesh, images);
  const compressed = compressedLeakageMatrix(mesh, images);

  it('multiplies like the whole one: to 3e-6 currents of one sign, to 3e-5 what nearly cancels', async () => {
    const random = randomNumbers(21);
    for (const [shift, most] of [
      [0, 3e-6],
      [0.5, 3e-5],
    ] as const) {
      // biome-ignore format: two kinds of currents
      const x = Float64Array.from({ length: whole.size }, () => random() - shift);
      const [a, b] = [new Float64Array(whole.size), new Float64Array(whole.size)];
      await whole.multiply(x, a);
      await compressed.multiply(x, b);
      const norm = Math.sqrt(a.reduce((sum, v) => sum + v * v, 0));
      const error = Math.sqrt(a.reduce((sum, v, i) => sum + (v - b[i]!) ** 2, 0));
      expect(error / norm).toBeLessThan(most);
    }
    const worst = whole.diagonal.reduce((most, v, i) => Math.max(most, Math.abs(compressed.diagonal[i]! / v - 1)), 0); // biome-ignore format: one comparison
    expect(worst).toBeLessThan(1e-12);
  });

  it('gives resistance within 1e-6 of the whole one’s, in few steps', async () => {
    const ohm = new Float64Array(mesh.count).fill(1e-4);
    const [a, b] = await Promise.all(
      [whole, compressed].map((matrix) => solveGraph(mesh, matrix, [0], ohm, 'resistive')),
    );
    expect(Math.abs(b!.units[0]!.resistance / a!.units[0]!.resistance - 1)).toBeLessThan(1e-6);
    expect(Math.abs(b!.units[0]!.balance)).toBeLessThan(1e-9);
    // one right-hand side a piece of metal, and one for the place of injection
    expect(b!.iterations / (mesh.componentCount + 1)).toBeLessThan(name === 'all in one leaf' ? 3 : 32);
  });

  it('is symmetric, and so is its preconditioner, which is positive definite', async () => {
    const { size } = compressed;
    const unit = new Float64Array(size);
    const column = new Float64Array(size);
    for (const apply of [compressed.multiply, compressed.precondition]) {
      const square = new Float64Array(size * size);
      for (let j = 0; j < size; j++) {
        unit.fill(0);
        unit[j] = 1;
        await apply(unit, column);
        square.set(column, j * size);
      }
      const packed = new Float64Array((size * (size + 1)) / 2);
      let worst = 0;
      for (let i = 0; i < size; i++)
        for (let j = 0; j <= i; j++) {
          const [one, other] = [square[i * size + j]!, square[j * size + i]!];
          const scale = Math.sqrt(square[i * (size + 1)]! * square[j * (size + 1)]!);
          worst = Math.max(worst, Math.abs(one - other) / scale);
          packed[(i * (i + 1)) / 2 + j] = (one + other) / 2;
        }
      expect(worst).toBeLessThan(1e-12);
      expect(() => factorPacked(packed, size)).not.toThrow();
    }
  });
});

describe('a large electrode', () => {
  it('takes memory, entries and steps that grow slower than n^1.2, n^1.2 and n^0.15', async () => {
    const counts = await Promise.all(
      [32, 60].map(async (across) => {
        const mesh = meshOf(gridBars(5 * across, 5 * across, across, across, 0.5, 0.005), [2], 0);
        const matrix = compressedLeakageMatrix(mesh, layered);
        const ohm = new Float64Array(mesh.count).fill(1e-4);
        const { iterations } = await solveGraph(mesh, matrix, [0], ohm, 'equipotential');
        return { n: mesh.count, stored: matrix.stored, evaluations: matrix.evaluations, iterations };
      }),
    );
    const [small, large] = counts;
    const power = (pick: 'stored' | 'evaluations' | 'iterations'): number =>
      Math.log(large![pick] / small![pick]) / Math.log(large!.n / small!.n);
    expect(large!.n).toBeGreaterThan(14_000);
    expect(power('stored')).toBeLessThan(1.2);
    expect(power('evaluations')).toBeLessThan(1.2);
    expect(power('iterations')).toBeLessThan(0.15);
    // to 1e-10
    expect(large!.iterations).toBeLessThan(35);
  });

  it('is the same to the last bit in whatever order and memory its parts are made', async () => {
    const [, mesh, images] = cases[0]!;
    const plan = planBlocks(mesh);
    expect(plan.parts.length).toBe(8);
    const starts = plan.parts.toReversed().map((part) => startPart(plan, part, leakageBlocks(mesh, images)));
    const joined = joinParts(plan, leakageBlocks(mesh, images), structuredClone(starts.toReversed()));
    const inputs = structuredClone(joined.inputs);
    const parts = plan.parts
      .toReversed()
      .map((part) => {
        const room = blockRoom(joined.layout.length);
        return { room, matrix: partMatrix(inputs, part, leakageBlocks(mesh, images), room) };
      })
      .toReversed();
    const matrices = parts.map((part) => part.matrix);
    const apart = assembleMatrix(mesh, joined, blockRoom(joined.layout.length), {
      systems: matrices.map((part) => part.system),
      bytes: matrices.reduce((sum, part) => sum + part.bytes, 0),
      evaluations: matrices.reduce((sum, part) => sum + part.evaluations, 0),
      products: {
        kind: 'away',
        multiply: async (x, y) => {
          const products = parts.toReversed().map(({ room, matrix }) => {
            room.x().set(x);
            room.y().fill(0);
            matrix.multiply();
            return room.y().slice();
          });
          for (const own of products.toReversed()) for (let i = 0; i < own.length; i++) y[i]! += own[i]!;
        },
      },
    });
    const together = compressedLeakageMatrix(mesh, images);
    const x = Float64Array.from({ length: together.size }, randomNumbers(4));
    for (const name of ['multiply', 'precondition'] as const) {
      const [a, b] = [new Float64Array(x.length), new Float64Array(x.length)];
      await together[name](x, a);
      await apart[name](x, b);
      expect(b).toEqual(a);
    }
    expect([apart.stored, apart.evaluations]).toEqual([together.stored, together.evaluations]);
    expect(Array.from(apart.diagonal)).toEqual(Array.from(together.diagonal));
  });

  it('tells the memory that its blocks will take before it takes it, to a fifth', () => {
    const mesh = meshOf(gridBars(150, 150, 30, 30, 0.5, 0.005), [2], 0);
    const planned = plannedBytes(planBlocks(mesh));
    const taken = 8 * compressedLeakageMatrix(mesh, layered).stored;
    expect(taken / planned).toBeGreaterThan(0.8);
    expect(taken / planned).toBeLessThan(1.2);
  });
});
