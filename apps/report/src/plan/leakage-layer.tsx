// Leakage over the plan: lines as thick as they pass current to the soil, hollow where they take it from there.
import { type LeakageDrawing, leakageDrawing, leakageThickness, rodRadius } from '@ohmstead/sheet';
import type { Outcome, Point } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useMemo } from 'preact/hooks';
import { groundTransform, type Size, type View } from './view.ts';

/** How much thicker the edge of a hollow line is than its core, pixels. */
const EDGE_PX = 1.6;

export interface LeakageLayerProps {
  readonly outcome: Outcome;
  readonly view: View;
  readonly size: Size;
}

export function LeakageLayer({ outcome, view, size }: LeakageLayerProps): VNode {
  const lines = useMemo(() => <Lines drawing={leakageDrawing(outcome)} />, [outcome]);
  return <g transform={groundTransform(view, size)}>{lines}</g>;
}

function Lines({ drawing }: { readonly drawing: LeakageDrawing }): VNode {
  return (
    <>
      {drawing.classes.map((group, k) => {
        const width = leakageThickness(k);
        return (
          <g key={group.upTo}>
            <Stroke class="leak" d={piecesPath(group.out)} width={width} />
            <Stroke class="leak" d={piecesPath(group.in)} width={width + EDGE_PX} />
            <Stroke class="leak-core" d={piecesPath(group.in)} width={width} />
          </g>
        );
      })}
      {drawing.rods.map(({ x, y, times }) => (
        <Stroke key={`${x} ${y}`} class="leak leak-round" d={`M${x} ${y}h0`} width={2 * rodRadius(times)} />
      ))}
    </>
  );
}

function piecesPath(pieces: readonly (readonly [Point, Point])[]): string {
  return pieces.map(([a, b]) => `M${a[0]} ${a[1]}L${b[0]} ${b[1]}`).join('');
}

interface StrokeProps {
  readonly class: string;
  readonly d: string;
  readonly width: number;
}

function Stroke({ class: name, d, width }: StrokeProps): VNode | null {
  return d === '' ? null : (
    <path class={name} d={d} stroke-width={width} vector-effect="non-scaling-stroke" />
  );
}
