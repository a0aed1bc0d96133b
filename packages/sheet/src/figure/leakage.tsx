// Draws how much current each piece of metal passes to the soil, as thickness of line.
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { given, quantity } from '../format/number.ts';
import { latticeExtent } from '../geometry/contours.ts';
import { LEAKAGE_STEPS, type LeakageDrawing, leakageDrawing } from '../geometry/leakage.ts';
import { type Plate, type PlateSize, plateOf } from '../geometry/plate.ts';
import { Path } from './drawn.tsx';
import { Figure, PlanAxes } from './frame.tsx';
import { SIGN_COLUMNS, SIGN_ROW, type Sign, SignKey } from './key.tsx';
import { piecesPath, px } from './path.ts';

export interface LeakageFigureProps {
  readonly outcome: Outcome;
  readonly name: string;
  readonly title: string;
  readonly css?: string | undefined;
}

/** Thickness of the highest class, drawing units. */
const THICKEST = 8;
const ROD_SMALLEST = 2.5;
const ROD_LARGEST = 9;

/** Thickness of the lines of a class, drawing units. */
export function leakageThickness(index: number): number {
  return (THICKEST * (index + 0.6)) / (LEAKAGE_STEPS.length - 0.4);
}

/** A hollow line: metal that takes current from the soil. */
function Hollow({ d, width }: { d: string; width: number }): VNode {
  return (
    <g>
      <Path class="leak" d={d} stroke-width={px(width + 1.6)} />
      <Path class="leak-core" d={d} stroke-width={px(width)} />
    </g>
  );
}

function Lines({ plate, drawing }: { plate: Plate; drawing: LeakageDrawing }): VNode {
  return (
    <g>
      {drawing.classes.map((group, k) => {
        const out = piecesPath(plate, group.out);
        const back = piecesPath(plate, group.in);
        return (
          <g key={group.upTo}>
            {out !== '' && <Path class="leak" d={out} stroke-width={px(leakageThickness(k))} />}
            {back !== '' && <Hollow d={back} width={leakageThickness(k)} />}
          </g>
        );
      })}
    </g>
  );
}

/** Rods with more than this many times the mean have the largest disc. */
const ROD_MOST = 3;

/** Radius of a rod's disc, drawing units. @param times the mean that it leaks along its length */
export function rodRadius(times: number): number {
  return ROD_SMALLEST + (ROD_LARGEST - ROD_SMALLEST) * Math.min(1, Math.abs(times) / ROD_MOST);
}

/** Times the mean that a class holds, in words. */
export function leakageClassText(k: number): string {
  const last = LEAKAGE_STEPS.length - 1;
  if (k === 0) return `up to ${given(LEAKAGE_STEPS[0])}`;
  if (k === last) return `above ${given(LEAKAGE_STEPS[last - 1])}`;
  return `${given(LEAKAGE_STEPS[k - 1])} to ${given(LEAKAGE_STEPS[k])}`;
}

function signsOf(drawing: LeakageDrawing): readonly Sign[] {
  const steps = drawing.classes.map((_, k): Sign => {
    return {
      text: leakageClassText(k),
      drawing: <Path class="leak" d="M-10,0H10" stroke-width={px(leakageThickness(k))} />,
    };
  });
  const back = drawing.classes.some((group) => group.in.length > 0);
  return back ? [...steps, { text: 'from the soil', drawing: <Hollow d="M-10,0H10" width={3} /> }] : steps;
}

/** Leakage along the conductors in plan. */
export function LeakageFigure({ outcome, name, title, css }: LeakageFigureProps): VNode {
  const drawing = leakageDrawing(outcome);
  const signs = signsOf(drawing);
  const rows = Math.ceil((signs.length + 1) / SIGN_COLUMNS);
  const size: PlateSize = {
    width: 760,
    most: 560,
    least: 120,
    margin: { left: 56, right: 8, top: 8, bottom: 84 + rows * SIGN_ROW },
  };
  const plate = plateOf(latticeExtent(outcome.cases[0].map), size);
  const mean = quantity(drawing.mean * 1000, 'mA', 3);
  const description = `Plan in which the thickness of each conductor shows its leakage current per metre, against the mean of the energised metal, ${mean} per metre and ampere injected.`;
  return (
    <Figure
      name={name}
      title={title}
      description={description}
      width={plate.width}
      height={plate.height}
      wide
      css={css}
    >
      <Lines plate={plate} drawing={drawing} />
      {drawing.rods.map((rod) => (
        <circle
          key={`${rod.x} ${rod.y}`}
          class="leak-rod"
          cx={px(plate.x(rod.x))}
          cy={px(plate.y(rod.y))}
          r={px(rodRadius(rod.times))}
        />
      ))}
      <PlanAxes plate={plate} drawn />
      <text x={px(plate.frame.left)} y={px(plate.frame.bottom + 60)}>
        leakage per metre, times the mean
      </text>
      <SignKey
        x={plate.frame.left}
        y={plate.frame.bottom + 84}
        width={plate.width - plate.frame.left}
        signs={signs}
        plate={plate}
      />
    </Figure>
  );
}
