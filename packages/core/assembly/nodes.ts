// Mean of the smooth images of two vertical segments from their values at nodes of depth difference and sum.

/** Place and squared distance of the values held, so that a run of pairs between two rods reads the tables once. */
let heldNodes: usize = 0;
let heldSquare: f64 = -1;

/** To be called when the memory was written anew. */
export function forget(): void {
  heldNodes = 0;
}

const FIRST: i64 = 0x3ff0000000000000 >> 49;

/**
 * Σ weights·values at a squared horizontal distance. Nodes: 1/s², their count (even), room for the values, then bin
 * after bin: centre, reciprocal half width, six coefficients of all nodes.
 */
export function nodeMean(nodes: usize, weights: usize, rr: f64): f64 {
  const size = <usize>load<i32>(nodes, 8) << 3;
  const values = nodes + 16;
  if (nodes != heldNodes || rr != heldSquare) {
    heldNodes = nodes;
    heldSquare = rr;
    const y = 1 + rr * load<f64>(nodes);
    const bin = values + size + <usize>((reinterpret<i64>(y) >> 49) - FIRST) * (16 + 6 * size);
    const u = f64x2.splat((y - load<f64>(bin)) * load<f64>(bin, 8));
    for (let n: usize = 0; n < size; n += 16) {
      const c = bin + 16 + n;
      let value = v128.load(c + 5 * size);
      value = f64x2.add(v128.load(c + 4 * size), f64x2.mul(u, value));
      value = f64x2.add(v128.load(c + 3 * size), f64x2.mul(u, value));
      value = f64x2.add(v128.load(c + 2 * size), f64x2.mul(u, value));
      value = f64x2.add(v128.load(c + size), f64x2.mul(u, value));
      value = f64x2.add(v128.load(c), f64x2.mul(u, value));
      v128.store(values + n, value);
    }
  }
  let sum = f64x2.splat(0);
  for (let n: usize = 0; n < size; n += 16) sum = f64x2.add(sum, f64x2.mul(v128.load(values + n), v128.load(weights + n)));
  return f64x2.extract_lane(sum, 0) + f64x2.extract_lane(sum, 1);
}
