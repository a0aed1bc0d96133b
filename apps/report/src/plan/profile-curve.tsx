// The curve along a line that the reader drew, from the map of the case.
import { ProfileFigure } from '@ohmstead/sheet';
import type { Outcome, Point } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useMemo } from 'preact/hooks';
import { readingsAlong } from './reading.ts';
import { Word } from './word.tsx';

export interface ProfileCurveProps {
  readonly outcome: Outcome;
  readonly caseIndex: number;
  readonly line: readonly [Point, Point];
  readonly drop: () => void;
}

export function ProfileCurve({ outcome, caseIndex, line: [from, to], drop }: ProfileCurveProps): VNode {
  const along = useMemo((): Outcome => {
    const cases = outcome.cases.map((figures, k) => {
      if (k !== caseIndex) return figures;
      const { distance, potential, touch } = readingsAlong(figures.map, from, to);
      const inside = (_: number, i: number): boolean => !Number.isNaN(potential[i]!);
      return {
        ...figures,
        profile: {
          from,
          to,
          distance: distance.filter(inside),
          potential: potential.filter(inside),
          touch: touch.filter(inside),
        },
      };
    });
    return { ...outcome, cases };
  }, [outcome, caseIndex, from, to]);
  const enough = (along.cases[caseIndex]?.profile.distance.length ?? 0) > 1;
  return (
    <div class="profile-curve">
      {enough ? (
        <ProfileFigure
          outcome={along}
          caseIndex={caseIndex}
          name="drawn-profile"
          title="Along the line drawn"
        />
      ) : (
        <p>The line lies outside the map.</p>
      )}
      <p class="plan-words">
        Between the points of the map, which is good to its stated error.{' '}
        <Word press={drop}>drop the profile</Word>
      </p>
    </div>
  );
}
