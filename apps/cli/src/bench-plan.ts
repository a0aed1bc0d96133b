// Which parts a run of the benchmark has, in their order.
import { resolve } from 'node:path';
import { loadStudy } from '@ohmstead/study';
import { benchCases, smallestCase } from './bench-cases.ts';
import { factorsPart } from './bench-factors.ts';
import { growthPart } from './bench-growth.ts';
import { kernelRows } from './bench-kernels.ts';
import { largeByChild } from './bench-large-child.ts';
import { mapsPart } from './bench-maps.ts';
import { demonstrationOf, partRows } from './bench-parts.ts';
import type { Part, Surroundings } from './bench-stage.ts';
import { startPart } from './bench-start.ts';
import { systemsPart } from './bench-systems.ts';
import { folderSource } from './folder-source.ts';

/** Rounds of the largest case: five, each some seconds; one in the second soil, which only shows that nothing changes. */
const LARGE_ROUNDS = 5;

export function smallestParts(around: Surroundings): (() => Promise<Part>)[] {
  return [() => systemsPart(smallestCase, around), () => factorsPart(smallestCase, around)];
}

export function allParts(around: Surroundings): (() => Promise<Part>)[] {
  const factored = benchCases.filter(({ rivals }) => rivals).at(-1)!;
  return [
    ...benchCases.map((one) => () => systemsPart(one, around)),
    () => factorsPart(factored, around),
    () => largeByChild('two layers', LARGE_ROUNDS, around),
    ...(around.full ? [() => largeByChild('four layers', 1, around)] : []),
    () => growthPart(around),
    mapsPart,
    () => startPart(around),
    piecesPart,
  ];
}

async function piecesPart(): Promise<Part> {
  const demonstration = await demonstrationOf(loadStudy(folderSource(resolve('test-data/aldermoor'))));
  const { mesh, images, surfaces } = demonstration;
  return { lines: [...(await partRows(demonstration)), '', ...kernelRows(mesh, images, surfaces)] };
}
