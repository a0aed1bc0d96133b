// A crew: answers go to whoever asked, losses are told, ended helpers are started anew.
import { deserialize, serialize } from 'node:v8';
import { describe, expect, it } from 'vitest';
import { type Crew, HelperLost, movable, type Task } from '../../src/crew/crew.ts';
import { crewOf, type HelperHearing } from '../../src/crew/helpers.ts';
import { type Said, work, workshop } from '../../src/crew/workshop.ts';

const ADD: Task<{ readonly of: readonly number[] }, number> = { name: 'add' };
const DOUBLE: Task<Float64Array, Float64Array> = { name: 'double' };
const REFUSE: Task<string, never> = { name: 'refuse' };
const works = [
  work(ADD, ({ of }) => ({ output: of.reduce((sum, one) => sum + one, 0) })),
  work(DOUBLE, (given) => {
    const output = given.map((one) => 2 * one);
    return { output, moved: movable(output) };
  }),
  work(REFUSE, (word: string): { output: never } => {
    throw new RangeError(`no ${word}`);
  }),
];

/** A message as another thread gets it. */
const copied = (message: unknown): ReturnType<typeof deserialize> => deserialize(serialize(message));

interface Slow {
  readonly crew: Crew;
  /** answers what was asked since */
  answer(): void;
  readonly hearings: HelperHearing[];
  ended: number;
}

/** Helpers that answer when told to. */
function slowCrew(size: number): Slow {
  const due: (() => void)[] = [];
  const slow: Slow = {
    crew: crewOf(size, {
      shared: false,
      start(hear) {
        slow.hearings.push(hear);
        const told: Said[] = [];
        const take = workshop(works, (said) => told.push(copied(said)));
        return {
          post: (order) =>
            void due.push(() => {
              take(copied(order));
              hear.said(told.shift()!);
            }),
          end: () => void slow.ended++,
        };
      },
    }),
    answer: () => {
      for (const act of due.splice(0)) act();
    },
    hearings: [],
    ended: 0,
  };
  return slow;
}

describe('a crew', () => {
  it('starts a helper when it is first asked, and hands each answer to whoever asked', async () => {
    const slow = slowCrew(2);
    const [one, other] = slow.crew.hands();
    expect(slow.hearings.length).toBe(0);
    const asked = [
      one!.ask(ADD, { of: [1, 2] }),
      one!.ask(ADD, { of: [3, 4] }),
      one!.ask(DOUBLE, Float64Array.of(5)),
    ];
    expect(slow.hearings.length).toBe(1);
    const last = other!.ask(ADD, { of: [7] });
    expect(slow.hearings.length).toBe(2);
    slow.answer();
    expect(await Promise.all([...asked, last])).toEqual([3, 7, Float64Array.of(10), 7]);
  });

  it('tells a failed task to its asker alone; the helper goes on', async () => {
    const slow = slowCrew(1);
    const [hand] = slow.crew.hands();
    const refused = hand!.ask(REFUSE, 'bread');
    const sum = hand!.ask(ADD, { of: [1] });
    slow.answer();
    await expect(refused).rejects.toThrow(new HelperLost('no bread'));
    expect(await sum).toBe(1);
    const unknown = hand!.ask({ name: 'sing' }, null);
    slow.answer();
    await expect(unknown).rejects.toThrow('no such task: sing');
  });

  it('gives up all that a broken helper was asked, and asks it no more until the crew was ended', async () => {
    const slow = slowCrew(1);
    const asked = slow.crew
      .hands()
      .flatMap((hand) => [hand.ask(ADD, { of: [1] }), hand.ask(ADD, { of: [2] })]);
    slow.hearings[0]!.broken('out of memory');
    for (const one of asked) await expect(one).rejects.toThrow(HelperLost);
    await expect(slow.crew.hands()[0]!.ask(ADD, { of: [1] })).rejects.toThrow('out of memory');
    expect([slow.hearings.length, slow.ended]).toEqual([1, 1]);
    slow.crew.end();
    const again = slow.crew.hands()[0]!.ask(ADD, { of: [1] });
    slow.answer();
    expect(await again).toBe(1);
    expect(slow.hearings.length).toBe(2);
  });

  it('does not hear a helper that was ended', async () => {
    const slow = slowCrew(1);
    const before = slow.crew.hands()[0]!.ask(ADD, { of: [1] });
    slow.crew.end();
    await expect(before).rejects.toThrow(HelperLost);
    const after = slow.crew.hands()[0]!.ask(ADD, { of: [2] });
    slow.answer();
    expect(await after).toBe(2);
  });

  it('refuses hands of a job before', async () => {
    const slow = slowCrew(1);
    const [old] = slow.crew.hands();
    slow.crew.hands();
    await expect(old!.ask(ADD, { of: [1] })).rejects.toThrow(HelperLost);
    expect(slow.hearings.length).toBe(0);
  });

  it('waits for helpers that were asked until they are under way', async () => {
    const events: string[] = [];
    let begin = (): void => {};
    const underWay = new Promise<void>((done) => {
      begin = done;
    });
    const crew = crewOf(2, { shared: false, start: () => ({ underWay, post: () => {}, end: () => {} }) });
    await crew.underWay();
    const asked = crew.hands()[0]!.ask(ADD, { of: [1] });
    const waited = crew.underWay().then(() => events.push('under way'));
    // every promise that can be kept by now is
    await new Promise((turn) => setImmediate(turn));
    events.push('begun');
    begin();
    await waited;
    expect(events).toEqual(['begun', 'under way']);
    crew.end();
    await expect(asked).rejects.toThrow(HelperLost);
  });

  it('has shared memory where the platform has', () => {
    const shared = crewOf(0, { shared: true, start: () => ({ post: () => {}, end: () => {} }) });
    expect(shared.doubles(3).buffer).toBeInstanceOf(SharedArrayBuffer);
    expect(movable(shared.doubles(3))).toEqual([]);
    expect(movable(slowCrew(0).crew.doubles(3)).length).toBe(1);
  });
});
