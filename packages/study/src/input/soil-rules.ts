// What the keys of the soil and of its seasons mean to each other.

import type { SoilInput } from '../study.ts';
import { SOIL_AS_GIVEN } from './defaults.ts';
import { isObject, items, type JsonValue, member, placeOf } from './json-value.ts';
import { MOST_FITTED_LAYERS } from './limits.ts';
import { type Finding, has } from './rule-finding.ts';
import { listed, quoted, shown } from './shown-value.ts';
import { pathFault } from './study-path.ts';
import type { StudyAsWritten } from './study-schema.ts';

/** Every layer but the last one has a thickness. */
function layerFindings(owner: JsonValue | undefined, place: string): readonly Finding[] {
  const layers = items(owner, 'layers');
  return layers.flatMap((layer, i): readonly Finding[] => {
    if (!isObject(layer)) return [];
    const where = placeOf(placeOf(placeOf(place, 'layers'), i), 'thickness_m');
    const last = i === layers.length - 1;
    if (last && has(layer, 'thickness_m')) {
      const value = String(member(layer, 'thickness_m'));
      const way = 'leave it out, or add the layer below';
      const message = `layer thickness ${shown(value)} is given for the last layer, which has no bottom; ${way}`;
      return [[where, 'last-layer-thickness', message]];
    }
    if (!last && !has(layer, 'thickness_m')) {
      return [[where, 'missing', 'layer thickness is missing; every layer but the last one has a thickness']];
    }
    return [];
  });
}

const EITHER_SOIL = 'expected either layers, the top one first, or survey with layer_count';
const LAYER_COUNT = `expected a whole number from 1 to ${MOST_FITTED_LAYERS}, or "auto"`;

/** Whether an object has a key that the schema tells as unknown, so that nothing is called missing for it. */
function hasOther(value: JsonValue, known: readonly string[]): boolean {
  return isObject(value) && Object.keys(value).some((key) => !known.includes(key));
}

function soilFindings(soil: JsonValue | undefined): readonly Finding[] {
  if (!isObject(soil)) return [];
  const [layers, survey, count] = ['layers', 'survey', 'layer_count'].map((key) => has(soil, key));
  const unknown = hasOther(soil, ['layers', 'survey', 'layer_count']);
  if (layers && (survey || count)) {
    const place = `soil.${survey ? 'survey' : 'layer_count'}`;
    return [[place, 'two-soils', `the soil has layers already; ${EITHER_SOIL}`]];
  }
  if (survey) {
    const message = `number of layers to fit is missing; ${LAYER_COUNT}`;
    return [
      ...pathFindings(soil),
      ...(count || unknown ? [] : [['soil.layer_count', 'missing', message] as const]),
    ];
  }
  if (layers || unknown) return [];
  if (!count) return [['soil', 'no-soil', `the soil is not described; ${EITHER_SOIL}`]];
  const message = 'path of a survey is missing; layer_count says how many layers are fitted to its readings';
  return [['soil.survey', 'missing', message]];
}

function pathFindings(soil: JsonValue): readonly Finding[] {
  const path = member(soil, 'survey');
  if (typeof path !== 'string' || path === '') return [];
  const wrong = pathFault(path);
  return wrong === undefined ? [] : [['soil.survey', 'path', `path ${quoted(path)} ${wrong}`]];
}

function depthOf(season: JsonValue, key: string): number {
  const depth = member(member(season, key), 'depth_m');
  return typeof depth === 'number' ? depth : Number.NaN;
}

function changeFindings(season: JsonValue, place: string): readonly Finding[] {
  const changes = ['top', 'below'].filter((key) => has(season, key));
  const expected = 'expected the whole soil as layers, or the soil of the study with top, below or both';
  if (has(season, 'layers')) {
    if (changes.length === 0) return [];
    const message = `the season has layers and ${listed(changes)}; ${expected}`;
    return [[placeOf(place, changes[0]), 'two-soils', message]];
  }
  if (changes.length === 0) {
    const unknown = hasOther(season, ['name', 'layers', 'top', 'below']);
    return unknown ? [] : [[place, 'no-change', `the season changes nothing; ${expected}`]];
  }
  const [top, below] = [depthOf(season, 'top'), depthOf(season, 'below')];
  if (!(top >= below)) return [];
  const message = `depth ${below} m of what is wet below is not deeper than the top, ${top} m`;
  return [[placeOf(placeOf(place, 'below'), 'depth_m'), 'season-depths', message]];
}

function nameFindings(
  season: JsonValue,
  place: string,
  firstWithName: Map<string, string>,
): readonly Finding[] {
  const name = member(season, 'name');
  if (typeof name !== 'string') return [];
  const where = placeOf(place, 'name');
  if (name === SOIL_AS_GIVEN) {
    return [[where, 'name-kept', `season name ${quoted(name)} is kept for the soil of the study itself`]];
  }
  const first = firstWithName.get(name);
  if (first !== undefined)
    return [[where, 'name-twice', `season name ${quoted(name)} is also that of ${first}`]];
  firstWithName.set(name, place);
  return [];
}

/** Findings of the soil and the seasons of a study, faulty or not; none for parts that the schema refuses. */
export function groundFindings(study: JsonValue): readonly Finding[] {
  const firstWithName = new Map<string, string>();
  const soil = member(study, 'soil');
  const seasons = items(study, 'seasons').flatMap((season, i): readonly Finding[] => {
    if (!isObject(season)) return [];
    const place = placeOf('seasons', i);
    return [
      ...nameFindings(season, place, firstWithName),
      ...changeFindings(season, place),
      ...layerFindings(season, place),
    ];
  });
  return [...soilFindings(soil), ...layerFindings(soil, 'soil'), ...seasons];
}

/** The soil of a study that has no such findings; `undefined` for any other. */
export function soilInput({ layers, survey, layer_count }: StudyAsWritten['soil']): SoilInput | undefined {
  if (layers !== undefined) {
    return survey === undefined && layer_count === undefined ? { layers } : undefined;
  }
  return survey === undefined || layer_count === undefined ? undefined : { survey, layer_count };
}

/** The survey that study.json names and that may be read. */
export function surveyPath(study: JsonValue): string | undefined {
  const soil = member(study, 'soil');
  const path = member(soil, 'survey');
  if (typeof path !== 'string' || path === '' || has(soil, 'layers')) return undefined;
  return pathFault(path) === undefined ? path : undefined;
}
