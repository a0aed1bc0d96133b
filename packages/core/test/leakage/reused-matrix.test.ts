import { describe, expect, it } from 'vitest';
import { joinConductors } from '../../src/geometry/joints.ts';
import { segmentMesh } from '../../src/geometry/segmentation.ts';
import type { SegmentMesh } from '../../src/geometry/segments.ts';
import { placesAmongKnown } from '../../src/leakage/known-segments.ts';
import { leakageMatrix } from '../../src/leakage/leakage-matrix.ts';
import { reusedLeakageMatrix } from '../../src/leakage/reused-matrix.ts';
import { soilImages } from '../../src/soil/image-list.ts';
import { solveGraph } from '../../src/solve/solution.ts';
import { type Bar, conductorTable, gridBars, rodBar } from '../support/electrodes.ts';
import { soil } from '../support/soils.ts';

const images = soilImages(soil([100, 1.5], [900]));
const grid = gridBars(40, 30, 4, 3, 0.5, 0.005);
const rod = (x: number): Bar => rodBar(x, 30, 0.5, 4, 0.008);

function meshed(bars: readonly Bar[]): SegmentMesh {
  const table = conductorTable(bars);
  return segmentMesh(table, joinConductors(table), [1.5], 1);
}

const before = meshed([...grid, rod(0), rod(27)]);
const known = { mesh: before, images, matrix: leakageMatrix(before, images) };

/** Segments of a mesh that are not in the one before, by looking at all of them. */
function strangers(mesh: SegmentMesh): number {
  const place = (m: SegmentMesh, i: number): string =>
    [m.x1[i], m.y1[i], m.z1[i], m.x2[i], m.y2[i], m.z2[i], m.radius[i], m.layer[i]].join(' ');
  const places = new Set(Array.from({ length: before.count }, (_, i) => place(before, i)));
  return Array.from({ length: mesh.count }, (_, i) => place(mesh, i)).filter((one) => !places.has(one))
    .length;
}

describe('leakage matrix after a change', () => {
  it.each([
    ['a rod moved', [...grid, rod(0), rod(33)]],
    ['a rod added', [...grid, rod(0), rod(27), rod(13)]],
    ['a rod removed', [...grid, rod(0)]],
    ['conductors drawn in another order', [rod(27), ...[...grid].reverse(), rod(0), rod(21)]],
  ])(
    '%s: rows of changed segments alone are computed, and the solution is the fresh one to 1e-9',
    async (_, bars) => {
      const mesh = meshed(bars);
      const { matrix, kept, computed } = reusedLeakageMatrix(known, mesh);
      const fresh = leakageMatrix(mesh, images);
      const [n, c] = [fresh.size, strangers(mesh)];
      expect(c).toBeGreaterThan(0);
      expect(c).toBeLessThan(n / 3);
      expect(kept).toBe(n - c);
      expect(computed).toBe(c * (n - c) + (c * (c + 1)) / 2);
      fresh.entries.forEach((value, k) => {
        expect(Math.abs(matrix.entries[k]! / value - 1)).toBeLessThan(1e-8);
      });
      const ohm = new Float64Array(bars.length).fill(1e-3);
      const [a, b] = await Promise.all(
        [matrix, fresh].map(async (one) => (await solveGraph(mesh, one, [0], ohm, 'resistive')).units[0]!),
      );
      b!.nodePotential.forEach((value, node) => {
        expect(Math.abs(a!.nodePotential[node]! / value - 1)).toBeLessThan(1e-9);
      });
      const most = b!.leakage.reduce((m, i) => Math.max(m, Math.abs(i)), 0);
      b!.leakage.forEach((value, i) => {
        expect(Math.abs(a!.leakage[i]! - value) / most).toBeLessThan(1e-9);
      });
      expect(a!.residual).toBeLessThan(1e-9);
    },
  );

  it('computes nothing where nothing changed, and keeps every bit', () => {
    const { matrix, kept, computed } = reusedLeakageMatrix(known, meshed([...grid, rod(0), rod(27)]));
    expect(computed).toBe(0);
    expect(kept).toBe(known.matrix.size);
    expect(matrix.entries).toEqual(known.matrix.entries);
    expect(matrix.diagonal).toEqual(known.matrix.diagonal);
  });

  it('goes on from a matrix that was itself reused', () => {
    const there = reusedLeakageMatrix(known, meshed([...grid, rod(0), rod(33)]));
    const back = reusedLeakageMatrix(there, before);
    expect(back.computed).toBeGreaterThan(0);
    known.matrix.entries.forEach((value, k) => {
      expect(Math.abs(back.matrix.entries[k]! / value - 1)).toBeLessThan(1e-8);
    });
  });
});

describe('known segments', () => {
  const all = Int32Array.from({ length: before.count }, (_, i) => i);

  it('are told apart by radius and layer, and by every end', () => {
    expect(placesAmongKnown(before, all, before, all)).toEqual(all);
    for (const part of ['x1', 'y1', 'z1', 'x2', 'y2', 'z2', 'radius', 'layer'] as const) {
      const changed = before[part].slice();
      changed[3]! += 1;
      const places = placesAmongKnown({ ...before, [part]: changed }, all, before, all);
      expect(places[3]).toBe(-1);
      expect(places.filter((at) => at < 0).length).toBe(1);
    }
  });

  it('are compared in full where their codes are equal: a bit of the layer made up for by the last of an end', () => {
    const [x1, layer] = [before.x1.slice(), before.layer.slice()];
    const words = new Uint32Array(x1.buffer);
    const little = new Uint8Array(new Uint16Array([1]).buffer)[0] === 1;
    words[2 * 3 + (little ? 0 : 1)]! ^= 1;
    layer[3]! ^= 1;
    expect(placesAmongKnown({ ...before, x1, layer }, all, before, all)[3]).toBe(-1);
  });

  it('are found once: of two alike, each its own', () => {
    const twice = Int32Array.from([...all, 5]);
    expect(placesAmongKnown(before, twice, before, all).at(-1)).toBe(-1);
    expect(placesAmongKnown(before, twice, before, twice)).toEqual(Int32Array.from([...all, before.count]));
  });
});
