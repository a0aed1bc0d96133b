import { describe, expect, it } from 'vitest';
import { nearestNode, nodesReached } from '../../src/field/metal-nearby.ts';
import { joinConductors } from '../../src/geometry/joints.ts';
import { segmentMesh } from '../../src/geometry/segmentation.ts';
import { conductorTable, gridBars, rodBar } from '../support/electrodes.ts';
import { randomNumbers } from '../support/random.ts';

describe('the nearest node of the metal', () => {
  it.each([
    ['a grid with rods', [...gridBars(60, 40, 9, 6, 0.5, 0.005), rodBar(0, 0, 0.5, 6, 0.008)]],
    ['one wire', [{ from: [3, 4, 0.5], to: [50, 4, 0.5], radius: 0.005 }]],
    ['one rod', [rodBar(7, 8, 0, 3, 0.008)]],
  ] as const)('is none farther than any other, the shallowest of a rod: %s', (_, bars) => {
    const table = conductorTable(bars);
    const mesh = segmentMesh(table, joinConductors(table), [], 2);
    const nearest = nearestNode(mesh, 0);
    const random = randomNumbers(3);
    for (let k = 0; k < 2000; k++) {
      const [x, y] = [200 * random() - 60, 200 * random() - 60];
      const node = nearest(x, y);
      const squared = (of: number): number => (mesh.nodeX[of]! - x) ** 2 + (mesh.nodeY[of]! - y) ** 2;
      const nodes = Array.from({ length: mesh.nodeCount }, (_, other) => other);
      expect(squared(node)).toBe(Math.min(...nodes.map(squared)));
      const depths = nodes
        .filter((other) => squared(other) === squared(node))
        .map((other) => mesh.nodeZ[other]!);
      expect(mesh.nodeZ[node]).toBe(Math.min(...depths));
    }
    const grid = { x0: -5, y0: -4, spacing: 3, nx: 4, ny: 3 };
    expect(nodesReached(grid, nearest)[7]).toBe(nearest(-5 + 9, -4 + 3));
  });
});
