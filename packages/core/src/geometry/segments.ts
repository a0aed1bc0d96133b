// The mesh: short straight segments that leak evenly, between nodes of the metal; struct of arrays in SI units.

/** Shapes: per segment [count], per node [nodeCount]. Depths positive downward, m. */
export interface SegmentMesh {
  readonly count: number;
  readonly x1: Float64Array;
  readonly y1: Float64Array;
  readonly z1: Float64Array;
  readonly x2: Float64Array;
  readonly y2: Float64Array;
  readonly z2: Float64Array;
  readonly length: Float64Array;
  readonly radius: Float64Array;
  /** soil layer that holds the segment */
  readonly layer: Int32Array;
  /** 0 where an insulating jacket keeps the current in */
  readonly leaking: Uint8Array;
  /** row of the conductor table */
  readonly conductor: Int32Array;
  readonly node1: Int32Array;
  readonly node2: Int32Array;
  readonly nodeCount: number;
  readonly nodeX: Float64Array;
  readonly nodeY: Float64Array;
  readonly nodeZ: Float64Array;
  /** metallically joined piece of metal that the node belongs to */
  readonly nodeComponent: Int32Array;
  readonly componentCount: number;
}
