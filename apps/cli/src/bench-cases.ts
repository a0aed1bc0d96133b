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
  { name: 'demo station, two layers, three cases', folder: 'test-data/aldermoor', level: 0, small: true },
  { name: '70 × 70 m, 100 meshes, two layers', folder: 'test-data/square-70m', level: 2, small: false },
];
