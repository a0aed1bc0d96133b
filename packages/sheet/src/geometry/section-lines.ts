// The metal seen from the side: what overlaps in the projection is drawn once.
import type { PlanConductor, Point } from '@ohmstead/study';

export interface SideLine {
  /** along the section, m, and depth, m */
  readonly from: Point;
  readonly to: Point;
  readonly floating: boolean;
}

interface Run {
  readonly depth: number;
  readonly floating: boolean;
  readonly spans: [number, number][];
}

/** Spans that touch or overlap become one. */
function merged(spans: readonly (readonly [number, number])[]): readonly (readonly [number, number])[] {
  const sorted = [...spans].sort((a, b) => a[0] - b[0] || a[1] - b[1]);
  const whole: [number, number][] = [];
  for (const [from, to] of sorted) {
    const last = whole[whole.length - 1];
    if (last !== undefined && from <= last[1]) last[1] = Math.max(last[1], to);
    else whole.push([from, to]);
  }
  return whole;
}

/** Conductors projected on a vertical plane along x or y. */
export function sectionLines(conductors: readonly PlanConductor[], along: 'x' | 'y'): readonly SideLine[] {
  const level = new Map<string, Run>();
  const sloping = new Map<string, SideLine>();
  for (const c of conductors) {
    const [a, b] = along === 'x' ? [c.x1, c.x2] : [c.y1, c.y2];
    const floating = c.role === 'floating';
    if (c.depth1 === c.depth2) {
      const key = `${c.depth1} ${floating}`;
      const run = level.get(key) ?? { depth: c.depth1, floating, spans: [] };
      run.spans.push([Math.min(a, b), Math.max(a, b)]);
      level.set(key, run);
    } else {
      sloping.set(`${a} ${c.depth1} ${b} ${c.depth2} ${floating}`, {
        from: [a, c.depth1],
        to: [b, c.depth2],
        floating,
      });
    }
  }
  const flat = [...level.values()].flatMap(({ depth, floating, spans }) =>
    merged(spans).map(([from, to]): SideLine => ({ from: [from, depth], to: [to, depth], floating })),
  );
  return [...flat, ...sloping.values()];
}
