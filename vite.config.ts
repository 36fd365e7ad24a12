import { svelte } from '@sveltejs/vite-plugin-svelte';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vite';
import { entryFileName, offlineFiles } from './app/page/offline.ts';

const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));

/** The page: the same build is served by the desktop through `app://` and by the loopback server. */
export default defineConfig({
  root: here('renderer'),
  base: './',
  plugins: [svelte({ configFile: here('svelte.config.js') }), offlineFiles()],
  worker: { format: 'es' },
  build: {
    outDir: here('dist/renderer'),
    emptyOutDir: true,
    target: 'chrome120',
    // The page's policy allows no inline source: fonts and icons stay files.
    assetsInlineLimit: 0,
    rolldownOptions: {
      input: { index: here('renderer/index.html'), offline: here('renderer/offline/worker.ts') },
      output: { entryFileNames: entryFileName },
    },
  },
  server: { host: '127.0.0.1', port: 5173, fs: { allow: [here('.')] } },
  optimizeDeps: { include: ['svelte', 'konva'] },
});
