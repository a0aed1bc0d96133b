// The key of a map: shares of the whole, and the volts they are.
import type { VNode } from 'preact';
import { percent, volts } from '../format/number.ts';
import type { MapDrawing } from '../geometry/map-drawing.ts';
import type { Plate } from '../geometry/plate.ts';
import { RampKey } from './key.tsx';
import { rampClasses } from './map-fill.tsx';

/** More bands than this have narrow swatches, and every second edge is lettered. */
const WIDE_SWATCHES = 5;

function keyTitle(drawing: MapDrawing): string {
  const whole = drawing.kind === 'potential' ? 'share of the rise' : `share of the ${drawing.kind} limit`;
  return drawing.roundVolts === undefined ? whole : `${whole}; lines every ${volts(drawing.roundVolts)}`;
}

/** Ramp with shares above and volts below. */
export function MapKey({ name, plate, drawing }: { name: string; plate: Plate; drawing: MapDrawing }): VNode {
  const count = drawing.edges.length + 1;
  const step = count > WIDE_SWATCHES ? 52 : 90;
  const shown = [0, ...drawing.edges, 1]
    .map((share, at) => ({ share, at }))
    .filter(({ at }) => at % (count > WIDE_SWATCHES ? 2 : 1) === 0);
  return (
    <RampKey
      x={plate.frame.left}
      y={plate.frame.bottom + 66}
      step={step}
      classes={rampClasses(count)}
      title={keyTitle(drawing)}
      beyond={drawing.beyond === undefined ? undefined : `url(#${name}-hatch)`}
      edges={shown.map(({ share, at }) => ({
        at,
        share: share === 0 ? '0' : percent(share),
        volts: volts(share * drawing.whole),
      }))}
    />
  );
}
