/**
 * `npm run build`: the page and the two parts of the desktop into `dist`. Notes when it began, so that `npm start` can
 * tell whether anything has changed since.
 */
import { readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build, type LogLevel } from 'vite';

export const PROJECT_FOLDER = fileURLToPath(new URL('..', import.meta.url));

const CONFIGS = ['vite.config.ts', 'app/desktop/vite.config.ts', 'app/preload/vite.config.ts'];

/** What the build is made from. */
const SOURCES = [
  'app',
  'assets',
  'core',
  'renderer',
  'package.json',
  'svelte.config.js',
  'tsconfig.json',
  'vite.config.ts',
];

const stampOf = (projectFolder: string): string => join(projectFolder, 'dist', 'built-from.txt');

/** Builds everything. @throws with the build's own message when a part cannot be built */
export async function buildAll(logLevel: LogLevel): Promise<void> {
  const began = Date.now();
  for (const config of CONFIGS) await build({ configFile: join(PROJECT_FOLDER, config), logLevel });
  writeFileSync(stampOf(PROJECT_FOLDER), `${began}\n`);
}

/** Whether there is no build, or something under `SOURCES` has changed, come or gone since it began. */
export function buildIsStale(projectFolder: string): boolean {
  let began: number;
  try {
    began = Number(readFileSync(stampOf(projectFolder), 'utf8'));
  } catch {
    return true;
  }
  // Written so that a stamp that is no number counts as none.
  return !SOURCES.every((name) => newest(join(projectFolder, name)) < began);
}

/** Time of the latest change at or under `path`, ms; a folder changes when something in it comes or goes. */
function newest(path: string): number {
  const stat = statSync(path, { throwIfNoEntry: false });
  if (stat === undefined) return 0;
  if (!stat.isDirectory()) return stat.mtimeMs;
  return readdirSync(path).reduce((latest, name) => Math.max(latest, newest(join(path, name))), stat.mtimeMs);
}

if (process.argv[1] === fileURLToPath(import.meta.url)) await buildAll('info');
