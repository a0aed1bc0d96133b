// What the benchmark runs: a study, and the mesh level whose system is solved beside the dense LU.

export interface BenchCase {
  readonly name: string;
  readonly folder: string;
  /** refinement of the one mesh that both solvers get */
  readonly level: number;
  /** also run at the smallest size */
  readonly small: boolean;
}

export const benchCases: readonly BenchCase[] = [
  {
    name: '70 × 70 m, 100 meshes, two layers, coarsest mesh',
    folder: 'test-data/square-70m',
    level: 0,
    small: true,
  },
  { name: 'the same, as refined by the study', folder: 'test-data/square-70m', level: 2, small: false },
];
