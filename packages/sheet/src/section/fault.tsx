// Fault: the current of each case that enters the ground, and for how long.
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import type { Desk } from '../desk/desk.ts';
import { itemsOf, memberOf, rawText } from '../desk/json.ts';
import { casesWithOneMore, listWithout, solvedIndex } from '../desk/study-edits.ts';
import { useDesk } from '../desk/use-desk.ts';
import { useUnits } from '../desk/use-units.ts';
import { QuantityInput, Stated } from '../field/inputs.tsx';
import { Pasting } from '../field/pasting.tsx';
import { WordButton } from '../field/word-button.tsx';
import { givenPlace } from '../format/length.ts';
import { givenQuantity, significant } from '../format/number.ts';
import { tally } from '../format/words.ts';
import { CaseFields, InjectionChoice } from './case-fields.tsx';
import { GridCurrent, HowCurrent } from './fault-current.tsx';
import { Part } from './part.tsx';
import { CaseName, Say } from './parts.tsx';

interface CaseProps {
  readonly outcome: Outcome;
  readonly index: number;
}

/** Where the current comes from: a share of a fault current, or as given. */
function Source({ outcome, index }: CaseProps): VNode {
  const of = outcome.results.cases[index];
  const stated = outcome.study.cases[index]?.grid_current_A;
  const duration = (
    <QuantityInput
      path={['cases', index, 'duration_s']}
      kind="duration"
      label={`duration of ${of.name}`}
      value={of.duration_s}
    />
  );
  if (of.fault_current_A !== null && of.division_factor !== null) {
    return (
      <>
        a fault of{' '}
        <QuantityInput
          path={['cases', index, 'fault_current_A']}
          kind="current"
          label={`fault current of ${of.name}`}
          value={of.fault_current_A}
        />{' '}
        for {duration}, of which the share{' '}
        <QuantityInput
          path={['cases', index, 'division_factor']}
          kind="ratio"
          label={`division factor of ${of.name}`}
          value={of.division_factor}
        />{' '}
        enters the ground here
      </>
    );
  }
  return (
    <>
      {stated !== undefined && (
        <QuantityInput
          path={['cases', index, 'grid_current_A']}
          kind="current"
          label={`current into the ground of ${of.name}`}
          value={stated}
        />
      )}{' '}
      enter the ground, as given, for {duration}
    </>
  );
}

function Decrement({ outcome, index }: CaseProps): VNode {
  const of = outcome.results.cases[index];
  if (of.x_over_r === null) return <>; no X/R is given, so the direct-current offset is left out</>;
  return (
    <>
      ; with <i>X/R</i> of{' '}
      <QuantityInput
        path={['cases', index, 'x_over_r']}
        kind="ratio"
        label={`X/R of ${of.name}`}
        value={of.x_over_r}
      />{' '}
      the direct-current offset raises it by the factor {significant(of.decrement_factor, 4)}
    </>
  );
}

/** Where it enters: as given, or at the node nearest the middle of the metal. */
function Injected({ outcome, index }: CaseProps): VNode {
  const units = useUnits();
  const { x_m, y_m } = outcome.results.cases[index].inject;
  const place = givenPlace(x_m, y_m, units);
  if (outcome.study.cases[index]?.inject === undefined)
    return <>It enters at the node nearest the centroid of the metal, {place}.</>;
  return (
    <>
      It enters the metal at <Stated path={['cases', index, 'inject']} text={place} />.
    </>
  );
}

/** The cases of the draft, each with what was solved of it. */
function LiveCases({ desk, outcome }: { desk: Desk; outcome: Outcome | undefined }): VNode {
  const stated = desk.valueAt(['cases']);
  const cases = itemsOf(stated);
  const solved = outcome?.results.cases ?? [];
  return (
    <Pasting table="cases" rows="cases with their name, current and duration, under headings">
      {cases.map((one, index) => {
        const of = solved[solvedIndex(cases, index, solved) ?? -1];
        return (
          <Say key={index}>
            <CaseFields desk={desk} index={index} solved={of}>
              {of !== undefined && outcome !== undefined && (
                <>
                  : <GridCurrent outcome={outcome} of={of} />
                </>
              )}
              .
            </CaseFields>
            {of !== undefined && <HowCurrent of={of} />}
            <span class="edits">
              <InjectionChoice desk={desk} index={index} solved={of} />
              {cases.length > 1 && (
                <WordButton
                  press={() => desk.edit(['cases'], listWithout(stated, index))}
                  of={rawText(memberOf(one, 'name'))}
                  vanishes
                >
                  remove the case
                </WordButton>
              )}
            </span>
          </Say>
        );
      })}
      <Say>
        <WordButton press={() => desk.edit(['cases'], casesWithOneMore(stated))}>add a case</WordButton>
      </Say>
    </Pasting>
  );
}

/** Fault cases, one statement each; without an outcome only what is asked. */
export function Fault({ outcome }: { outcome: Outcome | undefined }): VNode {
  const desk = useDesk();
  const cases = outcome?.results.cases ?? [];
  const frequencies = [...new Set(cases.map((c) => givenQuantity(c.frequency_hz, 'Hz')))];
  const facts = outcome === undefined ? [] : [tally(cases.length, 'case'), ...frequencies];
  return (
    <Part id="fault" title="Fault" facts={facts} outcome={outcome}>
      {desk !== undefined && <LiveCases desk={desk} outcome={outcome} />}
      {desk === undefined &&
        outcome !== undefined &&
        cases.map((of, index) => (
          <Say key={index}>
            <CaseName name={of.name} />: <Source outcome={outcome} index={index} />
            <Decrement outcome={outcome} index={index} />: <GridCurrent outcome={outcome} of={of} />.{' '}
            <Injected outcome={outcome} index={index} />
            <HowCurrent of={of} />
          </Say>
        ))}
    </Part>
  );
}
