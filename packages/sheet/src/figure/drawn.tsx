// A path that is left out where there is nothing to draw: an empty attribute would not be well-formed XML.
import type { SVGAttributes, VNode } from 'preact';

/** A path of a figure; nothing at all without path data. */
export function Path(props: SVGAttributes<SVGPathElement> & { readonly d: string }): VNode | null {
  return props.d === '' ? null : <path {...props} />;
}
