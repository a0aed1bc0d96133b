import { describe, expect, it } from 'vitest';
import { joinConductors } from '../../src/geometry/joints.ts';
import { segmentMesh } from '../../src/geometry/segmentation.ts';
import type { SegmentMesh } from '../../src/geometry/segments.ts';
import { type LeakageMatrix, leakageMatrix } from '../../src/leakage/leakage-matrix.ts';
import { soilImages } from '../../src/soil/image-list.ts';
import { solveGraphComplex } from '../../src/solve/complex-solution.ts';
import { solveGraph } from '../../src/solve/solution.ts';
import { type Bar, conductorTable, gridBars, rodBar } from '../support/electrodes.ts';
import { soil } from '../support/soils.ts';

const yard: Bar[] = [...gridBars(30, 20, 3, 2, 0.5, 0.005), rodBar(0, 0, 0.5, 4, 0.008)];
const fence: Bar = { from: [-2, -2, 0.4], to: [32, -2, 0.4], radius: 0.005 };
const ground = soil([100, 1.5], [900]);

function meshed(bars: readonly Bar[], model = ground, level = 1) {
  const table = conductorTable(bars);
  const interfaces = model.layers.length > 1 ? [model.layers[0]!.thickness] : [];
  const mesh = segmentMesh(table, joinConductors(table), interfaces, level);
  return { mesh, matrix: leakageMatrix(mesh, soilImages(model)) };
}

const perMetre = (bars: number, re: number, im: number) => ({
  re: new Float64Array(bars).fill(re),
  im: new Float64Array(bars).fill(im),
});

const nodeAt = (mesh: SegmentMesh, x: number, y: number): number =>
  mesh.nodeX.findIndex((nx, n) => Math.hypot(nx - x, mesh.nodeY[n]! - y) < 1e-6);

describe('the graph at a frequency', () => {
  it('is the real solution where nothing is imaginary, to 1e-9: two pieces of metal, two injections', async () => {
    const bars = [...yard, fence];
    const { mesh, matrix } = meshed(bars);
    const nodes = [nodeAt(mesh, 0, 0), nodeAt(mesh, 20, 10)];
    const real = await solveGraph(mesh, matrix, nodes, new Float64Array(bars.length).fill(2e-2), 'resistive');
    const complex = await solveGraphComplex(mesh, matrix, nodes, perMetre(bars.length, 2e-2, 0));
    real.units.forEach((unit, u) => {
      const found = complex.units[u]!;
      expect(found.injectionNode).toBe(unit.injectionNode);
      for (const [part, wanted] of [
        [found.nodePotential, unit.nodePotential],
        [found.leakage, unit.leakage],
        [found.along, unit.along],
      ] as const) {
        const scale = wanted.reduce((most, v) => Math.max(most, Math.abs(v)), 0);
        wanted.forEach((value, i) => {
          expect(Math.abs(part.re[i]! - value) / scale).toBeLessThan(1e-9);
          expect(Math.abs(part.im[i]!) / scale).toBeLessThan(1e-12);
        });
      }
    });
  });

  it('returns at remote earth what was injected, is reciprocal, and its power balances, to 1e-9', async () => {
    const bars = [...yard, fence];
    const { mesh, matrix } = meshed(bars);
    const nodes = [nodeAt(mesh, 0, 0), nodeAt(mesh, 30, 20)] as const;
    const [re, im] = [2e-2, 7e-2];
    const { units } = await solveGraphComplex(mesh, matrix, nodes, perMetre(bars.length, re, im));
    for (const unit of units) {
      expect(unit.balance).toBeLessThan(1e-9);
      expect(unit.nodeBalance).toBeLessThan(1e-9);
      expect(unit.residual).toBeLessThan(1e-9);
      // power in = what the soil and the metal's resistance turn to heat + what swings in its reactance
      const currents = [unit.leakage.re, unit.leakage.im].map((part) =>
        Float64Array.from(matrix.segments, (i) => part[i]!),
      );
      let heat = 0;
      let swing = 0;
      for (const current of currents) {
        const product = new Float64Array(matrix.size);
        await matrix.multiply(current, product);
        heat += current.reduce((sum, i, k) => sum + i * product[k]!, 0);
      }
      for (let i = 0; i < mesh.count; i++) {
        const square = (unit.along.re[i]! ** 2 + unit.along.im[i]! ** 2) * mesh.length[i]!;
        heat += re * square;
        swing += im * square;
      }
      expect(Math.abs(unit.impedance.re / heat - 1)).toBeLessThan(1e-9);
      expect(Math.abs(unit.impedance.im / swing - 1)).toBeLessThan(1e-9);
    }
    const [here, there] = units;
    const scale = Math.hypot(here!.impedance.re, here!.impedance.im);
    for (const part of ['re', 'im'] as const)
      expect(
        Math.abs(here!.nodePotential[part][nodes[1]]! - there!.nodePotential[part][nodes[0]]!) / scale,
      ).toBeLessThan(1e-9);
    expect(here!.nodePotential.im[nodes[1]]! / here!.impedance.im).toBeLessThan(0.9);
  });
});

/** A straight wire in equal segments that leak to remote earth each by itself: the line of the textbooks. */
function line(
  length: number,
  count: number,
  siemensPerMetre: number,
): { mesh: SegmentMesh; matrix: LeakageMatrix } {
  const step = length / count;
  const at = (offset: number): Float64Array =>
    Float64Array.from({ length: count }, (_, k) => (k + offset) * step);
  const flat = new Float64Array(count);
  const mesh: SegmentMesh = {
    count,
    x1: at(0),
    y1: flat,
    z1: flat.map(() => 0.6),
    x2: at(1),
    y2: flat,
    z2: flat.map(() => 0.6),
    length: flat.map(() => step),
    radius: flat.map(() => 0.005),
    layer: new Int32Array(count),
    leaking: new Uint8Array(count).fill(1),
    conductor: new Int32Array(count),
    node1: Int32Array.from({ length: count }, (_, k) => k),
    node2: Int32Array.from({ length: count }, (_, k) => k + 1),
    nodeCount: count + 1,
    nodeX: Float64Array.from({ length: count + 1 }, (_, k) => k * step),
    nodeY: new Float64Array(count + 1),
    nodeZ: new Float64Array(count + 1).fill(0.6),
    nodeComponent: new Int32Array(count + 1),
    componentCount: 1,
  };
  const ohm = 1 / (siemensPerMetre * step);
  const scale = (factor: number) => (x: Float64Array, into: Float64Array) =>
    into.forEach((_, k) => {
      into[k] = factor * x[k]!;
    });
  const matrix: LeakageMatrix = {
    segments: Int32Array.from({ length: count }, (_, k) => k),
    size: count,
    diagonal: new Float64Array(count).fill(ohm),
    multiply: scale(ohm),
    precondition: scale(1 / ohm),
  };
  return { mesh, matrix };
}

describe('a long buried wire as a line', () => {
  // steel wire and leakage of common size, chosen so that the line is 2.6 times as long as its attenuation length
  const [length, re, im, siemens] = [800, 1.862e-3, 1.605e-3, 4e-3];

  /** √(z/y)·coth(γℓ), γ = √(zy): input impedance of a line open at its far end (Sunde 1949, from memory). */
  function closedForm(): readonly [re: number, im: number] {
    const magnitude = Math.sqrt(Math.hypot(re, im));
    const angle = Math.atan2(im, re) / 2;
    const root = [magnitude * Math.cos(angle), magnitude * Math.sin(angle)] as const;
    const [alpha, beta] = root.map((part) => part * Math.sqrt(siemens) * length) as [number, number];
    // coth(α + jβ) = (sinh 2α − j sin 2β)/(cosh 2α − cos 2β)
    const divisor = Math.cosh(2 * alpha) - Math.cos(2 * beta);
    const [cr, ci] = [Math.sinh(2 * alpha) / divisor, -Math.sin(2 * beta) / divisor];
    const [zr, zi] = root.map((part) => part / Math.sqrt(siemens)) as [number, number];
    return [zr * cr - zi * ci, zr * ci + zi * cr];
  }

  it('shows at its end √(z/y)·coth(γℓ): halving the segments quarters the error, down to 1e-5', async () => {
    const [wr, wi] = closedForm();
    const errors: number[] = [];
    for (const count of [50, 100, 200, 400]) {
      const { mesh, matrix } = line(length, count, siemens);
      const { units } = await solveGraphComplex(mesh, matrix, [0], perMetre(1, re, im));
      const { impedance } = units[0]!;
      errors.push(Math.hypot(impedance.re - wr, impedance.im - wi) / Math.hypot(wr, wi));
    }
    for (const k of [1, 2, 3]) expect(errors[k - 1]! / errors[k]!).toBeCloseTo(4, 1);
    expect(errors[3]!).toBeLessThan(1e-5);
  });
});

describe('grids with their conductors’ internal impedance at 50 Hz (independent computation)', () => {
  // 100 m, 100 meshes, depth 0.6 m, 10 Ω·m, injected at a corner; no mutual inductance
  it.each([
    ['copper, radius 7 mm', 0.007, 0.112e-3, 0.016e-3, 0.0481, 0.0002],
    ['steel, radius 8 mm, μr 200', 0.008, 1.862e-3, 1.605e-3, 0.0708, 0.0196],
  ])('%s: Z at the corner within the digits given', async (_, radius, re, im, real, imaginary) => {
    const bars = gridBars(100, 100, 10, 10, 0.6, radius);
    const { mesh, matrix } = meshed(bars, soil([10]), 0);
    const { units } = await solveGraphComplex(
      mesh,
      matrix,
      [nodeAt(mesh, 0, 0)],
      perMetre(bars.length, re, im),
    );
    const { impedance } = units[0]!;
    expect(Math.abs(impedance.re - real)).toBeLessThan(1e-4);
    expect(Math.abs(impedance.im - imaginary)).toBeLessThan(1e-4);
  });
});
