// A place on the surface: text where the sheet is frozen, a way to it on the plan where it is alive.
import type { VNode } from 'preact';
import { useDesk } from '../desk/use-desk.ts';
import { useUnits } from '../desk/use-units.ts';
import { place } from '../format/length.ts';

/** @param props.x east, m @param props.y north, m */
export function PlaceLink({ x, y }: { x: number; y: number }): VNode {
  const desk = useDesk();
  const text = place(x, y, useUnits());
  if (desk === undefined || !Number.isFinite(x) || !Number.isFinite(y)) return <>{text}</>;
  return (
    <button type="button" class="word to-place" onClick={() => desk.goTo(x, y)}>
      <span class="unseen">show on the plan </span>
      {text}
    </button>
  );
}
