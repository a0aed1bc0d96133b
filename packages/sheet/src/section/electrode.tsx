// Electrode: what metal lies in the ground, how it is joined, and where voltages are assessed.
import { conductorMaterials } from '@ohmstead/core';
import type { Outcome, PlanConductor } from '@ohmstead/study';
import type { VNode } from 'preact';
import { PlanFigure } from '../figure/plan.tsx';
import { titles } from '../figure/titles.ts';
import { given, givenQuantity } from '../format/number.ts';
import { capital, counted, listed, tally } from '../format/words.ts';
import { DataTable, FigureBlock, Input, Part, Say } from './parts.tsx';

/** Distinct values listed in full up to this many; beyond, as a range. */
const MOST_LISTED = 3;
/** Rows of the conductor table on the sheet; the table file has them all. */
export const MOST_CONDUCTOR_ROWS = 120;

function distinct(values: readonly number[]): readonly number[] {
  return [...new Set(values.map((v) => Number(v.toPrecision(9))))].sort((a, b) => a - b);
}

/** `0.6 m`, `0.5 and 0.8 m`, or `0.5 to 1.2 m`. */
function spanText(values: readonly number[], unit: string): string {
  const all = distinct(values);
  if (all.length <= MOST_LISTED) return `${listed(all.map(given))}\u202f${unit}`;
  return `${given(all[0])} to ${given(all[all.length - 1])}\u202f${unit}`;
}

function lengthOf(c: PlanConductor): number {
  return Math.hypot(c.x2 - c.x1, c.y2 - c.y1, c.depth2 - c.depth1);
}

/** Materials with their diameters: `copper, commercial hard-drawn, 12 mm`. */
function metals(conductors: readonly PlanConductor[]): string {
  const names = [...new Set(conductors.map((c) => c.material))].sort();
  return names
    .map((name) => {
      const diameters = conductors.filter((c) => c.material === name).map((c) => c.diameter * 1000);
      return `${conductorMaterials.get(name)?.label ?? name}, ${spanText(diameters, 'mm')}`;
    })
    .join('; ');
}

function Laid({ conductors }: { conductors: readonly PlanConductor[] }): VNode {
  const main = conductors.filter((c) => c.role === 'energised');
  const rods = main.filter((c) => c.rod);
  const laid = main.filter((c) => !c.rod);
  return (
    <Say>
      {laid.length > 0 && (
        <>
          Conductors lie at{' '}
          <Input
            path="conductors"
            value={spanText(
              laid.flatMap((c) => [c.depth1, c.depth2]),
              'm',
            )}
          />
          : <Input path="conductors" value={metals(laid)} />.{' '}
        </>
      )}
      {rods.length > 0 && (
        <>
          {capital(counted(rods.length, 'rod'))} of{' '}
          <Input path="conductors" value={spanText(rods.map(lengthOf), 'm')} />:{' '}
          <Input path="conductors" value={metals(rods)} />.
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

function Assessed({ outcome }: { outcome: Outcome }): VNode {
  const { areasGiven } = outcome.plan;
  const touch = areasGiven.touch ? 'in the area given' : 'inside the outer boundary of the energised metal';
  const step = areasGiven.step ? 'in the area given' : 'in the same, grown by 3\u202fm';
  return (
    <Say>
      Touch voltage is assessed {touch}, step voltage {step}.
      {!areasGiven.touch &&
        ' This supposes that no metal within reach stands on the boundary; where a fence does, give an area.'}
    </Say>
  );
}

function conductorTable(outcome: Outcome): VNode {
  const { conductors } = outcome.plan;
  const shown = conductors.slice(0, MOST_CONDUCTOR_ROWS);
  const end = (x: number, y: number, depth: number): string => `${given(x)}, ${given(y)}, ${given(depth)}`;
  return (
    <>
      <DataTable
        caption="Conductors; ends as x, y, depth in metres"
        columns={[
          { label: 'id' },
          { label: 'from, m', align: 'right' },
          { label: 'to, m', align: 'right' },
          { label: 'diameter, mm', align: 'right' },
          { label: 'material' },
          { label: 'electrode' },
        ]}
        rows={shown.map((c) => [
          c.id,
          end(c.x1, c.y1, c.depth1),
          end(c.x2, c.y2, c.depth2),
          given(c.diameter * 1000),
          c.insulated ? `${c.material}, insulated` : c.material,
          c.role === 'floating' ? `${c.electrode}, floating` : c.electrode,
        ])}
      />
      {conductors.length > shown.length && (
        <p>{conductors.length - shown.length} more conductors are in conductors.csv.</p>
      )}
    </>
  );
}

/** Metal, joints and assessed areas. */
export function Electrode({ outcome }: { outcome: Outcome }): VNode {
  const { electrode, snaps, electrodes } = outcome.results;
  const floating = electrodes.filter((e) => e.role === 'floating').length;
  const facts = [
    tally(electrode.conductor_count, 'conductor'),
    tally(electrode.rod_count, 'rod'),
    givenQuantity(Math.round(electrode.conductor_length_m), 'm'),
    ...(floating > 0 ? [`${floating} floating`] : []),
    `${tally(snaps.length, 'contact')} bridged`,
  ];
  return (
    <Part id="electrode" title="Electrode" facts={facts}>
      <Laid conductors={outcome.plan.conductors} />
      <Joined outcome={outcome} />
      <Assessed outcome={outcome} />
      <FigureBlock
        name="electrode-plan"
        title={titles.plan}
        caption="Metal is ink, floating metal dashed. Tinted: where touch voltage is assessed. Axes in metres."
        table={conductorTable(outcome)}
      >
        <PlanFigure outcome={outcome} name="electrode-plan" title={titles.plan} />
      </FigureBlock>
    </Part>
  );
}
