// Drafts opened, edited and written: untouched files keep their bytes, and an edit taken back leaves no trace.
import { InputFaults, type JsonValue, STUDY_FILE } from '@ohmstead/study';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { canonicalJson } from '../../../src/desk/canonical-json.ts';
import { valueAt } from '../../../src/desk/draft.ts';
import { questionsOf } from '../../../src/desk/missing.ts';
import { openDraft } from '../../../src/desk/open-draft.ts';
import type { JsonPath } from '../../../src/desk/path.ts';
import { copyItem, insertItem, moveItem, removeItem, setValue } from '../../../src/desk/set-value.ts';
import { bytesOf, demo, filesOf, loaded, opened, small, smallStudy, smallTable, textOf } from './drafts.ts';

describe('opening', () => {
  test.each(['aldermoor', 'brackwater', 'square-70m', 'broken/wrong-keys'])('%s keeps every byte', (name) => {
    const files = filesOf(name);
    expect([...opened(files).files]).toEqual([...files]);
  });

  test.each<[string, string]>([
    ['{', 'expected a key in double quotes, found the end of the file'],
    ['[1]', 'the file holds no JSON object; expected a study as one'],
    [' ', 'the file is empty; expected a study as a JSON object'],
    ['{"title": "a", "title": "b"}', 'the key stands twice, first on line 1'],
    ['{"version": 1e999}', '1e999 is larger than a number can be'],
  ])('%s cannot be edited without loss', (text, message) => {
    const opening = openDraft(new Map([[STUDY_FILE, bytesOf(text)]]));
    expect(opening.kind === 'faults' && opening.faults.map((fault) => fault.message)).toEqual([message]);
  });

  test('a study that is no text is refused', () => {
    const opening = openDraft(new Map([[STUDY_FILE, new Uint8Array([0xff, 0xfe, 0x7b, 0])]]));
    expect(opening.kind === 'faults' && opening.faults[0]?.code).toBe('text-encoding');
  });
});

describe('bare tables', () => {
  test('a table of conductors becomes a study that asks for what is missing', () => {
    const draft = opened(new Map([['yard/north.csv', bytesOf(smallTable)]]));
    expect(draft.study).toEqual({
      format: 'ohmstead-study',
      version: 1,
      title: 'north',
      conductors: ['yard/north.csv'],
      cases: [{ name: 'ground fault' }],
      limits: { basis: 'IEEE 80' },
    });
    expect(textOf(draft, 'yard/north.csv')).toBe(smallTable);
    expect(questionsOf(draft).map(({ id, ask }) => `${id}: ${ask}`)).toEqual([
      'soil: the resistivity of the soil',
      'current: the current of ground fault',
      'duration: the duration of ground fault',
      'body-mass: the body mass that the limits are stated for',
    ]);
  });

  test('its questions answered, the study loads', () => {
    let draft = opened(new Map([['north.csv', bytesOf(smallTable)]]));
    expect(() => loaded(draft)).toThrow(InputFaults);
    for (const [first] of questionsOf(draft).map(({ answers }) => answers)) {
      if (first === undefined || first.kind === 'table' || first.kind === 'text')
        throw new Error('a number is asked for');
      draft = setValue(
        draft,
        first.path,
        first.kind === 'choice' ? first.choices[0]! : first.quantity === 'duration' ? 0.5 : 1000,
      );
    }
    expect(questionsOf(draft)).toEqual([]);
    expect(loaded(draft).study).toMatchObject({
      soil: { layers: [{ resistivity_ohm_m: 1000 }] },
      cases: [{ name: 'ground fault', grid_current_A: 1000, duration_s: 0.5 }],
      limits: { basis: 'IEEE 80', body_mass_kg: 50 },
    });
  });

  test('a survey among the tables is the soil', () => {
    const survey = 'spacing_m,resistance_ohm\n1,10\n2,5\n';
    const draft = opened(
      new Map([
        ['s.csv', bytesOf(survey)],
        ['c.csv', bytesOf(smallTable)],
      ]),
    );
    expect(draft.study).toMatchObject({
      soil: { survey: 's.csv', layer_count: 'auto' },
      conductors: ['c.csv'],
    });
    expect(questionsOf(draft).map(({ id }) => id)).toEqual(['current', 'duration', 'body-mass']);
  });

  test('a table with semicolons, or one that is none, is opened so that loading tells what is wrong', () => {
    const draft = opened(new Map([['c.csv', bytesOf(smallTable.replaceAll(',', ';'))]]));
    expect(draft.study.conductors).toEqual(['c.csv']);
    const two = new Map([
      ['c.csv', bytesOf(smallTable.replaceAll(',', '\t'))],
      ['d.csv', bytesOf('a,b\n1,2\n')],
    ]);
    expect(opened(two).study.conductors).toEqual(['c.csv']);
    expect(opened(new Map([['c.csv', bytesOf('a,b\n1,2\n')]])).study.conductors).toEqual(['c.csv']);
  });

  test('neither study nor table is refused', () => {
    const opening = openDraft(new Map([['photo.png', new Uint8Array(3)]]));
    expect(opening.kind === 'faults' && opening.faults[0]?.code).toBe('file-missing');
  });

  test('an empty study is asked for everything', () => {
    expect(questionsOf(small({})).map(({ id }) => id)).toEqual([
      ...['title', 'soil', 'conductors', 'case', 'current', 'duration', 'basis', 'body-mass'],
    ]);
    expect(questionsOf(demo('aldermoor'))).toEqual([]);
    expect(questionsOf(demo('brackwater'))).toEqual([]);
  });
});

describe('values of study.json', () => {
  const rho: JsonPath = ['soil', 'layers', 0, 'resistivity_ohm_m'];

  test('are set where they stand, other files untouched', () => {
    const before = demo('aldermoor');
    const after = setValue(before, rho, 180);
    expect(valueAt(after, rho)).toBe(180);
    expect(loaded(after).study.soil.layers?.[0]).toEqual({ resistivity_ohm_m: 180, thickness_m: 2.4 });
    expect(after.files.get('conductors.csv')).toBe(before.files.get('conductors.csv'));
    expect(valueAt(before, rho)).toBe(220);
  });

  test('the same value leaves the bytes alone', () => {
    const before = demo('aldermoor');
    expect(setValue(before, rho, 220)).toBe(before);
    expect(setValue(before, ['project', 'client'], undefined)).toBe(before);
  });

  test('are written in the order of the schema, unknown keys last', () => {
    const draft = setValue(small({ colour: 'red', ...smallStudy }), ['project', 'client'], 'N.');
    const keys = [...'format version title project soil conductors cases limits colour'.split(' ')];
    expect(Object.keys(JSON.parse(textOf(draft, STUDY_FILE)))).toEqual(keys);
    expect(textOf(draft, STUDY_FILE).endsWith('\n}\n')).toBe(true);
  });

  test('what is missing on the way is made, and goes again', () => {
    const before = setValue(small(), ['title'], 'A');
    const after = setValue(
      before,
      ['areas', 'touch', 0],
      [
        [0, 0],
        [1, 0],
        [1, 1],
      ],
    );
    expect(valueAt(after, ['areas', 'touch', 0, 2, 1])).toBe(1);
    expect(textOf(setValue(after, ['areas', 'touch', 0], undefined), STUDY_FILE)).toBe(
      textOf(before, STUDY_FILE),
    );
  });

  test('a cleared field of a list item keeps the places of the items after it', () => {
    const draft = setValue(
      small({ ...smallStudy, cases: [{ name: 'a' }, { name: 'b' }] }),
      ['cases', 0, 'name'],
      undefined,
    );
    expect(draft.study.cases).toEqual([{}, { name: 'b' }]);
  });

  test('a value of the wrong kind gives way', () => {
    expect(setValue(small({ soil: 'clay' }), rho, 1).study.soil).toEqual({
      layers: [{ resistivity_ohm_m: 1 }],
    });
  });

  test('a place past the end, and a number that is none, are faults of the caller', () => {
    expect(() => setValue(small(), ['cases', 3, 'name'], 'x')).toThrow(RangeError);
    expect(() => setValue(small(), rho, Number.NaN)).toThrow(RangeError);
  });

  test('no key has a meaning of its own', () => {
    const draft = setValue(small(), ['__proto__', 'polluted'], 'yes');
    expect(Object.hasOwn(draft.study, '__proto__')).toBe(true);
    expect(Object.hasOwn(Object.prototype, 'polluted')).toBe(false);
    expect(textOf(draft, STUDY_FILE)).toContain('"__proto__"');
  });

  test('an edit and its inverse give the same bytes', () => {
    const leaf = fc.oneof(fc.double({ noNaN: true, noDefaultInfinity: true }), fc.string(), fc.boolean());
    const key = fc.constantFrom('title', 'project', 'client', 'notes', 'ground', 'x');
    fc.assert(
      fc.property(fc.array(key, { minLength: 1, maxLength: 4 }), leaf, (path, value) => {
        const start = setValue(demo('aldermoor'), ['display_units'], 'US');
        const old: JsonValue | undefined = valueAt(start, path);
        const there = setValue(start, path, value);
        expect(valueAt(there, path)).toEqual(value);
        // a text gives way to an object that is made on the way; then the text is what has to be set again
        const whole = path.findIndex((_, i) => typeof valueAt(start, path.slice(0, i + 1)) === 'string');
        const back =
          whole < 0
            ? setValue(there, path, old)
            : setValue(there, path.slice(0, whole + 1), valueAt(start, path.slice(0, whole + 1)));
        expect(textOf(back, STUDY_FILE)).toBe(textOf(start, STUDY_FILE));
      }),
      { seed: 20_240_608, numRuns: 300 },
    );
  });

  test('the canonical form is its own canonical form', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        const text = canonicalJson(JSON.parse(JSON.stringify(value)));
        expect(canonicalJson(JSON.parse(text))).toBe(text);
      }),
      { seed: 20_240_608 },
    );
  });
});

describe('items of lists', () => {
  const cases: JsonPath = ['cases'];

  test('are inserted, moved, copied under a free name and removed', () => {
    const start = setValue(small(), ['title'], 'A');
    const two = copyItem(start, cases, 0);
    expect(two.study.cases).toEqual([smallStudy.cases[0], { ...smallStudy.cases[0], name: 'bus 2' }]);
    expect(copyItem(two, cases, 0).study.cases).toMatchObject([
      { name: 'bus' },
      { name: 'bus 3' },
      { name: 'bus 2' },
    ]);
    const turned = moveItem(two, cases, 0, 1);
    expect(turned.study.cases).toMatchObject([{ name: 'bus 2' }, { name: 'bus' }]);
    expect(textOf(removeItem(two, cases, 1), STUDY_FILE)).toBe(textOf(start, STUDY_FILE));
    expect(insertItem(two, cases, 1, { name: 'x' }).study.cases).toMatchObject([{}, { name: 'x' }, {}]);
    expect(moveItem(two, cases, 0, 2)).toBe(two);
  });
});
