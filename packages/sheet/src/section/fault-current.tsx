// The current of a case that enters the ground, and how it is found.
import type { CaseResult, Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { given, givenQuantity, quantity, significant } from '../format/number.ts';
import { quantityTold } from '../format/told.ts';
import { CLAUSES, DecrementFormula, GridCurrentFormula, S } from './formulas.tsx';
import { How, type HowInput } from './how.tsx';
import { caseNamed, ResultOf } from './result.tsx';

function howInputs(of: CaseResult): readonly HowInput[] {
  const inputs: (HowInput | undefined)[] = [
    of.fault_current_A === null
      ? undefined
      : {
          symbol: <S of="I" index="f" />,
          name: 'fault current',
          value: givenQuantity(of.fault_current_A, 'A'),
        },
    of.division_factor === null
      ? undefined
      : { symbol: <S of="S" index="f" />, name: 'division factor', value: given(of.division_factor) },
    { symbol: <S of="D" index="f" />, name: 'decrement factor', value: significant(of.decrement_factor, 5) },
    of.x_over_r === null
      ? undefined
      : { symbol: <i>X/R</i>, name: 'at the fault', value: given(of.x_over_r) },
    { symbol: <S of="f" />, name: 'frequency', value: givenQuantity(of.frequency_hz, 'Hz') },
    {
      symbol: <S of="t" index="f" />,
      name: 'duration of the fault',
      value: givenQuantity(of.duration_s, 's'),
    },
  ];
  return inputs.filter((input) => input !== undefined);
}

/** The current that enters the ground, decrement included. */
export function GridCurrent({ outcome, of }: { outcome: Outcome; of: CaseResult }): VNode {
  return (
    <ResultOf
      outcome={outcome}
      told={(one) => {
        const found = caseNamed(one, of.name);
        return found && quantityTold(found.grid_current_A, 'A');
      }}
    />
  );
}

/** Formulas and inputs of that current. */
export function HowCurrent({ of }: { of: CaseResult }): VNode {
  return (
    <How
      of={`the current of ${of.name} is found`}
      formula={
        <>
          <GridCurrentFormula />
          {of.x_over_r !== null && (
            <>
              <br />
              <DecrementFormula />
            </>
          )}
        </>
      }
      clause={of.x_over_r === null ? CLAUSES.gridCurrent : `${CLAUSES.gridCurrent}; ${CLAUSES.decrement}`}
      inputs={howInputs(of)}
      value={quantity(of.grid_current_A, 'A')}
    />
  );
}
