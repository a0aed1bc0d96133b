// Chooses where contour lines carry their value: on straight stretches, apart from each other and from other notes.
import type { Point } from '@ohmstead/study';
import { about, type Box, contains, overlap } from './box.ts';
import type { Occupancy } from './occupancy.ts';

export interface LabelledLevel {
  readonly text: string;
  /** width of the text, drawing units */
  readonly width: number;
  /** lines of this level, drawing units; a closed line repeats its first point */
  readonly lines: readonly (readonly Point[])[];
}

export interface LineLabel {
  readonly text: string;
  readonly x: number;
  readonly y: number;
  /** turn of the text, degrees clockwise, never upside down */
  readonly turn: number;
  readonly box: Box;
}

export interface LabelRoom {
  readonly bounds: Box;
  readonly avoid: readonly Box[];
  /** of the text, drawing units */
  readonly height: number;
  /** lines that a label crosses only where its level would stay bare */
  readonly lines: Occupancy;
  /** whether a label may stand here, e.g. only on assessed ground */
  readonly allowed: (label: LineLabel) => boolean;
}

/** A line shorter than this many label widths stays bare. */
const SHORTEST = 2;
/** Chord over arc below which a stretch is too bent to carry a text. */
const STRAIGHT_ENOUGH = 0.94;
/** Steepest text, degrees from level: steeper ones make the reader turn the head. */
const STEEPEST = 62;
/** Labels of one level keep this far apart, drawing units. */
const SAME_LEVEL_GAP = 150;
const MOST_PER_LEVEL = 4;
/** Labels of a level that may cross metal when none finds a place beside it. */
const MOST_CROSSING = 2;
/** Steps along a line at which places are tried, drawing units. */
const STEP = 9;

/** Point at a distance along a line, with the lengths summed up to each vertex. */
function pointAt(line: readonly Point[], sums: Float64Array, at: number): Point {
  let low = 0;
  let high = sums.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (sums[middle] <= at) low = middle;
    else high = middle;
  }
  const span = sums[high] - sums[low];
  const t = span > 0 ? (at - sums[low]) / span : 0;
  return [
    line[low][0] + t * (line[high][0] - line[low][0]),
    line[low][1] + t * (line[high][1] - line[low][1]),
  ];
}

function runningLength(line: readonly Point[]): Float64Array {
  const sums = new Float64Array(line.length);
  for (let i = 1; i < line.length; i += 1) {
    sums[i] = sums[i - 1] + Math.hypot(line[i][0] - line[i - 1][0], line[i][1] - line[i - 1][1]);
  }
  return sums;
}

interface Spot extends LineLabel {
  readonly straight: number;
}

function spotsOn(line: readonly Point[], level: LabelledLevel, height: number): readonly Spot[] {
  const sums = runningLength(line);
  const total = sums[sums.length - 1];
  const half = level.width / 2;
  if (total < SHORTEST * level.width) return [];
  const spots: Spot[] = [];
  for (let at = half; at <= total - half; at += STEP) {
    const a = pointAt(line, sums, at - half);
    const b = pointAt(line, sums, at + half);
    const [x, y] = pointAt(line, sums, at);
    const straight = Math.hypot(b[0] - a[0], b[1] - a[1]) / level.width;
    if (straight < STRAIGHT_ENOUGH) continue;
    const [from, to] = a[0] <= b[0] ? [a, b] : [b, a];
    const angle = Math.atan2(to[1] - from[1], to[0] - from[0]);
    if (Math.abs(angle) > (STEEPEST * Math.PI) / 180) continue;
    const wide = level.width * Math.abs(Math.cos(angle)) + height * Math.abs(Math.sin(angle));
    const high = level.width * Math.abs(Math.sin(angle)) + height * Math.abs(Math.cos(angle));
    spots.push({
      text: level.text,
      x,
      y,
      turn: (angle * 180) / Math.PI,
      box: about(x, y, wide, high),
      straight,
    });
  }
  return spots;
}

/** Labels for all levels, the first level choosing first; none covers another or an obstacle. */
export function labelIsolines(levels: readonly LabelledLevel[], room: LabelRoom): readonly LineLabel[] {
  const taken: LineLabel[] = [];
  for (const level of levels) {
    const spots = level.lines.flatMap((line) => spotsOn(line, level, room.height));
    spots.sort((a, b) => flatness(b) - flatness(a) || a.y - b.y || a.x - b.x);
    const free = spots.filter((spot) => room.lines(spot.box) === 0);
    const own = chosen(free, MOST_PER_LEVEL, room, taken);
    taken.push(...(own.length > 0 ? own : chosen(spots, MOST_CROSSING, room, taken)));
  }
  return taken;
}

/** The first spots that fit beside each other and beside what is taken. */
function chosen(
  spots: readonly Spot[],
  most: number,
  room: LabelRoom,
  taken: readonly LineLabel[],
): readonly LineLabel[] {
  const own: LineLabel[] = [];
  for (const { straight: _, ...spot } of spots) {
    if (own.length === most) break;
    if (!contains(room.bounds, spot.box) || !room.allowed(spot)) continue;
    if (room.avoid.some((box) => overlap(box, spot.box) > 0)) continue;
    if (taken.some((other) => overlap(other.box, spot.box) > 0)) continue;
    if (own.some((other) => Math.hypot(other.x - spot.x, other.y - spot.y) < SAME_LEVEL_GAP)) continue;
    own.push(spot);
  }
  return own;
}

/** Level text on a straight stretch reads best; rounded so that equal places are taken from the top left on. */
function flatness(spot: Spot): number {
  return Math.round(10 * (spot.straight + 0.5 * Math.cos((spot.turn * Math.PI) / 180)));
}
