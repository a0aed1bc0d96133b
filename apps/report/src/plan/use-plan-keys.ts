// The plan by keyboard: a cross that moves, and everything that a pointer does.
import type { Point } from '@ohmstead/study';
import { useRef } from 'preact/hooks';
import type { Conductor } from '../desk/conductor.ts';

/** What keys do; a deed that is undefined leaves its key to the page. */
export interface PlanKeys {
  /** m; 0 for none */
  readonly gridStep: number;
  readonly cursor: Point | undefined;
  /** where the cross appears first */
  readonly middle: Point;
  readonly moveCross: (to: Point) => void;
  /** moves what is in hand; undefined: arrows move the cross */
  readonly nudge: ((by: Point) => void) | undefined;
  readonly remove: (() => void) | undefined;
  readonly copy: (() => readonly Conductor[]) | undefined;
  readonly paste: (conductors: readonly Conductor[], by: Point) => void;
  readonly all: () => void;
  readonly zoom: (factor: number) => void;
  /** @param more adds to what is chosen */
  readonly enter: (place: Point, more: boolean) => void;
  /** ends what is being drawn */
  readonly finish: (() => void) | undefined;
  readonly leave: () => void;
}

export const KEYS_WORDS: readonly string[] = [
  'Arrow keys move the cross, or what is chosen; with Shift ten times as far.',
  'Enter chooses what lies under the cross, or sets a point; with Shift it chooses one more, or closes an area.',
  'Plus and minus enlarge. Escape leaves what is in hand. Delete removes what is chosen.',
  'Ctrl with C and V copies and pastes, with A chooses all.',
];
export const POINTER_WORDS: readonly string[] = [
  'Drag the ground to look elsewhere; drag metal, a corner or an end of the profile to move it. A double click enlarges, and so does the wheel once the plan has been pressed; two fingers enlarge on a touch screen.',
  'With Shift, a drag chooses what lies in a rectangle and a click one more. With Alt, points fall where they are.',
];

const ARROWS: Readonly<Record<string, Point>> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, 1],
  ArrowDown: [0, -1],
};
/** Steps of an arrow with shift. */
const LONG = 10;
const ENLARGED = 1.25;
/** Step of the cross where points fall on no grid, m. */
const FREE_STEP_M = 0.5;

type Press = Pick<KeyboardEvent, 'key' | 'shiftKey' | 'ctrlKey' | 'metaKey' | 'altKey'>;

export function usePlanKeys(keys: PlanKeys): (event: KeyboardEvent) => void {
  const clipboard = useRef<readonly Conductor[]>([]);
  return (event) => {
    const deed = keyDeed(keys, event, clipboard);
    if (deed === undefined) return;
    event.preventDefault();
    event.stopPropagation();
    deed();
  };
}

/** What a key does on the plan; undefined where it is none of the plan's. */
export function keyDeed(
  keys: PlanKeys,
  press: Press,
  clipboard: { current: readonly Conductor[] },
): (() => void) | undefined {
  if (press.altKey) return undefined;
  const step = (keys.gridStep > 0 ? keys.gridStep : FREE_STEP_M) * (press.shiftKey ? LONG : 1);
  if (press.ctrlKey || press.metaKey) return controlDeed(keys, press.key.toLowerCase(), step, clipboard);
  const at = keys.cursor ?? keys.middle;
  const arrow = ARROWS[press.key];
  if (arrow !== undefined) {
    const by: Point = [arrow[0] * step, arrow[1] * step];
    const { nudge } = keys;
    return nudge === undefined ? () => keys.moveCross([at[0] + by[0], at[1] + by[1]]) : () => nudge(by);
  }
  switch (press.key) {
    case 'Enter':
      return press.shiftKey && keys.finish !== undefined ? keys.finish : () => keys.enter(at, press.shiftKey);
    case '+':
    case '=':
      return () => keys.zoom(ENLARGED);
    case '-':
      return () => keys.zoom(1 / ENLARGED);
    case 'Escape':
      return keys.leave;
    case 'Delete':
    case 'Backspace':
      return keys.remove;
    default:
      return undefined;
  }
}

function controlDeed(
  keys: PlanKeys,
  key: string,
  step: number,
  clipboard: { current: readonly Conductor[] },
): (() => void) | undefined {
  const { copy } = keys;
  if (key === 'a') return keys.all;
  if (key === 'c' && copy !== undefined)
    return () => {
      clipboard.current = copy();
    };
  if (key === 'v' && clipboard.current.length > 0) return () => keys.paste(clipboard.current, [step, step]);
  return undefined;
}
