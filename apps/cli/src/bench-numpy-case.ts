// Writes a case for the numpy scripts: segments, nodes, and the image list of the layer that holds the metal.
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { type BenchSystem, ownImages } from './bench-system.ts';

/** Does some work with the path of the case's file, then removes it. */
export async function withNumpyCase<T>(system: BenchSystem, work: (path: string) => Promise<T>): Promise<T> {
  const folder = mkdtempSync(join(tmpdir(), 'ohmstead-bench-'));
  try {
    const path = join(folder, 'case.json');
    writeFileSync(path, JSON.stringify(numpyCase(system)));
    return await work(path);
  } finally {
    rmSync(folder, { recursive: true });
  }
}

/** Lengths in metres, depth downward; coordinates three a point. */
export function numpyCase({ mesh, shared }: BenchSystem): Record<string, number | number[]> {
  const list = ownImages(mesh, shared);
  const points = (x: Float64Array, y: Float64Array, z: Float64Array): number[] =>
    Array.from(x).flatMap((at, i) => [at, y[i]!, z[i]!]);
  return {
    p1: points(mesh.x1, mesh.y1, mesh.z1),
    p2: points(mesh.x2, mesh.y2, mesh.z2),
    radius: [...mesh.radius],
    node1: [...mesh.node1],
    node2: [...mesh.node2],
    nodes: points(mesh.nodeX, mesh.nodeY, mesh.nodeZ),
    factor: list.factor,
    weight: [...list.weight],
    sign: [...list.sign],
    offset: [...list.offset],
  };
}
