import { describe, expect, it } from 'vitest';
import { factorComplex, SingularNetwork, solvedComplex } from '../../src/numerics/sparse-complex.ts';
import { randomNumbers } from '../support/random.ts';

/** A lattice of random passive branches of every angle, and at each node a small one to remote earth. */
function lattice(side: number) {
  const size = side * side;
  const random = randomNumbers(17);
  const diagonal = { re: new Float64Array(size).fill(1e-2), im: new Float64Array(size).fill(3e-3) };
  const row: number[] = [];
  const column: number[] = [];
  const re: number[] = [];
  const im: number[] = [];
  const join = (i: number, j: number): void => {
    const [g, b] = [0.1 + random(), random() - 0.5];
    // in either triangle
    row.push(i % 2 === 0 ? i : j);
    column.push(i % 2 === 0 ? j : i);
    re.push(-g);
    im.push(-b);
    for (const k of [i, j]) {
      diagonal.re[k]! += g;
      diagonal.im[k]! += b;
    }
  };
  for (let y = 0; y < side; y++)
    for (let x = 0; x < side; x++) {
      if (x + 1 < side) join(y * side + x, y * side + x + 1);
      if (y + 1 < side) join(y * side + x, (y + 1) * side + x);
      // a second branch between the same nodes adds up
      if (x === 0 && y + 1 < side) join(y * side, (y + 1) * side);
    }
  const value = { re: Float64Array.from(re), im: Float64Array.from(im) };
  return { size, diagonal, row: Int32Array.from(row), column: Int32Array.from(column), value };
}

describe('sparse complex factor', () => {
  it('solves a lattice of branches of every angle: its product with the solution is what was asked, to 1e-12', () => {
    const matrix = lattice(9);
    const { size, diagonal, row, column, value } = matrix;
    const random = randomNumbers(5);
    const b = {
      re: Float64Array.from({ length: size }, random),
      im: Float64Array.from({ length: size }, random),
    };
    const factor = factorComplex(matrix);
    const x = solvedComplex(factor, b);
    const product = { re: new Float64Array(size), im: new Float64Array(size) };
    const add = (i: number, j: number, ar: number, ai: number): void => {
      product.re[i]! += ar * x.re[j]! - ai * x.im[j]!;
      product.im[i]! += ar * x.im[j]! + ai * x.re[j]!;
    };
    for (let i = 0; i < size; i++) add(i, i, diagonal.re[i]!, diagonal.im[i]!);
    for (let e = 0; e < row.length; e++) {
      add(row[e]!, column[e]!, value.re[e]!, value.im[e]!);
      add(column[e]!, row[e]!, value.re[e]!, value.im[e]!);
    }
    for (let i = 0; i < size; i++)
      expect(Math.hypot(product.re[i]! - b.re[i]!, product.im[i]! - b.im[i]!)).toBeLessThan(1e-12);
    expect(factor.row.length).toBeLessThan(8 * size);
  });

  it('names the unknown without a pivot', () => {
    const nothing = {
      size: 2,
      diagonal: { re: Float64Array.of(1, 0), im: Float64Array.of(0, 0) },
      row: new Int32Array(0),
      column: new Int32Array(0),
      value: { re: new Float64Array(0), im: new Float64Array(0) },
    };
    expect(() => factorComplex(nothing)).toThrow(new SingularNetwork(1));
  });
});
