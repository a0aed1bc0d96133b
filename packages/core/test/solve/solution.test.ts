import { describe, expect, it } from 'vitest';
import { joinConductors } from '../../src/geometry/joints.ts';
import { segmentMesh } from '../../src/geometry/segmentation.ts';
import { leakageMatrix } from '../../src/leakage/leakage-matrix.ts';
import { soilImages } from '../../src/soil/image-list.ts';
import { chooseMethod } from '../../src/solve/linear-solver.ts';
import { solveGraph } from '../../src/solve/solution.ts';
import { type Bar, conductorTable, gridBars, rodBar, solveBars } from '../support/electrodes.ts';
import { soil } from '../support/soils.ts';

const yard: Bar[] = [
  ...gridBars(30, 20, 3, 2, 0.5, 0.005),
  rodBar(0, 0, 0.5, 4, 0.008),
  rodBar(10, 20, 0.5, 4, 0.008),
];
const ground = soil([100, 1.5], [900]);

async function solved(
  bars: readonly Bar[],
  nodes: (mesh: { nodeX: Float64Array; nodeY: Float64Array }) => number[],
  ohmPerMetre: number,
) {
  const table = conductorTable(bars);
  const mesh = segmentMesh(table, joinConductors(table), [1.5], 1);
  const matrix = leakageMatrix(mesh, soilImages(ground));
  return {
    mesh,
    graph: await solveGraph(
      mesh,
      matrix,
      nodes(mesh),
      new Float64Array(table.count).fill(ohmPerMetre),
      'resistive',
    ),
  };
}

const nodeAt =
  (x: number, y: number) =>
  (mesh: { nodeX: Float64Array; nodeY: Float64Array }): number =>
    mesh.nodeX.findIndex((nx, n) => Math.hypot(nx - x, mesh.nodeY[n]! - y) < 1e-6);

describe('the graph', () => {
  it('returns at remote earth what was injected, at every node and in all, to 1e-9', async () => {
    const { graph } = await solved(yard, (mesh) => [nodeAt(0, 0)(mesh), nodeAt(20, 10)(mesh)], 2e-3);
    for (const unit of graph.units) {
      expect(Math.abs(unit.balance)).toBeLessThan(1e-9);
      expect(unit.nodeBalance).toBeLessThan(1e-9);
      expect(unit.residual).toBeLessThan(1e-9);
    }
  });

  it('is reciprocal: one ampere here raises there as one ampere there raises here, to 1e-9', async () => {
    const { mesh, graph } = await solved(yard, (m) => [nodeAt(0, 0)(m), nodeAt(30, 20)(m)], 5e-2);
    const [here, there] = graph.units;
    const a = here!.nodePotential[nodeAt(30, 20)(mesh)]!;
    const b = there!.nodePotential[nodeAt(0, 0)(mesh)]!;
    expect(Math.abs(a / b - 1)).toBeLessThan(1e-9);
    expect(a / here!.resistance).toBeLessThan(0.99);
  });

  it('approaches the equipotential solution as the metal’s resistance vanishes, in proportion to it', async () => {
    const ideal = (await solveBars(yard, ground, 1, 'equipotential')).unit.resistance;
    const excess = await Promise.all(
      [1e-4, 1e-5, 1e-6].map(
        async (ohm) => (await solved(yard, (m) => [nodeAt(0, 0)(m)], ohm)).graph.units[0]!.resistance - ideal,
      ),
    );
    expect(excess[0]! / excess[1]!).toBeCloseTo(10, 1);
    expect(excess[1]! / excess[2]!).toBeCloseTo(10, 1);
    expect(excess[2]! / ideal).toBeLessThan(1e-5);
  });

  it('scales: lengths × s divide resistance by s, resistivity × q multiplies it by q, to 1e-9', async () => {
    const s = 3;
    const grown = yard.map(
      (b): Bar => ({
        from: [b.from[0] * s, b.from[1] * s, b.from[2] * s],
        to: [b.to[0] * s, b.to[1] * s, b.to[2] * s],
        radius: b.radius * s,
      }),
    );
    const base = (await solveBars(yard, ground, 1)).unit.resistance;
    const scaled = (await solveBars(grown, soil([700, 4.5], [6300]), 1)).unit.resistance;
    expect(Math.abs((scaled * s) / 7 / base - 1)).toBeLessThan(1e-9);
  });

  it('is mirrored by a mirrored electrode to 1e-9', async () => {
    const mirrored = yard.map(
      (b): Bar => ({ ...b, from: [-b.from[0], b.from[1], b.from[2]], to: [-b.to[0], b.to[1], b.to[2]] }),
    );
    const reversed = [...mirrored].reverse().map((b): Bar => ({ ...b, from: b.to, to: b.from }));
    const base = (await solveBars(yard, ground, 1)).unit.resistance;
    expect(Math.abs((await solveBars(reversed, ground, 1)).unit.resistance / base - 1)).toBeLessThan(1e-9);
  });

  it('is the uniform solution when the layers are equal and the cuts the same, to 1e-9', async () => {
    const table = conductorTable(yard);
    const mesh = segmentMesh(table, joinConductors(table), [1.5], 1);
    const flat = { ...mesh, layer: new Int32Array(mesh.count) };
    const ohm = new Float64Array(table.count).fill(1e-4);
    const layered = await solveGraph(
      mesh,
      leakageMatrix(mesh, soilImages(soil([80, 1.5], [80]))),
      [0],
      ohm,
      'resistive',
    );
    const uniform = await solveGraph(
      flat,
      leakageMatrix(flat, soilImages(soil([80]))),
      [0],
      ohm,
      'resistive',
    );
    expect(Math.abs(layered.units[0]!.resistance / uniform.units[0]!.resistance - 1)).toBeLessThan(1e-9);
  });

  it('takes conductors that lie exactly on an interface, between those just above and just below', async () => {
    const flat = gridBars(20, 20, 2, 2, 0.5, 0.005);
    const [above, on, below] = await Promise.all(
      [0.501, 0.5, 0.499].map(async (h) => (await solveBars(flat, soil([100, h], [300]), 1)).unit.resistance),
    );
    expect(on!).toBeGreaterThan(Math.min(above!, below!));
    expect(on!).toBeLessThan(Math.max(above!, below!));
    expect(Math.abs(above! / below! - 1)).toBeLessThan(1e-2);
  });

  it('gives floating metal no net leakage and a potential between the soil’s and the electrode’s', async () => {
    const fence: Bar = { from: [-2, -2, 0.4], to: [32, -2, 0.4], radius: 0.005 };
    const { mesh, graph } = await solved([...yard, fence], (m) => [nodeAt(0, 0)(m)], 1e-4);
    const unit = graph.units[0]!;
    const net = unit.leakage.reduce((sum, i, s) => sum + (mesh.conductor[s] === yard.length ? i : 0), 0);
    expect(Math.abs(net)).toBeLessThan(1e-12);
    const level = unit.nodePotential[nodeAt(-2, -2)(mesh)]! / unit.resistance;
    expect(level).toBeGreaterThan(0.3);
    expect(level).toBeLessThan(0.9);
  });

  it('agrees between the factor and the iteration', async () => {
    expect(chooseMethod(300, 1)).toBe('cholesky');
    expect(chooseMethod(900, 1)).toBe('conjugate-gradients');
    expect(chooseMethod(900, 30)).toBe('cholesky');
    const many = gridBars(40, 40, 8, 8, 0.5, 0.005);
    const { mesh, graph } = await solved(many, (m) => [nodeAt(0, 0)(m)], 1e-3);
    expect(mesh.count).toBeGreaterThan(500);
    const table = conductorTable(many);
    const matrix = leakageMatrix(mesh, soilImages(ground));
    // ten distinct places of injection push the choice over to the factor
    const nodes = Array.from({ length: 12 }, (_, k) => k);
    const direct = await solveGraph(
      mesh,
      matrix,
      nodes,
      new Float64Array(table.count).fill(1e-3),
      'resistive',
    );
    expect(direct.iterations).toBe(0);
    expect(graph.iterations).toBeGreaterThan(0);
    const node = graph.units[0]!.injectionNode;
    const same = direct.units.find((unit) => unit.injectionNode === node) ?? direct.units[0]!;
    expect(Math.abs(same.resistance / graph.units[0]!.resistance - 1)).toBeLessThan(1e-9);
  });
});

describe('refinement', () => {
  it('converges: each refinement divides the change by more than 2.5, for a grid with rods through an interface', async () => {
    const resistances = await Promise.all(
      [0, 1, 2, 3].map(async (level) => (await solveBars(yard, ground, level)).unit.resistance),
    );
    const changes = [1, 2, 3].map((level) => resistances[level - 1]! - resistances[level]!);
    // four for a smooth leakage; the interface and the joints cost part of it
    expect(changes[0]! / changes[1]!).toBeGreaterThan(2.5);
    expect(changes[1]! / changes[2]!).toBeGreaterThan(2.5);
    expect(changes[2]! / resistances[3]!).toBeLessThan(5e-4);
    expect(changes[2]!).toBeGreaterThan(0);
  });
});
