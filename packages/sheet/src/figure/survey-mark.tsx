// Draws the marks of readings, another shape for each traverse.
import type { VNode } from 'preact';
import { Path } from './drawn.tsx';

interface MarkShape {
  readonly d: string;
  readonly hollow: boolean;
}

const CIRCLE = 'M-4.2,0A4.2,4.2,0,1,1,4.2,0A4.2,4.2,0,1,1,-4.2,0Z';
const SQUARE = 'M-3.7,-3.7H3.7V3.7H-3.7Z';
const TRIANGLE = 'M0,-5L4.6,3.2H-4.6Z';
const DIAMOND = 'M0,-5.2L5.2,0L0,5.2L-5.2,0Z';

/** Neighbours in the list differ in shape and in fill. */
const SHAPES: readonly MarkShape[] = [
  { d: CIRCLE, hollow: true },
  { d: SQUARE, hollow: false },
  { d: TRIANGLE, hollow: true },
  { d: DIAMOND, hollow: false },
  { d: CIRCLE, hollow: false },
  { d: SQUARE, hollow: true },
  { d: TRIANGLE, hollow: false },
  { d: DIAMOND, hollow: true },
];
/** All traverses past the shapes share one. */
const FURTHER: MarkShape = { d: 'M-4.6,0H4.6M0,-4.6V4.6', hollow: true };

/** Traverses with a mark of their own. */
export const OWN_MARKS: number = SHAPES.length;

/** The mark of a traverse about the origin. */
export function SurveyMark({ traverse }: { traverse: number }): VNode {
  const { d, hollow } = SHAPES[traverse] ?? FURTHER;
  return <Path class={hollow ? 'reading hollow' : 'reading'} d={d} />;
}
