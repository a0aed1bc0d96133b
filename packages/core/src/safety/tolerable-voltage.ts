// The voltages that a body tolerates for the duration of a fault, IEEE Std 80 (clause and equation numbers from memory).

/** kg */
export type BodyMass = 50 | 70;

/** What the feet stand on. */
export interface Footing {
  /** of the covering, or of the soil where there is none, Ω·m */
  readonly resistivity: number;
  /** covering derating factor Cs; 1 where there is no covering */
  readonly coveringFactor: number;
}

/** Body current for one second that 99.5 % of people of that mass survive, A; falls with the root of time (IEEE Std 80-2000/2013, eq. 8 and 9). */
const BODY_CURRENT_1S: Readonly<Record<BodyMass, number>> = { 50: 0.116, 70: 0.157 };

/** Hand to feet or foot to foot, Ω (IEEE Std 80-2000/2013, 7.1). */
const BODY_RESISTANCE = 1000;

/** Resistance of a foot per unit of the resistivity under it, 1/m: a disc of 0.08 m, ρ/(4b), rounded (IEEE Std 80-2000/2013, 7.4). */
const FOOT_RESISTANCE_PER_RESISTIVITY = 3;

/** Durations over which the body current was observed, s (IEEE Std 80-2000/2013, 5.2). */
export const SHORTEST_DURATION_S = 0.03;
export const LONGEST_DURATION_S = 3;

/**
 * Tolerable touch voltage, V: hand to both feet, which stand side by side (in parallel).
 *
 * E_touch = (1000 + 1.5·Cs·ρs)·k/√ts with k = 0.116 (50 kg) or 0.157 (70 kg): IEEE Std 80-2000/2013, eq. 32 and 33.
 * @param duration ts, of the current through the body, s
 * @throws RangeError if the duration lies outside 0.03 to 3 s
 */
export function tolerableTouchVoltage(mass: BodyMass, duration: number, footing: Footing): number {
  return tolerableBodyCurrent(mass, duration) * (BODY_RESISTANCE + footResistance(footing) / 2);
}

/**
 * Tolerable step voltage, V: foot to foot (in series).
 *
 * E_step = (1000 + 6·Cs·ρs)·k/√ts: IEEE Std 80-2000/2013, eq. 29 and 30. Parameters and errors as for touch.
 */
export function tolerableStepVoltage(mass: BodyMass, duration: number, footing: Footing): number {
  return tolerableBodyCurrent(mass, duration) * (BODY_RESISTANCE + 2 * footResistance(footing));
}

/**
 * Tolerable voltage between two pieces of metal, V: hand to hand, without the help of any covering.
 *
 * E_mm = 1000·k/√ts, that is 116/√ts or 157/√ts: IEEE Std 80-2000/2013, eq. 34 and 35. Errors as for touch.
 */
export function tolerableMetalToMetalVoltage(mass: BodyMass, duration: number): number {
  return tolerableBodyCurrent(mass, duration) * BODY_RESISTANCE;
}

/** I_B = k/√ts, A. */
function tolerableBodyCurrent(mass: BodyMass, duration: number): number {
  if (!(duration >= SHORTEST_DURATION_S && duration <= LONGEST_DURATION_S)) {
    throw new RangeError(
      `fault duration: ${duration} s is outside ${SHORTEST_DURATION_S} s to ${LONGEST_DURATION_S} s, for which tolerable body current is known`,
    );
  }
  return BODY_CURRENT_1S[mass] / Math.sqrt(duration);
}

/** R_f = 3·Cs·ρs, Ω. */
function footResistance({ resistivity, coveringFactor }: Footing): number {
  return FOOT_RESISTANCE_PER_RESISTIVITY * coveringFactor * resistivity;
}
