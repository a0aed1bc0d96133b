// What a reader must know to judge the benchmark's tables.
import { type Numpy, numpyBlas } from './bench-numpy.ts';
import type { Surroundings } from './bench-stage.ts';

export async function numpyLine({ numpy, spawner }: Surroundings): Promise<string> {
  switch (numpy.kind) {
    case 'absent':
      return `No numpy arms: ${numpy.reason}.`;
    case 'present':
      return `numpy ${numpy.version} with ${await numpyBlas(spawner)}.`;
  }
}

export function footnotes({ numpy, full }: Surroundings): string[] {
  return [
    'All arms run in turns, A B C A B C; a figure is the median of its rounds, in brackets the least',
    'and the most; ratios are taken round by round, of the wall’s clock and of processor time, which',
    'other work on the machine disturbs less. Lattices of 5 m meshes, two segments a side, 0.5 m',
    'deep; two layers: 2 m of 100 over 300 Ω·m; four: 1 m of 200, 3 m of 50, 4 m of 800 over 20 Ω·m.',
    'All arms get the same segments and, but for the one “as a study runs it”, the same images: in',
    'two layers the 26 of the series cut after eight reflections, fewer than a study fits, so that no',
    'script is slowed by their number. The scripts (`apps/cli/bench`) do collocation at the middle of',
    'a segment and LU, as scripts usually do; the engine does Galerkin and conjugate gradients: the',
    'same physics, and their R differs by the method. A script is timed by itself, after a warm-up',
    'and without the start of Python, with one and with two threads of its linear algebra; the better',
    'counts. “R off” is against the uncompressed matrix of the same images solved to 1e-12; entries',
    'are sampled from a seed and compared with direct quadrature of every image of the study’s list.',
    'Factors of a library at 2 000 rows run once.',
    ...leftOut(numpy, full),
  ];
}

function leftOut(numpy: Numpy, full: boolean): string[] {
  if (full) return [];
  const scripts = numpy.kind === 'present' ? 'the scripts at 10 000 segments (minutes, 6 GB) and ' : '';
  return [`Left out here, run by \`npm run bench -- --full\`: ${scripts}50 000 segments in four layers.`];
}
