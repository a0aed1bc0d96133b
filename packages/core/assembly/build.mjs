// Compiles the kernels and writes them as base64 into src/kernels/wasm-bytes.ts; with --check, only compares.
import { readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import asc from 'assemblyscript/asc';

const here = dirname(fileURLToPath(import.meta.url));
const target = join(here, '../src/kernels/wasm-bytes.ts');

/** Modules, each with its entry file. */
const MODULES = ['surface', 'leakage', 'cholesky'];

/** @returns {Promise<string>} text of the generated file */
export async function generatedText() {
  const parts = ['// The compiled kernels as base64; written by `npm run kernels`, not by hand.\n'];
  for (const name of MODULES) {
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
    parts.push(`\nexport const ${name}Bytes: string =\n  '${Buffer.from(bytes).toString('base64')}';\n`);
  }
  return parts.join('');
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const text = await generatedText();
  if (!process.argv.includes('--check')) writeFileSync(target, text);
  else if (readFileSync(target, 'utf8') !== text) {
    console.error('kernels: wasm-bytes.ts differs from its sources; run `npm run kernels`');
    process.exitCode = 1;
  }
}
