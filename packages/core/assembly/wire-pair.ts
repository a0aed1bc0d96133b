// Mean of 1/√(r² + a²) between two straight filaments by its closed double integral, as in src/leakage/wire-pair.ts.
import { angle } from './arctangent';
import { logarithm } from './radial';

/** Share of their gap by which two axes part over their lengths, squared, below which they are taken as parallel. */
const PARALLEL_SQUARED: f64 = 1e-14;

@inline
function parallelTerm(u: f64, gap: f64, perGap: f64): f64 {
  const v = abs<f64>(u);
  const r = sqrt(v * v + gap * gap);
  return v * logarithm((v + r) * perGap) - r;
}

/** ln[(x2 + r2)/(x1 + r1)], x1 ≤ x2, r² = x² + w², without loss where x is negative. */
@inline
function logRatio(x1: f64, r1: f64, x2: f64, r2: f64, ww: f64): f64 {
  if (x1 >= 0) return logarithm((x2 + r2) / (x1 + r1));
  if (x2 < 0) return logarithm((r1 - x1) / (r2 - x2));
  return logarithm((x2 + r2) * (r1 - x1) / ww);
}

/** w from the first end of one wire to that of the other; u, v unit vectors; aa the radius squared. */
export function meanInverseDistance(
  wx: f64, wy: f64, wz: f64,
  ux: f64, uy: f64, uz: f64, lp: f64,
  vx: f64, vy: f64, vz: f64, lq: f64,
  aa: f64,
): f64 {
  const cosine = ux * vx + uy * vy + uz * vz;
  const cx = uy * vz - uz * vy;
  const cy = uz * vx - ux * vz;
  const cz = ux * vy - uy * vx;
  const ss = cx * cx + cy * cy + cz * cz;
  const along = wx * ux + wy * uy + wz * uz;
  // from the axis of the one to the middle of the other
  const half = 0.5 * lq;
  const middle = along + half * cosine;
  const px = wx + half * vx - middle * ux;
  const py = wy + half * vy - middle * uy;
  const pz = wz + half * vz - middle * uz;
  const gapSquared = px * px + py * py + pz * pz + aa;
  if (ss * (lp + lq) * (lp + lq) < PARALLEL_SQUARED * gapSquared) {
    const gap = sqrt(gapSquared);
    const perGap = 1 / gap;
    const end = along + (cosine < 0 ? -lq : lq);
    const from = min<f64>(along, end);
    const to = max<f64>(along, end);
    return (
      parallelTerm(lp - from, gap, perGap) - parallelTerm(-from, gap, perGap) -
      (parallelTerm(lp - to, gap, perGap) - parallelTerm(-to, gap, perGap))
    ) / (lp * lq);
  }
  const sine = sqrt(ss);
  const nx = wy * uz - wz * uy;
  const ny = wz * ux - wx * uz;
  const nz = wx * uy - wy * ux;
  const t1 = -(nx * cx + ny * cy + nz * cz) / ss;
  // nearly parallel wires meet far away: differences of coordinates from there are made without them
  const s1 = t1 * cosine - along;
  const s2 = s1 + lp;
  const t2 = t1 + lq;
  const height = (wx * cx + wy * cy + wz * cz) / sine;
  const dd = height * height + aa;
  const d = sqrt(dd);
  const ws1 = s1 * s1 * ss + dd;
  const ws2 = s2 * s2 * ss + dd;
  const wt1 = t1 * t1 * ss + dd;
  const wt2 = t2 * t2 * ss + dd;
  const x11 = t1 * ss + along * cosine;
  const x12 = x11 + lq;
  const x21 = x11 - lp * cosine;
  const x22 = x21 + lq;
  const y1 = -along;
  const y2 = -along - lq * cosine;
  const r11 = sqrt(x11 * x11 + ws1);
  const r12 = sqrt(x12 * x12 + ws1);
  const r21 = sqrt(x21 * x21 + ws2);
  const r22 = sqrt(x22 * x22 + ws2);
  const logs =
    s2 * logRatio(x21, r21, x22, r22, ws2) - s1 * logRatio(x11, r11, x12, r12, ws1) +
    (t2 * logRatio(y2, r12, y2 + lp, r22, wt2) -
      t1 * logRatio(y1, r11, y1 + lp, r21, wt1));
  const base = dd * cosine;
  const ds = d * sine;
  const n11 = base + s1 * t1 * ss;
  const n12 = base + s1 * t2 * ss;
  const n21 = base + s2 * t1 * ss;
  const n22 = base + s2 * t2 * ss;
  const d11 = ds * r11;
  const d12 = ds * r12;
  const d21 = ds * r21;
  const d22 = ds * r22;
  const angles =
    angle(n22 * d12 - n12 * d22, d22 * d12 + n22 * n12) - angle(n21 * d11 - n11 * d21, d21 * d11 + n21 * n11);
  return (logs - (d / sine) * angles) / (lp * lq);
}
