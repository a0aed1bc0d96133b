// Fault: the current of each case that enters the ground, and for how long.
import type { CaseResult, Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { given, givenPlace, givenQuantity, quantity, significant } from '../format/number.ts';
import { tally } from '../format/words.ts';
import { CLAUSES, DecrementFormula, GridCurrentFormula, S } from './formulas.tsx';
import { How, type HowInput } from './how.tsx';
import { CaseName, Input, Part, Result, Say } from './parts.tsx';

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

/** Where the current comes from: a share of a fault current, or as given. */
function Source({ outcome, index }: { outcome: Outcome; index: number }): VNode {
  const of = outcome.results.cases[index];
  const stated = outcome.study.cases[index]?.grid_current_A;
  if (of.fault_current_A !== null && of.division_factor !== null) {
    return (
      <>
        a fault of <Input path={`cases[${index}].fault_current_A`} value={of.fault_current_A} unit="A" /> for{' '}
        <Input path={`cases[${index}].duration_s`} value={of.duration_s} unit="s" />, of which the share{' '}
        <Input path={`cases[${index}].division_factor`} value={of.division_factor} /> enters the ground here
      </>
    );
  }
  return (
    <>
      {stated !== undefined && <Input path={`cases[${index}].grid_current_A`} value={stated} unit="A" />}{' '}
      enter the ground, as given, for{' '}
      <Input path={`cases[${index}].duration_s`} value={of.duration_s} unit="s" />
    </>
  );
}

function Decrement({ of, index }: { of: CaseResult; index: number }): VNode {
  if (of.x_over_r === null) return <>; no X/R is given, so the direct-current offset is left out</>;
  return (
    <>
      ; with <i>X/R</i> of <Input path={`cases[${index}].x_over_r`} value={of.x_over_r} /> the direct-current
      offset raises it by the factor {significant(of.decrement_factor, 4)}
    </>
  );
}

/** Where it enters: as given, or at the node nearest the middle of the metal. */
function Injected({ outcome, index }: { outcome: Outcome; index: number }): VNode {
  const { x_m, y_m } = outcome.results.cases[index].inject;
  if (outcome.study.cases[index]?.inject === undefined) {
    return <>It enters at the node nearest the centroid of the metal, {givenPlace(x_m, y_m)}.</>;
  }
  return (
    <>
      It enters the metal at <Input path={`cases[${index}].inject`} value={givenPlace(x_m, y_m)} />.
    </>
  );
}

/** Fault cases, one statement each. */
export function Fault({ outcome }: { outcome: Outcome }): VNode {
  const { cases } = outcome.results;
  const frequencies = [...new Set(cases.map((c) => givenQuantity(c.frequency_hz, 'Hz')))];
  return (
    <Part id="fault" title="Fault" facts={[tally(cases.length, 'case'), ...frequencies]}>
      {cases.map((of, index) => (
        <Say key={index}>
          <CaseName name={of.name} />: <Source outcome={outcome} index={index} />
          <Decrement of={of} index={index} />: <Result>{quantity(of.grid_current_A, 'A')}</Result>.{' '}
          <Injected outcome={outcome} index={index} />
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
            clause={
              of.x_over_r === null ? CLAUSES.gridCurrent : `${CLAUSES.gridCurrent}; ${CLAUSES.decrement}`
            }
            inputs={howInputs(of)}
            value={quantity(of.grid_current_A, 'A')}
          />
        </Say>
      ))}
    </Part>
  );
}
