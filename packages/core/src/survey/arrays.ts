// Four pins on a line: their distances, the geometric factor, and resistance ⇄ apparent resistivity.

/** Four pins at equal spacing: current outside, potential inside. */
export interface WennerArray {
  readonly kind: 'wenner';
  /** a, between neighbouring pins, m */
  readonly spacing: number;
  /** b, at which each pin stands for a point electrode, m */
  readonly pinDepth: number;
}

/** A pair of potential pins in the middle between the current pins, at any distance (Schlumberger, Palmer). */
export interface SchlumbergerArray {
  readonly kind: 'schlumberger';
  /** AB/2, from the middle to a current pin, m */
  readonly halfCurrent: number;
  /** MN/2, from the middle to a potential pin, m */
  readonly halfPotential: number;
  readonly pinDepth: number;
}

/** Any four places along a line. */
export interface CollinearArray {
  readonly kind: 'collinear';
  /** where current enters (A) and leaves (B), along the line, m */
  readonly currentPins: readonly [a: number, b: number];
  /** M and N; the reading is potential of M less potential of N over current, m */
  readonly potentialPins: readonly [m: number, n: number];
  readonly pinDepth: number;
}

export type FourPinArray = WennerArray | SchlumbergerArray | CollinearArray;

/** Distances between current and potential pins, m, with the sign that each has in the reading. */
export interface PinDistances {
  /** AM, BM, AN, BN */
  readonly distance: readonly [number, number, number, number];
  readonly sign: readonly [1, -1, -1, 1];
}

const SIGNS = [1, -1, -1, 1] as const;

export function pinDistances(array: FourPinArray): PinDistances {
  switch (array.kind) {
    case 'wenner': {
      const a = array.spacing;
      return { distance: [a, 2 * a, 2 * a, a], sign: SIGNS };
    }
    case 'schlumberger': {
      const near = array.halfCurrent - array.halfPotential;
      const far = array.halfCurrent + array.halfPotential;
      return { distance: [near, far, far, near], sign: SIGNS };
    }
    case 'collinear': {
      const [a, b] = array.currentPins;
      const [m, n] = array.potentialPins;
      return { distance: [Math.abs(m - a), Math.abs(m - b), Math.abs(n - a), Math.abs(n - b)], sign: SIGNS };
    }
  }
}

/** Σ ± f(distance) over the four pairs of pins. */
export function overPins(array: FourPinArray, f: (distance: number) => number): number {
  const { distance, sign } = pinDistances(array);
  let sum = 0;
  for (let i = 0; i < 4; i++) sum += sign[i]! * f(distance[i]!);
  return sum;
}

/**
 * Geometric factor: apparent resistivity over resistance in uniform ground, m; negative where M and N are in reverse.
 *
 * 4π/Σ ±[1/r + 1/√(r² + 4b²)] over AM, BM, AN, BN: pins as points at depth b and their images in the air. For Wenner,
 * 4πa/(1 + 2a/√(a² + 4b²) − a/√(a² + b²)), which tends to 2πa: IEEE Std 81 (from memory). For Schlumberger on the
 * surface, π·c(c + d)/d with c = AB/2 − MN/2 and d = MN (Schlumberger–Palmer, IEEE Std 81, from memory).
 */
export function geometricFactor(array: FourPinArray): number {
  const b = array.pinDepth;
  return (4 * Math.PI) / overPins(array, (r) => 1 / r + 1 / Math.sqrt(r * r + 4 * b * b));
}

/** Apparent resistivity, Ω·m, of a resistance read as (potential of M − potential of N)/current, Ω. */
export function apparentFromResistance(array: FourPinArray, resistance: number): number {
  return geometricFactor(array) * resistance;
}

/** Resistance, Ω, that reads as an apparent resistivity, Ω·m. */
export function resistanceFromApparent(array: FourPinArray, apparent: number): number {
  return apparent / geometricFactor(array);
}

/** The length by which readings of one kind are ordered: a, AB/2, or half the distance between the outermost pins, m. */
export function spacingOf(array: FourPinArray): number {
  switch (array.kind) {
    case 'wenner':
      return array.spacing;
    case 'schlumberger':
      return array.halfCurrent;
    case 'collinear': {
      const pins = [...array.currentPins, ...array.potentialPins];
      return (Math.max(...pins) - Math.min(...pins)) / 2;
    }
  }
}

/** Words that two arrays share when their pins stand alike, pin depth left aside. */
export function arrayKey(array: FourPinArray): string {
  switch (array.kind) {
    case 'wenner':
      return `wenner ${array.spacing}`;
    case 'schlumberger':
      return `schlumberger ${array.halfCurrent} ${array.halfPotential}`;
    case 'collinear': {
      // only distances matter: the line may be read from either end and from any origin
      return `collinear ${pinDistances(array)
        .distance.map((d) => Number(d.toPrecision(9)))
        .join(' ')}`;
    }
  }
}
