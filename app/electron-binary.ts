import { existsSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';

/**
 * Electron's program on this machine, or null. Its package comes without it and fetches it when first asked, which
 * this never does: it only looks.
 * @param overrideFolder the environment's `ELECTRON_OVERRIDE_DIST_PATH`
 */
export function electronBinary(overrideFolder: string | undefined): string | null {
  try {
    const folder = dirname(createRequire(import.meta.url).resolve('electron/package.json'));
    const program = readFileSync(join(folder, 'path.txt'), 'utf8').trim();
    const path = join(overrideFolder ?? join(folder, 'dist'), program);
    return existsSync(path) ? path : null;
  } catch {
    return overrideFolder === undefined ? null : overriddenWithoutPackage(overrideFolder);
  }
}

/** `path.txt` is written with the program; a folder given by hand may stand without it. */
function overriddenWithoutPackage(folder: string): string | null {
  const names = ['electron', 'electron.exe', 'Electron.app/Contents/MacOS/Electron'];
  return names.map((name) => join(folder, name)).find((path) => existsSync(path)) ?? null;
}

/** Whether a window can be shown at all: on Linux there has to be a screen to show it on. */
export function hasScreen(platform: NodeJS.Platform, env: NodeJS.ProcessEnv): boolean {
  return platform !== 'linux' || Boolean(env['DISPLAY'] ?? env['WAYLAND_DISPLAY']);
}
