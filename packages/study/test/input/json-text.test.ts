// JSON text against the language's own reader, and the faults that reader would pass over.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type Fault, faultLine } from '../../src/fault.ts';
import { readJson } from '../../src/input/json-text.ts';
import type { JsonDocument } from '../../src/input/json-value.ts';

const SEED = 20_240_605;

function read(text: string): { document: JsonDocument | undefined; lines: readonly string[] } {
  const faults: Fault[] = [];
  const document = readJson('study.json', text, faults);
  return { document, lines: faults.map(faultLine) };
}

describe('readJson', () => {
  test('reads whatever the language writes, keys such as __proto__ included', () => {
    const values = fc.jsonValue({ maxDepth: 5, noUnicodeString: false });
    fc.assert(
      fc.property(values, fc.nat({ max: 3 }), (value, indent) => {
        const text = JSON.stringify(value, null, indent);
        const { document, lines } = read(text);
        expect(lines).toEqual([]);
        expect(document?.value).toEqual(JSON.parse(text.replace(/(?<![\w.])-0(?![.\d])/g, '0')));
      }),
      { seed: SEED, numRuns: 500 },
    );
    expect(Object.keys(Object(read('{ "__proto__": 1 }').document?.value))).toEqual(['__proto__']);
  });

  test('accepts no text that the language refuses', () => {
    const pieces = fc.constantFrom(
      '{',
      '}',
      '[',
      ']',
      ',',
      ':',
      '"a"',
      '"',
      '1',
      '-',
      '.5',
      '01',
      'true',
      'nul',
      ' ',
      '\n',
      '\\',
    );
    fc.assert(
      fc.property(fc.array(pieces, { maxLength: 12 }), (parts) => {
        const text = parts.join('');
        const { document } = read(text);
        let language: unknown;
        try {
          language = JSON.parse(text);
        } catch {
          language = undefined;
        }
        if (document === undefined) expect(language).toBeUndefined();
        else expect(document.value).toEqual(language);
      }),
      { seed: SEED, numRuns: 5000 },
    );
  });

  test('knows the line of every part', () => {
    const { document } = read(
      '{\n "cases": [\n  { "name": "a",\n    "duration_s": 1 },\n  { "odd key": 2 } ]\n}',
    );
    expect(Object.fromEntries(document?.lines ?? [])).toEqual({
      '': 1,
      cases: 2,
      'cases[0]': 3,
      'cases[0].name': 3,
      'cases[0].duration_s': 4,
      'cases[1]': 5,
      'cases[1]["odd key"]': 5,
    });
  });

  test.each([
    [
      '{ "a": 1,5 }',
      'study.json:1: expected a key in double quotes, found 5 (numbers have a decimal point, as in 1.5)',
    ],
    ["{\n'a': 1 }", "study.json:2: expected a key in double quotes, found 'a'"],
    ['{ "a" 1 }', 'study.json:1: expected : after the key "a", found 1'],
    ['[1 2]', 'study.json:1: expected , or ] after the item, found 2'],
    ['[01]', 'study.json:1: 01 is not a number as JSON writes it, such as -0.5 or 12'],
    ['[.5]', 'study.json:1: .5 is not a number as JSON writes it, such as -0.5 or 12'],
    ['[+5]', 'study.json:1: +5 is not a number as JSON writes it, such as -0.5 or 12'],
    ['[0x10]', 'study.json:1: 0x10 is not a number as JSON writes it, such as -0.5 or 12'],
    [
      '[NaN]',
      'study.json:1: NaN is not a value of JSON; expected a number, a text in double quotes, true, false, { or [',
    ],
    ['["a\nb"]', 'study.json:1: a text is not closed with " on its line'],
    ['["a\tb"]', 'study.json:1: the character U+0009 stands in a text; write it as an escape'],
    [
      '["C:\\grid"]',
      'study.json:1: the text "C:\\grid" has a backslash escape that JSON does not know; write \\\\ for a backslash',
    ],
    ['/* x */ {}', 'study.json:1: a comment stands here; JSON has none, delete it'],
    ['{} {}', 'study.json:1: expected the end of the file, found {'],
    ['[1,]', 'study.json:1: a comma stands before ] with no item after it'],
    ['{"a":1,}', 'study.json:1: a comma stands before } with no key after it'],
    ['[1', 'study.json:1: expected , or ] after the item, found the end of the file'],
    ['{ "a": 1,\n "a": 2 }', 'study.json:2: a: the key stands twice, first on line 1'],
    ['[-1e400]', 'study.json:1: [0]: -1e400 is larger than a number can be'],
    ['[1e-400]', 'study.json:1: [0]: 1e-400 is smaller than a number can be'],
  ])('tells what is wrong with %s', (text, line) => {
    expect(read(text).lines).toEqual([line]);
  });
});
