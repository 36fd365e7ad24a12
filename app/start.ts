/**
 * `npm start`: builds what has changed, then opens the desktop where Electron's program and a screen are there, and
 * otherwise serves the same page to the browsers of this machine.
 *
 * `--browser` serves in any case; `--port N` serves at that port; other words are files to open (desktop only).
 */
import { spawn } from 'node:child_process';
import { join, resolve } from 'node:path';
import { parseArgs } from 'node:util';
import { buildAll, buildIsStale, PROJECT_FOLDER } from './build.ts';
import { electronBinary, hasScreen } from './electron-binary.ts';
import { servePage, type Serving } from './web/server.ts';

/** Drafts in a browser belong to an address, so the address stays the same where it can. */
const USUAL_PORT = 4785;

const { values, positionals } = parseArgs({
  allowPositionals: true,
  options: { browser: { type: 'boolean', default: false }, port: { type: 'string' } },
});

if (buildIsStale(PROJECT_FOLDER)) {
  console.error('Building Skewback…');
  await buildAll('warn');
}

const electron = values.browser ? null : electronBinary(process.env['ELECTRON_OVERRIDE_DIST_PATH']);
if (electron !== null && hasScreen(process.platform, process.env))
  openDesktop(
    electron,
    positionals.map((file) => resolve(process.env['INIT_CWD'] ?? '', file)),
  );
else await serveBrowsers(values.port);

function openDesktop(program: string, files: readonly string[]): void {
  // Chromium refuses its sandbox to the superuser.
  const asRoot = process.getuid?.() === 0 ? ['--no-sandbox'] : [];
  const child = spawn(program, [PROJECT_FOLDER, ...asRoot, ...files], { stdio: 'inherit' });
  child.on('error', (error) => {
    console.error(`Electron could not be started: ${error.message}`);
    process.exitCode = 1;
  });
  child.on('close', (code) => {
    process.exitCode = code ?? 1;
  });
}

async function serveBrowsers(port: string | undefined): Promise<void> {
  const serving = await serveAt(port);
  if (serving === null) {
    console.error(`Port ${port ?? ''} cannot be had; leave --port out to take any that is free.`);
    process.exitCode = 1;
    return;
  }
  console.log(`Skewback is at ${serving.address}`);
}

/** Serves at the port asked for or not at all; with none asked for, at the usual one or else at any. */
async function serveAt(port: string | undefined): Promise<Serving | null> {
  const root = join(PROJECT_FOLDER, 'dist', 'renderer');
  const tries = port === undefined ? [USUAL_PORT, 0] : [Number(port)];
  for (const one of tries) {
    if (!Number.isInteger(one) || one < 0 || one > 65_535) return null;
    const serving = await servePage(root, one).catch(() => null);
    if (serving !== null) return serving;
  }
  return null;
}
