// The current that enters the ground through the electrode.

export interface FaultToGround {
  /** If = 3·I0, symmetrical root mean square, A */
  readonly faultCurrent: number;
  /** Sf, the share that returns through the ground; shield wires and sheaths carry the rest */
  readonly divisionFactor: number;
  /** Df */
  readonly decrementFactor: number;
}

/** Maximum grid current I_G = Df·Sf·If, A: IEEE Std 80-2000/2013, 15.1 (from memory). */
export function gridCurrent({ faultCurrent, divisionFactor, decrementFactor }: FaultToGround): number {
  return decrementFactor * divisionFactor * faultCurrent;
}
