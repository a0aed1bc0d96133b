// Laws of the way from ground to screen: back and forth, zoom about a place, pan, the whole plan in the window.
import type { Point } from '@ohmstead/study';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  centred,
  fitView,
  groundTransform,
  panned,
  type Size,
  toGround,
  toScreen,
  type View,
  zoomed,
} from '../../../src/plan/view.ts';

const metres = fc.double({ min: -5000, max: 5000, noNaN: true });
const pixels = fc.integer({ min: 0, max: 1500 });
const views: fc.Arbitrary<View> = fc.record({
  x: metres,
  y: metres,
  scale: fc.double({ min: 0.1, max: 400, noNaN: true }),
});
const sizes: fc.Arbitrary<Size> = fc.record({
  width: fc.integer({ min: 200, max: 2000 }),
  height: fc.integer({ min: 200, max: 2000 }),
});
/** Far below a pixel: what arithmetic at 5 km and 400 pixels a metre leaves. */
const PIXEL_DIGITS = 6;

function expectNear(a: Point, b: Point): void {
  expect(a[0]).toBeCloseTo(b[0], PIXEL_DIGITS);
  expect(a[1]).toBeCloseTo(b[1], PIXEL_DIGITS);
}

describe('view', () => {
  test('what goes to the screen comes back to its place', () => {
    fc.assert(
      fc.property(views, sizes, pixels, pixels, (view, size, px, py) => {
        expectNear(toScreen(view, size, toGround(view, size, [px, py])), [px, py]);
      }),
    );
  });

  test('north is up and east is right', () => {
    const view: View = { x: 0, y: 0, scale: 10 };
    const size: Size = { width: 400, height: 200 };
    expect(toScreen(view, size, [0, 0])).toEqual([200, 100]);
    expect(toScreen(view, size, [3, 2])).toEqual([230, 80]);
  });

  test('a zoom keeps the ground under the pointer', () => {
    fc.assert(
      fc.property(views, sizes, pixels, pixels, fc.double({ min: 0.1, max: 10, noNaN: true }), (...of) => {
        const [view, size, px, py, factor] = of;
        const place = toGround(view, size, [px, py]);
        expectNear(toScreen(zoomed(view, size, [px, py], factor), size, place), [px, py]);
      }),
    );
  });

  test('a zoom there and back is none, between the least and the most', () => {
    const view: View = { x: 3, y: -4, scale: 10 };
    const size: Size = { width: 400, height: 200 };
    const back = zoomed(zoomed(view, size, [10, 20], 2.5), size, [10, 20], 1 / 2.5);
    expectNear([back.x, back.y], [view.x, view.y]);
    expect(back.scale).toBeCloseTo(view.scale, 12);
    expect(zoomed(view, size, [0, 0], 1e9).scale).toBe(1000);
    expect(zoomed(view, size, [0, 0], 1e-9).scale).toBe(0.02);
  });

  test('a pan takes every place along by its pixels', () => {
    fc.assert(
      fc.property(views, sizes, metres, metres, (view, size, x, y) => {
        const [px, py] = toScreen(view, size, [x, y]);
        expectNear(toScreen(panned(view, 17, -9), size, [x, y]), [px + 17, py - 9]);
      }),
    );
  });

  test('the whole plan lies in the window, its middle in the middle', () => {
    fc.assert(
      fc.property(sizes, fc.double({ min: 1, max: 900, noNaN: true }), (size, side) => {
        const view = fitView({ x: [-side, side * 2], y: [5, 5 + side] }, size);
        const corners: readonly Point[] = [
          [-side, 5],
          [side * 2, 5 + side],
        ];
        for (const corner of corners) {
          const [px, py] = toScreen(view, size, corner);
          expect(px).toBeGreaterThanOrEqual(0);
          expect(px).toBeLessThanOrEqual(size.width);
          expect(py).toBeGreaterThanOrEqual(0);
          expect(py).toBeLessThanOrEqual(size.height);
        }
        expectNear(toScreen(view, size, [side / 2, 5 + side / 2]), [size.width / 2, size.height / 2]);
      }),
    );
  });

  test('a place that the reader is taken to lies in the middle, large enough and never smaller than before', () => {
    const size: Size = { width: 300, height: 300 };
    const taken = centred({ x: 0, y: 0, scale: 2 }, [7, 8], 24);
    expect(taken).toEqual({ x: 7, y: 8, scale: 24 });
    expect(centred({ x: 0, y: 0, scale: 60 }, [7, 8], 24).scale).toBe(60);
    expect(toScreen(taken, size, [7, 8])).toEqual([150, 150]);
  });

  test('the transform of a group is the same way to the screen', () => {
    const view: View = { x: 12, y: -7, scale: 8 };
    const size: Size = { width: 640, height: 480 };
    const numbers = [...groundTransform(view, size).matchAll(/-?[\d.]+/g)].map(([text]) => Number(text));
    const [tx, ty, sx, sy, ux, uy] = numbers as [number, number, number, number, number, number];
    expect([tx + sx * (20 + ux), ty + sy * (3 + uy)]).toEqual(toScreen(view, size, [20, 3]));
  });
});
