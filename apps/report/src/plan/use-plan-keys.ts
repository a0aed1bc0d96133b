// The plan by keyboard: a cross that moves, and everything that a pointer does.
import type { DisplayUnits, Point, RowOrigin } from '@ohmstead/study';
import { useRef } from 'preact/hooks';
import type { Draft } from '../desk/draft.ts';
import { copied, deleted, moved, type PlanEdit } from './plan-edits.ts';
import type { ToolState } from './tool-state.ts';
import type { Size, View } from './view.ts';

export interface PlanKeys {
  readonly tool: ToolState;
  readonly gridStep: number;
  readonly selected: readonly RowOrigin[];
  readonly cursor: Point | undefined;
  readonly draft: Draft;
  readonly units: DisplayUnits;
  /** where the cross appears first */
  readonly middle: Point;
  readonly moveCursor: (place: Point) => void;
  readonly look: (change: (view: View) => View) => void;
  readonly size: Size;
  readonly edit: (edit: PlanEdit) => void;
  readonly select: (rows: readonly RowOrigin[]) => void;
  readonly enter: (place: Point) => void;
  readonly finish: () => void;
  readonly leave: () => void;
}

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
/** The cross stays within this share of the window from its middle. */
const WINDOW = 0.45;

export function usePlanKeys(keys: PlanKeys): (event: KeyboardEvent) => void {
  const clipboard = useRef<readonly RowOrigin[]>([]);
  return (event) => {
    if (act(keys, event, clipboard)) {
      event.preventDefault();
      event.stopPropagation();
    }
  };
}

/** @returns whether the key was one of the plan's */
function act(keys: PlanKeys, event: KeyboardEvent, clipboard: { current: readonly RowOrigin[] }): boolean {
  const { selected, draft, gridStep } = keys;
  const step = (gridStep > 0 ? gridStep : FREE_STEP_M) * (event.shiftKey ? LONG : 1);
  const control = event.ctrlKey || event.metaKey;
  const arrow = ARROWS[event.key];
  if (arrow !== undefined && !control) {
    if (keys.tool.tool === 'select' && selected.length > 0)
      keys.edit(moved(draft, selected, { dx: arrow[0] * step, dy: arrow[1] * step }, keys.units));
    else moveCross(keys, arrow, step);
    return true;
  }
  const key = event.key.toLowerCase();
  if (control) {
    if (key === 'c' && selected.length > 0) clipboard.current = selected;
    else if (key === 'v' && clipboard.current.length > 0)
      keys.edit(copied(draft, clipboard.current, { dx: step, dy: step }));
    else return false;
    return true;
  }
  switch (event.key) {
    case 'Enter':
      if (event.shiftKey) keys.finish();
      else keys.enter(keys.cursor ?? keys.middle);
      return true;
    case '+':
    case '=':
      keys.look((view) => ({ ...view, scale: view.scale * ENLARGED }));
      return true;
    case '-':
      keys.look((view) => ({ ...view, scale: view.scale / ENLARGED }));
      return true;
    case 'Escape':
      keys.leave();
      return true;
    case 'Delete':
    case 'Backspace':
      if (selected.length === 0) return false;
      keys.edit(deleted(draft, selected));
      return true;
    default:
      return false;
  }
}

/** One step of the cross; the ground follows where it would leave the window. */
function moveCross(keys: PlanKeys, arrow: Point, step: number): void {
  const [x, y] = keys.cursor ?? keys.middle;
  const to: Point = [x + arrow[0] * step, y + arrow[1] * step];
  keys.moveCursor(to);
  keys.look((view) => {
    const reach = [
      (WINDOW * keys.size.width) / view.scale,
      (WINDOW * keys.size.height) / view.scale,
    ] as const;
    const kept = (middle: number, place: number, by: number): number =>
      Math.min(Math.max(middle, place - by), place + by);
    return { ...view, x: kept(view.x, to[0], reach[0]), y: kept(view.y, to[1], reach[1]) };
  });
}
