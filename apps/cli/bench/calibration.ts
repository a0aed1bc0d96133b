// Three loops that tell what this machine and this engine give: f64x2 multiply-add, triad, reciprocal square root.

/**
 * Twelve independent chains of multiply and add, enough to fill two pipes of each at a latency of three cycles:
 * 4 · 12 · rounds operations on doubles.
 * @returns a number that depends on every chain
 */
export function multiplyAdd(rounds: i32): f64 {
  const m = f64x2.splat(0.999999);
  const a = f64x2.splat(0.000001);
  let c0 = f64x2.splat(1.0);
  let c1 = f64x2.splat(1.1);
  let c2 = f64x2.splat(1.2);
  let c3 = f64x2.splat(1.3);
  let c4 = f64x2.splat(1.4);
  let c5 = f64x2.splat(1.5);
  let c6 = f64x2.splat(1.6);
  let c7 = f64x2.splat(1.7);
  let c8 = f64x2.splat(1.8);
  let c9 = f64x2.splat(1.9);
  let c10 = f64x2.splat(2.0);
  let c11 = f64x2.splat(2.1);
  for (let k: i32 = 0; k < rounds; k++) {
    c0 = f64x2.add(f64x2.mul(c0, m), a);
    c1 = f64x2.add(f64x2.mul(c1, m), a);
    c2 = f64x2.add(f64x2.mul(c2, m), a);
    c3 = f64x2.add(f64x2.mul(c3, m), a);
    c4 = f64x2.add(f64x2.mul(c4, m), a);
    c5 = f64x2.add(f64x2.mul(c5, m), a);
    c6 = f64x2.add(f64x2.mul(c6, m), a);
    c7 = f64x2.add(f64x2.mul(c7, m), a);
    c8 = f64x2.add(f64x2.mul(c8, m), a);
    c9 = f64x2.add(f64x2.mul(c9, m), a);
    c10 = f64x2.add(f64x2.mul(c10, m), a);
    c11 = f64x2.add(f64x2.mul(c11, m), a);
  }
  const s0 = f64x2.add(f64x2.add(c0, c1), f64x2.add(c2, c3));
  const s1 = f64x2.add(f64x2.add(c4, c5), f64x2.add(c6, c7));
  const s2 = f64x2.add(f64x2.add(c8, c9), f64x2.add(c10, c11));
  const s = f64x2.add(s0, f64x2.add(s1, s2));
  return f64x2.extract_lane(s, 0) + f64x2.extract_lane(s, 1);
}

/** a = b + 3 c over `count` doubles: 24 bytes each. */
export function triad(a: usize, b: usize, c: usize, count: i32): void {
  const by = f64x2.splat(3);
  const end = (<usize>count) << 3;
  for (let at: usize = 0; at < end; at += 16)
    v128.store(a + at, f64x2.add(v128.load(b + at), f64x2.mul(by, v128.load(c + at))));
}

/** Writes 1/√ of `count` doubles. */
export function reciprocalRoots(from: usize, into: usize, count: i32): void {
  const one = f64x2.splat(1);
  const end = (<usize>count) << 3;
  for (let at: usize = 0; at < end; at += 16)
    v128.store(into + at, f64x2.div(one, f64x2.sqrt(v128.load(from + at))));
}

/** Makes room for `bytes` from address 0; true when it is there. */
export function reserve(bytes: i32): bool {
  const missing = ((bytes + 65535) >> 16) - memory.size();
  return missing <= 0 || memory.grow(missing) >= 0;
}
