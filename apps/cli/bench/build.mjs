// Compiles the calibration loops and writes them as base64 into src/bench-calibration-bytes.ts.
import { readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import asc from 'assemblyscript/asc';

const here = dirname(fileURLToPath(import.meta.url));
let bytes = new Uint8Array();
const options = '-O2 --noAssert --runtime stub --enable simd --initialMemory 1';
const { error, stderr } = await asc.main(
  ['calibration.ts', '--outFile', 'calibration.wasm', ...options.split(' ')],
  {
    readFile: (file) => (file === 'calibration.ts' ? readFileSync(join(here, file), 'utf8') : null),
    writeFile: (file, content) => {
      if (file.endsWith('.wasm')) bytes = content;
    },
    listFiles: () => [],
  },
);
if (error !== null) throw new Error(`${error.message}\n${stderr.toString()}`);
const base64 = Buffer.from(bytes).toString('base64');
writeFileSync(
  join(here, '../src/bench-calibration-bytes.ts'),
  `// The calibration loops as base64; written by \`node apps/cli/bench/build.mjs\`, not by hand.\n\nexport const calibrationBytes: string =\n  '${base64}';\n`,
);
