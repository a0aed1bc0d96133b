// What a hand calculation with one resistivity would use, and how far off its resistance is.
import type { EquivalentUniform as Equivalent, Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { fittedQuantity } from '../format/fitted.ts';
import { MINUS, percent, significant } from '../format/number.ts';
import { DataTable, Say } from './parts.tsx';

function deviation(of: Equivalent): string {
  const share = of.deviation_percent / 100;
  if (Math.abs(share) < 5e-4) return percent(Math.abs(share));
  return `${share < 0 ? MINUS : '+'}${percent(Math.abs(share))}`;
}

/** Absent in uniform soil, where there is nothing to be made one. */
export function EquivalentUniformSoil({ outcome }: { outcome: Outcome }): VNode | null {
  const { equivalent_uniform: rows } = outcome.results;
  if (rows.length === 0) return null;
  const [least, most] = rows.reduce<readonly [number, number]>(
    ([low, high], { deviation_percent: d }) => [Math.min(low, d), Math.max(high, d)],
    [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY],
  );
  const range =
    least < 0 && most > 0
      ? `between ${percent(-least / 100)} too low and ${percent(most / 100)} too high`
      : least >= 0
        ? `up to ${percent(most / 100)} too high`
        : `up to ${percent(-least / 100)} too low`;
  return (
    <>
      <Say>
        A hand calculation takes one resistivity for the whole ground. This electrode in such ground, solved
        alike, has a resistance {range}.
      </Say>
      <DataTable
        caption="One resistivity in place of the layers, and what it makes of the resistance"
        columns={[
          { label: 'one resistivity' },
          { label: 'resistivity', align: 'right' },
          { label: 'resistance', align: 'right' },
          { label: 'off by', align: 'right' },
          { label: 'source' },
        ]}
        rows={rows.map((of) => [
          of.name,
          fittedQuantity(of.resistivity_ohm_m, 'Ω·m'),
          `${significant(of.resistance_ohm, 4)}\u202fΩ`,
          deviation(of),
          of.source,
        ])}
        file="equivalent-uniform.csv"
      />
    </>
  );
}
