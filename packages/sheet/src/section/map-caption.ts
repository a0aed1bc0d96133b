// What stands under a map: what its fill and lines tell, and the limit that it is drawn against.
import type { CaseResult, DisplayUnits, Outcome } from '@ohmstead/study';
import { givenQuantity, measured, quantity } from '../format/number.ts';
import { quantityText } from '../format/quantity-text.ts';
import type { MapKind } from '../geometry/map-drawing.ts';

/** A limit and what it rests on, `827 V (IEEE 80, 70 kg, 0.5 s, covering 0.1 m)`. */
export function limitText(
  outcome: Outcome,
  of: CaseResult,
  kind: 'touch' | 'step',
  units: DisplayUnits,
): string {
  const { limits } = outcome.results;
  const covering =
    limits.surfacing_thickness_m === null
      ? 'no covering'
      : of[kind].on_covering
        ? `covering ${quantityText('thickness', limits.surfacing_thickness_m, units)}`
        : 'on bare soil, where the worst lies';
  return `${quantity(of[kind].limit_V, 'V')} (${limits.basis}, ${limits.body_mass_kg}\u202fkg, ${givenQuantity(of.duration_s, 's')}, ${covering})`;
}

/** The limit that holds where the map's own does not; empty without a covering. */
export function otherLimit(of: CaseResult, kind: 'touch' | 'step'): string {
  const [bare, covered] =
    kind === 'touch'
      ? [of.bare_touch_limit_V, of.covering_touch_limit_V]
      : [of.bare_step_limit_V, of.covering_step_limit_V];
  if (covered === null) return '';
  return of[kind].on_covering
    ? ` The limit is that of the covering; where there is none it is ${quantity(bare, 'V')}.`
    : ` On the covering the limit is ${quantity(covered, 'V')}.`;
}

/** Caption of a full-width map. */
export function mapCaption(outcome: Outcome, caseIndex: number, kind: MapKind, units: DisplayUnits): string {
  const of = outcome.results.cases[caseIndex];
  switch (kind) {
    case 'potential':
      return `Fill is the share of the rise of ${measured(of.gpr_V, of.gpr_uncertainty_V, 'V')}; lines carry volts.`;
    case 'touch':
      return `Voltage to the metal that can be reached from the place. Fill is the share of the limit of ${limitText(outcome, of, kind, units)}; the red-brown line is the limit, and what lies beyond it is hatched. Paler: outside the assessed area.${otherLimit(of, kind)}`;
    case 'step':
      return `Largest voltage over 1\u202fm about the place. Fill is the share of the limit of ${limitText(outcome, of, kind, units)}. The bar across the ring joins the two feet. Paler: outside the assessed area.${otherLimit(of, kind)}`;
  }
}
