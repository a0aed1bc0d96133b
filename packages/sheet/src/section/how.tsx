// Unfolds a result to its formula, clause, inputs and value.
import type { ComponentChildren, VNode } from 'preact';
import { Fold } from './parts.tsx';

export interface HowInput {
  readonly symbol: ComponentChildren;
  readonly name: string;
  readonly value: string;
}

export interface HowProps {
  /** what is explained, for readers who hear only the word how: `the rise is found` */
  readonly of: string;
  readonly formula: ComponentChildren;
  /** document and clause, with a mark where they are recalled */
  readonly clause: string;
  readonly inputs: readonly HowInput[];
  readonly value?: string;
  readonly children?: ComponentChildren;
}

/** Formula, clause, inputs with units, value; set right behind its sentence, never alone on a line. */
export function How({ of, formula, clause, inputs, value, children }: HowProps): VNode {
  return (
    <>
      {'\u00a0'}
      <Fold label="how" of={` ${of}`}>
        <div class="formula">{formula}</div>
        <dl class="inputs">
          {inputs.map(({ symbol, name, value: shown }) => (
            <div key={name}>
              <dt>
                {symbol} <span class="meaning">{name}</span>
              </dt>
              <dd>{shown}</dd>
            </div>
          ))}
          {value !== undefined && (
            <div class="outcome">
              <dt>gives</dt>
              <dd>{value}</dd>
            </div>
          )}
        </dl>
        {children}
        <div class="clause">{clause}</div>
      </Fold>
    </>
  );
}
