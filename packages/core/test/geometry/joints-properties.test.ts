// What must hold for the joints of any drawing.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type Joints, joinConductors } from '../../src/geometry/joints.ts';
import { conductorTable, cutLattice, lattice, type Row, rod, wire } from './conductor-rows.ts';

const settings = { seed: 20240607, numRuns: 150 };

/** Conductors on a lattice of 0.25 m, so that what meets meets exactly and what misses misses by far; diagonals and depths included. */
const coordinate = fc.integer({ min: 0, max: 8 }).map((step) => step * 0.25);
const level = fc.constantFrom(0.5, 0.75);
const row: fc.Arbitrary<Row> = fc.oneof(
  fc.tuple(coordinate, coordinate, coordinate, coordinate, level, level).map(([x1, y1, x2, y2, z1, z2]) => ({
    from: [x1, y1, z1] as const,
    to: [x2, y2, z2] as const,
  })),
  fc.tuple(coordinate, coordinate).map(([x, y]) => rod(x, y)),
);
const drawing = fc.array(row, { minLength: 1, maxLength: 14 });

function join(rows: readonly Row[]): Joints {
  return joinConductors(conductorTable(rows));
}

function reversed(rows: readonly Row[]): Row[] {
  return rows.map((r, i) => (i % 2 === 0 ? { ...r, from: r.to, to: r.from } : r));
}

/** Length of all pieces, m. */
function metalLength(rows: readonly Row[], joints: Joints): number {
  let length = 0;
  for (let piece = 0; piece < joints.pieceCount; piece++) {
    const { from, to } = rows[joints.pieceConductor[piece]!]!;
    const whole = Math.hypot(to[0] - from[0], to[1] - from[1], to[2] - from[2]);
    length += whole * (joints.pieceEnd[piece]! - joints.pieceStart[piece]!);
  }
  return length;
}

/** What must not depend on how the rows are written down; node places sorted and rounded to the micrometre. */
function essence(joints: Joints): unknown {
  const places = Array.from({ length: joints.nodeCount }, (_, i) =>
    [joints.nodeX[i]!, joints.nodeY[i]!, joints.nodeDepth[i]!, joints.nodeDegree[i]!]
      .map((value) => (Math.round(value * 1e6) / 1e6 + 0).toFixed(6))
      .join(' '),
  );
  const codes = joints.faults.map(({ code }) => code).sort();
  return [joints.nodeCount, joints.pieceCount, joints.componentCount, places.sort(), codes];
}

describe('joints of any drawing', () => {
  test('do not depend on the order of the rows', () => {
    const shuffled = drawing.chain((rows) =>
      fc.tuple(
        fc.constant(rows),
        fc.shuffledSubarray(rows, { minLength: rows.length, maxLength: rows.length }),
      ),
    );
    fc.assert(
      fc.property(shuffled, ([rows, other]) => {
        expect(essence(join(other))).toEqual(essence(join(rows)));
      }),
      settings,
    );
  });

  test('do not depend on the direction of the conductors', () => {
    fc.assert(
      fc.property(drawing, (rows) => {
        expect(essence(join(reversed(rows)))).toEqual(essence(join(rows)));
      }),
      settings,
    );
  });

  test('keep the length of the metal', () => {
    fc.assert(
      fc.property(drawing, (rows) => {
        const drawn = rows.reduce(
          (sum, { from, to }) => sum + Math.hypot(...to.map((v, k) => v - from[k]!)),
          0,
        );
        expect(metalLength(rows, join(rows))).toBeCloseTo(drawn, 9);
      }),
      settings,
    );
  });

  test('move with the drawing', () => {
    const shift = fc.integer({ min: -40, max: 40 }).map((step) => step * 1024);
    fc.assert(
      fc.property(drawing, shift, shift, (rows, dx, dy) => {
        const moved = rows.map((r) => ({
          ...r,
          from: [r.from[0] + dx, r.from[1] + dy, r.from[2]] as const,
          to: [r.to[0] + dx, r.to[1] + dy, r.to[2]] as const,
        }));
        const here = join(rows);
        const there = join(moved);
        expect(Array.from(there.pieceNode1)).toEqual(Array.from(here.pieceNode1));
        expect(Array.from(there.pieceNode2)).toEqual(Array.from(here.pieceNode2));
        there.nodeX.forEach((x, i) => {
          expect(x - dx).toBeCloseTo(here.nodeX[i]!, 9);
          expect(there.nodeY[i]! - dy).toBeCloseTo(here.nodeY[i]!, 9);
        });
      }),
      settings,
    );
  });

  test('touch at every node: each piece ends within reach of its nodes', () => {
    fc.assert(
      fc.property(drawing, (rows) => {
        const joints = join(rows);
        for (let piece = 0; piece < joints.pieceCount; piece++) {
          const { from, to } = rows[joints.pieceConductor[piece]!]!;
          const along = (t: number): number[] => from.map((v, k) => v + t * (to[k]! - v));
          const ends = [
            [along(joints.pieceStart[piece]!), joints.pieceNode1[piece]!],
            [along(joints.pieceEnd[piece]!), joints.pieceNode2[piece]!],
          ] as const;
          for (const [[x, y, z], node] of ends) {
            const miss = Math.hypot(
              x! - joints.nodeX[node]!,
              y! - joints.nodeY[node]!,
              z! - joints.nodeDepth[node]!,
            );
            expect(miss).toBeLessThan(0.05);
          }
        }
      }),
      settings,
    );
  });
});

describe('a lattice of any size', () => {
  const size = fc.integer({ min: 1, max: 7 });
  const side = fc.constantFrom(0.3, 3.3, 7, 11.1);

  test('has a node at every crossing and a piece on every side, drawn whole or cut', () => {
    fc.assert(
      fc.property(size, size, side, (columns, rows, length) => {
        const nodes = (columns + 1) * (rows + 1);
        const sides = columns * (rows + 1) + rows * (columns + 1);
        for (const drawn of [lattice(columns, rows, length), cutLattice(columns, rows, length)]) {
          const joints = join(drawn);
          expect([joints.nodeCount, joints.pieceCount, joints.componentCount]).toEqual([nodes, sides, 1]);
          expect(joints.faults).toEqual([]);
          expect(joints.snaps).toEqual([]);
        }
      }),
      { ...settings, numRuns: 40 },
    );
  });

  test('hung with rods at its corners and joined to its twin by one wire', () => {
    fc.assert(
      fc.property(size, size, (columns, rows) => {
        const width = columns * 5;
        const twin = lattice(columns, rows, 5).map((r) => ({
          ...r,
          from: [r.from[0] + width + 20, r.from[1], r.from[2]] as const,
          to: [r.to[0] + width + 20, r.to[1], r.to[2]] as const,
        }));
        const hung = [...lattice(columns, rows, 5), rod(0, 0), rod(width, 0), rod(0, rows * 5), ...twin];
        expect(join(hung).componentCount).toBe(2);
        const joined = join([...hung, wire(width, 0, width + 20, 0)]);
        expect(joined.componentCount).toBe(1);
        expect(joined.nodeCount).toBe(2 * (columns + 1) * (rows + 1) + 3);
      }),
      { ...settings, numRuns: 30 },
    );
  });
});
