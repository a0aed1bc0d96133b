// A lattice of points on the surface, filled adaptively: evaluated where the field bends, interpolated where it does not.

/** Value (i, j) stands at (x0 + i·spacing, y0 + j·spacing), index j·nx + i. */
export interface Lattice {
  readonly x0: number;
  readonly y0: number;
  readonly spacing: number;
  readonly nx: number;
  readonly ny: number;
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

/**
 * Fills lattices of several functions over one box. Each cell carries 3 × 3 values; its four quarter points are computed
 * and compared with the biquadratic through the nine. Where one function differs by more than its tolerance the cell is
 * quartered, otherwise its points are interpolated.
 * @param f writes the values at a place; `into` shape [tolerances]
 * @param spacing of the lattices, m
 * @param tolerances one a function, in its unit
 */
export function adaptiveLattices(
  f: (x: number, y: number, into: Float64Array) => void,
  tolerances: readonly number[],
  box: Box,
  spacing: number,
): Lattice[] {
  const cells = (length: number): number => Math.max(1, Math.ceil(length / (spacing * COARSEST) - 1e-9));
  const across = cells(box.east - box.west);
  const up = cells(box.north - box.south);
  const nx = across * COARSEST + 1;
  const ny = up * COARSEST + 1;
  // the box in the middle of the lattice
  const x0 = (box.west + box.east - (nx - 1) * spacing) / 2;
  const y0 = (box.south + box.north - (ny - 1) * spacing) / 2;
  const values = tolerances.map(() => new Float64Array(nx * ny));
  const errors = tolerances.map(() => 0);
  const known = new Uint8Array(nx * ny);
  const here = new Float64Array(tolerances.length);
  let evaluated = 0;
  const compute = (i: number, j: number): number => {
    const place = j * nx + i;
    if (known[place] !== COMPUTED) {
      f(x0 + i * spacing, y0 + j * spacing, here);
      values.forEach((of, u) => {
        of[place] = here[u]!;
      });
      known[place] = COMPUTED;
      evaluated++;
    }
    return place;
  };
  const places = new Int32Array(9);
  const nine = new Float64Array(9);
  const take = (of: Float64Array): void => {
    for (let k = 0; k < 9; k++) nine[k] = of[places[k]!]!;
  };
  const fill = (i0: number, j0: number, side: number): void => {
    const half = side / 2;
    for (let b = 0; b < 3; b++)
      for (let a = 0; a < 3; a++) places[b * 3 + a] = compute(i0 + a * half, j0 + b * half);
    if (side <= FINEST) return;
    const quarter = side / 4;
    const tests = [1, 3].flatMap((b) =>
      [1, 3].map((a) => [a, b, compute(i0 + a * quarter, j0 + b * quarter)] as const),
    );
    const misses = values.map((of) => {
      take(of);
      return tests.reduce(
        (most, [a, b, place]) => Math.max(most, Math.abs(of[place]! - biquadratic(nine, a / 4, b / 4))),
        0,
      );
    });
    if (misses.some((miss, u) => miss > tolerances[u]!)) {
      for (const b of [0, half]) for (const a of [0, half]) fill(i0 + a, j0 + b, half);
      return;
    }
    values.forEach((of, u) => {
      errors[u] = Math.max(errors[u]!, misses[u]!);
      take(of);
      for (let b = 0; b <= side; b++)
        for (let a = 0; a <= side; a++) {
          const place = (j0 + b) * nx + i0 + a;
          if (known[place] !== COMPUTED) of[place] = biquadratic(nine, a / side, b / side);
        }
    });
  };
  for (let j = 0; j < up; j++) for (let i = 0; i < across; i++) fill(i * COARSEST, j * COARSEST, COARSEST);
  return values.map((of, u) => ({ x0, y0, spacing, nx, ny, values: of, evaluated, error: errors[u]! }));
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

/** Value between lattice points by bicubic convolution (Keys, IEEE Trans. ASSP 29, 1981); clamped at the border. */
export function latticeValue(lattice: Lattice, x: number, y: number): number {
  const { nx, ny, values } = lattice;
  const fx = Math.min(nx - 1, Math.max(0, (x - lattice.x0) / lattice.spacing));
  const fy = Math.min(ny - 1, Math.max(0, (y - lattice.y0) / lattice.spacing));
  const i = Math.min(nx - 2, Math.floor(fx));
  const j = Math.min(ny - 2, Math.floor(fy));
  const u = fx - i;
  const v = fy - j;
  let sum = 0;
  for (let b = -1; b <= 2; b++) {
    const row = Math.min(ny - 1, Math.max(0, j + b)) * nx;
    const wy = keys(v - b);
    for (let a = -1; a <= 2; a++)
      sum += wy * keys(u - a) * values[row + Math.min(nx - 1, Math.max(0, i + a))]!;
  }
  return sum;
}

function keys(t: number): number {
  const s = Math.abs(t);
  if (s <= 1) return (1.5 * s - 2.5) * s * s + 1;
  if (s < 2) return ((-0.5 * s + 2.5) * s - 4) * s + 2;
  return 0;
}
