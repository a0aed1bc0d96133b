// What figures are drawn from: conductors, joints and areas in metres, and leakage and current by segment.

import { type Box, isRod, type Lattice, lineProfile } from '@ohmstead/core';
import type { CaseFigures, CaseMap, Plan, Profile, SegmentTable } from '../outcome.ts';
import type { Solved, UnitField } from './levels.ts';
import type { Prepared } from './prepare.ts';
import { isEnergised } from './roles.ts';

/** Points of a profile: one every 20 cm on 80 m. */
const PROFILE_POINTS = 401;

export function planOf(prepared: Prepared): Plan {
  const { conductors: table, study } = prepared.loaded;
  const { joints } = prepared;
  return {
    conductors: Array.from({ length: table.count }, (_, i) => ({
      id: table.id[i]!,
      x1: table.x1[i]!,
      y1: table.y1[i]!,
      depth1: table.depth1[i]!,
      x2: table.x2[i]!,
      y2: table.y2[i]!,
      depth2: table.depth2[i]!,
      diameter: 2 * table.radius[i]!,
      material: table.material[i]!,
      electrode: table.electrode[i]!,
      role: isEnergised(prepared, i) ? 'energised' : 'floating',
      insulated: table.insulated[i] === 1,
      rod: isRod(table, i),
    })),
    joints: Array.from({ length: joints.nodeCount }, (_, n) => n)
      .filter((n) => joints.nodeDegree[n]! > 1)
      .map((n) => [joints.nodeX[n]!, joints.nodeY[n]!, joints.nodeDepth[n]!] as const),
    touchArea: prepared.touchArea,
    stepArea: prepared.stepArea,
    areasGiven: { touch: study.areas?.touch !== undefined, step: study.areas?.step !== undefined },
  };
}

export function segmentTable(solved: Solved): SegmentTable {
  const { mesh, graph } = solved;
  const unit = graph.units[0]!;
  return {
    count: mesh.count,
    conductor: mesh.conductor,
    x1: mesh.x1,
    y1: mesh.y1,
    depth1: mesh.z1,
    x2: mesh.x2,
    y2: mesh.y2,
    depth2: mesh.z2,
    leakage: unit.leakage.map((current, i) => current / mesh.length[i]!),
    along: unit.along,
  };
}

/** @param through place of the worst touch voltage, m */
export function caseFigures(
  name: string,
  current: number,
  unit: UnitField,
  box: Box,
  through: { readonly x: number; readonly y: number },
): CaseFigures {
  return { name, map: caseMap(current, unit), profile: caseProfile(current, unit, box, through) };
}

function caseMap(current: number, unit: UnitField): CaseMap {
  const { potential } = unit;
  const volts = (lattice: Lattice): Float64Array => lattice.values.map((value) => current * value);
  return {
    x0: potential.x0,
    y0: potential.y0,
    dx: potential.spacing,
    dy: potential.spacing,
    nx: potential.nx,
    ny: potential.ny,
    potential: volts(unit.potential),
    touch: volts(unit.touch),
    step: volts(unit.step),
    error: current * potential.error,
  };
}

/** Through the worst touch voltage, along the longer side of the plan. */
function caseProfile(
  current: number,
  unit: UnitField,
  box: Box,
  through: { readonly x: number; readonly y: number },
): Profile {
  const { x, y } = through;
  const eastward = box.east - box.west >= box.north - box.south;
  const from: [number, number] = eastward ? [box.west, y] : [x, box.south];
  const to: [number, number] = eastward ? [box.east, y] : [x, box.north];
  return profileAlong(current, unit, from, to);
}

/** Potential and touch voltage along a line on the surface, from its first point to its second. */
export function profileAlong(
  current: number,
  unit: UnitField,
  from: readonly [number, number],
  to: readonly [number, number],
): Profile {
  const line = lineProfile(unit.surface, unit.metal, from, to, PROFILE_POINTS);
  return {
    from,
    to,
    distance: line.distance,
    potential: line.potential.map((v) => current * v),
    touch: line.touch.map((v) => current * v),
  };
}
