// Pasted rows put into a draft: a list of study.json, an area, a table of conductors or of readings replaced whole.
import { type DisplayUnits, type JsonObject, member, type Point } from '@ohmstead/study';
import { type AreaKind, addPolygon, setPolygon } from './areas.ts';
import type { Conductor } from './conductor.ts';
import { replaceConductors } from './conductor-edits.ts';
import { type Draft, valueAt, withFile } from './draft.ts';
import { type Pasted, type PastedRow, readPaste } from './paste.ts';
import type { PasteComplaint } from './paste-complaint.ts';
import type { JsonPath } from './path.ts';
import { listAt, setList, setValue } from './set-value.ts';
import { readingsText } from './survey-text.ts';

/** The draft after a paste; with any complaint nothing is changed. */
export type Pasting =
  | { readonly kind: 'draft'; readonly draft: Draft; readonly count: number }
  | { readonly kind: 'complaints'; readonly complaints: readonly PasteComplaint[] };

const FIRST_SURVEY = 'survey.csv';

function into({ rows, complaints }: Pasted, edit: (rows: readonly PastedRow[]) => Draft): Pasting {
  if (complaints.length > 0) return { kind: 'complaints', complaints };
  return { kind: 'draft', draft: edit(rows), count: rows.length };
}

/** Replaces the layers of the soil, or those of a season. */
export function pasteLayers(draft: Draft, path: JsonPath, text: string, units?: DisplayUnits): Pasting {
  return into(readPaste('layers', text, units), (rows) => {
    const layers = rows.map((row): JsonObject => Object.fromEntries(row));
    // the soil is told by layers or by a survey, not by both
    const isSoil = path.length === 2 && path[0] === 'soil';
    return isSoil ? setValue(draft, ['soil'], { layers }) : setList(draft, path, layers);
  });
}

/** Replaces the fault cases; a case of the same name keeps its place of injection, which has no column. */
export function pasteCases(draft: Draft, text: string, units?: DisplayUnits): Pasting {
  return into(readPaste('cases', text, units), (rows) => {
    const old = listAt(draft, ['cases']);
    const cases = rows.map((row): JsonObject => {
      const inject = member(
        old.find((one) => member(one, 'name') === row.get('name')),
        'inject',
      );
      return { ...Object.fromEntries(row), ...(inject === undefined ? {} : { inject }) };
    });
    return setList(draft, ['cases'], cases);
  });
}

/** Replaces the seasons. */
export function pasteSeasons(draft: Draft, text: string, units?: DisplayUnits): Pasting {
  return into(readPaste('seasons', text, units), (rows) => setList(draft, ['seasons'], rows.map(season)));
}

function season(row: PastedRow): JsonObject {
  const part = (name: 'top' | 'below'): JsonObject => {
    const found = Object.entries({
      depth_m: row.get(`${name}_depth_m`),
      resistivity_ohm_m: row.get(`${name}_resistivity_ohm_m`),
    }).flatMap(([key, value]) => (value === undefined ? [] : [[key, value] as const]));
    return found.length === 0 ? {} : { [name]: Object.fromEntries(found) };
  };
  return { name: row.get('name') ?? '', ...part('top'), ...part('below') };
}

/** Replaces one of the lists of study.json that take pasted rows; layers are those of the soil. */
export function pasteList(
  draft: Draft,
  table: 'layers' | 'cases' | 'seasons',
  text: string,
  units?: DisplayUnits,
): Pasting {
  switch (table) {
    case 'layers':
      return pasteLayers(draft, ['soil', 'layers'], text, units);
    case 'cases':
      return pasteCases(draft, text, units);
    case 'seasons':
      return pasteSeasons(draft, text, units);
  }
}

/** Adds an area, or replaces the corners of the area `polygon`. */
export function pasteCorners(
  draft: Draft,
  area: { readonly kind: AreaKind; readonly polygon?: number | undefined },
  text: string,
  units?: DisplayUnits,
): Pasting {
  return into(readPaste('corners', text, units), (rows) => {
    const corners = rows.map((row): Point => [Number(row.get('x')), Number(row.get('y'))]);
    const { kind, polygon } = area;
    return polygon === undefined
      ? addPolygon(draft, kind, corners)
      : setPolygon(draft, kind, polygon, corners);
  });
}

function conductor(row: PastedRow): Conductor {
  const number = (key: string): number => Number(row.get(key));
  const text = (key: string): string | undefined => {
    const value = row.get(key);
    return value === undefined ? undefined : String(value);
  };
  const resistance = row.get('resistance');
  return {
    id: text('id'),
    ...{ x1: number('x1'), y1: number('y1'), depth1: number('depth1') },
    ...{ x2: number('x2'), y2: number('y2'), depth2: number('depth2') },
    diameter: number('diameter'),
    material: text('material'),
    electrode: text('electrode'),
    insulated: row.has('insulated') ? row.get('insulated') === 'yes' : undefined,
    resistance: typeof resistance === 'number' ? resistance : undefined,
  };
}

/** Replaces every conductor of a table; the first one, or a new one, where `path` is undefined. */
export function pasteConductors(draft: Draft, text: string, path?: string, units?: DisplayUnits): Pasting {
  const pasted = readPaste('conductors', text, units);
  return into(pasted, (rows) => replaceConductors(draft, rows.map(conductor), path));
}

/** Replaces the readings of the survey; a study without one gets `survey.csv`, its number of layers left to the fit. */
export function pasteReadings(draft: Draft, text: string, units?: DisplayUnits): Pasting {
  return into(readPaste('readings', text, units), (rows) => {
    const named = valueAt(draft, ['soil', 'survey']);
    const path = typeof named === 'string' ? named : FIRST_SURVEY;
    const filled = withFile(draft, path, new TextEncoder().encode(readingsText(rows)));
    return typeof named === 'string'
      ? filled
      : setValue(filled, ['soil'], { survey: path, layer_count: 'auto' });
  });
}
