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
/** Side of the finest cell that may be interpolated. */
const FINEST = 2;

/**
 * Fills a lattice over a box. Each cell carries 3 × 3 values; its four quarter points are computed and compared with
 * the biquadratic through the nine. Where one differs by more than the tolerance the cell is quartered, otherwise its
 * points are interpolated.
 * @param f value at a place
 * @param spacing of the lattice, m
 * @param tolerance in the unit of f
 */
export function adaptiveLattice(
  f: (x: number, y: number) => number,
  box: Box,
  spacing: number,
  tolerance: number,
): Lattice {
  const cells = (length: number): number => Math.max(1, Math.ceil(length / (spacing * COARSEST) - 1e-9));
  const across = cells(box.east - box.west);
  const up = cells(box.north - box.south);
  const nx = across * COARSEST + 1;
  const ny = up * COARSEST + 1;
  // the box in the middle of the lattice
  const x0 = (box.west + box.east - (nx - 1) * spacing) / 2;
  const y0 = (box.south + box.north - (ny - 1) * spacing) / 2;
  const values = new Float64Array(nx * ny);
  const known = new Uint8Array(nx * ny);
  let evaluated = 0;
  let error = 0;
  const at = (i: number, j: number): number => {
    const place = j * nx + i;
    if (known[place] !== 1) {
      values[place] = f(x0 + i * spacing, y0 + j * spacing);
      known[place] = 1;
      evaluated++;
    }
    return values[place]!;
  };
  const nine = new Float64Array(9);
  const fill = (i0: number, j0: number, side: number): void => {
    const half = side / 2;
    for (let b = 0; b < 3; b++) for (let a = 0; a < 3; a++) nine[b * 3 + a] = at(i0 + a * half, j0 + b * half);
    if (side <= FINEST) return;
    const quarter = side / 4;
    let worst = 0;
    for (const b of [1, 3])
      for (const a of [1, 3]) {
        const guess = biquadratic(nine, a / 4, b / 4);
        worst = Math.max(worst, Math.abs(at(i0 + a * quarter, j0 + b * quarter) - guess));
      }
    if (worst > tolerance) {
      for (const b of [0, half]) for (const a of [0, half]) fill(i0 + a, j0 + b, half);
      return;
    }
    error = Math.max(error, worst);
    for (let b = 0; b <= side; b++)
      for (let a = 0; a <= side; a++) {
        const place = (j0 + b) * nx + i0 + a;
        if (known[place] === 0) {
          values[place] = biquadratic(nine, a / side, b / side);
          known[place] = 2;
        }
      }
  };
  for (let j = 0; j < up; j++) for (let i = 0; i < across; i++) fill(i * COARSEST, j * COARSEST, COARSEST);
  return { x0, y0, spacing, nx, ny, values, evaluated, error };
}

/** Value of the biquadratic through 3 × 3 values at (u, v) in the unit square. */
function biquadratic(nine: Float64Array, u: number, v: number): number {
  const rows = [0, 3, 6].map((r) => quadratic(nine[r]!, nine[r + 1]!, nine[r + 2]!, u));
  return quadratic(rows[0]!, rows[1]!, rows[2]!, v);
}

function quadratic(a: number, b: number, c: number, u: number): number {
  return a * (1 - u) * (1 - 2 * u) + b * 4 * u * (1 - u) + c * u * (2 * u - 1);
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
    for (let a = -1; a <= 2; a++) sum += wy * keys(u - a) * values[row + Math.min(nx - 1, Math.max(0, i + a))]!;
  }
  return sum;
}

function keys(t: number): number {
  const s = Math.abs(t);
  if (s <= 1) return (1.5 * s - 2.5) * s * s + 1;
  if (s < 2) return ((-0.5 * s + 2.5) * s - 4) * s + 2;
  return 0;
}
