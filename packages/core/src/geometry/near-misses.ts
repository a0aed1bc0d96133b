// Free ends that stop just short of other metal, which a slip of the drawing would explain.
import { placeOn } from './conductor-axis.ts';
import type { ConductorTable, Snap } from './conductors.ts';
import { NEAR_MISS_GAP_M } from './contact-tolerances.ts';
import type { Contacts } from './contacts.ts';
import type { JoinedMetal } from './joined-metal.ts';
import { apart, nearestShare } from './segment-distance.ts';

/**
 * Ends that touch nothing and leave a gap of less than 0.15 m, metal to metal, to a conductor that theirs does not touch
 * either; the nearest conductor of each such end. Place: the free end; distance: between end and axis, m.
 */
export function nearMisses(
  table: ConductorTable,
  { axes, contacts, near }: Contacts,
  metal: JoinedMetal,
): Snap[] {
  const touching = new Set(contacts.map(({ conductor, other }) => conductor * table.count + other));
  const touch = (p: number, q: number): boolean =>
    touching.has(Math.min(p, q) * table.count + Math.max(p, q));
  const misses: Snap[] = [];
  const look = (conductor: number, share: 0 | 1): void => {
    const axis = axes[conductor]!;
    const end = placeOn(axis, share);
    const [x, y, depth] = end;
    let nearest: Snap | undefined;
    for (const other of near.ofPlace(x, y, axis.radius + NEAR_MISS_GAP_M)) {
      if (other === conductor || touch(conductor, other)) continue;
      const axis2 = axes[other]!;
      const distance = apart(end, placeOn(axis2, nearestShare(axis2, end)));
      const gap = distance - axis.radius - axis2.radius;
      if (gap < NEAR_MISS_GAP_M && (nearest === undefined || distance < nearest.distance)) {
        nearest = { conductor, other, x, y, depth, distance };
      }
    }
    if (nearest !== undefined) misses.push(nearest);
  };
  for (let piece = 0; piece < metal.pieceCount; piece++) {
    const conductor = metal.pieceConductor[piece]!;
    const free1 = metal.nodeDegree[metal.pieceNode1[piece]!] === 1;
    const free2 = metal.nodeDegree[metal.pieceNode2[piece]!] === 1;
    if (free1 && metal.pieceStart[piece] === 0) look(conductor, 0);
    if (free2 && metal.pieceEnd[piece] === 1) look(conductor, 1);
  }
  return misses;
}
