// Review pack → every difference between what it holds and what its own study gives when solved again.
import { withoutProgram } from '@ohmstead/sheet';
import {
  InputFaults,
  type LoadedStudy,
  loadStudy,
  type Outcome,
  type StudySource,
  sourceFromMap,
} from '@ohmstead/study';
import { checkDigests } from './check-digests.ts';
import { type Comparison, compareResults } from './compare-results.ts';
import type { Difference } from './difference.ts';
import { jsonText } from './json-text.ts';
import { packEntries, RESULTS_NAME, SHEET_NAME, STUDY_FOLDER } from './pack-entries.ts';
import { type PageScripts, pageProgram } from './page-program.ts';
import { type Pack, readPack } from './read-pack.ts';
import type { Renderer } from './renderer.ts';
import { sameRendering } from './same-rendering.ts';
import { sheetRenderer } from './sheet-renderer.ts';

export type Solve = (loaded: LoadedStudy) => Outcome | Promise<Outcome>;

export interface VerifyOptions {
  /** what to call the zip in faults */
  readonly file?: string;
  /** study from its files; throws InputFaults */
  readonly load?: (source: StudySource) => LoadedStudy;
  readonly renderer?: Renderer;
  /** what the sheet of a pack of this version of the program carries */
  readonly scripts?: PageScripts | undefined;
}

export interface Verification {
  readonly differences: readonly Difference[];
  readonly checked: {
    /** program that wrote the pack, and the one that recomputed it (null where the study could not be solved) */
    readonly packVersion: string;
    readonly programVersion: string | null;
    /** entries whose digest was compared */
    readonly digests: number;
    readonly numbers: number;
    readonly exactNumbers: number;
    readonly closeNumbers: number;
    /** sheet, figures and tables compared */
    readonly renderings: number;
  };
}

/**
 * Checks a review pack: digests, results number by number, sheet and figures byte by byte, tables by their numbers.
 * @param bytes the zip
 * @param solve the chain from study to outcome
 * @param options the program's own reader and sheet where left out
 * @throws InputFaults where it is not a sound review pack; whatever can be compared is a difference instead
 */
export async function verifyPack(
  bytes: Uint8Array,
  solve: Solve,
  options: VerifyOptions = {},
): Promise<Verification> {
  const { file, load = loadStudy, renderer = sheetRenderer, scripts } = options;
  const pack = await readPack(bytes, file);
  const digests = await checkDigests(pack);
  const recomputed = await recompute(pack, { load, solve, renderer, scripts });
  return {
    differences: withoutRepeats([...digests, ...recomputed.differences]),
    checked: {
      packVersion: pack.manifest.program_version,
      programVersion: recomputed.programVersion,
      digests: pack.manifest.entries.filter((entry) => pack.entries.has(entry.path)).length,
      numbers: recomputed.numbers,
      exactNumbers: recomputed.exact,
      closeNumbers: recomputed.close,
      renderings: recomputed.renderings,
    },
  };
}

interface Tools extends Required<Omit<VerifyOptions, 'file'>> {
  readonly solve: Solve;
}

interface Recomputed extends Comparison {
  readonly programVersion: string | null;
  readonly renderings: number;
}

async function recompute(pack: Pack, tools: Tools): Promise<Recomputed> {
  const unsolved = { programVersion: null, renderings: 0, numbers: 0, exact: 0, close: 0 };
  const solved = await solveAgain(pack, tools);
  if (solved.kind === 'faults') return { ...unsolved, differences: solved.differences };
  const programVersion = solved.outcome.results.program_version;
  // Another version of the program is not a difference by itself: its name is taken over, its numbers are compared.
  const outcome: Outcome = {
    ...solved.outcome,
    results: { ...solved.outcome.results, program_version: pack.manifest.program_version },
  };
  const { renderer, scripts } = tools;
  const stored = json(pack.entries.get(RESULTS_NAME));
  const sameProgram = programVersion === pack.manifest.program_version;
  // the sheet's record is due to be the pack's own results, which are compared as numbers
  const program = sameProgram ? scripts && (await pageProgram(scripts, solved.loaded, stored)) : undefined;
  const due = packEntries(solved.loaded, outcome, { renderer, program });
  const results = compareResults(stored, JSON.parse(jsonText(outcome.results)));
  const drawn = compareEntries(sameProgram ? pack.entries : withPlainSheet(pack.entries), due);
  return {
    ...results,
    programVersion,
    differences: [...(pack.entries.has(RESULTS_NAME) ? results.differences : []), ...drawn.differences],
    renderings: drawn.compared,
  };
}

type Solved =
  | { readonly kind: 'solved'; readonly loaded: LoadedStudy; readonly outcome: Outcome }
  | { readonly kind: 'faults'; readonly differences: readonly Difference[] };

async function solveAgain(pack: Pack, tools: Tools): Promise<Solved> {
  const inside = [...pack.entries].filter(([path]) => path.startsWith(STUDY_FOLDER));
  const files = new Map(inside.map(([path, content]) => [path.slice(STUDY_FOLDER.length), content]));
  try {
    const loaded = tools.load(sourceFromMap(files));
    return { kind: 'solved', loaded, outcome: await tools.solve(loaded) };
  } catch (error) {
    if (!(error instanceof InputFaults)) throw error;
    const differences = error.faults.map(
      ({ file, message }): Difference => ({ kind: 'study', path: `${STUDY_FOLDER}${file}`, message }),
    );
    return { kind: 'faults', differences };
  }
}

/** Every entry but the results, which are compared as numbers; the study's own files are due as they are. */
function compareEntries(
  found: ReadonlyMap<string, Uint8Array>,
  due: ReadonlyMap<string, Uint8Array>,
): { readonly differences: readonly Difference[]; readonly compared: number } {
  const differences: Difference[] = [];
  let compared = 0;
  for (const path of [...new Set([...due.keys(), ...found.keys()])].toSorted()) {
    const expected = due.get(path);
    const content = found.get(path);
    if (content === undefined) differences.push({ kind: 'missing', path });
    else if (expected === undefined) differences.push({ kind: 'extra', path });
    else if (path !== RESULTS_NAME && !path.startsWith(STUDY_FOLDER)) {
      compared++;
      if (!sameRendering(path, expected, content)) differences.push({ kind: 'rendering', path });
    }
  }
  return { differences, compared };
}

/** Entries whose sheet has lost the program it carries, which another version of the program does not have. */
function withPlainSheet(entries: ReadonlyMap<string, Uint8Array>): ReadonlyMap<string, Uint8Array> {
  const sheet = entries.get(SHEET_NAME);
  if (sheet === undefined) return entries;
  const plain = withoutProgram(new TextDecoder().decode(sheet));
  return new Map([...entries, [SHEET_NAME, new TextEncoder().encode(plain)]]);
}

function json(content: Uint8Array | undefined): unknown {
  try {
    return JSON.parse(new TextDecoder().decode(content));
  } catch {
    return undefined;
  }
}

/** A missing or extra entry shows against the manifest and again against the recomputed study; once is enough. */
function withoutRepeats(differences: readonly Difference[]): readonly Difference[] {
  const seen = new Set<string>();
  return differences.filter((difference) => {
    const key = JSON.stringify([difference.kind, difference.path]);
    return !seen.has(key) && seen.add(key);
  });
}
