// The map under the plan: drawn once for an outcome, then only moved and enlarged.
import {
  assessedFor,
  Hatch,
  latticeExtent,
  MapGround,
  type MapKind,
  mapDrawing,
  type Plate,
  plateOf,
  useTurn,
} from '@ohmstead/sheet';
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useMemo } from 'preact/hooks';
import type { Size, View } from './view.ts';

/** Drawing units across; strokes do not grow with the plan, so that only the digits of its paths depend on it. */
const WIDTH = 2000;
const WHOLE = { width: WIDTH, most: WIDTH, least: 1, margin: { left: 0, right: 0, top: 0, bottom: 0 } };

export interface MapLayerProps {
  readonly outcome: Outcome;
  readonly caseIndex: number;
  readonly kind: MapKind;
  readonly view: View;
  readonly size: Size;
  readonly name: string;
}

export function MapLayer({ outcome, caseIndex, kind, view, size, name }: MapLayerProps): VNode {
  const asked = useMemo(() => ({ outcome, caseIndex, kind }), [outcome, caseIndex, kind]);
  // contours are drawn in a task of their own, the old ones standing meanwhile
  const shown = useTurn<typeof asked | undefined>(asked, undefined);
  const map = shown?.outcome.cases[shown.caseIndex]?.map;
  const plate = useMemo(() => (map === undefined ? undefined : plateOf(latticeExtent(map), WHOLE)), [map]);
  const ground = useMemo(
    () =>
      plate &&
      shown && (
        <MapGround
          name={name}
          plate={plate}
          drawing={mapDrawing(shown.outcome, shown.caseIndex, shown.kind, false)}
          area={assessedFor(shown.outcome, shown.kind)}
        />
      ),
    [plate, shown, name],
  );
  if (plate === undefined) return <g />;
  return (
    <g>
      <defs>
        {/* the hatch keeps its spacing on the screen */}
        <Hatch id={`${name}-hatch`} spacing={6.5 / (view.scale / plate.scale)} />
      </defs>
      <g class="map-ground" transform={plateTransform(plate, view, size)}>
        {ground}
      </g>
    </g>
  );
}

function plateTransform(plate: Plate, view: View, size: Size): string {
  const ratio = view.scale / plate.scale;
  const x = size.width / 2 - plate.x(view.x) * ratio;
  const y = size.height / 2 - plate.y(view.y) * ratio;
  return `translate(${x} ${y}) scale(${ratio})`;
}
