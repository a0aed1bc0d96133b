// The figure of the frozen sheet that tells what the plan shows: on paper nobody can look closer.
import { LeakageFigure, MapFigure, PlanFigure, titles } from '@ohmstead/sheet';
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import type { Shown } from './shown.ts';

export interface FrozenFigureProps {
  readonly outcome: Outcome;
  readonly caseIndex: number;
  readonly shown: Shown;
}

export function FrozenFigure({ outcome, caseIndex, shown }: FrozenFigureProps): VNode {
  const name = 'printed-plan';
  switch (shown) {
    case 'nothing':
      return <PlanFigure outcome={outcome} name={name} title={titles.plan} />;
    case 'leakage':
      return <LeakageFigure outcome={outcome} name={name} title={titles.leakage} />;
    default:
      return (
        <MapFigure
          outcome={outcome}
          caseIndex={caseIndex}
          kind={shown}
          name={name}
          title={titles[shown](outcome.results.cases[caseIndex]?.name ?? '')}
          small={false}
        />
      );
  }
}
