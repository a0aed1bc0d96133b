// A lattice of points on the surface, filled adaptively: evaluated where the field bends, interpolated where it does not.

/** Point (i, j) stands at (x0 + i·spacing, y0 + j·spacing), index j·nx + i. */
export interface Grid {
  readonly x0: number;
  readonly y0: number;
  readonly spacing: number;
  readonly nx: number;
  readonly ny: number;
}

/** A value at each point of a grid. */
export interface Lattice extends Grid {
  readonly values: Float64Array;
  /** points computed, the others being interpolated */
  readonly evaluated: number;
  /** largest difference seen between a computed value and what interpolation would have given, where it was accepted */
  readonly error: number;
}

export interface Box {
  readonly west: number;
  readonly south: number;
  readonly east: number;
  readonly north: number;
}

/** Side of the coarsest cell in lattice spacings; a power of two. */
const COARSEST = 8;
/** Mark of a point that was computed, not interpolated. */
const COMPUTED = 1;
/** Side of the finest cell that may be interpolated. */
const FINEST = 2;

/** Functions of place: one place at a time (`into` shape [functions]), or many (`into` shape [places × functions]). */
export type PlaceFunctions =
  | ((x: number, y: number, into: Float64Array) => void)
  | { atMany(xs: Float64Array, ys: Float64Array, into: Float64Array): void };

/**
 * Fills lattices of several functions over one box. Each cell carries 3 × 3 values; its four quarter points are computed
 * and compared with the biquadratic through the nine. Where one function differs by more than its tolerance the cell is
 * quartered, otherwise its points are interpolated. All points of one size of cell are asked for at once.
 * @param f as many functions as tolerances
 * @param spacing of the lattices, m
 * @param tolerances one a function, in its unit
 */
export function adaptiveLattices(
  f: PlaceFunctions,
  tolerances: readonly number[],
  box: Box,
  spacing: number,
): Lattice[] {
  const { x0, y0, nx, ny } = gridOver(box, spacing);
  const across = (nx - 1) / COARSEST;
  const up = (ny - 1) / COARSEST;
  const values = tolerances.map(() => new Float64Array(nx * ny));
  const errors = tolerances.map(() => 0);
  const known = new Uint8Array(nx * ny);
  let evaluated = 0;
  const compute = (wanted: readonly number[]): void => {
    const xs = Float64Array.from(wanted, (place) => x0 + (place % nx) * spacing);
    const ys = Float64Array.from(wanted, (place) => y0 + Math.floor(place / nx) * spacing);
    const found = valuesAt(f, xs, ys, tolerances.length);
    wanted.forEach((place, p) => {
      values.forEach((of, u) => {
        of[place] = found[p * tolerances.length + u]!;
      });
    });
    evaluated += wanted.length;
  };
  const nine = new Float64Array(9);
  const take = (of: Float64Array, corner: number, half: number): void => {
    for (let b = 0; b < 3; b++)
      for (let a = 0; a < 3; a++) nine[b * 3 + a] = of[corner + b * half * nx + a * half]!;
  };
  const missOf = (of: Float64Array, corner: number, side: number): number => {
    take(of, corner, side / 2);
    let most = 0;
    for (const b of [1, 3])
      for (const a of [1, 3]) {
        const value = of[corner + ((b * side) / 4) * nx + (a * side) / 4]!;
        most = Math.max(most, Math.abs(value - biquadratic(nine, a / 4, b / 4)));
      }
    return most;
  };
  /** Cells that were quartered, marked at their centre, which is no other cell's. */
  const quartered = new Uint8Array(nx * ny);
  let level: number[] = [];
  for (let j = 0; j < up; j++) for (let i = 0; i < across; i++) level.push((j * nx + i) * COARSEST);
  for (let side = COARSEST; level.length > 0; side /= 2) {
    const half = side / 2;
    compute(unknownOf(level, side, nx, known));
    if (side <= FINEST) break;
    const next: number[] = [];
    for (const corner of level) {
      const misses = values.map((of) => missOf(of, corner, side));
      if (misses.some((miss, u) => miss > tolerances[u]!)) {
        quartered[corner + half * nx + half] = 1;
        next.push(corner, corner + half, corner + half * nx, corner + half * nx + half);
      } else
        misses.forEach((miss, u) => {
          errors[u] = Math.max(errors[u]!, miss);
        });
    }
    level = next;
  }
  const fill = (corner: number, side: number): void => {
    const half = side / 2;
    if (side <= FINEST) return;
    if (quartered[corner + half * nx + half] === 1) {
      for (const b of [0, half]) for (const a of [0, half]) fill(corner + b * nx + a, half);
      return;
    }
    for (const of of values) {
      take(of, corner, half);
      for (let b = 0; b <= side; b++)
        for (let a = 0; a <= side; a++) {
          const place = corner + b * nx + a;
          if (known[place] !== COMPUTED) of[place] = biquadratic(nine, a / side, b / side);
        }
    }
  };
  for (let j = 0; j < up; j++) for (let i = 0; i < across; i++) fill((j * nx + i) * COARSEST, COARSEST);
  return values.map((of, u) => ({ x0, y0, spacing, nx, ny, values: of, evaluated, error: errors[u]! }));
}

/** The grid of whole coarsest cells that covers a box, with the box in its middle. */
export function gridOver(box: Box, spacing: number): Grid {
  const cells = (length: number): number => Math.max(1, Math.ceil(length / (spacing * COARSEST) - 1e-9));
  const nx = cells(box.east - box.west) * COARSEST + 1;
  const ny = cells(box.north - box.south) * COARSEST + 1;
  return {
    x0: (box.west + box.east - (nx - 1) * spacing) / 2,
    y0: (box.south + box.north - (ny - 1) * spacing) / 2,
    spacing,
    nx,
    ny,
  };
}

/** Points of cells of one side that are not computed yet, which it marks: nine a cell, and the quarter points of cells that are tested. */
function unknownOf(level: readonly number[], side: number, nx: number, known: Uint8Array): number[] {
  const wanted: number[] = [];
  const step = side / 4;
  const want = (place: number): void => {
    if (known[place] === COMPUTED) return;
    known[place] = COMPUTED;
    wanted.push(place);
  };
  for (const corner of level) {
    for (const b of [0, 2, 4]) for (const a of [0, 2, 4]) want(corner + b * step * nx + a * step);
    if (side > FINEST)
      for (const b of [1, 3]) for (const a of [1, 3]) want(corner + b * step * nx + a * step);
  }
  return wanted;
}

function valuesAt(f: PlaceFunctions, xs: Float64Array, ys: Float64Array, count: number): Float64Array {
  const found = new Float64Array(xs.length * count);
  if (typeof f !== 'function') f.atMany(xs, ys, found);
  else for (let p = 0; p < xs.length; p++) f(xs[p]!, ys[p]!, found.subarray(p * count, (p + 1) * count));
  return found;
}

/** Value of the biquadratic through 3 × 3 values at (u, v) in the unit square. */
function biquadratic(nine: Float64Array, u: number, v: number): number {
  const a = (1 - u) * (1 - 2 * u);
  const b = 4 * u * (1 - u);
  const c = u * (2 * u - 1);
  return (
    (1 - v) * (1 - 2 * v) * (a * nine[0]! + b * nine[1]! + c * nine[2]!) +
    4 * v * (1 - v) * (a * nine[3]! + b * nine[4]! + c * nine[5]!) +
    v * (2 * v - 1) * (a * nine[6]! + b * nine[7]! + c * nine[8]!)
  );
}

/** Value between lattice points by bicubic convolution (Keys 1981), with his condition at the border; outside, the border's. */
export function latticeValue(lattice: Lattice, x: number, y: number): number {
  const { nx, ny, values } = lattice;
  const fx = Math.min(nx - 1, Math.max(0, (x - lattice.x0) / lattice.spacing));
  const fy = Math.min(ny - 1, Math.max(0, (y - lattice.y0) / lattice.spacing));
  const i = Math.min(nx - 2, Math.floor(fx));
  const j = Math.min(ny - 2, Math.floor(fy));
  const wx = bordered(keysWeights(fx - i), i, nx);
  const wy = bordered(keysWeights(fy - j), j, ny);
  let sum = 0;
  for (let b = 0; b < 4; b++) {
    if (wy[b] === 0) continue;
    const row = (j + b - 1) * nx + i - 1;
    for (let a = 0; a < 4; a++) if (wx[a] !== 0) sum += wy[b]! * wx[a]! * values[row + a]!;
  }
  return sum;
}

type FourWeights = readonly [number, number, number, number];

/** The point beyond a border continues the parabola of the three before it: 3v₀ − 3v₁ + v₂ (Keys 1981). */
function bordered([w0, w1, w2, w3]: FourWeights, first: number, count: number): FourWeights {
  if (count < 3) return [0, w0 + w1, w2 + w3, 0];
  if (first === 0) return [0, w1 + 3 * w0, w2 - 3 * w0, w3 + w0];
  if (first === count - 2) return [w0 + w3, w1 - 3 * w3, w2 + 3 * w3, 0];
  return [w0, w1, w2, w3];
}

/** Weights of the points −1, 0, 1 and 2 at a place between 0 and 1. */
export function keysWeights(u: number): FourWeights {
  return [keys(u + 1), keys(u), keys(1 - u), keys(2 - u)];
}

function keys(t: number): number {
  const s = Math.abs(t);
  if (s <= 1) return (1.5 * s - 2.5) * s * s + 1;
  if (s < 2) return ((-0.5 * s + 2.5) * s - 4) * s + 2;
  return 0;
}
