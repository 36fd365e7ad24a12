import fs from 'node:fs/promises';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { buildIsStale } from '../../app/build.ts';
import { electronBinary, hasScreen } from '../../app/electron-binary.ts';

let folder: string;
beforeEach(async () => {
  folder = await fs.mkdtemp(join(tmpdir(), 'skewback-start-'));
});
afterEach(() => fs.rm(folder, { recursive: true, force: true }));

describe('whether to build before starting', () => {
  const BEGAN = Date.UTC(2026, 4, 14);

  /** A project all of whose sources are a minute older than its build. */
  async function project(): Promise<void> {
    for (const path of ['core/job/schema.ts', 'renderer/main.ts', 'app/start.ts', 'dist/renderer/index.html']) {
      await fs.mkdir(join(folder, dirname(path)), { recursive: true });
      await fs.writeFile(join(folder, path), '');
    }
    await fs.writeFile(join(folder, 'package.json'), '{}');
    await fs.writeFile(join(folder, 'dist/built-from.txt'), `${BEGAN}\n`);
    for (const path of await fs.readdir(folder, { recursive: true })) await age(path, -60);
  }
  const age = (path: string, seconds: number): Promise<void> =>
    fs.utimes(join(folder, path), new Date(), new Date(BEGAN + seconds * 1000));

  test('not where nothing has changed since', async () => {
    await project();
    expect(buildIsStale(folder)).toBe(false);
  });

  test('where there is no build', async () => {
    await project();
    await fs.rm(join(folder, 'dist'), { recursive: true });
    expect(buildIsStale(folder)).toBe(true);
  });

  test('where nobody can tell when it was built', async () => {
    await project();
    await fs.writeFile(join(folder, 'dist/built-from.txt'), 'yesterday');
    expect(buildIsStale(folder)).toBe(true);
  });

  test.each(['core/job/schema.ts', 'package.json'])('where %s has changed since', async (path) => {
    await project();
    await age(path, 1);
    expect(buildIsStale(folder)).toBe(true);
  });

  test('where a source was taken away', async () => {
    await project();
    await fs.rm(join(folder, 'core/job/schema.ts'));
    expect(buildIsStale(folder)).toBe(true);
  });
});

describe('whether the desktop can be opened', () => {
  test('Electron is found in the folder that the environment names', async () => {
    expect(electronBinary(folder)).toBeNull();
    await fs.writeFile(join(folder, 'electron'), '');
    await fs.writeFile(join(folder, 'electron.exe'), '');
    await fs.mkdir(join(folder, 'Electron.app/Contents/MacOS'), { recursive: true });
    await fs.writeFile(join(folder, 'Electron.app/Contents/MacOS/Electron'), '');
    expect(electronBinary(folder)).toMatch(/[Ee]lectron/);
  });

  test('without that, it is there when its package has fetched it', async () => {
    const fetched = join(dirname(createRequire(import.meta.url).resolve('electron/package.json')), 'path.txt');
    const isFetched = await fs.access(fetched).then(
      () => true,
      () => false,
    );
    expect(electronBinary(undefined) !== null).toBe(isFetched);
  });

  test('on Linux a screen is needed, elsewhere there is one', () => {
    expect(hasScreen('linux', {})).toBe(false);
    expect(hasScreen('linux', { DISPLAY: ':0' })).toBe(true);
    expect(hasScreen('linux', { WAYLAND_DISPLAY: 'wayland-0' })).toBe(true);
    expect(hasScreen('win32', {})).toBe(true);
  });
});
