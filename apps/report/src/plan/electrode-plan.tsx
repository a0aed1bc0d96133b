// The figure of the electrode with a way from it to the instrument.
import { PlanFigure, planPlate, titles } from '@ohmstead/sheet';
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useMemo } from 'preact/hooks';
import { usePlanDesk } from './plan-desk.ts';
import { Word } from './word.tsx';

export function ElectrodePlan({ outcome }: { readonly outcome: Outcome }): VNode {
  const { goTo, units } = usePlanDesk();
  const figure = useMemo(
    () => <PlanFigure outcome={outcome} name="electrode-plan" title={titles.plan} />,
    [outcome, units],
  );
  const plate = useMemo(() => planPlate(outcome), [outcome]);
  const { x, y } = plate.extent;
  const follow = (event: MouseEvent): void => {
    const svg = event.target instanceof Element ? event.target.closest('svg') : null;
    const matrix = svg?.getScreenCTM()?.inverse();
    if (matrix === undefined) return;
    const at = new DOMPoint(event.clientX, event.clientY).matrixTransform(matrix);
    const { left, right, top, bottom } = plate.frame;
    if (at.x < left || at.x > right || at.y < top || at.y > bottom) return;
    goTo(plate.east(at.x), plate.north(at.y));
  };
  return (
    <div class="electrode-plan">
      {/* biome-ignore lint/a11y/useKeyWithClickEvents lint/a11y/noStaticElementInteractions: the word below leads there by keyboard */}
      <div onClick={follow}>{figure}</div>
      <p class="plan-words">
        <Word press={() => goTo((x[0] + x[1]) / 2, (y[0] + y[1]) / 2)}>
          draw and edit on the plan of voltages
        </Word>
        <span class="soft">or press a place of this figure to be taken there</span>
      </p>
    </div>
  );
}
