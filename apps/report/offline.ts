// Lets the page open without a network: a service worker that keeps the page's own files, written when they are built.
import { createHash } from 'node:crypto';
import type { Plugin } from 'vite';

/** Name of the script among the page's files; `src/files/keep-offline.ts` asks for it. */
const NAME = 'offline.js';

/** The script for files with these names; names change with contents, so that their digest tells one build from another. */
export function offlineScript(files: readonly string[]): string {
  const version = createHash('sha256').update(files.join('\n')).digest('hex').slice(0, 12);
  return `// Keeps the page's own files, so that it opens without a network; written by the build.
const name = 'ohmstead-${version}';
const files = ${JSON.stringify(['./', ...files])};
const older = (key) => key.startsWith('ohmstead-') && key !== name;
self.addEventListener('install', (event) => {
  event.waitUntil(caches.open(name).then((cache) => cache.addAll(files)).then(() => self.skipWaiting()));
});
self.addEventListener('activate', (event) => {
  const removed = caches.keys().then((keys) => Promise.all(keys.filter(older).map((key) => caches.delete(key))));
  event.waitUntil(removed.then(() => self.clients.claim()));
});
self.addEventListener('fetch', (event) => {
  if (event.request.method !== 'GET') return;
  event.respondWith(caches.match(event.request, { ignoreSearch: true, ignoreVary: true }).then((kept) => kept ?? fetch(event.request)));
});
`;
}

export function offline(): Plugin {
  return {
    name: 'offline',
    apply: 'build',
    generateBundle(_, bundle) {
      const files = Object.keys(bundle)
        .filter((file) => !file.endsWith('.html'))
        .sort();
      this.emitFile({ type: 'asset', fileName: NAME, source: offlineScript(files) });
    },
  };
}
