// How much the decaying direct-current part of a fault adds to its effect on the body.

/**
 * Decrement factor Df: root mean square of the asymmetrical current over the fault, per symmetrical current.
 *
 * Df = √(1 + (Ta/tf)·(1 − e^(−2·tf/Ta))), Ta = (X/R)/(2πf): IEEE Std 80-2000, eq. 79; IEEE Std 80-2013, eq. 84.
 * @param xOverR X/R at the place of the fault; undefined or 0 where no offset is to be counted, which gives 1
 * @param frequency f, Hz
 * @param duration tf, s
 * @throws RangeError if X/R is negative, or frequency or duration is not positive
 */
export function decrementFactor(xOverR: number | undefined, frequency: number, duration: number): number {
  if (xOverR === undefined || xOverR === 0) return 1;
  if (!(xOverR > 0)) throw new RangeError(`X/R: ${xOverR} is negative`);
  if (!(frequency > 0)) throw new RangeError(`frequency: ${frequency} Hz is not positive`);
  if (!(duration > 0)) throw new RangeError(`fault duration: ${duration} s is not positive`);
  const timeConstant = xOverR / (2 * Math.PI * frequency);
  return Math.sqrt(1 - (timeConstant / duration) * Math.expm1((-2 * duration) / timeConstant));
}
