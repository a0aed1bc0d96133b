// What the profile of one case shows: surface, metal, touch limit and what lies beyond it, in metres and volts.
import type { Outcome, Point, Profile } from '@ohmstead/study';
import { crossingsOf } from './crossings.ts';
import { insideEvenOdd } from './polygon.ts';

export interface ProfileDrawing {
  /** coordinate that runs along the line, and what is constant beside it */
  readonly axis: ProfileAxis;
  /** along the line, in the axis's coordinate, m */
  readonly range: Point;
  /** V */
  readonly volts: Point;
  /** each a line of [along, V] */
  readonly surface: readonly Point[];
  readonly metal: readonly Point[];
  /** the metal and the limit line on assessed ground only */
  readonly assessedMetal: readonly (readonly Point[])[];
  readonly limit: readonly (readonly Point[])[];
  /** closed, between limit line and surface where the surface lies below it */
  readonly beyond: readonly (readonly Point[])[];
  readonly crossings: readonly number[];
  readonly worst: { readonly along: number; readonly surface: number; readonly metal: number } | undefined;
}

export interface ProfileAxis {
  readonly kind: 'x' | 'y' | 'distance';
  /** the coordinate at the start of the line, m */
  readonly start: number;
}

/** A line counts as along an axis when it strays less than this from it, m. */
const STRAIGHT_ALONG = 1e-6;
/** Room above the highest potential, share of it. */
const HEADROOM = 1.08;

function axisOf({ from, to }: Profile): ProfileAxis {
  if (Math.abs(to[1] - from[1]) < STRAIGHT_ALONG && to[0] > from[0]) return { kind: 'x', start: from[0] };
  if (Math.abs(to[0] - from[0]) < STRAIGHT_ALONG && to[1] > from[1]) return { kind: 'y', start: from[1] };
  return { kind: 'distance', start: 0 };
}

/** Runs of consecutive samples on assessed ground, as [first, last]. */
function assessedRuns(outcome: Outcome, profile: Profile): readonly (readonly [number, number])[] {
  const length = profile.distance[profile.distance.length - 1];
  const runs: [number, number][] = [];
  profile.distance.forEach((d, k) => {
    const t = length > 0 ? d / length : 0;
    const x = profile.from[0] + t * (profile.to[0] - profile.from[0]);
    const y = profile.from[1] + t * (profile.to[1] - profile.from[1]);
    if (!insideEvenOdd(outcome.plan.touchArea, x, y)) return;
    const last = runs[runs.length - 1];
    if (last !== undefined && last[1] === k - 1) last[1] = k;
    else runs.push([k, k]);
  });
  return runs.filter(([first, last]) => last > first);
}

/** A line passes through a place within this, m. Reason: places of results are rounded to far less, and no foot is smaller. */
const THROUGH_M = 0.05;

/** How far along the line the worst touch voltage of the case lies; undefined where the line passes it by. */
function worstAlong(outcome: Outcome, caseIndex: number, profile: Profile): number | undefined {
  const { x_m, y_m } = outcome.results.cases[caseIndex].touch;
  const [dx, dy] = [profile.to[0] - profile.from[0], profile.to[1] - profile.from[1]];
  const length = Math.hypot(dx, dy);
  if (length === 0) return undefined;
  const [x, y] = [x_m - profile.from[0], y_m - profile.from[1]];
  const aside = Math.abs(x * dy - y * dx) / length;
  const along = (x * dx + y * dy) / length;
  return aside <= THROUGH_M && along >= 0 && along <= length ? along : undefined;
}

/** Surface, metal and limit along the profile of a case. */
export function profileDrawing(outcome: Outcome, caseIndex: number): ProfileDrawing {
  const { profile } = outcome.cases[caseIndex];
  const limit = outcome.results.cases[caseIndex].touch.limit_V;
  const axis = axisOf(profile);
  const along = Array.from(profile.distance, (d) => axis.start + d);
  const surface = Array.from(profile.potential);
  const metal = surface.map((v, k) => v + profile.touch[k]);
  const top = Math.max(0, ...surface, ...metal) * HEADROOM;
  const bottom = Math.min(0, ...surface, ...metal);
  const line = (values: readonly number[], first = 0, last = along.length - 1): readonly Point[] =>
    along.slice(first, last + 1).map((d, k): Point => [d, values[first + k]]);
  const floor = metal.map((v) => v - limit);
  const runs = assessedRuns(outcome, profile);
  const beyond = runs
    .filter(([first, last]) => surface.slice(first, last + 1).some((v, k) => v < floor[first + k]))
    .map(([first, last]) => {
      const lower = surface.map((v, k) => Math.min(v, floor[k]));
      return [...line(floor, first, last), ...[...line(lower, first, last)].reverse()];
    });
  const at = worstAlong(outcome, caseIndex, profile);
  const nearest = at === undefined ? -1 : profile.distance.findIndex((d) => d >= at);
  const worst =
    at === undefined || nearest < 0
      ? undefined
      : { along: axis.start + at, surface: surface[nearest], metal: metal[nearest] };
  return {
    axis,
    range: [along[0], along[along.length - 1]],
    volts: [bottom, top],
    surface: line(surface),
    metal: line(metal),
    assessedMetal: runs.map(([first, last]) => line(metal, first, last)),
    limit: runs.map(([first, last]) => line(floor, first, last)),
    beyond,
    crossings: crossingsOf(profile, outcome.plan.conductors).map((d) => axis.start + d),
    worst,
  };
}
