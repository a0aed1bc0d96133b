// The conductor table: one straight piece of metal a row, as struct of arrays in SI units.

/** Straight conductors, shape [count] each; depths are positive downward from the soil surface. */
export interface ConductorTable {
  readonly count: number;
  /** the user's name of the row, or its place in the table as text, unique within the table */
  readonly id: readonly string[];
  /** ends in plan and depth, m */
  readonly x1: Float64Array;
  readonly y1: Float64Array;
  readonly depth1: Float64Array;
  readonly x2: Float64Array;
  readonly y2: Float64Array;
  readonly depth2: Float64Array;
  /** radius of the metal, m */
  readonly radius: Float64Array;
  /** key into the table of conductor materials */
  readonly material: readonly string[];
  /** name of the electrode the conductor is drawn as a part of */
  readonly electrode: readonly string[];
  /** 1 where the conductor has an insulating jacket: it carries current but leaks none */
  readonly insulated: Uint8Array;
  /** resistance per metre, Ω/m, where the user gives it; NaN where material and section decide */
  readonly resistancePerMetre: Float64Array;
}

/** A fault of the drawing, told of one conductor and, where two are concerned, of the other. */
export interface ConductorFault {
  readonly code:
    | 'zero-length'
    | 'above-surface'
    | 'depth-below-radius'
    | 'duplicate'
    | 'overlap'
    | 'floating-joined';
  readonly conductor: number;
  readonly other?: number;
  readonly message: string;
}

/** Metal that touches without its axes meeting, joined as one node. */
export interface Snap {
  readonly conductor: number;
  readonly other: number;
  /** place on the first conductor, m */
  readonly x: number;
  readonly y: number;
  readonly depth: number;
  /** distance between the two axes that was bridged, m */
  readonly distance: number;
}
