// The page as a value: the study worked at, what is computed of it, and the states that are pinned.
import type { SectionId, SectionState } from '@ohmstead/sheet';
import type { Fault, Outcome } from '@ohmstead/study';
import { type Draft, sameDraft } from '../desk/draft.ts';
import { beginHistory, commit, type History, redo, undo } from '../desk/history.ts';
import { questionsOf } from '../desk/missing.ts';
import { addPin, type Pin, removePin, renamePin, stateOf } from '../desk/pins.ts';
import type { RunAnswer } from '../engine/messages.ts';
import { outdatedBy } from './dependence.ts';
import { faultsOfSection, isAskedFor } from './section-faults.ts';

/** An outcome and what it belongs to. */
export interface Solved {
  readonly outcome: Outcome;
  readonly run: number;
  readonly draft: Draft;
  /** from coarse meshes, the rest of the run being under way */
  readonly early: boolean;
}

export interface Bench {
  readonly history: History;
  readonly solved: Solved | undefined;
  /** the run that computes the present draft */
  readonly running:
    | { readonly run: number; readonly draft: Draft; readonly stage: string; readonly share: number }
    | undefined;
  /** faults of the draft that was computed last, which has no outcome then */
  readonly faults: readonly Fault[];
  /** a fault of the program */
  readonly failure: string | undefined;
  readonly pins: readonly Pin[];
  /** pin that everything is compared with */
  readonly compared: number | undefined;
}

export type BenchAction =
  | { readonly kind: 'open'; readonly draft: Draft; readonly label: string }
  | { readonly kind: 'restore'; readonly history: History; readonly pins: readonly Pin[] }
  | {
      readonly kind: 'edit';
      readonly draft: Draft;
      readonly label: string;
      readonly field?: string | undefined;
    }
  | { readonly kind: 'undo' | 'redo' | 'cancelled' | 'pin' }
  | { readonly kind: 'began'; readonly run: number; readonly draft: Draft }
  | { readonly kind: 'answer'; readonly answer: Exclude<RunAnswer, { kind: 'ended' }> }
  | { readonly kind: 'rename-pin'; readonly at: number; readonly name: string }
  | { readonly kind: 'remove-pin'; readonly at: number }
  | { readonly kind: 'compare'; readonly at: number | undefined };

export function beginBench(draft: Draft, label: string): Bench {
  return {
    history: beginHistory(draft, label),
    solved: undefined,
    running: undefined,
    faults: [],
    failure: undefined,
    pins: [],
    compared: undefined,
  };
}

export function draftOf(bench: Bench): Draft {
  return bench.history.present.draft;
}

/** The page after an action; the same value where nothing changes. */
export function reduceBench(bench: Bench, action: BenchAction): Bench {
  switch (action.kind) {
    case 'open':
      return beginBench(action.draft, action.label);
    case 'restore':
      return { ...beginBench(action.history.present.draft, ''), history: action.history, pins: action.pins };
    case 'edit':
      return withHistory(bench, commit(bench.history, action.draft, action.label, action.field));
    case 'undo':
      return withHistory(bench, undo(bench.history));
    case 'redo':
      return withHistory(bench, redo(bench.history));
    case 'began':
      return {
        ...bench,
        running: { run: action.run, draft: action.draft, stage: 'reading the study', share: 0 },
        faults: [],
        failure: undefined,
      };
    case 'cancelled':
      return { ...bench, running: undefined };
    case 'answer':
      return answered(bench, action.answer);
    case 'pin':
      return pinned(bench);
    case 'rename-pin':
      return { ...bench, pins: renamePin(bench.pins, action.at, action.name) };
    case 'remove-pin':
      return {
        ...bench,
        pins: removePin(bench.pins, action.at),
        compared: afterRemoval(bench.compared, action.at),
      };
    case 'compare':
      return { ...bench, compared: action.at };
  }
}

function withHistory(bench: Bench, history: History): Bench {
  return history === bench.history ? bench : { ...bench, history };
}

function answered(bench: Bench, answer: Exclude<RunAnswer, { kind: 'ended' }>): Bench {
  const { running } = bench;
  if (running === undefined || answer.run !== running.run) return bench;
  const { draft, run } = running;
  switch (answer.kind) {
    case 'progress':
      return { ...bench, running: { ...running, stage: answer.stage, share: answer.share } };
    case 'first':
      // words alone were edited: better results stand than an early outcome has
      if (bench.solved?.early === false && outdatedBy(bench.solved.draft, draft).size === 0) return bench;
      return {
        ...bench,
        solved: { outcome: withOld(answer.outcome, bench.solved?.outcome), run, draft, early: true },
      };
    case 'solved':
      return { ...bench, running: undefined, solved: { outcome: answer.outcome, run, draft, early: false } };
    case 'faults':
      return { ...bench, running: undefined, faults: toldFaults(draft, answer.faults) };
    case 'failed':
      return { ...bench, running: undefined, failure: answer.message };
  }
}

/** Faults that are told: what study.json still lacks is asked for instead. */
function toldFaults(draft: Draft, faults: readonly Fault[]): readonly Fault[] {
  const questions = questionsOf(draft);
  return faults.filter((fault) => !isAskedFor(fault, questions));
}

/** What an early outcome leaves out stands as it was, greyed, where it is still about the same seasons. */
function withOld(early: Outcome, old: Outcome | undefined): Outcome {
  if (old === undefined) return early;
  const names = (outcome: Outcome): string =>
    JSON.stringify(outcome.study.seasons?.map(({ name }) => name) ?? []);
  const cases = (outcome: Outcome): string => JSON.stringify(outcome.study.cases.map(({ name }) => name));
  if (cases(early) !== cases(old)) return early;
  const { ground, equivalent_uniform, seasons, envelope } = old.results;
  const kept = names(early) === names(old) ? { seasons, envelope } : {};
  return { ...early, results: { ...early.results, ground, equivalent_uniform, ...kept } };
}

function pinned(bench: Bench): Bench {
  const { solved, pins } = bench;
  if (solved === undefined || solved.early || outdated(bench).size > 0) return bench;
  const added = addPin(pins, stateOf(`state ${pins.length + 1}`, draftOf(bench), solved.outcome));
  return { ...bench, pins: added, compared: bench.compared ?? added.length - 1 };
}

function afterRemoval(compared: number | undefined, removed: number): number | undefined {
  if (compared === undefined || compared === removed) return undefined;
  return compared > removed ? compared - 1 : compared;
}

/** Sections whose results are not those of the draft. */
export function outdated(bench: Bench): ReadonlySet<SectionId> {
  return bench.solved === undefined ? new Set() : outdatedBy(bench.solved.draft, draftOf(bench));
}

/** Whether the last outcome is that of the draft, its words included, and final. */
export function isComplete(bench: Bench): boolean {
  const { solved, running } = bench;
  return (
    solved !== undefined && !solved.early && running === undefined && sameDraft(solved.draft, draftOf(bench))
  );
}

/** Sections that an early outcome does not tell yet. */
const LATER: readonly SectionId[] = ['season', 'trust', 'assumed'];

/** Sections whose numbers finer meshes still move. */
const REFINED: readonly SectionId[] = ['electrode', 'rise', 'surface', 'people'];

/** How a section stands. */
export function sectionState(bench: Bench, section: SectionId): SectionState {
  if (faultsOfSection(bench.faults, section).length > 0) return 'fault';
  const { solved, running } = bench;
  const old =
    solved === undefined || outdated(bench).has(section) || (solved.early && LATER.includes(section));
  if (!old) return solved.early && REFINED.includes(section) ? 'early' : 'fresh';
  return running === undefined ? 'stale' : 'computing';
}
