// One line under the plan: where the pointer is, why it falls there, and every voltage at that place.
import { type MapKind, percent, place, quantity } from '@ohmstead/sheet';
import type { DisplayUnits, Outcome, Point } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useEffect, useState } from 'preact/hooks';
import { readingAt } from './reading.ts';

export interface ReadingLineProps {
  readonly outcome: Outcome;
  readonly caseIndex: number;
  readonly at: Point | undefined;
  readonly why: string | undefined;
  readonly units: DisplayUnits;
}

export function readingText({ outcome, caseIndex, at, why, units }: ReadingLineProps): string {
  if (at === undefined)
    return 'Point at a place, or move the cross with the arrow keys, to read its voltages.';
  const result = outcome.results.cases[caseIndex];
  const map = outcome.cases[caseIndex]?.map;
  const reading = map === undefined ? undefined : readingAt(map, at[0], at[1]);
  const told = [place(at[0], at[1], units), ...(why === undefined ? [] : [why])].join(', ');
  if (reading === undefined || result === undefined) return `${told}: outside the map`;
  const share = (volts: number, kind: Exclude<MapKind, 'potential'>): string =>
    `${quantity(volts, 'V')} (${percent(Math.abs(volts) / result[kind].limit_V)} of ${quantity(result[kind].limit_V, 'V')})`;
  return `${told}: potential ${quantity(reading.potential, 'V')}, touch ${share(reading.touch, 'touch')}, step ${share(reading.step, 'step')}`;
}

/** Pause after which a reading is spoken, ms: a moving pointer is not talked over. */
const SPOKEN_AFTER_MS = 300;

export function ReadingLine(props: ReadingLineProps): VNode {
  const text = readingText(props);
  const [spoken, speak] = useState('');
  useEffect(() => {
    if (props.at === undefined) return;
    const timer = setTimeout(() => speak(text), SPOKEN_AFTER_MS);
    return () => clearTimeout(timer);
  }, [text]);
  return (
    <>
      <p class="plan-reading">{text}</p>
      <p class="unseen" aria-live="polite">
        {spoken}
      </p>
    </>
  );
}
