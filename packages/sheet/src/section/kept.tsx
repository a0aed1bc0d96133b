// Keeps what was drawn until what it was drawn from is another, so that an edit elsewhere does not draw it anew.
import type { ComponentChildren, VNode } from 'preact';
import { useMemo } from 'preact/hooks';

/**
 * Children as they were last drawn while all of `by` are the same; contexts still reach into them.
 * @param props.by what the children are drawn from, always as many
 */
export function Kept({ by, children }: { by: readonly unknown[]; children: ComponentChildren }): VNode {
  // the children are new objects each time; `by` tells what they show
  return useMemo(() => <>{children}</>, [...by]);
}
