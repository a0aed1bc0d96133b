// The plan as an instrument: looked at, read, drawn on and edited, by pointer and by keyboard.
import { governingCase, type MapKind } from '@ohmstead/sheet';
import type { DisplayUnits, Outcome, Point, RowOrigin } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useEffect, useMemo, useRef, useState } from 'preact/hooks';
import type { Draft } from '../desk/draft.ts';
import { DrawingLayer } from './drawing-layer.tsx';
import { floatingElectrodes } from './floating.ts';
import { FrameLayer } from './frame-layer.tsx';
import { itemAt, itemsIn } from './hit.ts';
import { MakingWords } from './making-words.tsx';
import { MapLayer } from './map-layer.tsx';
import { MetalLayer } from './metal-layer.tsx';
import { itemName, planItems, rowKey } from './plan-conductors.ts';
import { drawnInto, type Making, moved, type PlanEdit } from './plan-edits.ts';
import { planExtent } from './plan-extent.ts';
import { ProfileCurve } from './profile-curve.tsx';
import { ReadingLine } from './reading-line.tsx';
import { SelectionWords } from './selection-words.tsx';
import { type Snapped, snap } from './snap.ts';
import { close, type Drawn, hold, type Taking, type Tool, take } from './tool-state.ts';
import { ToolWords } from './tool-words.tsx';
import { TypedEnd } from './typed-end.tsx';
import { type PlanKeys, usePlanKeys } from './use-plan-keys.ts';
import { usePlanPointer } from './use-plan-pointer.ts';
import { useSize } from './use-size.ts';
import { centred, fitView, type View } from './view.ts';
import { WorstLayer } from './worst-layer.tsx';

export interface InstrumentProps {
  readonly outcome: Outcome;
  readonly draft: Draft;
  readonly units: DisplayUnits;
  readonly selected: readonly RowOrigin[];
  readonly select: (rows: readonly RowOrigin[]) => void;
  readonly edit: (edit: PlanEdit) => void;
  /** a place that the reader is taken to, a new object each time */
  readonly goal: { readonly at: Point } | undefined;
}

/** Points are drawn aside to what lies within so many pixels. */
const SNAP_PX = 9;
/** Least pixels a metre at a place that the reader is taken to. */
const GOAL_SCALE = 24;
const FIRST_MAKING: Making = { depth: 0.6, diameter: 0.012, material: undefined, rodLength: 3, nx: 4, ny: 4 };

export function Instrument(props: InstrumentProps): VNode {
  const { outcome, draft, units, selected, select, edit, goal } = props;
  const svg = useRef<SVGSVGElement>(null);
  const size = useSize(svg);
  const items = useMemo(() => planItems(draft), [draft]);
  const floating = useMemo(() => floatingElectrodes(draft), [draft]);
  const whole = (): View => fitView(planExtent(outcome, items), size);
  const [looked, setLooked] = useState<View>();
  const view = looked ?? whole();
  const look = (change: (view: View) => View): void => setLooked((now) => change(now ?? view));
  const [kind, setKind] = useState<MapKind>('touch');
  const [chosenCase, setChosenCase] = useState<number>();
  const caseIndex = Math.min(chosenCase ?? governingCase(outcome.results), outcome.cases.length - 1);
  const [tool, setTool] = useState(hold('select'));
  const [making, setMaking] = useState<Making>(() => makingOf(items, floating));
  const [gridStep, setGridStep] = useState(0.5);
  const [cursor, setCursor] = useState<Snapped>();
  const [profile, setProfile] = useState<readonly [Point, Point]>();
  const chosen = useMemo(() => new Set(selected.map(rowKey)), [selected]);
  const tolerance = SNAP_PX / view.scale;

  useEffect(() => {
    if (goal === undefined) return;
    look((now) => centred(now, goal.at, GOAL_SCALE));
    svg.current?.focus();
    svg.current?.scrollIntoView({ block: 'nearest' });
  }, [goal]);

  const snapped = (place: Point, free: boolean): Snapped => {
    if (free) return { at: place, why: undefined };
    const from = tool.taken.at(-1);
    return snap(items, place, { tolerance, step: gridStep, ...(from === undefined ? {} : { from }) });
  };
  const drew = (drawn: Drawn): void => {
    if (drawn.kind === 'profile') {
      setProfile([drawn.from, drawn.to]);
      return;
    }
    const made = drawnInto(draft, drawn, making);
    if (made === undefined) return;
    edit(made);
    select(made.rows);
  };
  const apply = ({ state, drawn }: Taking): void => {
    setTool(state);
    if (drawn !== undefined) drew(drawn);
  };
  const under = cursor === undefined ? undefined : itemAt(items, cursor.at, tolerance);
  const choose = (place: Point, more: boolean): void => {
    const item = itemAt(items, place, tolerance);
    if (!more) select(item === undefined ? [] : [item.row]);
    else if (item !== undefined)
      select(
        chosen.has(item.key) ? selected.filter((row) => rowKey(row) !== item.key) : [...selected, item.row],
      );
  };
  const pointer = usePlanPointer(view, size, look, {
    hover: (place, free) =>
      setCursor(place && (tool.tool === 'select' ? { at: place, why: undefined } : snapped(place, free))),
    click: (place, { shift, free }) => {
      if (tool.tool === 'select') choose(place, shift);
      else apply(take(tool, snapped(place, free).at));
    },
    pickUp: (place, { shift }) => {
      if (tool.tool !== 'select' || shift) return false;
      const item = itemAt(items, place, tolerance);
      if (item === undefined) return false;
      if (!chosen.has(item.key)) select([item.row]);
      return true;
    },
    drop: (from, to, free) => {
      const end = free
        ? to
        : snap(
            items.filter(({ key }) => !chosen.has(key)),
            to,
            { tolerance, step: 0 },
          ).at;
      const shift = shiftOf(from, end, free ? 0 : gridStep);
      if (shift[0] !== 0 || shift[1] !== 0)
        edit(moved(draft, selected, { dx: shift[0], dy: shift[1] }, units));
    },
    band: (a, b) => select(itemsIn(items, a, b).map(({ row }) => row)),
  });
  const keys: PlanKeys = {
    tool,
    gridStep,
    selected,
    cursor: cursor?.at,
    draft,
    units,
    middle: [view.x, view.y],
    moveCursor: (place) => setCursor(snapped(place, true)),
    look,
    size,
    edit: (made) => {
      edit(made);
      select(made.rows);
    },
    select,
    enter: (place) => (tool.tool === 'select' ? choose(place, false) : apply(take(tool, place))),
    finish: () => apply(close(tool)),
    leave: () => {
      setTool(tool.taken.length > 0 ? hold(tool.tool) : hold('select'));
      if (tool.tool === 'select') select([]);
    },
  };
  const onKeyDown = usePlanKeys(keys);
  const shift: Point =
    pointer.drag?.kind === 'move' && pointer.held !== undefined
      ? shiftOf(pointer.drag.from, pointer.held, gridStep)
      : [0, 0];
  return (
    <div class="instrument">
      <svg
        ref={svg}
        class={`fig plan-svg ${tool.tool === 'select' ? '' : 'drawing-tool'}`}
        role="application"
        // biome-ignore lint/a11y/noNoninteractiveTabindex: the plan takes the keyboard, as its label tells
        tabIndex={0}
        aria-label={`Plan of the electrode with its ${kind} map. ${KEYS_WORDS}`}
        onKeyDown={onKeyDown}
        onDblClick={() => tool.tool === 'select' && look((now) => ({ ...now, scale: now.scale * 2 }))}
        {...pointer.handlers}
      >
        <rect class="plan-ground" width={size.width} height={size.height} />
        <MapLayer
          outcome={outcome}
          caseIndex={caseIndex}
          kind={kind}
          view={view}
          size={size}
          name="instrument"
        />
        <MetalLayer
          items={items}
          chosen={chosen}
          hovered={tool.tool === 'select' ? under?.key : undefined}
          floating={floating}
          shift={shift}
          view={view}
          size={size}
        />
        <WorstLayer
          outcome={outcome}
          caseIndex={caseIndex}
          kind={kind}
          goal={goal?.at}
          view={view}
          size={size}
        />
        <DrawingLayer
          tool={tool}
          pointer={cursor?.at}
          band={pointer.drag?.kind === 'band' ? [pointer.drag.from, pointer.drag.to] : undefined}
          meshes={[making.nx, making.ny]}
          profile={profile}
          view={view}
          size={size}
        />
        <FrameLayer view={view} size={size} units={units} />
      </svg>
      <ReadingLine
        outcome={outcome}
        caseIndex={caseIndex}
        at={cursor?.at}
        why={cursor?.why ?? (under === undefined ? undefined : itemName(under))}
        units={units}
      />
      <ToolWords
        outcome={outcome}
        kind={kind}
        setKind={setKind}
        caseIndex={caseIndex}
        setCase={setChosenCase}
        tool={tool.tool}
        setTool={(next: Tool) => setTool(hold(next))}
        zoom={(factor) => look((now) => ({ ...now, scale: now.scale * factor }))}
        whole={() => setLooked(undefined)}
        all={() => select(items.map(({ row }) => row))}
        gridStep={gridStep}
        setGridStep={setGridStep}
        units={units}
      />
      <MakingWords tool={tool.tool} making={making} change={setMaking} units={units} />
      {tool.taken.length > 0 && (
        <TypedEnd
          from={tool.taken.at(-1)!}
          towards={cursor?.at}
          units={units}
          take={(at) => apply(take(tool, at))}
          finish={tool.taken.length > 2 ? () => apply(close(tool)) : undefined}
        />
      )}
      {selected.length > 0 && (
        <SelectionWords draft={draft} selected={selected} units={units} edit={keys.edit} />
      )}
      {profile !== undefined && (
        <ProfileCurve
          outcome={outcome}
          caseIndex={caseIndex}
          line={profile}
          drop={() => setProfile(undefined)}
        />
      )}
    </div>
  );
}

const KEYS_WORDS =
  'Arrow keys move the cross, or what is chosen; Enter chooses or sets a point; plus and minus enlarge; Escape leaves; Delete removes what is chosen; Tab goes on to the tools.';

/** How far something is moved: on the grid's steps where there are any. */
function shiftOf(from: Point, to: Point, step: number): Point {
  const on = (v: number): number =>
    step > 0 ? Number((Math.round(v / step) * step).toPrecision(12)) + 0 : v;
  return [on(to[0] - from[0]), on(to[1] - from[1])];
}

/** What is drawn first is made as the last conductor and rod of the study that do not float. */
function makingOf(items: ReturnType<typeof planItems>, floating: ReadonlySet<string>): Making {
  const own = items.filter(({ conductor }) => !floating.has(conductor.electrode ?? 'main'));
  const last = own.findLast(({ rod }) => !rod)?.conductor;
  const rod = own.findLast((item) => item.rod)?.conductor;
  if (last === undefined) return FIRST_MAKING;
  return {
    ...FIRST_MAKING,
    depth: last.depth1,
    diameter: last.diameter,
    material: last.material,
    electrode: last.electrode,
    rodLength: rod === undefined ? FIRST_MAKING.rodLength : Math.abs(rod.depth2 - rod.depth1),
  };
}
