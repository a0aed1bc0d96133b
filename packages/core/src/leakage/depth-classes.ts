// Segments sorted by what the soil sees of them: same depth, or same vertical extent, in the same layer.
import type { SegmentMesh } from '../geometry/segments.ts';

/** A horizontal depth (z1 = z2) or a vertical extent in one soil layer. */
export interface DepthClass {
  readonly layer: number;
  readonly z1: number;
  readonly z2: number;
  readonly vertical: boolean;
  readonly members: number;
}

export interface DepthClasses {
  readonly classes: readonly DepthClass[];
  /** class of each segment; −1 for one that slopes; shape [count] */
  readonly of: Int32Array;
}

/** Slope (rise over run, or run over rise) below which a segment counts as horizontal, or vertical: it leaves its class's depth by less than a micrometre a metre. */
const LEVEL_SLOPE = 1e-6;

/** Whether a segment is exactly level in the depth and layer of another that is. */
function alike(mesh: SegmentMesh, a: number, b: number): boolean {
  const z = mesh.z1[a];
  return mesh.z2[a] === z && mesh.z1[b] === z && mesh.z2[b] === z && mesh.layer[a] === mesh.layer[b];
}

export function depthClasses(mesh: SegmentMesh): DepthClasses {
  const of = new Int32Array(mesh.count).fill(-1);
  const keys = new Map<string, number>();
  const classes: { layer: number; z1: number; z2: number; vertical: boolean; members: number }[] = [];
  for (let i = 0; i < mesh.count; i++) {
    if (i > 0 && alike(mesh, i - 1, i)) {
      of[i] = of[i - 1]!;
      if (of[i]! >= 0) classes[of[i]!]!.members++;
      continue;
    }
    const run = Math.hypot(mesh.x2[i]! - mesh.x1[i]!, mesh.y2[i]! - mesh.y1[i]!);
    const rise = Math.abs(mesh.z2[i]! - mesh.z1[i]!);
    const level = rise <= LEVEL_SLOPE * run;
    const upright = run <= LEVEL_SLOPE * rise;
    if (!level && !upright) continue;
    const z1 = level ? (mesh.z1[i]! + mesh.z2[i]!) / 2 : Math.min(mesh.z1[i]!, mesh.z2[i]!);
    const z2 = level ? z1 : Math.max(mesh.z1[i]!, mesh.z2[i]!);
    const layer = mesh.layer[i]!;
    const key = `${layer} ${z1.toPrecision(12)} ${z2.toPrecision(12)}`;
    let at = keys.get(key);
    if (at === undefined) {
      at = classes.length;
      keys.set(key, at);
      classes.push({ layer, z1, z2, vertical: upright, members: 0 });
    }
    classes[at]!.members++;
    of[i] = at;
  }
  return { classes, of };
}
