// The reference for entries agrees with closed forms, and the cut series with the sum it stands for.
import { expect, test } from 'vitest';
import { referenceEntry } from '../src/bench-reference.ts';
import { twoLayerSeries } from '../src/bench-series.ts';
import { benchSystem, ownImages } from '../src/bench-system.ts';

const { mesh, images, shared } = benchSystem(2, 'two layers');
const own = { ...twoLayerSeries(4 * Math.PI, 4 * Math.PI, 2), factor: 1, count: 1 };

test('a segment with itself: (2/L²)[L·asinh(L/a) − √(L² + a²) + a]', () => {
  const [length, radius] = [mesh.length[0]!, mesh.radius[0]!];
  const closed =
    (2 / length ** 2) *
    (length * Math.asinh(length / radius) - Math.sqrt(length ** 2 + radius ** 2) + radius);
  expect(referenceEntry(mesh, 0, 0, own) / closed).toBeCloseTo(1, 11);
});

test('touching and far entries are the same seen from either segment', () => {
  const list = ownImages(mesh, images);
  for (const other of [1, 2, 5, mesh.count - 1]) {
    const there = referenceEntry(mesh, 0, other, list);
    expect(referenceEntry(mesh, other, 0, list) / there).toBeCloseTo(1, 10);
  }
});

test('the cut series has 26 images, whose sum far away is that of the whole series but for its rest', () => {
  const series = ownImages(mesh, shared);
  expect(series.count).toBe(26);
  // all at one place: (1 + 2 Σ Kⁿ + …) tends to 2(1 + K)/(1 − K), K = 1/2; the rest beyond n = 8 is 4 K⁹/(1 − K)
  const sum = series.weight.reduce((total, weight) => total + weight, 0);
  expect(sum).toBeCloseTo(6 - (4 * 0.5 ** 9) / 0.5, 12);
});

test('the cut series stays within a few thousandths of the images a study fits', () => {
  const ratio =
    referenceEntry(mesh, 0, mesh.count - 1, ownImages(mesh, shared)) /
    referenceEntry(mesh, 0, mesh.count - 1, ownImages(mesh, images));
  expect(Math.abs(ratio - 1)).toBeLessThan(3e-3);
  expect(Math.abs(ratio - 1)).toBeGreaterThan(1e-5);
});
