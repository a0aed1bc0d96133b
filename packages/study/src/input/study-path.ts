// Paths that a study may name: relative, within its folder, the same on every system.
import { LONGEST_PATH } from './limits.ts';
import { invisibleCharacter } from './shown-value.ts';

const INSIDE = 'expected a path within the study folder such as conductors.csv';

/**
 * What is wrong with a path that a study names.
 * @param path as written in study.json
 * @returns a message, or `undefined` where the path stays in the study folder
 */
export function pathFault(path: string): string | undefined {
  if (path.length > LONGEST_PATH) return `has more than ${LONGEST_PATH} characters; ${INSIDE}`;
  if (/^[A-Za-z]:/.test(path)) return `names a drive; ${INSIDE}`;
  if (path.includes(':')) return `has a colon; ${INSIDE}`;
  if (path.includes('\\')) return 'has a backslash; expected / between folder and file';
  if (path.startsWith('/')) return `is absolute; ${INSIDE}`;
  const parts = path.split('/');
  if (parts.includes('..')) return `leaves the study folder; ${INSIDE}`;
  if (parts.includes('.') || parts.includes('')) return `has an empty or . part; ${INSIDE}`;
  const invisible = invisibleCharacter(path);
  return invisible === undefined ? undefined : `has the character ${invisible}; ${INSIDE}`;
}
