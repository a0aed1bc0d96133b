// Tells what the soils that the readings allow make of one result: median and band, never with a ±.
import type { Spread } from '@ohmstead/study';
import type { VNode } from 'preact';
import { bandQuantity, fittedQuantity, outsideBand } from '../format/fitted.ts';

/** `Over the soils that the readings allow: median 1.41 Ω, 5–95 % 1.31–2.32 Ω.` */
export function SoilSpread({ of, unit }: { of: Spread; unit: string }): VNode {
  return (
    <span class="soils-told">
      Over the soils that the readings allow: median <span>{fittedQuantity(of.median, unit)}</span>, 5–95
      {'\u202f'}% <span>{bandQuantity(of, unit)}</span>
      {outsideBand(of) && '; the best fit lies outside that band'}.
    </span>
  );
}
