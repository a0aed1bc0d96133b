// People: the tolerable voltages, and every worst voltage against them.
import type { CaseResult, Outcome, Results } from '@ohmstead/study';
import type { VNode } from 'preact';
import { fixed, givenQuantity, quantity } from '../format/number.ts';
import { undecidedReason } from '../verdict/finding.ts';
import { type VerdictRow, verdictRows } from '../verdict/rows.ts';
import { soilBandRows } from '../verdict/soil-band.ts';
import { BODY_FACTOR, CLAUSES, S, StepFormula, TouchFormula } from './formulas.tsx';
import { How, type HowInput } from './how.tsx';
import { originOf, soilQuantity } from './layers.tsx';
import { CaseName, Input, Part, Result, Say } from './parts.tsx';
import { SoilBandTable } from './soil-band-table.tsx';
import { VerdictTable } from './verdict-table.tsx';

/** Tolerable voltages of a case, on the covering and on bare soil. */
function Tolerable({ of }: { of: CaseResult }): VNode {
  const pair = (touch: number, step: number): VNode => (
    <>
      touch <Result>{quantity(touch, 'V')}</Result> and step <Result>{quantity(step, 'V')}</Result>
    </>
  );
  const { covering_touch_limit_V: touch, covering_step_limit_V: step } = of;
  if (touch === null || step === null) return pair(of.bare_touch_limit_V, of.bare_step_limit_V);
  return (
    <>
      on the covering {pair(touch, step)}, on bare soil {pair(of.bare_touch_limit_V, of.bare_step_limit_V)}
    </>
  );
}

function limitWords(of: CaseResult): string {
  const words = (touch: number, step: number): string =>
    `${quantity(touch, 'V')} touch, ${quantity(step, 'V')} step`;
  const bare = words(of.bare_touch_limit_V, of.bare_step_limit_V);
  const { covering_touch_limit_V: touch, covering_step_limit_V: step } = of;
  return touch === null || step === null ? bare : `${words(touch, step)}; on bare soil ${bare}`;
}

/** Ground under the feet: the covering where there is one, and the soil, for which the factor is 1. */
function groundInputs(results: Results): readonly HowInput[] {
  const { limits } = results;
  const soil = soilQuantity(limits.soil_resistivity_ohm_m, 'Ω·m', originOf(results));
  const bare: HowInput = { symbol: <S of="ρ" index="s" />, name: 'bare soil, factor 1', value: soil };
  if (limits.surfacing_resistivity_ohm_m === null) return [bare];
  return [
    {
      symbol: <S of="C" index="s" />,
      name: 'covering factor',
      value: fixed(limits.covering_factor, 4),
    },
    {
      symbol: <S of="ρ" index="s" />,
      name: 'covering',
      value: givenQuantity(limits.surfacing_resistivity_ohm_m, 'Ω·m'),
    },
    bare,
  ];
}

function Limits({ outcome }: { outcome: Outcome }): VNode {
  const { limits, cases } = outcome.results;
  const factor = BODY_FACTOR[limits.body_mass_kg];
  return (
    <>
      <Say>
        Tolerable voltages after <Input path="limits.basis" value={limits.basis} /> for a body of{' '}
        <Input path="limits.body_mass_kg" value={limits.body_mass_kg} unit="kg" />.
      </Say>
      {cases.map((of, index) => (
        <Say key={index}>
          <CaseName name={of.name} />: over{' '}
          <Input path={`cases[${index}].duration_s`} value={of.duration_s} unit="s" />, <Tolerable of={of} />.
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
              ...groundInputs(outcome.results),
              { symbol: <S of="t" index="s" />, name: 'duration', value: givenQuantity(of.duration_s, 's') },
            ]}
            value={limitWords(of)}
          />
        </Say>
      ))}
    </>
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

/** What the readings leave open in touch and step voltage; nothing where the soil was given. */
function Soils({ outcome }: { outcome: Outcome }): VNode | null {
  const rows = soilBandRows(outcome.results);
  if (rows.length === 0) return null;
  return (
    <>
      <Say>
        What the readings leave open: the same currents in the soils that they allow, beside the best fit and
        against its limits. This spread belongs to the soil; the ± of the best fit belongs to the mesh, and
        neither holds the other.
      </Say>
      <SoilBandTable rows={rows} id="soils" />
    </>
  );
}

/** Limits, bars, what cannot be decided, what the soil leaves open. */
export function People({ outcome }: { outcome: Outcome }): VNode {
  const { limits } = outcome.results;
  const rows = verdictRows(outcome.results);
  const floating = rows.some((row) => row.kind === 'floating');
  const facts = ['IEEE Std 80-2013, 8.3–8.4', `${limits.body_mass_kg}\u202fkg`];
  return (
    <Part id="people" title="People" facts={facts}>
      <Limits outcome={outcome} />
      <VerdictTable
        rows={rows}
        caption="Worst voltages against their limits; the tick across the bars is the limit"
        id="people"
      />
      <Undecided rows={rows} />
      <Soils outcome={outcome} />
      {floating && limits.surfacing_resistivity_ohm_m !== null && (
        <Say>
          Floating metal is set against the limit of the ground beside it: the covering where it reaches
          there, bare soil elsewhere.
        </Say>
      )}
      <p class="caution">
        These limits suppose that clearing times, covering and access are as stated. Local codes and a
        licensed engineer decide; measure before energising.
      </p>
    </Part>
  );
}
