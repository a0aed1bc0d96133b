// Each electrode by name: its potential and net leakage per ampere injected, and the touch voltage on floating metal.
import {
  type ConductorTable,
  insideArea,
  isRod,
  nearestNode,
  refinementUncertainty,
  worstTouchNearLines,
} from '@ohmstead/core';
import type { ElectrodeResult } from '../results.ts';
import type { Solved } from './levels.ts';
import type { Prepared } from './prepare.ts';
import { conductorLength, isEnergised } from './roles.ts';

/** Electrodes in the order in which the conductor table names them, for the first case's place of injection. */
export function electrodeResults(prepared: Prepared, solved: Solved): ElectrodeResult[] {
  const table = prepared.loaded.conductors;
  const groups = new Map<string, number[]>();
  for (let i = 0; i < table.count; i++) {
    const key = `${isEnergised(prepared, i) ? 'energised' : 'floating'} ${table.electrode[i]!}`;
    groups.set(key, [...(groups.get(key) ?? []), i]);
  }
  return [...groups.values()].map((members) => electrodeResult(prepared, solved, table, members));
}

function electrodeResult(
  prepared: Prepared,
  solved: Solved,
  table: ConductorTable,
  members: readonly number[],
): ElectrodeResult {
  const fine = solved.graph.units[0]!;
  const { mesh } = solved.graph;
  const own = new Set(members);
  let leakage = 0;
  for (let s = 0; s < mesh.count; s++) if (own.has(mesh.conductor[s]!)) leakage += fine.leakage[s]!;
  const pieces = [...new Set(members.map((i) => prepared.componentOf[i]!))];
  const energised = isEnergised(prepared, members[0]!);
  const levels = pieces.map((component) => {
    // nodes of the joints come first in every mesh, so that one index serves the coarse and the fine one
    const node = prepared.joints.nodeComponent.indexOf(component);
    return solved.series.map(
      ({ graph }) => graph.units[0]!.nodePotential[node]! / graph.units[0]!.resistance,
    );
  });
  const highest = levels.reduce((a, b) => (Math.abs(b.at(-1)!) > Math.abs(a.at(-1)!) ? b : a));
  const touch = energised ? undefined : floatingTouch(prepared, solved, table, members, pieces);
  return {
    name: table.electrode[members[0]!]!,
    role: energised ? 'energised' : 'floating',
    piece_count: pieces.length,
    potential_ratio: highest.at(-1)!,
    potential_uncertainty_ratio: refinementUncertainty(highest, 1),
    leakage_ratio: leakage,
    conductor_count: members.length,
    rod_count: members.filter((i) => isRod(table, i)).length,
    conductor_length_m: members.reduce((sum, i) => sum + conductorLength(table, i), 0),
    touch_ratio: touch?.ratio ?? null,
    touch_uncertainty_ratio: touch?.uncertainty ?? null,
    touch_on_covering: touch?.onCovering ?? null,
    touch_x_m: touch?.x ?? null,
    touch_y_m: touch?.y ?? null,
  };
}

/** The worst voltage between floating metal and the soil within reach of it, of the rise, over all its pieces. */
function floatingTouch(
  prepared: Prepared,
  solved: Solved,
  table: ConductorTable,
  members: readonly number[],
  pieces: readonly number[],
): { ratio: number; uncertainty: number; x: number; y: number; onCovering: boolean } {
  const voltageOn = (at: number, component: number): ((x: number, y: number) => number) => {
    const { graph, fields } = solved.series.at(at)!;
    const nearest = nearestNode(graph.mesh, component);
    const { nodePotential, resistance } = graph.units[0]!;
    return (x, y) => (nodePotential[nearest(x, y)]! - fields[0]!.surface(x, y)) / resistance;
  };
  const fine = solved.graph.units[0]!;
  const worst = pieces.map((component) => {
    const nearest = nearestNode(solved.mesh, component);
    const lines = members
      .filter((i) => prepared.componentOf[i] === component)
      .map((i) => [table.x1[i]!, table.y1[i]!, table.x2[i]!, table.y2[i]!] as const);
    const place = worstTouchNearLines(
      lines,
      solved.units[0]!.surface,
      (x, y) => fine.nodePotential[nearest(x, y)]!,
    );
    return { component, ...place };
  });
  const most = worst.reduce((a, b) => (b.value > a.value ? b : a));
  const seen = solved.series.map((_, level) => voltageOn(level, most.component)(most.x, most.y));
  return {
    ratio: most.signed / fine.resistance,
    uncertainty: refinementUncertainty(seen, 1),
    x: most.x,
    y: most.y,
    onCovering: prepared.coveringArea !== undefined && insideArea(prepared.coveringArea, most.x, most.y),
  };
}
