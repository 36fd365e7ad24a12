import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vite';

const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));

/** The desktop's main process, one file with everything in it but Electron and Node. */
export default defineConfig({
  root: here('.'),
  publicDir: false,
  ssr: { noExternal: true, external: ['electron'] },
  build: {
    ssr: true,
    target: 'node22',
    outDir: here('../../dist/desktop'),
    emptyOutDir: true,
    rolldownOptions: { input: here('main.ts'), output: { format: 'cjs', entryFileNames: 'main.cjs' } },
  },
});
