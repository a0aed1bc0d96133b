// Times the compiled kernels beside their plain twins, in turns, with the largest difference of their results.
import {
  factorPacked,
  leakageMatrix,
  type SegmentMesh,
  type SoilImages,
  type SurfacePotentials,
  useKernels,
} from '@ohmstead/core';

/** Rounds of both arms in turns, the first of which only warms up. */
const ROUNDS = 5;
/** Places each way of the map. */
const ACROSS = 60;
/** Rows of the matrix factored. */
const ROWS = 800;

/** A table: medians of both arms, their ratio, and the largest difference over the largest value. */
export function kernelRows(mesh: SegmentMesh, images: SoilImages, surfaces: SurfacePotentials): string[] {
  const xs = Float64Array.from({ length: ACROSS * ACROSS }, (_, p) => -5 + (p % ACROSS) * 1.17);
  const ys = Float64Array.from({ length: ACROSS * ACROSS }, (_, p) => -5 + Math.floor(p / ACROSS) * 0.93);
  return [
    '| kernel, one thread | plain twin, ms | kernel, ms | twin over kernel | largest difference |',
    '|---|---|---|---|---|',
    row(`surface potential, ${xs.length} places, ${mesh.count} segments`, () => {
      const values = new Float64Array(xs.length * surfaces.count);
      return [() => surfaces.atMany(xs, ys, values), values];
    }),
    row(`leakage matrix, ${mesh.count} segments`, () => {
      const values = new Float64Array((mesh.count * (mesh.count + 1)) / 2);
      return [() => values.set(leakageMatrix(mesh, images).entries), values];
    }),
    row(`Cholesky factor, ${ROWS} rows`, () => {
      const values = new Float64Array((ROWS * (ROWS + 1)) / 2).fill(0.5);
      for (let i = 0; i < ROWS; i++) values[(i * (i + 3)) / 2] = ROWS;
      return [() => factorPacked(values, ROWS), values];
    }),
  ];
}

function row(name: string, prepare: () => readonly [work: () => void, values: Float64Array]): string {
  const times: [number[], number[]] = [[], []];
  let difference = 0;
  for (let r = 0; r < ROUNDS; r++) {
    const [plain, fast] = [0, 1].map((arm) => {
      useKernels(arm === 1);
      const [work, values] = prepare();
      const start = performance.now();
      work();
      times[arm]!.push(performance.now() - start);
      return values;
    });
    const scale = plain!.reduce((most, v) => Math.max(most, Math.abs(v)), 0);
    difference = plain!.reduce((most, v, k) => Math.max(most, Math.abs(v - fast![k]!) / scale), difference);
  }
  const [plain, fast] = times.map((all) => all.slice(1).sort((a, b) => a - b)[(ROUNDS - 1) >> 1]!);
  const cells = [name, plain!.toFixed(1), fast!.toFixed(1), `${(plain! / fast!).toFixed(1)}×`];
  return `| ${[...cells, difference.toExponential(1)].join(' | ')} |`;
}
