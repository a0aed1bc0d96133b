// The layered soil as the numbers that a fit moves: logarithms of resistivities and thicknesses, and their bounds.
import type { SoilModel } from '../soil/soil-model.ts';
import { wennerEquivalent } from './investigation-depth.ts';
import type { Reading } from './readings.ts';

export const FEWEST_LAYERS = 1;
/** Beyond, no survey of some dozen readings tells one layer from the next. */
export const MOST_LAYERS = 5;

/** A number of the model: [ln ρ1 … ln ρN, ln t1 … ln t(N−1)] in this order. */
export interface ModelParameter {
  readonly quantity: 'resistivity' | 'thickness';
  /** from 1 at the surface */
  readonly layer: number;
}

export function parameterCount(layers: number): number {
  return 2 * layers - 1;
}

export function modelParameters(layers: number): readonly ModelParameter[] {
  return Array.from({ length: parameterCount(layers) }, (_, j) =>
    j < layers ? { quantity: 'resistivity', layer: j + 1 } : { quantity: 'thickness', layer: j - layers + 1 },
  );
}

/** Soil of the parameters x, shape [2N − 1]. */
export function soilOf(x: ArrayLike<number>): SoilModel {
  const layers = (x.length + 1) / 2;
  return {
    layers: Array.from({ length: layers }, (_, i) => ({
      resistivity: Math.exp(x[i]!),
      thickness: i < layers - 1 ? Math.exp(x[layers + i]!) : Number.POSITIVE_INFINITY,
    })),
  };
}

/** Parameters of a soil, shape [2N − 1]. */
export function parametersOf(soil: SoilModel): Float64Array {
  const { layers } = soil;
  return Float64Array.from([
    ...layers.map((layer) => Math.log(layer.resistivity)),
    ...layers.slice(0, -1).map((layer) => Math.log(layer.thickness)),
  ]);
}

/** A layer may be this many times more or less resistive than any reading … */
const RESISTIVITY_BEYOND_READINGS = 100;
/** … but not beyond what earth materials show, Ω·m: brine to dry crystalline rock (Palacky 1988, from memory) … */
const LEAST_RESISTIVITY = 0.1;
const MOST_RESISTIVITY = 1e5;
/** … unless the readings themselves come near to that. */
const RESISTIVITY_ROOM = 10;
/** Thinnest layer, of the shortest spacing: it changes that reading by its thickness times or over its resistivity only. */
const THINNEST = 0.1;
/** Thickest layer above the last, of the longest spacing: what lies below shifts that reading by less than a tenth. */
const THICKEST = 2;

export interface ParameterBounds {
  /** logarithms, shape [2N − 1] */
  readonly lower: Float64Array;
  readonly upper: Float64Array;
  /** why no smaller and no larger value was tried, by quantity */
  readonly reasons: Readonly<
    Record<ModelParameter['quantity'], { readonly lower: string; readonly upper: string }>
  >;
}

/** Bounds on the parameters of any model fitted to these readings; spacings as of the Wenner array that looks as deep. */
export function parameterBounds(readings: readonly Reading[], layers: number): ParameterBounds {
  const values = readings.map((reading) => reading.apparentResistivity);
  const spacings = readings.map((reading) => wennerEquivalent(reading.array));
  const least = Math.min(...values);
  const most = Math.max(...values);
  const lowest = Math.min(
    Math.max(least / RESISTIVITY_BEYOND_READINGS, LEAST_RESISTIVITY),
    least / RESISTIVITY_ROOM,
  );
  const highest = Math.max(
    Math.min(most * RESISTIVITY_BEYOND_READINGS, MOST_RESISTIVITY),
    most * RESISTIVITY_ROOM,
  );
  const thinnest = THINNEST * Math.min(...spacings);
  const thickest = THICKEST * Math.max(...spacings);
  const parameters = modelParameters(layers);
  const bound = (resistivity: number, thickness: number): Float64Array =>
    Float64Array.from(parameters, (p) => Math.log(p.quantity === 'resistivity' ? resistivity : thickness));
  return {
    lower: bound(lowest, thinnest),
    upper: bound(highest, thickest),
    reasons: {
      resistivity: {
        lower: `the readings do not limit it from below, and less than ${round(lowest)} Ω·m was not tried`,
        upper: `the readings do not limit it from above, and more than ${round(highest)} Ω·m was not tried`,
      },
      thickness: {
        lower: `a layer thinner than ${round(thinnest)} m shows at the shortest spacing only as thickness times or over resistivity`,
        upper: `below ${round(thickest)} m the longest spacing hardly sees`,
      },
    },
  };
}

function round(value: number): string {
  return String(Number(value.toPrecision(3)));
}
