// Matrices from the moments of a cell to the expansion of their field in another of the same side, by cells between them.
import type { MapArithmetic, PlacedTable } from './map-arithmetic.ts';
import { DEGREES, FROM_VALUES, ORDER, ROOTS, TERMS } from './plan-expansion.ts';
import { radialReach } from './table-reach.ts';

/**
 * Differences of two Chebyshev points, a target's and a source's, that differ from one another: those of (i, k) and
 * (n − k, n − i) are the same, for the points lie evenly about 0. There are as many as terms.
 */
const PAIRS: readonly (readonly [target: number, source: number])[] = Array.from({ length: ORDER }, (_, i) =>
  Array.from({ length: ORDER - i }, (_, k) => [i, k] as const),
).flat();

/** Degrees of the polynomials of target and source, the first not below the second; the others follow by their parity. */
const DEGREE_PAIRS: readonly (readonly [target: number, source: number])[] = Array.from(
  { length: ORDER },
  (_, a) => Array.from({ length: a + 1 }, (_, c) => [a, c] as const),
).flat();

/** From values at the differences to coefficients by pairs of degrees: column after column, shape [TERMS × TERMS]. */
const TO_COEFFICIENTS: Float64Array = Float64Array.from({ length: TERMS * TERMS }, (_, at) => {
  const [i, k] = PAIRS[Math.floor(at / TERMS)]!;
  const [a, c] = DEGREE_PAIRS[at % TERMS]!;
  const product = (target: number, source: number): number =>
    FROM_VALUES[a * ORDER + target]! * FROM_VALUES[c * ORDER + source]!;
  return product(i, k) + (i + k === ORDER - 1 ? 0 : product(ORDER - 1 - k, ORDER - 1 - i));
});

/** Place of each entry's coefficient among pairs of pairs, x slowest, or y where x and y are exchanged. */
function places(exchanged: boolean): Int32Array {
  const pair = (p: number, q: number): number => (Math.max(p, q) * (Math.max(p, q) + 1)) / 2 + Math.min(p, q);
  return Int32Array.from({ length: TERMS * TERMS }, (_, at) => {
    const [a, b] = DEGREES[at % TERMS]!;
    const [c, d] = DEGREES[Math.floor(at / TERMS)]!;
    return exchanged ? pair(b, d) * TERMS + pair(a, c) : pair(a, c) * TERMS + pair(b, d);
  });
}
const STRAIGHT = places(false);
const EXCHANGED = places(true);

/** Sign of each entry: (−1)^(sum of degrees) where a direction is turned round, and where degrees stand in the other order. */
const SIGNS: readonly Float64Array[] = [0, 1, 2, 3].map((turned) =>
  Float64Array.from({ length: TERMS * TERMS }, (_, at) => {
    const target = DEGREES[at % TERMS]!;
    const source = DEGREES[Math.floor(at / TERMS)]!;
    const sign = (way: 0 | 1): number => {
      const turns = (target[way] < source[way] ? 1 : 0) + ((turned >> way) & 1);
      return ((target[way] + source[way]) * turns) % 2 === 1 ? -1 : 1;
    };
    return sign(0) * sign(1);
  }),
);

/** Numbers that a maker of cell matrices needs. */
export const MATRIX_ROOM: number = 4 * TERMS * TERMS + 2 * TERMS + 4;

/** Makes the matrices of one table and side of cells, by cells from source to target; those mirrored share their values. */
export interface CellMatrices {
  /** writes a matrix, column after column */
  write(across: number, up: number, into: number): void;
}

/**
 * @param half half side of the cells, m
 * @param room place of MATRIX_ROOM numbers, for as long as matrices are made
 * @param full column limits that leave out nothing
 */
export function cellMatrices(
  a: MapArithmetic,
  placed: PlacedTable,
  half: number,
  room: number,
  full: number,
): CellMatrices {
  const size = TERMS * TERMS;
  const [transform, values, once, twice] = [room, room + size, room + 2 * size, room + 3 * size];
  const xs = room + 4 * size;
  const ys = xs + TERMS;
  const source = ys + TERMS;
  const n = a.numbers;
  n.set(TO_COEFFICIENTS, transform);
  const reach = radialReach(placed.table);
  const made = new Map<number, Float64Array>();
  /** coefficients by pairs of degrees, x slowest, for 0 ≤ up ≤ across */
  const coefficients = (across: number, up: number): Float64Array => {
    if (Math.hypot(across + 1, up + 1) * 2 * half > reach)
      throw new RangeError(`cells of ${(2 * half).toFixed(1)} m reach past a table of ${reach.toFixed(1)} m`);
    PAIRS.forEach(([i, k], pair) => {
      n[xs + pair] = half * (ROOTS[i]! - ROOTS[k]! + 2 * across);
      n[ys + pair] = half * (ROOTS[i]! - ROOTS[k]! + 2 * up);
    });
    n.set([0, 0, 1], source);
    n.fill(0, values, values + 3 * size);
    a.sources(source, 1, 1, placed, {
      xs,
      ys,
      columns: TERMS,
      rows: TERMS,
      values,
      rowStep: TERMS,
      caseStep: 0,
    });
    const cells = (at: number) => ({ at, eastward: TERMS, northward: 0 });
    a.transfer(transform, full, cells(values), cells(once), TERMS, 1);
    for (let q = 0; q < TERMS; q++)
      for (let r = 0; r < TERMS; r++) n[values + r * TERMS + q] = n[once + q * TERMS + r]!;
    a.transfer(transform, full, cells(values), cells(twice), TERMS, 1);
    return n.slice(twice, twice + size);
  };
  return {
    write(across, up, into) {
      const [x, y] = [Math.abs(across), Math.abs(up)];
      const key = x * x + y * y;
      const of = made.get(key) ?? coefficients(Math.max(x, y), Math.min(x, y));
      made.set(key, of);
      const at = y > x ? EXCHANGED : STRAIGHT;
      const sign = SIGNS[(across < 0 ? 1 : 0) + (up < 0 ? 2 : 0)]!;
      for (let k = 0; k < size; k++) n[into + k] = sign[k]! * of[at[k]!]!;
    },
  };
}
