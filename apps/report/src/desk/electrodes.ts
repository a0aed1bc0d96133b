// Roles of the electrodes that study.json names.
import { isObject, member } from '@ohmstead/study';
import type { Draft } from './draft.ts';
import { insertItem, listAt, removeItem, setValue } from './set-value.ts';

const ELECTRODES = ['electrodes'] as const;

/**
 * Gives an electrode its role.
 * @param name as the conductors have it
 * @param role undefined takes the electrode off the list: it is then energised by default
 */
export function setRole(draft: Draft, name: string, role: 'energised' | 'floating' | undefined): Draft {
  const list = listAt(draft, ELECTRODES);
  const at = list.findIndex((one) => member(one, 'name') === name);
  if (role === undefined) return at < 0 ? draft : removeItem(draft, ELECTRODES, at);
  if (at < 0) return insertItem(draft, ELECTRODES, list.length, { name, role });
  return setValue(draft, [...ELECTRODES, at, 'role'], role);
}

/** The role that study.json gives an electrode; undefined where it is not listed, or its role is none. */
export function roleOf(draft: Draft, name: string): 'energised' | 'floating' | undefined {
  const one = listAt(draft, ELECTRODES).find((electrode) => member(electrode, 'name') === name);
  const role = isObject(one) ? one.role : undefined;
  return role === 'energised' || role === 'floating' ? role : undefined;
}
