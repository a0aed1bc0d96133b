// A small field for a quantity of what is drawn or chosen; nonsense is refused beside it.
import type { DisplayUnits } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useId, useState } from 'preact/hooks';
import { type QuantityKind, readQuantity } from '../desk/quantity.ts';
import { quantityText } from '../desk/quantity-text.ts';

export interface QuantityFieldProps {
  readonly label: string;
  /** completes the label for those who hear it */
  readonly of?: string;
  readonly kind: QuantityKind;
  /** in SI; undefined where nothing is to be shown */
  readonly value: number | undefined;
  readonly units: DisplayUnits;
  readonly take: (value: number) => void;
}

export function QuantityField({ label, of, kind, value, units, take }: QuantityFieldProps): VNode {
  const id = useId();
  const [typed, setTyped] = useState<string>();
  const [complaint, setComplaint] = useState<string>();
  const shown = value === undefined ? '' : quantityText(kind, value, units);
  const commit = (): void => {
    if (typed === undefined) return;
    if (typed.trim() === '' || typed === shown) {
      setTyped(undefined);
      return;
    }
    const reading = readQuantity(kind, typed, { units });
    if ('complaint' in reading) {
      setComplaint(reading.complaint);
      return;
    }
    setTyped(undefined);
    take(reading.value);
  };
  return (
    <label class="plan-field">
      {label}
      {of !== undefined && <span class="unseen"> of {of}</span>}{' '}
      <input
        class="in"
        size={7}
        value={typed ?? shown}
        autocomplete="off"
        spellcheck={false}
        {...(complaint === undefined ? {} : { 'aria-invalid': true, 'aria-describedby': id })}
        onInput={(event) => {
          setTyped(event.currentTarget.value);
          setComplaint(undefined);
        }}
        onBlur={commit}
        onKeyDown={(event) => {
          if (event.key === 'Enter') commit();
          if (event.key === 'Escape') {
            setTyped(undefined);
            setComplaint(undefined);
          }
        }}
      />
      {complaint !== undefined && (
        <span class="complaint" id={id} role="alert">
          {complaint}
        </span>
      )}
    </label>
  );
}
