// The benchmark's fixed cases: square lattices five metres apart, half a metre deep, in two and four layers.
import type { ConductorTable } from '@ohmstead/core';
import type { LayerInput } from '@ohmstead/study';

export type SoilName = 'two layers' | 'four layers';

/** Layers from the surface down. */
export const soilLayers: Readonly<Record<SoilName, readonly LayerInput[]>> = {
  'two layers': [{ resistivity_ohm_m: 100, thickness_m: 2 }, { resistivity_ohm_m: 300 }],
  'four layers': [
    { resistivity_ohm_m: 200, thickness_m: 1 },
    { resistivity_ohm_m: 50, thickness_m: 3 },
    { resistivity_ohm_m: 800, thickness_m: 4 },
    { resistivity_ohm_m: 20 },
  ],
};

export interface BenchCase {
  /** meshes along a side; the lattice has 4·across·(across + 1) segments, two a mesh side */
  readonly across: number;
  readonly soil: SoilName;
  readonly rounds: number;
  /** beside the engine: its plain twin and the dense solvers of a library; too slow past 2 000 segments */
  readonly rivals: boolean;
  /** the numpy scripts: in every round, once and only in a full run, or not at all */
  readonly scripts: 'always' | 'full' | 'never';
}

const ROUNDS = 5;
/** At some milliseconds a round: enough that the compilers' first tries do not count. */
const SMALL_ROUNDS = 15;
/** Rounds that the scripts take part in. */
export const SCRIPT_ROUNDS = 5;

export const benchCases: readonly BenchCase[] = [
  { across: 10, soil: 'two layers', rounds: SMALL_ROUNDS, rivals: true, scripts: 'always' },
  { across: 22, soil: 'two layers', rounds: ROUNDS, rivals: true, scripts: 'always' },
  { across: 22, soil: 'four layers', rounds: ROUNDS, rivals: false, scripts: 'never' },
  { across: 49, soil: 'two layers', rounds: ROUNDS, rivals: false, scripts: 'full' },
  { across: 49, soil: 'four layers', rounds: ROUNDS, rivals: false, scripts: 'never' },
];

/** What is run where a few seconds must do. */
export const smallestCase: BenchCase = {
  across: 10,
  soil: 'two layers',
  rounds: SMALL_ROUNDS,
  rivals: true,
  scripts: 'never',
};

/** Meshes along a side of the largest case, some 50 000 segments, and of those that growth is fitted over. */
export const LARGEST_ACROSS = 111;
export const GROWTH_ACROSS: readonly number[] = [31, 63, 126];

/** Lines `SPACING` metres apart, cut at every crossing; bars of 10 mm. */
export function latticeTable(across: number): ConductorTable {
  const ends: [number, number, number, number][] = [];
  for (let i = 0; i <= across; i++)
    for (let j = 0; j < across; j++) {
      const [at, from, to] = [i * SPACING, j * SPACING, (j + 1) * SPACING];
      ends.push([at, from, at, to], [from, at, to, at]);
    }
  const column = (pick: (end: readonly number[]) => number): Float64Array => Float64Array.from(ends, pick);
  const all = (value: number): Float64Array => new Float64Array(ends.length).fill(value);
  return {
    count: ends.length,
    id: ends.map((_, i) => String(i)),
    x1: column((e) => e[0]!),
    y1: column((e) => e[1]!),
    depth1: all(DEPTH),
    x2: column((e) => e[2]!),
    y2: column((e) => e[3]!),
    depth2: all(DEPTH),
    radius: all(RADIUS),
    material: ends.map(() => 'copper-annealed'),
    electrode: ends.map(() => 'main'),
    insulated: new Uint8Array(ends.length),
    resistancePerMetre: all(Number.NaN),
  };
}

/** m */
const SPACING = 5;
const DEPTH = 0.5;
const RADIUS = 0.005;
