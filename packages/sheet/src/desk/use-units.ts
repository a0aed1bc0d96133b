// The units in which lengths are displayed, as components reach them.
import type { DisplayUnits } from '@ohmstead/study';
import { type Context, createContext } from 'preact';
import { useContext } from 'preact/hooks';

/** Set by the sheet from the desk's switch or from the study. */
export const UnitsContext: Context<DisplayUnits> = createContext<DisplayUnits>('SI');

export function useUnits(): DisplayUnits {
  return useContext(UnitsContext);
}
