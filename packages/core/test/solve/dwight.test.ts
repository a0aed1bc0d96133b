// Simple electrodes whose resistance is known in closed form.
import { describe, expect, it } from 'vitest';
import { joinConductors } from '../../src/geometry/joints.ts';
import type { SegmentMesh } from '../../src/geometry/segments.ts';
import { leakageMatrix } from '../../src/leakage/leakage-matrix.ts';
import { soilImages } from '../../src/soil/image-list.ts';
import { solveGraph } from '../../src/solve/solution.ts';
import { type Bar, conductorTable, rodBar, solveBars } from '../support/electrodes.ts';
import { soil } from '../support/soils.ts';

const ground = soil([100]);

/** Resistance with one segment a conductor: the even leakage that Dwight's formulas suppose. */
async function oneSegmentEach(bars: readonly Bar[]): Promise<number> {
  const table = conductorTable(bars);
  const joints = joinConductors(table);
  const mesh: SegmentMesh = {
    count: table.count,
    x1: table.x1,
    y1: table.y1,
    z1: table.depth1,
    x2: table.x2,
    y2: table.y2,
    z2: table.depth2,
    length: table.x1.map((x, i) =>
      Math.hypot(table.x2[i]! - x, table.y2[i]! - table.y1[i]!, table.depth2[i]! - table.depth1[i]!),
    ),
    radius: table.radius,
    layer: new Int32Array(table.count),
    leaking: new Uint8Array(table.count).fill(1),
    conductor: Int32Array.from(bars, (_, i) => i),
    node1: joints.pieceNode1,
    node2: joints.pieceNode2,
    nodeCount: joints.nodeCount,
    nodeX: joints.nodeX,
    nodeY: joints.nodeY,
    nodeZ: joints.nodeDepth,
    nodeComponent: joints.nodeComponent,
    componentCount: joints.componentCount,
  };
  const ohm = new Float64Array(table.count).fill(1e-4);
  return (await solveGraph(mesh, leakageMatrix(mesh, soilImages(ground)), [0], ohm, 'equipotential'))
    .units[0]!.resistance;
}

const arm = (angle: number, length: number): Bar => ({
  from: [0, 0, 0.5],
  to: [length * Math.cos(angle), length * Math.sin(angle), 0.5],
  radius: 0.005,
});

describe('Dwight, AIEE Trans. 55 (1936) 1319, formulas from memory, reproduced by independent integration', () => {
  const [rho, a, L, s] = [100, 0.005, 15, 1];
  const x = s / L;
  const F = Math.log((2 * L) / a) + Math.log((2 * L) / s);

  it('straight wire of 30 m, one segment: to 0.1 %', async () => {
    const formula =
      (rho / (4 * Math.PI * L)) * (Math.log((4 * L) / a) + Math.log((4 * L) / s) - 2 + x / 2 - x ** 2 / 16);
    expect(formula).toBeCloseTo(6.1116, 3);
    const wire: Bar = { from: [-L, 0, 0.5], to: [L, 0, 0.5], radius: a };
    expect(Math.abs((await oneSegmentEach([wire])) / formula - 1)).toBeLessThan(1e-3);
  });

  it.each([
    [3, 6, 1.071, -0.209, 0.238, -0.054],
    [4, 8, 2.912, -1.071, 0.645, -0.145],
    [6, 12, 6.851, -3.128, 1.758, -0.49],
  ])('star of %i arms of 15 m, one segment an arm: to 0.1 %', async (arms, divisor, c0, c1, c2, c4) => {
    const formula = (rho / (divisor * Math.PI * L)) * (F + c0 + c1 * x + c2 * x ** 2 + c4 * x ** 4);
    const star = Array.from({ length: arms }, (_, k) => arm((2 * Math.PI * k) / arms, L));
    expect(Math.abs((await oneSegmentEach(star)) / formula - 1)).toBeLessThan(1e-3);
  });

  it('right angle of two arms of 15 m, one segment an arm: to 0.1 %', async () => {
    const formula = (rho / (4 * Math.PI * L)) * (F - 0.2373 + 0.2146 * x + 0.1035 * x ** 2 - 0.0424 * x ** 4);
    expect(Math.abs((await oneSegmentEach([arm(0, L), arm(Math.PI / 2, L)])) / formula - 1)).toBeLessThan(
      1e-3,
    );
  });

  it('lies above the true resistance, in which the ends leak more (independent computation: 6.0692 and 3.0992 Ω)', async () => {
    const wire: Bar = { from: [-L, 0, 0.5], to: [L, 0, 0.5], radius: a };
    expect(Math.abs((await solveBars([wire], ground, 3)).unit.resistance / 6.0692 - 1)).toBeLessThan(2e-3);
    const star = Array.from({ length: 6 }, (_, k) => arm((Math.PI * k) / 3, L));
    expect(Math.abs((await solveBars(star, ground, 3)).unit.resistance / 3.0992 - 1)).toBeLessThan(2e-3);
  });
});

describe('limits of simple electrodes', () => {
  it.each([
    [50, 0.67126],
    [100, 0.78278],
    [375, 0.99603],
    [500, 1.04238],
    [1000, 1.15389],
  ])(
    'driven rod, length over radius %i: R·L/ρ = %d within 0.5 % (independent computation: exact hollow tube)',
    async (slenderness, expected) => {
      const rod = rodBar(0, 0, 0, 3, 3 / slenderness);
      expect(
        Math.abs(((await solveBars([rod], ground, 2)).unit.resistance * 3) / 100 / expected - 1),
      ).toBeLessThan(5e-3);
    },
  );

  it('ring of 10 m: ρ/(2π²D)[ln(8D/d) + ln(4D/s)] within 0.5 % (Dwight 1936; independent computation: exact to 0.0 %)', async () => {
    const [D, d, s, sides] = [10, 0.01, 1, 96];
    const formula = (100 / (2 * Math.PI ** 2 * D)) * (Math.log((8 * D) / d) + Math.log((4 * D) / s));
    // a polygon of equal perimeter
    const radius = (Math.PI * D) / (2 * sides * Math.sin(Math.PI / sides));
    const corner = (k: number): [number, number, number] => [
      radius * Math.cos((2 * Math.PI * k) / sides),
      radius * Math.sin((2 * Math.PI * k) / sides),
      s / 2,
    ];
    const ring = Array.from(
      { length: sides },
      (_, k): Bar => ({ from: corner(k), to: corner(k + 1), radius: d / 2 }),
    );
    expect(Math.abs((await solveBars(ring, ground, 0)).unit.resistance / formula - 1)).toBeLessThan(5e-3);
  });

  it('a mesh of wires on the surface stays above a square plate, ρ·0.4339/side, and nears it (Maxwell’s plate, 0.36679 from memory)', async () => {
    const plate = 100 * 0.4339;
    const meshed = await Promise.all(
      [4, 8].map(async (n) => {
        const bars: Bar[] = [];
        for (let k = 0; k <= n; k++) {
          bars.push({ from: [k / n, 0, 0.0005], to: [k / n, 1, 0.0005], radius: 0.0005 });
          bars.push({ from: [0, k / n, 0.0005], to: [1, k / n, 0.0005], radius: 0.0005 });
        }
        return (await solveBars(bars, ground, 0)).unit.resistance;
      }),
    );
    expect(meshed[1]!).toBeGreaterThan(plate);
    expect(meshed[0]!).toBeGreaterThan(meshed[1]!);
  });
});
