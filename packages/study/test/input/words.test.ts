// The small words of messages: shortened values, near names, sorted faults.
import { describe, expect, test } from 'vitest';
import type { Fault } from '../../src/fault.ts';
import { orderedFaults } from '../../src/input/fault-order.ts';
import { placeOf } from '../../src/input/json-value.ts';
import { nearestName } from '../../src/input/nearest-name.ts';
import { figure, invisibleCharacter, listed, shown } from '../../src/input/shown-value.ts';

describe('shown', () => {
  test.each([
    ['abc', 'abc'],
    ['', '(empty)'],
    ['x'.repeat(40), 'x'.repeat(40)],
    ['x'.repeat(41), `${'x'.repeat(40)}…`],
    ['\u{1f600}'.repeat(41), `${'\u{1f600}'.repeat(40)}…`],
    ['a\u0000b', 'a<U+0000>b'],
    ['\u202e', '<U+202E>'],
    ['\ud800', '<U+D800>'],
  ])('%j is shown as %j', (text, expected) => {
    expect(shown(text)).toBe(expected);
  });

  test('only what cannot be seen is invisible', () => {
    expect(invisibleCharacter('ROD-NE <b> =1+1 Ω Größe')).toBeUndefined();
    expect(invisibleCharacter('a\u2028')).toBe('U+2028');
    expect(invisibleCharacter('a\ufffe')).toBe('U+FFFE');
  });

  test('limits and lists read as people write them', () => {
    expect([0.03, 1000, 1e5, -1e8, 1e-5].map(figure)).toEqual(['0.03', '1000', '1e5', '-1e8', '0.00001']);
    expect([[], ['a'], ['a', 'b'], ['a', 'b', 'c']].map(listed)).toEqual(['', 'a', 'a and b', 'a, b and c']);
  });
});

describe('nearestName', () => {
  const known = ['x1_m', 'depth1_m', 'diameter_mm', 'electrode', 'insulated'];
  test.each([
    ['X1_M', 'x1_m'],
    ['diametre_mm', 'diameter_mm'],
    ['electrod', 'electrode'],
    ['depth_m', 'depth1_m'],
    ['z1_m', undefined],
    ['layer', undefined],
  ])('%s means %s', (name, meant) => {
    expect(nearestName(name, known)).toBe(meant);
  });
});

test('names of a page in length are not compared', () => {
  expect(nearestName('y'.repeat(100), ['y'.repeat(100)])).toBeUndefined();
});

test('places are paths as people write them, odd and endless keys in quotation marks', () => {
  expect(placeOf(placeOf('cases', 0), 'duration_s')).toBe('cases[0].duration_s');
  expect(placeOf('', 'odd key')).toBe('["odd key"]');
  expect(placeOf('soil', 'k'.repeat(50))).toBe(`soil["${'k'.repeat(40)}…"]`);
});

describe('orderedFaults', () => {
  test('counts the unknown keys and the items of a list beyond the first 200', () => {
    const faults = Array.from({ length: 500 }, (_, i): readonly Fault[] => [
      { file: 'study.json', line: 1, place: `k${i}`, code: 'unknown-key', message: 'unknown' },
      { file: 'study.json', line: 2, place: `cases[${i}].name`, code: 'kind', message: 'no name' },
      { file: 'study.json', line: 2, place: 'title', code: 'kind', message: 'no title' },
    ]);
    const told = orderedFaults(faults.flat().slice(0, 1202), 'study.json').map(({ message }) => message);
    expect(told.filter((message) => message === 'unknown')).toHaveLength(200);
    expect(told.filter((message) => message === 'no name')).toHaveLength(200);
    expect(told.filter((message) => message === 'no title')).toHaveLength(200);
    const rest = (count: number): string => `from here on ${count} more faults of this kind, not listed`;
    expect(told.filter((message) => message.startsWith('from'))).toEqual([rest(201), rest(201), rest(200)]);
  });

  const fault = (file: string, line: number | undefined, message: string): Fault => {
    return { file, ...(line === undefined ? {} : { line }), code: 'x', message };
  };

  test('sorts by file and line, the named file first, and keeps the order within a line', () => {
    const faults = [
      fault('b.csv', 10, '5'),
      fault('a.csv', 9, '4'),
      fault('a.csv', 2, '3'),
      fault('z.json', 3, '1'),
      fault('a.csv', undefined, '2'),
      fault('z.json', 3, '1b'),
    ];
    expect(orderedFaults(faults, 'z.json').map(({ message }) => message)).toEqual([
      '1',
      '1b',
      '2',
      '3',
      '4',
      '5',
    ]);
  });
});
