import { describe, expect, it } from 'vitest';
import { REMOTE_EARTH } from '../../src/network/branches.ts';
import { type ComplexBranches, complexLaplacian, reciprocals } from '../../src/network/complex-network.ts';
import { complexVector } from '../../src/numerics/complex-vector.ts';
import { SingularNetwork } from '../../src/numerics/sparse-complex.ts';

type Branch = readonly [from: number, to: number, re: number, im: number];

function network(list: readonly Branch[]): ComplexBranches {
  return {
    count: list.length,
    from: Int32Array.from(list, (b) => b[0]),
    to: Int32Array.from(list, (b) => b[1]),
    admittance: reciprocals({
      re: Float64Array.from(list, (b) => b[2]),
      im: Float64Array.from(list, (b) => b[3]),
    }),
  };
}

/** Impedance between a node and what is grounded. */
function impedance(branches: ComplexBranches, nodes: number, at: number): readonly [re: number, im: number] {
  const injection = complexVector(nodes);
  injection.re[at] = 1;
  const { re, im } = complexLaplacian(branches, nodes, []).solve(injection);
  return [re[at]!, im[at]!];
}

/** Shield wire from the station (node 0) over towers 0.3 km apart, each with its footing; span first. */
function shieldWire(spans: number, footing: number): ComplexBranches {
  const list: Branch[] = [];
  for (let k = 0; k < spans; k++) {
    list.push([k, k + 1, 0.3 * 0.29, 0.3 * 0.73]);
    list.push([k + 1, REMOTE_EARTH, footing, 0]);
  }
  return network(list);
}

describe('complex network', () => {
  // |Z| seen from the station, wire 0.29 + j0.73 Ω/km, last tower grounded (independent computation)
  it.each([
    [10, 5, 2.251],
    [10, 10, 1.589],
    [10, 20, 1.618],
    [10, 50, 1.636],
    [40, 5, 8.208],
    [40, 10, 4.432],
    [40, 20, 3.086],
    [40, 50, 3.165],
  ])('a shield wire over footings of %i Ω, %i spans, shows %d Ω', (footing, spans, expected) => {
    const [re, im] = impedance(shieldWire(spans, footing), spans + 1, 0);
    expect(Math.abs(Math.hypot(re, im) - expected)).toBeLessThan(5.1e-4);
  });

  it('nears Zs/2 + √(Zs²/4 + Zs·R) as spans go on (Endrenyi 1967, the closed form of the recursion)', () => {
    const [re, im] = impedance(shieldWire(400, 10), 401, 0);
    // w = Z − Zs/2 must satisfy w² = Zs²/4 + Zs·R
    const [sr, si] = [0.3 * 0.29, 0.3 * 0.73];
    const [wr, wi] = [re - sr / 2, im - si / 2];
    expect(Math.abs(wr * wr - wi * wi - ((sr * sr - si * si) / 4 + sr * 10))).toBeLessThan(1e-12);
    expect(Math.abs(2 * wr * wi - ((2 * sr * si) / 4 + si * 10))).toBeLessThan(1e-12);
  });

  it('gives 5/6 of one edge, whatever its angle, across a cube (van Steenwijk, Am. J. Phys. 66, 1998, from memory)', () => {
    const edges = [[0, 1], [2, 3], [4, 5], [6, 7], [0, 2], [1, 3], [4, 6], [5, 7], [0, 4], [1, 5], [2, 6], [3, 7]]; // biome-ignore format: twelve edges
    const cube = network(edges.map(([a, b]): Branch => [a! - 1, b! - 1, 0.2, 3]));
    const [re, im] = impedance(cube, 7, 6);
    expect(Math.abs(re - (0.2 * 5) / 6)).toBeLessThan(1e-12);
    expect(Math.abs(im - (3 * 5) / 6)).toBeLessThan(1e-12);
  });

  it('refuses a part of the network that touches no grounded node', () => {
    const apart = network([[0, 1, 1, 2], [2, 3, 1, 2]]); // biome-ignore format: two parts
    expect(() => complexLaplacian(apart, 4, [0])).toThrowError(SingularNetwork);
  });
});
