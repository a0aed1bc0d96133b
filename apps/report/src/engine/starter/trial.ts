// The form in which a reader changes numbers of the study, and what comes of it beside the record.
import type { BesideRow } from '../messages.ts';
import { element } from './element.ts';
import { type NumberInput, typedNumber } from './inputs.ts';

export interface Change {
  readonly input: NumberInput;
  readonly value: number;
}

/**
 * A field for each number.
 * @param compute is given what was changed, once at least one number is
 */
export function trialForm(
  inputs: readonly NumberInput[],
  compute: (changes: readonly Change[]) => void,
): HTMLFormElement {
  const word = element('p', { role: 'alert' });
  const fields = inputs.map((input) => {
    const id = `trial-${input.name}`;
    const field = element('input', {
      id,
      type: 'text',
      inputmode: 'decimal',
      autocomplete: 'off',
      value: String(input.value),
    });
    return { input, field, row: element('p', {}, element('label', { for: id }, input.label), field) };
  });
  const groups = [...new Set(inputs.map(({ group }) => group))].map((group) =>
    element(
      'fieldset',
      {},
      element('legend', {}, group),
      ...fields.filter(({ input }) => input.group === group).map(({ row }) => row),
    ),
  );
  const form = element(
    'form',
    {},
    element('div', { class: 'fields' }, ...groups),
    element('button', { type: 'submit' }, 'Compute with these numbers'),
    ' ',
    element('button', { type: 'reset' }, 'As on record'),
    word,
  );
  form.addEventListener('submit', (event) => {
    event.preventDefault();
    const typed = fields.map(({ input, field }) => {
      const value = typedNumber(field.value);
      if (value === undefined) field.setAttribute('aria-invalid', 'true');
      else field.removeAttribute('aria-invalid');
      return { input, value };
    });
    const wrong = typed.filter(({ value }) => value === undefined);
    const changes = typed.flatMap(({ input, value }): Change[] =>
      value === undefined || value === input.value ? [] : [{ input, value }],
    );
    if (wrong.length > 0)
      word.textContent = `Not a number: ${wrong.map(({ input }) => input.name).join(', ')}.`;
    else if (changes.length === 0) word.textContent = 'Every number is as on record; change one first.';
    else {
      word.textContent = '';
      compute(changes);
    }
  });
  return form;
}

/** Main results on record and as they would be. */
export function besideTable(changes: readonly Change[], rows: readonly BesideRow[]): Node {
  const changed = changes.map(({ input, value }) => `${input.name} ${input.value} → ${value}`).join('; ');
  const table = element(
    'table',
    {},
    element('caption', {}, `With ${changed}. The record below is unaltered.`),
    element(
      'thead',
      {},
      element(
        'tr',
        {},
        ...['', 'on record', 'with the change'].map((text) => element('th', { scope: 'col' }, text)),
      ),
    ),
    element(
      'tbody',
      {},
      ...rows.map(({ name, record, computed }) =>
        element(
          'tr',
          {},
          element('th', { scope: 'row' }, name),
          element('td', {}, record),
          element('td', record === computed ? {} : { class: 'differs' }, computed),
        ),
      ),
    ),
  );
  return element('div', { class: 'scroll' }, table);
}
