// How far the energised metal reaches: the diagonal that spacings are set against, and how deep it lies.
import type { PlanConductor } from '@ohmstead/study';

/** Diagonal of the box round the energised metal in plan, m; 0 without any. */
export function diagonalOf(conductors: readonly PlanConductor[]): number {
  const metal = conductors.filter((c) => c.role === 'energised');
  if (metal.length === 0) return 0;
  const reach = (read: (c: PlanConductor) => readonly [number, number]): number => {
    const all = metal.flatMap(read);
    return all.reduce((a, b) => Math.max(a, b)) - all.reduce((a, b) => Math.min(a, b));
  };
  return Math.hypot(
    reach((c) => [c.x1, c.x2]),
    reach((c) => [c.y1, c.y2]),
  );
}

/** Least depth at which energised metal lies, m; undefined without any. */
export function shallowestOf(conductors: readonly PlanConductor[]): number | undefined {
  const depths = conductors.filter((c) => c.role === 'energised').flatMap((c) => [c.depth1, c.depth2]);
  return depths.length === 0 ? undefined : depths.reduce((a, b) => Math.min(a, b));
}
