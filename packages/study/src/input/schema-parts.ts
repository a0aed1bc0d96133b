// Parts that the schema of study.json is made of: texts and numbers with their trade name and what is expected.
import { z } from 'zod';
import { figure } from './shown-value.ts';

// No code made at run time, so that a page with a strict content policy can read studies.
z.config({ jitless: true });

/** Text that can stand in a label: not blank, nothing invisible; a subset of what `invisibleCharacter` refuses. */
const VISIBLE = /^(?=.*\S)[^\p{Cc}\p{Cs}\u2028\u2029\u200e\u200f\u202a-\u202e\u2066-\u2069]+$/u;

/** `title` is the trade name that faults begin with, `description` ends the phrase "expected …". */
export function told<T extends z.ZodType>(schema: T, title: string, description: string): T {
  return schema.meta({ title, description });
}

/** One of these sets of keys, for editors: when a study is loaded, the rules between keys tell more. */
export function oneOf<T extends z.ZodType>(schema: T, ...keys: readonly (readonly string[])[]): T {
  return schema.meta({ ...schema.meta(), oneOf: keys.map((required) => ({ required })) });
}

export function label(title: string, longest: number): z.ZodString {
  const schema = z.string().min(1).max(longest).regex(VISIBLE);
  return told(schema, title, `visible text of at most ${longest} characters`);
}

export function above(title: string, unit: string, largest: number): z.ZodNumber {
  return told(z.number().gt(0).max(largest), title, `a number above 0 and at most ${figure(largest)}${unit}`);
}

export function between(title: string, unit: string, least: number, largest: number, why = ''): z.ZodNumber {
  return told(
    z.number().min(least).max(largest),
    title,
    `a number from ${figure(least)} to ${figure(largest)}${unit}${why}`,
  );
}
