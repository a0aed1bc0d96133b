// Draws the bands of a map and what lies beyond the limit.
import type { Polygon } from '@ohmstead/study';
import type { VNode } from 'preact';
import type { Isoline } from '../geometry/contours.ts';
import type { MapDrawing } from '../geometry/map-drawing.ts';
import type { Plate } from '../geometry/plate.ts';
import { Path } from './drawn.tsx';
import { RAMP_STEPS } from './palette.ts';
import { linePath, onPlate, polygonPath, px, ringPath } from './path.ts';

/** Classes of fill from nothing upward for so many bands. */
export function rampClasses(count: number): readonly string[] {
  return Array.from({ length: count }, (_, k) => `r${Math.round((k * (RAMP_STEPS - 1)) / (count - 1))}`);
}

/** Bands of fill, each upon the one below. */
export function Fill({ plate, drawing }: { plate: Plate; drawing: MapDrawing }): VNode {
  const classes = rampClasses(drawing.edges.length + 1);
  const { frame } = plate;
  return (
    <g fill-rule="evenodd">
      <rect
        class={classes[0]}
        x={px(frame.left)}
        y={px(frame.top)}
        width={px(frame.right - frame.left)}
        height={px(frame.bottom - frame.top)}
      />
      {drawing.bands.map((band, k) => (
        <Path
          key={band.level}
          class={classes[k + 1]}
          d={ringPath(band.rings.map((ring) => onPlate(plate, ring)))}
        />
      ))}
    </g>
  );
}

/** Lines on the ground as path data. */
export function isolinePath(plate: Plate, lines: readonly Isoline[]): string {
  return lines
    .map(({ points, closed }) =>
      closed ? ringPath([onPlate(plate, points)]) : linePath(onPlate(plate, points)),
    )
    .join('');
}

export interface BeyondProps {
  readonly name: string;
  readonly plate: Plate;
  readonly drawing: MapDrawing;
  readonly area: readonly Polygon[];
}

/** Hatch and limit line, on assessed ground only: elsewhere nothing is judged. */
export function Beyond({ name, plate, drawing, area }: BeyondProps): VNode | null {
  const { beyond } = drawing;
  if (beyond === undefined || beyond.rings.length === 0) return null;
  return (
    <g clip-path={`url(#${name}-area)`}>
      <clipPath id={`${name}-area`}>
        <Path d={polygonPath(plate, area)} clip-rule="evenodd" />
      </clipPath>
      <Path
        d={ringPath(beyond.rings.map((ring) => onPlate(plate, ring)))}
        fill={`url(#${name}-hatch)`}
        fill-rule="evenodd"
      />
      <Path class="limit" d={isolinePath(plate, beyond.lines)} />
    </g>
  );
}
