import { afterEach, describe, expect, it } from 'vitest';
import { type Lattice, latticeValue } from '../../src/field/lattice.ts';
import { stepLattice } from '../../src/field/step.ts';
import { useKernels } from '../../src/kernels/instance.ts';

const [nx, ny, spacing] = [41, 28, 0.3];
const lattice: Lattice = {
  x0: 2,
  y0: -1,
  spacing,
  nx,
  ny,
  values: Float64Array.from(
    { length: nx * ny },
    (_, p) => Math.sin(0.7 * (p % nx)) + Math.cos(0.004 * p * p),
  ),
  evaluated: nx * ny,
  error: 0,
};

afterEach(() => useKernels(true));

describe('the lattice of step voltages', () => {
  it('is the largest drop over a metre of twelve directions, between points of the potential', () => {
    const step = stepLattice(lattice);
    for (let j = 4; j < ny - 4; j++)
      for (let i = 4; i < nx - 4; i++) {
        const [x, y] = [2 + i * spacing, -1 + j * spacing];
        let most = 0;
        for (let d = 0; d < 12; d++) {
          const [ex, ey] = [0.5 * Math.cos((Math.PI * d) / 12), 0.5 * Math.sin((Math.PI * d) / 12)];
          const drop = latticeValue(lattice, x + ex, y + ey) - latticeValue(lattice, x - ex, y - ey);
          most = Math.max(most, Math.abs(drop));
        }
        expect(Math.abs(step.values[j * nx + i]! - most)).toBeLessThan(1e-12);
      }
  });

  it('goes on with a plane beyond the border, and is the same by plain code', () => {
    const plane = {
      ...lattice,
      values: lattice.values.map((_, p) => 0.3 * (p % nx) - 0.4 * Math.floor(p / nx)),
    };
    const step = stepLattice(plane);
    const [first, middle] = [step.values[0]!, step.values[10 * nx + 20]!];
    expect(first).toBeCloseTo(middle, 10);
    const compiled = stepLattice(lattice).values;
    useKernels(false);
    const plain = stepLattice(lattice).values;
    for (let p = 0; p < plain.length; p++) expect(Math.abs(plain[p]! - compiled[p]!)).toBeLessThan(1e-12);
  });
});
