// Checks which package may import which, the order of the folders in core, import cycles, and that core stays pure.
// Usage: node .ci/layers.mjs [ROOT]
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { dirname, join, relative, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { cycles } from './cycles.mjs';
import { sourceFacts } from './source-facts.mjs';

/** What each package may import of the others; `types` marks those of which only types may be taken. */
const MAY_IMPORT = {
  'packages/core': {},
  'packages/study': { core: 'all' },
  'packages/sheet': { core: 'all', study: 'types' },
  'packages/pack': { core: 'all', study: 'all', sheet: 'all' },
  'apps/cli': { core: 'all', study: 'all', sheet: 'all', pack: 'all' },
  'apps/report': { core: 'all', study: 'all', sheet: 'all', pack: 'all' },
};

/** The only package that runs in Node alone; all others must run in a browser too. */
const NODE_ONLY = 'apps/cli';

/** Folders of a package, each importing only from itself and those before it; files beside them import from all. */
const FOLDER_ORDER = {
  'packages/core': [
    'kernels',
    'numerics',
    'crew',
    'materials',
    'soil',
    'geometry',
    'leakage',
    'network',
    'solve',
    'field',
    'safety',
    'fault',
    'sizing',
    'survey',
    'fieldtest',
    'closedform',
  ],
  'apps/report': ['desk', 'files', 'engine', 'plan', 'view'],
};

/** No file, clock, unseeded chance, network, console or page in core. */
const IMPURE = [
  ...['Date', 'performance', 'setTimeout', 'setInterval', 'requestAnimationFrame', 'Math.random', 'crypto'],
  ...['fetch', 'XMLHttpRequest', 'WebSocket', 'EventSource', 'navigator', 'localStorage', 'indexedDB'],
  ...['console', 'document', 'window', 'self', 'globalThis', 'process', 'Buffer', 'require'],
];

/**
 * Every breach of the rules in a source tree.
 * @param {string} root folder that holds packages/ and apps/
 * @returns {string[]} one line each, sorted
 */
export function breaches(root) {
  const found = [];
  const edges = new Map();
  for (const home of Object.keys(MAY_IMPORT)) {
    for (const file of sources(join(root, home, 'src'))) {
      const name = relative(root, file);
      const { imports, globals } = sourceFacts(file);
      const targets = imports.map((one) => ({ ...one, ...resolveImport(root, home, file, one.target) }));
      edges.set(
        name,
        targets.flatMap(({ path }) => path ?? []),
      );
      for (const one of targets) {
        const complaint = importComplaint(root, home, name, one);
        if (complaint !== undefined) found.push(`${name}: imports ${one.target}: ${complaint}`);
      }
      if (home === 'packages/core') {
        for (const word of IMPURE) if (globals.has(word)) found.push(`${name}: uses ${word}; core is pure`);
      }
    }
  }
  for (const cycle of cycles(edges)) found.push(`import cycle among ${cycle.join(', ')}`);
  return [...new Set(found)].sort();
}

function sources(folder) {
  if (!existsSync(folder)) return [];
  const entries = readdirSync(folder, { withFileTypes: true, recursive: true });
  return entries
    .filter((entry) => entry.isFile() && /\.tsx?$/.test(entry.name))
    .map((entry) => join(entry.path, entry.name))
    .sort();
}

/** Where an import leads: a file of the tree, another package of the workspace, or outside. */
function resolveImport(root, home, file, target) {
  if (target.startsWith('.'))
    return { kind: 'relative', path: relative(root, resolve(dirname(file), target)) };
  const workspace = /^@ohmstead\/([^/]+)(\/.*)?$/.exec(target);
  if (workspace === null) return { kind: target.startsWith('node:') ? 'node' : 'external' };
  const [, name, inner] = workspace;
  return {
    kind: 'workspace',
    name,
    inner,
    path: `packages/${name}/src/index.ts`,
    own: home === `packages/${name}`,
  };
}

function importComplaint(root, home, name, one) {
  switch (one.kind) {
    case 'relative':
      // an application may carry the demonstration data, as text
      if (home.startsWith('apps/') && one.path.startsWith('test-data/') && one.path.endsWith('?raw'))
        return undefined;
      if (!one.path.startsWith(`${home}/src/`)) return 'leaves its package';
      if (/\.tsx?$/.test(one.path) && !existsSync(join(root, one.path))) return 'no such file';
      return FOLDER_ORDER[home] === undefined ? undefined : orderComplaint(home, name, one.path);
    case 'workspace':
      if (one.inner !== undefined) return 'reaches into a package; only its index is public';
      if (one.own) return 'a package does not import itself by name';
      if (MAY_IMPORT[home][one.name] === undefined) return `${home} may not import ${one.name}`;
      if (MAY_IMPORT[home][one.name] === 'types' && !one.typeOnly)
        return `${home} may take only types of ${one.name}`;
      return undefined;
    case 'node':
      return home === NODE_ONLY ? undefined : `only ${NODE_ONLY} runs in Node alone`;
    case 'external':
      return declared(root, home).includes(packageName(one.target))
        ? undefined
        : `not among the dependencies of ${home}`;
  }
}

function orderComplaint(home, from, to) {
  const folderOf = (path) => path.slice(`${home}/src/`.length).split('/').slice(0, -1)[0];
  const [here, there] = [from, to].map(folderOf);
  if (here === undefined) return undefined;
  const order = FOLDER_ORDER[home];
  const named = home.split('/')[1];
  if (!order.includes(here)) return `${here} has no place in the order of ${named}'s folders`;
  if (!order.includes(there)) return `${there ?? to} has no place in the order of ${named}'s folders`;
  return order.indexOf(there) <= order.indexOf(here) ? undefined : `${there} comes after ${here} in ${named}`;
}

function declared(root, home) {
  const { dependencies = {} } = JSON.parse(readFileSync(join(root, home, 'package.json'), 'utf8'));
  return Object.keys(dependencies);
}

function packageName(target) {
  return target
    .split('/')
    .slice(0, target.startsWith('@') ? 2 : 1)
    .join('/');
}

if (process.argv[1] !== undefined && fileURLToPath(import.meta.url) === resolve(process.argv[1])) {
  const found = breaches(resolve(process.argv[2] ?? join(dirname(fileURLToPath(import.meta.url)), '..')));
  for (const line of found) console.error(line);
  console.log(found.length === 0 ? 'layers: in order' : `layers: ${found.length} breaches`);
  process.exitCode = found.length === 0 ? 0 : 1;
}
