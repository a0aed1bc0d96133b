// All places where conductors touch, and all pairs that lie on top of each other.
import { type Axis, conductorAxes } from './conductor-axis.ts';
import type { ConductorTable } from './conductors.ts';
import { CONTACT_TOLERANCE_M, reachOf } from './contact-tolerances.ts';
import { type Meeting, meetingOf } from './meeting.ts';
import { type Neighbours, neighbours } from './neighbours.ts';
import type { Approach } from './segment-distance.ts';

/** A place where two conductors touch, as shares 0 … 1 along each; conductor < other. */
export interface Contact extends Approach {
  readonly conductor: number;
  readonly other: number;
}

/** Two conductors on top of each other; conductor < other. */
export interface Covering {
  readonly conductor: number;
  readonly other: number;
  readonly meeting: Extract<Meeting, { kind: 'overlap' | 'duplicate' }>;
}

export interface Contacts {
  readonly axes: readonly Axis[];
  readonly near: Neighbours;
  /** in the order of the conductors; metal on top of metal is in contact at both ends of the stretch */
  readonly contacts: readonly Contact[];
  readonly coverings: readonly Covering[];
}

/** Pairs on top of each other after which no more are looked for: so many are one mistake repeated, and every pair of a large heap would fill the memory. */
export const MOST_COVERINGS = 2000;

export function findContacts(table: ConductorTable): Contacts {
  const axes = conductorAxes(table);
  const near = neighbours(axes);
  const contacts: Contact[] = [];
  const coverings: Covering[] = [];
  for (let conductor = 0; conductor < table.count && coverings.length < MOST_COVERINGS; conductor++) {
    const axis = axes[conductor]!;
    for (const other of near.ofConductor(conductor, CONTACT_TOLERANCE_M)) {
      if (other <= conductor || outOfDepth(axis, axes[other]!)) continue;
      const meeting = meetingOf(
        axis,
        table.insulated[conductor] === 1,
        axes[other]!,
        table.insulated[other] === 1,
      );
      switch (meeting.kind) {
        case 'apart':
          break;
        case 'contact':
          for (const approach of meeting.contacts) contacts.push({ conductor, other, ...approach });
          break;
        case 'overlap':
        case 'duplicate': {
          const { from, to, nearest } = meeting.stretch;
          coverings.push({ conductor, other, meeting });
          contacts.push({ conductor, other, ...from, distance: nearest });
          contacts.push({ conductor, other, ...to, distance: nearest });
          break;
        }
      }
    }
  }
  return { axes, near, contacts, coverings };
}

/** Whether two conductors lie too far apart in depth to touch, told without the distance of their axes. */
function outOfDepth(a: Axis, b: Axis): boolean {
  const reach = reachOf(a.radius, b.radius);
  const aboveB = Math.max(a.z1, a.z2) + reach < Math.min(b.z1, b.z2);
  const belowB = Math.min(a.z1, a.z2) - reach > Math.max(b.z1, b.z2);
  return aboveB || belowB;
}
