// Areas over the plan: touch, step and covered ground told apart by their dashes; of the one in hand every corner.
import type { Point, Polygon } from '@ohmstead/study';
import type { VNode } from 'preact';
import { edgeMiddles, type PlanArea } from './plan-areas.ts';
import { type Size, toScreen, type View } from './view.ts';

/** Half the side of the square at a corner, pixels. */
const CORNER_PX = 4;
const MIDDLE_PX = 2.6;

export interface AreaLayerProps {
  readonly areas: readonly PlanArea[];
  readonly inHand: PlanArea | undefined;
  /** corners of the area in hand as it is dragged; undefined where it lies still */
  readonly dragged: Polygon | undefined;
  readonly corner: number | undefined;
  readonly view: View;
  readonly size: Size;
}

export function AreaLayer({ areas, inHand, dragged, corner, view, size }: AreaLayerProps): VNode {
  const on = (place: Point): Point => toScreen(view, size, place);
  const ring = (corners: Polygon): string =>
    corners.length === 0 ? '' : `M${corners.map((place) => on(place).join(' ')).join('L')}Z`;
  const corners = dragged ?? inHand?.corners;
  return (
    <g class="areas">
      {areas.map((area) => (
        <path
          key={`${area.kind} ${area.polygon}`}
          class={`area-${area.kind}`}
          d={ring(area === inHand ? (corners ?? area.corners) : area.corners)}
        />
      ))}
      {corners !== undefined && (
        <g class="in-hand">
          <path class="area-held" d={ring(corners)} />
          {dragged === undefined &&
            edgeMiddles(corners).map((place, k) => {
              const [x, y] = on(place);
              return <circle key={`m${k}`} class="middle" cx={x} cy={y} r={MIDDLE_PX} />;
            })}
          {corners.map((place, k) => {
            const [x, y] = on(place);
            return (
              <rect
                key={k}
                class={k === corner ? 'corner held' : 'corner'}
                x={x - CORNER_PX}
                y={y - CORNER_PX}
                width={2 * CORNER_PX}
                height={2 * CORNER_PX}
              />
            );
          })}
        </g>
      )}
    </g>
  );
}
