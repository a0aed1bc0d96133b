// The live sheet as static files that work from any plain host.
import { defineConfig } from 'vite';
import { offline } from './offline.ts';
import { pageScriptDefinitions } from './page-scripts.ts';

export default defineConfig(({ isPreview }) => ({
  base: './',
  plugins: [offline()],
  define: isPreview === true ? {} : pageScriptDefinitions(),
  build: {
    target: 'es2023',
    outDir: 'dist/site',
    emptyOutDir: true,
    modulePreload: false,
    // the scripts carried as text are one chunk of this size, kB; a test watches what the whole page transfers
    chunkSizeWarningLimit: 1000,
  },
  preview: { port: 4173, strictPort: false },
}));
