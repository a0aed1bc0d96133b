// Column names of a table to the quantities that they carry, units read from the names.
import type { Fault } from '../fault.ts';
import type { CsvTable } from './csv-table.ts';
import { nearestName } from './nearest-name.ts';
import { listed, shown } from './shown-value.ts';
import { type Unit, type UnitKind, unitsOf } from './units.ts';

/** A column that a table may have: text under its name, or a quantity whose unit follows the name. */
export interface ColumnSpec {
  /** name without unit, such as `x1` */
  readonly stem: string;
  readonly kind: 'text' | UnitKind;
  /** unit of the name shown in messages */
  readonly usualUnit?: string;
  readonly required: boolean;
  /** trade name, for messages */
  readonly label: string;
}

export interface FoundColumn {
  readonly spec: ColumnSpec;
  readonly index: number;
  /** as the header writes it */
  readonly name: string;
  /** for quantities */
  readonly unit?: Unit;
}

export interface FoundColumns {
  readonly byStem: ReadonlyMap<string, FoundColumn>;
  /** names of columns that no quantity of the table goes by */
  readonly unused: readonly string[];
}

type Match =
  | { readonly kind: 'found'; readonly unit?: Unit }
  | { readonly kind: 'no-unit' }
  | { readonly kind: 'unknown-unit'; readonly unit: string };

/** `x1_m` for a quantity, the name itself for text. */
export function usualName(spec: ColumnSpec): string {
  return spec.usualUnit === undefined ? spec.stem : `${spec.stem}_${spec.usualUnit}`;
}

function namesOf(spec: ColumnSpec): readonly string[] {
  if (spec.kind === 'text') return [spec.stem];
  return [usualName(spec), ...[...unitsOf(spec.kind).keys()].map((unit) => `${spec.stem}_${unit}`)];
}

function match(spec: ColumnSpec, name: string): Match | undefined {
  if (spec.kind === 'text') return name === spec.stem ? { kind: 'found' } : undefined;
  if (name === spec.stem) return { kind: 'no-unit' };
  if (!name.startsWith(`${spec.stem}_`)) return undefined;
  const suffix = name.slice(spec.stem.length + 1);
  const unit = unitsOf(spec.kind).get(suffix);
  return unit === undefined ? { kind: 'unknown-unit', unit: suffix } : { kind: 'found', unit };
}

/** Whether a name is that of a column the table needs, its unit known or not. */
export function isRequiredColumn(specs: readonly ColumnSpec[], name: string): boolean {
  return specs.some((spec) => spec.required && match(spec, name) !== undefined);
}

function unitWords(kind: UnitKind): string {
  switch (kind) {
    case 'length':
      return 'a unit of length';
    case 'resistance-per-length':
      return 'a unit of resistance per length';
    case 'resistivity':
      return 'a unit of resistivity';
    case 'resistance':
      return 'a unit of resistance';
  }
}

function unitMessage(spec: ColumnSpec, found: Match): string {
  if (spec.kind === 'text' || found.kind === 'found') return '';
  const known = listed([...unitsOf(spec.kind).keys()].map((unit) => `_${unit}`));
  if (found.kind === 'no-unit') {
    return `the column name has no unit; expected one such as ${usualName(spec)}, known are ${known}`;
  }
  return `${shown(found.unit)} is not ${unitWords(spec.kind)} known here; known are ${known}`;
}

/** Columns of heights, which drawings carry where this table wants depths. */
function heightColumns(unused: readonly string[]): string {
  const heights = unused.filter((name) => /^(?:z|elev|height|level)/i.test(name));
  return heights.length === 0
    ? ''
    : `; heights (${listed(heights.map(shown))}) are not read, they count the other way`;
}

function missingMessage(spec: ColumnSpec, unused: readonly string[]): string {
  const depth = spec.stem.startsWith('depth');
  const heights = depth ? heightColumns(unused) : '';
  return `the column is missing; expected ${spec.label}${depth ? ', positive downward' : ''}${heights}`;
}

/**
 * Finds the columns of a table.
 * @param table the table
 * @param specs columns that it may have
 * @param faults gets units that are unknown or absent, names that are nearly right, quantities given twice or missing
 * @returns columns by stem, and the names that mean nothing here
 */
export function findColumns(table: CsvTable, specs: readonly ColumnSpec[], faults: Fault[]): FoundColumns {
  const { file, headerLine: line } = table;
  const byStem = new Map<string, FoundColumn>();
  const told = new Set<string>();
  const unused: string[] = [];
  const names = specs.flatMap(namesOf);
  const stemOf = new Map(specs.flatMap((spec) => namesOf(spec).map((name) => [name, spec.stem] as const)));

  table.header.forEach((name, index) => {
    // blank and repeated names are told when the table is read
    if (name === '' || table.header.indexOf(name) !== index) return;
    const place = shown(name);
    for (const spec of specs) {
      const found = match(spec, name);
      if (found === undefined) continue;
      if (found.kind !== 'found') {
        told.add(spec.stem);
        const code = found.kind === 'no-unit' ? 'missing-unit' : 'unknown-unit';
        faults.push({ file, line, place, code, message: unitMessage(spec, found) });
        return;
      }
      const first = byStem.get(spec.stem);
      if (first !== undefined) {
        const message = `${spec.label} is given twice, as ${first.name} and ${name}`;
        faults.push({ file, line, place, code: 'duplicate-column', message });
        return;
      }
      byStem.set(spec.stem, { spec, index, name, ...(found.unit === undefined ? {} : { unit: found.unit }) });
      return;
    }
    unused.push(name);
  });

  const passedOver: string[] = [];
  for (const name of unused) {
    const free = names.filter((known) => !byStem.has(stemOf.get(known) ?? ''));
    const near = nearestName(name, free);
    if (near === undefined) {
      passedOver.push(name);
      continue;
    }
    told.add(stemOf.get(near) ?? '');
    const message = `no column of this table goes by this name; ${near} is probably meant`;
    faults.push({ file, line, place: shown(name), code: 'unknown-column', message });
  }
  for (const spec of specs) {
    if (!spec.required || byStem.has(spec.stem) || told.has(spec.stem)) continue;
    const message = missingMessage(spec, passedOver);
    faults.push({ file, line, place: usualName(spec), code: 'missing-column', message });
  }
  return { byStem, unused: passedOver };
}
