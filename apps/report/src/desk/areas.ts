// Polygons of the assessed areas and of the covering: added, removed, and their corners moved.
import { isList, type JsonValue, type Point, type Polygon } from '@ohmstead/study';
import type { Draft } from './draft.ts';
import type { JsonPath } from './path.ts';
import { insertItem, listAt, removeItem, setValue } from './set-value.ts';

export type AreaKind = 'touch' | 'step' | 'covering';

/** Fewest corners of an area. */
const FEWEST_CORNERS = 3;

/** Where the polygons of a kind stand in study.json. */
export function areaPath(kind: AreaKind): JsonPath {
  return kind === 'covering' ? ['surfacing', 'areas'] : ['areas', kind];
}

function pointOf(value: JsonValue): Point | undefined {
  if (!isList(value)) return undefined;
  const [x, y] = value;
  return typeof x === 'number' && typeof y === 'number' ? [x, y] : undefined;
}

/** Polygons of a kind as they can be drawn; empty where none is given. A corner that is no point is passed over. */
export function polygonsOf(draft: Draft, kind: AreaKind): readonly Polygon[] {
  return listAt(draft, areaPath(kind)).map((area) =>
    isList(area) ? area.map(pointOf).filter((point) => point !== undefined) : [],
  );
}

/** Adds a polygon after the others of its kind. */
export function addPolygon(draft: Draft, kind: AreaKind, corners: Polygon): Draft {
  const path = areaPath(kind);
  return insertItem(draft, path, listAt(draft, path).length, corners);
}

/** Removes a polygon; with the last of its kind gone, the default area holds again. */
export function removePolygon(draft: Draft, kind: AreaKind, polygon: number): Draft {
  return removeItem(draft, areaPath(kind), polygon);
}

/** Replaces every corner of a polygon. */
export function setPolygon(draft: Draft, kind: AreaKind, polygon: number, corners: Polygon): Draft {
  return setValue(draft, [...areaPath(kind), polygon], corners);
}

/** Moves one corner. */
export function setCorner(draft: Draft, kind: AreaKind, polygon: number, corner: number, to: Point): Draft {
  return setValue(draft, [...areaPath(kind), polygon, corner], to);
}

/** Adds a corner before the corner `before`, or after the last one. */
export function addCorner(
  draft: Draft,
  kind: AreaKind,
  polygon: number,
  before: number,
  corner: Point,
): Draft {
  return insertItem(draft, [...areaPath(kind), polygon], before, corner);
}

/** Removes a corner; a triangle, which cannot spare one, is removed whole. */
export function removeCorner(draft: Draft, kind: AreaKind, polygon: number, corner: number): Draft {
  const path = [...areaPath(kind), polygon];
  if (listAt(draft, path).length <= FEWEST_CORNERS) return removePolygon(draft, kind, polygon);
  return removeItem(draft, path, corner);
}
