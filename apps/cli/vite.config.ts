// The command line, bundled to plain files that Node 20 runs as they are.
import { defineConfig } from 'vite';
import { pageScriptDefinitions } from '../report/page-scripts.ts';

export default defineConfig({
  define: pageScriptDefinitions(),
  build: {
    ssr: true,
    target: 'node20',
    outDir: 'dist',
    emptyOutDir: false,
    // names stay, so that the lines of a fault can be read; a third less text is parsed at every start
    minify: 'oxc',
    rollupOptions: {
      input: {
        ohmstead: 'src/ohmstead.ts',
        helper: 'src/helper.ts',
        bench: 'src/bench.ts',
        agreement: 'src/agreement.ts',
        schema: 'src/schema.ts',
      },
      output: {
        minify: { compress: true, mangle: false, codegen: { removeWhitespace: true } },
        entryFileNames: '[name].js',
        chunkFileNames: 'chunks/[name].js',
      },
    },
  },
  ssr: { noExternal: true },
});
