// The curve along a line that the reader drew, from the map of the case.
import { ProfileFigure } from '@ohmstead/sheet';
import type { Outcome, Point } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useMemo } from 'preact/hooks';
import { profileOn } from './reading.ts';
import { Word } from './word.tsx';

export interface ProfileCurveProps {
  readonly outcome: Outcome;
  readonly caseIndex: number;
  readonly line: readonly [Point, Point];
  readonly drop: () => void;
}

export function ProfileCurve({ outcome, caseIndex, line: [from, to], drop }: ProfileCurveProps): VNode {
  const along = useMemo((): Outcome | undefined => {
    const map = outcome.cases[caseIndex]?.map;
    const profile = map && profileOn(map, from, to);
    if (profile === undefined) return undefined;
    return {
      ...outcome,
      cases: outcome.cases.map((figures, k) => (k === caseIndex ? { ...figures, profile } : figures)),
    };
  }, [outcome, caseIndex, from, to]);
  return (
    <div class="profile-curve">
      <p class="plan-words">
        <strong>Along the line drawn</strong>
        <span>between the points of the map, which is good to its stated error</span>
        <Word press={drop}>drop the profile</Word>
      </p>
      {along === undefined ? (
        <p>The line lies outside the map.</p>
      ) : (
        <ProfileFigure
          outcome={along}
          caseIndex={caseIndex}
          name="drawn-profile"
          title="Along the line drawn"
        />
      )}
    </div>
  );
}
