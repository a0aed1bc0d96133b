// Which of the things 0 … count−1 belong together, kept as a forest whose roots are the smallest members.

/** Every thing on its own: parent of each, shape [count]. */
export function singletons(count: number): Int32Array {
  return Int32Array.from({ length: count }, (_, i) => i);
}

/** Smallest member of the set that holds `i`; shortens the path on the way (path halving). */
export function rootOf(parent: Int32Array, i: number): number {
  let at = i;
  while (parent[at]! !== at) {
    parent[at] = parent[parent[at]!]!;
    at = parent[at]!;
  }
  return at;
}

/** Puts the sets of `a` and `b` together; the smaller root stays, so the result does not depend on the order of calls. */
export function unite(parent: Int32Array, a: number, b: number): void {
  const rootA = rootOf(parent, a);
  const rootB = rootOf(parent, b);
  if (rootA < rootB) parent[rootB] = rootA;
  else parent[rootA] = rootB;
}
