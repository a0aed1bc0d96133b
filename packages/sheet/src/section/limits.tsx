// The tolerable voltages of each case: what they rest on, and how they are found.
import type { CaseResult, Outcome, Results } from '@ohmstead/study';
import type { VNode } from 'preact';
import type { Desk } from '../desk/desk.ts';
import { itemsOf } from '../desk/json.ts';
import { draftIndex } from '../desk/study-edits.ts';
import { useDesk } from '../desk/use-desk.ts';
import { ChoiceInput, type Option } from '../field/choice.tsx';
import { QuantityInput, Stated } from '../field/inputs.tsx';
import { fixed, givenQuantity, quantity } from '../format/number.ts';
import { quantityTold } from '../format/told.ts';
import { BODY_FACTOR, CLAUSES, S, StepFormula, TouchFormula } from './formulas.tsx';
import { How, type HowInput } from './how.tsx';
import { originOf, soilResistivity } from './layers.tsx';
import { CaseName, Say } from './parts.tsx';
import { caseNamed, ResultOf } from './result.tsx';

/** A tolerable voltage of a case. */
type LimitKey =
  | 'bare_touch_limit_V'
  | 'bare_step_limit_V'
  | 'covering_touch_limit_V'
  | 'covering_step_limit_V';

interface TolerableProps {
  readonly outcome: Outcome;
  readonly of: CaseResult;
}

/** Tolerable voltages of a case, on the covering and on bare soil. */
function Tolerable({ outcome, of }: TolerableProps): VNode {
  const limit = (key: LimitKey): VNode => (
    <ResultOf
      outcome={outcome}
      told={(one) => {
        const volts = caseNamed(one, of.name)?.[key] ?? undefined;
        return volts === undefined ? undefined : quantityTold(volts, 'V');
      }}
    />
  );
  const bare = (
    <>
      touch {limit('bare_touch_limit_V')} and step {limit('bare_step_limit_V')}
    </>
  );
  if (of.covering_touch_limit_V === null || of.covering_step_limit_V === null) return bare;
  return (
    <>
      on the covering touch {limit('covering_touch_limit_V')} and step {limit('covering_step_limit_V')}, on
      bare soil {bare}
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
  const soil = soilResistivity(limits.soil_resistivity_ohm_m, originOf(results));
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

const BASES: readonly Option[] = [{ value: 'IEEE 80', text: 'IEEE 80' }];
const BODY_MASSES: readonly Option[] = ([50, 70] as const).map((mass) => ({
  value: mass,
  text: givenQuantity(mass, 'kg'),
}));

/** What the limits rest on, as inputs. */
export function LimitBasis({ basis, mass }: { basis: string | undefined; mass: number | undefined }): VNode {
  return (
    <Say>
      Tolerable voltages after{' '}
      <ChoiceInput path={['limits', 'basis']} label="basis of the limits" value={basis} options={BASES} /> for
      a body of{' '}
      <ChoiceInput path={['limits', 'body_mass_kg']} label="body mass" value={mass} options={BODY_MASSES} />.
    </Say>
  );
}

/** Duration of a solved case: its field in the draft, while it is still there. */
function Duration({
  desk,
  outcome,
  index,
}: {
  desk: Desk | undefined;
  outcome: Outcome;
  index: number;
}): VNode {
  const { cases } = outcome.results;
  const of = cases[index];
  const place = desk === undefined ? index : draftIndex(itemsOf(desk.valueAt(['cases'])), index, cases);
  if (place === undefined)
    return <Stated path={['cases', index, 'duration_s']} text={givenQuantity(of.duration_s, 's')} />;
  return (
    <QuantityInput
      path={['cases', place, 'duration_s']}
      kind="duration"
      label={`duration of ${of.name}`}
      value={of.duration_s}
    />
  );
}

/** The limits of every case, on the covering and on bare soil. */
export function Limits({ outcome }: { outcome: Outcome }): VNode {
  const desk = useDesk();
  const { limits, cases } = outcome.results;
  const factor = BODY_FACTOR[limits.body_mass_kg];
  return (
    <>
      <LimitBasis basis={limits.basis} mass={limits.body_mass_kg} />
      {cases.map((of, index) => (
        <Say key={index}>
          <CaseName name={of.name} />: over <Duration desk={desk} outcome={outcome} index={index} />,{' '}
          <Tolerable outcome={outcome} of={of} />.
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
