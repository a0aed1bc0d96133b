// What a live page lends to the sheet: the study as it stands, ways to change it, and what surrounds each section.
import type { DisplayUnits, JsonValue, Outcome } from '@ohmstead/study';
import { type Context, createContext, type VNode } from 'preact';

/** Keys and places from the root of study.json inward, e.g. `['soil', 'layers', 0, 'resistivity_ohm_m']`. */
export type StudyPath = readonly (string | number)[];

/** Sections that depend on the study, by their anchors. */
export type SectionId =
  | 'ground'
  | 'electrode'
  | 'fault'
  | 'rise'
  | 'surface'
  | 'people'
  | 'season'
  | 'trust'
  | 'assumed';

/**
 * How a section's results stand to the study: they belong to it (`fresh`), or are its first, from coarse meshes (`early`), are being computed anew, belong to an
 * earlier study (`stale`), or cannot be computed because an input is at fault.
 */
export type SectionState = 'fresh' | 'early' | 'computing' | 'stale' | 'fault';

/** Quantities that are read with a unit; values are SI: Ω·m, m, A, s, Hz, and 1 for a ratio. */
export type QuantityKind =
  | 'resistivity'
  /** thickness or depth in soil: m or ft */
  | 'length'
  /** thickness of a covering: m or in */
  | 'thickness'
  /** place in plan, may be negative: m or ft */
  | 'coordinate'
  | 'current'
  | 'duration'
  | 'frequency'
  | 'ratio';

/** A quantity as read from a text, or why the text is none, in words. */
export type Reading = { readonly value: number } | { readonly complaint: string };

/** Lists of study.json that take rows pasted from a spreadsheet. */
export type PastedTable = 'layers' | 'cases' | 'seasons';

/** All that a live page lends to the sheet; without it the sheet is frozen. */
export interface Desk {
  /** a value of study.json as it stands in the draft; undefined where there is none */
  readonly valueAt: (path: StudyPath) => JsonValue | undefined;
  /**
   * Sets a value of study.json, and makes what is missing on the way to it; undefined removes it, with what then holds
   * nothing. An index one past the end of a list appends.
   */
  readonly edit: (path: StudyPath, value: JsonValue | undefined) => void;
  /** reads a quantity as it was typed, with or without its unit */
  readonly read: (kind: QuantityKind, text: string) => Reading;
  /** writes a quantity for editing, with its unit in the units displayed, so that it reads back as the same value */
  readonly show: (kind: QuantityKind, value: number) => string;
  /** replaces a list by pasted rows, or tells why not and changes nothing */
  readonly paste: (table: PastedTable, text: string) => readonly string[];
  readonly state: (section: SectionId) => SectionState;
  /** faults of the inputs of a section, in words, in the order of the study */
  readonly faults: (section: SectionId) => readonly string[];
  /** complaints about exactly this input as it stands, in words */
  readonly complaints: (path: StudyPath) => readonly string[];
  /** the pinned state that everything is compared with */
  readonly before: Outcome | undefined;
  readonly units: DisplayUnits;
  /** stands in for a figure of the frozen sheet, e.g. the plan as an instrument; undefined: draw the figure */
  readonly instrument: ((figure: 'surface' | 'electrode', outcome: Outcome) => VNode | undefined) | undefined;
  /** takes the reader to a place on the plan, m */
  readonly goTo: (x: number, y: number) => void;
  /** slot under a section's text: the engineer's note */
  readonly note: (section: SectionId) => VNode | undefined;
  /** hands out a figure (`touch-33-kv-bus.svg`) or table (`cases.csv`) by the name of its file; undefined: no downloads */
  readonly download: ((file: string) => void) | undefined;
}

/** The desk that the sheet lies on; undefined where it is frozen. */
export const DeskContext: Context<Desk | undefined> = createContext<Desk | undefined>(undefined);
