// A block of a matrix as a product of two thin ones, from a few of its rows and columns.

/** B ≈ Σ_k u_k v_kᵀ: u shape [rank × rows], v shape [rank × columns], one vector after another. */
export interface LowRank {
  readonly rank: number;
  readonly rows: number;
  readonly columns: number;
  readonly u: Float64Array;
  readonly v: Float64Array;
}

/** Sweeps of Jacobi's method on the small core; a core of rank 20 settles in 6 to 8. */
const JACOBI_SWEEPS = 30;
/** Rotation angles below this are none. */
const JACOBI_STILL = 1e-14;

/**
 * Adaptive cross approximation with partial pivoting (Bebendorf, Numer. Math. 86, 2000; from memory), recompressed by
 * orthogonalising both factors and dropping small singular values of the core.
 * @param entry value at a row and column of the block
 * @param tolerance of the block's Frobenius norm
 * @param most largest rank worth storing; undefined is returned when it is not enough
 */
export function crossApproximation(
  rows: number,
  columns: number,
  entry: (row: number, column: number) => number,
  tolerance: number,
  most: number,
): LowRank | undefined {
  const us: Float64Array[] = [];
  const vs: Float64Array[] = [];
  const usedRow = new Uint8Array(rows);
  const usedColumn = new Uint8Array(columns);
  let pivotRow = 0;
  let norm = 0;
  for (;;) {
    if (us.length === most) return undefined;
    usedRow[pivotRow] = 1;
    const v = new Float64Array(columns);
    for (let c = 0; c < columns; c++) v[c] = entry(pivotRow, c);
    for (let k = 0; k < us.length; k++) addScaled(v, vs[k]!, -us[k]![pivotRow]!);
    const pivotColumn = largest(v, usedColumn);
    if (pivotColumn < 0 || v[pivotColumn] === 0) break;
    usedColumn[pivotColumn] = 1;
    const pivot = v[pivotColumn]!;
    for (let c = 0; c < columns; c++) v[c]! /= pivot;
    const u = new Float64Array(rows);
    for (let r = 0; r < rows; r++) u[r] = entry(r, pivotColumn);
    for (let k = 0; k < us.length; k++) addScaled(u, us[k]!, -vs[k]![pivotColumn]!);
    const size = Math.sqrt(dot(u, u) * dot(v, v));
    let cross = 0;
    for (let k = 0; k < us.length; k++) cross += dot(u, us[k]!) * dot(v, vs[k]!);
    norm = Math.sqrt(Math.max(0, norm * norm + 2 * cross + size * size));
    us.push(u);
    vs.push(v);
    if (size <= tolerance * norm) break;
    pivotRow = largest(u, usedRow);
    if (pivotRow < 0) break;
  }
  return recompressed(us, vs, rows, columns, tolerance);
}

function largest(values: Float64Array, used: Uint8Array): number {
  let at = -1;
  let most = -1;
  for (let i = 0; i < values.length; i++)
    if (used[i] === 0 && Math.abs(values[i]!) > most) {
      most = Math.abs(values[i]!);
      at = i;
    }
  return at;
}

/** U Vᵀ = Q_u (R_u R_vᵀ) Q_vᵀ; the core's singular values below the tolerance go. */
function recompressed(
  us: Float64Array[],
  vs: Float64Array[],
  rows: number,
  columns: number,
  tolerance: number,
): LowRank {
  const k = us.length;
  const ru = orthogonalise(us);
  const rv = orthogonalise(vs);
  // core, column j held as an array: C = R_u R_vᵀ
  const core = Array.from({ length: k }, (_, j) => {
    const column = new Float64Array(k);
    for (let i = 0; i < k; i++)
      for (let m = Math.max(i, j); m < k; m++) column[i]! += ru[m]![i]! * rv[m]![j]!;
    return column;
  });
  const right = oneSidedJacobi(core);
  const sizes = core.map((column) => Math.sqrt(dot(column, column)));
  const order = sizes.map((_, j) => j).sort((a, b) => sizes[b]! - sizes[a]!);
  const total = Math.sqrt(sizes.reduce((sum, s) => sum + s * s, 0));
  let rank = 0;
  let rest = total;
  while (rank < k && rest > tolerance * total) {
    rank++;
    rest = Math.sqrt(order.slice(rank).reduce((sum, j) => sum + sizes[j]! ** 2, 0));
  }
  const u = new Float64Array(rank * rows);
  const v = new Float64Array(rank * columns);
  for (let r = 0; r < rank; r++) {
    const j = order[r]!;
    for (let m = 0; m < k; m++) {
      addScaled(u.subarray(r * rows, (r + 1) * rows), us[m]!, core[j]![m]!);
      addScaled(v.subarray(r * columns, (r + 1) * columns), vs[m]!, right[j]![m]!);
    }
  }
  return { rank, rows, columns, u, v };
}

/** Gram–Schmidt, twice over for digits, in place; R by columns: result[m][i] multiplies q_i in vector m. */
function orthogonalise(vectors: Float64Array[]): Float64Array[] {
  const k = vectors.length;
  const r = vectors.map(() => new Float64Array(k));
  for (let m = 0; m < k; m++) {
    const own = vectors[m]!;
    for (let pass = 0; pass < 2; pass++)
      for (let i = 0; i < m; i++) {
        const share = dot(own, vectors[i]!);
        addScaled(own, vectors[i]!, -share);
        r[m]![i]! += share;
      }
    const length = Math.sqrt(dot(own, own));
    r[m]![m] = length;
    if (length > 0) for (let i = 0; i < own.length; i++) own[i]! /= length;
  }
  return r;
}

/** Rotates the columns of a square matrix until they are orthogonal, in place; the rotations' product by columns. */
function oneSidedJacobi(columns: Float64Array[]): Float64Array[] {
  const k = columns.length;
  const right = Array.from({ length: k }, (_, j) => {
    const column = new Float64Array(k);
    column[j] = 1;
    return column;
  });
  for (let sweep = 0; sweep < JACOBI_SWEEPS; sweep++) {
    let moved = false;
    for (let p = 0; p < k; p++)
      for (let q = p + 1; q < k; q++) {
        const app = dot(columns[p]!, columns[p]!);
        const aqq = dot(columns[q]!, columns[q]!);
        const apq = dot(columns[p]!, columns[q]!);
        if (Math.abs(apq) <= JACOBI_STILL * Math.sqrt(app * aqq) || apq === 0) continue;
        moved = true;
        const zeta = (aqq - app) / (2 * apq);
        const t = (zeta >= 0 ? 1 : -1) / (Math.abs(zeta) + Math.sqrt(1 + zeta * zeta));
        const c = 1 / Math.sqrt(1 + t * t);
        rotate(columns[p]!, columns[q]!, c, c * t);
        rotate(right[p]!, right[q]!, c, c * t);
      }
    if (!moved) break;
  }
  return right;
}

function rotate(a: Float64Array, b: Float64Array, c: number, s: number): void {
  for (let i = 0; i < a.length; i++) {
    const x = a[i]!;
    a[i] = c * x - s * b[i]!;
    b[i] = s * x + c * b[i]!;
  }
}

function addScaled(into: Float64Array, other: Float64Array, by: number): void {
  for (let i = 0; i < into.length; i++) into[i]! += by * other[i]!;
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i]! * b[i]!;
  return sum;
}
