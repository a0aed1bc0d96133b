// Texts of a sheet against each other: which numbers and words differ, and where.
import { expect, test } from 'vitest';
import { compareTexts } from '../src/compare-texts.ts';
import { sheetTexts } from '../src/sheet-texts.ts';

test('equal texts have no differences, and their printed numbers are counted', () => {
  const texts = ['33 kV busbar', '975 ± 4 V at (32.7, 36.3) m', 'no number', '−9·10⁻⁵', '12\u202f345.6 Ω'];
  expect(compareTexts(texts, [...texts])).toEqual({ differences: [], numbers: 7 });
});

test('a number that differs is told with both values and its place', () => {
  const stored = ['rise', '822 ± 5 V, 90 % of the limit', '1\u202f912 V'];
  const computed = ['rise', '1\u202f047 ± 6 V, 113 % of the limit', '−1\u202f912 V'];
  expect(compareTexts(stored, computed).differences).toEqual([
    { kind: 'number', index: 1, stored: '822', computed: '1\u202f047' },
    { kind: 'number', index: 1, stored: '5', computed: '6' },
    { kind: 'number', index: 1, stored: '90', computed: '113' },
    { kind: 'number', index: 2, stored: '1\u202f912', computed: '−1\u202f912' },
  ]);
});

test.each([
  // rounding errors themselves, as one machine and another leave them
  ['balance 2·10⁻¹⁵', 'balance −7·10⁻¹⁶', 0],
  ['2·10⁻⁵', '3·10⁻⁵', 1],
  ['2·10⁻¹⁵', '2·10⁻⁵', 1],
  ['2·10⁹', '2·10⁸', 1],
  ['0.813', '0.814', 1],
])('%j against %j: %i differences', (stored, computed, count) => {
  expect(compareTexts([stored], [computed]).differences).toHaveLength(count);
});

test('words that differ are told as words', () => {
  expect(compareTexts(['is within the limit of 692 V'], ['exceeds the limit of 692 V']).differences).toEqual([
    {
      kind: 'words',
      index: 0,
      stored: 'is within the limit of 692 V',
      computed: 'exceeds the limit of 692 V',
    },
  ]);
});

test('a stretch with more or fewer texts is one difference, and the rest is still compared', () => {
  expect(compareTexts(['a 1', 'x', 'c 3'], ['a 1', 'b', 'y 2', 'c 3'])).toEqual({
    differences: [{ kind: 'words', index: 1, stored: 'x', computed: 'b y 2' }],
    numbers: 2,
  });
  expect(compareTexts(['a', 'a'], ['a']).differences).toHaveLength(1);
  expect(compareTexts([], ['a']).differences).toMatchObject([{ index: 0, stored: '', computed: 'a' }]);
});

test('the texts of a page are those of its main element, as a browser has them', () => {
  const page =
    '<body><a>skip</a><main id="sheet"><p title="a > b">one &lt;two&gt;\n</p> <p>&amp;lt; &quot;3&quot;</p></main><p>end</p></body>';
  expect(sheetTexts(page)).toEqual(['one <two>\n', '&lt; "3"']);
  expect(() => sheetTexts('<body></body>')).toThrow('no main');
});
