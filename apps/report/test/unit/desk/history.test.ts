// Laws of undo and redo, runs of edits, and the limits of what is kept.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type Draft, withFile } from '../../../src/desk/draft.ts';
import {
  beginHistory,
  commit,
  endRun,
  type History,
  MOST_BYTES,
  MOST_STEPS,
  redo,
  redoLabel,
  undo,
  undoLabel,
} from '../../../src/desk/history.ts';
import { setValue } from '../../../src/desk/set-value.ts';
import { small } from './drafts.ts';

const start = small();
const titled = (title: string): Draft => setValue(start, ['title'], title);

function drafts(history: History): readonly Draft[] {
  return [...history.past, history.present, ...history.future].map(({ draft }) => draft);
}

describe('history', () => {
  test('undo and redo go back and forth, each told in words', () => {
    const one = commit(beginHistory(start, 'opened'), titled('A'), 'title set to A');
    const two = commit(one, titled('B'), 'title set to B');
    expect([undoLabel(two), redoLabel(two)]).toEqual(['title set to B', undefined]);
    const back = undo(undo(two));
    expect(back.present.draft).toBe(start);
    expect([undoLabel(back), redoLabel(back)]).toEqual([undefined, 'title set to A']);
    expect(redo(redo(back)).present.draft).toBe(two.present.draft);
    expect(undo(back)).toBe(back);
    expect(redo(two)).toBe(two);
  });

  test('a new edit forgets what was undone', () => {
    const one = commit(beginHistory(start, 'opened'), titled('A'), 'A');
    const other = commit(undo(one), titled('B'), 'B');
    expect(other.future).toEqual([]);
    expect(undo(other).present.draft).toBe(start);
  });

  test('an edit that changes nothing is no step', () => {
    const one = commit(beginHistory(start, 'opened'), titled('A'), 'A');
    expect(commit(one, titled('A'), 'A again')).toBe(one);
  });

  test('consecutive edits of one field are one step, until the field is left', () => {
    let history = beginHistory(start, 'opened');
    for (const title of ['A', 'AB', 'ABC'])
      history = commit(history, titled(title), `title ${title}`, 'title');
    expect([history.past.length, undoLabel(history)]).toEqual([1, 'title ABC']);
    expect(undo(history).present.draft).toBe(start);
    const apart = commit(endRun(history), titled('ABCD'), 'title ABCD', 'title');
    expect(apart.past.length).toBe(2);
    const other = commit(history, setValue(titled('ABC'), ['version'], 2), 'version', 'version');
    expect(other.past.length).toBe(2);
  });

  test('a run that ends where it began leaves no step, and does not reopen the step before', () => {
    const one = commit(beginHistory(start, 'opened'), titled('A'), 'A', 'title');
    const run = commit(endRun(one), titled('B'), 'B', 'title');
    const back = commit(run, titled('A'), 'A', 'title');
    expect([back.past.length, back.present.label]).toEqual([1, 'A']);
    expect(commit(back, titled('C'), 'C', 'title').past.length).toBe(2);
  });

  test('nor does it let the step before go on', () => {
    const one = commit(beginHistory(start, 'opened'), titled('A'), 'A', 'title');
    const other = commit(one, setValue(titled('A'), ['version'], 2), 'version', 'version');
    const back = commit(other, titled('A'), 'version', 'version');
    expect(commit(back, titled('B'), 'B', 'title').past.length).toBe(2);
  });

  test('after undo a run does not go on', () => {
    let history = commit(beginHistory(start, 'opened'), titled('A'), 'A', 'title');
    history = commit(history, setValue(titled('A'), ['version'], 2), 'version', 'version');
    expect(commit(undo(history), titled('B'), 'B', 'title').past.length).toBe(2);
    const again = redo(undo(commit(beginHistory(start, 'opened'), titled('A'), 'A', 'title')));
    expect(commit(again, titled('B'), 'B', 'title').past.length).toBe(2);
  });

  test('the oldest steps go first, by number and by bytes', () => {
    let history = beginHistory(start, 'opened');
    for (let i = 0; i <= MOST_STEPS; i++) history = commit(history, titled(`${i}`), `${i}`);
    expect([history.past.length, history.past[0]?.label]).toEqual([MOST_STEPS, '0']);
    let heavy = beginHistory(start, 'opened');
    const size = MOST_BYTES / 4;
    for (let i = 0; i < 6; i++) {
      const bytes = new Uint8Array(size);
      bytes[0] = i;
      heavy = commit(heavy, withFile(start, 'conductors.csv', bytes), `${i}`);
    }
    expect(heavy.past.length).toBe(2);
    expect(heavy.present.label).toBe('5');
  });

  test('files that no edit touched are shared by every step', () => {
    let history = beginHistory(start, 'opened');
    for (let i = 0; i < 20; i++) history = commit(history, titled(`${i}`), `${i}`);
    expect(new Set(drafts(history).map(({ files }) => files.get('conductors.csv'))).size).toBe(1);
  });

  test('undo after any edit, and redo after any undo, give back the very draft', () => {
    const action = fc.oneof(
      fc.record({ kind: fc.constant('edit' as const), title: fc.constantFrom('A', 'B', 'C') }),
      fc.record({ kind: fc.constantFrom('undo' as const, 'redo' as const) }),
    );
    fc.assert(
      fc.property(fc.array(action, { maxLength: 30 }), (actions) => {
        let history = beginHistory(start, 'opened');
        for (const one of actions) {
          const before = history;
          if (one.kind === 'edit') {
            history = commit(history, titled(one.title), one.title);
            if (history !== before) expect(undo(history).present.draft).toBe(before.present.draft);
          } else if (one.kind === 'undo') {
            history = undo(history);
            if (history !== before) expect(redo(history).present.draft).toBe(before.present.draft);
          } else {
            history = redo(history);
            if (history !== before) expect(undo(history).present.draft).toBe(before.present.draft);
          }
        }
      }),
      { seed: 20_240_608 },
    );
  });
});
