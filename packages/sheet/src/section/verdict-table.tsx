// Sets worst voltages against their limits as a table with bars on one scale, grouped by case.
import type { VNode } from 'preact';
import type { BarRow } from '../figure/bars.tsx';
import { Hatch } from '../figure/hatch.tsx';
import { measured, quantity } from '../format/number.ts';
import { barOf, barScale } from '../geometry/bars.ts';
import { findingWords } from '../verdict/finding.ts';

function BarCell({ row, full, id }: { row: BarRow; full: number; id: string }): VNode {
  const bar = barOf(row, full);
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
      <line class="limit-tick" x1={pc(bar.limit)} x2={pc(bar.limit)} y1="0" y2="22" />
    </svg>
  );
}

function VerdictLine({ row, full, id }: { row: BarRow; full: number; id: string }): VNode {
  const governs = row.governs === true;
  return (
    <tr class={governs ? `${row.finding} governing` : row.finding}>
      <th scope="row">
        {row.subject}
        {row.footing === 'bare soil' && ', on bare soil'}
        {governs && <span class="mark">, governs</span>}
      </th>
      <td class="num worst">{measured(row.worst, row.uncertainty, 'V')}</td>
      <td class="num limit-value">{quantity(row.limit, 'V')}</td>
      <td class="bar-cell">
        <BarCell row={row} full={full} id={id} />
      </td>
      <td class="finding">{findingWords(row)}</td>
    </tr>
  );
}

export interface VerdictTableProps {
  readonly rows: readonly BarRow[];
  readonly caption: string;
  /** begins the identifiers inside */
  readonly id: string;
  /** rows carry names of seasons, which take more room */
  readonly bySeason?: boolean;
}

/** One row a comparison; the tick across the bars is the limit. */
export function VerdictTable({ rows, caption, id, bySeason = false }: VerdictTableProps): VNode {
  const full = barScale(rows);
  const cases = [...new Set(rows.map((row) => row.caseIndex))];
  return (
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
                <VerdictLine key={k} row={row} full={full} id={`${id}-hatch-${k}`} />
              ),
          )}
        </tbody>
      ))}
    </table>
  );
}
