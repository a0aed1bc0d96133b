// Draws every worst voltage against its limit on one shared scale.
import type { VNode } from 'preact';
import { measured, quantity } from '../format/number.ts';
import { barOf, barScale } from '../geometry/bars.ts';
import { findingWords } from '../verdict/finding.ts';
import type { VerdictRow } from '../verdict/rows.ts';
import { Path } from './drawn.tsx';
import { Figure } from './frame.tsx';
import { Hatch } from './hatch.tsx';
import { px } from './path.ts';

const WIDTH = 900;
const ROW = 30;
const TOP = 34;
const NAME = 8;
const WORST = 372;
const LIMIT = 440;
const BAR: readonly [number, number] = [456, 680];
const WORDS = 694;
/** Longest name that fits its column, characters. */
const LONGEST_NAME = 34;

function cut(text: string): string {
  return text.length > LONGEST_NAME ? `${text.slice(0, LONGEST_NAME - 1)}…` : text;
}

function Row({ row, y, full, name }: { row: VerdictRow; y: number; full: number; name: string }): VNode {
  const bar = barOf(row, full);
  const at = (share: number): number => BAR[0] + share * (BAR[1] - BAR[0]);
  return (
    <g>
      <text x={NAME} y={y} dy="0.36em">
        {cut(`${row.caseName}, ${row.subject}`)}
      </text>
      <text class="end" x={WORST} y={y} dy="0.36em">
        {measured(row.worst, row.uncertainty, 'V')}
      </text>
      <text class="end" x={LIMIT} y={y} dy="0.36em">
        {quantity(row.limit, 'V')}
      </text>
      <rect class="bar" x={BAR[0]} y={y - 5} width={px(at(bar.within) - BAR[0])} height="10" />
      {bar.beyond > 0 && (
        <rect
          x={px(at(bar.within))}
          y={y - 5}
          width={px(at(bar.within + bar.beyond) - at(bar.within))}
          height="10"
          fill={`url(#${name}-hatch)`}
        />
      )}
      <Path class="leader" d={`M${px(at(bar.low))},${y}H${px(at(bar.high))}`} />
      <Path class="line" stroke-width="2" d={`M${px(at(bar.limit))},${y - 10}V${y + 10}`} />
      <text class={row.finding === 'beyond' ? 'warn strong' : undefined} x={WORDS} y={y} dy="0.36em">
        {findingWords(row)}
      </text>
      <line class="gridline" x1={NAME} x2={WIDTH - 8} y1={y + ROW / 2} y2={y + ROW / 2} />
    </g>
  );
}

/** All comparisons as bars; for files that stand alone, the page sets them as a table with the same bars. */
export function BarsFigure({
  rows,
  name,
  title,
  css,
}: {
  rows: readonly VerdictRow[];
  name: string;
  title: string;
  css?: string | undefined;
}): VNode {
  const full = barScale(rows);
  const height = TOP + rows.length * ROW + 12;
  const description = rows.map((r) => `${r.caseName}, ${r.subject}: ${findingWords(r)}.`).join(' ');
  return (
    <Figure
      name={name}
      title={title}
      description={description}
      width={WIDTH}
      height={height}
      wide={false}
      css={css}
    >
      <defs>
        <Hatch id={`${name}-hatch`} spacing={5} />
      </defs>
      <text class="soft" x={NAME} y={18}>
        case and quantity
      </text>
      <text class="soft end" x={WORST} y={18}>
        worst
      </text>
      <text class="soft end" x={LIMIT} y={18}>
        limit
      </text>
      {rows.map((row, k) => (
        <Row
          key={`${row.caseIndex} ${row.subject}`}
          row={row}
          y={TOP + k * ROW + ROW / 2}
          full={full}
          name={name}
        />
      ))}
    </Figure>
  );
}
