// The layer rules find each kind of breach in a tree made for it, and nothing in a tree that keeps them.
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { breaches } from '../../../.ci/layers.mjs';

let root: string;
beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'layers-'));
  const manifest = JSON.stringify({ dependencies: { 'ml-matrix': '1' } });
  for (const home of [
    'packages/core',
    'packages/study',
    'packages/sheet',
    'packages/pack',
    'apps/cli',
    'apps/report',
  ]) {
    write(`${home}/package.json`, manifest);
  }
  write('packages/core/src/index.ts', "export * from './soil/layers.ts';");
  write(
    'packages/core/src/soil/layers.ts',
    "import { sum } from '../numerics/sum.ts'; export const a = sum;",
  );
  write('packages/core/src/numerics/sum.ts', 'export const sum: number = Math.sqrt(2);');
  write('apps/report/src/view/bench.ts', 'export const b = 1;');
});
afterEach(() => rmSync(root, { recursive: true }));

function write(path: string, text: string): void {
  mkdirSync(dirname(join(root, path)), { recursive: true });
  writeFileSync(join(root, path), text);
}

test('a tree in order has no breach', () => {
  write(
    'packages/study/src/index.ts',
    "import { a } from '@ohmstead/core'; import Matrix from 'ml-matrix'; a; Matrix;",
  );
  write('packages/sheet/src/index.ts', "import { type A, type B } from '@ohmstead/study';");
  write('apps/cli/src/main.ts', "import { readFileSync } from 'node:fs';");
  expect(breaches(root)).toEqual([]);
});

test.each([
  [
    'a later folder of core',
    'packages/core/src/numerics/a.ts',
    "import '../soil/layers.ts'",
    'imports ../soil/layers.ts: soil comes after numerics in core',
  ],
  [
    'a later folder, types only',
    'packages/core/src/numerics/a.ts',
    "import type { a } from '../soil/layers.ts'",
    'imports ../soil/layers.ts: soil comes after numerics in core',
  ],
  [
    'a folder without a place',
    'packages/core/src/misc/a.ts',
    "import '../soil/layers.ts'",
    "imports ../soil/layers.ts: misc has no place in the order of core's folders",
  ],
  [
    'a later folder of the page',
    'apps/report/src/desk/a.ts',
    "import '../view/bench.ts'",
    'imports ../view/bench.ts: view comes after desk in report',
  ],
  [
    'a package above',
    'packages/study/src/a.ts',
    "export { x } from '@ohmstead/pack'",
    'imports @ohmstead/pack: packages/study may not import pack',
  ],
  [
    'any package, from core',
    'packages/core/src/soil/a.ts',
    "import('@ohmstead/study')",
    'imports @ohmstead/study: packages/core may not import study',
  ],
  [
    'a type by import()',
    'packages/core/src/soil/a.ts',
    "export type T = import('@ohmstead/study').Study",
    'imports @ohmstead/study: packages/core may not import study',
  ],
  [
    'values of study, from sheet',
    'packages/sheet/src/a.ts',
    "import { type A, b } from '@ohmstead/study'",
    'imports @ohmstead/study: packages/sheet may take only types of study',
  ],
  [
    'the inside of a package',
    'packages/study/src/a.ts',
    "import '@ohmstead/core/src/soil/layers.ts'",
    'imports @ohmstead/core/src/soil/layers.ts: reaches into a package; only its index is public',
  ],
  [
    'a path out of the package',
    'packages/study/src/a.ts',
    "import '../../core/src/index.ts'",
    'imports ../../core/src/index.ts: leaves its package',
  ],
  ['a file that is not there', 'packages/study/src/a.ts', "import './b.ts'", 'imports ./b.ts: no such file'],
  [
    'node, outside the command line',
    'packages/pack/src/a.ts',
    "import 'node:fs'",
    'imports node:fs: only apps/cli runs in Node alone',
  ],
  [
    'a dependency not declared',
    'packages/pack/src/a.ts',
    "import 'left-pad/x.js'",
    'imports left-pad/x.js: not among the dependencies of packages/pack',
  ],
  [
    'a computed import',
    'packages/core/src/soil/a.ts',
    "import('./' + 'b.ts')",
    'imports (computed): not among the dependencies of packages/core',
  ],
  ['a clock', 'packages/core/src/soil/a.ts', 'export const t = new Date()', 'uses Date; core is pure'],
  [
    'chance',
    'packages/core/src/soil/a.ts',
    "export const t = Math['random']()",
    'uses Math.random; core is pure',
  ],
  ['the console', 'packages/core/src/soil/a.ts', 'console.log(1)', 'uses console; core is pure'],
  [
    'the process',
    'packages/core/src/soil/a.ts',
    'export const e = process.env',
    'uses process; core is pure',
  ],
  ['the network', 'packages/core/src/soil/a.ts', "fetch('x')", 'uses fetch; core is pure'],
])('%s', (_what, path, text, breach) => {
  write(path, text);
  expect(breaches(root)).toEqual([`${path}: ${breach}`]);
});

test('names, members and comments that only look like globals are let be', () => {
  write(
    'packages/core/src/soil/a.ts',
    '// new Date()\nexport const text = "fetch"; export const b = { process: 1 }; b.process;',
  );
  write(
    'packages/core/src/soil/b.ts',
    'export function step(process: number, window: number): number { return process + window; }',
  );
  expect(breaches(root)).toEqual([]);
});

test('an import cycle, across files and by types alone', () => {
  write('packages/core/src/soil/a.ts', "import type { B } from './b.ts'; export type A = B;");
  write('packages/core/src/soil/b.ts', "import type { A } from './c.ts'; export type B = A;");
  write('packages/core/src/soil/c.ts', "export type * from './a.ts';");
  const [a, b, c] = ['a', 'b', 'c'].map((name) => `packages/core/src/soil/${name}.ts`);
  expect(breaches(root)).toEqual([`import cycle among ${a}, ${b}, ${c}`]);
});
