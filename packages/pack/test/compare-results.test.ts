// Results compared number by number.
import { expect, test } from 'vitest';
import { compareResults, SAME_NUMBER_TOLERANCE } from '../src/compare-results.ts';

test('equal results agree to the last bit', () => {
  const results = { a: 1.5, list: [{ x: 0.1 }, { x: 2 }], name: 'n', none: null };
  expect(compareResults(results, structuredClone(results))).toEqual({
    differences: [],
    numbers: 3,
    exact: 3,
    close: 0,
  });
});

test('each differing path is told with both values', () => {
  const stored = { cases: [{ touch: { worst_V: 980, within_limit: true } }], title: 'A', old: 1 };
  const computed = { cases: [{ touch: { worst_V: 981, within_limit: false } }], title: 'A', fresh: [1] };
  expect(compareResults(stored, computed).differences).toEqual([
    { kind: 'result', path: 'cases[0].touch.worst_V', stored: '980', computed: '981' },
    { kind: 'result', path: 'cases[0].touch.within_limit', stored: 'true', computed: 'false' },
    { kind: 'result', path: 'old', stored: '1', computed: 'nothing' },
    { kind: 'result', path: 'fresh', stored: 'nothing', computed: 'a list of 1' },
  ]);
});

test('lists of different length, and a list in place of an object', () => {
  expect(compareResults({ a: [1, 2] }, { a: [1] }).differences).toHaveLength(1);
  expect(compareResults({ a: [1] }, { a: { 0: 1 } }).differences).toHaveLength(1);
});

test('the tolerance is relative above 1 and absolute below', () => {
  const near = 0.5 * SAME_NUMBER_TOLERANCE;
  const far = 2 * SAME_NUMBER_TOLERANCE;
  expect(compareResults({ a: 1000 }, { a: 1000 * (1 + near) })).toMatchObject({ differences: [], close: 1 });
  expect(compareResults({ a: 1000 }, { a: 1000 * (1 + far) }).differences).toHaveLength(1);
  expect(compareResults({ residual: 1e-14 }, { residual: 3e-13 })).toMatchObject({
    differences: [],
    close: 1,
  });
  expect(compareResults({ a: 0 }, { a: far }).differences).toHaveLength(1);
});

test('inherited names are not taken for values', () => {
  expect(compareResults(JSON.parse('{"__proto__": 1}'), {}).differences).toHaveLength(1);
  expect(compareResults({ toString: 1 }, {}).differences).toHaveLength(1);
});

test('a hostile value makes no long message', () => {
  const [difference] = compareResults({ a: 'x'.repeat(1e5) }, { a: 1 }).differences;
  expect(difference).toMatchObject({ path: 'a', computed: '1' });
  expect(JSON.stringify(difference).length).toBeLessThan(300);
});
