// The study as its file writes it (contract names, units in the keys) and as it is read with its tables.
import type { ConductorTable, Reading, RowFinding } from '@ohmstead/core';

export type Point = readonly [x: number, y: number];
/** Corners in order, metres; closed without repeating the first. */
export type Polygon = readonly Point[];

export interface LayerInput {
  readonly resistivity_ohm_m: number;
  readonly thickness_m?: number | undefined;
}

export interface CaseInput {
  readonly name: string;
  /** either this with `division_factor` … */
  readonly fault_current_A?: number | undefined;
  readonly division_factor?: number | undefined;
  /** … or the current that enters the ground, before decrement */
  readonly grid_current_A?: number | undefined;
  readonly x_over_r?: number | undefined;
  readonly frequency_hz?: number | undefined;
  readonly duration_s: number;
  readonly inject?: { readonly x_m: number; readonly y_m: number; readonly depth_m: number } | undefined;
}

/** The soil: layers from the surface down, or a table of field readings that layers are fitted to. */
export type SoilInput =
  | { readonly layers: readonly LayerInput[]; readonly survey?: undefined; readonly layer_count?: undefined }
  | { readonly layers?: undefined; readonly survey: string; readonly layer_count: number | 'auto' };

/** A season: the whole soil anew, or the soil of the study with its top or its depth changed. */
export interface SeasonInput {
  readonly name: string;
  readonly layers?: readonly LayerInput[] | undefined;
  /** dried or frozen down to a depth */
  readonly top?: { readonly depth_m: number; readonly resistivity_ohm_m: number } | undefined;
  /** wet below a depth */
  readonly below?: { readonly depth_m: number; readonly resistivity_ohm_m: number } | undefined;
}

/** Whose work the study is; printed at the head of the sheet. */
export interface ProjectInput {
  readonly client?: string | undefined;
  readonly site?: string | undefined;
  readonly number?: string | undefined;
  readonly prepared_by?: string | undefined;
  readonly checked_by?: string | undefined;
}

/** One issue of the sheet. */
export interface RevisionInput {
  readonly mark: string;
  /** as its author writes dates; never reckoned with */
  readonly date?: string | undefined;
  readonly text?: string | undefined;
  readonly by?: string | undefined;
}

/** The engineer's own words under each section of the sheet; lines end in a line feed. */
export interface SectionNotes {
  readonly ground?: string | undefined;
  readonly electrode?: string | undefined;
  readonly fault?: string | undefined;
  readonly rise?: string | undefined;
  readonly surface?: string | undefined;
  readonly people?: string | undefined;
  readonly season?: string | undefined;
  readonly trust?: string | undefined;
  readonly assumed?: string | undefined;
}

/** Units in which a sheet is shown and typed; files and results stay in the units of their keys. */
export type DisplayUnits = 'SI' | 'US';

export interface Study {
  readonly format: 'ohmstead-study';
  readonly version: 1;
  readonly title: string;
  readonly project?: ProjectInput | undefined;
  /** in the order of issue */
  readonly revisions?: readonly RevisionInput[] | undefined;
  readonly soil: SoilInput;
  /** variants of the soil, each solved; the worst of all seasons governs */
  readonly seasons?: readonly SeasonInput[] | undefined;
  readonly surfacing?:
    | {
        readonly resistivity_ohm_m: number;
        readonly thickness_m: number;
        /** where it lies; the touch area where undefined */
        readonly areas?: readonly Polygon[] | undefined;
      }
    | undefined;
  readonly metal_model?: 'resistive' | 'equipotential' | undefined;
  readonly conductors: readonly string[];
  readonly electrodes?:
    | readonly { readonly name: string; readonly role: 'energised' | 'floating' }[]
    | undefined;
  readonly cases: readonly CaseInput[];
  readonly limits: { readonly basis: 'IEEE 80'; readonly body_mass_kg: 50 | 70 };
  readonly areas?:
    | { readonly touch?: readonly Polygon[] | undefined; readonly step?: readonly Polygon[] | undefined }
    | undefined;
  readonly notes?: SectionNotes | undefined;
  /** SI where undefined */
  readonly display_units?: DisplayUnits | undefined;
}

/** Where a row of the conductor table was read. */
export interface RowOrigin {
  readonly file: string;
  readonly line: number;
}

/** Something taken for granted or converted while reading; listed, never silent. */
export interface Note {
  readonly code: string;
  readonly message: string;
}

/** A survey table, checked. */
export interface LoadedSurvey {
  readonly file: string;
  /** `row` is the line of the file */
  readonly readings: readonly Reading[];
  /** doubts about rows that are used */
  readonly cautions: readonly RowFinding[];
}

/** A study with its tables, checked. */
export interface LoadedStudy {
  readonly study: Study;
  readonly conductors: ConductorTable;
  /** one a conductor */
  readonly origins: readonly RowOrigin[];
  /** field readings, where the soil is to be fitted to them */
  readonly survey?: LoadedSurvey | undefined;
  /** assumed values and conversions, e.g. a material that was not given */
  readonly notes: readonly Note[];
  /** every file of the study, by its path, as read */
  readonly files: ReadonlyMap<string, Uint8Array>;
}
