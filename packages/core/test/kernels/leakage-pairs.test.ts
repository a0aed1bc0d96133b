// Single entries by the compiled kernel: against its plain twin over all kinds of pairs, and against integration at awkward places.
import { afterEach, describe, expect, it } from 'vitest';
import { useKernels } from '../../src/kernels/instance.ts';
import { leakageBlocks } from '../../src/leakage/leakage-matrix.ts';
import { soilImages } from '../../src/soil/image-list.ts';
import type { SoilModel } from '../../src/soil/soil-model.ts';
import type { Bar } from '../support/electrodes.ts';
import { integratedEntry } from '../support/entry-reference.ts';
import { looseMesh } from '../support/loose-mesh.ts';
import { randomNumbers } from '../support/random.ts';
import { soil } from '../support/soils.ts';

afterEach(() => useKernels(true));

/** The kernel's entries of pairs, then the plain twin's. */
function bothWays(bars: readonly Bar[], model: SoilModel, interfaces: readonly number[], pairs: Int32Array) {
  const mesh = looseMesh(bars, interfaces);
  const images = soilImages(model);
  const [fast, plain] = [true, false].map((on) => {
    useKernels(on);
    const fill = leakageBlocks(mesh, images);
    const [row, column, value] = [new Int32Array(1), new Int32Array(1), new Float64Array(1)];
    return Float64Array.from({ length: pairs.length / 2 }, (_, k) => {
      row[0] = pairs[2 * k]!;
      column[0] = pairs[2 * k + 1]!;
      fill(row, column, value);
      return value[0]!;
    });
  });
  return { mesh, images, fast: fast!, plain: plain! };
}

/** Grid-like, slanting and sloping wires and rods of several depths, from a centimetre to twenty metres, in clusters that touch. */
function everyKind(random: () => number): Bar[] {
  const bars: Bar[] = [];
  const size = (): number => 0.01 * 2000 ** random();
  for (let k = 0; k < 700; k++) {
    const cluster = k % 3 === 0 ? 3 : 80;
    const [x, y] = [cluster * random(), cluster * random()];
    const radius = 0.003 + 0.01 * random();
    const length = size();
    const turn = k % 4 === 0 ? 2 * Math.PI * random() : (Math.PI / 2) * Math.floor(4 * random());
    const [dx, dy] = [length * Math.cos(turn), length * Math.sin(turn)];
    const depth = [0.3, 0.7, 0.7, 2.5][k % 4]!;
    if (k % 10 < 6) bars.push({ from: [x, y, depth], to: [x + dx, y + dy, depth], radius });
    else if (k % 10 < 9) {
      const [top, bottom] = [[0.3, 0.9], [1.2, 3.5], [4.5, 7], [8.5, 8.6]][k % 4]!; // biome-ignore format: one choice
      bars.push({ from: [x, y, top!], to: [x, y, bottom!], radius });
    } else bars.push({ from: [x, y, 1.1 + random()], to: [x + dx, y + dy, 2 + random()], radius });
  }
  return bars;
}

describe('entries by the kernel', () => {
  it.each([
    ['uniform ground', soil([100]), []],
    ['two layers', soil([300, 1], [60]), [1]],
    ['two layers, the lower resistive', soil([50, 4], [2000]), [4]],
    ['four layers', soil([200, 1], [50, 3], [800, 4], [20]), [1, 4, 8]],
  ] as const)(
    'agree with plain code to 1e-12 on 10 000 random pairs of every kind: %s',
    (_, model, interfaces) => {
      const bars = everyKind(randomNumbers(11));
      const random = randomNumbers(29);
      const pairs = Int32Array.from({ length: 20_000 }, () => Math.floor(random() * bars.length));
      const { fast, plain } = bothWays(bars, model, interfaces, pairs);
      const worst = plain.reduce((most, value, k) => Math.max(most, Math.abs(fast[k]! / value - 1)), 0);
      expect(worst).toBeLessThan(1e-12);
      expect(fast).not.toEqual(plain);
    },
  );

  const a = 0.005;
  const bar = (x1: number, y1: number, z1: number, x2: number, y2: number, z2: number): Bar => ({
    from: [x1, y1, z1],
    to: [x2, y2, z2],
    radius: a,
  });
  const awkward: readonly (readonly [string, Bar, Bar])[] = [
    ['one with itself', bar(0, 0, 0.5, 5, 0, 0.5), bar(0, 0, 0.5, 5, 0, 0.5)],
    ['touching end to end', bar(0, 0, 0.5, 5, 0, 0.5), bar(5, 0, 0.5, 10, 0, 0.5)],
    ['in line with a gap', bar(0, 0, 0.5, 5, 0, 0.5), bar(9.5, 0, 0.5, 6, 0, 0.5)],
    ['overlapping in line', bar(0, 0, 0.5, 5, 0, 0.5), bar(3, 0, 0.5, 8, 0, 0.5)],
    ['coincident ends at a right angle', bar(0, 0, 0.5, 5, 0, 0.5), bar(0, 0, 0.5, 0, 5, 0.5)],
    ['crossing in the middle', bar(0, 0, 0.5, 5, 0, 0.5), bar(2.5, -2.5, 0.5, 2.5, 2.5, 0.5)],
    ['crossing askew', bar(0, 0, 0.5, 5, 0, 0.5), bar(1, -1, 0.5, 4, 2, 0.5)],
    ['meeting in mid span', bar(0, 0, 0.5, 5, 0, 0.5), bar(2, 0, 0.5, 2, 3, 0.5)],
    ['parallel at one radius', bar(0, 0, 0.5, 5, 0, 0.5), bar(0, a, 0.5, 5, a, 0.5)],
    ['parallel at one radius, drawn the other way', bar(0, 0, 0.5, 5, 0, 0.5), bar(5, a, 0.5, 0, a, 0.5)],
    ['one over the other', bar(0, 0, 0.5, 5, 0, 0.5), bar(1, 0, 0.8, 6, 0, 0.8)],
    ['nearly parallel', bar(0, 0, 0.5, 5, 0, 0.5), bar(1, 0.2, 0.5, 6, 0.200005, 0.5)],
    ['nearly parallel and touching', bar(0, 0, 0.5, 5, 0, 0.5), bar(5, 0, 0.5, 10, 5e-6, 0.5)],
    ['at the edge of parallel', bar(0, 0, 0.5, 5, 0, 0.5), bar(1, 0.2, 0.5, 6, 0.2 + 6e-7, 0.5)],
    ['a rod under a crossing', bar(0, 0, 0.5, 5, 0, 0.5), bar(2.5, 0, 0.5, 2.5, 0, 3.5)],
    ['a rod under an end', bar(0, 0, 0.5, 5, 0, 0.5), bar(0, 0, 0.5, 0, 0, 3.5)],
    ['one rod below another', bar(0, 0, 0.5, 0, 0, 3.5), bar(0, 0, 3.5, 0, 0, 4.1)],
    ['rods side by side', bar(0, 0, 0.5, 0, 0, 3.5), bar(0.02, 0, 0.5, 0.02, 0, 3.5)],
    ['a slope from an end', bar(0, 0, 0.5, 5, 0, 0.5), bar(5, 0, 0.5, 7, 1, 2)],
    ['a kilometre beside a decimetre', bar(-300, 0, 0.5, 700, 0, 0.5), bar(2, 0.3, 0.5, 2.1, 0.3, 0.5)],
    [
      'a decimetre at the end of a kilometre',
      bar(0, 0, 0.5, 1000, 0, 0.5),
      bar(1000, 0, 0.5, 1000, 0.1, 0.5),
    ],
    ['ten kilometres apart', bar(0, 0, 0.5, 5, 0, 0.5), bar(10_000, 0, 0.5, 10_000, 5, 0.5)],
    ['ten kilometres apart in line', bar(0, 0, 0.5, 1, 0, 0.5), bar(10_000, 0, 0.5, 10_001, 0, 0.5)],
  ];

  it.each(awkward)('equal integration to 1e-9: %s', (_, p, q) => {
    const { mesh, images, fast, plain } = bothWays([p, q], soil([100]), [], Int32Array.of(0, 1, 1, 0));
    const exact = integratedEntry(mesh, images, 0, 1);
    expect(Math.abs(fast[0]! / exact - 1)).toBeLessThan(1e-9);
    expect(Math.abs(plain[0]! / exact - 1)).toBeLessThan(1e-9);
    expect(fast[1]).toBe(fast[0]);
  });

  it.each([
    ['both on the interface', bar(0, 0, 1, 5, 0, 1), bar(5, 0, 1, 5, 4, 1)],
    ['itself on the interface', bar(0, 0, 1, 5, 0, 1), bar(0, 0, 1, 5, 0, 1)],
    ['a rod that begins at the interface', bar(0, 0, 1, 5, 0, 1), bar(2, 0, 1, 2, 0, 4)],
    ['rods that meet at the interface', bar(0, 0, 0.4, 0, 0, 1), bar(0, 0, 1, 0, 0, 4)],
  ] as const)('equal integration to 1e-6 where metal lies in a change of soil: %s', (_, p, q) => {
    for (const model of [soil([100, 1], [2000]), soil([2000, 1], [100])]) {
      const { mesh, images, fast } = bothWays([p, q], model, [1], Int32Array.of(0, 1));
      expect(Math.abs(fast[0]! / integratedEntry(mesh, images, 0, 1) - 1)).toBeLessThan(1e-6);
    }
  });
});
