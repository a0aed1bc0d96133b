// Rings the worst place of what the map shows, and a place that the reader was taken to.
import { measured } from '@ohmstead/sheet';
import type { Outcome, Point } from '@ohmstead/study';
import type { VNode } from 'preact';
import type { Shown } from './shown.ts';
import { type Size, toScreen, type View } from './view.ts';

export interface WorstLayerProps {
  readonly outcome: Outcome;
  readonly caseIndex: number;
  readonly shown: Shown;
  readonly goal: Point | undefined;
  readonly view: View;
  readonly size: Size;
}

export function WorstLayer({ outcome, caseIndex, shown, goal, view, size }: WorstLayerProps): VNode {
  const result = outcome.results.cases[caseIndex];
  const worst = shown === 'touch' || shown === 'step' ? result?.[shown] : undefined;
  return (
    <g>
      {worst !== undefined && (
        <Ring
          at={toScreen(view, size, [worst.x_m, worst.y_m])}
          beyond={!worst.within_limit}
          text={measured(worst.worst_V, worst.uncertainty_V, 'V')}
        />
      )}
      {goal !== undefined && <Ring at={toScreen(view, size, goal)} beyond={false} text="" wide />}
    </g>
  );
}

interface RingProps {
  readonly at: Point;
  readonly beyond: boolean;
  readonly text: string;
  readonly wide?: boolean;
}

function Ring({ at: [x, y], beyond, text, wide = false }: RingProps): VNode {
  return (
    <g>
      <circle class="under" cx={x} cy={y} r={wide ? 14 : 7} />
      <circle class={beyond ? 'ring warn-line' : 'ring'} cx={x} cy={y} r={wide ? 14 : 7} />
      {text !== '' && (
        <>
          <path class={beyond ? 'leader warn-line' : 'leader'} d={`M${x + 6} ${y - 4}l22 -14`} />
          <text class={beyond ? 'strong halo warn' : 'strong halo'} x={x + 31} y={y - 19} dy="0.3em">
            {text}
          </text>
        </>
      )}
    </g>
  );
}
