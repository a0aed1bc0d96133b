// What the page and its engine say to each other.
import type { Comparison, PageScripts, TextComparison } from '@ohmstead/pack';
import type { Fault, FieldPoint, FieldValue, Outcome, Profile } from '@ohmstead/study';

/** The engine's own text, and what starts it in a pack, where packs are to carry both. */
export type EngineScripts = Pick<PageScripts, 'engine'> & Partial<PageScripts>;

export type EngineRequest =
  /** what helpers are started from, and what the sheets of packs are to carry; neither is before it */
  | { readonly kind: 'carry'; readonly scripts: EngineScripts }
  | {
      readonly kind: 'solve';
      /** tells answers to this request from answers to one that it replaced */
      readonly run: number;
      readonly files: ReadonlyMap<string, Uint8Array>;
    }
  /** ends the run if it is still computing */
  | { readonly kind: 'cancel'; readonly run: number }
  /** about the outcome of a run that is solved */
  | { readonly kind: 'ask'; readonly run: number; readonly ask: number; readonly question: Question };

export type Question =
  /** the review pack */
  | { readonly kind: 'pack' }
  /** whether a record says what was computed: its results, and the texts of its sheet in order */
  | { readonly kind: 'check'; readonly results: unknown; readonly texts: readonly string[] }
  /** potential and touch voltage along a line on the surface, m, or at places of any depth */
  | {
      readonly kind: 'profile';
      readonly caseIndex: number;
      readonly from: readonly [number, number];
      readonly to: readonly [number, number];
    }
  | { readonly kind: 'field'; readonly caseIndex: number; readonly points: readonly FieldPoint[] }
  /** the main results beside those of a record */
  | { readonly kind: 'beside'; readonly results: unknown };

export type Reply =
  | { readonly kind: 'pack'; readonly pack: Uint8Array<ArrayBuffer> }
  | { readonly kind: 'check'; readonly results: Comparison; readonly printed: TextComparison }
  | { readonly kind: 'profile'; readonly profile: Profile }
  | { readonly kind: 'field'; readonly values: readonly FieldValue[] }
  | { readonly kind: 'beside'; readonly rows: readonly BesideRow[] };

export interface BesideRow {
  readonly name: string;
  readonly record: string;
  readonly computed: string;
}

/** What is heard of a run; the last four end it. */
export type RunAnswer =
  | { readonly kind: 'progress'; readonly run: number; readonly stage: string; readonly share: number }
  /** an early outcome on coarse meshes, with the uncertainties that these leave */
  | { readonly kind: 'first'; readonly run: number; readonly outcome: Outcome }
  | { readonly kind: 'solved'; readonly run: number; readonly outcome: Outcome }
  | { readonly kind: 'faults'; readonly run: number; readonly faults: readonly Fault[] }
  | { readonly kind: 'failed'; readonly run: number; readonly message: string }
  /** cancelled, or replaced by a later run */
  | { readonly kind: 'ended'; readonly run: number };

export type EngineAnswer =
  | RunAnswer
  | { readonly kind: 'told'; readonly ask: number; readonly reply: Reply }
  | { readonly kind: 'untold'; readonly ask: number; readonly message: string };
