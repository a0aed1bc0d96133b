// What each key does on the plan, and which keys it leaves to the page.
import type { Point } from '@ohmstead/study';
import { describe, expect, test } from 'vitest';
import type { Conductor } from '../../../src/desk/conductor.ts';
import { keyDeed, type PlanKeys } from '../../../src/plan/use-plan-keys.ts';
import { conductor } from './items.ts';

/** Deeds told as text. */
function keysOf(told: string[], part: Partial<PlanKeys> = {}): PlanKeys {
  const tell = (text: string) => (): void => {
    told.push(text);
  };
  return {
    gridStep: 0.5,
    cursor: [1, 2],
    middle: [30, 40],
    moveCross: (to) => told.push(`cross ${to}`),
    nudge: undefined,
    remove: undefined,
    copy: undefined,
    paste: (conductors, by) => told.push(`paste ${conductors.map(({ id }) => id)} ${by}`),
    all: tell('all'),
    zoom: (factor) => told.push(`zoom ${factor}`),
    enter: (place, more) => told.push(`enter ${place} ${more}`),
    finish: undefined,
    leave: tell('leave'),
    ...part,
  };
}

interface Held {
  readonly shift?: boolean;
  readonly control?: boolean;
  readonly alt?: boolean;
}

function press(part: Partial<PlanKeys>, key: string, held: Held = {}, clipboard: readonly Conductor[] = []) {
  const told: string[] = [];
  const kept = { current: clipboard };
  const { shift: shiftKey = false, control: ctrlKey = false, alt: altKey = false } = held;
  const deed = keyDeed(keysOf(told, part), { key, shiftKey, ctrlKey, metaKey: false, altKey }, kept);
  deed?.();
  return { told: deed === undefined ? 'left to the page' : told.join(), kept: kept.current };
}

describe('keys', () => {
  test.each([
    ['ArrowLeft', 'cross 0.5,2'],
    ['ArrowRight', 'cross 1.5,2'],
    ['ArrowUp', 'cross 1,2.5'],
    ['ArrowDown', 'cross 1,1.5'],
  ])('%s moves the cross by a step of the grid', (key, told) => {
    expect(press({}, key).told).toBe(told);
  });

  test('arrows with shift go ten times as far, begin in the middle, and without a grid go half a metre', () => {
    expect(press({}, 'ArrowUp', { shift: true }).told).toBe('cross 1,7');
    expect(press({ cursor: undefined }, 'ArrowUp').told).toBe('cross 30,40.5');
    expect(press({ gridStep: 0 }, 'ArrowRight').told).toBe('cross 1.5,2');
  });

  test('arrows move what is chosen', () => {
    const by: Point[] = [];
    press({ nudge: (one) => by.push(one) }, 'ArrowLeft');
    expect(by).toEqual([[-0.5, 0]]);
  });

  test('enter sets or chooses; with shift it ends what is drawn, or chooses one more', () => {
    expect(press({}, 'Enter').told).toBe('enter 1,2 false');
    expect(press({}, 'Enter', { shift: true }).told).toBe('enter 1,2 true');
    let ended = false;
    press(
      {
        finish: () => {
          ended = true;
        },
      },
      'Enter',
      { shift: true },
    );
    expect(ended).toBe(true);
  });

  test('plus and minus enlarge there and back', () => {
    expect([press({}, '+').told, press({}, '=').told, press({}, '-').told]).toEqual([
      'zoom 1.25',
      'zoom 1.25',
      'zoom 0.8',
    ]);
  });

  test('escape leaves; delete is the page\u2019s where nothing is chosen', () => {
    expect(press({}, 'Escape').told).toBe('leave');
    expect(press({}, 'Delete').told).toBe('left to the page');
    let removed = 0;
    const remove = (): void => {
      removed += 1;
    };
    press({ remove }, 'Delete');
    press({ remove }, 'Backspace');
    expect(removed).toBe(2);
  });

  test('control copies, pastes a step aside, and chooses all', () => {
    const own = [conductor('A', 0, 0, 1, 0)];
    expect(press({ copy: () => own }, 'c', { control: true }).kept).toBe(own);
    expect(press({}, 'V', { control: true }, own).told).toBe('paste A 0.5,0.5');
    expect(press({}, 'a', { control: true }).told).toBe('all');
  });

  test.each(['Tab', 'F5', 'x', 'PageDown'])('%s is left to the page', (key) => {
    expect(press({}, key).told).toBe('left to the page');
  });

  test('control without anything to copy or paste, undo, and what is held with alt are left to the page', () => {
    for (const key of ['c', 'v', 'z', 'y', 'ArrowLeft'])
      expect(press({}, key, { control: true }).told).toBe('left to the page');
    expect(press({}, 'ArrowLeft', { alt: true }).told).toBe('left to the page');
  });
});
