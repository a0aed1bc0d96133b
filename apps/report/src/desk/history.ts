// Undo and redo over drafts: each step with a label in words, runs of edits of one field taken together.
import { type Draft, sameDraft } from './draft.ts';

/** One state of the study and what led to it. */
export interface Step {
  readonly draft: Draft;
  /** what was done, in words; of the first step, where the study came from */
  readonly label: string;
  /** field that was edited: consecutive edits of one are one step */
  readonly field?: string | undefined;
}

export interface History {
  /** oldest first */
  readonly past: readonly Step[];
  readonly present: Step;
  /** undone steps, the next to be redone first */
  readonly future: readonly Step[];
}

/** Most steps kept. Reason: a long day's work; files that an edit does not touch are shared by all steps. */
export const MOST_STEPS = 500;
/** Most bytes of distinct files kept by all steps. Reason: some twenty versions of the largest table that is read. */
export const MOST_BYTES = 200_000_000;

/** A history that begins with a draft. */
export function beginHistory(draft: Draft, label: string): History {
  return { past: [], present: { draft, label }, future: [] };
}

/**
 * Takes an edit into the history; what was undone before it is forgotten.
 * @param draft after the edit
 * @param label what was done, in words: `rod R-03 moved 2.0 m east`
 * @param field names what was edited, e.g. its path as text: the edit joins the step before it where that has the same
 * @returns the same history where nothing was changed; a run of edits that ends where it began leaves no step
 */
export function commit(history: History, draft: Draft, label: string, field?: string): History {
  const { past, present } = history;
  if (sameDraft(present.draft, draft)) return history;
  const step: Step = { draft, label, ...(field === undefined ? {} : { field }) };
  const before = past.at(-1);
  const joins = field !== undefined && present.field === field && before !== undefined;
  if (!joins) return trimmed({ past: [...past, present], present: step, future: [] });
  // the step before keeps its draft but not its field, so that a later edit of its field is a step of its own
  if (sameDraft(before.draft, draft)) return { past: past.slice(0, -1), present: closed(before), future: [] };
  return { past, present: step, future: [] };
}

/** Ends a run of edits of one field, e.g. when the reader leaves it: the next edit is a step of its own. */
export function endRun(history: History): History {
  return history.present.field === undefined ? history : { ...history, present: closed(history.present) };
}

function closed({ draft, label }: Step): Step {
  return { draft, label };
}

/** One step back; the same history where there is none. */
export function undo(history: History): History {
  const { past, present, future } = history;
  const before = past.at(-1);
  if (before === undefined) return history;
  return { past: past.slice(0, -1), present: closed(before), future: [present, ...future] };
}

/** One step forward again; the same history where there is none. */
export function redo(history: History): History {
  const { past, present, future } = history;
  const [next, ...later] = future;
  if (next === undefined) return history;
  return { past: [...past, present], present: closed(next), future: later };
}

/** What undoing takes back, in words; undefined where there is nothing to undo. */
export function undoLabel({ past, present }: History): string | undefined {
  return past.length === 0 ? undefined : present.label;
}

/** What redoing does again, in words; undefined where there is nothing to redo. */
export function redoLabel({ future }: History): string | undefined {
  return future[0]?.label;
}

/** The newest steps within both limits; the present is always kept. */
function trimmed(history: History): History {
  const { past, present } = history;
  const counted = new Set<Uint8Array>(present.draft.files.values());
  let bytes = 0;
  for (const file of counted) bytes += file.length;
  let kept = 0;
  for (; kept < Math.min(past.length, MOST_STEPS); kept++) {
    for (const file of past[past.length - 1 - kept]!.draft.files.values()) {
      if (counted.has(file)) continue;
      counted.add(file);
      bytes += file.length;
    }
    if (bytes > MOST_BYTES) break;
  }
  return kept === past.length ? history : { ...history, past: past.slice(past.length - kept) };
}
