// The metal of the fixture and its field: a small dense solve in uniform soil, from invented data.
import type { PlanConductor, Point, Polygon } from '@ohmstead/study';

const RESISTIVITY = 300;
const FENCE: Polygon = [
  [-2.5, -2.5],
  [62.5, -2.5],
  [62.5, 20.5],
  [38.5, 20.5],
  [38.5, 47.5],
  [-2.5, 47.5],
];
export const RODS: readonly Point[] = [
  [0, 0],
  [30, 0],
  [60, 0],
  [60, 18],
  [36, 18],
  [36, 45],
  [18, 45],
  [0, 45],
  [0, 27],
  [12, 18],
];
export interface Piece {
  readonly conductor: number;
  readonly a: readonly [number, number, number];
  readonly b: readonly [number, number, number];
  readonly radius: number;
  readonly floating: boolean;
}

function wire(id: string, from: Point, to: Point, more: Partial<PlanConductor> = {}): PlanConductor {
  return {
    id,
    x1: from[0],
    y1: from[1],
    depth1: 0.6,
    x2: to[0],
    y2: to[1],
    depth2: 0.6,
    diameter: 0.012,
    material: 'copper-annealed',
    electrode: 'main',
    role: 'energised',
    insulated: false,
    rod: false,
    ...more,
  };
}

export function fixtureConductors(fenceName = 'fence'): readonly PlanConductor[] {
  const rows = [0, 6, 12, 18].map((y, k) => wire(`E${k + 1}`, [0, y], [60, y]));
  const high = [27, 36, 45].map((y, k) => wire(`E${k + 5}`, [0, y], [36, y]));
  const tall = [0, 6, 12, 18, 24, 30, 36].map((x, k) => wire(`N${k + 1}`, [x, 0], [x, 45]));
  const low = [42, 48, 54, 60].map((x, k) => wire(`N${k + 8}`, [x, 0], [x, 18]));
  const rods = RODS.map((p, k) =>
    wire(`R${k + 1}`, p, p, { depth2: 5.6, diameter: 0.016, material: 'steel-copper-clad', rod: true }),
  );
  const fence = FENCE.map((p, k) =>
    wire(`F${k + 1}`, p, FENCE[(k + 1) % FENCE.length], {
      depth1: 0.4,
      depth2: 0.4,
      diameter: 0.06,
      material: 'steel',
      electrode: fenceName,
      role: 'floating',
    }),
  );
  return [...rows, ...high, ...tall, ...low, ...rods, ...fence];
}

function pieces(conductors: readonly PlanConductor[]): readonly Piece[] {
  return conductors.flatMap((c, conductor) => {
    const length = Math.hypot(c.x2 - c.x1, c.y2 - c.y1, c.depth2 - c.depth1);
    const count = Math.max(1, Math.round(length / (c.rod ? 2.5 : 5)));
    return Array.from({ length: count }, (_, k): Piece => {
      const at = (t: number): [number, number, number] => [
        c.x1 + t * (c.x2 - c.x1),
        c.y1 + t * (c.y2 - c.y1),
        c.depth1 + t * (c.depth2 - c.depth1),
      ];
      return {
        conductor,
        a: at(k / count),
        b: at((k + 1) / count),
        radius: c.diameter / 2,
        floating: c.role === 'floating',
      };
    });
  });
}

export function lengthOf(p: Piece): number {
  return Math.hypot(p.b[0] - p.a[0], p.b[1] - p.a[1], p.b[2] - p.a[2]);
}

/** Potential at a point by one ampere from a piece and its image, V. */
function potential(p: Piece, x: number, y: number, depth: number): number {
  const length = lengthOf(p);
  const line = (sign: number): number => {
    const r1 = Math.hypot(x - p.a[0], y - p.a[1], depth - sign * p.a[2], p.radius);
    const r2 = Math.hypot(x - p.b[0], y - p.b[1], depth - sign * p.b[2], p.radius);
    return Math.log((r1 + r2 + length) / (r1 + r2 - length));
  };
  return (RESISTIVITY / (4 * Math.PI * length)) * (line(1) + line(-1));
}

/** Gauss elimination with row exchange; the system is small. */
function solve(a: number[][], b: number[]): number[] {
  const n = b.length;
  for (let k = 0; k < n; k += 1) {
    let pivot = k;
    for (let i = k + 1; i < n; i += 1) if (Math.abs(a[i][k]) > Math.abs(a[pivot][k])) pivot = i;
    [a[k], a[pivot]] = [a[pivot], a[k]];
    [b[k], b[pivot]] = [b[pivot], b[k]];
    for (let i = k + 1; i < n; i += 1) {
      const f = a[i][k] / a[k][k];
      if (f === 0) continue;
      for (let j = k; j < n; j += 1) a[i][j] -= f * a[k][j];
      b[i] -= f * b[k];
    }
  }
  for (let i = n - 1; i >= 0; i -= 1) {
    for (let j = i + 1; j < n; j += 1) b[i] -= a[i][j] * b[j];
    b[i] /= a[i][i];
  }
  return b;
}

export interface Field {
  readonly parts: readonly Piece[];
  /** A per ampere injected */
  readonly current: readonly number[];
  readonly resistance: number;
  /** V per ampere injected */
  readonly fence: number;
  at(x: number, y: number): number;
}

/** Grid at one potential, fence at another with no net leakage, one ampere injected. */
export function field(conductors: readonly PlanConductor[]): Field {
  const parts = pieces(conductors);
  const n = parts.length;
  const matrix = parts.map((p) => {
    const middle = [0, 1, 2].map((k) => (p.a[k] + p.b[k]) / 2);
    return [
      ...parts.map((q) => potential(q, middle[0], middle[1], middle[2])),
      p.floating ? 0 : -1,
      p.floating ? -1 : 0,
    ];
  });
  matrix.push(
    [...parts.map((p) => (p.floating ? 0 : 1)), 0, 0],
    [...parts.map((p) => (p.floating ? 1 : 0)), 0, 0],
  );
  const solution = solve(matrix, [...parts.map(() => 0), 1, 0]);
  const current = solution.slice(0, n);
  const at = (x: number, y: number): number =>
    parts.reduce((sum, p, k) => sum + current[k] * potential(p, x, y, 0), 0);
  return { parts, current, resistance: solution[n], fence: solution[n + 1], at };
}
