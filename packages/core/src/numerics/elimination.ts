// The order in which the unknowns of a sparse symmetric matrix are eliminated, and the pattern of the factor that follows.

/** The pattern of L, whatever the entries. */
export interface Elimination {
  readonly size: number;
  /** place k of the elimination holds unknown order[k] */
  readonly order: Int32Array;
  /** place of each unknown */
  readonly place: Int32Array;
  /** column k of L below its diagonal: entries start[k] … start[k + 1] − 1 */
  readonly start: Int32Array;
  /** rows as places, upward in each column */
  readonly row: Int32Array;
}

/**
 * Eliminates the unknowns one by one, always one with the fewest neighbours left (Tinney and Walker, Proc. IEEE 55,
 * 1967, scheme 2).
 * @param rows row of each entry off the diagonal, columns likewise; equal places may come again, in either triangle
 */
export function elimination(size: number, rows: Int32Array, columns: Int32Array): Elimination {
  // few neighbours each, so that looking through lists is quickest
  const graph: number[][] = Array.from({ length: size }, () => []);
  for (let e = 0; e < rows.length; e++) {
    join(graph[rows[e]!]!, columns[e]!);
    join(graph[columns[e]!]!, rows[e]!);
  }
  const queue = degreeQueue(graph);
  const done = new Uint8Array(size);
  const order = new Int32Array(size);
  const start = new Int32Array(size + 1);
  const below: number[] = [];
  for (let k = 0; k < size; k++) {
    const v = queue.next(done);
    done[v] = 1;
    order[k] = v;
    const around = graph[v]!;
    for (const i of around) leave(graph[i]!, v);
    for (let a = 0; a < around.length; a++) {
      below.push(around[a]!);
      for (let b = a + 1; b < around.length; b++) {
        join(graph[around[a]!]!, around[b]!);
        join(graph[around[b]!]!, around[a]!);
      }
    }
    for (const i of around) queue.push(i);
    start[k + 1] = below.length;
  }
  const place = new Int32Array(size);
  for (let k = 0; k < size; k++) place[order[k]!] = k;
  const row = Int32Array.from(below, (unknown) => place[unknown]!);
  for (let k = 0; k < size; k++) row.subarray(start[k], start[k + 1]).sort();
  return { size, order, place, start, row };
}

/** Index of the entry in row `row` of column `column`, both places; it must be there. */
export function entryAt({ start, row }: Elimination, at: number, column: number): number {
  let e = start[column]!;
  while (row[e]! !== at) e++;
  return e;
}

function join(neighbours: number[], other: number): void {
  if (!neighbours.includes(other)) neighbours.push(other);
}

function leave(neighbours: number[], other: number): void {
  const at = neighbours.indexOf(other);
  const last = neighbours.pop()!;
  if (at < neighbours.length) neighbours[at] = last;
}

interface DegreeQueue {
  push(unknown: number): void;
  next(done: Uint8Array): number;
}

/** Unknowns in buckets by degree; stale entries are passed over when they come up. */
function degreeQueue(graph: readonly (readonly number[])[]): DegreeQueue {
  const buckets: number[][] = [];
  let least = 0;
  const push = (unknown: number): void => {
    const degree = graph[unknown]!.length;
    while (buckets.length <= degree) buckets.push([]);
    buckets[degree]!.push(unknown);
    least = Math.min(least, degree);
  };
  for (let i = graph.length - 1; i >= 0; i--) push(i);
  return {
    push,
    next(done) {
      for (;;) {
        const unknown = buckets[least]!.pop();
        if (unknown === undefined) least++;
        else if (done[unknown] === 0 && graph[unknown]!.length === least) return unknown;
      }
    },
  };
}
