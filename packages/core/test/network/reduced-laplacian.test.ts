import { describe, expect, it } from 'vitest';
import { type Branches, branchCurrents, nodeOutflow, REMOTE_EARTH } from '../../src/network/branches.ts';
import { reducedLaplacian } from '../../src/network/reduced-laplacian.ts';
import { NotPositiveDefinite } from '../../src/numerics/packed-cholesky.ts';

function network(list: readonly (readonly [from: number, to: number, ohm: number])[]): Branches {
  return {
    count: list.length,
    from: Int32Array.from(list, (b) => b[0]),
    to: Int32Array.from(list, (b) => b[1]),
    conductance: Float64Array.from(list, (b) => 1 / b[2]),
  };
}

/** Resistance between a node and the grounded one. */
function resistance(branches: Branches, nodes: number, at: number, grounded: readonly number[]): number {
  const injection = new Float64Array(nodes);
  injection[at] = 1;
  return reducedLaplacian(branches, nodes, grounded).solve(injection)[at]!;
}

// edges of a unit cube, node = x + 2y + 4z
const cube = network(
  [[0, 1], [2, 3], [4, 5], [6, 7], [0, 2], [1, 3], [4, 6], [5, 7], [0, 4], [1, 5], [2, 6], [3, 7]].map(
    ([a, b]) => [a!, b!, 1] as const,
  ),
); // biome-ignore format: twelve edges

describe('reduced Laplacian', () => {
  it('gives 5/6, 3/4 and 7/12 of one edge across a cube’s space diagonal, face diagonal and edge (van Steenwijk, Am. J. Phys. 66, 1998, from memory)', () => {
    expect(Math.abs(resistance(cube, 8, 7, [0]) * (6 / 5) - 1)).toBeLessThan(1e-12);
    expect(Math.abs(resistance(cube, 8, 3, [0]) * (4 / 3) - 1)).toBeLessThan(1e-12);
    expect(Math.abs(resistance(cube, 8, 1, [0]) * (12 / 7) - 1)).toBeLessThan(1e-12);
  });

  it('gives the golden ratio for an endless ladder of 1 Ω rails and rungs (closed form of the recursion)', () => {
    const rungs = 60;
    const list: [number, number, number][] = [];
    for (let k = 0; k < rungs; k++) {
      list.push([k, k + 1, 1], [k + 1, REMOTE_EARTH, 1]);
    }
    const golden = (1 + Math.sqrt(5)) / 2;
    expect(Math.abs(resistance(network(list), rungs + 1, 0, []) / golden - 1)).toBeLessThan(1e-12);
  });

  it('carries no current in the galvanometer of a balanced bridge, and the textbook current in one out of balance', () => {
    const bridge = (d: number): Branches =>
      network([[0, 1, 100], [0, 2, 200], [1, REMOTE_EARTH, 300], [2, REMOTE_EARTH, d], [1, 2, 50]]); // biome-ignore format: five arms
    const current = (d: number): number => {
      const branches = bridge(d);
      const potential = reducedLaplacian(branches, 3, []).solve(Float64Array.from([1, 0, 0]));
      return branchCurrents(branches, potential)[4]!;
    };
    expect(Math.abs(current(600))).toBeLessThan(1e-12);
    // closed form by delta–star: i5 = I(R2 R3 − R1 R4)/[R5(R1 + R2 + R3 + R4) + (R1 + R2)(R3 + R4)], arms R1, R2 on top
    const d = 500;
    const expected = (200 * 300 - 100 * d) / (50 * (100 + 200 + 300 + d) + (100 + 200) * (300 + d));
    expect(Math.abs(current(d) / expected - 1)).toBeLessThan(1e-12);
  });

  it('keeps Kirchhoff’s law at every node and returns at remote earth what was injected', () => {
    const injection = Float64Array.from([2, 0, -0.5, 0, 1, 0, 0, 0]);
    const potential = reducedLaplacian(cube, 8, [7]).solve(injection);
    const outflow = nodeOutflow(cube, 8, branchCurrents(cube, potential));
    for (let node = 0; node < 7; node++)
      expect(Math.abs(outflow[node]! - injection[node]!)).toBeLessThan(1e-14);
    expect(Math.abs(outflow[7]! + 2.5)).toBeLessThan(1e-14);
  });

  it('refuses a part of the network that touches no grounded node', () => {
    expect(() => reducedLaplacian(network([[0, 1, 1], [2, 3, 1]]), 4, [0])).toThrowError(NotPositiveDefinite); // biome-ignore format: two parts
  });
});
