// The desk as components reach it.
import { useContext } from 'preact/hooks';
import { type Desk, DeskContext } from './desk.ts';

/** The desk under the sheet; undefined where the sheet is frozen. */
export function useDesk(): Desk | undefined {
  return useContext(DeskContext);
}
