// The engine as one classic script, which the live sheet and every review pack carry as text.
import { defineConfig } from 'vite';

export default defineConfig({
  build: {
    target: 'es2023',
    outDir: 'dist/engine',
    emptyOutDir: true,
    lib: { entry: 'src/engine/engine.ts', formats: ['iife'], name: 'engine', fileName: () => 'engine.js' },
    minify: 'oxc',
    reportCompressedSize: false,
  },
});
