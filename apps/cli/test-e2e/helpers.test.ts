// Threads of the built program: the bits of a matrix made by them, their loss, and when they are started.
import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import type { Worker } from 'node:worker_threads';
import {
  type Crew,
  joinConductors,
  leakageOperator,
  type SegmentMesh,
  segmentMesh,
  soilImages,
} from '@ohmstead/core';
import { expect, test } from 'vitest';
import { conductorTable, gridBars } from '../../../packages/core/test/support/electrodes.ts';
import { soil } from '../../../packages/core/test/support/soils.ts';
import { threadCrew } from '../src/thread-crew.ts';
import { ROOT } from './program.ts';

const HELPER = pathToFileURL(`${ROOT}apps/cli/dist/helper.js`);

const mesh = meshOf(45);
const images = soilImages(soil([100, 2], [900]));

function meshOf(across: number): SegmentMesh {
  const table = conductorTable(gridBars(5 * across, 5 * across, across, across, 0.5, 0.005));
  return segmentMesh(table, joinConductors(table), [2], 0);
}

async function productOf(crew?: Crew): Promise<Float64Array> {
  const matrix = await leakageOperator(mesh, images, crew);
  const x = Float64Array.from({ length: matrix.size }, (_, i) => Math.cos(i));
  const product = new Float64Array(matrix.size);
  // twice, so that vectors are used again
  await matrix.multiply(x, product);
  await matrix.multiply(product, x);
  crew?.end();
  return x;
}

test('the bits are the same alone, with one helper and with two', async () => {
  const alone = await productOf();
  let said = 0;
  const heard = (worker: Worker): void => void worker.on('message', () => said++);
  process.on('worker', heard);
  for (const size of [1, 2]) {
    said = 0;
    expect(await productOf(threadCrew(HELPER, size))).toEqual(alone);
    // parts started, finished, and multiplied twice
    expect(said).toBe(4 * size);
  }
  process.off('worker', heard);
});

test.each([
  ['is not there', undefined],
  ['throws at its start', 'throw new Error("no")'],
  ['ends at once', 'process.exit(0)'],
  ['ends when it is asked', 'require("node:worker_threads").parentPort.on("message", () => process.exit(1))'],
])('a helper that %s changes no bit', async (_, text) => {
  const file = join(mkdtempSync(join(tmpdir(), 'helper-')), 'helper.cjs');
  if (text !== undefined) writeFileSync(file, text);
  expect(await productOf(threadCrew(pathToFileURL(file), 2))).toEqual(await productOf());
});
