// Floating metal: what potential it takes, and what stands between it and the soil beside it.
import type { ElectrodeResult, Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { quantity } from '../format/number.ts';
import { measuredTold, percentTold, type Told } from '../format/told.ts';
import { capital } from '../format/words.ts';
import { Say } from './parts.tsx';
import { PlaceLink } from './place-link.tsx';
import { Compared, ResultOf } from './result.tsx';

function metalNamed({ results }: Outcome, name: string): ElectrodeResult | undefined {
  return results.electrodes.find((metal) => metal.name === name);
}

/** Potential of floating metal in the first case, V. */
function floatingPotential(of: Outcome, name: string): Told | undefined {
  const metal = metalNamed(of, name);
  const first = of.results.cases[0];
  if (metal === undefined) return undefined;
  const { potential_ratio: ratio, potential_uncertainty_ratio: uncertainty } = metal;
  return measuredTold(ratio * first.gpr_V, uncertainty * first.gpr_V + ratio * first.gpr_uncertainty_V, 'V');
}

/** One piece of metal, or several of one name, that no joint connects to what is energised. */
export function Floating({ outcome, metal }: { outcome: Outcome; metal: ElectrodeResult }): VNode {
  const first = outcome.results.cases[0];
  return (
    <Say>
      {capital(metal.name)}
      {metal.piece_count > 1
        ? `, ${metal.piece_count} pieces that no joint connects, floats at most at`
        : ' floats at'}{' '}
      <ResultOf
        outcome={outcome}
        told={(of) => {
          const found = metalNamed(of, metal.name);
          return found && percentTold(found.potential_ratio);
        }}
      />{' '}
      of the rise, <Compared outcome={outcome} told={(of) => floatingPotential(of, metal.name)} /> for{' '}
      {first.name}.
      {metal.touch_ratio !== null && metal.touch_x_m !== null && metal.touch_y_m !== null && (
        <>
          {' '}
          Between it and the soil within 1{'\u202f'}m of it stands at most{' '}
          {quantity(Math.abs(metal.touch_ratio) * first.gpr_V, 'V', 3)}, at{' '}
          <PlaceLink x={metal.touch_x_m} y={metal.touch_y_m} />, where the metal is the{' '}
          {metal.touch_ratio < 0 ? 'lower' : 'higher'} of the two.
        </>
      )}
    </Say>
  );
}
