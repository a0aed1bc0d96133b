// The hatch that marks what lies beyond a limit, so that it survives greyscale and colour blindness.
import type { VNode } from 'preact';

/** A pattern of slanting lines; fill with `url(#id)`. */
export function Hatch({ id, spacing = 6.5 }: { id: string; spacing?: number }): VNode {
  return (
    <pattern
      id={id}
      width={spacing}
      height={spacing}
      patternUnits="userSpaceOnUse"
      patternTransform="rotate(45)"
    >
      <rect class="hatch-ground" width={spacing} height={spacing} />
      <line class="hatch-line" x1={spacing / 2} x2={spacing / 2} y1="0" y2={spacing} />
    </pattern>
  );
}
