/** What the packed program carries, packed for real around a stand-in for Electron's own files. */
import { spawnSync } from 'node:child_process';
import fs from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, expect, test } from 'vitest';

const project = fileURLToPath(new URL('../..', import.meta.url));

/** How Electron's program marks the place of its fuses, from its own documentation; then version, count and states. */
const FUSE_MARK = 'dL7pKGdnNz796PbbjQWNKmHXBZaB9tsX';
const FUSES = Buffer.concat([Buffer.from(FUSE_MARK), Buffer.from([1, 8]), Buffer.from('10110001')]);

let folder: string;
let packed: string;
beforeAll(async () => {
  folder = await fs.mkdtemp(join(tmpdir(), 'skewback-packed-'));
  const write = async (path: string, content: string | Buffer): Promise<void> => {
    await fs.mkdir(join(folder, path, '..'), { recursive: true });
    await fs.writeFile(join(folder, path), content);
  };
  for (const name of ['package.json', 'electron-builder.yml', 'LICENSE'])
    await fs.copyFile(join(project, name), join(folder, name));
  for (const path of ['dist/desktop/main.cjs', 'dist/preload/preload.cjs', 'dist/renderer/index.html'])
    await write(path, path);
  for (const path of ['core/job/schema.ts', 'tests/a.test.ts', '.env', 'node_modules/konva/index.js'])
    await write(path, path);
  await write('electron/electron', FUSES);
  await write('electron/locales/en-GB.pak', '');
  await fs.mkdir(join(folder, 'electron', 'resources'));
  const run = spawnSync(
    process.execPath,
    [
      join(project, 'node_modules/electron-builder/cli.js'),
      ...['--linux', 'dir', '--x64', '--projectDir', folder],
      ...[`-c.electronDist=${join(folder, 'electron')}`, '-c.electronVersion=45.5.0'],
    ],
    { encoding: 'utf8', timeout: 100_000 },
  );
  if (run.status !== 0) throw new Error(run.stdout + run.stderr);
  packed = join(folder, 'out', 'linux-unpacked');
}, 120_000);
afterAll(() => fs.rm(folder, { recursive: true, force: true }));

/** File names in an asar: a header of JSON after sixteen bytes, its length in the last four of them. */
async function names(asar: string): Promise<string[]> {
  const bytes = await fs.readFile(asar);
  const header = JSON.parse(bytes.subarray(16, 16 + bytes.readUInt32LE(12)).toString()) as Entry;
  return filesOf(header, '');
}

interface Entry {
  readonly files?: Readonly<Record<string, Entry>>;
}

function filesOf({ files = {} }: Entry, path: string): string[] {
  return Object.entries(files).flatMap(([name, entry]) =>
    entry.files === undefined ? [path + name] : filesOf(entry, `${path}${name}/`),
  );
}

test('the packed program holds what was built and nothing else', async () => {
  expect((await names(join(packed, 'resources', 'app.asar'))).sort()).toEqual([
    'LICENSE',
    'dist/desktop/main.cjs',
    'dist/preload/preload.cjs',
    'dist/renderer/index.html',
    'package.json',
  ]);
});

test('the packed program runs its own code only', async () => {
  const program = await fs.readFile(join(packed, 'skewback'));
  const at = program.indexOf(FUSE_MARK) + FUSE_MARK.length + 2;
  // Run as Node, cookies, NODE_OPTIONS, inspector, integrity, only from the asar, snapshot, file:// privileges.
  expect(program.subarray(at, at + 8).toString()).toBe('01001100');
});
