// The areas of a draft as the plan shows them: which, with what corners, under what name.
import type { Outcome, Point, Polygon } from '@ohmstead/study';
import { type AreaKind, areaPath, polygonsOf } from '../desk/areas.ts';
import type { Draft } from '../desk/draft.ts';
import { listAt } from '../desk/set-value.ts';
import { nearestOnLine } from './hit.ts';

export interface AreaRef {
  readonly kind: AreaKind;
  /** among the polygons of its kind */
  readonly polygon: number;
}

export interface PlanArea extends AreaRef {
  readonly corners: Polygon;
  /** `touch area`, with its number where there are several */
  readonly name: string;
}

export const AREA_KINDS: readonly AreaKind[] = ['touch', 'step', 'covering'];

export function areaWords(kind: AreaKind): string {
  return kind === 'covering' ? 'covered area' : `${kind} area`;
}

/** In the order of the study; an area with a corner that cannot be read is only in study.json. */
export function planAreas(draft: Draft): readonly PlanArea[] {
  return AREA_KINDS.flatMap((kind) => {
    const polygons = polygonsOf(draft, kind);
    return polygons.flatMap((corners, polygon): PlanArea[] => {
      if (corners.length !== listAt(draft, [...areaPath(kind), polygon]).length) return [];
      const name = polygons.length > 1 ? `${areaWords(kind)} ${polygon + 1}` : areaWords(kind);
      return [{ kind, polygon, corners, name }];
    });
  });
}

export function areaOf(areas: readonly PlanArea[], ref: AreaRef | undefined): PlanArea | undefined {
  return ref && areas.find(({ kind, polygon }) => kind === ref.kind && polygon === ref.polygon);
}

/** Polygons that hold where the study gives none of a kind; empty where it gives some, or where nothing is supposed. */
export function supposedArea({ plan, study }: Outcome, kind: AreaKind): readonly Polygon[] {
  switch (kind) {
    case 'touch':
      return plan.areasGiven.touch ? [] : plan.touchArea;
    case 'step':
      return plan.areasGiven.step ? [] : plan.stepArea;
    case 'covering':
      return study.surfacing === undefined || study.surfacing.areas !== undefined ? [] : plan.touchArea;
  }
}

/** The area an edge of which lies under a place. */
export function areaAt(areas: readonly PlanArea[], place: Point, tolerance: number): PlanArea | undefined {
  return areas.find(({ corners }) =>
    corners.some((to, k) => nearestOnLine(corners.at(k - 1)!, to, place).distance <= tolerance),
  );
}

/** A corner of an area, or the middle of one of its edges, where a new corner begins. */
export interface AreaGrip {
  /** place of the corner, or that a new one would take among the corners */
  readonly corner: number;
  readonly fresh: boolean;
  readonly at: Point;
}

/** The middle of the edge that ends at a corner; of the first corner, the one that closes the area. */
export function edgeMiddles(corners: Polygon): readonly Point[] {
  return corners.map(([x, y], k) => {
    const [px, py] = corners.at(k - 1)!;
    return [(x + px) / 2, (y + py) / 2];
  });
}

/** What of an area lies under a place: a corner before the middle of an edge. */
export function gripAt(corners: Polygon, [x, y]: Point, tolerance: number): AreaGrip | undefined {
  const nearest = (points: readonly Point[], fresh: boolean): AreaGrip | undefined => {
    let best: AreaGrip | undefined;
    let least = tolerance;
    points.forEach((at, k) => {
      const distance = Math.hypot(x - at[0], y - at[1]);
      if (distance > least) return;
      least = distance;
      // a corner on the edge that closes the area comes after the last
      best = { corner: fresh && k === 0 ? corners.length : k, fresh, at };
    });
    return best;
  };
  return nearest(corners, false) ?? nearest(edgeMiddles(corners), true);
}
