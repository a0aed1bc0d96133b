// The live sheet as static files that work from any plain host.
import { defineConfig } from 'vite';

export default defineConfig({
  base: './',
  build: { target: 'es2023', outDir: 'dist/site', emptyOutDir: true, modulePreload: false },
  worker: { format: 'es' },
  preview: { port: 4173, strictPort: false },
});
