// What a map shows of the ground itself: bands, lines in volts, the assessed area and what lies beyond the limit.
import type { Polygon } from '@ohmstead/study';
import type { VNode } from 'preact';
import type { MapDrawing } from '../geometry/map-drawing.ts';
import type { Plate } from '../geometry/plate.ts';
import { Path } from './drawn.tsx';
import { frameRing } from './frame-ring.ts';
import { Beyond, Fill, isolinePath } from './map-fill.tsx';
import { polygonPath, ringPath } from './path.ts';

export interface MapGroundProps {
  /** the hatch is `NAME-hatch` */
  readonly name: string;
  readonly plate: Plate;
  readonly drawing: MapDrawing;
  /** assessed; what lies outside is paler */
  readonly area: readonly Polygon[];
}

export function MapGround({ name, plate, drawing, area }: MapGroundProps): VNode {
  return (
    <>
      <Fill plate={plate} drawing={drawing} />
      <Path
        class="iso"
        d={isolinePath(
          plate,
          drawing.lines.flatMap((band) => band.lines),
        )}
      />
      {area.length > 0 && (
        <Path class="veil" fill-rule="evenodd" d={ringPath([frameRing(plate)]) + polygonPath(plate, area)} />
      )}
      <Beyond name={name} plate={plate} drawing={drawing} area={area} />
      {area.length > 0 && <Path class="area" d={polygonPath(plate, area)} />}
    </>
  );
}
