// The table equivalent of a map: the worst of each area, and values every few metres.
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useUnits } from '../desk/use-units.ts';
import { fixedLength, lengthUnit } from '../format/length.ts';
import { fixed } from '../format/number.ts';
import { coarseGrid, worstIn } from '../geometry/coarse.ts';
import { assessedFor, type MapKind, wholeOf } from '../geometry/map-drawing.ts';
import { insideEvenOdd } from '../geometry/polygon.ts';
import { DataTable } from './parts.tsx';
import { PlaceLink } from './place-link.tsx';

const QUANTITY: Readonly<Record<MapKind, string>> = {
  potential: 'Surface potential',
  touch: 'Touch voltage',
  step: 'Step voltage',
};

function AreaTable({ outcome, caseIndex, kind }: MapTableProps): VNode | null {
  const areas = assessedFor(outcome, kind);
  if (areas.length === 0) return null;
  const { map } = outcome.cases[caseIndex];
  const whole = wholeOf(kind, outcome.results.cases[caseIndex]);
  const rows = areas.map((area, k) => {
    const worst = worstIn(map, map[kind], area);
    const name = areas.length === 1 ? 'assessed area' : `area ${k + 1}`;
    if (worst === undefined) return [name, '—', '—', '—'];
    return [
      name,
      fixed(worst.value, 0),
      <PlaceLink key={name} x={worst.x} y={worst.y} />,
      fixed((100 * worst.value) / whole, 0),
    ];
  });
  return (
    <DataTable
      caption="Worst on the points of the map, by area"
      columns={[
        { label: 'area' },
        { label: 'worst, V', align: 'right' },
        { label: 'at', align: 'right' },
        { label: 'of the limit, %', align: 'right' },
      ]}
      rows={rows}
    />
  );
}

export interface MapTableProps {
  readonly outcome: Outcome;
  readonly caseIndex: number;
  readonly kind: MapKind;
}

/** Worst values by area, then a coarse lattice that reads like the plan: y falls from row to row, x runs to the right. */
export function MapTable(props: MapTableProps): VNode {
  const { outcome, caseIndex, kind } = props;
  const units = useUnits();
  const unit = lengthUnit(units);
  const { map } = outcome.cases[caseIndex];
  const { xs, ys, values } = coarseGrid(map, map[kind], unit.metres);
  const areas = assessedFor(outcome, kind);
  const limit = wholeOf(kind, outcome.results.cases[caseIndex]);
  const cell = (value: number, x: number, y: number): string => {
    const volts = fixed(kind === 'touch' ? Math.abs(value) : value, 0);
    if (areas.length === 0) return volts;
    if (!insideEvenOdd(areas, x, y)) return `(${volts})`;
    return Math.abs(value) > limit ? `${volts}\u202f*` : volts;
  };
  const signs = areas.length === 0 ? '' : '; in brackets outside the assessed area, * beyond the limit';
  return (
    <>
      <AreaTable {...props} />
      <DataTable
        caption={`${QUANTITY[kind]} in volts at x (columns) and y (rows) in ${unit.words}${signs}`}
        columns={[
          { label: 'y \\ x' },
          ...xs.map((x) => ({ label: fixedLength(x, 0, units), align: 'right' as const })),
        ]}
        rows={ys.map((y, r) => [fixedLength(y, 0, units), ...xs.map((x, c) => cell(values[r][c], x, y))])}
      />
    </>
  );
}
