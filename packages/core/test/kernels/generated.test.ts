// The committed bytes of the kernels are what their sources compile to.
import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { generatedText } from '../../assembly/build.mjs';

it('has the kernels its sources compile to', async () => {
  const committed = readFileSync(new URL('../../src/kernels/wasm-bytes.ts', import.meta.url), 'utf8');
  expect(await generatedText()).toBe(committed);
});
