// The main results of a computed study beside those on record, as rows of text.
import { measured, percent } from '@ohmstead/sheet';
import type { CaseResult, EnvelopeCase, Results, WorstTouch } from '@ohmstead/study';
import type { BesideRow } from './messages.ts';

/** Stands for what the record does not say, or not as a number. */
const NOTHING = '—';

interface Told {
  readonly name: string;
  /** where it stands in results.json */
  readonly path: readonly (string | number)[];
  /** from the value found there */
  readonly text: (found: unknown) => string;
}

/**
 * @param record as parsed from JSON; nothing of it is trusted
 * @param results of the study as computed
 */
export function besideRows(record: unknown, results: Results): readonly BesideRow[] {
  const rows: readonly Told[] = [
    { name: 'Resistance', path: ['electrode'], text: quantityText('resistance_ohm', 'Ω') },
    ...results.cases.flatMap((one, c) => caseRows(one, c)),
    ...(results.seasons.length === 0 ? [] : results.envelope.flatMap((one, c) => envelopeRows(one, c))),
  ];
  return rows.map(({ name, path, text }) => ({
    name,
    record: text(at(record, path)),
    computed: text(at(results, path)),
  }));
}

function caseRows({ name }: CaseResult, c: number): readonly Told[] {
  return [
    { name: `${name}: rise`, path: ['cases', c], text: quantityText('gpr_V', 'V') },
    { name: `${name}: worst touch voltage`, path: ['cases', c, 'touch'], text: againstLimit },
    { name: `${name}: worst step voltage`, path: ['cases', c, 'step'], text: againstLimit },
  ];
}

function envelopeRows({ name }: EnvelopeCase, c: number): readonly Told[] {
  return [
    { name: `${name}: touch voltage, governing season`, path: ['envelope', c, 'touch'], text: againstLimit },
    { name: `${name}: step voltage, governing season`, path: ['envelope', c, 'step'], text: againstLimit },
  ];
}

/** A quantity whose uncertainty has its name with `uncertainty` before the unit, e.g. `gpr_uncertainty_V`. */
function quantityText(key: string, unit: string): (found: unknown) => string {
  return (found) => {
    const value = at(found, [key]);
    const uncertainty = at(found, [key.replace(/_[^_]+$/, '_uncertainty$&')]);
    return typeof value === 'number' && typeof uncertainty === 'number'
      ? measured(value, uncertainty, unit)
      : NOTHING;
  };
}

function againstLimit(found: unknown): string {
  if (!isWorst(found)) return NOTHING;
  const { worst_V, uncertainty_V, limit_V } = found;
  return `${measured(worst_V, uncertainty_V, 'V')}, ${percent(worst_V / limit_V)} of the limit`;
}

function isWorst(found: unknown): found is Pick<WorstTouch, 'worst_V' | 'uncertainty_V' | 'limit_V'> {
  return ['worst_V', 'uncertainty_V', 'limit_V'].every((key) => typeof at(found, [key]) === 'number');
}

function at(value: unknown, path: readonly (string | number)[]): unknown {
  let inner: unknown = value;
  for (const key of path) {
    if (typeof inner !== 'object' || inner === null || !Object.hasOwn(inner, key)) return undefined;
    inner = Reflect.get(inner, key);
  }
  return inner;
}
