// Electrode: what metal lies in the ground, how it is joined, and where voltages are assessed.
import { conductorMaterials } from '@ohmstead/core';
import type { DisplayUnits, Outcome, PlanConductor } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useDesk } from '../desk/use-desk.ts';
import { useUnits } from '../desk/use-units.ts';
import { Stated } from '../field/inputs.tsx';
import { PlanFigure } from '../figure/plan.tsx';
import { titles } from '../figure/titles.ts';
import { givenIn, givenLength, type LengthUnit, lengthUnit, smallUnit } from '../format/length.ts';
import { fixed, THIN_SPACE } from '../format/number.ts';
import { capital, counted, listed, tally } from '../format/words.ts';
import { ElectrodeRoles } from './electrode-roles.tsx';
import { Part } from './part.tsx';
import { DataTable, FigureBlock, Say } from './parts.tsx';

/** Distinct values listed in full up to this many; beyond, as a range. */
const MOST_LISTED = 3;
/** Rows of the conductor table on the sheet; the table file has them all. */
export const MOST_CONDUCTOR_ROWS = 120;

function distinct(values: readonly number[]): readonly number[] {
  return [...new Set(values.map((v) => Number(v.toPrecision(9))))].sort((a, b) => a - b);
}

/** Lengths in metres as `0.6 m`, `0.5 and 0.8 m`, or `0.5 to 1.2 m`. */
function spanText(values: readonly number[], unit: LengthUnit): string {
  const all = distinct(values);
  const told = (metres: number): string => givenIn(metres, unit);
  if (all.length <= MOST_LISTED) return `${listed(all.map(told))}${THIN_SPACE}${unit.sign}`;
  return `${told(all[0])} to ${told(all[all.length - 1])}${THIN_SPACE}${unit.sign}`;
}

function lengthOf(c: PlanConductor): number {
  return Math.hypot(c.x2 - c.x1, c.y2 - c.y1, c.depth2 - c.depth1);
}

/** Materials with their diameters: `copper, commercial hard-drawn, 12 mm`. */
function metals(conductors: readonly PlanConductor[], units: DisplayUnits): string {
  const names = [...new Set(conductors.map((c) => c.material))].sort();
  return names
    .map((name) => {
      const diameters = conductors.filter((c) => c.material === name).map((c) => c.diameter);
      return `${conductorMaterials.get(name)?.label ?? name}, ${spanText(diameters, smallUnit(units))}`;
    })
    .join('; ');
}

const CONDUCTORS = ['conductors'];

function Laid({ conductors }: { conductors: readonly PlanConductor[] }): VNode {
  const units = useUnits();
  const unit = lengthUnit(units);
  const main = conductors.filter((c) => c.role === 'energised');
  const rods = main.filter((c) => c.rod);
  const laid = main.filter((c) => !c.rod);
  return (
    <Say>
      {laid.length > 0 && (
        <>
          Conductors lie at{' '}
          <Stated
            path={CONDUCTORS}
            text={spanText(
              laid.flatMap((c) => [c.depth1, c.depth2]),
              unit,
            )}
          />
          : <Stated path={CONDUCTORS} text={metals(laid, units)} />.{' '}
        </>
      )}
      {rods.length > 0 && (
        <>
          {capital(counted(rods.length, 'rod'))} of{' '}
          <Stated path={CONDUCTORS} text={spanText(rods.map(lengthOf), unit)} />:{' '}
          <Stated path={CONDUCTORS} text={metals(rods, units)} />.
        </>
      )}
      {rods.length === 0 && 'There are no rods.'}
    </Say>
  );
}

function Joined({ outcome }: { outcome: Outcome }): VNode {
  const { results } = outcome;
  const floating = results.electrodes.filter((e) => e.role === 'floating').map((e) => e.name);
  const snaps = results.snaps.length;
  return (
    <Say>
      Where the metal touches it is one: {results.electrode.node_count} nodes
      {snaps > 0 ? `, ${counted(snaps, 'contact')} bridged and listed under Assumed` : ''}.
      {floating.length > 0 &&
        ` ${capital(listed(floating))} ${floating.length === 1 ? 'is' : 'are'} not joined to it and ${floating.length === 1 ? 'floats' : 'float'}.`}
    </Say>
  );
}

/** How far the step area reaches beyond the touch area where none is given, m. */
const STEP_REACH_M = 3;

function Assessed({ outcome }: { outcome: Outcome }): VNode {
  const reach = givenLength(STEP_REACH_M, useUnits());
  const { areasGiven } = outcome.plan;
  const touch = areasGiven.touch ? 'in the area given' : 'inside the outer boundary of the energised metal';
  const step = areasGiven.step ? 'in the area given' : `in the same, grown by ${reach}`;
  return (
    <Say>
      Touch voltage is assessed {touch}, step voltage {step}.
      {!areasGiven.touch &&
        ' This supposes that no metal within reach stands on the boundary; where a fence does, give an area.'}
    </Say>
  );
}

function ConductorTable({ outcome, units }: { outcome: Outcome; units: DisplayUnits }): VNode {
  const [unit, small] = [lengthUnit(units), smallUnit(units)];
  const { conductors } = outcome.plan;
  const shown = conductors.slice(0, MOST_CONDUCTOR_ROWS);
  const end = (x: number, y: number, depth: number): string =>
    [x, y, depth].map((metres) => givenIn(metres, unit)).join(', ');
  return (
    <>
      <DataTable
        caption={`Conductors; ends as x, y, depth in ${unit.words}`}
        columns={[
          { label: 'id' },
          { label: `from, ${unit.sign}`, align: 'right' },
          { label: `to, ${unit.sign}`, align: 'right' },
          { label: `diameter, ${small.sign}`, align: 'right' },
          { label: 'material' },
          { label: 'electrode' },
        ]}
        rows={shown.map((c) => [
          c.id,
          end(c.x1, c.y1, c.depth1),
          end(c.x2, c.y2, c.depth2),
          givenIn(c.diameter, small),
          c.insulated ? `${c.material}, insulated` : c.material,
          c.role === 'floating' ? `${c.electrode}, floating` : c.electrode,
        ])}
        file="conductors.csv"
      />
      {conductors.length > shown.length && (
        <p>{conductors.length - shown.length} more conductors are in conductors.csv.</p>
      )}
    </>
  );
}

function factsOf({ results }: Outcome, units: DisplayUnits): readonly string[] {
  const { electrode, snaps, electrodes } = results;
  const floating = electrodes.filter((e) => e.role === 'floating').length;
  const unit = lengthUnit(units);
  return [
    tally(electrode.conductor_count, 'conductor'),
    tally(electrode.rod_count, 'rod'),
    `${fixed(electrode.conductor_length_m / unit.metres, 0)}${THIN_SPACE}${unit.sign}`,
    ...(floating > 0 ? [`${floating} floating`] : []),
    `${tally(snaps.length, 'contact')} bridged`,
  ];
}

/** Metal, joints and assessed areas. */
export function Electrode({ outcome }: { outcome: Outcome }): VNode {
  const desk = useDesk();
  const units = useUnits();
  const instrument = desk?.instrument?.('electrode', outcome);
  const words = lengthUnit(units).words;
  return (
    <Part id="electrode" title="Electrode" facts={factsOf(outcome, units)} outcome={outcome}>
      <Laid conductors={outcome.plan.conductors} />
      <Joined outcome={outcome} />
      {desk !== undefined && <ElectrodeRoles desk={desk} outcome={outcome} />}
      <Assessed outcome={outcome} />
      <FigureBlock
        name="electrode-plan"
        title={titles.plan}
        caption={`Metal is ink, floating metal dashed. Tinted: where touch voltage is assessed. Axes in ${words}.`}
        table={<ConductorTable outcome={outcome} units={units} />}
        by={[outcome, units]}
      >
        {instrument ?? <PlanFigure outcome={outcome} name="electrode-plan" title={titles.plan} />}
      </FigureBlock>
    </Part>
  );
}
