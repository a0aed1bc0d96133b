// The instrument's tools as a value: which one is held, the points it has taken, and what it is about to draw.
import type { Point } from '@ohmstead/study';
import type { AreaKind } from '../desk/areas.ts';

type AreaTool = 'touch area' | 'step area' | 'covered area';
export type Tool = 'select' | 'conductor' | 'rod' | 'mesh' | 'profile' | AreaTool;
export const TOOLS: readonly Tool[] = [
  ...(['select', 'conductor', 'rod', 'mesh', 'profile'] as const),
  ...(['touch area', 'step area', 'covered area'] as const),
];

export interface ToolState {
  readonly tool: Tool;
  /** points taken so far */
  readonly taken: readonly Point[];
}

/** What a tool draws when it has its points. */
export type Drawn =
  | { readonly kind: 'conductor'; readonly from: Point; readonly to: Point }
  | { readonly kind: 'rod'; readonly at: Point }
  | { readonly kind: 'mesh'; readonly from: Point; readonly to: Point }
  | { readonly kind: 'profile'; readonly from: Point; readonly to: Point }
  | { readonly kind: 'area'; readonly area: AreaKind; readonly corners: readonly Point[] };

export interface Taking {
  readonly state: ToolState;
  readonly drawn: Drawn | undefined;
}

/** Corners of an area, at least. */
const LEAST_CORNERS = 3;

export function hold(tool: Tool): ToolState {
  return { tool, taken: [] };
}

/** Gives a tool one more point; a point on the one before it is none. */
export function take(state: ToolState, at: Point): Taking {
  const { tool, taken } = state;
  const last = taken.at(-1);
  const again = last !== undefined && last[0] === at[0] && last[1] === at[1];
  const more: ToolState = { tool, taken: [...taken, at] };
  switch (tool) {
    case 'select':
      return { state, drawn: undefined };
    case 'rod':
      return { state, drawn: { kind: 'rod', at } };
    case 'conductor':
      if (last === undefined) return { state: more, drawn: undefined };
      // the next conductor begins where this one ends
      return again
        ? { state, drawn: undefined }
        : { state: { tool, taken: [at] }, drawn: { kind: tool, from: last, to: at } };
    case 'mesh':
    case 'profile':
      if (last === undefined) return { state: more, drawn: undefined };
      if (again || (tool === 'mesh' && (last[0] === at[0] || last[1] === at[1])))
        return { state, drawn: undefined };
      return { state: hold(tool), drawn: { kind: tool, from: last, to: at } };
    case 'touch area':
    case 'step area':
    case 'covered area': {
      const [first] = taken;
      const closes = first !== undefined && first[0] === at[0] && first[1] === at[1];
      return closes ? close(state) : { state: again ? state : more, drawn: undefined };
    }
  }
}

const AREA_OF: Readonly<Partial<Record<Tool, AreaKind>>> = {
  'touch area': 'touch',
  'step area': 'step',
  'covered area': 'covering',
};

/** Ends what is being drawn: an area with enough corners is closed, anything else is dropped. */
export function close({ tool, taken }: ToolState): Taking {
  const area = AREA_OF[tool];
  const enough = area !== undefined && taken.length >= LEAST_CORNERS;
  return { state: hold(tool), drawn: enough ? { kind: 'area', area, corners: taken } : undefined };
}
