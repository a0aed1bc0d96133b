// JSON text to its value, with the line of every part, and with faults where the language reader would be silent.
import type { Fault } from '../fault.ts';
import { type JsonDocument, type JsonObject, type JsonValue, placeOf } from './json-value.ts';
import { DEEPEST_NESTING, LONGEST_PLACE } from './limits.ts';
import { codePointName, quoted, shown } from './shown-value.ts';

/** Stops the reading at the first fault of syntax. */
class JsonSyntax extends Error {}

const NUMBER = /-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?/y;
const WORD = /[^\s,:[\]{}"]+/y;
const NONZERO_MANTISSA = /^[^eE]*[1-9]/;
const STRING_STOP = /["\\\p{Cc}]/gu;

/**
 * Reads JSON text. Beside faults of syntax, a key given twice and a number out of range are faults: common readers
 * keep the last of the two and make the number infinite or zero.
 * @param file name for the faults
 * @param text the whole text
 * @param faults gets what is wrong: the first fault of syntax, and all others before it
 * @returns value and lines, or `undefined` after a fault of syntax
 */
export function readJson(file: string, text: string, faults: Fault[]): JsonDocument | undefined {
  const lines = new Map<string, number>();
  let at = 0;
  let line = 1;

  const note = (place: string, at: number): void => {
    if (place.length <= LONGEST_PLACE) lines.set(place, at);
  };

  const fail = (message: string): never => {
    faults.push({ file, line, code: 'json-syntax', message });
    throw new JsonSyntax(message);
  };

  const skipSpace = (): void => {
    for (; at < text.length; at++) {
      const character = text[at];
      if (character === '\n') line++;
      else if (character !== ' ' && character !== '\t' && character !== '\r') break;
    }
    if (text.startsWith('//', at) || text.startsWith('/*', at) || text[at] === '#') {
      fail('a comment stands here; JSON has none, delete it');
    }
  };

  /** What stands at the reading place, for messages. */
  const here = (): string => {
    if (at >= text.length) return 'the end of the file';
    WORD.lastIndex = at;
    return shown(WORD.exec(text)?.[0] ?? text[at]);
  };

  const readString = (): string => {
    const start = at++;
    for (;;) {
      STRING_STOP.lastIndex = at;
      const stop = STRING_STOP.exec(text);
      if (stop === null || stop[0] === '\n') return fail('a text is not closed with " on its line');
      at = stop.index + 1;
      if (stop[0] === '"') break;
      if (stop[0] === '\\') at++;
      else if (stop[0] < ' ')
        fail(`the character ${codePointName(stop[0])} stands in a text; write it as an escape`);
    }
    const raw = text.slice(start, at);
    try {
      const value: unknown = JSON.parse(raw);
      if (typeof value === 'string') return value;
    } catch {
      // told below
    }
    return fail(
      `the text ${shown(raw)} has a backslash escape that JSON does not know; write \\\\ for a backslash`,
    );
  };

  const readNumber = (place: string): number => {
    NUMBER.lastIndex = at;
    const token = NUMBER.exec(text)?.[0] ?? '';
    WORD.lastIndex = at;
    const word = WORD.exec(text)?.[0] ?? '';
    if (token === '' || token !== word) {
      fail(`${shown(word)} is not a number as JSON writes it, such as -0.5 or 12`);
    }
    at += token.length;
    const value = Number(token);
    if (!Number.isFinite(value) || (value === 0 && NONZERO_MANTISSA.test(token))) {
      const size = value === 0 ? 'smaller' : 'larger';
      faults.push({
        file,
        line,
        place,
        code: 'number-range',
        message: `${shown(token)} is ${size} than a number can be`,
      });
    }
    return value + 0;
  };

  const readList = (place: string, depth: number): readonly JsonValue[] => {
    const list: JsonValue[] = [];
    at++;
    skipSpace();
    if (text[at] === ']') {
      at++;
      return list;
    }
    for (;;) {
      list.push(readValue(placeOf(place, list.length), depth));
      skipSpace();
      if (text[at] === ']') break;
      if (text[at] !== ',') fail(`expected , or ] after the item, found ${here()}`);
      at++;
      skipSpace();
      if (text[at] === ']') fail('a comma stands before ] with no item after it');
    }
    at++;
    return list;
  };

  const readKey = (): string => {
    if (text[at] !== '"') {
      const hint = /\d/.test(text[at] ?? '') ? ' (numbers have a decimal point, as in 1.5)' : '';
      fail(`expected a key in double quotes, found ${here()}${hint}`);
    }
    return readString();
  };

  const readObject = (place: string, depth: number): JsonObject => {
    const entries = new Map<string, JsonValue>();
    at++;
    skipSpace();
    while (text[at] !== '}') {
      const key = readKey();
      const keyPlace = placeOf(place, key);
      const keyLine = line;
      skipSpace();
      if (text[at] !== ':') fail(`expected : after the key ${quoted(key)}, found ${here()}`);
      at++;
      if (entries.has(key)) {
        const message = `the key stands twice, first on line ${lines.get(keyPlace)}`;
        faults.push({ file, line: keyLine, place: keyPlace, code: 'json-key-twice', message });
      }
      entries.set(key, readValue(keyPlace, depth));
      note(keyPlace, keyLine);
      skipSpace();
      if (text[at] === '}') break;
      if (text[at] !== ',') fail(`expected , or } after the value of ${quoted(key)}, found ${here()}`);
      at++;
      skipSpace();
      if (text[at] === '}') fail('a comma stands before } with no key after it');
    }
    at++;
    return Object.fromEntries(entries);
  };

  const readWord = (): JsonValue => {
    const word = here();
    for (const [name, value] of [
      ['true', true],
      ['false', false],
      ['null', null],
    ] as const) {
      if (word !== name) continue;
      at += name.length;
      return value;
    }
    return fail(
      `${word} is not a value of JSON; expected a number, a text in double quotes, true, false, { or [`,
    );
  };

  const readValue = (place: string, depth: number): JsonValue => {
    skipSpace();
    note(place, line);
    const character = text[at] ?? '';
    if (character === '{' || character === '[') {
      if (depth >= DEEPEST_NESTING) fail(`brackets are nested deeper than ${DEEPEST_NESTING}`);
      return character === '{' ? readObject(place, depth + 1) : readList(place, depth + 1);
    }
    if (character === '"') return readString();
    if (/[-+.\d]/.test(character)) return readNumber(place);
    return readWord();
  };

  try {
    const value = readValue('', 0);
    skipSpace();
    if (at < text.length) fail(`expected the end of the file, found ${here()}`);
    return { value, lines };
  } catch (error) {
    if (error instanceof JsonSyntax) return undefined;
    throw error;
  }
}
