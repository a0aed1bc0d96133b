// Finds import cycles: groups of files each of which reaches all others of its group (Tarjan's algorithm).

/**
 * @param {ReadonlyMap<string, readonly string[]>} edges file → files it imports
 * @returns {string[][]} each group with a cycle in it, sorted
 */
export function cycles(edges) {
  const order = new Map();
  const low = new Map();
  const path = [];
  const onPath = new Set();
  const found = [];
  const visit = (file) => {
    order.set(file, order.size);
    low.set(file, order.get(file));
    path.push(file);
    onPath.add(file);
    for (const next of edges.get(file) ?? []) {
      if (!order.has(next)) visit(next);
      if (onPath.has(next)) low.set(file, Math.min(low.get(file), low.get(next)));
    }
    if (low.get(file) !== order.get(file)) return;
    const group = path.splice(path.indexOf(file));
    for (const member of group) onPath.delete(member);
    if (group.length > 1 || edges.get(file)?.includes(file)) found.push(group.sort());
  };
  for (const file of edges.keys()) if (!order.has(file)) visit(file);
  return found.sort((a, b) => (a[0] < b[0] ? -1 : 1));
}
