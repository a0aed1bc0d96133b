// Cells stand in aligned columns and text breaks between words.
import { expect, test } from 'vitest';
import { aligned, wrapped } from '../src/columns.ts';

test('columns are as wide as their widest cell, numbers to the right', () => {
  const columns = [
    { align: 'left', most: 9 },
    { align: 'right', most: 9 },
  ] as const;
  expect(
    aligned(columns, [
      ['Ω', '1'],
      ['long one', '20'],
    ]),
  ).toEqual(['Ω          1', 'long one  20']);
});

test('cells beyond the limit are cut', () => {
  expect(aligned([{ align: 'left', most: 4 }], [['abcdef'], ['abcd']])).toEqual(['abc…', 'abcd']);
});

test('one column may take what the others leave of the line', () => {
  const columns = [
    { align: 'left', most: 'rest' },
    { align: 'right', most: 9 },
  ] as const;
  const long = 'a name that goes on and on';
  expect(aligned(columns, [[long, '20']], 20)).toEqual(['a name that goe…  20']);
  expect(aligned(columns, [[long, '20']])).toEqual([`${long}  20`]);
  expect(aligned(columns, [[long, '123456789']], 20)).toEqual(['a name that…  123456789']);
  expect(aligned(columns, [['short', '20']], 20)).toEqual(['short  20']);
});

test('text breaks between words and keeps its indent', () => {
  expect(wrapped('one two  three', 8, 2)).toEqual(['one two', '  three']);
  expect(wrapped('one two', 7)).toEqual(['one two']);
  expect(wrapped('unbreakable', 4)).toEqual(['unbreakable']);
  expect(wrapped('', 4)).toEqual(['']);
});
