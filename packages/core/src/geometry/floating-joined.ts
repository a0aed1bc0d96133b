// Electrodes that are stated to float but touch metal of another electrode that does not.
import type { ConductorFault, ConductorTable } from './conductors.ts';
import type { Joints } from './joints.ts';
import { metres, planPlace } from './length-text.ts';

/**
 * One fault for each conductor of a floating electrode that touches a conductor of an electrode that does not float.
 * @param floatingElectrodes names of the electrodes whose role is floating
 */
export function floatingJoined(
  table: ConductorTable,
  joints: Joints,
  floatingElectrodes: ReadonlySet<string>,
): ConductorFault[] {
  const floats = (c: number): boolean => floatingElectrodes.has(table.electrode[c]!);
  const grounded = new Int32Array(joints.nodeCount).fill(-1);
  for (let piece = 0; piece < joints.pieceCount; piece++) {
    const c = joints.pieceConductor[piece]!;
    if (floats(c)) continue;
    for (const node of [joints.pieceNode1[piece]!, joints.pieceNode2[piece]!]) {
      if (grounded[node] === -1) grounded[node] = c;
    }
  }
  const faults: ConductorFault[] = [];
  for (let piece = 0; piece < joints.pieceCount; piece++) {
    const conductor = joints.pieceConductor[piece]!;
    if (!floats(conductor) || faults.at(-1)?.conductor === conductor) continue;
    const nodes = [joints.pieceNode1[piece]!, joints.pieceNode2[piece]!];
    const node = nodes.find((n) => grounded[n] !== -1);
    if (node === undefined) continue;
    const other = grounded[node]!;
    const place = `${planPlace(joints.nodeX[node]!, joints.nodeY[node]!)}, depth ${metres(joints.nodeDepth[node]!)}`;
    const message = `electrode ${table.electrode[conductor]} is stated to be floating but touches ${table.id[other]} of electrode ${table.electrode[other]} at ${place}`;
    faults.push({ code: 'floating-joined', conductor, other, message });
  }
  return faults;
}
