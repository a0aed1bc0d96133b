// The leakage matrix: mutual resistance between every two leaking segments, Galerkin, symmetric positive definite.
import type { SegmentMesh } from '../geometry/segments.ts';
import type { Product, Products } from '../numerics/conjugate-gradients.ts';
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import type { PackedLower } from '../numerics/packed-cholesky.ts';
import { packedOperator } from '../numerics/packed-operator.ts';
import { packedStore } from '../numerics/packed-store.ts';
import type { ImageList, SoilImages } from '../soil/image-list.ts';
import { type DepthClasses, depthClasses } from './depth-classes.ts';
import { type DepthPair, fillFarEntries } from './leakage-kernel.ts';
import { CLOSED_FORM_RATIO, gaussOrder, imagePairSum } from './pair-potential.ts';
import { type RadialTable, radialValue, scaledTable } from './radial-table.ts';
import { smoothImages, smoothKernel } from './smooth-kernel.ts';

/** The leakage matrix behind one interface, however it is stored. */
export interface LeakageMatrix {
  /** leaking segments, as indices into the mesh; shape [size] */
  readonly segments: Int32Array;
  readonly size: number;
  /** R_ii, Ω; shape [size] */
  readonly diagonal: Float64Array;
  /** writes R x, V */
  readonly multiply: Product;
  /** the same for several vectors in one pass over the matrix, where it is cheaper so */
  readonly multiplyAll?: Products;
  /** writes an approximate R⁻¹ r that keeps iterations few; symmetric positive definite */
  precondition(r: Float64Array, into: Float64Array): void;
  /** R_ij, Ω: mean potential of segment i per ampere leaked evenly by segment j; packed lower triangle, where it is stored whole */
  readonly entries?: PackedLower;
}

export interface DenseLeakageMatrix extends LeakageMatrix {
  readonly entries: PackedLower;
}

/** Pairs of segments that make a table for their two depth classes worth its building. */
const TABLE_PAIRS = 400;
/** Gauss points for the smooth images of a near pair, by their distance over the longer length; below the last, image by image. */
const NEAR_ORDERS: readonly (readonly [ratio: number, order: number])[] = [[1.987, 4], [0.993, 6], [0.497, 10]]; // biome-ignore format: one pair a step

/**
 * Assembles the matrix: R_ij = factor·Σ_images weight·(1/L_i L_j)∬ ds dt/√(r² + a²), a the larger radius.
 * Primary images: closed double integral when near, Gauss points chosen by distance over length when far. The smooth
 * rest: one table in horizontal distance for each pair of depths, so that the number of images costs nothing.
 */
export function leakageMatrix(mesh: SegmentMesh, images: SoilImages): DenseLeakageMatrix {
  const segments = leakingSegments(mesh);
  const size = segments.length;
  const store = packedStore(size);
  const { entries } = store;
  const classes = depthClasses(mesh);
  const tables = tableCache(mesh, images, classes);
  const points = gaussPoints(mesh);
  const pairOf = (i: number, j: number): DepthPair => {
    const field = mesh.layer[i]! >= mesh.layer[j]! ? i : j;
    const source = field === i ? j : i;
    const list = images.list(mesh.layer[source]!, mesh.layer[field]!);
    const table = list.count === list.primaryCount ? undefined : tables.of(source, field, list);
    return { list, table, fieldDepth: mesh.z1[field]!, sourceDepth: mesh.z1[source]! };
  };
  fillFarEntries(mesh, classes, segments, pairOf, entries, (row, column) => {
    entries[(row * (row + 1)) / 2 + column] = entry(mesh, images, classes, tables, points, segments[row]!, segments[column]!); // biome-ignore format: one entry
  });
  const diagonal = Float64Array.from({ length: size }, (_, i) => entries[(i * (i + 3)) / 2]!);
  return {
    segments,
    size,
    entries,
    diagonal,
    ...packedOperator(store),
  };
}

/** R_ij of two segments of the mesh, Ω. */
export type LeakageEntry = (i: number, j: number) => number;

/** Prepares the tables and points from which single entries of the leakage matrix are made. */
export function leakageEntries(mesh: SegmentMesh, images: SoilImages): LeakageEntry {
  const classes = depthClasses(mesh);
  const tables = tableCache(mesh, images, classes);
  const points = gaussPoints(mesh);
  return (i, j) => entry(mesh, images, classes, tables, points, i, j);
}

/**
 * Fills a block of the leakage matrix, Ω, row after row; rows and columns are indices into the mesh.
 * `into` shape [rows × columns]
 */
export type LeakageBlocks = (rows: Int32Array, columns: Int32Array, into: Float64Array) => void;

/** Prepares the tables and points from which blocks of the leakage matrix are made. */
export function leakageBlocks(mesh: SegmentMesh, images: SoilImages): LeakageBlocks {
  const entryOf = leakageEntries(mesh, images);
  return (rows, columns, into) => {
    for (let r = 0; r < rows.length; r++)
      for (let c = 0; c < columns.length; c++) into[r * columns.length + c] = entryOf(rows[r]!, columns[c]!);
  };
}

export function leakingSegments(mesh: SegmentMesh): Int32Array {
  const found: number[] = [];
  for (let i = 0; i < mesh.count; i++) if (mesh.leaking[i] === 1) found.push(i);
  return Int32Array.from(found);
}

function entry(
  mesh: SegmentMesh,
  images: SoilImages,
  classes: DepthClasses,
  tables: TableCache,
  points: GaussPoints,
  i: number,
  j: number,
): number {
  // the shallower layer is the source, so that R_ij and R_ji are the same sum
  const field = mesh.layer[i]! >= mesh.layer[j]! ? i : j;
  const source = field === i ? j : i;
  const list = images.list(mesh.layer[source]!, mesh.layer[field]!);
  const dx = (mesh.x1[i]! + mesh.x2[i]! - mesh.x1[j]! - mesh.x2[j]!) / 2;
  const dy = (mesh.y1[i]! + mesh.y2[i]! - mesh.y1[j]! - mesh.y2[j]!) / 2;
  const dz = (mesh.z1[i]! + mesh.z2[i]! - mesh.z1[j]! - mesh.z2[j]!) / 2;
  const distance = Math.sqrt(dx * dx + dy * dy + dz * dz);
  const longer = Math.max(mesh.length[i]!, mesh.length[j]!);
  const table = list.count === list.primaryCount ? undefined : tables.of(source, field, list);
  if (distance < CLOSED_FORM_RATIO * longer) {
    const primary = imagePairSum(mesh, field, source, list, 0, list.primaryCount);
    const rest =
      list.count === list.primaryCount
        ? 0
        : nearRest(mesh, classes, field, source, list, table, distance / longer, longer);
    return list.factor * (primary + rest);
  }
  const orderF = gaussOrder(distance / mesh.length[field]!);
  const orderS = gaussOrder(distance / mesh.length[source]!);
  const radius = Math.max(mesh.radius[i]!, mesh.radius[j]!);
  const aa = radius * radius;
  if (table === undefined)
    return list.factor * farSum(points, field, source, orderF, orderS, list, list.count, aa, undefined);
  if (classes.classes[classes.of[source]!]!.vertical === classes.classes[classes.of[field]!]!.vertical)
    return list.factor * farSum(points, field, source, orderF, orderS, list, list.primaryCount, aa, table);
  return (
    list.factor *
    (farSum(points, field, source, orderF, orderS, list, list.primaryCount, aa, undefined) +
      tableMean(mesh, classes, field, source, orderF, orderS, table))
  );
}

/** Double Gauss sum over two far segments: images before `count` one by one, the rest by the table. */
function farSum(
  points: GaussPoints,
  field: number,
  source: number,
  orderF: number,
  orderS: number,
  list: ImageList,
  count: number,
  aa: number,
  table: RadialTable | undefined,
): number {
  const { weight, sign, offset } = list;
  const pf = points[orderF]!;
  const ps = points[orderS]!;
  const wf = pf.weights;
  const ws = ps.weights;
  let sum = 0;
  for (let a = 0; a < orderF; a++) {
    const f = field * orderF + a;
    const x = pf.x[f]!;
    const y = pf.y[f]!;
    const z = pf.z[f]!;
    for (let b = 0; b < orderS; b++) {
      const s = source * orderS + b;
      const dx = x - ps.x[s]!;
      const dy = y - ps.y[s]!;
      const rr = dx * dx + dy * dy;
      const zs = ps.z[s]!;
      let value = table === undefined ? 0 : radialValue(table, rr);
      for (let k = 0; k < count; k++) {
        const h = z - sign[k]! * zs - offset[k]!;
        value += weight[k]! / Math.sqrt(rr + h * h + aa);
      }
      sum += wf[a]! * ws[b]! * value;
    }
  }
  return sum;
}

/** Smooth images of a pair whose direct distance is short. */
function nearRest(
  mesh: SegmentMesh,
  classes: DepthClasses,
  field: number,
  source: number,
  list: ImageList,
  table: RadialTable | undefined,
  ratio: number,
  longer: number,
): number {
  if (table !== undefined) {
    const smooth = Math.hypot(ratio, table.smoothness / longer);
    for (const [least, order] of NEAR_ORDERS)
      if (smooth >= least) return tableMean(mesh, classes, field, source, order, order, table);
  }
  return imagePairSum(mesh, field, source, list, list.primaryCount, list.count);
}

/** Mean of a table over two segments; a vertical one is a single place, its extent is in the table. */
function tableMean(
  mesh: SegmentMesh,
  classes: DepthClasses,
  field: number,
  source: number,
  orderF: number,
  orderS: number,
  table: RadialTable,
): number {
  const gf = gaussLegendre(classes.classes[classes.of[field]!]!.vertical ? 1 : orderF);
  const gs = gaussLegendre(classes.classes[classes.of[source]!]!.vertical ? 1 : orderS);
  let sum = 0;
  for (let a = 0; a < gf.points.length; a++) {
    const x = mesh.x1[field]! + gf.points[a]! * (mesh.x2[field]! - mesh.x1[field]!);
    const y = mesh.y1[field]! + gf.points[a]! * (mesh.y2[field]! - mesh.y1[field]!);
    for (let b = 0; b < gs.points.length; b++) {
      const dx = x - mesh.x1[source]! - gs.points[b]! * (mesh.x2[source]! - mesh.x1[source]!);
      const dy = y - mesh.y1[source]! - gs.points[b]! * (mesh.y2[source]! - mesh.y1[source]!);
      sum += gf.weights[a]! * gs.weights[b]! * radialValue(table, dx * dx + dy * dy);
    }
  }
  return sum;
}

interface TableCache {
  /** table for a source and a field segment; undefined where image by image is cheaper or the only way */
  of(source: number, field: number, list: ImageList): RadialTable | undefined;
}

function tableCache(mesh: SegmentMesh, images: SoilImages, classes: DepthClasses): TableCache {
  const count = classes.classes.length;
  const made: (RadialTable | undefined | null)[] = new Array(count * count).fill(null);
  const reach = planReach(mesh);
  return {
    of(source, field, list) {
      const cs = classes.of[source]!;
      const cf = classes.of[field]!;
      if (cs < 0 || cf < 0) return undefined;
      const known = made[cs * count + cf];
      if (known !== null) return known;
      const s = classes.classes[cs]!;
      const f = classes.classes[cf]!;
      let table: RadialTable | undefined;
      if (!(s.vertical && f.vertical) && s.members * f.members >= TABLE_PAIRS) {
        // a vertical field segment seen from a horizontal source: the same mean by reciprocity
        const chosen = smoothImages(list);
        table = f.vertical
          ? smoothKernel(images.list(f.layer, s.layer), chosen, f, s.z1, reach)
          : smoothKernel(list, chosen, s, f.z1, reach);
        if (table !== undefined && f.vertical)
          table = scaledTable(table, images.list(f.layer, s.layer).factor / list.factor);
      }
      made[cs * count + cf] = table;
      return table;
    },
  };
}

/** Diagonal of the mesh's bounding box in plan, m. */
export function planReach(mesh: SegmentMesh): number {
  let west = Number.POSITIVE_INFINITY;
  let east = Number.NEGATIVE_INFINITY;
  let south = Number.POSITIVE_INFINITY;
  let north = Number.NEGATIVE_INFINITY;
  for (let i = 0; i < mesh.count; i++) {
    west = Math.min(west, mesh.x1[i]!, mesh.x2[i]!);
    east = Math.max(east, mesh.x1[i]!, mesh.x2[i]!);
    south = Math.min(south, mesh.y1[i]!, mesh.y2[i]!);
    north = Math.max(north, mesh.y1[i]!, mesh.y2[i]!);
  }
  return Math.hypot(east - west, north - south);
}

/** Gauss points of every segment, by order (index 1 to 4): coordinates shape [count × order]. */
type GaussPoints = readonly (
  | { x: Float64Array; y: Float64Array; z: Float64Array; weights: Float64Array }
  | undefined
)[];

function gaussPoints(mesh: SegmentMesh): GaussPoints {
  return [0, 1, 2, 3, 4].map((order) => {
    if (order === 0) return undefined;
    const { points, weights } = gaussLegendre(order);
    const x = new Float64Array(mesh.count * order);
    const y = new Float64Array(mesh.count * order);
    const z = new Float64Array(mesh.count * order);
    for (let i = 0; i < mesh.count; i++)
      for (let a = 0; a < order; a++) {
        const t = points[a]!;
        x[i * order + a] = mesh.x1[i]! + t * (mesh.x2[i]! - mesh.x1[i]!);
        y[i * order + a] = mesh.y1[i]! + t * (mesh.y2[i]! - mesh.y1[i]!);
        z[i * order + a] = mesh.z1[i]! + t * (mesh.z2[i]! - mesh.z1[i]!);
      }
    return { x, y, z, weights };
  });
}
