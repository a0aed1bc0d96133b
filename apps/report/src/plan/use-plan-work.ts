// What is in hand on the plan and what pointers and keys do with it.
import type { Point } from '@ohmstead/study';
import { useMemo, useState } from 'preact/hooks';
import { conductorsAt } from '../desk/conductor-edits.ts';
import { type AreaEdit, cornerRemoved, cornerSet } from './area-edits.ts';
import { floatingElectrodes } from './floating.ts';
import { itemAt, itemsIn } from './hit.ts';
import { type AreaRef, areaAt, areaOf, type PlanArea, planAreas } from './plan-areas.ts';
import { type PlanItem, planItems, rowKey } from './plan-conductors.ts';
import type { PlanDesk } from './plan-desk.ts';
import { deleted, drawnInto, type Making, makingOf, moved, type PlanEdit, pasted } from './plan-edits.ts';
import { draggedProfile, type Grip, gripUnder, heldAt, type ProfileLine } from './plan-grip.ts';
import { type Snapped, snap } from './snap.ts';
import { close, type Drawn, hold, type Taking, type Tool, type ToolState, take } from './tool-state.ts';
import type { Looking } from './use-looking.ts';
import type { PlanKeys } from './use-plan-keys.ts';
import type { PointerDeeds } from './use-plan-pointer.ts';

/** Points are drawn aside to what lies within so many pixels. */
const SNAP_PX = 9;
/** Step of the grid at first, m. */
const FIRST_GRID_M = 0.5;

export interface PlanWork {
  readonly floating: ReadonlySet<string>;
  readonly chosen: ReadonlySet<string>;
  readonly areas: readonly PlanArea[];
  readonly area: PlanArea | undefined;
  /** corner of the area in hand that keys move */
  readonly corner: number | undefined;
  readonly takeUp: (area: AreaRef | undefined) => void;
  readonly editArea: (edit: AreaEdit) => void;
  readonly tool: ToolState;
  readonly setTool: (tool: Tool) => void;
  readonly apply: (taking: Taking) => void;
  readonly making: Making;
  readonly setMaking: (making: Making) => void;
  readonly gridStep: number;
  readonly setGridStep: (step: number) => void;
  /** where the pointer or the cross is */
  readonly cursor: Snapped | undefined;
  /** what lies there while nothing is drawn */
  readonly under: PlanItem | undefined;
  readonly profile: ProfileLine | undefined;
  readonly setProfile: (line: ProfileLine | undefined) => void;
  /** edits, and leaves chosen what the edit says */
  readonly edit: (edit: PlanEdit) => void;
  /** how far from a place something is still meant, and the grid, m */
  readonly reach: { readonly tolerance: number; readonly step: number };
  readonly deeds: PointerDeeds<Grip>;
  readonly keys: PlanKeys;
}

export function usePlanWork(desk: PlanDesk, items: readonly PlanItem[], looking: Looking): PlanWork {
  const { draft, units, selected, select } = desk;
  const { view, size, look } = looking;
  const floating = useMemo(() => floatingElectrodes(draft), [draft]);
  const areas = useMemo(() => planAreas(draft), [draft]);
  const chosen = useMemo(() => new Set(selected.map(rowKey)), [selected]);
  const [tool, setTool] = useState(hold('select'));
  const [making, setMaking] = useState<Making>(() => makingOf(items, floating));
  const [gridStep, setGridStep] = useState(FIRST_GRID_M);
  const [cursor, setCursor] = useState<Snapped>();
  const [profile, setProfile] = useState<ProfileLine>();
  const [heldArea, setHeldArea] = useState<AreaRef>();
  const [corner, setCorner] = useState<number>();
  const area = areaOf(areas, heldArea);
  const reach = { tolerance: SNAP_PX / view.scale, step: gridStep };
  const selects = tool.tool === 'select';

  const edit = (made: PlanEdit): void => {
    desk.edit(made);
    select(made.rows);
  };
  const takeUp = (ref: AreaRef | undefined): void => {
    setHeldArea(ref && { kind: ref.kind, polygon: ref.polygon });
    setCorner(undefined);
    setTool(hold('select'));
  };
  const snapped = (place: Point, free: boolean): Snapped =>
    free ? { at: place, why: undefined } : snap(items, place, { ...reach, from: tool.taken.at(-1) });
  const drew = (drawn: Drawn): void => {
    if (drawn.kind === 'profile') setProfile([drawn.from, drawn.to]);
    const made = drawnInto(draft, drawn, making);
    if (made === undefined) return;
    edit(made);
    if (drawn.kind === 'area')
      takeUp({ kind: drawn.area, polygon: areas.filter(({ kind }) => kind === drawn.area).length });
  };
  const apply = ({ state, drawn }: Taking): void => {
    setTool(state);
    if (drawn !== undefined) drew(drawn);
  };
  const choose = (place: Point, more: boolean): void => {
    const item = itemAt(items, place, reach.tolerance);
    if (item !== undefined) {
      const rest = selected.filter((row) => rowKey(row) !== item.key);
      select(!more ? [item.row] : chosen.has(item.key) ? rest : [...selected, item.row]);
    } else if (!more) {
      select([]);
      const edge = areaAt(areas, place, reach.tolerance);
      if (edge !== undefined) takeUp(edge);
    }
  };
  const setGrip = (grip: Grip, to: Point): void => {
    switch (grip.kind) {
      case 'items': {
        const [dx, dy] = [to[0] - grip.at[0], to[1] - grip.at[1]];
        if (dx !== 0 || dy !== 0) edit(moved(draft, selected, { dx, dy }, units));
        return;
      }
      case 'corner':
        if (area === undefined) return;
        desk.edit(cornerSet(draft, area, grip, to, units));
        setCorner(grip.corner);
        return;
      case 'profile':
        if (profile !== undefined) setProfile(draggedProfile(profile, grip.end, to));
        return;
      case 'line':
        setTool(hold('profile'));
        setProfile([grip.at, to]);
    }
  };
  const under = cursor === undefined || !selects ? undefined : itemAt(items, cursor.at, reach.tolerance);
  return {
    ...{ floating, chosen, areas, area, corner, takeUp, tool, apply, making, setMaking },
    ...{ gridStep, setGridStep, cursor, under, profile, setProfile, edit, reach },
    editArea: desk.edit,
    setTool: (next) => setTool(hold(next)),
    deeds: {
      hover: (place, free) =>
        setCursor(place && (selects ? { at: place, why: undefined } : snapped(place, free))),
      click: (place, { shift, free }) => {
        if (selects) choose(place, shift);
        else apply(take(tool, snapped(place, free).at));
      },
      pickUp: (place, { shift, free }) => {
        // a result that comes in does not move the ground under a hand
        look((now) => now);
        if (shift) return undefined;
        if (tool.tool === 'profile' && tool.taken.length === 0)
          return { kind: 'line', at: snapped(place, free).at };
        const grip = selects ? gripUnder({ items, area, profile }, place, reach.tolerance) : undefined;
        if (grip?.kind === 'items' && !chosen.has(rowKey(grip.row))) select([grip.row]);
        return grip;
      },
      drop: (grip, from, to, free) => {
        const drag = { kind: 'move', grip, begun: from, from, to, far: true, free } as const;
        const held = heldAt(drag, items, chosen, reach);
        if (held !== undefined) setGrip(grip, held.at);
      },
      tap: (grip) => {
        if (grip.kind === 'items') select([grip.row]);
        else if (grip.kind === 'line') apply(take(tool, grip.at));
        else if (grip.kind === 'corner' && grip.fresh) setGrip(grip, grip.at);
        else if (grip.kind === 'corner') setCorner(grip.corner);
      },
      band: (a, b) => select(itemsIn(items, a, b).map(({ row }) => row)),
    },
    keys: {
      gridStep,
      cursor: cursor?.at,
      middle: [view.x, view.y],
      moveCross: (place) => {
        setCursor({ at: place, why: undefined });
        look((now) => ({ ...now, ...keptInWindow(now, size, place) }));
      },
      nudge: nudgeOf(),
      remove: removeOf(),
      copy: selects && selected.length > 0 ? () => conductorsAt(draft, selected) : undefined,
      paste: (conductors, [dx, dy]) => edit(pasted(draft, conductors, { dx, dy })),
      all: () => select(items.map(({ row }) => row)),
      zoom: looking.zoom,
      enter: (place, more) => {
        if (selects) choose(place, more);
        else apply(take(tool, place));
      },
      finish: selects ? undefined : () => apply(close(tool)),
      leave: () => {
        if (tool.taken.length > 0) setTool(hold(tool.tool));
        else if (!selects) setTool(hold('select'));
        else if (corner !== undefined) setCorner(undefined);
        else {
          select([]);
          setHeldArea(undefined);
        }
        looking.leaveGoal();
      },
    },
  };

  function nudgeOf(): PlanKeys['nudge'] {
    const at = corner === undefined ? undefined : area?.corners[corner];
    if (!selects) return undefined;
    if (area !== undefined && corner !== undefined && at !== undefined)
      return ([dx, dy]) =>
        desk.edit(cornerSet(draft, area, { corner, fresh: false }, [at[0] + dx, at[1] + dy], units));
    if (selected.length === 0) return undefined;
    return ([dx, dy]) => edit(moved(draft, selected, { dx, dy }, units));
  }

  function removeOf(): PlanKeys['remove'] {
    if (!selects) return undefined;
    if (area !== undefined && corner !== undefined)
      return () => {
        setCorner(undefined);
        desk.edit(cornerRemoved(draft, area, corner));
      };
    return selected.length === 0 ? undefined : () => edit(deleted(draft, selected));
  }
}

/** The cross stays within this share of the window from its middle. */
const WINDOW = 0.45;

function keptInWindow(
  { x, y, scale }: Looking['view'],
  { width, height }: Looking['size'],
  place: Point,
): { readonly x: number; readonly y: number } {
  const kept = (middle: number, at: number, by: number): number =>
    Math.min(Math.max(middle, at - by), at + by);
  return { x: kept(x, place[0], (WINDOW * width) / scale), y: kept(y, place[1], (WINDOW * height) / scale) };
}

/** The metal of a draft, taken apart once. */
export function usePlanItems(draft: PlanDesk['draft']): readonly PlanItem[] {
  return useMemo(() => planItems(draft), [draft]);
}
