// Arms run in turns, and one that is too slow sits out.
import { expect, test } from 'vitest';
import { type Arm, figures, inTurns } from '../src/bench-rounds.ts';

function counting(name: string, order: string[], atMost?: number): Arm {
  let runs = 0;
  return {
    name,
    ...(atMost === undefined ? {} : { atMost }),
    run: async () => {
      order.push(name);
      runs++;
      return { wallMs: runs, cpuMs: 10 * runs, resistance: 1 };
    },
  };
}

test('rounds go A B C A B C, and an arm held to one round sits out the rest', async () => {
  const order: string[] = [];
  const told: string[] = [];
  const arms = [counting('a', order), counting('b', order, 1), counting('c', order)];
  const rounds = await inTurns(arms, 3, (text) => told.push(text));
  expect(order.join('')).toBe('abcacac');
  expect(figures(rounds, 'a', (run) => run.wallMs)).toEqual([1, 2, 3]);
  expect(figures(rounds, 'b', (run) => run.cpuMs)).toEqual([10, undefined, undefined]);
  expect(told[0]).toBe('round 1 of 3: a');
  expect(told).toHaveLength(7);
});

test('an arm that is not there has no figures', async () => {
  expect(figures(await inTurns([], 2, () => {}), 'a', (run) => run.wallMs)).toEqual([]);
});
