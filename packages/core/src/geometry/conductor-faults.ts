// What cannot be right in a drawing of conductors: each alone, and pairs that lie on top of each other.
import { type Axis, isRod, placeOn } from './conductor-axis.ts';
import type { ConductorFault, ConductorTable } from './conductors.ts';
import type { Contacts, Covering } from './contacts.ts';
import { metres, millimetres, planPlace } from './length-text.ts';

/** Axes within this of each other on the whole stretch are said to overlap rather than to run beside each other, m. */
const SAME_LINE_M = 5e-4;

/** Faults in the order of the conductors; of a pair the later conductor is told. */
export function drawingFaults(table: ConductorTable, { axes, coverings }: Contacts): ConductorFault[] {
  const faults: ConductorFault[] = [];
  axes.forEach((axis, c) => {
    faults.push(...loneFaults(table, axis, c));
  });
  faults.push(...withoutEchoes(coverings).map((covering) => coveringFault(table, axes, covering)));
  return faults.sort((p, q) => p.conductor - q.conductor);
}

function loneFaults(table: ConductorTable, axis: Axis, conductor: number): ConductorFault[] {
  const faults: ConductorFault[] = [];
  const diameter = 2 * axis.radius;
  if (!(axis.length > diameter)) {
    const message = `length ${millimetres(axis.length)} is not greater than the diameter ${millimetres(diameter)}`;
    faults.push({ code: 'zero-length', conductor, message });
  }
  const depths = [axis.z1, axis.z2];
  const highest = Math.min(...depths);
  if (highest < 0) {
    const [x, y] = placeOn(axis, depths.indexOf(highest));
    const message = `stands ${metres(-highest)} above the surface at ${planPlace(x, y)}; depth is positive downward`;
    faults.push({ code: 'above-surface', conductor, message });
  }
  const shallow = isRod(table, conductor) ? [] : depths.filter((depth) => depth >= 0 && depth < axis.radius);
  if (shallow.length > 0) {
    const depth = Math.min(...shallow);
    const [x, y] = placeOn(axis, depths.indexOf(depth));
    const message = `depth ${millimetres(depth)} at ${planPlace(x, y)} is less than the radius ${millimetres(axis.radius)}`;
    faults.push({ code: 'depth-below-radius', conductor, message });
  }
  return faults;
}

/** Of several rows that a conductor repeats, the first only. */
function withoutEchoes(coverings: readonly Covering[]): readonly Covering[] {
  const told = new Set<number>();
  return coverings.filter(({ meeting, other }) => {
    const echo = meeting.kind === 'duplicate' && told.has(other);
    if (meeting.kind === 'duplicate') told.add(other);
    return !echo;
  });
}

function coveringFault(table: ConductorTable, axes: readonly Axis[], covering: Covering): ConductorFault {
  const { meeting } = covering;
  const conductor = covering.other;
  const other = covering.conductor;
  const id = table.id[other]!;
  if (meeting.kind === 'duplicate') {
    const message = `repeats ${id}${meeting.reversed ? ' in the opposite direction' : ''}`;
    return { code: 'duplicate', conductor, other, message };
  }
  const { from, to, length, farthest } = meeting.stretch;
  const [x1, y1] = placeOn(axes[conductor]!, Math.min(from.t, to.t));
  const [x2, y2] = placeOn(axes[conductor]!, Math.max(from.t, to.t));
  const how = farthest < SAME_LINE_M ? `overlaps ${id}` : `runs within ${millimetres(farthest)} of ${id}`;
  const message = `${how} over ${metres(length)}, from ${planPlace(x1, y1)} to ${planPlace(x2, y2)}`;
  return { code: 'overlap', conductor, other, message };
}
