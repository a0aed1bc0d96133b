// Two results compared number by number: what differs, and how much of the rest agrees exactly.
import type { Difference } from './difference.ts';

/**
 * Relative difference up to which two numbers count as the same result on two kinds of machine. On one machine type
 * a study gives the same bits; between runtimes exp, log, sin and the like differ in the last bit (2e-16), which the
 * solution of the equations enlarges by their condition number, 1e3 to 1e6. Numbers below 1 are compared to
 * the same figure absolutely: residuals and balances are rounding errors themselves and agree in size at best.
 */
export const SAME_NUMBER_TOLERANCE: number = 1e-9;

/** Whether two numbers count as the same result on two kinds of machine. */
export function sameNumber(a: number, b: number): boolean {
  return Math.abs(a - b) <= SAME_NUMBER_TOLERANCE * Math.max(1, Math.abs(a), Math.abs(b));
}

export interface Comparison {
  readonly differences: readonly Difference[];
  /** numbers compared, those that agree to the last bit, and those that agree within the tolerance only */
  readonly numbers: number;
  readonly exact: number;
  readonly close: number;
}

/**
 * Compares stored results with recomputed ones.
 * @param stored as parsed from a results file
 * @param computed as parsed from the text of the new results, so that both went through JSON
 * @returns each differing path with both values, in order of the paths
 */
export function compareResults(stored: unknown, computed: unknown): Comparison {
  const differences: Difference[] = [];
  let numbers = 0;
  let exact = 0;
  let close = 0;
  const visit = (path: string, a: unknown, b: unknown): void => {
    if (typeof a === 'number' && typeof b === 'number') {
      numbers++;
      if (a === b) exact++;
      else if (sameNumber(a, b)) close++;
      else differences.push({ kind: 'result', path, stored: String(a), computed: String(b) });
    } else if (isObject(a) && isObject(b) && Array.isArray(a) === Array.isArray(b)) {
      for (const key of [...new Set([...Object.keys(a), ...Object.keys(b)])]) {
        visit(
          Array.isArray(a) ? `${path}[${key}]` : path === '' ? key : `${path}.${key}`,
          own(a, key),
          own(b, key),
        );
      }
    } else if (a !== b) {
      differences.push({
        kind: 'result',
        path: path === '' ? '(all of it)' : path,
        stored: shown(a),
        computed: shown(b),
      });
    }
  };
  visit('', stored, computed);
  return { differences, numbers, exact, close };
}

function isObject(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null;
}

function own(value: Readonly<Record<string, unknown>>, key: string): unknown {
  return Object.hasOwn(value, key) ? value[key] : undefined;
}

/** A value in a few words; stored values are not to be trusted with the length or depth of a message. */
function shown(value: unknown): string {
  if (value === undefined) return 'nothing';
  if (Array.isArray(value)) return `a list of ${value.length}`;
  if (isObject(value)) return 'an object';
  const text = JSON.stringify(value);
  return text.length > 120 ? `${text.slice(0, 120)}…` : text;
}
