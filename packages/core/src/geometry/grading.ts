// Where to cut a span of conductor: finer toward its ends, where the leakage changes fastest.

/** What stands at the end of a span. */
export type SpanEnd =
  /** other metal, or more of the same beyond a soil interface */
  | 'joint'
  /** a free end in the soil, where the leakage grows without bound */
  | 'tip'
  /** the soil surface, a plane of symmetry: nothing changes fast */
  | 'surface';

/**
 * Length of the last segment at a free end, in radii. It makes the thin-wire model agree with a solid cylinder with a
 * flat end to 1e-4; finer segments drift below it (independent computation against axisymmetric finite elements).
 */
export const TIP_SEGMENT_RADII = 1.5;
/** Shortest segment elsewhere, in radii: the thin-wire equation is ill-posed below. Published rule of thumb: common practice, no source. */
export const SHORTEST_RADII = 4;
/** Segments of a span between joints on the coarsest mesh. */
const COARSEST_PIECES = 2;
/** Growth of segment length away from a free end on the coarsest mesh; halved in the logarithm by each refinement. */
const TIP_GROWTH = 3;

/** Share of a rod's last piece that is cut off toward a joint: a third leaves twice as much beside it. */
const JOINT_SHARE = 3;

/**
 * Cuts along a span, as distances from its first end, m, both ends included.
 * Between joints: cosine spacing s = L(1 − cos πk/n)/2, n = 2·2^level, so that every finer mesh contains the coarser
 * unless pieces would fall below four radii.
 * From a free end: one segment of 1.5 radii, then growing geometrically up to the cosine spacing's largest segment.
 * @param length L, m
 * @param radius m
 * @param level 0 for the coarsest mesh, one more for each refinement
 */
export function spanCuts(
  length: number,
  radius: number,
  first: SpanEnd,
  last: SpanEnd,
  level: number,
): number[] {
  if (first === 'tip' && last === 'tip') {
    const half = spanCuts(length / 2, radius, 'tip', 'surface', level);
    return [
      ...half,
      ...half
        .slice(0, -1)
        .reverse()
        .map((s) => length - s),
    ];
  }
  if (last === 'tip')
    return spanCuts(length, radius, 'tip', first, level)
      .map((s) => length - s)
      .reverse();
  if (first === 'tip') return tipCuts(length, radius, last, level);
  return jointCuts(length, radius, first, last, level);
}

function jointCuts(length: number, radius: number, first: SpanEnd, last: SpanEnd, level: number): number[] {
  const shortest = SHORTEST_RADII * radius;
  let pieces = COARSEST_PIECES * 2 ** level;
  const even = first === 'surface' && last === 'surface';
  const place = (k: number): number =>
    even ? (length * k) / pieces : (length * (1 - Math.cos((Math.PI * k) / pieces))) / 2;
  while (pieces > 1 && place(1) < shortest) pieces--;
  return Array.from({ length: pieces + 1 }, (_, k) => (k === pieces ? length : place(k)));
}

function tipCuts(length: number, radius: number, last: SpanEnd, level: number): number[] {
  const shortest = SHORTEST_RADII * radius;
  const growth = TIP_GROWTH ** (1 / 2 ** level);
  const largest = Math.max(shortest, length / (COARSEST_PIECES * 2 ** level));
  const tip = Math.min(TIP_SEGMENT_RADII * radius, length);
  if (length - tip < shortest) return [0, length];
  const cuts = [0, tip];
  let size = Math.max(tip * growth, shortest);
  let at = tip;
  while (length - at > 2 * size && size < largest) {
    at += size;
    cuts.push(at);
    size *= growth;
  }
  const rest = length - at;
  const wanted = Math.round(rest / Math.min(size, largest));
  const pieces = Math.max(1, Math.min(wanted, Math.floor(rest / shortest)));
  for (let k = 1; k <= pieces; k++) cuts.push(k === pieces ? length : at + (rest * k) / pieces);
  // toward a joint the last piece is graded once more, as the spacing between joints is
  const lastPiece = rest / pieces;
  if (last === 'joint' && level > 0 && lastPiece >= JOINT_SHARE * shortest)
    cuts.splice(cuts.length - 1, 0, length - lastPiece / JOINT_SHARE);
  return cuts;
}
