// What keys of study.json mean to each other, which a schema of single keys cannot tell.
import type { Fault } from '../fault.ts';
import type { Point } from '../study.ts';
import { isList, isObject, items, type JsonDocument, type JsonValue, member, placeOf } from './json-value.ts';
import { MOST_CORNERS } from './limits.ts';
import { polygonFault } from './polygon-faults.ts';
import { type Finding, has } from './rule-finding.ts';
import { quoted } from './shown-value.ts';
import { groundFindings } from './soil-rules.ts';
import { pathFault } from './study-path.ts';

function currentFindings(faultCase: JsonValue, place: string): readonly Finding[] {
  const fault = has(faultCase, 'fault_current_A');
  const grid = has(faultCase, 'grid_current_A');
  const either = 'fault_current_A with division_factor, or grid_current_A';
  if (!fault && !grid) return [[place, 'no-current', `the case has no current; expected ${either}`]];
  if (fault && grid) {
    return [
      [
        placeOf(place, 'grid_current_A'),
        'two-currents',
        `the case has two currents; expected either ${either}`,
      ],
    ];
  }
  if (grid && has(faultCase, 'division_factor')) {
    const message =
      'division factor has nothing to divide: the grid current is already the part that enters the ground';
    return [[placeOf(place, 'division_factor'), 'two-currents', message]];
  }
  return [];
}

function caseFindings(study: JsonValue): readonly Finding[] {
  const firstWithName = new Map<string, number>();
  return items(study, 'cases').flatMap((faultCase, i): readonly Finding[] => {
    if (!isObject(faultCase)) return [];
    const place = placeOf('cases', i);
    const findings: Finding[] = [...currentFindings(faultCase, place)];
    if (has(faultCase, 'x_over_r') && !has(faultCase, 'frequency_hz')) {
      const message = 'frequency is missing; the decrement factor needs it beside x_over_r, 50 or 60 Hz';
      findings.push([placeOf(place, 'frequency_hz'), 'missing', message]);
    }
    const name = member(faultCase, 'name');
    if (typeof name !== 'string') return findings;
    const first = firstWithName.get(name);
    if (first === undefined) firstWithName.set(name, i);
    else
      findings.push([
        placeOf(place, 'name'),
        'name-twice',
        `case name ${quoted(name)} is also that of cases[${first}]`,
      ]);
    return findings;
  });
}

function electrodeFindings(study: JsonValue): readonly Finding[] {
  const firstWithName = new Map<string, number>();
  return items(study, 'electrodes').flatMap((electrode, i): readonly Finding[] => {
    const name = member(electrode, 'name');
    if (typeof name !== 'string') return [];
    const first = firstWithName.get(name);
    firstWithName.set(name, first ?? i);
    const place = placeOf(placeOf('electrodes', i), 'name');
    return first === undefined
      ? []
      : [[place, 'name-twice', `electrode name ${quoted(name)} is also that of electrodes[${first}]`]];
  });
}

function tableFindings(study: JsonValue): readonly Finding[] {
  const seen = new Set<string>();
  return items(study, 'conductors').flatMap((path, i): readonly Finding[] => {
    if (typeof path !== 'string' || path === '') return [];
    const place = placeOf('conductors', i);
    const wrong = pathFault(path);
    if (wrong !== undefined) return [[place, 'path', `path ${quoted(path)} ${wrong}`]];
    if (seen.has(path)) return [[place, 'table-twice', `table ${quoted(path)} is listed twice`]];
    seen.add(path);
    return [];
  });
}

function pointOf(value: JsonValue): Point | undefined {
  if (!isList(value) || value.length !== 2) return undefined;
  const [x, y] = value;
  return typeof x === 'number' && typeof y === 'number' ? [x, y] : undefined;
}

/** Lists of polygons in a study: what holds them, and under which key. */
const POLYGON_LISTS = [
  ['areas', 'touch'],
  ['areas', 'step'],
  ['surfacing', 'areas'],
] as const;

function areaFindings(study: JsonValue): readonly Finding[] {
  return POLYGON_LISTS.flatMap(([owner, key]) =>
    items(member(study, owner), key).flatMap((area, i): readonly Finding[] => {
      const corners = isList(area) ? area.map(pointOf).filter((point) => point !== undefined) : [];
      // corners that are no points, too few or too many are told by the schema
      if (
        corners.length < 3 ||
        corners.length > MOST_CORNERS ||
        !isList(area) ||
        corners.length < area.length
      )
        return [];
      const wrong = polygonFault(corners);
      return wrong === undefined ? [] : [[placeOf(placeOf(owner, key), i), 'area', wrong]];
    }),
  );
}

/** Line of a place, or of the nearest place around it that stands in the file. */
function lineOf(document: JsonDocument, place: string): number | undefined {
  return document.lines.get(place) ?? document.lines.get(place.replace(/(?:\.\w+|\[\d+\])$/, ''));
}

/**
 * Judges the rules between the keys of study.json; works on a study with other faults too.
 * @param file name for the faults
 * @param document the study as read
 * @returns located faults; none for parts that the schema refuses
 */
export function ruleFaults(file: string, document: JsonDocument): readonly Fault[] {
  const study = document.value;
  const findings = [
    ...groundFindings(study),
    ...caseFindings(study),
    ...electrodeFindings(study),
    ...tableFindings(study),
    ...areaFindings(study),
  ];
  return findings.map(([place, code, message]) => {
    const line = lineOf(document, place);
    return { file, ...(line === undefined ? {} : { line }), place, code, message };
  });
}

/**
 * The tables that study.json names and that may be read.
 * @param study value of study.json, faulty or not
 * @returns paths within the study folder, each once, in the order given
 */
export function conductorTables(study: JsonValue): readonly string[] {
  const paths = items(study, 'conductors').filter((path) => typeof path === 'string');
  return [...new Set(paths)].filter((path) => path !== '' && pathFault(path) === undefined);
}
