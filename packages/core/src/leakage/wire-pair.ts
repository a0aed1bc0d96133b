// Mean of 1/r between two straight filaments: the closed double integral that every near leakage entry is made of.
import { angleOf, logarithm } from '../numerics/elementary.ts';

/** Straight axis as scalars: ends in plan and depth, m. */
export interface Wire {
  x1: number;
  y1: number;
  z1: number;
  x2: number;
  y2: number;
  z2: number;
}

/**
 * Share of their gap by which two axes part over their lengths, below which they are taken as parallel, which errs by a
 * hundredth of it; above it the skew form loses some 1e-16 over it: 4e-9 at worst, seen.
 */
const PARALLEL_SHARE = 1e-7;

/**
 * (1/L_i L_j)∬ ds dt/√(r² + a²) over two straight wires, 1/m; symmetric in the wires.
 * @param radius a, the larger of the two conductor radii, m; greater than 0
 */
export function meanInverseDistance(p: Wire, q: Wire, radius: number): number {
  const ux = p.x2 - p.x1;
  const uy = p.y2 - p.y1;
  const uz = p.z2 - p.z1;
  const vx = q.x2 - q.x1;
  const vy = q.y2 - q.y1;
  const vz = q.z2 - q.z1;
  const lp = Math.sqrt(ux * ux + uy * uy + uz * uz);
  const lq = Math.sqrt(vx * vx + vy * vy + vz * vz);
  const [wx, wy, wz] = [q.x1 - p.x1, q.y1 - p.y1, q.z1 - p.z1];
  return axesMean(wx, wy, wz, ux / lp, uy / lp, uz / lp, lp, vx / lq, vy / lq, vz / lq, lq, radius * radius); // biome-ignore format: one call
}

/**
 * The same from scalars: w from the first end of one wire to that of the other, unit vectors u and v, lengths, a².
 * Parallel axes at distance D: G(x2 − y1) − G(x1 − y1) − G(x2 − y2) + G(x1 − y2), G(u) = |u|·ln[(|u| + √(u² + D²))/D] − √(u² + D²).
 * Skew axes, with s and t measured from the closest approach, angle θ, distance d:
 * F = s·asinh((t − s cosθ)/√(s² sin²θ + d²)) + t·asinh((s − t cosθ)/√(t² sin²θ + d²))
 *   − (d/sinθ)·atan((d² cosθ + s t sin²θ)/(d r sinθ)), differenced over the four corners; two corners that share s or t
 * need one logarithm of a ratio, and two arc tangents one angle of a product.
 * Source: the mutual inductance of inclined filaments, Campbell (Phys. Rev. 5, 1915) (from memory); both forms are
 * tested against numerical integration.
 */
export function axesMean(
  wx: number,
  wy: number,
  wz: number,
  ux: number,
  uy: number,
  uz: number,
  lp: number,
  vx: number,
  vy: number,
  vz: number,
  lq: number,
  aa: number,
): number {
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
  if (ss * (lp + lq) * (lp + lq) < PARALLEL_SHARE * PARALLEL_SHARE * gapSquared) {
    const gap = Math.sqrt(gapSquared);
    const end = along + (cosine < 0 ? -lq : lq);
    return parallelMean(lp, lq, Math.min(along, end), Math.max(along, end), gap);
  }
  const sine = Math.sqrt(ss);
  const t1 = -triple(wx, wy, wz, ux, uy, uz, cx, cy, cz) / ss;
  // nearly parallel wires meet far away: differences of coordinates from there, t − s cosθ and s − t cosθ, are made without them
  const s1 = t1 * cosine - along;
  const s2 = s1 + lp;
  const t2 = t1 + lq;
  const height = (wx * cx + wy * cy + wz * cz) / sine;
  const dd = height * height + aa;
  const d = Math.sqrt(dd);
  const ws1 = s1 * s1 * ss + dd;
  const ws2 = s2 * s2 * ss + dd;
  const x11 = t1 * ss + along * cosine;
  const x12 = x11 + lq;
  const x21 = x11 - lp * cosine;
  const x22 = x21 + lq;
  const y1 = -along;
  const y2 = -along - lq * cosine;
  const r11 = Math.sqrt(x11 * x11 + ws1);
  const r12 = Math.sqrt(x12 * x12 + ws1);
  const r21 = Math.sqrt(x21 * x21 + ws2);
  const r22 = Math.sqrt(x22 * x22 + ws2);
  const logs =
    s2 * logRatio(x21, r21, x22, r22, ws2) -
    s1 * logRatio(x11, r11, x12, r12, ws1) +
    (t2 * logRatio(y2, r12, y2 + lp, r22, t2 * t2 * ss + dd) -
      t1 * logRatio(y1, r11, y1 + lp, r21, t1 * t1 * ss + dd));
  const base = dd * cosine;
  const ds = d * sine;
  const angles =
    turn(base + s2 * t2 * ss, ds * r22, base + s1 * t2 * ss, ds * r12) -
    turn(base + s2 * t1 * ss, ds * r21, base + s1 * t1 * ss, ds * r11);
  return (logs - (d / sine) * angles) / (lp * lq);
}

/** The mean over [0, lp] and [from, to] on two parallel axes at a distance. */
export function parallelMean(lp: number, lq: number, from: number, to: number, gap: number): number {
  const perGap = 1 / gap;
  return (
    (parallelTerm(lp - from, gap, perGap) -
      parallelTerm(-from, gap, perGap) -
      (parallelTerm(lp - to, gap, perGap) - parallelTerm(-to, gap, perGap))) /
    (lp * lq)
  );
}

/** Mean of 1/√(s² + a²) of a wire with itself: (2/L²)[L·asinh(L/a) − √(L² + a²) + a], 1/m. */
export function selfInverseDistance(length: number, radius: number): number {
  return (
    (2 / (length * length)) *
    (length * Math.asinh(length / radius) - Math.sqrt(length * length + radius * radius) + radius)
  );
}

/** (1/L)∫ ds/√(r² + a²) over a wire, seen from a point, 1/m: (1/L)·ln[(r1 + r2 + L)/(r1 + r2 − L)]. */
export function meanInverseDistanceToPoint(p: Wire, x: number, y: number, z: number, radius: number): number {
  const ax = x - p.x1;
  const ay = y - p.y1;
  const az = z - p.z1;
  const bx = x - p.x2;
  const by = y - p.y2;
  const bz = z - p.z2;
  const dx = p.x2 - p.x1;
  const dy = p.y2 - p.y1;
  const dz = p.z2 - p.z1;
  const aa = radius * radius;
  const length = Math.sqrt(dx * dx + dy * dy + dz * dz);
  const sum = Math.sqrt(ax * ax + ay * ay + az * az + aa) + Math.sqrt(bx * bx + by * by + bz * bz + aa);
  return Math.log((sum + length) / (sum - length)) / length;
}

function parallelTerm(u: number, gap: number, perGap: number): number {
  const v = Math.abs(u);
  const r = Math.sqrt(v * v + gap * gap);
  return v * logarithm((v + r) * perGap) - r;
}

/** asinh(x2/w) − asinh(x1/w) = ln[(x2 + r2)/(x1 + r1)], x1 ≤ x2, r² = x² + w², without loss where x is negative. */
export function logRatio(x1: number, r1: number, x2: number, r2: number, ww: number): number {
  if (x1 >= 0) return logarithm((x2 + r2) / (x1 + r1));
  if (x2 < 0) return logarithm((r1 - x1) / (r2 - x2));
  return logarithm(((x2 + r2) * (r1 - x1)) / ww);
}

/** atan(n2/d2) − atan(n1/d1), d1 and d2 positive. */
function turn(n2: number, d2: number, n1: number, d1: number): number {
  return angleOf(n2 * d1 - n1 * d2, d2 * d1 + n2 * n1);
}

/** (w × v)·c */
function triple(
  wx: number,
  wy: number,
  wz: number,
  vx: number,
  vy: number,
  vz: number,
  cx: number,
  cy: number,
  cz: number,
): number {
  return (wy * vz - wz * vy) * cx + (wz * vx - wx * vz) * cy + (wx * vy - wy * vx) * cz;
}
