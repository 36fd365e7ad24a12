/** The page's own worker for working without its server: built as one file that names and fingerprints all others. */
import { createHash } from 'node:crypto';
import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join, sep } from 'node:path';
import type { Plugin } from 'vite';

/** At the foot of the page's address, so that the whole page lies in its reach. */
const WORKER = 'offline.js';

/** The name of an entry of the build: the worker keeps its own, so that browsers find it again. */
export const entryFileName = ({ name }: { readonly name: string }): string =>
  name === 'offline' ? WORKER : 'assets/[name]-[hash].js';

/** Puts the list of the files that were written before the worker's code. */
export function offlineFiles(): Plugin {
  return {
    name: 'skewback-offline-files',
    apply: 'build',
    writeBundle({ dir = '' }) {
      const files = builtFiles(dir);
      const worker = join(dir, WORKER);
      writeFileSync(worker, `const BUILT_FILES=${JSON.stringify(files)};\n${readFileSync(worker, 'utf8')}`);
    },
  };
}

/** SHA-256 of every file under the folder but the worker itself, by its path with forward strokes, in order. */
export function builtFiles(folder: string): Readonly<Record<string, string>> {
  const paths = readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => join(entry.parentPath, entry.name).slice(folder.length + 1))
    .map((path) => path.split(sep).join('/'))
    .filter((path) => path !== WORKER)
    .sort();
  return Object.fromEntries(
    paths.map((path) => [
      path,
      createHash('sha256')
        .update(readFileSync(join(folder, path)))
        .digest('hex'),
    ]),
  );
}
