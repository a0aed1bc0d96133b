// Wires of an electrode as a plane graph: what they look like from above, joined wherever they cross or touch in plan.
import { bridges, type Graph } from '../numerics/bridges.ts';
import { isRod } from './conductor-axis.ts';
import type { ConductorTable } from './conductors.ts';
import { findContacts } from './contacts.ts';
import { cutConductors } from './cuts.ts';
import { joinPieces } from './joined-metal.ts';

/** A graph whose edges are straight lines in plan that meet at nodes only. */
export interface PlanGraph extends Graph {
  /** m */
  readonly x: Float64Array;
  readonly y: Float64Array;
}

/**
 * Graph of the closed meshes of some conductors, seen from above: tails and single links between blocks are left out.
 * Rods enclose nothing. Insulated conductors are left out too: they do not hold the soil at their potential, so what
 * they enclose is no mesh.
 */
export function meshGraph(table: ConductorTable, conductors: readonly number[]): PlanGraph {
  const wires = conductors.filter((c) => !isRod(table, c) && table.insulated[c] !== 1);
  const contacts = findContacts(flattened(table, wires));
  const joints = joinPieces(contacts, cutConductors(contacts.axes, contacts.contacts));
  const edges = new Map<number, readonly [from: number, to: number]>();
  for (let piece = 0; piece < joints.pieceCount; piece++) {
    const from = Math.min(joints.pieceNode1[piece]!, joints.pieceNode2[piece]!);
    const to = Math.max(joints.pieceNode1[piece]!, joints.pieceNode2[piece]!);
    if (from !== to) edges.set(from * joints.nodeCount + to, [from, to]);
  }
  const pairs = [...edges.values()];
  const whole = {
    nodeCount: joints.nodeCount,
    from: pairs.map(([from]) => from),
    to: pairs.map(([, to]) => to),
  };
  const bridge = bridges(whole);
  return {
    nodeCount: joints.nodeCount,
    from: whole.from.filter((_, e) => bridge[e] === 0),
    to: whole.to.filter((_, e) => bridge[e] === 0),
    x: joints.nodeX,
    y: joints.nodeY,
  };
}

/** Some conductors of a table, all brought to one depth so that crossings in plan are crossings. */
function flattened(table: ConductorTable, rows: readonly number[]): ConductorTable {
  const pick = (column: Float64Array): Float64Array => Float64Array.from(rows, (c) => column[c]!);
  const level = new Float64Array(rows.length);
  return {
    count: rows.length,
    id: rows.map((c) => table.id[c]!),
    x1: pick(table.x1),
    y1: pick(table.y1),
    depth1: level,
    x2: pick(table.x2),
    y2: pick(table.y2),
    depth2: level,
    radius: pick(table.radius),
    material: rows.map((c) => table.material[c]!),
    electrode: rows.map((c) => table.electrode[c]!),
    insulated: new Uint8Array(rows.length),
    resistancePerMetre: pick(table.resistancePerMetre),
  };
}
