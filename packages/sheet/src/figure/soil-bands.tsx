// Draws what the soils that the readings allow do to touch and step voltage: intervals on one scale against the limits.
import type { VNode } from 'preact';
import { bandQuantity, fittedQuantity } from '../format/fitted.ts';
import { quantity } from '../format/number.ts';
import { intervalOf, intervalScale } from '../geometry/interval.ts';
import { reachWords, type SoilBandRow } from '../verdict/soil-band.ts';
import { CaseHeading, stacked } from './bars.tsx';
import { Path } from './drawn.tsx';
import { Figure } from './frame.tsx';
import { Hatch } from './hatch.tsx';
import { Signs } from './key.tsx';
import { px } from './path.ts';

const WIDTH = 900;
const ROW = 30;
const NAME = 8;
const INDENT = 22;
const BEST = 196;
const MEDIAN = 264;
const BAND = 376;
const LIMIT = 440;
const BAR: readonly [number, number] = [456, 660];
const WORDS = 674;

/** The best fit: a wedge whose point stands on the upper edge of the interval, so that it hides no median. */
export const BEST_FIT = 'M-4.4,-1.5H4.4L0,5Z';

function Row({ row, y, full, name }: { row: SoilBandRow; y: number; full: number; name: string }): VNode {
  const { low, high, median, best, limit } = intervalOf(row.of, row.limit, full);
  const at = (share: number): number => BAR[0] + share * (BAR[1] - BAR[0]);
  const from = Math.max(low, limit);
  return (
    <g>
      <text x={INDENT} y={y} dy="0.36em">
        {row.footing === 'bare soil' ? `${row.kind}, bare soil` : row.kind}
      </text>
      <text class="end" x={BEST} y={y} dy="0.36em">
        {quantity(row.of.best, 'V')}
      </text>
      <text class="end" x={MEDIAN} y={y} dy="0.36em">
        {fittedQuantity(row.of.median, 'V')}
      </text>
      <text class="end" x={BAND} y={y} dy="0.36em">
        {bandQuantity(row.of, 'V')}
      </text>
      <text class="end" x={LIMIT} y={y} dy="0.36em">
        {quantity(row.limit, 'V')}
      </text>
      {high > limit && (
        <rect
          x={px(at(from))}
          y={y - 6}
          width={px(at(high) - at(from))}
          height="12"
          fill={`url(#${name}-hatch)`}
        />
      )}
      <rect class="soils-bar" x={px(at(low))} y={y - 6} width={px(at(high) - at(low))} height="12" />
      <Path class="soils-median" d={`M${px(at(median))},${y - 6}V${y + 6}`} />
      <Path class="line" stroke-width="2" d={`M${px(at(limit))},${y - 11}V${y + 11}`} />
      <g transform={`translate(${px(at(best))},${y - 11})`}>
        <Path class="best-fit" d={BEST_FIT} />
      </g>
      <text class={row.reach === 'within' ? undefined : 'warn'} x={WORDS} y={y} dy="0.36em">
        {reachWords(row)}
      </text>
      <line class="gridline" x1={NAME} x2={WIDTH - 8} y1={y + ROW / 2} y2={y + ROW / 2} />
    </g>
  );
}

const KEY = [
  {
    text: '5–95\u202f% of the soils',
    drawing: <rect class="soils-bar" x="-12" y="-6" width="24" height="12" />,
  },
  { text: 'median of the soils', drawing: <Path class="soils-median" d="M0,-6V6" /> },
  { text: 'best fit', drawing: <Path class="best-fit" d={BEST_FIT} /> },
  { text: 'limit', drawing: <Path class="line" stroke-width="2" d="M0,-10V10" /> },
];

/** All intervals; for files that stand alone, the page sets them as a table with the same intervals. */
export function SoilBandsFigure({
  rows,
  name,
  title,
  css,
}: {
  rows: readonly SoilBandRow[];
  name: string;
  title: string;
  css?: string | undefined;
}): VNode {
  const full = intervalScale(rows);
  const lines = stacked(rows);
  const bottom = (lines.at(-1)?.y ?? ROW) + ROW / 2;
  const description = rows
    .map(
      (r) =>
        `${r.caseName}, ${r.kind}: best fit ${quantity(r.of.best, 'V')}, 5 to 95 per cent of the soils ${bandQuantity(r.of, 'V')}; ${reachWords(r)}.`,
    )
    .join(' ');
  return (
    <Figure
      name={name}
      title={title}
      description={description}
      width={WIDTH}
      height={bottom + 44}
      wide={false}
      css={css}
    >
      <defs>
        <Hatch id={`${name}-hatch`} spacing={5} />
      </defs>
      <text class="soft" x={NAME} y={18}>
        case and quantity
      </text>
      {[
        ['best fit', BEST],
        ['median', MEDIAN],
        ['5–95\u202f% of soils', BAND],
        ['limit', LIMIT],
      ].map(([text, x]) => (
        <text key={text} class="soft end" x={x} y={18}>
          {text}
        </text>
      ))}
      {lines.map(({ row, y, first }, k) => (
        <g key={k}>
          {first && <CaseHeading text={row.caseName} y={y - ROW} />}
          <Row row={row} y={y} full={full} name={name} />
        </g>
      ))}
      <Signs x={NAME} y={bottom + 26} column={170} columns={KEY.length} signs={KEY} />
    </Figure>
  );
}
