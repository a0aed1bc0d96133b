// Sets the band of touch and step voltage over the soils that the readings allow beside best fit and limit.
import type { VNode } from 'preact';
import { useDesk } from '../desk/use-desk.ts';
import { Path } from '../figure/drawn.tsx';
import { Hatch } from '../figure/hatch.tsx';
import { BEST_FIT } from '../figure/soil-bands.tsx';
import { bandQuantity, fittedQuantity } from '../format/fitted.ts';
import { quantity } from '../format/number.ts';
import { measuredTold, type Told } from '../format/told.ts';
import { intervalOf, intervalScale } from '../geometry/interval.ts';
import { reachWords, type SoilBandRow } from '../verdict/soil-band.ts';
import { Change } from './result.tsx';

function IntervalCell({ row, full, id }: { row: SoilBandRow; full: number; id: string }): VNode {
  const { low, high, median, best, limit } = intervalOf(row.of, row.limit, full);
  const pc = (share: number): string => `${Math.round(share * 10_000) / 100}%`;
  const from = Math.max(low, limit);
  return (
    <svg class="fig bar-line" aria-hidden="true" focusable="false">
      <defs>
        <Hatch id={id} spacing={5} />
      </defs>
      {high > limit && <rect x={pc(from)} y="5" width={pc(high - from)} height="12" fill={`url(#${id})`} />}
      <rect class="soils-bar" x={pc(low)} y="5" width={pc(high - low)} height="12" />
      <line class="soils-median" x1={pc(median)} x2={pc(median)} y1="5" y2="17" />
      <line class="limit-tick" x1={pc(limit)} x2={pc(limit)} y1="0" y2="22" />
      {/* a drawing of its own, so that a share of the width can place a shape in drawing units */}
      <svg x={pc(best)} y="0" overflow="visible" aria-hidden="true">
        <Path class="best-fit" d={BEST_FIT} />
      </svg>
    </svg>
  );
}

interface LineProps {
  readonly row: SoilBandRow;
  /** the same voltage in the pinned state; undefined without one */
  readonly pinned: SoilBandRow | undefined;
  readonly full: number;
  readonly id: string;
}

function BandLine({ row, pinned, full, id }: LineProps): VNode {
  const before = useDesk()?.before;
  const told = ({ of, uncertainty }: SoilBandRow): Told => measuredTold(of.best, uncertainty, 'V');
  return (
    <tr class={row.reach}>
      <th scope="row">
        {row.kind}
        {row.footing === 'bare soil' && ', on bare soil'}
      </th>
      <td class="num best">
        {told(row).text}
        {before !== undefined && <Change now={told(row)} before={pinned && told(pinned)} />}
      </td>
      <td class="num median">{fittedQuantity(row.of.median, 'V')}</td>
      <td class="num soils-range">{bandQuantity(row.of, 'V')}</td>
      <td class="num limit-value">{quantity(row.limit, 'V')}</td>
      <td class="bar-cell">
        <IntervalCell row={row} full={full} id={id} />
      </td>
      <td class="finding">{reachWords(row)}</td>
    </tr>
  );
}

/** One row a voltage: best fit with its numerical ±, median and band of the soils, limit, and all on one scale. */
export function SoilBandTable({
  rows,
  pinned = [],
  id,
}: {
  rows: readonly SoilBandRow[];
  /** of the pinned state; undefined without one */
  pinned?: readonly SoilBandRow[] | undefined;
  id: string;
}): VNode {
  const full = intervalScale(rows);
  const cases = [...new Set(rows.map((row) => row.caseIndex))];
  return (
    <table class="verdicts bands">
      <caption>
        Worst voltages over the soils that the readings allow. Open bar: 5–95{'\u202f'}% of the soils; stroke
        in it: their median; wedge above it: the best fit; tick: the limit
      </caption>
      <thead>
        <tr>
          <th scope="col">case and quantity</th>
          <th scope="col" class="num">
            best fit
          </th>
          <th scope="col" class="num">
            median
          </th>
          <th scope="col" class="num">
            5–95{'\u202f'}% of soils
          </th>
          <th scope="col" class="num">
            limit
          </th>
          <td class="bar-cell" />
          <th scope="col">over the soils</th>
        </tr>
      </thead>
      {cases.map((caseIndex) => (
        <tbody key={caseIndex}>
          <tr class="group">
            <th scope="rowgroup" colSpan={7}>
              {rows.find((row) => row.caseIndex === caseIndex)?.caseName}
            </th>
          </tr>
          {rows.map(
            (row, k) =>
              row.caseIndex === caseIndex && (
                <BandLine
                  key={k}
                  row={row}
                  pinned={pinned.find((then) => then.caseName === row.caseName && then.kind === row.kind)}
                  full={full}
                  id={`${id}-hatch-${k}`}
                />
              ),
          )}
        </tbody>
      ))}
    </table>
  );
}
