// What is about to be drawn: the points taken, the line to the pointer, the mesh, the band, and why a point falls there.
import type { Point } from '@ohmstead/study';
import type { VNode } from 'preact';
import type { ToolState } from './tool-state.ts';
import { type Size, toScreen, type View } from './view.ts';

export interface DrawingLayerProps {
  readonly tool: ToolState;
  readonly pointer: Point | undefined;
  readonly band: readonly [Point, Point] | undefined;
  /** meshes each way of a mesh that is drawn */
  readonly meshes: readonly [number, number];
  readonly profile: readonly [Point, Point] | undefined;
  /** name of what the pointer is on */
  readonly name: string | undefined;
  readonly view: View;
  readonly size: Size;
}

export function DrawingLayer(props: DrawingLayerProps): VNode {
  const { tool, pointer, band, meshes, profile, name, view, size } = props;
  const on = (place: Point): string => toScreen(view, size, place).join(' ');
  const { taken } = tool;
  const [first] = taken;
  const open = pointer === undefined ? taken : [...taken, pointer];
  return (
    <g class="drawing">
      {profile !== undefined && (
        <>
          <path class="profile-line" d={`M${on(profile[0])}L${on(profile[1])}`} />
          {profile.map((place, k) => {
            const [x, y] = toScreen(view, size, place);
            return <circle key={k} class="taken" cx={x} cy={y} r={3.5} />;
          })}
        </>
      )}
      {tool.tool === 'mesh' && first !== undefined && pointer !== undefined ? (
        <path class="about" d={meshPath(first, pointer, meshes, on)} />
      ) : (
        open.length > 1 && <path class="about" d={`M${open.map(on).join('L')}`} />
      )}
      {taken.map((place) => {
        const [x, y] = toScreen(view, size, place);
        return <circle key={`${x} ${y}`} class="taken" cx={x} cy={y} r={3.5} />;
      })}
      {band !== undefined && <path class="band" d={rectangle(band[0], band[1], on)} />}
      {pointer !== undefined && <Cross at={toScreen(view, size, pointer)} faint={tool.tool === 'select'} />}
      {pointer !== undefined && name !== undefined && (
        <Name at={toScreen(view, size, pointer)} text={name} size={size} />
      )}
    </g>
  );
}

function rectangle(a: Point, b: Point, on: (place: Point) => string): string {
  return `M${on(a)}L${on([b[0], a[1]])}L${on(b)}L${on([a[0], b[1]])}Z`;
}

function meshPath(
  a: Point,
  b: Point,
  [nx, ny]: readonly [number, number],
  on: (place: Point) => string,
): string {
  const lines: string[] = [];
  for (let i = 0; i <= nx; i++) {
    const x = a[0] + ((b[0] - a[0]) * i) / nx;
    lines.push(`M${on([x, a[1]])}L${on([x, b[1]])}`);
  }
  for (let j = 0; j <= ny; j++) {
    const y = a[1] + ((b[1] - a[1]) * j) / ny;
    lines.push(`M${on([a[0], y])}L${on([b[0], y])}`);
  }
  return lines.join('');
}

interface CrossProps {
  readonly at: Point;
  readonly faint: boolean;
}

function Cross({ at: [x, y], faint }: CrossProps): VNode {
  return <path class={faint ? 'cross faint' : 'cross'} d={`M${x - 9} ${y}h18M${x} ${y - 9}v18`} />;
}

interface NameProps {
  readonly at: Point;
  readonly text: string;
  readonly size: Size;
}

/** Beside the pointer, on the side that has room. */
function Name({ at: [x, y], text, size }: NameProps): VNode {
  const right = x < size.width / 2;
  return (
    <text class={right ? 'halo' : 'halo end'} x={right ? x + 12 : x - 12} y={y < 24 ? y + 20 : y - 9}>
      {text}
    </text>
  );
}
