// Where the plan is looked at: the whole of it until the reader looks closer or is taken to a place.
import type { Outcome, Point } from '@ohmstead/study';
import type { RefObject } from 'preact';
import { useEffect, useMemo, useState } from 'preact/hooks';
import type { PlanItem } from './plan-conductors.ts';
import { planExtent } from './plan-extent.ts';
import { useSize } from './use-size.ts';
import { centred, fitView, type Size, type View, zoomed } from './view.ts';

/** Least pixels a metre at a place that the reader is taken to. */
const GOAL_SCALE = 24;

export interface Looking {
  readonly view: View;
  readonly size: Size;
  readonly look: (change: (view: View) => View) => void;
  /** larger or smaller about the middle */
  readonly zoom: (factor: number) => void;
  readonly whole: () => void;
  /** a place that the reader was taken to and has not left */
  readonly goal: Point | undefined;
  readonly leaveGoal: () => void;
}

export function useLooking(
  svg: RefObject<SVGSVGElement | null>,
  outcome: Outcome,
  items: readonly PlanItem[],
  goal: { readonly at: Point } | undefined,
): Looking {
  const size = useSize(svg);
  const extent = useMemo(() => planExtent(outcome, items), [outcome, items]);
  const [looked, setLooked] = useState<View>();
  const [left, setLeft] = useState<typeof goal>();
  const view = useMemo(() => looked ?? fitView(extent, size), [looked, extent, size]);
  const look = (change: (view: View) => View): void => setLooked((now) => change(now ?? view));
  useEffect(() => {
    if (goal === undefined) return;
    look((now) => centred(now, goal.at, GOAL_SCALE));
    svg.current?.focus({ preventScroll: true });
    svg.current?.scrollIntoView({ block: 'center' });
  }, [goal]);
  return {
    view,
    size,
    look,
    zoom: (factor) => look((now) => zoomed(now, size, [size.width / 2, size.height / 2], factor)),
    whole: () => {
      setLooked(undefined);
      setLeft(goal);
    },
    goal: goal === left ? undefined : goal?.at,
    leaveGoal: () => setLeft(goal),
  };
}
