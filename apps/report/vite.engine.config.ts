// Scripts that are carried as text: the engine, and what starts it in a review pack. One a build, named by its mode.
import { defineConfig } from 'vite';

const ENTRIES: Readonly<Record<string, string>> = {
  engine: 'src/engine/engine.ts',
  starter: 'src/engine/starter/starter.ts',
};

export default defineConfig(({ mode }) => {
  const entry = ENTRIES[mode];
  if (entry === undefined)
    throw new Error(`no script ${mode}; expected ${Object.keys(ENTRIES).join(' or ')}`);
  return {
    build: {
      target: 'es2023',
      outDir: 'dist/engine',
      emptyOutDir: false,
      // one classic script, which a worker and an inline script element take as it is
      lib: { entry, formats: ['iife'], name: mode, fileName: () => `${mode}.js` },
      minify: 'oxc',
      reportCompressedSize: false,
    },
  };
});
