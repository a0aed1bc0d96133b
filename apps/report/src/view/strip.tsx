// The line above the sheet: what is being computed, and what can be done with the study as a whole.
import { type DisplayUnits, type Fault, listed } from '@ohmstead/study';
import type { VNode } from 'preact';
import { redoLabel, undoLabel } from '../desk/history.ts';
import { questionsOf } from '../desk/missing.ts';
import type { Bench, BenchAction } from './bench.ts';
import { draftOf, isComplete, outdated } from './bench.ts';
import { FilePicks } from './file-picks.tsx';
import { sectionOfFault } from './section-faults.ts';

export interface StripProps {
  readonly bench: Bench;
  readonly act: (action: BenchAction) => void;
  readonly units: DisplayUnits;
  readonly switchUnits: () => void;
  readonly open: (list: readonly File[]) => void;
  readonly saveStudy: () => void;
  readonly takePack: () => void;
  readonly close: () => void;
  readonly cancel: () => void;
  readonly recompute: () => void;
  /** what the page has to say of its doings, e.g. that storage is full */
  readonly word: string | undefined;
}

export function Strip(props: StripProps): VNode {
  const { bench, act } = props;
  const settled = bench.solved !== undefined && !bench.solved.early && outdated(bench).size === 0;
  const undo = undoLabel(bench.history);
  const redo = redoLabel(bench.history);
  return (
    <header class="strip">
      <p class="doing" role="status">
        {doing(bench)}
      </p>
      {props.word !== undefined && (
        <p class="page-word" role="alert">
          {props.word}
        </p>
      )}
      <p class="words">
        {bench.running !== undefined && <Word press={props.cancel}>cancel</Word>}
        {bench.running === undefined && !isComplete(bench) && bench.faults.length === 0 && (
          <Word press={props.recompute}>compute</Word>
        )}
        <Word press={() => act({ kind: 'undo' })} off={undo === undefined} title={undo}>
          undo
        </Word>
        <Word press={() => act({ kind: 'redo' })} off={redo === undefined} title={redo}>
          redo
        </Word>
        <Word press={() => act({ kind: 'pin' })} off={!settled}>
          pin this state
        </Word>
        <Word press={props.switchUnits}>{props.units === 'SI' ? 'show feet and inches' : 'show metres'}</Word>
        <Word press={props.saveStudy}>save the study</Word>
        <Word press={props.takePack} off={!isComplete(bench)}>
          take the review pack
        </Word>
        <FilePicks open={props.open} />
        <Word press={props.close}>all studies</Word>
      </p>
      {bench.running !== undefined && <progress max={1} value={bench.running.share} aria-label="computing" />}
    </header>
  );
}

function doing(bench: Bench): string {
  const { running, solved, faults, failure } = bench;
  if (running !== undefined) return `Computing: ${running.stage}`;
  if (failure !== undefined) return `A fault of the program, not of the study: ${failure}`;
  if (faults.length > 0) {
    const count = faults.length === 1 ? 'a fault' : `${faults.length} faults`;
    // without an outcome all of them are listed at the top
    return `The study has ${count}${solved === undefined ? '' : `, told under ${placesOf(faults)}`}.`;
  }
  if (solved === undefined) return 'Not computed.';
  if (isComplete(bench)) return 'Computed.';
  return questionsOf(draftOf(bench)).length > 0
    ? 'Out of date: the sheet asks for what is missing.'
    : 'Out of date.';
}

/** Sections that tell faults, by name. */
function placesOf(faults: readonly Fault[]): string {
  const names = new Set(faults.map(sectionOfFault));
  return listed([...names].map((name) => `${name[0]?.toUpperCase()}${name.slice(1)}`));
}

interface WordProps {
  readonly children: string;
  readonly press: () => void;
  readonly off?: boolean;
  readonly title?: string | undefined;
}

function Word({ children, press, off = false, title }: WordProps): VNode {
  return (
    <button
      type="button"
      class="word"
      disabled={off}
      onClick={press}
      {...(title === undefined ? {} : { title })}
    >
      {children}
    </button>
  );
}
