// Everything that is drawn on the plan, from the ground up.
import type { DisplayUnits, Outcome, Point } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useMemo } from 'preact/hooks';
import { AreaLayer } from './area-layer.tsx';
import { DrawingLayer } from './drawing-layer.tsx';
import { FrameLayer } from './frame-layer.tsx';
import { LeakageLayer } from './leakage-layer.tsx';
import { MapLayer } from './map-layer.tsx';
import { MetalLayer } from './metal-layer.tsx';
import { itemName, type PlanItem } from './plan-conductors.ts';
import { draggedCorners, type Grip, type ProfileLine } from './plan-grip.ts';
import type { Drag } from './pointer-drag.ts';
import { mapOf, type Shown } from './shown.ts';
import type { Snapped } from './snap.ts';
import type { Looking } from './use-looking.ts';
import type { PlanWork } from './use-plan-work.ts';
import { WorstLayer } from './worst-layer.tsx';

export interface PlanPictureProps {
  readonly outcome: Outcome;
  readonly caseIndex: number;
  readonly shown: Shown;
  readonly units: DisplayUnits;
  readonly items: readonly PlanItem[];
  readonly looking: Looking;
  readonly work: PlanWork;
  readonly drag: Drag<Grip> | undefined;
  /** where what is dragged is held */
  readonly held: Snapped | undefined;
  readonly profile: ProfileLine | undefined;
}

export function PlanPicture(props: PlanPictureProps): VNode {
  const { outcome, caseIndex, shown, units, items, looking, work, drag, held, profile } = props;
  const { view, size } = looking;
  const at = { view, size };
  const kind = mapOf(shown);
  const grip = drag?.kind === 'move' ? drag.grip : undefined;
  const shift: Point =
    grip?.kind === 'items' && held !== undefined
      ? [held.at[0] - grip.at[0], held.at[1] - grip.at[1]]
      : [0, 0];
  const dragged =
    grip?.kind === 'corner' && held !== undefined && work.area !== undefined
      ? draggedCorners(work.area.corners, grip, held.at)
      : undefined;
  const frame = useMemo(() => <FrameLayer view={view} size={size} units={units} />, [view, size, units]);
  return (
    <>
      <rect class="plan-ground" width={size.width} height={size.height} />
      {kind !== undefined && (
        <MapLayer outcome={outcome} caseIndex={caseIndex} kind={kind} name="instrument" {...at} />
      )}
      {shown === 'leakage' && <LeakageLayer outcome={outcome} {...at} />}
      <AreaLayer areas={work.areas} inHand={work.area} dragged={dragged} corner={work.corner} {...at} />
      <MetalLayer
        items={items}
        chosen={work.chosen}
        hovered={work.under}
        floating={work.floating}
        shift={shift}
        {...at}
      />
      <WorstLayer outcome={outcome} caseIndex={caseIndex} shown={shown} goal={looking.goal} {...at} />
      <DrawingLayer
        tool={work.tool}
        pointer={work.cursor?.at}
        band={drag?.kind === 'band' ? [drag.from, drag.to] : undefined}
        meshes={[work.making.nx, work.making.ny]}
        profile={profile}
        name={held?.why ?? work.cursor?.why ?? (work.under && itemName(work.under))}
        {...at}
      />
      {frame}
    </>
  );
}
