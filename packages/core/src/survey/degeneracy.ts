// Layers of which the readings tell only thickness times or over resistivity, said in words.
import { bandOf, type FamilyBand, RESOLVED_RATIO, type SoilFamily } from './ambiguity.ts';

/** A layer above the last whose resistivity and thickness are known only together. */
export interface DegenerateLayer {
  /** from 1 at the surface */
  readonly layer: number;
  /** what is known of it, after Maillet (1947): transverse resistance ρ·t, Ω·m², or longitudinal conductance t/ρ, S */
  readonly known: 'transverse resistance' | 'longitudinal conductance';
  readonly band: FamilyBand;
  readonly message: string;
}

/** Spread of what is known over that of the less spread of ρ and t alone, in logarithms: beyond a half nothing is won. */
const MUCH_NARROWER = 0.5;

/**
 * Degenerate layers of a family. A thin layer more resistive than its neighbours shows by ρ·t alone, a thin more conductive
 * one by t/ρ alone (principle of equivalence, Maillet, Geophysics 12, 1947, from memory): such a layer is reported when its
 * resistivity or its thickness is not resolved but the product or quotient is, with at most half the spread of either.
 */
export function degenerateLayers(family: SoilFamily): readonly DegenerateLayer[] {
  const layers = (family.parameters.length + 1) / 2;
  const found: DegenerateLayer[] = [];
  for (let i = 0; i < layers - 1; i++) {
    const resistivity = family.parameters[i]!;
    const thickness = family.parameters[layers + i]!;
    if (resistivity.resolved && thickness.resolved) continue;
    const alone = Math.min(spread(resistivity), spread(thickness));
    const product = bandOf(family.draws.map((x) => Math.exp(x[i]! + x[layers + i]!)));
    const quotient = bandOf(family.draws.map((x) => Math.exp(x[layers + i]! - x[i]!)));
    const band = spread(product) <= spread(quotient) ? product : quotient;
    if (spread(band) > Math.min(MUCH_NARROWER * alone, Math.log(RESOLVED_RATIO))) continue;
    const known = band === product ? 'transverse resistance' : 'longitudinal conductance';
    const how = band === product ? 'resistivity times thickness' : 'thickness over resistivity';
    const unit = band === product ? 'Ω·m²' : 'S';
    const message =
      `layer ${i + 1} is known only by its ${how}, ${between(band)} ${unit}: ` +
      `soils with a resistivity there from ${between(resistivity)} Ω·m and a thickness from ${between(thickness)} m read alike`;
    found.push({ layer: i + 1, known, band, message });
  }
  return found;
}

function spread(band: FamilyBand): number {
  return Math.log(band.high / band.low);
}

function between(band: FamilyBand): string {
  return `${digits(band.low)} to ${digits(band.high)}`;
}

/** Two digits: more would claim what a band does not know. */
function digits(value: number): string {
  return String(Number(value.toPrecision(2)));
}
