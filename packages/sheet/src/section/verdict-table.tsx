// Sets worst voltages against their limits as a table with bars on one scale, grouped by case.
import type { VNode } from 'preact';
import { useDesk } from '../desk/use-desk.ts';
import { Download } from '../field/download.tsx';
import type { BarRow } from '../figure/bars.tsx';
import { Hatch } from '../figure/hatch.tsx';
import { quantity } from '../format/number.ts';
import { measuredTold, type Told } from '../format/told.ts';
import { barOf, barScale } from '../geometry/bars.ts';
import { findingWords } from '../verdict/finding.ts';
import { PlaceLink } from './place-link.tsx';
import { Change } from './result.tsx';

interface LineProps {
  readonly row: BarRow;
  /** the same comparison in the pinned state; undefined without one */
  readonly pinned: BarRow | undefined;
  readonly full: number;
  readonly id: string;
}

/** Width of the hollow tick, drawing units. */
const TICK = 5;

function BarCell({ row, pinned, full, id }: LineProps): VNode {
  const bar = barOf(row, full);
  const then = pinned === undefined ? undefined : barOf(pinned, full);
  const pc = (share: number): string => `${Math.round(share * 10_000) / 100}%`;
  return (
    <svg class="fig bar-line" aria-hidden="true" focusable="false">
      <defs>
        <Hatch id={id} spacing={5} />
      </defs>
      <rect class="bar" x="0" y="6" width={pc(bar.within)} height="10" />
      {bar.beyond > 0 && (
        <rect x={pc(bar.within)} y="6" width={pc(bar.beyond)} height="10" fill={`url(#${id})`} />
      )}
      <line class="leader" x1={pc(bar.low)} x2={pc(bar.high)} y1="11" y2="11" />
      {then !== undefined && (
        <svg x={pc(then.within + then.beyond)} y="0" overflow="visible" aria-hidden="true">
          <rect class="pinned-tick" x={-TICK / 2} y="3" width={TICK} height="16" />
        </svg>
      )}
      <line class="limit-tick" x1={pc(bar.limit)} x2={pc(bar.limit)} y1="0" y2="22" />
    </svg>
  );
}

function VerdictLine({ row, pinned, full, id }: LineProps): VNode {
  const desk = useDesk();
  const governs = row.governs === true;
  const told = ({ worst, uncertainty }: BarRow): Told => measuredTold(worst, uncertainty, 'V');
  return (
    <tr class={governs ? `${row.finding} governing` : row.finding}>
      <th scope="row">
        {row.subject}
        {row.footing === 'bare soil' && ', on bare soil'}
        {governs && <span class="mark">, governs</span>}
        {desk !== undefined && (
          <span class="place">
            {' '}
            at <PlaceLink x={row.x} y={row.y} />
          </span>
        )}
      </th>
      <td class="num worst">
        {told(row).text}
        {desk?.before !== undefined && <Change now={told(row)} before={pinned && told(pinned)} />}
      </td>
      <td class="num limit-value">{quantity(row.limit, 'V')}</td>
      <td class="bar-cell">
        <BarCell row={row} pinned={pinned} full={full} id={id} />
      </td>
      <td class="finding">{findingWords(row)}</td>
    </tr>
  );
}

export interface VerdictTableProps {
  readonly rows: readonly BarRow[];
  /** the comparisons of the pinned state; undefined without one */
  readonly pinned?: readonly BarRow[] | undefined;
  readonly caption: string;
  /** begins the identifiers inside */
  readonly id: string;
  /** the table file that holds it */
  readonly file: string;
  /** rows carry names of seasons, which take more room */
  readonly bySeason?: boolean;
}

/** Whether two rows of different states compare the same voltage. */
function sameComparison(one: BarRow, other: BarRow): boolean {
  return one.caseName === other.caseName && one.subject === other.subject;
}

/** One row a comparison; the tick across the bars is the limit. */
export function VerdictTable(props: VerdictTableProps): VNode {
  const { rows, pinned = [], caption, id, file, bySeason = false } = props;
  const full = barScale([...rows, ...pinned]);
  const cases = [...new Set(rows.map((row) => row.caseIndex))];
  return (
    <>
      <table class={bySeason ? 'verdicts by-season' : 'verdicts'}>
        <caption>{caption}</caption>
        <thead>
          <tr>
            <th scope="col">case and quantity</th>
            <th scope="col" class="num">
              worst
            </th>
            <th scope="col" class="num">
              limit
            </th>
            <td class="bar-cell" />
            <th scope="col">finding</th>
          </tr>
        </thead>
        {cases.map((caseIndex) => (
          <tbody key={caseIndex}>
            <tr class="group">
              <th scope="rowgroup" colSpan={5}>
                {rows.find((row) => row.caseIndex === caseIndex)?.caseName}
              </th>
            </tr>
            {rows.map(
              (row, k) =>
                row.caseIndex === caseIndex && (
                  <VerdictLine
                    key={k}
                    row={row}
                    pinned={pinned.find((then) => sameComparison(then, row))}
                    full={full}
                    id={`${id}-hatch-${k}`}
                  />
                ),
            )}
          </tbody>
        ))}
      </table>
      <Download file={file} />
    </>
  );
}
