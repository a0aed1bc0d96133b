// What drawing and moving does to the draft, with words for undo.
import type { DisplayUnits, RowOrigin } from '@ohmstead/study';
import { addPolygon } from '../desk/areas.ts';
import type { Conductor } from '../desk/conductor.ts';
import {
  addConductors,
  conductorsAt,
  copyConductors,
  copyId,
  deleteConductors,
  idsOf,
  moveConductors,
  type Shift,
  setConductors,
} from '../desk/conductor-edits.ts';
import type { Draft } from '../desk/draft.ts';
import { conductorsLabel, moveLabel } from '../desk/labels.ts';
import { line, type Make, mesh, rod } from '../desk/shapes.ts';
import { areaWords } from './plan-areas.ts';
import type { PlanItem } from './plan-conductors.ts';
import type { Drawn } from './tool-state.ts';

/** What is drawn next is made of this. */
export interface Making extends Make {
  /** of conductors, and of the tops of rods, m */
  readonly depth: number;
  readonly rodLength: number;
  /** meshes from west to east, and from south to north */
  readonly nx: number;
  readonly ny: number;
}

/** Of a study without metal. Common practice, no source. */
const FIRST_MAKING: Making = { depth: 0.6, diameter: 0.012, material: undefined, rodLength: 3, nx: 4, ny: 4 };

/** An edit of the draft, with the rows that it leaves chosen. */
export interface PlanEdit {
  readonly draft: Draft;
  readonly label: string;
  readonly rows: readonly RowOrigin[];
}

/** Puts what a tool has drawn into the draft; a profile is no part of it. */
export function drawnInto(draft: Draft, drawn: Drawn, making: Making): PlanEdit | undefined {
  const ids = idsOf(draft);
  const make: Make = { diameter: making.diameter, material: making.material, electrode: making.electrode };
  const placed = (conductors: readonly Conductor[], label: string): PlanEdit => ({
    ...addConductors(draft, conductors),
    label,
  });
  switch (drawn.kind) {
    case 'profile':
      return undefined;
    case 'conductor': {
      const one = [line(drawn.from, drawn.to, making.depth, make, ids)];
      return placed(one, conductorsLabel(one, 'drawn'));
    }
    case 'rod': {
      const one = [rod(drawn.at, { top: making.depth, length: making.rodLength }, make, ids)];
      return placed(one, conductorsLabel(one, 'drawn'));
    }
    case 'mesh': {
      const { from, to } = drawn;
      const { depth, nx, ny } = making;
      return placed(mesh({ from, to, depth, nx, ny }, make, ids), `mesh of ${nx} by ${ny} drawn`);
    }
    case 'area':
      return {
        draft: addPolygon(draft, drawn.area, drawn.corners),
        label: `${areaWords(drawn.area)} drawn`,
        rows: [],
      };
  }
}

export function moved(draft: Draft, rows: readonly RowOrigin[], shift: Shift, units: DisplayUnits): PlanEdit {
  const label = moveLabel(conductorsAt(draft, rows), shift, units);
  return { draft: moveConductors(draft, rows, shift), label, rows };
}

export function copied(draft: Draft, rows: readonly RowOrigin[], shift: Shift): PlanEdit {
  return {
    ...copyConductors(draft, rows, shift),
    label: conductorsLabel(conductorsAt(draft, rows), 'copied'),
  };
}

/** Puts in conductors that were copied from this or an earlier draft, shifted; an id that is taken is followed by a number. */
export function pasted(draft: Draft, conductors: readonly Conductor[], { dx, dy }: Shift): PlanEdit {
  const ids = new Set(idsOf(draft));
  const placed = conductors.map((one): Conductor => {
    const id = one.id !== undefined && ids.has(one.id) ? copyId(one.id, ids) : one.id;
    if (id !== undefined) ids.add(id);
    return { ...one, id, x1: one.x1 + dx, y1: one.y1 + dy, x2: one.x2 + dx, y2: one.y2 + dy };
  });
  return { ...addConductors(draft, placed), label: conductorsLabel(conductors, 'copied') };
}

export function deleted(draft: Draft, rows: readonly RowOrigin[]): PlanEdit {
  return {
    draft: deleteConductors(draft, rows),
    label: conductorsLabel(conductorsAt(draft, rows), 'deleted'),
    rows: [],
  };
}

/** Values that conductors chosen can be given together. */
export function remade(
  draft: Draft,
  rows: readonly RowOrigin[],
  values: Pick<Partial<Conductor>, 'diameter' | 'material' | 'electrode'>,
): PlanEdit {
  return {
    draft: setConductors(draft, rows, () => values),
    label: conductorsLabel(conductorsAt(draft, rows), 'changed'),
    rows,
  };
}

/** Conductors chosen laid at another depth: the whole of each is moved so that its first end lies there. */
export function laidAt(draft: Draft, rows: readonly RowOrigin[], depth: number): PlanEdit {
  return {
    draft: setConductors(draft, rows, ({ depth1, depth2 }) => ({
      depth1: depth,
      depth2: depth + depth2 - depth1,
    })),
    label: conductorsLabel(conductorsAt(draft, rows), 'changed'),
    rows,
  };
}

/** What is drawn first is made as the last conductor and rod of the study that do not float. */
export function makingOf(items: readonly PlanItem[], floating: ReadonlySet<string>): Making {
  const own = items.filter(({ conductor }) => !floating.has(conductor.electrode ?? 'main'));
  const last = own.findLast(({ rod }) => !rod)?.conductor;
  const lastRod = own.findLast((item) => item.rod)?.conductor;
  if (last === undefined) return FIRST_MAKING;
  return {
    ...FIRST_MAKING,
    depth: last.depth1,
    diameter: last.diameter,
    material: last.material,
    electrode: last.electrode,
    rodLength: lastRod === undefined ? FIRST_MAKING.rodLength : Math.abs(lastRod.depth2 - lastRod.depth1),
  };
}
