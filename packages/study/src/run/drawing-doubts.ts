// Doubts about the drawing that do not stop it from being solved.
import { type ConductorTable, conductorMaterials, insideArea, type Joints } from '@ohmstead/core';
import type { ResultsWarning } from '../results.ts';
import type { Polygon } from '../study.ts';
import { listed } from './listed.ts';

/** Pieces of conductor shorter than this many radii leave the thin-wire model ill-posed (common practice, no source). */
const SHORTEST_RADII = 4;

export function drawingDoubts(
  table: ConductorTable,
  joints: Joints,
  energised: ReadonlySet<number>,
  componentOf: Int32Array,
  touchArea: readonly Polygon[],
): ResultsWarning[] {
  return [
    ...shortPieces(table, joints),
    ...outsideTouchArea(table, energised, componentOf, touchArea),
    ...magneticMetal(table),
  ];
}

function shortPieces(table: ConductorTable, joints: Joints): ResultsWarning[] {
  const ids = new Set<string>();
  for (let piece = 0; piece < joints.pieceCount; piece++) {
    const c = joints.pieceConductor[piece]!;
    const length = Math.hypot(
      table.x2[c]! - table.x1[c]!,
      table.y2[c]! - table.y1[c]!,
      table.depth2[c]! - table.depth1[c]!,
    );
    const share = joints.pieceEnd[piece]! - joints.pieceStart[piece]!;
    if (share * length < SHORTEST_RADII * table.radius[c]!) ids.add(table.id[c]!);
  }
  if (ids.size === 0) return [];
  return [
    {
      code: 'segment-short',
      message: `between joints ${listed([...ids])} ${ids.size === 1 ? 'has a piece' : 'have pieces'} shorter than ${SHORTEST_RADII} radii, where the thin-wire model is doubtful`,
    },
  ];
}

/** Energised metal with an end outside the area in which touch is judged. */
function outsideTouchArea(
  table: ConductorTable,
  energised: ReadonlySet<number>,
  componentOf: Int32Array,
  touchArea: readonly Polygon[],
): ResultsWarning[] {
  const ids: string[] = [];
  for (let i = 0; i < table.count; i++) {
    if (!energised.has(componentOf[i]!)) continue;
    const within =
      insideArea(touchArea, table.x1[i]!, table.y1[i]!) && insideArea(touchArea, table.x2[i]!, table.y2[i]!);
    if (!within) ids.push(table.id[i]!);
  }
  if (ids.length === 0) return [];
  return [
    {
      code: 'metal-outside-touch-area',
      message: `energised metal reaches outside the touch area and is not judged there: ${listed(ids)}; name areas where a hand can reach it`,
    },
  ];
}

function magneticMetal(table: ConductorTable): ResultsWarning[] {
  const steel = new Set(
    table.material.filter((name, i) => Number.isNaN(table.resistancePerMetre[i]!) && MAGNETIC.test(name)),
  );
  if (steel.size === 0) return [];
  const labels = [...steel].map((name) => conductorMaterials.get(name)?.label ?? name);
  return [
    {
      code: 'steel-direct-current',
      message: `${labels.join(', ')}: at power frequency magnetic metal has about twice the resistance taken here and an inductance besides; give resistance_ohm_per_m where the metal's own drop matters (large electrodes in soil below 100 Ω·m)`,
    },
  ];
}

/** Materials of magnetic steel throughout; clad steel carries its current in the cladding first. */
const MAGNETIC = /^(steel|zinc-coated|stainless-clad)/;
