// Mean of 1/r between two straight filaments: the closed double integral that every near leakage entry is made of.

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
 * Sine of the angle below which two axes are taken as parallel: over 10 m they part by a micrometre. Above it the
 * closest approach, taken from cross products, keeps nine digits.
 */
const PARALLEL_SINE = 1e-7;

/**
 * (1/L_i L_j)∬ ds dt/√(r² + a²) over two straight wires, 1/m; symmetric in the wires.
 * Parallel axes at distance D: G(x2 − y1) − G(x1 − y1) − G(x2 − y2) + G(x1 − y2), G(u) = u·asinh(u/D) − √(u² + D²).
 * Skew axes, with s and t measured from the closest approach, angle θ, distance d:
 * F = s·asinh((t − s cosθ)/√(s² sin²θ + d²)) + t·asinh((s − t cosθ)/√(t² sin²θ + d²))
 *   − (d/sinθ)·atan((d² cosθ + s t sin²θ)/(d r sinθ)), differenced over the four corners.
 * Source: the mutual inductance of inclined filaments, Campbell (Phys. Rev. 5, 1915) (from memory); both forms are
 * tested against numerical integration.
 * @param radius a, the larger of the two conductor radii, m; greater than 0
 */
export function meanInverseDistance(p: Wire, q: Wire, radius: number): number {
  let ux = p.x2 - p.x1;
  let uy = p.y2 - p.y1;
  let uz = p.z2 - p.z1;
  let vx = q.x2 - q.x1;
  let vy = q.y2 - q.y1;
  let vz = q.z2 - q.z1;
  const lp = Math.sqrt(ux * ux + uy * uy + uz * uz);
  const lq = Math.sqrt(vx * vx + vy * vy + vz * vz);
  ux /= lp;
  uy /= lp;
  uz /= lp;
  vx /= lq;
  vy /= lq;
  vz /= lq;
  const wx = q.x1 - p.x1;
  const wy = q.y1 - p.y1;
  const wz = q.z1 - p.z1;
  const cosine = ux * vx + uy * vy + uz * vz;
  const cx = uy * vz - uz * vy;
  const cy = uz * vx - ux * vz;
  const cz = ux * vy - uy * vx;
  const sineSquared = cx * cx + cy * cy + cz * cz;
  const sine = Math.sqrt(sineSquared);
  const along = wx * ux + wy * uy + wz * uz;
  const aa = radius * radius;
  if (sine < PARALLEL_SINE) {
    const px = wx - along * ux;
    const py = wy - along * uy;
    const pz = wz - along * uz;
    const gap = Math.sqrt(px * px + py * py + pz * pz + aa);
    const y2 = along + Math.sign(cosine) * lq;
    const from = Math.min(along, y2);
    const to = Math.max(along, y2);
    return (
      (parallelTerm(lp - from, gap) -
        parallelTerm(-from, gap) -
        parallelTerm(lp - to, gap) +
        parallelTerm(-to, gap)) /
      (lp * lq)
    );
  }
  const s0 = triple(wx, wy, wz, vx, vy, vz, cx, cy, cz) / sineSquared;
  const t0 = triple(wx, wy, wz, ux, uy, uz, cx, cy, cz) / sineSquared;
  const height = (wx * cx + wy * cy + wz * cz) / sine;
  const d = Math.sqrt(height * height + aa);
  return (
    (skewTerm(lp - s0, lq - t0, cosine, sine, d) -
      skewTerm(-s0, lq - t0, cosine, sine, d) -
      skewTerm(lp - s0, -t0, cosine, sine, d) +
      skewTerm(-s0, -t0, cosine, sine, d)) /
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

function parallelTerm(u: number, gap: number): number {
  return u * Math.asinh(u / gap) - Math.sqrt(u * u + gap * gap);
}

function skewTerm(s: number, t: number, cosine: number, sine: number, d: number): number {
  const dd = d * d;
  const r = Math.sqrt(Math.max(0, s * s + t * t - 2 * s * t * cosine) + dd);
  const ss = sine * sine;
  return (
    s * Math.asinh((t - s * cosine) / Math.sqrt(s * s * ss + dd)) +
    t * Math.asinh((s - t * cosine) / Math.sqrt(t * t * ss + dd)) -
    (d / sine) * Math.atan((dd * cosine + s * t * ss) / (d * sine * r))
  );
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
