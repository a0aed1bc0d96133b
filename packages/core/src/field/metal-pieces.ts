// Horizontal metal cut at the borders of a map's cells: what lies in each cell, finest where the map is near.
import { heightOf, holds, type MapCells, placeIn, widthOf } from './map-cells.ts';
import type { SegmentGroup } from './segment-group.ts';

/** Parts of segments: from −1 at a segment's first end to 1 at its second. Shape [count] each, or longer. */
export interface MetalPieces {
  readonly count: number;
  readonly segment: Int32Array;
  readonly from: Float64Array;
  readonly to: Float64Array;
  /** level of the cell, and its column and row */
  readonly level: Int32Array;
  readonly column: Int32Array;
  readonly row: Int32Array;
  /** pieces of the finest level by place of their cell among its sources: `order[start[c]] … order[start[c + 1] − 1]` */
  readonly start: Int32Array;
  readonly order: Int32Array;
}

/** Walks each segment from cell to cell; where the map is far the cells are those of a coarser level. */
export function metalPieces(group: SegmentGroup, cells: MapCells): MetalPieces {
  let room = 2 * group.count + 16;
  let whole = new Int32Array(4 * room);
  let spans = new Float64Array(2 * room);
  let count = 0;
  for (let j = 0; j < group.count; j++) {
    const x = group.cx[j]!;
    const y = group.cy[j]!;
    const hx = group.hx[j]!;
    const hy = group.hy[j]!;
    let column = cells.column(x - hx);
    let row = cells.row(y - hy);
    let from = -1;
    for (;;) {
      let k = 0;
      while (!holds(cells.levels[k]!.near, column >> k, row >> k)) k++;
      const c = column >> k;
      const r = row >> k;
      const east = hx === 0 ? Infinity : (cells.west(k, hx > 0 ? c + 1 : c) - x) / hx;
      const north = hy === 0 ? Infinity : (cells.south(k, hy > 0 ? r + 1 : r) - y) / hy;
      const to = Math.min(1, Math.max(from, Math.min(east, north)));
      if (to > from) {
        if (count === room) {
          room *= 2;
          whole = grown(whole, new Int32Array(4 * room));
          spans = grown(spans, new Float64Array(2 * room));
        }
        whole[4 * count] = j;
        whole[4 * count + 1] = k;
        whole[4 * count + 2] = c;
        whole[4 * count + 3] = r;
        spans[2 * count] = from;
        spans[2 * count++ + 1] = to;
      }
      if (!(Math.min(east, north) < 1)) break;
      from = to;
      const within = (cell: number, at: number): number =>
        Math.min(((at + 1) << k) - 1, Math.max(at << k, cell));
      if (east <= north) {
        column = hx > 0 ? (c + 1) << k : (c << k) - 1;
        row = within(cells.row(y + to * hy), r);
      } else {
        row = hy > 0 ? (r + 1) << k : (r << k) - 1;
        column = within(cells.column(x + to * hx), c);
      }
    }
  }
  const pick = (at: number): Int32Array => Int32Array.from({ length: count }, (_, p) => whole[4 * p + at]!);
  const span = (at: number): Float64Array =>
    Float64Array.from({ length: count }, (_, p) => spans[2 * p + at]!);
  const pieces = {
    count,
    segment: pick(0),
    level: pick(1),
    column: pick(2),
    row: pick(3),
    from: span(0),
    to: span(1),
  };
  return { ...pieces, ...byCell(pieces, cells) };
}

function grown<T extends Int32Array | Float64Array>(old: T, larger: T): T {
  larger.set(old);
  return larger;
}

function byCell(
  { count, level, column, row }: Omit<MetalPieces, 'start' | 'order'>,
  cells: MapCells,
): Pick<MetalPieces, 'start' | 'order'> {
  const { sources } = cells.levels[0]!;
  const start = new Int32Array(widthOf(sources) * heightOf(sources) + 1);
  for (let p = 0; p < count; p++) if (level[p] === 0) start[placeIn(sources, column[p]!, row[p]!) + 1]!++;
  for (let c = 1; c < start.length; c++) start[c]! += start[c - 1]!;
  const order = new Int32Array(start.at(-1)!);
  const next = start.slice();
  for (let p = 0; p < count; p++)
    if (level[p] === 0) order[next[placeIn(sources, column[p]!, row[p]!)]!++] = p;
  return { start, order };
}
