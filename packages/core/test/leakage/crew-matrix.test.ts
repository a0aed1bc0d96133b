// A compressed matrix by crews of any size and luck has the bits of one made alone.
import { beforeAll, describe, expect, it } from 'vitest';
import { joinConductors } from '../../src/geometry/joints.ts';
import { segmentMesh } from '../../src/geometry/segmentation.ts';
import { planBlocks, plannedEntries } from '../../src/leakage/block-plan.ts';
import {
  type CompressedLeakageMatrix,
  compressedLeakageMatrix,
} from '../../src/leakage/compressed-matrix.ts';
import { crewMatrix, crewPays } from '../../src/leakage/crew-matrix.ts';
import { leakageOperator } from '../../src/leakage/leakage-operator.ts';
import { soilImages } from '../../src/soil/image-list.ts';
import { solveGraph } from '../../src/solve/solution.ts';
import { testCrew } from '../support/crews.ts';
import { conductorTable, gridBars, rodBar } from '../support/electrodes.ts';
import { randomNumbers } from '../support/random.ts';
import { soil } from '../support/soils.ts';

function meshOf(across: number) {
  const table = conductorTable([
    ...gridBars(5 * across, 5 * across, across, across, 0.5, 0.005),
    rodBar(0, 0, 0.5, 6, 0.008),
  ]);
  return segmentMesh(table, joinConductors(table), [2], 0);
}

const images = soilImages(soil([100, 2], [900]));
const mesh = meshOf(16);
const plan = planBlocks(mesh);
const x = Float64Array.from({ length: mesh.count }, randomNumbers(5));

async function bitsOf(matrix: CompressedLeakageMatrix): Promise<Float64Array[]> {
  const found = [new Float64Array(x.length), new Float64Array(x.length), new Float64Array(x.length)];
  await matrix.multiply(x, found[0]!);
  await matrix.multiply(found[0]!, found[1]!);
  matrix.precondition(x, found[2]!);
  return [...found, matrix.diagonal, Float64Array.of(matrix.evaluations, matrix.stored)];
}

let alone: Float64Array[];
beforeAll(async () => {
  alone = await bitsOf(compressedLeakageMatrix(mesh, images));
});

describe('a compressed matrix made by a crew', () => {
  it.each([0, 1, 2, 3, 11])('of %i is the same to the last bit', async (size) => {
    for (const shared of [false, true]) {
      const { crew, counts } = testCrew(size, { shared });
      expect(await bitsOf(await crewMatrix(mesh, images, plan, crew))).toEqual(alone);
      // eight parts: one of them at least is the caller's
      expect(counts.started).toBe(Math.min(size, 7));
      expect(counts.orders).toBe(4 * counts.started);
    }
  });

  it('is the same when a helper breaks at any order or fails in it, or none can be started', async () => {
    for (const failure of [0, 1, 2, 3, 4, 5, 6, 7, 8]) {
      const broken = testCrew(2, { breaksAt: failure });
      expect(await bitsOf(await crewMatrix(mesh, images, plan, broken.crew))).toEqual(alone);
      expect(broken.counts.ended).toBe(failure === 0 ? 0 : 1);
      const failed = testCrew(2, { failsAt: failure });
      expect(await bitsOf(await crewMatrix(mesh, images, plan, failed.crew))).toEqual(alone);
      expect(failed.counts.ended).toBe(0);
    }
  });

  it('is the same after its helpers were set to another matrix, and after they were ended', async () => {
    const { crew, counts } = testCrew(2);
    const first = await crewMatrix(mesh, images, plan, crew);
    const second = await crewMatrix(mesh, images, plan, crew);
    expect(await bitsOf(first)).toEqual(alone);
    expect(await bitsOf(second)).toEqual(alone);
    expect(counts.started).toBe(2);
    crew.end();
    expect(counts.ended).toBe(2);
    expect(await bitsOf(second)).toEqual(alone);
    expect(await bitsOf(await crewMatrix(mesh, images, plan, crew))).toEqual(alone);
    expect(counts.started).toBe(4);
  });

  it('keeps products apart that are asked for at once', async () => {
    const matrix = await crewMatrix(mesh, images, plan, testCrew(2, { shared: true }).crew);
    const [a, b] = [new Float64Array(x.length), new Float64Array(x.length)];
    await Promise.all([matrix.multiply(x, a), matrix.multiply(alone[0]!, b)]);
    expect([a, b]).toEqual(alone.slice(0, 2));
  });

  it('tells the error of the work itself, not that of a helper', async () => {
    const { crew } = testCrew(1);
    const touching = { ...mesh, x1: mesh.x1.map((v, i) => (i === mesh.count - 1 ? Number.NaN : v)) };
    await expect(crewMatrix(touching, images, plan, crew)).rejects.toThrow(RangeError);
  });
});

describe('the rule for a crew', () => {
  it('starts no helper for a matrix that is quickly made, and all for one that is not', async () => {
    const [small, large] = [mesh, meshOf(45)];
    const { crew, counts } = testCrew(2);
    expect(crewPays(planBlocks(small))).toBe(false);
    await leakageOperator(small, images, crew);
    expect(counts.started).toBe(0);
    expect(crewPays(planBlocks(large))).toBe(true);
    const together = await leakageOperator(large, images, crew);
    expect(counts.started).toBe(2);
    const ohm = new Float64Array(large.count).fill(1e-4);
    const [a, b] = await Promise.all(
      [together, await leakageOperator(large, images)].map((one) =>
        solveGraph(large, one, [0], ohm, 'resistive'),
      ),
    );
    expect(a).toEqual(b);
  });

  it('foresees the entries to a fifth', () => {
    const { evaluations } = compressedLeakageMatrix(mesh, images);
    expect(plannedEntries(plan) / evaluations).toBeGreaterThan(0.8);
    expect(plannedEntries(plan) / evaluations).toBeLessThan(1.2);
  });
});
