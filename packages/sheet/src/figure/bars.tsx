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

/** A comparison, and whether it is the one that governs among seasons. */
export type BarRow = VerdictRow & { readonly governs?: boolean };

const WIDTH = 900;
const ROW = 30;
const TOP = 34;
const NAME = 8;
const INDENT = 22;
const WORST = 372;
const LIMIT = 440;
const BAR: readonly [number, number] = [456, 680];
const WORDS = 694;
/** Longest texts that fit their places, characters. */
const LONGEST_NAME = 38;
const LONGEST_CASE = 110;

/** A name that fits its place, the rest told by …. */
export function cut(text: string, longest: number): string {
  return text.length > longest ? `${text.slice(0, longest - 1)}…` : text;
}

function Row({ row, y, full, name }: { row: BarRow; y: number; full: number; name: string }): VNode {
  const bar = barOf(row, full);
  const at = (share: number): number => BAR[0] + share * (BAR[1] - BAR[0]);
  const governs = row.governs === true;
  const subject = row.footing === 'bare soil' ? `${row.subject}, on bare soil` : row.subject;
  return (
    <g>
      <text class={governs ? 'strong' : undefined} x={INDENT} y={y} dy="0.36em">
        {cut(subject, LONGEST_NAME - (governs ? 9 : 0))}
        {governs && ', governs'}
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

/** Name of a case over its rows. */
export function CaseHeading({ text, y }: { text: string; y: number }): VNode {
  return (
    <text class="strong" x={NAME} y={y} dy="0.6em">
      {cut(text, LONGEST_CASE)}
    </text>
  );
}

/** Heights of rows that stand under a heading wherever another case begins. */
export function stacked<Row extends { readonly caseIndex: number }>(
  rows: readonly Row[],
): readonly { readonly row: Row; readonly y: number; readonly first: boolean }[] {
  let below = TOP;
  return rows.map((row, k) => {
    const first = k === 0 || rows[k - 1].caseIndex !== row.caseIndex;
    below += first ? 2 * ROW : ROW;
    return { row, y: below - ROW / 2, first };
  });
}

/** All comparisons as bars; for files that stand alone, the page sets them as a table with the same bars. */
export function BarsFigure({
  rows,
  name,
  title,
  css,
}: {
  rows: readonly BarRow[];
  name: string;
  title: string;
  css?: string | undefined;
}): VNode {
  const full = barScale(rows);
  const lines = stacked(rows);
  const height = (lines.at(-1)?.y ?? TOP) + ROW / 2 + 12;
  const description = rows
    .map(
      (r) => `${r.caseName}, ${r.subject}${r.governs === true ? ', which governs' : ''}: ${findingWords(r)}.`,
    )
    .join(' ');
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
      {lines.map(({ row, y, first }, k) => (
        <g key={k}>
          {first && <CaseHeading text={row.caseName} y={y - ROW} />}
          <Row row={row} y={y} full={full} name={name} />
        </g>
      ))}
    </Figure>
  );
}
