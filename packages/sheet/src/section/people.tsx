// People: the tolerable voltages, and every worst voltage against them.
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { Hatch } from '../figure/hatch.tsx';
import { fixed, givenQuantity, measured, quantity } from '../format/number.ts';
import { barOf, barScale } from '../geometry/bars.ts';
import { findingWords, undecidedReason } from '../verdict/finding.ts';
import { type VerdictRow, verdictRows } from '../verdict/rows.ts';
import { BODY_FACTOR, CLAUSES, S, StepFormula, TouchFormula } from './formulas.tsx';
import { How } from './how.tsx';
import { CaseName, Input, Part, Result, Say } from './parts.tsx';

function Limits({ outcome }: { outcome: Outcome }): VNode {
  const { limits, cases } = outcome.results;
  const factor = BODY_FACTOR[limits.body_mass_kg];
  const ground = limits.surfacing_resistivity_ohm_m ?? limits.soil_resistivity_ohm_m;
  return (
    <>
      <Say>
        Tolerable voltages after <Input path="limits.basis" value={limits.basis} /> for a body of{' '}
        <Input path="limits.body_mass_kg" value={limits.body_mass_kg} unit="kg" />.
      </Say>
      {cases.map((of, index) => (
        <Say key={index}>
          <CaseName name={of.name} />: over{' '}
          <Input path={`cases[${index}].duration_s`} value={of.duration_s} unit="s" />, touch{' '}
          <Result>{quantity(of.touch.limit_V, 'V')}</Result> and step{' '}
          <Result>{quantity(of.step.limit_V, 'V')}</Result>.
          <How
            of={`the limits of ${of.name} are found`}
            formula={
              <>
                <TouchFormula factor={factor} />
                <br />
                <StepFormula factor={factor} />
              </>
            }
            clause={CLAUSES.tolerable}
            inputs={[
              {
                symbol: <S of="C" index="s" />,
                name: 'covering factor',
                value: fixed(limits.covering_factor, 4),
              },
              {
                symbol: <S of="ρ" index="s" />,
                name: 'ground under the feet',
                value: givenQuantity(ground, 'Ω·m'),
              },
              { symbol: <S of="t" index="s" />, name: 'duration', value: givenQuantity(of.duration_s, 's') },
            ]}
            value={`${quantity(of.touch.limit_V, 'V')} touch, ${quantity(of.step.limit_V, 'V')} step`}
          />
        </Say>
      ))}
    </>
  );
}

function BarCell({ row, full, id }: { row: VerdictRow; full: number; id: string }): VNode {
  const bar = barOf(row, full);
  const pc = (share: number): string => `${Math.round(share * 10_000) / 100}%`;
  return (
    <svg class="fig bar-line" aria-hidden="true" focusable="false">
      <defs>
        <Hatch id={id} spacing={5} />
      </defs>
      <rect class="bar" x="0" y="6" width={pc(bar.within)} height="10" />
      {bar.beyond > 0 && (
        <rect x={pc(bar.within)} y="6" width={pc(bar.beyond)} height="10" fill={`url(#${id})`} />
      )}
      <line class="leader" x1={pc(bar.low)} x2={pc(bar.high)} y1="11" y2="11" />
      <line class="limit-tick" x1={pc(bar.limit)} x2={pc(bar.limit)} y1="0" y2="22" />
    </svg>
  );
}

function VerdictLine({ row, full, id }: { row: VerdictRow; full: number; id: string }): VNode {
  return (
    <tr class={row.finding}>
      <th scope="row">{row.subject}</th>
      <td class="num worst">{measured(row.worst, row.uncertainty, 'V')}</td>
      <td class="num limit-value">{quantity(row.limit, 'V')}</td>
      <td class="bar-cell">
        <BarCell row={row} full={full} id={id} />
      </td>
      <td class="finding">{findingWords(row)}</td>
    </tr>
  );
}

function Verdicts({ rows }: { rows: readonly VerdictRow[] }): VNode {
  const full = barScale(rows);
  const cases = [...new Set(rows.map((row) => row.caseIndex))];
  return (
    <table class="verdicts">
      <caption>Worst voltages against their limits; the tick across the bars is the limit</caption>
      <thead>
        <tr>
          <th scope="col">case and quantity</th>
          <th scope="col" class="num">
            worst
          </th>
          <th scope="col" class="num">
            limit
          </th>
          <td class="bar-cell" />
          <th scope="col">finding</th>
        </tr>
      </thead>
      {cases.map((caseIndex) => (
        <tbody key={caseIndex}>
          <tr class="group">
            <th scope="rowgroup" colSpan={5}>
              {rows.find((row) => row.caseIndex === caseIndex)?.caseName}
            </th>
          </tr>
          {rows.map(
            (row, k) =>
              row.caseIndex === caseIndex && (
                <VerdictLine key={k} row={row} full={full} id={`people-hatch-${k}`} />
              ),
          )}
        </tbody>
      ))}
    </table>
  );
}

function Undecided({ rows }: { rows: readonly VerdictRow[] }): VNode {
  return (
    <>
      {rows
        .filter((row) => row.finding === 'undecided')
        .map((row) => (
          <Say key={`${row.caseIndex} ${row.subject}`}>
            <CaseName name={row.caseName} />, {row.subject}: {undecidedReason(row)}
          </Say>
        ))}
    </>
  );
}

/** Limits, bars, what cannot be decided. */
export function People({ outcome }: { outcome: Outcome }): VNode {
  const { limits } = outcome.results;
  const rows = verdictRows(outcome.results);
  const floating = rows.some((row) => row.kind === 'floating');
  const facts = ['IEEE Std 80-2013, 8.3–8.4', `${limits.body_mass_kg}\u202fkg`];
  return (
    <Part id="people" title="People" facts={facts}>
      <Limits outcome={outcome} />
      <Verdicts rows={rows} />
      <Undecided rows={rows} />
      {floating && (
        <Say>
          At floating metal the same touch limit is taken; where the covering does not reach it, the limit of
          bare soil is lower and has to be set against it.
        </Say>
      )}
      <p class="caution">
        These limits suppose that clearing times, covering and access are as stated. Local codes and a
        licensed engineer decide; measure before energising.
      </p>
    </Part>
  );
}
