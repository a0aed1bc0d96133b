// What a sheet carries to be computed anew: nothing of a study or of the program can end the element it is kept in.
import { createHash } from 'node:crypto';
import { sheetHtml } from '@ohmstead/sheet';
import { sourceFromMap } from '@ohmstead/study';
import { expect, test } from 'vitest';
import { fixtureOutcome } from '../../sheet/test/fixture.ts';
import { dataBlock } from '../src/data-block.ts';
import { ENGINE_BLOCK, pageProgram, RECORD_BLOCK } from '../src/page-program.ts';
import { type Solve, type VerifyOptions, verifyPack } from '../src/verify-pack.ts';
import { writePack } from '../src/write-pack.ts';
import { readZip } from '../src/zip-read.ts';
import { writeZip } from '../src/zip-write.ts';
import { exampleFiles, exampleLoad, exampleOptions, exampleRenderer, exampleSolve } from './example.ts';

const HOSTILE = '</script><script>alert(1)</script><!--<script> \u2028 ]]> " \\ é';
const encoder = new TextEncoder();
const files = new Map([
  ...exampleFiles,
  ['tables/hostile.csv', encoder.encode(HOSTILE)],
  ['tables/binary.csv', Uint8Array.of(0xff, 0x00, 0x3c, 0xfe)],
]);
const loaded = exampleLoad(sourceFromMap(files));
const outcome = exampleSolve(loaded);
const scripts = { starter: 'go("Ω")', engine: `self.x = "${HOSTILE}";` };

/** Contents of the script elements, read as HTML reads them: up to the first `</script`. */
function scriptElements(page: string): { readonly attributes: string; readonly text: string }[] {
  return [...page.matchAll(/<script([^>]*)>([\s\S]*?)<\/script/gi)].map(([, attributes, text]) => ({
    attributes: attributes!,
    text: text!,
  }));
}

test('a data block holds no <, and reads back as it was', () => {
  const block = dataBlock({ [HOSTILE]: [HOSTILE, 1e-9] });
  expect(block).not.toContain('<');
  expect(JSON.parse(block)).toEqual({ [HOSTILE]: [HOSTILE, 1e-9] });
});

test('record and engine stand in the page as data, and the starter is its only script', async () => {
  const page = sheetHtml(fixtureOutcome({ spacing: 6 }), await pageProgram(scripts, loaded, outcome.results));
  const elements = scriptElements(page);
  expect(elements.map(({ attributes }) => attributes)).toEqual([
    ` type="application/json" id="${RECORD_BLOCK}"`,
    ` type="application/json" id="${ENGINE_BLOCK}"`,
    '',
  ]);
  expect(page).not.toContain('<!--');
  const [record, engine, starter] = elements.map(({ text }) => text);
  expect(starter).toBe(scripts.starter);
  expect(JSON.parse(engine!)).toBe(scripts.engine);
  expect(JSON.parse(record!)).toEqual({
    files: {
      'study.json': { text: new TextDecoder().decode(files.get('study.json')) },
      'tables/binary.csv': { base64: '/wA8/g==' },
      'tables/hostile.csv': { text: HOSTILE },
      // with its byte order mark
      'tables/rod.csv': { text: '\uFEFFid;depth1_m\r\nrod;0,5\r\n' },
    },
    results: outcome.results,
  });
});

test('the policy admits the starter by its digest, compiled kernels and workers from the page itself, no more', async () => {
  const page = sheetHtml(fixtureOutcome({ spacing: 6 }), await pageProgram(scripts, loaded, outcome.results));
  const digest = createHash('sha256').update(scripts.starter).digest('base64');
  expect(page).toContain(
    `content="default-src 'none'; script-src 'sha256-${digest}' 'wasm-unsafe-eval'; worker-src blob:; style-src 'unsafe-inline'; img-src data:"`,
  );
  expect(page.indexOf('Content-Security-Policy')).toBeLessThan(page.indexOf('<style'));
});

test.each(['x = "</script>"', 'x = "</SCRIPT"', 'x = "<!--"'])(
  'a starter with %s is refused',
  async (starter) => {
    await expect(pageProgram({ ...scripts, starter }, loaded, outcome.results)).rejects.toThrow('starter');
  },
);

const drawn = fixtureOutcome({ spacing: 6 });
const version = drawn.results.program_version;
const solve = () => drawn;
const packed = (): Promise<Uint8Array> => writePack(loaded, drawn, version, { scripts });

async function withSheet(change: (page: string) => string, forged?: object): Promise<Uint8Array> {
  const entries = new Map(await readZip(await packed(), 'a.zip'));
  entries.set('index.html', encoder.encode(change(new TextDecoder().decode(entries.get('index.html')))));
  if (forged !== undefined) {
    const manifest = JSON.parse(new TextDecoder().decode(entries.get('manifest.json')));
    entries.set('manifest.json', encoder.encode(JSON.stringify({ ...manifest, ...forged })));
  }
  return writeZip(entries);
}

async function renderingsThatDiffer(
  zip: Uint8Array,
  options: VerifyOptions = { load: exampleLoad, scripts },
  solver: Solve = solve,
): Promise<readonly string[]> {
  const { differences } = await verifyPack(zip, solver, options);
  return differences.filter(({ kind }) => kind === 'rendering').map(({ path }) => path);
}

test('verification compares the program in the sheet, and the record with the results of the pack', async () => {
  expect(await renderingsThatDiffer(await packed())).toEqual([]);
  for (const change of [
    (page: string) => page.replace('self.x =', 'self.y ='),
    (page: string) => page.replace('go(', 'stop('),
    (page: string) => page.replace('"worst_V":', '"worst_V":1'),
    (page: string) => page.replace(" 'wasm-unsafe-eval'", " 'unsafe-inline'"),
    (page: string) => page.replace('<main', '<script>evil()</script><main'),
    (page: string) => page.replace('</main>', '<script>evil()</script></main>'),
    (page: string) => page.replace('</main>', '<br></main>'),
    (page: string) => page.replace(/(?<=class="res">)\d/, '9'),
  ])
    expect(await renderingsThatDiffer(await withSheet(change))).toEqual(['index.html']);
});

test('the program of another version is left out of the comparison, the sheet is not', async () => {
  const older = { program_version: '0.0.9' };
  const aged = (page: string): string => page.replaceAll(`Ohmstead ${version}`, 'Ohmstead 0.0.9');
  const program = (page: string): string => aged(page).replace('self.x =', 'self.y =');
  expect(await renderingsThatDiffer(await withSheet(program, older))).toEqual([]);
  const sheet = (page: string): string => program(page).replace('</main>', 'more</main>');
  expect(await renderingsThatDiffer(await withSheet(sheet, older))).toEqual(['index.html']);
});

test('tables agree when their numbers do, to what two kinds of machine share', async () => {
  const withTable = (gpr: string): VerifyOptions => ({
    ...exampleOptions,
    renderer: { ...exampleRenderer, tables: () => [{ name: 'cases.csv', csv: `gpr_V\n${gpr}\n` }] },
  });
  const { renderer } = withTable('0.8133041072278673');
  const zip = await writePack(loaded, outcome, '1.2.3', { renderer });
  const differ = (gpr: string): Promise<readonly string[]> =>
    renderingsThatDiffer(zip, withTable(gpr), exampleSolve);
  expect(await differ('0.8133041072278676')).toEqual([]);
  expect(await differ('0.8133042')).toEqual(['tables/cases.csv']);
  expect(await differ('0.8133041072278673,1')).toEqual(['tables/cases.csv']);
});

test('a sheet agrees when its printed numbers do: rounding errors differ between two kinds of machine', async () => {
  const residual = (from: string, to: string): Promise<Uint8Array> =>
    withSheet((page) => {
      if (!page.includes(from)) throw new Error(`the sheet has no ${from}`);
      return page.replaceAll(from, to);
    });
  expect(await renderingsThatDiffer(await residual('·10⁻¹³', '·10⁻¹⁴'))).toEqual([]);
  expect(await renderingsThatDiffer(await residual('·10⁻¹³', '·10⁻³'))).toEqual(['index.html']);
});
