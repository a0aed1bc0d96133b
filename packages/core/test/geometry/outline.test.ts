// Outer boundaries of closed meshes: closed cases drawn by hand.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { areaSquareMetres } from '../../src/geometry/area.ts';
import { meshOutlines } from '../../src/geometry/outline.ts';
import type { Polygon } from '../../src/geometry/polygon.ts';
import { conductorTable, cutLattice, lattice, type Row, rod, wire } from './conductor-rows.ts';

function outlines(...rows: Row[]): Polygon[] {
  return meshOutlines(
    conductorTable(rows),
    rows.map((_, i) => i),
  );
}

function moved(rows: readonly Row[], dx: number, dy: number): Row[] {
  return rows.map((r) => ({
    ...r,
    from: [r.from[0] + dx, r.from[1] + dy, r.from[2]],
    to: [r.to[0] + dx, r.to[1] + dy, r.to[2]],
  }));
}

/** A square of four rows with its lower left corner at (x, y). */
function square(x: number, y: number, side: number): Row[] {
  return [
    wire(x, y, x + side, y),
    wire(x + side, y, x + side, y + side),
    wire(x + side, y + side, x, y + side),
    wire(x, y + side, x, y),
  ];
}

const rectangle = (x1: number, y1: number, x2: number, y2: number): Polygon => [
  [x1, y1],
  [x2, y1],
  [x2, y2],
  [x1, y2],
];

describe('the outer boundary of closed meshes', () => {
  test('of a grid is its rectangle, drawn whole or cut, in any order', () => {
    expect(outlines(...lattice(3, 2, 7))).toEqual([rectangle(0, 0, 21, 14)]);
    expect(outlines(...cutLattice(3, 2, 7).reverse())).toEqual([rectangle(0, 0, 21, 14)]);
  });

  test('of an L has six corners, counter-clockwise from the lowest left one', () => {
    const lines = [
      wire(0, 0, 20, 0),
      wire(0, 10, 20, 10),
      wire(0, 20, 10, 20),
      wire(0, 0, 0, 20),
      wire(10, 0, 10, 20),
      wire(20, 0, 20, 10),
    ];
    expect(outlines(...lines)).toEqual([
      [
        [0, 0],
        [20, 0],
        [20, 10],
        [10, 10],
        [10, 20],
        [0, 20],
      ],
    ]);
  });

  test('of one small triangle is that triangle', () => {
    expect(outlines(wire(0, 0, 0.5, 0), wire(0.5, 0, 0, 0.5), wire(0, 0.5, 0, 0))).toEqual([
      [
        [0, 0],
        [0.5, 0],
        [0, 0.5],
      ],
    ]);
  });

  test('of small, slanting meshes is their outside', () => {
    // a fan of triangles around (0, 0), less than a metre across
    const spokes = [
      [0.5, 0.1],
      [0.2, 0.4],
      [-0.3, 0.3],
      [-0.4, -0.1],
      [0.1, -0.5],
    ] as const;
    const fan = spokes.flatMap(([x, y], i) => {
      const [nextX, nextY] = spokes[(i + 1) % spokes.length]!;
      return [wire(0, 0, x, y), wire(x, y, nextX, nextY)];
    });
    expect(outlines(...fan)).toEqual([[...spokes.slice(4), ...spokes.slice(0, 4)]]);
  });

  test('of two blocks joined by one conductor is two', () => {
    expect(outlines(...square(30, 5, 8), ...square(0, 0, 10), wire(10, 6, 30, 6))).toEqual([
      rectangle(0, 0, 10, 10),
      rectangle(30, 5, 38, 13),
    ]);
  });

  test('of two blocks side by side tells the left one first, whichever was drawn first', () => {
    expect(outlines(...square(30, 0, 8), ...square(0, 0, 10))).toEqual([
      rectangle(0, 0, 10, 10),
      rectangle(30, 0, 38, 8),
    ]);
  });

  test('of a grid turned out of the axes has four corners', () => {
    // turned by the angle of a 3–4–5 triangle
    const turned = lattice(3, 2, 10).map((r): Row => {
      const turn = ([x, y, z]: Row['from']): Row['from'] => [(4 * x - 3 * y) / 5, (3 * x + 4 * y) / 5, z];
      return { from: turn(r.from), to: turn(r.to) };
    });
    const [outline, ...others] = outlines(...turned);
    expect(others).toEqual([]);
    const rounded = outline!.map(([x, y]) => [Math.round(x * 1e9) / 1e9, Math.round(y * 1e9) / 1e9]);
    expect(rounded).toEqual([
      [0, 0],
      [24, 18],
      [12, 34],
      [-12, 16],
    ]);
  });

  test('of two blocks joined by two conductors is one', () => {
    const joined = outlines(
      ...square(0, 0, 10),
      ...square(30, 0, 10),
      wire(10, 2, 30, 2),
      wire(10, 8, 30, 8),
    );
    expect(joined).toHaveLength(1);
    expect(areaSquareMetres(joined)).toBeCloseTo(100 + 100 + 120, 6);
  });

  test('leaves out rods, tails and trees of tails', () => {
    const tails = [wire(10, 5, 25, 5), wire(20, 5, 20, 12), wire(20, 12, 30, 12), wire(-4, -4, 0, 0)];
    const lid: Row = { from: [10, 10, 0.5], to: [10.2, 10.1, 3.5] };
    expect(outlines(...square(0, 0, 10), ...tails, rod(0, 0), rod(10, 10), lid)).toEqual([
      rectangle(0, 0, 10, 10),
    ]);
  });

  test('of lines that overshoot their crossings leaves out the overshoots', () => {
    const hash = [wire(-1, 0, 11, 0), wire(-1, 10, 11, 10), wire(0, -1, 0, 11), wire(10, -1, 10, 11)];
    expect(outlines(...hash)).toEqual([rectangle(0, 0, 10, 10)]);
  });

  test('of a figure of eight is two blocks that share a corner', () => {
    expect(outlines(...square(0, 0, 10), ...square(10, 10, 5))).toEqual([
      rectangle(0, 0, 10, 10),
      rectangle(10, 10, 15, 15),
    ]);
  });

  test('of three blocks in a chain by their corners is three', () => {
    expect(outlines(...square(10, 10, 10), ...square(0, 0, 10), ...square(20, 20, 10))).toHaveLength(3);
  });

  test('ignores what lies inside: a block in a large mesh, joined or not, and one at its corner', () => {
    const outer = rectangle(0, 0, 40, 40);
    expect(outlines(...square(0, 0, 40), ...square(10, 10, 5))).toEqual([outer]);
    expect(outlines(...square(0, 0, 40), ...square(10, 10, 5), wire(0, 12, 10, 12))).toEqual([outer]);
    expect(outlines(...square(0, 0, 40), ...square(0, 0, 5))).toEqual([outer]);
    expect(outlines(...square(10, 10, 5), ...square(12, 12, 1), ...square(0, 0, 40))).toEqual([outer]);
  });

  test('of a ring of meshes around an empty middle is the outside', () => {
    const ring = [...square(0, 0, 30), ...square(10, 10, 10), wire(0, 15, 10, 15), wire(20, 15, 30, 15)];
    expect(outlines(...ring)).toEqual([rectangle(0, 0, 30, 30)]);
  });

  test('closes across different depths, since it is seen from above', () => {
    const deep = [wire(0, -1, 0, 11, 1), wire(10, -1, 10, 11, 1)];
    expect(outlines(wire(-1, 0, 11, 0), wire(-1, 10, 11, 10), ...deep)).toEqual([rectangle(0, 0, 10, 10)]);
  });

  test('of wires above each other is that of one of them', () => {
    expect(
      outlines(
        ...square(0, 0, 10),
        ...lattice(1, 1, 10).map((r) => ({ ...r, to: [r.to[0], r.to[1], 1] as const })),
      ),
    ).toEqual([rectangle(0, 0, 10, 10)]);
  });

  test('of an open or a branching electrode is none', () => {
    expect(outlines(wire(0, 0, 10, 0), wire(10, 0, 10, 10), wire(10, 10, 0, 10), rod(0, 0))).toEqual([]);
    expect(outlines(rod(0, 0), rod(3, 0))).toEqual([]);
    expect(outlines()).toEqual([]);
  });

  test('an insulated conductor closes no mesh', () => {
    const [first, ...others] = square(0, 0, 10);
    expect(outlines({ ...first!, insulated: true }, ...others)).toEqual([]);
  });

  test('looks at the named conductors only', () => {
    const rows = [...square(0, 0, 10), ...square(20, 0, 10)];
    expect(meshOutlines(conductorTable(rows), [4, 5, 6, 7])).toEqual([rectangle(20, 0, 30, 10)]);
  });

  test('of a ring drawn as a polygon keeps all of its corners', () => {
    const corner = (k: number): readonly [number, number] => [
      30 * Math.cos((k * Math.PI) / 36),
      30 * Math.sin((k * Math.PI) / 36),
    ];
    const ring = Array.from({ length: 72 }, (_, k) => wire(...corner(k), ...corner(k + 1)));
    const [outline, ...others] = outlines(...ring);
    expect(others).toEqual([]);
    expect(outline).toHaveLength(72);
    // regular polygon of n corners on a circle of radius r: (n/2)·r²·sin(2π/n)
    expect(areaSquareMetres([outline!])).toBeCloseTo(36 * 900 * Math.sin(Math.PI / 36), 1);
  });

  test('is that of the meshes that are there, for any lattice with some squares added beside it', () => {
    const size = fc.integer({ min: 1, max: 6 });
    const shift = fc.integer({ min: -20, max: 20 }).map((step) => step * 256);
    fc.assert(
      fc.property(size, size, size, shift, shift, fc.boolean(), (columns, rows, beside, dx, dy, cut) => {
        const first = cut ? cutLattice(columns, rows, 4) : lattice(columns, rows, 4);
        const second = moved(lattice(beside, 1, 4), columns * 4 + 8, 0);
        const found = outlines(...moved([...first, ...second], dx, dy));
        expect(found).toEqual([
          rectangle(dx, dy, dx + columns * 4, dy + rows * 4),
          rectangle(dx + columns * 4 + 8, dy, dx + columns * 4 + 8 + beside * 4, dy + 4),
        ]);
      }),
      { seed: 20240608, numRuns: 60 },
    );
  });
});
