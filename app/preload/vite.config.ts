import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vite';

const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));

/** The desktop's preload, one file: a sandboxed preload can load no other. */
export default defineConfig({
  root: here('.'),
  publicDir: false,
  ssr: { noExternal: true, external: ['electron'] },
  build: {
    ssr: true,
    target: 'node22',
    outDir: here('../../dist/preload'),
    emptyOutDir: true,
    rolldownOptions: { input: here('preload.ts'), output: { format: 'cjs', entryFileNames: 'preload.cjs' } },
  },
});
