// Electrodes that the draft leaves floating.
import { isObject, items, member } from '@ohmstead/study';
import type { Draft } from '../desk/draft.ts';

export function floatingElectrodes({ study }: Draft): ReadonlySet<string> {
  const named = items(study, 'electrodes').flatMap((one): string[] => {
    const name = isObject(one) ? member(one, 'name') : undefined;
    return typeof name === 'string' && member(one, 'role') === 'floating' ? [name] : [];
  });
  return new Set(named);
}
