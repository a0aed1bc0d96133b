// Keeps what was drawn until what it was drawn from is another, so that an edit elsewhere does not draw it anew.
import type { ComponentChildren, VNode } from 'preact';
import { useMemo } from 'preact/hooks';
import { useTurn } from '../desk/use-turn.ts';

/** Room for what a live page has not come to yet. */
const NOTHING: VNode = <div class="not-yet" />;

/**
 * Children as they were last drawn while all of `by` are the same; contexts still reach into them. On a live page each
 * is drawn in a task of its own.
 * @param props.by what the children are drawn from, always as many
 */
export function Kept({ by, children }: { by: readonly unknown[]; children: ComponentChildren }): VNode {
  // the children are new objects each time; `by` tells what they show
  const drawn = useMemo(() => <>{children}</>, [...by]);
  return useTurn(drawn, NOTHING);
}
