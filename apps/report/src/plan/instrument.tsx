// The plan as an instrument: looked at, read, drawn on and edited, by pointer and by keyboard.
import { governingCase } from '@ohmstead/sheet';
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useId, useMemo, useRef, useState } from 'preact/hooks';
import { AreaWords } from './area-words.tsx';
import { FrozenFigure } from './frozen-figure.tsx';
import { MakingWords } from './making-words.tsx';
import { itemName } from './plan-conductors.ts';
import { usePlanDesk } from './plan-desk.ts';
import { draggedProfile, type Grip, heldAt, type ProfileLine } from './plan-grip.ts';
import { PlanKey } from './plan-key.tsx';
import { PlanPicture } from './plan-picture.tsx';
import type { Drag } from './pointer-drag.ts';
import { ProfileCurve } from './profile-curve.tsx';
import { ReadingLine } from './reading-line.tsx';
import { SelectionWords } from './selection-words.tsx';
import { type Shown, shownWords } from './shown.ts';
import type { Snapped } from './snap.ts';
import { close, take } from './tool-state.ts';
import { ToolWords } from './tool-words.tsx';
import { TypedEnd } from './typed-end.tsx';
import { useLooking } from './use-looking.ts';
import { KEYS_WORDS, POINTER_WORDS, usePlanKeys } from './use-plan-keys.ts';
import { usePlanPointer } from './use-plan-pointer.ts';
import { usePlanItems, usePlanWork } from './use-plan-work.ts';
import { usePrinting } from './use-printing.ts';

export function Instrument({ outcome }: { readonly outcome: Outcome }): VNode {
  const desk = usePlanDesk();
  const { draft, units, selected } = desk;
  const how = useId();
  const svg = useRef<SVGSVGElement>(null);
  const printing = usePrinting();
  const items = usePlanItems(draft);
  const looking = useLooking(svg, outcome, items, desk.goal);
  const work = usePlanWork(desk, items, looking);
  const [shown, show] = useState<Shown>('touch');
  const [chosenCase, setCase] = useState<number>();
  const caseIndex = Math.min(chosenCase ?? governingCase(outcome.results), outcome.cases.length - 1);
  const { tool, cursor, under, making, gridStep, area, areas } = work;
  const { drag, handlers } = usePlanPointer(looking.view, looking.size, looking.look, work.deeds);
  const onKeyDown = usePlanKeys(work.keys);
  const held = heldAt(drag, items, work.chosen, work.reach);
  const profile = profileShown(work.profile, drag, held);
  const typed = tool.taken.at(-1);
  // a pointer that moves draws none of the words below the plan anew
  const tools = useMemo(
    () => (
      <ToolWords
        outcome={outcome}
        shown={shown}
        show={show}
        caseIndex={caseIndex}
        setCase={setCase}
        tool={tool.tool}
        setTool={work.setTool}
        zoom={looking.zoom}
        whole={looking.whole}
        all={work.keys.all}
        gridStep={gridStep}
        setGridStep={work.setGridStep}
        units={units}
      />
    ),
    [outcome, shown, caseIndex, tool.tool, gridStep, units, looking.view, looking.size, items],
  );
  const chosenWords = useMemo(
    () =>
      selected.length > 0 && (
        <SelectionWords draft={draft} selected={selected} units={units} edit={work.edit} />
      ),
    [draft, selected, units],
  );
  const areaWords = useMemo(
    () => (
      <AreaWords
        outcome={outcome}
        draft={draft}
        units={units}
        areas={areas}
        inHand={area}
        takeUp={work.takeUp}
        edit={work.editArea}
      />
    ),
    [outcome, draft, units, areas, area],
  );
  return (
    <div class={printing ? 'instrument printing' : 'instrument'}>
      {printing && <FrozenFigure outcome={outcome} caseIndex={caseIndex} shown={shown} />}
      <svg
        ref={svg}
        class={`fig plan-svg of-${shown} ${tool.tool === 'select' ? '' : 'drawing-tool'}`}
        role="application"
        // in lower case: attributes of SVG know no other
        tabindex={0}
        aria-label={shownWords(shown)}
        aria-describedby={how}
        onKeyDown={onKeyDown}
        {...handlers}
      >
        <PlanPicture
          outcome={outcome}
          caseIndex={caseIndex}
          shown={shown}
          units={units}
          items={items}
          looking={looking}
          work={work}
          drag={drag}
          held={held}
          profile={profile}
        />
      </svg>
      <ReadingLine
        outcome={outcome}
        caseIndex={caseIndex}
        at={held?.at ?? cursor?.at}
        why={held?.why ?? cursor?.why ?? (under && itemName(under))}
        units={units}
      />
      <PlanKey outcome={outcome} caseIndex={caseIndex} shown={shown} />
      {tools}
      <MakingWords tool={tool.tool} making={making} change={work.setMaking} units={units} />
      {typed !== undefined && (
        <TypedEnd
          from={typed}
          towards={cursor?.at}
          units={units}
          take={(at) => work.apply(take(tool, at))}
          finish={tool.taken.length > 2 ? () => work.apply(close(tool)) : undefined}
        />
      )}
      {chosenWords}
      {areaWords}
      {profile !== undefined && (
        <ProfileCurve
          outcome={outcome}
          caseIndex={caseIndex}
          line={profile}
          drop={() => work.setProfile(undefined)}
        />
      )}
      <details class="plan-how">
        <summary>keys and gestures of the plan</summary>
        <p id={how}>{KEYS_WORDS.join(' ')}</p>
        <p>{POINTER_WORDS.join(' ')}</p>
      </details>
    </div>
  );
}

/** The profile as it is while one of its ends, or a new one, is dragged. */
function profileShown(
  profile: ProfileLine | undefined,
  drag: Drag<Grip> | undefined,
  held: Snapped | undefined,
): ProfileLine | undefined {
  if (drag?.kind !== 'move' || held === undefined) return profile;
  const { grip } = drag;
  if (grip.kind === 'line') return [grip.at, held.at];
  return grip.kind === 'profile' && profile !== undefined
    ? draggedProfile(profile, grip.end, held.at)
    : profile;
}
