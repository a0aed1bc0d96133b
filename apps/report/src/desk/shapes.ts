// What is drawn, as conductors: a line, a rod, a rectangular mesh; each under a free id.
import type { Point } from '@ohmstead/study';
import type { Conductor } from './conductor.ts';

/** What a drawn conductor is made of and belongs to. */
export interface Make {
  /** m */
  readonly diameter: number;
  readonly material?: string | undefined;
  readonly electrode?: string | undefined;
}

/** Digits of the number in an id: `R-01`. */
const ID_DIGITS = 2;

/** Free ids `prefix-01`, `prefix-02`, …, past those that are taken. */
export function freeIds(taken: ReadonlySet<string>, prefix: string, count: number): readonly string[] {
  const ids: string[] = [];
  for (let n = 1; ids.length < count; n++) {
    const id = `${prefix}-${String(n).padStart(ID_DIGITS, '0')}`;
    if (!taken.has(id)) ids.push(id);
  }
  return ids;
}

/** A straight conductor between two places at one depth, m. */
export function line(
  from: Point,
  to: Point,
  depth: number,
  make: Make,
  taken: ReadonlySet<string>,
): Conductor {
  return {
    id: freeIds(taken, 'L', 1)[0],
    ...{ x1: from[0], y1: from[1], depth1: depth, x2: to[0], y2: to[1], depth2: depth },
    ...make,
  };
}

/** A rod driven at a place from the depth of its top, m. */
export function rod(
  at: Point,
  { top, length }: { readonly top: number; readonly length: number },
  make: Make,
  taken: ReadonlySet<string>,
): Conductor {
  return {
    id: freeIds(taken, 'R', 1)[0],
    ...{ x1: at[0], y1: at[1], depth1: top, x2: at[0], y2: at[1], depth2: top + length },
    ...make,
  };
}

/** A rectangle of meshes, its sides east and north. */
export interface MeshShape {
  /** two corners opposite each other, m */
  readonly from: Point;
  readonly to: Point;
  readonly depth: number;
  /** meshes from west to east and from south to north, at least 1 */
  readonly nx: number;
  readonly ny: number;
}

/**
 * The conductors of a rectangular mesh, whole from edge to edge: where they cross they are joined.
 * @returns ny + 1 conductors from west to east, from the south up (`EW-…`), then nx + 1 from south to north (`NS-…`)
 */
export function mesh(shape: MeshShape, make: Make, taken: ReadonlySet<string>): readonly Conductor[] {
  const { from, to, depth, nx, ny } = shape;
  const [x1, x2] = [Math.min(from[0], to[0]), Math.max(from[0], to[0])];
  const [y1, y2] = [Math.min(from[1], to[1]), Math.max(from[1], to[1])];
  const divided = (a: number, b: number, n: number): readonly number[] =>
    Array.from({ length: n + 1 }, (_, i) => (i === n ? b : a + ((b - a) * i) / n));
  const depths = { depth1: depth, depth2: depth };
  const [ewIds, nsIds] = [freeIds(taken, 'EW', ny + 1), freeIds(taken, 'NS', nx + 1)];
  return [
    ...divided(y1, y2, ny).map((y, i) => ({ id: ewIds[i], x1, y1: y, x2, y2: y, ...depths, ...make })),
    ...divided(x1, x2, nx).map((x, i) => ({ id: nsIds[i], x1: x, y1, x2: x, y2, ...depths, ...make })),
  ];
}
