// How touch voltage over the plan changed since the pinned state: figure, caption, and the same as a table.
import type { CaseFigures, Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useMemo } from 'preact/hooks';
import { useDesk } from '../desk/use-desk.ts';
import { useUnits } from '../desk/use-units.ts';
import { DifferenceFigure, signedVolts } from '../figure/difference.tsx';
import { titles } from '../figure/titles.ts';
import { fixedLength, lengthUnit } from '../format/length.ts';
import { fixed, quantity } from '../format/number.ts';
import { coarseGrid } from '../geometry/coarse.ts';
import {
  type DifferenceDrawing,
  differenceDrawing,
  differenceOf,
  type Extreme,
} from '../geometry/difference.ts';
import { DataTable, FigureBlock, Say } from './parts.tsx';
import { PlaceLink } from './place-link.tsx';

function Farthest({ most, least }: DifferenceDrawing): VNode {
  const row = (name: string, of: Extreme | undefined): readonly (VNode | string)[] =>
    of === undefined
      ? [name, '—', '—']
      : [name, signedVolts(of.value), <PlaceLink key={name} x={of.x} y={of.y} />];
  return (
    <DataTable
      caption="Farthest from the pinned state, on assessed ground"
      columns={[{ label: 'direction' }, { label: 'change', align: 'right' }, { label: 'at', align: 'right' }]}
      rows={[row('higher', most), row('lower', least)]}
    />
  );
}

function DifferenceTable({ drawing }: { drawing: DifferenceDrawing }): VNode {
  const units = useUnits();
  const unit = lengthUnit(units);
  const { xs, ys, values } = coarseGrid(drawing.lattice, drawing.values, unit.metres);
  const signed = (value: number): string => {
    const text = fixed(value, 0);
    return value > 0 && Number(text) !== 0 ? `+${text}` : text;
  };
  return (
    <>
      <Farthest {...drawing} />
      <DataTable
        caption={`Change in volts at x (columns) and y (rows) in ${unit.words}`}
        columns={[
          { label: 'y \\ x' },
          ...xs.map((x) => ({ label: fixedLength(x, 0, units), align: 'right' as const })),
        ]}
        rows={ys.map((y, r) => [fixedLength(y, 0, units), ...xs.map((_, c) => signed(values[r][c]))])}
      />
    </>
  );
}

interface Compared {
  readonly outcome: Outcome;
  readonly caseIndex: number;
  /** the same case of the pinned state */
  readonly then: CaseFigures;
  readonly slug: string;
}

function Change({ outcome, caseIndex, then, slug }: Compared): VNode {
  const { name: of, map } = outcome.cases[caseIndex];
  const units = useUnits();
  const difference = useMemo(() => differenceOf(map, then.map, 'touch'), [map, then.map]);
  const drawing = useMemo(
    () => difference && differenceDrawing(difference, outcome.plan.touchArea),
    [difference, outcome.plan.touchArea],
  );
  if (difference === undefined) return <Say>The pinned state covers other ground than this one.</Say>;
  if (drawing === undefined) {
    return (
      <Say>
        Against the pinned state, touch voltage moved nowhere by more than the maps are good to,{' '}
        {quantity(difference.error, 'V', 2)}.
      </Say>
    );
  }
  const name = `change-${slug}`;
  const title = titles.change(of);
  return (
    <FigureBlock
      name={name}
      title={title}
      caption="Touch voltage now less touch voltage in the pinned state, on the ground that both cover. Fill tells how much, the hatch which way: rising to the right where it is higher, falling where it is lower. Lines carry volts. Paler: outside the assessed area. The metal is that of now."
      table={<DifferenceTable drawing={drawing} />}
      by={[drawing, units]}
      file={null}
    >
      <DifferenceFigure outcome={outcome} drawing={drawing} name={name} title={title} />
    </FigureBlock>
  );
}

/** Nothing without a pinned state, or where it has no such case. */
export function DifferenceBlock(props: Omit<Compared, 'then'>): VNode | null {
  const { name } = props.outcome.cases[props.caseIndex];
  const then = useDesk()?.before?.cases.find((one) => one.name === name);
  return then === undefined ? null : <Change {...props} then={then} />;
}
