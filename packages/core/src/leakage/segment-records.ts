// The mesh as one record a segment, in the order in which entries of the leakage matrix need it.
import type { SegmentMesh } from '../geometry/segments.ts';
import { CLOSED_FORM_RATIO, SINGLE_RATIO } from './pair-potential.ts';

/** Doubles of a record; the kernel reads the same ones (assembly/layout.ts). */
export const RECORD = 16;
/** Centre in plan, half vector in plan (nothing for a vertical class), a third of its square, radius². */
export const CX = 0;
export const CY = 1;
export const HX = 2;
export const HY = 3;
export const THIRD = 4;
export const AA = 5;
/** Squared distances from which one place of a table does, and from which the pair is far. */
export const SINGLE = 6;
export const NEAR = 7;
/** Depth of the centre, unit vector, length. */
export const CZ = 8;
export const UX = 9;
export const UY = 10;
export const UZ = 11;
export const LENGTH = 12;
/** Orders segments by layer, then index. */
export const RANK = 13;
/** Place of the class number, left for the kernel. */
export const CLASS = 14;
/** Squared distance in plan between centres from which tables of all images hold. */
export const LEAST = 15;

/** Segments of one layer before those of the next: more than a mesh can have. */
const LAYER_RANK = 2 ** 31;

/**
 * @param upright whether a segment belongs to a class of vertical ones
 * @param uprightLeast distance in plan of a point from which tables of all images of a vertical segment hold, m
 * @returns shape [mesh.count × RECORD]
 * @throws RangeError where a coordinate is not a number: an entry of it would be read from beyond its table
 */
export function segmentRecords(
  mesh: SegmentMesh,
  upright: (i: number) => boolean,
  uprightLeast: number,
): Float64Array {
  const records = new Float64Array(mesh.count * RECORD);
  for (let i = 0; i < mesh.count; i++) {
    const at = i * RECORD;
    const dx = mesh.x2[i]! - mesh.x1[i]!;
    const dy = mesh.y2[i]! - mesh.y1[i]!;
    const dz = mesh.z2[i]! - mesh.z1[i]!;
    const length = Math.sqrt(dx * dx + dy * dy + dz * dz);
    const cx = (mesh.x1[i]! + mesh.x2[i]!) / 2;
    const cy = (mesh.y1[i]! + mesh.y2[i]!) / 2;
    const cz = (mesh.z1[i]! + mesh.z2[i]!) / 2;
    if (!(length > 0 && Number.isFinite(length + cx + cy + cz)))
      throw new RangeError(`segment ${i} has no length or place: ${length} m at ${cx}, ${cy}, ${cz}`);
    const vertical = upright(i);
    const share = vertical ? 0 : 0.5;
    const hx = share * dx;
    const hy = share * dy;
    const third = (hx * hx + hy * hy) / 3;
    const near = CLOSED_FORM_RATIO ** 2 * length * length;
    records[at + CX] = cx;
    records[at + CY] = cy;
    records[at + HX] = hx;
    records[at + HY] = hy;
    records[at + THIRD] = third;
    records[at + AA] = mesh.radius[i]! ** 2;
    records[at + SINGLE] = Math.max(near, SINGLE_RATIO ** 2 * 12 * third);
    records[at + NEAR] = near;
    records[at + CZ] = cz;
    records[at + UX] = dx / length;
    records[at + UY] = dy / length;
    records[at + UZ] = dz / length;
    records[at + LENGTH] = length;
    // points on a level wire are then at least half as far as its centre
    records[at + LEAST] = vertical ? 4 * uprightLeast ** 2 : 12 * third;
    records[at + RANK] = mesh.layer[i]! * LAYER_RANK + i;
  }
  return records;
}
