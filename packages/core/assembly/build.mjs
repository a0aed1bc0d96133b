// Compiles the kernels and writes each as base64 into src/kernels/<module>-bytes.ts: all of them, or those named.
import { readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import asc from 'assemblyscript/asc';

const here = dirname(fileURLToPath(import.meta.url));

/** Modules, each with its entry file. */
export const MODULES = ['surface', 'leakage', 'cholesky', 'product', 'blocks'];

/** @param {string} name @returns {string} path of the generated file */
export function targetOf(name) {
  return join(here, `../src/kernels/${name}-bytes.ts`);
}

/** @param {string} name @returns {Promise<string>} text of the generated file */
export async function generatedText(name) {
  let bytes;
  const { error, stderr } = await asc.main(
    [
      `${name}.ts`,
      '--outFile',
      `${name}.wasm`,
      '-O2',
      '--noAssert',
      '--runtime',
      'stub',
      '--enable',
      'simd',
      '--initialMemory',
      '1',
    ],
    {
      readFile: (file) => {
        try {
          return readFileSync(join(here, file), 'utf8');
        } catch {
          return null;
        }
      },
      writeFile: (file, content) => {
        if (file.endsWith('.wasm')) bytes = content;
      },
      listFiles: () => [],
    },
  );
  if (error !== null) throw new Error(`${name}: ${error.message}\n${stderr.toString()}`);
  const base64 = Buffer.from(bytes).toString('base64');
  return `// The compiled kernel as base64; written by \`npm run kernels\`, not by hand.\n\nexport const ${name}Bytes: string =\n  '${base64}';\n`;
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const named = process.argv.slice(2);
  for (const name of named.length > 0 ? named : MODULES)
    writeFileSync(targetOf(name), await generatedText(name));
}
