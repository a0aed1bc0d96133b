// Electrodes for tests: square grids, rods and wires as conductor tables, and their solution on one mesh.
import type { ConductorTable } from '../../src/geometry/conductors.ts';
import { joinConductors } from '../../src/geometry/joints.ts';
import { segmentMesh } from '../../src/geometry/segmentation.ts';
import type { SegmentMesh } from '../../src/geometry/segments.ts';
import { leakageMatrix } from '../../src/leakage/leakage-matrix.ts';
import { type SoilImages, soilImages } from '../../src/soil/image-list.ts';
import type { SoilModel } from '../../src/soil/soil-model.ts';
import { type MetalModel, solveGraph, type UnitSolution } from '../../src/solve/solution.ts';

/** A straight conductor: ends [x, y, depth] in m, radius in m. */
export interface Bar {
  readonly from: readonly [number, number, number];
  readonly to: readonly [number, number, number];
  readonly radius: number;
}

export function conductorTable(bars: readonly Bar[]): ConductorTable {
  const pick = (value: (bar: Bar) => number): Float64Array => Float64Array.from(bars, value);
  return {
    count: bars.length,
    id: bars.map((_, i) => String(i + 1)),
    x1: pick((b) => b.from[0]),
    y1: pick((b) => b.from[1]),
    depth1: pick((b) => b.from[2]),
    x2: pick((b) => b.to[0]),
    y2: pick((b) => b.to[1]),
    depth2: pick((b) => b.to[2]),
    radius: pick((b) => b.radius),
    material: bars.map(() => 'copper-annealed'),
    electrode: bars.map(() => 'main'),
    insulated: new Uint8Array(bars.length),
    resistancePerMetre: new Float64Array(bars.length).fill(Number.NaN),
  };
}

/** A rectangular grid with its corner at the origin, one bar a line. */
export function gridBars(
  width: number,
  height: number,
  across: number,
  up: number,
  depth: number,
  radius: number,
): Bar[] {
  const bars: Bar[] = [];
  for (let i = 0; i <= across; i++) {
    const x = (width * i) / across;
    bars.push({ from: [x, 0, depth], to: [x, height, depth], radius });
  }
  for (let j = 0; j <= up; j++) {
    const y = (height * j) / up;
    bars.push({ from: [0, y, depth], to: [width, y, depth], radius });
  }
  return bars;
}

export function rodBar(x: number, y: number, top: number, bottom: number, radius: number): Bar {
  return { from: [x, y, top], to: [x, y, bottom], radius };
}

export interface SolvedElectrode {
  readonly mesh: SegmentMesh;
  readonly images: SoilImages;
  readonly unit: UnitSolution;
}

/** Solves bars on one mesh, one ampere into the first node. */
export async function solveBars(
  bars: readonly Bar[],
  model: SoilModel,
  level: number,
  metal: MetalModel = 'equipotential',
): Promise<SolvedElectrode> {
  const table = conductorTable(bars);
  const interfaces: number[] = [];
  let depth = 0;
  for (const layer of model.layers.slice(0, -1)) {
    depth += layer.thickness;
    interfaces.push(depth);
  }
  const images = soilImages(model);
  const mesh = segmentMesh(table, joinConductors(table), interfaces, level);
  const resistance = new Float64Array(table.count).fill(1e-4);
  const unit = (await solveGraph(mesh, leakageMatrix(mesh, images), [0], resistance, metal)).units[0]!;
  return { mesh, images, unit };
}
