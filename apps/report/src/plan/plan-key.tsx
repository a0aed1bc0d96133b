// What fill and lines of the plan tell: shares of the limit and the volts they are, or leakage by thickness.
import {
  Hatch,
  leakageClassText,
  leakageDrawing,
  leakageThickness,
  MapKey,
  mapDrawing,
  plateOf,
  quantity,
} from '@ohmstead/sheet';
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useMemo } from 'preact/hooks';
import type { Shown } from './shown.ts';

const WIDTH = 640;
const HEIGHT = 66;
/** The key of a map begins so far below the ground's frame. */
const KEY_DROP = 46;
const PLATE = plateOf(
  { x: [0, 1], y: [0, 1] },
  { width: WIDTH, most: 1, least: 1, margin: { left: 2, right: 2, top: -1 - KEY_DROP, bottom: 0 } },
);

export interface PlanKeyProps {
  readonly outcome: Outcome;
  readonly caseIndex: number;
  readonly shown: Shown;
}

export function PlanKey({ outcome, caseIndex, shown }: PlanKeyProps): VNode | null {
  return useMemo(() => {
    switch (shown) {
      case 'nothing':
        return null;
      case 'leakage':
        return <LeakageKey outcome={outcome} />;
      default:
        return (
          <svg class="fig plan-key" viewBox={`0 0 ${WIDTH} ${HEIGHT}`} aria-hidden="true">
            <defs>
              <Hatch id="plan-key-hatch" spacing={6.5} />
            </defs>
            <MapKey name="plan-key" plate={PLATE} drawing={mapDrawing(outcome, caseIndex, shown, true)} />
          </svg>
        );
    }
  }, [outcome, caseIndex, shown]);
}

function LeakageKey({ outcome }: { readonly outcome: Outcome }): VNode {
  const { mean, classes } = leakageDrawing(outcome);
  const back = classes.some((group) => group.in.length > 0);
  return (
    <p class="plan-words">
      <span>
        leakage per metre, times the mean of {quantity(mean * 1000, 'mA', 3)} per metre and ampere injected
      </span>
      {classes.map(({ upTo }, k) => (
        <span key={upTo}>
          <svg class="fig key-line" width="26" height="12" aria-hidden="true">
            <path class="leak" d="M2 6H24" stroke-width={leakageThickness(k)} />
          </svg>{' '}
          {leakageClassText(k)}
        </span>
      ))}
      {back && <span>hollow: taken from the soil</span>}
    </p>
  );
}
