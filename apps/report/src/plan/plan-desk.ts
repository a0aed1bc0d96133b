// What the plan works on, lent by the page: apart from what is lent to the sheet, so that choosing draws no section anew.
import type { DisplayUnits, Point, RowOrigin } from '@ohmstead/study';
import { type Context, createContext } from 'preact';
import { useContext } from 'preact/hooks';
import type { Draft } from '../desk/draft.ts';

export interface PlanDesk {
  readonly draft: Draft;
  readonly units: DisplayUnits;
  readonly selected: readonly RowOrigin[];
  readonly select: (rows: readonly RowOrigin[]) => void;
  readonly edit: (edit: { readonly draft: Draft; readonly label: string }) => void;
  /** a place that the reader is taken to, a new object each time */
  readonly goal: { readonly at: Point } | undefined;
  readonly goTo: (x: number, y: number) => void;
}

export const PlanDeskContext: Context<PlanDesk | undefined> = createContext<PlanDesk | undefined>(undefined);

export function usePlanDesk(): PlanDesk {
  const desk = useContext(PlanDeskContext);
  if (desk === undefined) throw new Error('the plan stands on no desk');
  return desk;
}
