/** The built main process and preload, run together in Node over a stand-in for Electron. */
import fs from 'node:fs/promises';
import Module, { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'vite';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, test, vi } from 'vitest';
import type { Host } from '../../../app/host.ts';
import { FakeElectron } from './fake-electron.ts';

const project = fileURLToPath(new URL('../../..', import.meta.url));
const load = createRequire(import.meta.url);
type Loader = (request: string, ...rest: unknown[]) => unknown;
const modules = Module as unknown as { _load: Loader };
const ownLoader = modules._load;

let built: string;
beforeAll(async () => {
  built = await fs.mkdtemp(join(tmpdir(), 'skewback-program-'));
  for (const part of ['desktop', 'preload']) {
    await build({
      configFile: join(project, 'app', part, 'vite.config.ts'),
      logLevel: 'warn',
      build: { outDir: join(built, part) },
    });
  }
}, 60_000);
afterAll(() => fs.rm(built, { recursive: true, force: true }));

let folder: string;
beforeEach(async () => {
  folder = await fs.mkdtemp(join(tmpdir(), 'skewback-run-'));
  await fs.mkdir(join(folder, 'dist', 'renderer'), { recursive: true });
  await fs.writeFile(join(folder, 'dist', 'renderer', 'index.html'), 'the page');
});
afterEach(async () => {
  modules._load = ownLoader;
  await fs.rm(folder, { recursive: true, force: true });
});

/** Starts the program with these words on its command line. */
async function run({ words = [] as string[], lock = true } = {}): Promise<FakeElectron> {
  const electron = new FakeElectron(folder, join(folder, 'user'), lock);
  modules._load = (request, ...rest) =>
    request === 'electron' ? electron.module : ownLoader.call(Module, request, ...rest);
  const argv = process.argv;
  process.argv = ['skewback', ...words];
  for (const part of ['desktop/main.cjs', 'preload/preload.cjs']) {
    const file = join(built, part);
    Reflect.deleteProperty(load.cache, file);
    load(file);
  }
  process.argv = argv;
  if (lock) await vi.waitFor(() => expect(electron.windows[0]?.address).not.toBe(''));
  return electron;
}

const hostOf = (electron: FakeElectron): Host => electron.page['skewbackHost'] as Host;

describe('the program', () => {
  test('opens one window, shut in, on its own address', async () => {
    const electron = await run();
    expect(electron.windows).toHaveLength(1);
    expect(electron.windows[0]!.address).toBe('app://skewback/');
    expect(electron.windows[0]!.options['webPreferences']).toMatchObject({
      sandbox: true,
      contextIsolation: true,
      nodeIntegration: false,
      webviewTag: false,
    });
    expect(electron.privileged).toEqual([
      { scheme: 'app', privileges: { standard: true, secure: true, supportFetchAPI: true } },
    ]);
  });

  test('serves the built page at that address with its policy, and nothing else', async () => {
    const serve = (await run()).schemes.get('app')!;
    const page = await serve({ url: 'app://skewback/' });
    expect(await page.text()).toBe('the page');
    expect(page.headers.get('content-security-policy')).toContain("default-src 'none'");
    expect((await serve({ url: 'app://elsewhere/' })).status).toBe(404);
    expect((await serve({ url: 'app://skewback/..%2f..%2fpackage.json' })).status).toBe(404);
  });

  test('fetches nothing from outside and grants no permission', async () => {
    const { session } = await run();
    expect(session.fetches('app://skewback/assets/main.js')).toBe(true);
    expect(session.fetches('blob:app://skewback/1')).toBe(true);
    expect(session.fetches('https://example.com/')).toBe(false);
    expect(session.fetches('file:///etc/passwd')).toBe(false);
    expect(session.mayHave(null, 'geolocation')).toBe(false);
    expect(session.spellChecks).toBe(false);
  });

  test('lets the page go nowhere and open no window', async () => {
    const { app } = await run();
    const contents = Object.assign(new (await import('node:events')).EventEmitter(), {
      setWindowOpenHandler: vi.fn<(handler: () => { action: string }) => void>(),
    });
    app.emit('web-contents-created', {}, contents);
    const event = { preventDefault: vi.fn() };
    for (const way of ['will-navigate', 'will-redirect', 'will-attach-webview']) contents.emit(way, event);
    expect(event.preventDefault).toHaveBeenCalledTimes(3);
    expect(contents.setWindowOpenHandler.mock.calls[0]![0]()).toEqual({ action: 'deny' });
  });

  test('a second start gives way to the first', async () => {
    const electron = await run({ lock: false });
    expect(electron.app.hasQuit).toBe(true);
    expect(electron.windows).toEqual([]);
  });
});

describe('the page through the preload', () => {
  test('opens, saves and finds again', async () => {
    const electron = await run();
    const host = hostOf(electron);
    const path = join(folder, 'north.skewback');
    await fs.writeFile(path, 'job');
    electron.choice.filePaths = [path];
    const opened = await host.open();
    if (opened.kind !== 'done') throw new Error('was not opened');
    expect(Buffer.from(opened.value.bytes).toString()).toBe('job');
    expect(await host.save(opened.value.file, new TextEncoder().encode('edited'))).toMatchObject({ kind: 'done' });
    expect(await fs.readFile(path, 'utf8')).toBe('edited');
    expect(await host.recent!.list()).toHaveLength(1);
    expect(await host.print!()).toEqual({ kind: 'cancelled' });
  });

  test('knows versions and shell', async () => {
    const host = hostOf(await run());
    expect(host.shell).toBe('desktop');
    expect(host.versions.app).toMatch(/^\d+\.\d+\.\d+$/);
  });

  test('is refused where the question comes from another page, or is of another kind', async () => {
    const electron = await run();
    await expect(electron.invoke('file:save', 7, 'text')).rejects.toThrow('details of another kind');
    await expect(electron.invoke('file:save', 'id', [1, 2])).rejects.toThrow('details of another kind');
    await expect(electron.invoke('recent:list', 'more')).rejects.toThrow('details of another kind');
    electron.sender = 'https://example.com/';
    await expect(electron.invoke('recent:list')).rejects.toThrow('own page');
    electron.sender = 'app://skewback.example/';
    await expect(electron.invoke('recent:list')).rejects.toThrow('own page');
  });

  test('a file named at the start waits until the page listens', async () => {
    await fs.writeFile(join(folder, 'north.skewback'), 'job');
    const electron = await run({ words: ['--flag', join(folder, 'north.skewback')] });
    await new Promise((later) => setTimeout(later, 20));
    const heard: string[] = [];
    hostOf(electron).onOpenFile!((opened) => heard.push(opened.kind === 'done' ? opened.value.file.name : opened.kind));
    await vi.waitFor(() => expect(heard).toEqual(['north.skewback']));
  });

  test('a file opened while it runs comes to the same window, in front', async () => {
    const electron = await run();
    const heard: unknown[] = [];
    const unlisten = hostOf(electron).onOpenFile!((opened) => heard.push(opened));
    await fs.writeFile(join(folder, 'b.skewback'), 'job');
    electron.app.emit('second-instance', {}, ['skewback', 'b.skewback'], folder);
    await vi.waitFor(() => expect(heard).toHaveLength(1));
    electron.app.emit('open-file', { preventDefault: () => undefined }, join(folder, 'gone.skewback'));
    await vi.waitFor(() =>
      expect(heard[1]).toEqual({
        kind: 'failed',
        reason: 'gone.skewback cannot be read: there is no such file or folder.',
      }),
    );
    expect(electron.windows).toHaveLength(1);
    expect(electron.windows[0]!.isInFront).toBe(true);
    unlisten();
    electron.app.emit('second-instance', {}, ['skewback', 'b.skewback'], folder);
    await new Promise((later) => setTimeout(later, 20));
    expect(heard).toHaveLength(2);
  });

  test('closing asks the page only while work would be lost', async () => {
    const electron = await run();
    const [window] = electron.windows;
    const host = hostOf(electron);
    const asked = vi.fn();
    host.window!.onCloseRequested(asked);
    host.window!.setDirty(true);
    window!.close();
    expect(asked).toHaveBeenCalledTimes(1);
    expect(window!.isClosed).toBe(false);
    host.window!.close();
    await vi.waitFor(() => expect(window!.isClosed).toBe(true));
    expect(asked).toHaveBeenCalledTimes(1);
  });

  test('the menu speaks to the page, and the title is the job’s', async () => {
    const electron = await run();
    const host = hostOf(electron);
    const heard: string[] = [];
    host.window!.onCommand((command) => heard.push(command));
    const file = electron.menu.find(({ label }) => label === '&File')?.submenu as {
      label?: string;
      click?: () => void;
    }[];
    file.find(({ label }) => label === '&Save')!.click!();
    expect(heard).toEqual(['save']);
    host.window!.setTitle('North door');
    await vi.waitFor(() => expect(electron.windows[0]!.title).toBe('North door · Skewback'));
  });
});
