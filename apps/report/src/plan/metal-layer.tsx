// The metal of the draft as ink: lines that keep their width, rods as rings with a dot, what is chosen drawn strong.
import type { Point } from '@ohmstead/study';
import { Fragment, type VNode } from 'preact';
import { useMemo } from 'preact/hooks';
import type { PlanItem } from './plan-conductors.ts';
import { groundTransform, type Size, toScreen, type View } from './view.ts';

const ROD_RADIUS = 4;

export interface MetalLayerProps {
  readonly items: readonly PlanItem[];
  readonly chosen: ReadonlySet<string>;
  readonly hovered: string | undefined;
  readonly floating: ReadonlySet<string>;
  /** what is chosen is shown so far aside while it is dragged, m */
  readonly shift: Point;
  readonly view: View;
  readonly size: Size;
}

/** Lines as path data in metres. */
function lines(items: readonly PlanItem[], [dx, dy]: Point): string {
  return items
    .filter(({ rod }) => !rod)
    .map(({ conductor: { x1, y1, x2, y2 } }) => `M${x1 + dx} ${y1 + dy}L${x2 + dx} ${y2 + dy}`)
    .join('');
}

const STILL: Point = [0, 0];

export function MetalLayer({ items, chosen, hovered, floating, shift, view, size }: MetalLayerProps): VNode {
  const paths = useMemo(() => {
    const isFloating = ({ conductor }: PlanItem): boolean => floating.has(conductor.electrode ?? 'main');
    const solid = items.filter((item) => !isFloating(item) && item.conductor.insulated !== true);
    const insulated = items.filter((item) => !isFloating(item) && item.conductor.insulated === true);
    return {
      all: lines(items, STILL),
      solid: lines(solid, STILL),
      insulated: lines(insulated, STILL),
      floating: lines(items.filter(isFloating), STILL),
    };
  }, [items, floating]);
  const own = items.filter(({ key }) => chosen.has(key));
  const under = items.find(({ key }) => key === hovered);
  return (
    <>
      <g transform={groundTransform(view, size)}>
        <Line class="casing" d={paths.all} />
        <Line class="metal" d={paths.solid} />
        <Line class="metal insulated" d={paths.insulated} />
        <Line class="metal floating" d={paths.floating} />
        {under !== undefined && <Line class="hovered" d={lines([under], STILL)} />}
        <Line class="chosen" d={lines(own, shift)} />
      </g>
      {items
        .filter(({ rod }) => rod)
        .map((item) => (
          <Rod
            key={item.key}
            at={toScreen(view, size, [item.conductor.x1, item.conductor.y1])}
            chosen={chosen.has(item.key)}
          />
        ))}
      {own
        .filter(({ rod }) => rod && (shift[0] !== 0 || shift[1] !== 0))
        .map(({ key, conductor: { x1, y1 } }) => (
          <Rod key={`${key} moved`} at={toScreen(view, size, [x1 + shift[0], y1 + shift[1]])} chosen />
        ))}
    </>
  );
}

function Line({ d, class: name }: { readonly d: string; readonly class: string }): VNode | null {
  return d === '' ? null : <path class={name} d={d} vector-effect="non-scaling-stroke" />;
}

function Rod({ at: [x, y], chosen }: { readonly at: Point; readonly chosen: boolean }): VNode {
  return (
    <Fragment>
      {chosen && <circle class="chosen" cx={x} cy={y} r={ROD_RADIUS + 3} />}
      <circle class="rod" cx={x} cy={y} r={ROD_RADIUS} />
      <circle class="dot" cx={x} cy={y} r={ROD_RADIUS * 0.34} />
    </Fragment>
  );
}
