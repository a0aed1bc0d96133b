// A ringed place with a leader line and a note of a few lines beside it.
import type { VNode } from 'preact';
import { about, type Box, grown } from '../geometry/box.ts';
import { type Callout, placeCallout } from '../geometry/callout.ts';
import type { Occupancy } from '../geometry/occupancy.ts';
import { blockSize, LINE_EM } from '../geometry/text-size.ts';
import { Path } from './drawn.tsx';
import { px } from './path.ts';

export interface NoteRequest {
  readonly x: number;
  readonly y: number;
  /** ways to break the note into lines, best liked first */
  readonly layouts: readonly (readonly string[])[];
  /** greatest size the text takes on any screen, drawing units */
  readonly fontSize: number;
  readonly bounds: Box;
  readonly avoid: readonly Box[];
  readonly cost: (x: number, y: number) => number;
  readonly lines: Occupancy;
}

export interface PlacedNote {
  readonly x: number;
  readonly y: number;
  readonly lines: readonly string[];
  readonly callout: Callout;
}

/** Radius of the ring about the place, drawing units. */
export const RING_RADIUS = 6;
/** Gap between leader line and text, drawing units. */
const GAP = 4;

/** Finds the note's place, in the layout that finds the best one. */
export function placedNote(request: NoteRequest): PlacedNote {
  const { x, y, layouts, fontSize } = request;
  const placed = layouts.map((lines): PlacedNote => {
    const { width, height } = blockSize(lines, fontSize);
    return { x, y, lines, callout: placeCallout({ ...request, width: width + 2 * GAP, height }) };
  });
  return placed.reduce((best, other) => (other.callout.price < best.callout.price ? other : best));
}

/** What a note covers, for labels that keep clear of it. */
export function noteBoxes(note: PlacedNote): readonly Box[] {
  return [note.callout.box, grown(about(note.x, note.y, 2 * RING_RADIUS, 2 * RING_RADIUS), 2)];
}

export interface NoteProps {
  readonly note: PlacedNote;
  /** the place exceeds a limit */
  readonly beyond: boolean;
  /** both feet of a step, joined by a bar */
  readonly feet?: readonly (readonly [number, number])[];
  /** no line of the text is strong */
  readonly plain?: boolean;
  /** of the ring, drawing units; larger about a mark that has to be seen in it */
  readonly radius?: number;
}

/** The ring, the leader line and the text, the first line strong. */
export function Note({ note, beyond, feet, plain, radius = RING_RADIUS }: NoteProps): VNode {
  const { x, y, lines, callout } = note;
  const [lx, ly] = callout.leader;
  const away = Math.hypot(lx - x, ly - y);
  const start = away > 0 ? Math.min(1, radius / away) : 0;
  const d = `M${px(x + start * (lx - x))},${px(y + start * (ly - y))}L${px(lx)},${px(ly)}`;
  const line = beyond ? 'warn-line' : '';
  const right = callout.side === 'right';
  const tx = px(right ? lx + GAP : lx - GAP);
  const first = 0.36 - ((lines.length - 1) * LINE_EM) / 2;
  return (
    <g>
      <Path class="under" d={d} />
      <Path class={`leader ${line}`} d={d} />
      <circle class="disc" cx={px(x)} cy={px(y)} r={radius + 1.6} />
      <circle class={`ring ${line}`} cx={px(x)} cy={px(y)} r={radius} />
      {feet !== undefined && (
        <Path
          class={`ring ${line}`}
          d={feet.map(([fx, fy], k) => `${k === 0 ? 'M' : 'L'}${px(fx)},${px(fy)}`).join('')}
        />
      )}
      <text class={`halo ${right ? '' : 'end'} ${beyond ? 'warn' : ''}`.trim()} y={px(ly)}>
        {lines.map((text, k) => (
          <tspan
            key={text}
            x={tx}
            dy={`${k === 0 ? first : LINE_EM}em`}
            class={k === 0 && plain !== true ? 'strong' : undefined}
          >
            {text}
          </tspan>
        ))}
      </text>
    </g>
  );
}
