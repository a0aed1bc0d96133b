// Pinned states and what differs between one of them and the state worked at.

import { percent, quantity } from '@ohmstead/sheet';
import type { DisplayUnits } from '@ohmstead/study';
import type { VNode } from 'preact';
import { type Comparison, compareStates } from '../desk/compare.ts';
import { type Compared, type Difference, isTold } from '../desk/difference.ts';
import { stateOf } from '../desk/pins.ts';
import { quantityText } from '../desk/quantity-text.ts';
import { type Bench, type BenchAction, draftOf } from './bench.ts';

export interface PinsProps {
  readonly bench: Bench;
  readonly act: (action: BenchAction) => void;
  readonly units: DisplayUnits;
}

export function Pins({ bench, act, units }: PinsProps): VNode | null {
  const { pins, compared, solved } = bench;
  if (pins.length === 0) return null;
  const pin = compared === undefined ? undefined : pins[compared];
  return (
    <section class="pins" aria-labelledby="pins-title">
      <h2 id="pins-title">Pinned states</h2>
      <ul>
        {pins.map((one, at) => (
          <li key={one.name}>
            <input
              class="in"
              aria-label={`name of pinned state ${at + 1}`}
              value={one.name}
              onChange={(event) => act({ kind: 'rename-pin', at, name: event.currentTarget.value })}
            />
            <button
              type="button"
              class="word"
              aria-pressed={compared === at}
              onClick={() => act({ kind: 'compare', at: compared === at ? undefined : at })}
            >
              {compared === at ? 'compared with' : 'compare with this'}
            </button>
            <button
              type="button"
              class="word"
              onClick={() => act({ kind: 'edit', draft: one.draft, label: `back to ${one.name}` })}
            >
              go back to this
            </button>
            <button type="button" class="word" onClick={() => act({ kind: 'remove-pin', at })}>
              unpin<span class="unseen"> {one.name}</span>
            </button>
          </li>
        ))}
      </ul>
      {pin !== undefined && solved !== undefined && (
        <ComparisonTable
          name={pin.name}
          comparison={compareStates(pin, stateOf('now', draftOf(bench), solved.outcome))}
          units={units}
        />
      )}
    </section>
  );
}

interface ComparisonTableProps {
  readonly name: string;
  readonly comparison: Comparison;
  readonly units: DisplayUnits;
}

function ComparisonTable({ name, comparison, units }: ComparisonTableProps): VNode {
  const { inputs, conductors, metal, results } = comparison;
  const lists = [
    ['added', conductors.added],
    ['removed', conductors.removed],
    ['moved', conductors.moved],
  ] as const;
  const groups = [
    ['Inputs', inputs],
    ['Metal', metal],
    ['Results', results],
  ] as const;
  const told = groups.filter(([, lines]) => lines.length > 0);
  if (told.length === 0) return <p>Nothing differs from {name}.</p>;
  return (
    <div class="scroll">
      <table class="compare">
        <caption>What differs from {name}</caption>
        <thead>
          <tr>
            <th scope="col">quantity</th>
            <th scope="col">{name}</th>
            <th scope="col">now</th>
          </tr>
        </thead>
        {told.map(([title, lines]) => (
          <tbody key={title}>
            <tr>
              <th colSpan={3} scope="rowgroup">
                {title}
              </th>
            </tr>
            {lines.map((line) => (
              <Row key={line.what} line={line} units={units} />
            ))}
          </tbody>
        ))}
      </table>
      {lists.map(([word, list]) =>
        list.length === 0 ? null : (
          <p key={word}>
            Conductors {word}: {list.length}.
          </p>
        ),
      )}
    </div>
  );
}

function Row({ line, units }: { readonly line: Difference; readonly units: DisplayUnits }): VNode {
  return (
    <tr class={isTold(line) ? 'told' : 'untold'}>
      <th scope="row">{line.what}</th>
      <td>{text(line, line.before, units)}</td>
      <td>
        {text(line, line.after, units)}
        {!isTold(line) && <span class="soft"> (within the numerical uncertainty)</span>}
      </td>
    </tr>
  );
}

/** Results have the digits of a result; inputs are told as they were given. */
function text({ kind }: Difference, value: Compared, units: DisplayUnits): string {
  if (value === undefined) return '–';
  if (typeof value === 'string') return value;
  switch (kind) {
    case 'text':
    case 'count':
      return String(value);
    case 'resistance':
      return quantity(value, 'Ω');
    case 'voltage':
      return quantity(value, 'V');
    case 'percent':
      return percent(value / 100);
    default:
      return quantityText(kind, value, units);
  }
}
