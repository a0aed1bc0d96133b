// Which electrodes of the tables carry the fault and which float, each to be chosen.
import type { JsonValue, Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import type { Desk } from '../desk/desk.ts';
import { itemsOf, memberOf } from '../desk/json.ts';
import { type Option, Select } from '../field/choice.tsx';
import { Say } from './parts.tsx';

const ROLES: readonly Option[] = [
  { value: 'energised', text: 'is energised' },
  { value: 'floating', text: 'floats' },
];

/** Sets the role of an electrode, whether the study names it already or only its tables do. */
function setRole(desk: Desk, name: string, role: JsonValue): void {
  const stated = itemsOf(desk.valueAt(['electrodes']));
  const index = stated.findIndex((electrode) => memberOf(electrode, 'name') === name);
  if (index >= 0) desk.edit(['electrodes', index, 'role'], role);
  else desk.edit(['electrodes'], [...stated, { name, role }]);
}

/** One choice an electrode; what joints make of it is told before. */
export function ElectrodeRoles({ desk, outcome }: { desk: Desk; outcome: Outcome }): VNode {
  const stated = itemsOf(desk.valueAt(['electrodes']));
  const names = [...new Set(outcome.plan.conductors.map((c) => c.electrode))].filter((name) => name !== '');
  return (
    <Say>
      As stated:{' '}
      {names.map((name, k) => {
        const index = stated.findIndex((electrode) => memberOf(electrode, 'name') === name);
        return (
          <span key={name}>
            {k > 0 && ', '}
            {name}{' '}
            <Select
              label={`role of ${name}`}
              options={ROLES}
              value={memberOf(stated[index], 'role') ?? 'energised'}
              choose={(role) => setRole(desk, name, role)}
              complaints={index < 0 ? [] : desk.complaints(['electrodes', index, 'role'])}
            />
          </span>
        );
      })}
      .
    </Say>
  );
}
