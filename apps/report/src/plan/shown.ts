// What the plan shows of the results.
import type { MapKind } from '@ohmstead/sheet';

export type Shown = MapKind | 'leakage' | 'nothing';
export const SHOWN: readonly Shown[] = ['touch', 'step', 'potential', 'leakage', 'nothing'];

/** The map that is shown; undefined where none is. */
export function mapOf(shown: Shown): MapKind | undefined {
  return shown === 'leakage' || shown === 'nothing' ? undefined : shown;
}

/** What the plan is called for those who hear it. */
export function shownWords(shown: Shown): string {
  switch (shown) {
    case 'nothing':
      return 'Plan of the electrode';
    case 'leakage':
      return 'Plan of the electrode with its leakage';
    case 'potential':
      return 'Plan of the electrode with its map of the surface potential';
    default:
      return `Plan of the electrode with its map of ${shown} voltage`;
  }
}
