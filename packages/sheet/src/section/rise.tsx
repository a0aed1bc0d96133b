// Rise: resistance to remote earth, rise of the metal, floating metal, and where the current leaves.
import type { DisplayUnits, Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useUnits } from '../desk/use-units.ts';
import { ChoiceInput, type Option } from '../field/choice.tsx';
import { LeakageFigure } from '../figure/leakage.tsx';
import { titles } from '../figure/titles.ts';
import { fixedLength, lengthUnit } from '../format/length.ts';
import { measured, powerOfTen, quantity, significant } from '../format/number.ts';
import { measuredTold } from '../format/told.ts';
import { conductorCurrents } from '../geometry/leakage.ts';
import { levelled } from '../geometry/ties.ts';
import { MOST_CONDUCTOR_ROWS } from './electrode.tsx';
import { EquivalentUniformSoil } from './equivalent-uniform.tsx';
import { Floating } from './floating.tsx';
import { RiseFormula, S } from './formulas.tsx';
import { How } from './how.tsx';
import { Part } from './part.tsx';
import { CaseName, DataTable, FigureBlock, Say } from './parts.tsx';
import { caseNamed, ResultOf } from './result.tsx';
import { SoilSpread } from './soil-spread.tsx';

const METAL_MODELS: readonly Option[] = [
  { value: 'resistive', text: 'resistive along its length' },
  { value: 'equipotential', text: 'one potential throughout' },
];

/** How the metal is taken, in its sentence. */
export function MetalModel({ value }: { value: 'resistive' | 'equipotential' }): VNode {
  return (
    <ChoiceInput path={['metal_model']} label="model of the metal" value={value} options={METAL_MODELS} />
  );
}

function Resistance({ outcome }: { outcome: Outcome }): VNode {
  const { electrode, metal_model, cases, ground } = outcome.results;
  const where =
    cases.length > 1
      ? `, seen where the current of ${cases[0].name} enters`
      : ', seen where the current enters';
  return (
    <Say>
      The resistance to remote earth{where}, is{' '}
      <ResultOf
        outcome={outcome}
        told={({ results: { electrode: of } }) =>
          measuredTold(of.resistance_ohm, of.resistance_uncertainty_ohm, 'Ω')
        }
      />
      , with the metal taken as <MetalModel value={metal_model} />.
      <How
        of="the resistance is found"
        formula={
          <>
            <S of="R" /> = <S of="V" index="injection" />/<S of="I" index="injected" />
          </>
        }
        clause="Leakage equations of thin wires in layered soil (Galerkin, constant leakage per segment), joined with the conductors as one network whose node at remote earth is grounded."
        inputs={[
          { symbol: <i>n</i>, name: 'segments', value: String(electrode.segment_count) },
          { symbol: <i>m</i>, name: 'nodes of the metal', value: String(electrode.node_count) },
        ]}
        value={measured(electrode.resistance_ohm, electrode.resistance_uncertainty_ohm, 'Ω')}
      />
      {ground !== null && (
        <>
          {' '}
          <SoilSpread of={ground.consequence.resistance_ohm} unit="Ω" />
        </>
      )}
    </Say>
  );
}

/** The rise of a case over the soils; nothing where the soil was given. */
function RiseSpread({ outcome, index }: { outcome: Outcome; index: number }): VNode | null {
  const spread = outcome.results.ground?.consequence.cases[index]?.gpr_V;
  if (spread === undefined) return null;
  return (
    <>
      {' '}
      <SoilSpread of={spread} unit="V" />
    </>
  );
}

function Rises({ outcome }: { outcome: Outcome }): VNode {
  return (
    <>
      {outcome.results.cases.map((of, index) => (
        <Say key={index}>
          <CaseName name={of.name} />: with {quantity(of.grid_current_A, 'A')} entering the ground the metal
          rises to{' '}
          <ResultOf
            outcome={outcome}
            told={(one) => {
              const found = caseNamed(one, of.name);
              return found && measuredTold(found.gpr_V, found.gpr_uncertainty_V, 'V');
            }}
          />
          .
          <How
            of={`the rise of ${of.name} is found`}
            formula={<RiseFormula />}
            clause="Ohm’s law between the place of injection and remote earth."
            inputs={[
              {
                symbol: <S of="R" />,
                name: 'resistance seen by this case',
                value: measured(of.resistance_ohm, of.resistance_uncertainty_ohm, 'Ω'),
              },
              {
                symbol: <S of="I" index="G" />,
                name: 'current into the ground',
                value: quantity(of.grid_current_A, 'A'),
              },
            ]}
            value={measured(of.gpr_V, of.gpr_uncertainty_V, 'V')}
          />
          <RiseSpread outcome={outcome} index={index} />
        </Say>
      ))}
    </>
  );
}

function LeakageTable({ outcome, units }: { outcome: Outcome; units: DisplayUnits }): VNode {
  const { conductors } = outcome.plan;
  const currents = conductorCurrents(outcome);
  const order = [...conductors.keys()].sort(
    (a, b) => levelled(Math.abs(currents[b].leakage)) - levelled(Math.abs(currents[a].leakage)) || a - b,
  );
  const shown = order.slice(0, MOST_CONDUCTOR_ROWS);
  /* floating metal sums to nothing but rounding */
  const share = (value: number): string =>
    Math.abs(value) < 1e-9 ? '0' : Math.abs(value) < 1e-4 ? powerOfTen(value) : significant(value, 3);
  return (
    <>
      <DataTable
        caption="Leakage and current by conductor, per ampere injected by the first case, largest leakage first"
        columns={[
          { label: 'id' },
          { label: 'electrode' },
          { label: `length, ${lengthUnit(units).sign}`, align: 'right' },
          { label: 'into the soil, A/A', align: 'right' },
          { label: 'mean, mA/m per A', align: 'right' },
          { label: 'largest current along, A/A', align: 'right' },
        ]}
        rows={shown.map((k) => [
          conductors[k].id,
          conductors[k].electrode,
          fixedLength(currents[k].length, 2, units),
          share(currents[k].leakage),
          significant((1000 * currents[k].leakage) / currents[k].length, 3),
          share(currents[k].along),
        ])}
        file="conductors.csv"
      />
      {order.length > shown.length && <p>{order.length - shown.length} more are in conductors.csv.</p>}
    </>
  );
}

/** Resistance, rise, floating metal, leakage. */
export function Rise({ outcome }: { outcome: Outcome }): VNode {
  const units = useUnits();
  const { electrode, electrodes, checks } = outcome.results;
  const facts = [
    `${electrode.segment_count} segments`,
    `balance at remote earth ${powerOfTen(Math.abs(checks.current_balance))}`,
  ];
  return (
    <Part id="rise" title="Rise" facts={facts} outcome={outcome}>
      <Resistance outcome={outcome} />
      <Rises outcome={outcome} />
      <EquivalentUniformSoil outcome={outcome} />
      {electrodes
        .filter((metal) => metal.role === 'floating')
        .map((metal) => (
          <Floating key={metal.name} outcome={outcome} metal={metal} />
        ))}
      <FigureBlock
        name="leakage"
        title={titles.leakage}
        caption="Thickness shows the current that a metre of conductor passes to the soil, against the mean of the energised metal; the disc of a rod shows its mean along the rod. Hollow lines take current from the soil; floating metal gives back elsewhere what it takes."
        table={<LeakageTable outcome={outcome} units={units} />}
        by={[outcome, units]}
      >
        <LeakageFigure outcome={outcome} name="leakage" title={titles.leakage} />
      </FigureBlock>
    </Part>
  );
}
