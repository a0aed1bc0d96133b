// Vertical metal by place: all that leaks at one place in plan is one function of the distance from it, a table a leakage.
import { type RadialTable, radialTable, radialValue, STRIDE } from '../leakage/radial-table.ts';
import { logarithm } from '../numerics/elementary.ts';
import type { SegmentGroup } from './segment-group.ts';

/** The potentials of all vertical segments at one place. */
export interface RodTables {
  readonly x: number;
  readonly y: number;
  /** one a leakage, with the same bins but for the values */
  readonly tables: readonly RadialTable[];
}

interface Part {
  readonly group: SegmentGroup;
  readonly at: number;
}

/** Doubles of a bin that are not values: its centre and reciprocal half width. */
const BIN_HEAD = 2;

/**
 * @param groups vertical metal, one depth class each
 * @param cases leakages
 * @param reach largest distance asked for, m
 */
export function rodTables(groups: readonly SegmentGroup[], cases: number, reach: number): RodTables[] {
  const places = new Map<string, Part[]>();
  for (const group of groups)
    for (let at = 0; at < group.count; at++) {
      const key = `${group.cx[at]!} ${group.cy[at]!}`;
      const parts = places.get(key);
      if (parts === undefined) places.set(key, [{ group, at }]);
      else parts.push({ group, at });
    }
  // rods of one kind share the tables of their parts
  const made = new Map<string, RadialTable>();
  return [...places.values()].map((parts) => {
    const above = parts.reduce(
      (least, { group }) => Math.min(least, group.z1 ** 2 + group.radiusSquared),
      Infinity,
    );
    const tables = parts.map(({ group }) => {
      const key = `${groups.indexOf(group)} ${above}`;
      const table = made.get(key) ?? radialTable((rr) => uprightMean(group, rr), Math.sqrt(above), reach);
      made.set(key, table);
      return table;
    });
    const { group, at } = parts[0]!;
    const strengths = (u: number): number[] => parts.map((part) => part.group.strength[part.at * cases + u]!);
    return {
      x: group.cx[at]!,
      y: group.cy[at]!,
      tables: Array.from({ length: cases }, (_, u) => summed(tables, strengths(u))),
    };
  });
}

/** Mean of all images along a vertical segment: closed form for its own distance, the table for the rest. */
export function uprightMean({ z1, z2, radiusSquared, ownWeight, rest }: SegmentGroup, rr: number): number {
  const length = z2 - z1;
  const a = z1 * z1 + radiusSquared + rr;
  const b = z2 * z2 + radiusSquared + rr;
  const ends = Math.sqrt(a) + Math.sqrt(b);
  return (
    (ownWeight * logarithm((ends + length) / (ends - length))) / length +
    (rest === undefined ? 0 : radialValue(rest, rr))
  );
}

function summed(tables: readonly RadialTable[], strengths: readonly number[]): RadialTable {
  const [first] = tables;
  const bins = new Float64Array(first!.bins.length);
  tables.forEach((table, t) => {
    const strength = strengths[t]!;
    for (let k = 0; k < bins.length; k++) bins[k]! += strength * table.bins[k]!;
  });
  for (let bin = 0; bin < bins.length; bin += STRIDE)
    for (let k = bin; k < bin + BIN_HEAD; k++) bins[k] = first!.bins[k]!;
  return { ...first!, bins };
}
