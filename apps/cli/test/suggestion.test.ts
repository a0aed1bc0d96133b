// A mistyped word finds the word that was meant, and a foreign one finds none.
import { expect, test } from 'vitest';
import { suggestion } from '../src/suggestion.ts';

const known = ['solve', 'field', 'verify', 'help'];

test.each([
  ['slove', 'solve'],
  ['SOLVE', 'solve'],
  ['feild', 'field'],
  ['verfy', 'verify'],
  ['ver', 'verify'],
  ['solved', 'solve'],
  ['plot', undefined],
  ['x', undefined],
  ['', undefined],
])('%s', (word, meant) => {
  expect(suggestion(word, known)).toBe(meant);
});
