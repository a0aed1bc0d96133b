// Finds the place of a note beside a mark: inside the drawing, clear of what must stay legible.
import { about, type Box, contains, overlap } from './box.ts';
import type { Occupancy } from './occupancy.ts';

export interface CalloutRequest {
  /** the mark, drawing units */
  readonly x: number;
  readonly y: number;
  /** of the note, drawing units */
  readonly width: number;
  readonly height: number;
  /** the note never leaves this */
  readonly bounds: Box;
  /** what it should not cover */
  readonly avoid: readonly Box[];
  /** cost of covering a point, 0 for empty ground; asked on a few points of the note */
  readonly cost: (x: number, y: number) => number;
  /** lines that the note should not cross */
  readonly lines: Occupancy;
}

export interface Callout {
  readonly box: Box;
  /** side of the mark on which the note stands: text runs away from it */
  readonly side: 'left' | 'right';
  /** where the leader line meets the note */
  readonly leader: readonly [number, number];
  /** what its place costs; comparable between notes at one mark */
  readonly price: number;
}

/** Distances from the mark that are tried, drawing units. */
const REACHES: readonly number[] = [26, 44, 66, 92, 124, 162, 206, 256];
const DIRECTIONS = 16;
/** Cost of touching an obstacle, and of covering it wholly, against one unit of leader line. */
const TOUCH_COST = 160;
const OBSTACLE_COST = 400;
/** Half side of the square about the mark that the note leaves free, drawing units. */
const MARK_HALF = 9;
/** Cost of standing on dear ground throughout, against one unit of leader line. */
const GROUND_COST = 190;
/** Cost of one line that passes through the note, against one unit of leader line. */
const LINE_COST = 30;

function groundCost(box: Box, cost: CalloutRequest['cost']): number {
  const across = 5;
  const down = 3;
  let sum = 0;
  for (let i = 0; i < across; i += 1) {
    for (let j = 0; j < down; j += 1) {
      const x = box.left + ((i + 0.5) / across) * (box.right - box.left);
      sum += cost(x, box.top + ((j + 0.5) / down) * (box.bottom - box.top));
    }
  }
  return sum / (across * down);
}

function candidate(request: CalloutRequest, reach: number, angle: number): Callout {
  const { x, y, width, height } = request;
  const side = Math.cos(angle) >= -1e-9 ? 'right' : 'left';
  const lx = x + reach * Math.cos(angle);
  const ly = y - reach * Math.sin(angle);
  const middle = side === 'right' ? lx + width / 2 : lx - width / 2;
  return { box: about(middle, ly, width, height), side, leader: [lx, ly], price: Number.POSITIVE_INFINITY };
}

/** Pushes a note into the bounds by the shortest way. */
function pushedInside(found: Callout, bounds: Box): Callout {
  const { box } = found;
  const dx = Math.max(0, bounds.left - box.left) - Math.max(0, box.right - bounds.right);
  const dy = Math.max(0, bounds.top - box.top) - Math.max(0, box.bottom - bounds.bottom);
  const moved: Box = {
    left: box.left + dx,
    right: box.right + dx,
    top: box.top + dy,
    bottom: box.bottom + dy,
  };
  return { ...found, box: moved, leader: [found.leader[0] + dx, found.leader[1] + dy] };
}

/** What a place costs in all, in units of leader line. */
function priceOf(request: CalloutRequest, box: Box, reach: number): number {
  const size = request.width * request.height;
  let price = reach + GROUND_COST * groundCost(box, request.cost) + LINE_COST * request.lines(box);
  for (const obstacle of request.avoid) {
    const shared = overlap(obstacle, box);
    if (shared > 0) price += TOUCH_COST + (OBSTACLE_COST * shared) / Math.min(size, areaOf(obstacle));
  }
  return price;
}

/**
 * Best place for a note. Every candidate is inside the bounds and off the mark; of these the cheapest is taken: short
 * leader, no obstacle, empty ground. Where none fits, the first one is pushed inside.
 */
export function placeCallout(request: CalloutRequest): Callout {
  const mark = about(request.x, request.y, 2 * MARK_HALF, 2 * MARK_HALF);
  let best: Callout | undefined;
  for (const reach of REACHES) {
    for (let k = 0; k < DIRECTIONS; k += 1) {
      const found = candidate(request, reach, (2 * Math.PI * (k + 0.5)) / DIRECTIONS);
      if (!contains(request.bounds, found.box) || overlap(mark, found.box) > 0) continue;
      const price = priceOf(request, found.box, reach);
      if (best === undefined || price < best.price) best = { ...found, price };
    }
  }
  return best ?? pushedInside(candidate(request, REACHES[0], Math.PI / DIRECTIONS), request.bounds);
}

function areaOf(box: Box): number {
  return Math.max(1, (box.right - box.left) * (box.bottom - box.top));
}
