// Segments of one mesh found again in another by what the soil sees of them: ends, radius and layer, to the last bit.
import type { SegmentMesh } from '../geometry/segments.ts';

/** Ends and radius; the layer follows. */
const NUMBERS = 7;

/**
 * Place of each segment among the known ones; −1 for one that is not there. None is found twice.
 * @param segments, known indices into their meshes
 * @returns shape [segments]
 */
export function placesAmongKnown(
  mesh: SegmentMesh,
  segments: Int32Array,
  knownMesh: SegmentMesh,
  known: Int32Array,
): Int32Array {
  const codeOf = coder();
  const first = new Map<number, number>();
  // chains of equal codes, the earliest place first
  const next = new Int32Array(known.length).fill(-1);
  for (let k = known.length - 1; k >= 0; k--) {
    const code = codeOf(knownMesh, known[k]!);
    next[k] = first.get(code) ?? -1;
    first.set(code, k);
  }
  const taken = new Uint8Array(known.length);
  return Int32Array.from(segments, (i) => {
    let at = first.get(codeOf(mesh, i)) ?? -1;
    while (at >= 0 && (taken[at] === 1 || !same(mesh, i, knownMesh, known[at]!))) at = next[at]!;
    if (at >= 0) taken[at] = 1;
    return at;
  });
}

/** A number of 32 bits from those of a segment, by multiplying and adding (Fowler, Noll and Vo, from memory). */
function coder(): (mesh: SegmentMesh, i: number) => number {
  const numbers = new Float64Array(NUMBERS);
  const words = new Uint32Array(numbers.buffer);
  return (mesh, i) => {
    numbers[0] = mesh.x1[i]!;
    numbers[1] = mesh.y1[i]!;
    numbers[2] = mesh.z1[i]!;
    numbers[3] = mesh.x2[i]!;
    numbers[4] = mesh.y2[i]!;
    numbers[5] = mesh.z2[i]!;
    numbers[6] = mesh.radius[i]!;
    let code = mesh.layer[i]!;
    for (let w = 0; w < words.length; w++) code = Math.imul(code ^ words[w]!, 16777619);
    return code;
  };
}

function same(a: SegmentMesh, i: number, b: SegmentMesh, j: number): boolean {
  return (
    a.x1[i] === b.x1[j] &&
    a.y1[i] === b.y1[j] &&
    a.z1[i] === b.z1[j] &&
    a.x2[i] === b.x2[j] &&
    a.y2[i] === b.y2[j] &&
    a.z2[i] === b.z2[j] &&
    a.radius[i] === b.radius[j] &&
    a.layer[i] === b.layer[j]
  );
}
