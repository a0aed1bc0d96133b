// Far entries of the leakage matrix between horizontal segments, by the compiled kernel.
import type { SegmentMesh } from '../geometry/segments.ts';
import { doublesAt, kernelOf, place } from '../kernels/instance.ts';
import { leakageBytes } from '../kernels/leakage-bytes.ts';
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import type { ImageList } from '../soil/image-list.ts';
import type { DepthClasses } from './depth-classes.ts';
import { CLOSED_FORM_RATIO, GAUSS_RATIOS } from './pair-potential.ts';
import type { RadialTable } from './radial-table.ts';

/** What two segments of two depth classes share. */
export interface DepthPair {
  readonly list: ImageList;
  readonly table: RadialTable | undefined;
  /** depths of the field and the source segment, m */
  readonly fieldDepth: number;
  readonly sourceDepth: number;
}

/** Highest order of a rule, and doubles it takes: points, then weights. */
const ORDERS = 4;

/**
 * Fills the entries that the kernel can: both segments exactly horizontal, and apart.
 * @param segments leaking segments, rows and columns of the packed triangle
 * @param pairOf what two segments share, by their classes alone
 * @param entries receives the far entries
 * @param left called with row and column of each entry that is not filled
 */
export function fillFarEntries(
  mesh: SegmentMesh,
  classes: DepthClasses,
  segments: Int32Array,
  pairOf: (i: number, j: number) => DepthPair,
  entries: Float64Array,
  left: (row: number, column: number) => void,
): void {
  const kernel = kernelOf(leakageBytes);
  const members: number[][] = classes.classes.map(() => []);
  const others: number[] = [];
  segments.forEach((i, row) => {
    const own = classes.of[i]!;
    if (kernel !== undefined && own >= 0 && mesh.z1[i] === mesh.z2[i]) members[own]!.push(row);
    else others.push(row);
  });
  const plain = new Uint8Array(segments.length);
  for (const row of others) plain[row] = 1;
  for (let row = 0; row < segments.length; row++)
    for (let column = 0; column <= row; column++)
      if (plain[row] === 1 || plain[column] === 1) left(row, column);
  if (kernel === undefined) return;
  const level = members.filter((rows) => rows.length > 0);
  for (const rows of level)
    for (const columns of level) {
      const pair = pairOf(segments[rows[0]!]!, segments[columns[0]!]!);
      const { table, list } = pair;
      const direct = table === undefined ? list.count : list.primaryCount;
      const arrays = [
        packed(mesh, segments, rows),
        packed(mesh, segments, columns),
        table?.bins ?? new Float64Array(0),
        heights(pair, direct),
        RULES,
        GAUSS_RATIOS.map((ratio) => ratio * ratio),
        new Float64Array(columns.length),
      ];
      const at = place(kernel, arrays);
      const [a = 0, b = 0, t = 0, h = 0, g = 0, r = 0, o = 0] = at ?? [];
      const apart = (pair.fieldDepth - pair.sourceDepth) ** 2;
      const closed = CLOSED_FORM_RATIO ** 2;
      if (at !== undefined)
        kernel.call('depths', table === undefined ? 0 : t, table?.perSquare ?? 0, h, direct, list.factor, apart, g, closed, r); // biome-ignore format: one call
      const found = at === undefined ? arrays.at(-1)!.fill(Number.NaN) : doublesAt(kernel, o, columns.length);
      let count = 0;
      rows.forEach((row, k) => {
        while (count < columns.length && columns[count]! <= row) count++;
        if (at !== undefined) kernel.call('row', a + k * 8 * SEGMENT, b, count, o);
        const start = (row * (row + 1)) / 2;
        for (let c = 0; c < count; c++) {
          const value = found[c]!;
          const column = columns[c]!;
          if (Number.isNaN(value)) left(row, column);
          else entries[start + column] = value;
        }
      });
    }
}

/** Doubles of a segment: centre, half vector, length, radius. */
const SEGMENT = 6;

function packed(mesh: SegmentMesh, segments: Int32Array, rows: readonly number[]): Float64Array {
  const found = new Float64Array(rows.length * SEGMENT);
  rows.forEach((row, k) => {
    const i = segments[row]!;
    const [x1, y1, x2, y2] = [mesh.x1[i]!, mesh.y1[i]!, mesh.x2[i]!, mesh.y2[i]!];
    const own = [
      (x1 + x2) / 2,
      (y1 + y2) / 2,
      (x2 - x1) / 2,
      (y2 - y1) / 2,
      mesh.length[i]!,
      mesh.radius[i]!,
    ];
    found.set(own, k * SEGMENT);
  });
  return found;
}

/** Weight and squared height of the images taken one by one, each twice. */
function heights({ list, fieldDepth, sourceDepth }: DepthPair, count: number): Float64Array {
  const found = new Float64Array(count * 4);
  for (let k = 0; k < count; k++) {
    const h = fieldDepth - list.sign[k]! * sourceDepth - list.offset[k]!;
    found.set([list.weight[k]!, list.weight[k]!, h * h, h * h], 4 * k);
  }
  return found;
}

/** Rules of order 0 (none) to 4. */
const RULES: Float64Array = rules();

function rules(): Float64Array {
  const found = new Float64Array((ORDERS + 1) * 2 * ORDERS);
  for (let order = 1; order <= ORDERS; order++) {
    const { points, weights } = gaussLegendre(order);
    for (let k = 0; k < ORDERS; k++) {
      found[order * 2 * ORDERS + k] = 2 * points[Math.min(k, order - 1)]! - 1;
      found[order * 2 * ORDERS + ORDERS + k] = k < order ? weights[k]! : 0;
    }
  }
  return found;
}
