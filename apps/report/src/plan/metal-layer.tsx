// The metal of the draft as ink: lines that keep their width, rods as rings with a dot, what is chosen drawn strong.
import type { Point } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useMemo } from 'preact/hooks';
import type { PlanItem } from './plan-conductors.ts';
import { groundTransform, type Size, type View } from './view.ts';

export interface MetalLayerProps {
  readonly items: readonly PlanItem[];
  readonly chosen: ReadonlySet<string>;
  readonly hovered: PlanItem | undefined;
  readonly floating: ReadonlySet<string>;
  /** what is chosen is shown so far aside while it is dragged, m */
  readonly shift: Point;
  readonly view: View;
  readonly size: Size;
}

/** Path data in metres; a rod is a line without length, which a round cap makes a disc of one size on the screen. */
function pathOf(items: readonly PlanItem[], rod: boolean, [dx, dy]: Point): string {
  return items
    .filter((item) => item.rod === rod)
    .map(({ conductor: { x1, y1, x2, y2 } }) =>
      rod ? `M${x1 + dx} ${y1 + dy}h0` : `M${x1 + dx} ${y1 + dy}L${x2 + dx} ${y2 + dy}`,
    )
    .join('');
}

const STILL: Point = [0, 0];

export function MetalLayer(props: MetalLayerProps): VNode {
  const { items, chosen, hovered, floating, shift, view, size } = props;
  const still = useMemo(() => <Still items={items} floating={floating} />, [items, floating]);
  const [dx, dy] = shift;
  const strong = useMemo(
    () => (
      <Strong
        items={items.filter(({ key }) => chosen.has(key))}
        shift={[dx, dy]}
        moved={dx !== 0 || dy !== 0}
      />
    ),
    [items, chosen, dx, dy],
  );
  return (
    <g transform={groundTransform(view, size)}>
      {still}
      {hovered !== undefined && (
        <>
          <Line class="hovered" d={pathOf([hovered], false, STILL)} />
          <Line class="rod-ring hovered" d={pathOf([hovered], true, STILL)} />
          <Rods d={pathOf([hovered], true, STILL)} />
        </>
      )}
      {strong}
    </g>
  );
}

interface StillProps {
  readonly items: readonly PlanItem[];
  readonly floating: ReadonlySet<string>;
}

function Still({ items, floating }: StillProps): VNode {
  const isFloating = ({ conductor }: PlanItem): boolean => floating.has(conductor.electrode ?? 'main');
  const solid = items.filter((item) => !isFloating(item) && item.conductor.insulated !== true);
  const insulated = items.filter((item) => !isFloating(item) && item.conductor.insulated === true);
  const rods = pathOf(items, true, STILL);
  return (
    <>
      <Line class="casing" d={pathOf(items, false, STILL)} />
      <Line class="metal" d={pathOf(solid, false, STILL)} />
      <Line class="metal insulated" d={pathOf(insulated, false, STILL)} />
      <Line class="metal floating" d={pathOf(items.filter(isFloating), false, STILL)} />
      <Line class="rod-ring" d={rods} />
      <Rods d={rods} />
    </>
  );
}

/** Paper and dot within the rings of rods. */
function Rods({ d }: { readonly d: string }): VNode {
  return (
    <>
      <Line class="rod-hole" d={d} />
      <Line class="rod-dot" d={d} />
    </>
  );
}

interface StrongProps {
  readonly items: readonly PlanItem[];
  readonly shift: Point;
  readonly moved: boolean;
}

function Strong({ items, shift, moved }: StrongProps): VNode {
  const rods = pathOf(items, true, shift);
  return (
    <>
      {moved && <Line class="from" d={pathOf(items, false, STILL)} />}
      <Line class="chosen" d={pathOf(items, false, shift)} />
      <Line class="rod-chosen" d={rods} />
      <Line class="rod-ring" d={rods} />
      <Rods d={rods} />
    </>
  );
}

function Line({ d, class: name }: { readonly d: string; readonly class: string }): VNode | null {
  return d === '' ? null : <path class={name} d={d} vector-effect="non-scaling-stroke" />;
}
