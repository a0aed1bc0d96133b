// What this machine and this engine give just now: the figures that every time is to be read against.
import { calibrationBytes } from './bench-calibration-bytes.ts';
import { spread } from './bench-statistics.ts';

export interface Calibration {
  /** f64x2 multiply and add in WebAssembly, one thread, 10⁹ operations a second */
  readonly multiplyAddGflops: number;
  /** a = b + 3 c over arrays larger than the caches, GB/s */
  readonly triadGBs: number;
  /** 1/√ of one double in f64x2, ns */
  readonly reciprocalRootNs: number;
}

/** Rounds of the multiply-add loop: some 5 ms. */
const MULTIPLY_ADDS = 2_500_000;
/** Operations of one of its rounds: twelve chains, two doubles, a product and a sum. */
const OPERATIONS = 48;
/** Doubles of each of the triad's arrays: 96 MB together, past the caches of any one core. */
const TRIAD = 4_000_000;
/** Doubles of the root loop: in the first cache, so that memory does not count. */
const ROOTS = 1024;
const ROOT_REPEATS = 2000;
/** Repeats of each loop; the fastest counts, for the first are compiled in haste and others may be disturbed. */
const REPEATS = 12;
const BYTES = Float64Array.BYTES_PER_ELEMENT;

/** Runs the three loops; undefined where WebAssembly or its vectors are missing. */
export function calibration(): Calibration | undefined {
  const call = loops();
  if (call === undefined) return undefined;
  const [a, b, c] = [0, 1, 2].map((k) => k * BYTES * TRIAD);
  if (call('reserve', 3 * BYTES * TRIAD) === 0) return undefined;
  const ms = (work: () => void): number =>
    spread(
      Array.from({ length: REPEATS }, () => {
        const start = performance.now();
        work();
        return performance.now() - start;
      }),
    )!.least;
  const multiplyAdd = ms(() => call('multiplyAdd', MULTIPLY_ADDS));
  const triad = ms(() => call('triad', a!, b!, c!, TRIAD));
  const roots = ms(() => {
    for (let k = 0; k < ROOT_REPEATS; k++) call('reciprocalRoots', a!, b!, ROOTS);
  });
  return {
    multiplyAddGflops: (OPERATIONS * MULTIPLY_ADDS) / multiplyAdd / 1e6,
    triadGBs: (3 * BYTES * TRIAD) / triad / 1e6,
    reciprocalRootNs: (roots * 1e6) / (ROOTS * ROOT_REPEATS),
  };
}

/** An instance of its own each time, so that its memory does not stay. */
function loops(): ((name: string, ...values: number[]) => number) | undefined {
  let exports: WebAssembly.Exports;
  try {
    exports = new WebAssembly.Instance(new WebAssembly.Module(Buffer.from(calibrationBytes, 'base64')))
      .exports;
  } catch {
    return undefined;
  }
  return (name, ...values) => {
    const f = exports[name];
    if (typeof f !== 'function') throw new TypeError(`the calibration has no loop ${name}`);
    return Number(f(...values) ?? 0);
  };
}
