// Views of a survey: geometric means and scatter by spacing, and each traverse by itself.
import { arrayKey, type FourPinArray, spacingOf } from './arrays.ts';
import type { Reading } from './readings.ts';

/** All readings whose pins stood alike. */
export interface SoundingPoint {
  readonly array: FourPinArray;
  /** a, AB/2 or half the distance between the outermost pins, m */
  readonly spacing: number;
  /** Ω·m */
  readonly geometricMean: number;
  readonly least: number;
  readonly most: number;
  /** standard deviation of ln ρ about its mean; undefined for one reading */
  readonly scatter: number | undefined;
  readonly rows: readonly number[];
}

export interface Sounding {
  /** by kind of array, then by spacing */
  readonly points: readonly SoundingPoint[];
  /** standard deviation of ln ρ within spacings, pooled over them; undefined where no spacing was read twice */
  readonly scatter: number | undefined;
}

/** Geometric mean and scatter per spacing, over traverses and repeated readings; pins alike but for their depth are one spacing. */
export function soundingOf(readings: readonly Reading[]): Sounding {
  const groups = new Map<string, Reading[]>();
  for (const reading of readings) {
    const key = arrayKey(reading.array);
    const group = groups.get(key);
    if (group === undefined) groups.set(key, [reading]);
    else group.push(reading);
  }
  let squares = 0;
  let freedom = 0;
  const points = [...groups.values()].map((group): SoundingPoint => {
    const logs = group.map((reading) => Math.log(reading.apparentResistivity));
    const mean = logs.reduce((sum, x) => sum + x, 0) / logs.length;
    const spread = logs.reduce((sum, x) => sum + (x - mean) ** 2, 0);
    squares += spread;
    freedom += logs.length - 1;
    const values = group.map((reading) => reading.apparentResistivity);
    return {
      array: group[0]!.array,
      spacing: spacingOf(group[0]!.array),
      geometricMean: Math.exp(mean),
      least: Math.min(...values),
      most: Math.max(...values),
      scatter: logs.length > 1 ? Math.sqrt(spread / (logs.length - 1)) : undefined,
      rows: group.map((reading) => reading.row),
    };
  });
  points.sort(
    (p, q) =>
      compareText(p.array.kind, q.array.kind) ||
      p.spacing - q.spacing ||
      compareText(arrayKey(p.array), arrayKey(q.array)),
  );
  return { points, scatter: freedom > 0 ? Math.sqrt(squares / freedom) : undefined };
}

/** The readings of one traverse. */
export interface Traverse {
  readonly name: string;
  readonly readings: readonly Reading[];
  /** mean over its readings of ln(reading/geometric mean of all traverses at that spacing), 0 where it stands alone */
  readonly shift: number;
  /** spacings that another traverse read too */
  readonly shared: number;
}

/** Each traverse by itself, by name. */
export function traversesOf(readings: readonly Reading[]): readonly Traverse[] {
  const means = new Map<string, number>();
  for (const point of soundingOf(readings).points)
    means.set(arrayKey(point.array), Math.log(point.geometricMean));
  const names = [...new Set(readings.map((reading) => reading.traverse))].sort(compareText);
  const elsewhere = (name: string, key: string): boolean =>
    readings.some((other) => other.traverse !== name && arrayKey(other.array) === key);
  return names.map((name): Traverse => {
    const own = readings.filter((reading) => reading.traverse === name);
    const shared = own.filter((reading) => elsewhere(name, arrayKey(reading.array)));
    const total = shared.reduce(
      (sum, reading) => sum + Math.log(reading.apparentResistivity) - means.get(arrayKey(reading.array))!,
      0,
    );
    return {
      name,
      readings: own,
      shift: shared.length > 0 ? total / shared.length : 0,
      shared: new Set(shared.map((reading) => arrayKey(reading.array))).size,
    };
  });
}

function compareText(p: string, q: string): number {
  return p < q ? -1 : p > q ? 1 : 0;
}
