// What two depth classes share: their images, and the tables that make an entry cost the same whatever their number.
import type { SegmentMesh } from '../geometry/segments.ts';
import type { ImageList, SoilImages } from '../soil/image-list.ts';
import { type DepthClass, depthClasses } from './depth-classes.ts';
import { collapsed, type DepthNodes, type DepthRange, depthNodes, nodeWeights } from './depth-nodes.ts';
import { farTable } from './far-table.ts';
import { smoothOrder } from './pair-potential.ts';
import type { RadialTable } from './radial-table.ts';
import { smoothKernel } from './smooth-kernel.ts';

export interface DepthPair {
  readonly list: ImageList;
  /** images that neither rest nor nodes hold */
  readonly singly: ImageList;
  /** mean of all images over two far segments; absent where too few pairs would use it */
  readonly far?: RadialTable;
  /** the same of images that keep away from both depths, for near segments too */
  readonly rest?: RadialTable;
  /** these images for two vertical classes: weights of the layers' nodes */
  readonly nodes?: DepthNodes;
  readonly weights?: Float64Array;
}

export interface DepthPairs {
  /** classes, then one for the other segments of each layer */
  readonly count: number;
  /** shape [mesh.count] */
  readonly classOf: Int32Array;
  /** whether a class is of vertical segments; shape [count] */
  readonly upright: readonly boolean[];
  /** distance in plan of a point from which tables of all images of a vertical segment hold, m */
  readonly uprightLeast: number;
  /** the same pair at [a, b] and [b, a]; shape [count × count] */
  readonly pairs: readonly DepthPair[];
}

/** Most classes that get tables, the most populous first: the pairs of classes stay below ten thousand. */
const MOST_CLASSES = 128;
/** Pairs of segments that make a table worth its building: 100 images at 1 500 places against 100 images at 4 points. */
const TABLE_PAIRS = 1000;
/** The same for a table put together from nodes, which takes a tenth. */
const COLLAPSED_PAIRS = 100;
/** Pairs with vertical segments that make nodes for their layers worth building. */
const NODES_PAIRS = 8000;
/** Vertical pairs that make a table of their own worth putting together, against reading nodes. */
const UPRIGHT_TABLE_PAIRS = 4000;
/** Largest error of a table that is used: a hundredth of what an entry may err. */
const TABLE_ERROR = 1e-8;
/** Tables from which others are made reach this much farther: those end up to two bins past the reach, 1.12 of it. */
const WIDER = 1.2;
/** Least distance in plan of a vertical segment's tables of all images, over the reach: few pairs are nearer, and half of the bins would serve them. */
const UPRIGHT_LEAST = 0.01;

interface Class extends DepthClass {
  /** shortest and mean length, m */
  readonly shortest: number;
  readonly typical: number;
}

/** @param reach largest √(r² + a²), r the distance in plan between two points of the metal and a a radius, m */
export function depthPairs(mesh: SegmentMesh, images: SoilImages, reach: number): DepthPairs {
  const { classes, classOf } = chosenClasses(mesh);
  const layers = images.soil.layers.length;
  const count = classes.length + layers;
  for (let i = 0; i < mesh.count; i++) if (classOf[i]! < 0) classOf[i] = classes.length + mesh.layer[i]!;
  const layerOf = (at: number): number => (at < classes.length ? classes[at]!.layer : at - classes.length);
  const nodesOf = layerNodes(classes, images, reach);
  const pairs: DepthPair[] = new Array(count * count);
  for (let a = 0; a < count; a++)
    for (let b = 0; b <= a; b++) {
      // the shallower layer is the source
      const [s, f] = layerOf(a) <= layerOf(b) ? [a, b] : [b, a];
      const list = images.list(layerOf(s), layerOf(f));
      const [source, field] = [classes[s], classes[f]];
      const pair = source === undefined || field === undefined ? { list, singly: list } : classPair(list, field, source, nodesOf(source.layer, field.layer), reach); // biome-ignore format: one choice
      pairs[a * count + b] = pair;
      pairs[b * count + a] = pair;
    }
  return { count, classOf, uprightLeast: UPRIGHT_LEAST * reach, upright: Array.from({ length: count }, (_, at) => classes[at]?.vertical ?? false), pairs }; // biome-ignore format: one row a field
}

/** The most populous classes, and the class of each segment; −1 for one that slopes or is alone. */
function chosenClasses(mesh: SegmentMesh): { classes: Class[]; classOf: Int32Array } {
  const { classes, of } = depthClasses(mesh);
  const members = new Int32Array(classes.length);
  const shortest = new Float64Array(classes.length).fill(Number.POSITIVE_INFINITY);
  const total = new Float64Array(classes.length);
  let leaking = 0;
  for (let i = 0; i < mesh.count; i++) {
    if (mesh.leaking[i] !== 1) continue;
    leaking++;
    const at = of[i]!;
    if (at < 0) continue;
    members[at]!++;
    total[at]! += mesh.length[i]!;
    shortest[at] = Math.min(shortest[at]!, mesh.length[i]!);
  }
  const chosen = Array.from(classes.keys())
    .filter((at) => members[at]! * leaking >= COLLAPSED_PAIRS)
    .sort((a, b) => members[b]! - members[a]! || a - b)
    .slice(0, MOST_CLASSES);
  const placeOf = new Int32Array(classes.length).fill(-1);
  chosen.forEach((at, place) => {
    placeOf[at] = place;
  });
  return {
    classes: chosen.map((at) => ({
      ...classes[at]!,
      members: members[at]!,
      shortest: shortest[at]!,
      typical: total[at]! / members[at]!,
    })),
    classOf: of.map((at) => (at < 0 ? -1 : placeOf[at]!)),
  };
}

function pairCount(a: Class, b: Class): number {
  return a === b ? (a.members * (a.members + 1)) / 2 : a.members * b.members;
}

/** Nodes made for a soil: meshes of one electrode, coarse to fine, have the same depths. */
const known = new WeakMap<SoilImages, Map<string, DepthNodes | undefined>>();

/** Nodes by source and field layer; undefined where they would not pay. */
function layerNodes(
  classes: readonly Class[],
  images: SoilImages,
  reach: number,
): (s: number, f: number) => DepthNodes | undefined {
  const made = known.get(images) ?? new Map<string, DepthNodes | undefined>();
  known.set(images, made);
  const here = new Map<string, DepthNodes | undefined>();
  const find = (s: number, f: number): DepthNodes | undefined => {
    const [sources, fields] = [s, f].map((layer) => classes.filter((one) => one.layer === layer));
    let uprightPairs = 0;
    for (const a of sources!)
      for (const b of fields!) if (a.vertical || b.vertical) uprightPairs += a.members * b.members;
    if (s === f) uprightPairs /= 2;
    if (uprightPairs < NODES_PAIRS) return undefined;
    const [source, field] = [extent(sources!), extent(fields!)];
    const key = [s, f, source.z1, source.z2, field.z1, field.z2, reach].join(' ');
    if (!made.has(key)) made.set(key, depthNodes(images.list(s, f), field, source, WIDER * reach));
    return made.get(key);
  };
  return (s, f) => {
    const key = `${s} ${f}`;
    if (!here.has(key)) here.set(key, find(s, f));
    return here.get(key);
  };
}

function extent(classes: readonly Class[]): DepthRange {
  return {
    z1: classes.reduce((least, one) => Math.min(least, one.z1), Number.POSITIVE_INFINITY),
    z2: classes.reduce((most, one) => Math.max(most, one.z2), Number.NEGATIVE_INFINITY),
  };
}

function classPair(
  list: ImageList,
  field: Class,
  source: Class,
  nodes: DepthNodes | undefined,
  reach: number,
): DepthPair {
  const size = pairCount(field, source);
  const primary = range(0, list.primaryCount);
  const smooth = list.count > list.primaryCount;
  const plain = { list, singly: list };
  if (!field.vertical && !source.vertical) {
    if (size < TABLE_PAIRS) return plain;
    const others = range(list.primaryCount, list.count);
    const height = (k: number): number => Math.abs(field.z1 - list.sign[k]! * source.z1 - list.offset[k]!);
    // a primary image that is as far away as the others costs nothing among them
    const away = Math.min(
      Math.max(field.typical, source.typical),
      others.reduce((least, k) => Math.min(least, height(k)), Number.POSITIVE_INFINITY),
    );
    const folded = primary.filter((k) => height(k) >= away);
    const rest = smoothKernel(list, [...folded, ...others], source, field.z1, WIDER * reach);
    if (rest !== undefined && !(rest.error <= TABLE_ERROR)) return plain;
    const singly = primary.filter((k) => height(k) < away);
    return withFar({ list, singly: someImages(list, singly), ...(rest && { rest }) }, field, source, reach);
  }
  const weights = nodes && weightsOf(nodes, field, source);
  if (smooth && (nodes === undefined || weights === undefined)) return plain;
  const singly = smooth ? primaryImages(list) : list;
  if (
    size >= (field.vertical && source.vertical ? UPRIGHT_TABLE_PAIRS : smooth ? COLLAPSED_PAIRS : TABLE_PAIRS)
  ) {
    const rest = nodes && weights && collapsed(nodes, weights);
    return withFar({ list, singly, ...(rest && { rest }) }, field, source, reach);
  }
  return { list, singly, ...(nodes && weights && { nodes, weights }) };
}

function range(from: number, to: number): number[] {
  return Array.from({ length: to - from }, (_, k) => from + k);
}

const primaries = new WeakMap<ImageList, ImageList>();

/** The primary images of a list, the same object each time. */
function primaryImages(list: ImageList): ImageList {
  const made = primaries.get(list) ?? someImages(list, range(0, list.primaryCount));
  primaries.set(list, made);
  return made;
}

function someImages(list: ImageList, chosen: readonly number[]): ImageList {
  return {
    ...list,
    count: chosen.length,
    primaryCount: chosen.length,
    sign: Int8Array.from(chosen, (k) => list.sign[k]!),
    offset: Float64Array.from(chosen, (k) => list.offset[k]!),
    weight: Float64Array.from(chosen, (k) => list.weight[k]!),
  };
}

/** Weights for two classes; undefined where an extent is too long for points on the nearest image. */
function weightsOf(nodes: DepthNodes, field: Class, source: Class): Float64Array | undefined {
  const longer = Math.max(field.z2 - field.z1, source.z2 - source.z1);
  const order = smoothOrder(nodes.smoothness ** 2, longer);
  return order === 0 ? undefined : nodeWeights(nodes, field, source, (length) => smoothOrder(nodes.smoothness ** 2, length)); // biome-ignore format: one choice
}

/** Adds the table of all images, if it is good enough. */
function withFar(pair: DepthPair, field: Class, source: Class, reach: number): DepthPair {
  const least = field.vertical || source.vertical ? UPRIGHT_LEAST * reach : 0;
  const far = farTable(pair.singly, pair.rest, field, source, reach, least);
  return far.error <= TABLE_ERROR ? { ...pair, far } : pair;
}
