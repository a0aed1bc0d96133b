// A smooth function of horizontal distance as a table: polynomials on bins even in the logarithm of its square.
import { inverse, Matrix } from 'ml-matrix';

/** f(r²) for 0 ≤ r² ≤ the square the table was built to; coefficients of degree 5, bin after bin, shape [bins × 6]. */
export interface RadialTable {
  /** squared length added to r² before the logarithm, m² */
  readonly floor: number;
  readonly start: number;
  readonly binsPerUnit: number;
  readonly coefficients: Float64Array;
  /** the function stays smooth on distances down to this, m */
  readonly smoothness: number;
}

/**
 * Bins per unit of ln(r² + s²). A sum of 1/√(r² + h²), h ≥ s, is analytic in this variable within π of the real axis,
 * so degree 5 on half-bins of 1/12 leaves (1/12/π)⁶/2⁵ ≈ 1e-11 of the function.
 */
const BINS_PER_UNIT = 6;
const TERMS = 6;

/** Chebyshev points on [−1, 1] and the matrix from values there to coefficients of powers. */
const POINTS: readonly number[] = Array.from(
  { length: TERMS },
  (_, k) => -Math.cos((Math.PI * (k + 0.5)) / TERMS),
);
const TO_POWERS: readonly (readonly number[])[] = inverse(
  new Matrix(POINTS.map((point) => Array.from({ length: TERMS }, (_, power) => point ** power))),
).to2DArray();

/**
 * Tabulates f.
 * @param f function of r², m²
 * @param smoothness s, the shortest length on which f changes, m
 * @param reach largest r, m
 */
export function radialTable(f: (rr: number) => number, smoothness: number, reach: number): RadialTable {
  const floor = smoothness * smoothness;
  const start = Math.log(floor);
  const bins = Math.floor((Math.log(reach * reach + floor) - start) * BINS_PER_UNIT) + 2;
  const coefficients = new Float64Array(bins * TERMS);
  const values = new Float64Array(TERMS);
  for (let bin = 0; bin < bins; bin++) {
    for (let k = 0; k < TERMS; k++) {
      const y = start + (bin + 0.5 + 0.5 * POINTS[k]!) / BINS_PER_UNIT;
      values[k] = f(Math.max(0, Math.exp(y) - floor));
    }
    for (let power = 0; power < TERMS; power++) {
      let sum = 0;
      for (let k = 0; k < TERMS; k++) sum += TO_POWERS[power]![k]! * values[k]!;
      coefficients[bin * TERMS + power] = sum;
    }
  }
  return { floor, start, binsPerUnit: BINS_PER_UNIT, coefficients, smoothness };
}

/** f(r²) from its table. */
export function radialValue(table: RadialTable, rr: number): number {
  const y = (Math.log(rr + table.floor) - table.start) * table.binsPerUnit;
  const bin = y < 0 ? 0 : y | 0;
  const u = 2 * (y - bin) - 1;
  const c = table.coefficients;
  const at = bin * TERMS;
  return c[at]! + u * (c[at + 1]! + u * (c[at + 2]! + u * (c[at + 3]! + u * (c[at + 4]! + u * c[at + 5]!))));
}
