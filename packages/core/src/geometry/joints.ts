// Conductors joined to one piece of metal where they touch: nodes, the pieces between them, and what is wrong with the drawing.
import { placeOn } from './conductor-axis.ts';
import { drawingFaults } from './conductor-faults.ts';
import type { ConductorFault, ConductorTable, Snap } from './conductors.ts';
import { SNAP_FLOOR_M } from './contact-tolerances.ts';
import { type Contacts, findContacts } from './contacts.ts';
import { cutConductors } from './cuts.ts';
import { type JoinedMetal, joinPieces } from './joined-metal.ts';
import { nearMisses } from './near-misses.ts';

/** Joined metal, with what is wrong or doubtful about the drawing. */
export interface Joints extends JoinedMetal {
  readonly faults: readonly ConductorFault[];
  /** contacts whose axes do not meet exactly */
  readonly snaps: readonly Snap[];
  /** free ends that stop just short of other metal: doubts for the engineer, joined to nothing */
  readonly nearMisses: readonly Snap[];
}

/**
 * Joins conductors wherever metal touches: crossings, end to end, mid-span, and any number of conductors at one place.
 * Metal touches where the axes come within the sum of the radii and 5 mm; insulated conductors touch at their ends only.
 * Axes are never moved: a piece keeps its own straight line, and the node stands at the mean of the places that touch.
 * @returns joints even of a faulty drawing; a drawing with faults should not be solved
 */
export function joinConductors(table: ConductorTable): Joints {
  const found = findContacts(table);
  const cuts = cutConductors(found.axes, found.contacts);
  const metal = joinPieces(found, cuts);
  return {
    faults: drawingFaults(table, found),
    snaps: snapsOf(found),
    nearMisses: nearMisses(table, found, metal),
    ...metal,
  };
}

function snapsOf({ axes, contacts }: Contacts): Snap[] {
  return contacts
    .filter(({ distance }) => distance > SNAP_FLOOR_M)
    .map(({ conductor, other, s, distance }) => {
      const [x, y, depth] = placeOn(axes[conductor]!, s);
      return { conductor, other, x, y, depth, distance };
    });
}
