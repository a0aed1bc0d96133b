// The live sheet: a study is opened, edited where it stands, computed at every edit, and taken away as a review pack.
import { DeskContext, Questions, type SectionId, Sheet } from '@ohmstead/sheet';
import { faultLine, type Point, type RowOrigin } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useCallback, useEffect, useMemo, useState } from 'preact/hooks';
import type { Draft } from '../desk/draft.ts';
import { joinTables } from '../desk/join-tables.ts';
import { setLabel } from '../desk/labels.ts';
import { openDraft } from '../desk/open-draft.ts';
import type { Opening } from '../desk/opening.ts';
import { setValue } from '../desk/set-value.ts';
import type { EnginePlatform } from '../engine/client.ts';
import { demoFiles } from '../files/demo.ts';
import { newId } from '../files/new-id.ts';
import { openFiles } from '../files/open-files.ts';
import { useDroppedFiles } from '../files/use-dropped-files.ts';
import { ElectrodePlan } from '../plan/electrode-plan.tsx';
import { Instrument } from '../plan/instrument.tsx';
import { standing } from '../plan/plan-conductors.ts';
import { type PlanDesk, PlanDeskContext } from '../plan/plan-desk.ts';
import '../plan/plan.css';
import { type Bench, draftOf, sectionState } from './bench.ts';
import { ConductorTables } from './conductor-table.tsx';
import { Contents } from './contents.tsx';
import { deskOf, unitsOf } from './desk-of.ts';
import { Faults } from './faults.tsx';
import { KeptStudies } from './kept-studies.tsx';
import { Missing } from './missing.tsx';
import { NoteField } from './note-field.tsx';
import { noteOf, withNote } from './note-of.ts';
import { Pins } from './pins.tsx';
import { Start } from './start.tsx';
import { Strip } from './strip.tsx';
import { saveStudy, takeFile, takePack } from './take.ts';
import { type BenchControl, useBench } from './use-bench.ts';
import { useKeeping } from './use-keeping.ts';
import { useUndoKeys } from './use-undo-keys.ts';

export function App({ begin }: { readonly begin: EnginePlatform['begin'] }): VNode {
  const control = useBench(begin);
  const { bench, act } = control;
  const [id, setId] = useState<string>();
  const keeping = useKeeping(bench, id);
  const [refused, setRefused] = useState<readonly string[]>([]);
  const take = (opening: Opening, label: string): void => {
    if (opening.kind === 'faults') setRefused(opening.faults.map(faultLine));
    else {
      const joined = bench !== undefined && id !== undefined && joinTables(draftOf(bench), opening.draft);
      if (joined) {
        act({ kind: 'edit', draft: joined, label: `${label} added` });
        return;
      }
      setRefused([]);
      setId(newId());
      act({ kind: 'open', draft: opening.draft, label });
    }
  };
  const open = (list: readonly File[]): void => {
    openFiles(list)
      .then((opening) => take(opening, list.map(({ name }) => name).join(', ')))
      .catch((error: unknown) => setRefused([String(error)]));
  };
  const goOn = (wanted: string): void => {
    keeping
      .read(wanted)
      .then((study) => {
        if (study === undefined) return;
        setRefused([]);
        setId(study.id);
        act({ kind: 'restore', history: study.history, pins: study.pins });
      })
      .catch((error: unknown) => setRefused([String(error)]));
  };
  const { restoring } = keeping;
  useEffect(() => {
    if (restoring !== undefined && id === undefined) goOn(restoring);
  }, [restoring]);
  const history = bench?.history;
  // a word about files is over with the next edit
  useEffect(() => setRefused((told) => (told.length === 0 ? told : [])), [history]);
  useDroppedFiles(open);
  useUndoKeys(act);
  if (bench === undefined || id === undefined)
    return (
      <Start
        open={open}
        demo={() => take(openDraft(demoFiles()), 'the demonstration study')}
        faults={refused}
      >
        {keeping.word !== undefined && <p role="alert">{keeping.word}</p>}
        <KeptStudies kept={keeping.kept} goOn={goOn} remove={keeping.remove} />
      </Start>
    );
  const close = (): void => {
    control.cancel();
    setRefused([]);
    setId(undefined);
  };
  const word = refused.length > 0 ? `These files cannot be read. ${refused.join('; ')}` : keeping.word;
  return <Work key={id} control={control} bench={bench} open={open} close={close} word={word} />;
}

interface WorkProps {
  readonly control: BenchControl;
  readonly bench: Bench;
  readonly open: (list: readonly File[]) => void;
  /** back to the studies that are kept */
  readonly close: () => void;
  /** what the page has to say of its storage, or of files that were opened last */
  readonly word: string | undefined;
}

function Work({ control, bench, open, close, word }: WorkProps): VNode {
  const { act, engine } = control;
  const [failed, setFailed] = useState<string>();
  const [selected, select] = useState<readonly RowOrigin[]>([]);
  const draft = draftOf(bench);
  const units = unitsOf(draft);
  const [goal, setGoal] = useState<{ readonly at: Point }>();
  const goTo = useCallback((x: number, y: number): void => setGoal({ at: [x, y] }), []);
  const present = useMemo(() => standing(draft, selected), [draft, selected]);
  const tell = (work: Promise<void>): void => {
    setFailed(undefined);
    work.catch((error: unknown) => setFailed(error instanceof Error ? error.message : String(error)));
  };
  const outcome = bench.solved?.outcome;
  // the share that is done changes many times a second and is no concern of the sheet
  const { history, solved, faults, pins, compared, running } = bench;
  const still = useMemo(() => bench, [history, solved, faults, pins, compared, running === undefined]);
  const desk = useMemo(
    () =>
      deskOf(still, act, {
        instrument: (figure, shown) =>
          figure === 'surface' ? <Instrument outcome={shown} /> : <ElectrodePlan outcome={shown} />,
        goTo,
        note: (section: SectionId) => (
          <NoteField
            section={section}
            text={noteOf(draft, section)}
            take={(text) =>
              act({
                kind: 'edit',
                draft: withNote(draft, section, text),
                label: `note to ${section} changed`,
              })
            }
          />
        ),
        download: outcome && ((file) => takeFile(outcome, file)),
      }),
    [still, act, draft, outcome, goTo],
  );
  const plan = useMemo(
    (): PlanDesk => ({
      draft,
      units,
      selected: present,
      select,
      edit: ({ draft: edited, label }) => act({ kind: 'edit', draft: edited, label }),
      goal,
      goTo,
    }),
    [draft, units, present, goal, goTo, act],
  );
  // what is chosen on the plan draws no section anew: contexts reach into the sheet
  const sheet = useMemo(() => outcome && <Sheet outcome={outcome} />, [outcome]);
  return (
    <DeskContext.Provider value={desk}>
      <div class="live">
        <Strip
          bench={bench}
          act={act}
          units={units}
          switchUnits={() => act(unitSwitch(draft))}
          open={open}
          saveStudy={() => tell(saveStudy(draft))}
          takePack={() => tell(takePack(engine, bench))}
          close={close}
          cancel={control.cancel}
          recompute={control.recompute}
          word={failed ?? word}
        />
        <Contents state={(section) => sectionState(bench, section)} />
        <main id="page">
          <Missing draft={draft} units={units} act={act} />
          {outcome === undefined ? (
            <>
              <Faults faults={bench.faults} />
              <Questions />
            </>
          ) : (
            <PlanDeskContext.Provider value={plan}>{sheet}</PlanDeskContext.Provider>
          )}
          <div class="beside">
            <ConductorTables
              draft={draft}
              units={units}
              act={act}
              faults={bench.faults}
              selected={present}
              select={select}
            />
            <Pins bench={bench} act={act} units={units} />
          </div>
        </main>
      </div>
    </DeskContext.Provider>
  );
}

/** Turns the display from metres to feet and back. */
function unitSwitch(draft: Draft): { readonly kind: 'edit'; readonly draft: Draft; readonly label: string } {
  const to = unitsOf(draft) === 'SI' ? 'US' : undefined;
  return {
    kind: 'edit',
    draft: setValue(draft, ['display_units'], to),
    label: setLabel(draft, ['display_units'], to),
  };
}
