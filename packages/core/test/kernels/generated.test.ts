// The committed bytes of the kernels are what their sources compile to.
import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { generatedText, MODULES, targetOf } from '../../assembly/build.mjs';

it.each(MODULES)('has the %s kernel its source compiles to', async (name) => {
  expect(await generatedText(name)).toBe(readFileSync(targetOf(name), 'utf8'));
});
