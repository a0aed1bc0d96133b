// The live sheet as static files that work from any plain host.
import { defineConfig } from 'vite';
import { engineDefinitions } from './engine-text.ts';

export default defineConfig(({ isPreview }) => ({
  base: './',
  define: isPreview === true ? {} : engineDefinitions(),
  build: {
    target: 'es2023',
    outDir: 'dist/site',
    emptyOutDir: true,
    modulePreload: false,
    // the engine's text is one chunk of this size, kB; a test watches what the whole page transfers
    chunkSizeWarningLimit: 1000,
  },
  preview: { port: 4173, strictPort: false },
}));
