/**
 * `npm run bench`: every bench, one after the other, so that none disturbs another. The statics are bundled first, as the
 * program ships: the loader that runs the sources wraps every function and would be timed with them.
 */
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { build } from 'vite';

const PROJECT = join(import.meta.dirname, '..', '..');
const BUNDLED = ['statics', 'supports'];

await build({
  configFile: false,
  root: PROJECT,
  logLevel: 'error',
  build: {
    ssr: true,
    outDir: 'dist/bench',
    emptyOutDir: true,
    rolldownOptions: { input: BUNDLED.map((name) => join(import.meta.dirname, `${name}.ts`)) },
  },
});
for (const name of BUNDLED) await import(pathToFileURL(join(PROJECT, 'dist/bench', `${name}.js`)).href);
await import('./frames.ts');
