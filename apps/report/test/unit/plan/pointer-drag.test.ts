// What pointers that are held do to the view and to what they hold.
import type { Point } from '@ohmstead/study';
import { describe, expect, test } from 'vitest';
import { type Drag, dragStep, pinchOf } from '../../../src/plan/pointer-drag.ts';
import { type Size, toGround, toScreen, type View } from '../../../src/plan/view.ts';

const view: View = { x: 10, y: 5, scale: 20 };
const size: Size = { width: 600, height: 400 };
const held = (at: Point, down: readonly Point[] = [at]) => ({ at, down, free: false });

describe('a drag', () => {
  const press: Drag<string> = { kind: 'pan', begun: [100, 100], last: [100, 100], far: false };

  test('of four pixels is still a click', () => {
    const step = dragStep(press, held([104, 100]), view, size);
    expect(step).toEqual({ drag: press, view });
  });

  test('further takes the ground along from where it was pressed, and goes on from there', () => {
    const place = toGround(view, size, [100, 100]);
    const first = dragStep(press, held([120, 90]), view, size);
    expect(toScreen(first.view, size, place)).toEqual([120, 90]);
    expect(first.drag).toMatchObject({ far: true });
    // back at the beginning it is a drag all the same
    const second = dragStep(first.drag, held([100, 100]), first.view, size);
    expect(second.drag).toMatchObject({ far: true });
    expect(second.view.x).toBeCloseTo(view.x, 12);
  });

  test('of something held leaves the view and tells where the pointer is, once it is far', () => {
    const grip: Drag<string> = {
      kind: 'move',
      grip: 'rod',
      begun: [100, 100],
      from: [0, 0],
      to: [0, 0],
      far: false,
      free: false,
    };
    expect(dragStep(grip, held([102, 101]), view, size).drag).toMatchObject({ far: false });
    const step = dragStep(grip, { ...held([140, 100]), free: true }, view, size);
    expect(step.view).toBe(view);
    expect(step.drag).toMatchObject({ far: true, free: true, to: toGround(view, size, [140, 100]) });
  });

  test('round what is to be chosen ends under the pointer', () => {
    const band: Drag<string> = { kind: 'band', from: [1, 1], to: [1, 1] };
    const step = dragStep(band, held([300, 200]), view, size);
    expect(step.drag).toEqual({ kind: 'band', from: [1, 1], to: [10, 5] });
  });

  test('of two fingers keeps the ground under each of them', () => {
    const [a, b]: [Point, Point] = [
      [200, 200],
      [300, 200],
    ];
    const [toA, toB]: [Point, Point] = [
      [180, 260],
      [380, 260],
    ];
    const step = dragStep<string>(pinchOf(a, b), held(toA, [toA, toB]), view, size);
    expect(step.view.scale).toBeCloseTo(2 * view.scale, 12);
    for (const [from, to] of [
      [a, toA],
      [b, toB],
    ] as const) {
      const [px, py] = toScreen(step.view, size, toGround(view, size, from));
      expect(px).toBeCloseTo(to[0], 9);
      expect(py).toBeCloseTo(to[1], 9);
    }
  });

  test('of two fingers waits where one is gone, and is bounded where they meet', () => {
    const pinch = pinchOf([0, 0], [100, 0]);
    expect(dragStep<string>(pinch, held([5, 5]), view, size)).toEqual({ drag: pinch, view });
    const met = dragStep<string>(
      pinch,
      held(
        [50, 0],
        [
          [50, 0],
          [50, 0],
        ],
      ),
      view,
      size,
    );
    expect(met.view.scale).toBeCloseTo(view.scale / 100, 12);
  });
});
