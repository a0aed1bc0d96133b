// A value that a live page takes over when its turn has come.
import { useEffect, useState } from 'preact/hooks';
import { inTurn } from './turns.ts';
import { useDesk } from './use-desk.ts';

/**
 * What is costly to draw, on a live page: the value as it was until what was drawn before it is on the screen; `before`
 * at first. On a frozen page, and where a page is written as text, the value itself.
 */
export function useTurn<T>(value: T, before: T): T {
  // a page that is written as text has no turns to wait for
  const live = useDesk() !== undefined && typeof document !== 'undefined';
  const [taken, take] = useState(before);
  useEffect(() => (live && taken !== value ? inTurn(() => take(() => value)) : undefined), [live, value]);
  return live ? taken : value;
}
