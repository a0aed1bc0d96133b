// What editing an area does to the draft, with words for undo.
import { place } from '@ohmstead/sheet';
import type { DisplayUnits, Point, Polygon } from '@ohmstead/study';
import {
  type AreaKind,
  addCorner,
  addPolygon,
  polygonsOf,
  removeCorner,
  removePolygon,
  setCorner,
} from '../desk/areas.ts';
import type { Draft } from '../desk/draft.ts';
import { complaintLine } from '../desk/paste-complaint.ts';
import { pasteCorners } from '../desk/paste-into.ts';
import { type AreaGrip, areaWords, type PlanArea } from './plan-areas.ts';

export interface AreaEdit {
  readonly draft: Draft;
  readonly label: string;
}

/** A corner moved to a place, or a new one set there. */
export function cornerSet(
  draft: Draft,
  { kind, polygon, name }: PlanArea,
  { corner, fresh }: Pick<AreaGrip, 'corner' | 'fresh'>,
  to: Point,
  units: DisplayUnits,
): AreaEdit {
  const told = place(to[0], to[1], units);
  return fresh
    ? {
        draft: addCorner(draft, kind, polygon, corner, to),
        label: `corner added to the ${name} at ${told}`,
      }
    : {
        draft: setCorner(draft, kind, polygon, corner, to),
        label: `corner ${corner + 1} of the ${name} moved to ${told}`,
      };
}

/** A corner gone; a triangle goes whole. */
export function cornerRemoved(draft: Draft, area: PlanArea, corner: number): AreaEdit {
  const { kind, polygon, name } = area;
  const next = removeCorner(draft, kind, polygon, corner);
  const whole = polygonsOf(next, kind).length < polygonsOf(draft, kind).length;
  return {
    draft: next,
    label: whole ? `${name} removed` : `corner ${corner + 1} of the ${name} removed`,
  };
}

export function areaRemoved(draft: Draft, { kind, polygon, name }: PlanArea): AreaEdit {
  return { draft: removePolygon(draft, kind, polygon), label: `${name} removed` };
}

/** What was supposed is given, so that its corners can be moved. */
export function areaGiven(draft: Draft, kind: AreaKind, polygons: readonly Polygon[]): AreaEdit {
  return {
    draft: polygons.reduce((next, corners) => addPolygon(next, kind, corners), draft),
    label: `${areaWords(kind)} given as it was supposed`,
  };
}

/** Corners of an area replaced by pasted rows, or why not. */
export function cornersPasted(
  draft: Draft,
  { kind, polygon, name }: PlanArea,
  text: string,
  units: DisplayUnits,
): AreaEdit | { readonly complaints: readonly string[] } {
  const pasting = pasteCorners(draft, { kind, polygon }, text, units);
  return pasting.kind === 'complaints'
    ? { complaints: pasting.complaints.map(complaintLine) }
    : { draft: pasting.draft, label: `corners of the ${name} pasted` };
}
