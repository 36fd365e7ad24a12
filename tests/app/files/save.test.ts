import { spawnSync } from 'node:child_process';
import fs from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { saveWhole, saveWholeInFolder } from '../../../app/files/save.ts';

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);
const root = process.getuid?.() === 0;

let folder: string;
beforeEach(async () => {
  folder = await fs.mkdtemp(join(tmpdir(), 'skewback-save-'));
});
afterEach(async () => {
  vi.restoreAllMocks();
  await fs.rm(folder, { recursive: true, force: true });
});

/** The superuser may write anywhere, so a test of refusals is done as somebody else. */
async function asNobody<Value>(act: () => Promise<Value>): Promise<Value> {
  if (!root) return act();
  await fs.chmod(folder, 0o777);
  process.seteuid!(65534);
  try {
    return await act();
  } finally {
    process.seteuid!(0);
  }
}

describe('saving a job file', () => {
  test('writes a new file and leaves nothing beside it', async () => {
    const path = join(folder, 'north door.skewback');
    expect(await saveWhole(path, bytes('new'))).toEqual({ kind: 'done', value: null });
    expect(await fs.readFile(path, 'utf8')).toBe('new');
    expect(await fs.readdir(folder)).toEqual(['north door.skewback']);
  });

  test('writes over a file and keeps its permissions', async () => {
    const path = join(folder, 'a.skewback');
    await fs.writeFile(path, 'old');
    await fs.chmod(path, 0o640);
    await saveWhole(path, bytes('new'));
    expect(await fs.readFile(path, 'utf8')).toBe('new');
    expect((await fs.stat(path)).mode & 0o777).toBe(0o640);
  });

  test.runIf(root)('keeps the owner where it may', async () => {
    const path = join(folder, 'a.skewback');
    await fs.writeFile(path, 'old');
    await fs.chown(path, 65534, 65534);
    await saveWhole(path, bytes('new'));
    expect((await fs.stat(path)).uid).toBe(65534);
  });

  test('follows a link and leaves it a link', async () => {
    await fs.writeFile(join(folder, 'real.skewback'), 'old');
    await fs.symlink('real.skewback', join(folder, 'link.skewback'));
    await saveWhole(join(folder, 'link.skewback'), bytes('new'));
    expect(await fs.readFile(join(folder, 'real.skewback'), 'utf8')).toBe('new');
    expect((await fs.lstat(join(folder, 'link.skewback'))).isSymbolicLink()).toBe(true);
  });

  test('writes part of a larger buffer, not the whole of it', async () => {
    const path = join(folder, 'a.skewback');
    await saveWhole(path, bytes('--middle--').subarray(2, 8));
    expect(await fs.readFile(path, 'utf8')).toBe('middle');
  });

  test('takes a name as long as the disk allows', async () => {
    const path = join(folder, `${'n'.repeat(246)}.skewback`);
    expect(await saveWhole(path, bytes('new'))).toMatchObject({ kind: 'done' });
  });

  test('of many saves asked for at once the last one stays', async () => {
    const path = join(folder, 'a.skewback');
    const texts = Array.from({ length: 20 }, (_, k) => `${k} `.repeat(5000 - 200 * k));
    await Promise.all(texts.map((text) => saveWhole(path, bytes(text))));
    expect(await fs.readFile(path, 'utf8')).toBe(texts.at(-1));
    expect(await fs.readdir(folder)).toEqual(['a.skewback']);
  });

  test('makes the folder of a drawing that has none yet', async () => {
    const path = join(folder, 'sheets', 'north', 'elevation.svg');
    expect(await saveWholeInFolder(path, bytes('<svg/>'))).toMatchObject({ kind: 'done' });
    expect(await fs.readFile(path, 'utf8')).toBe('<svg/>');
  });
});

describe('a save that cannot be', () => {
  test('says that a folder may not be written to, and the old file stands', async () => {
    const path = join(folder, 'a.skewback');
    await fs.writeFile(path, 'old');
    const outcome = await asNobody(async () => {
      if (root) process.seteuid!(0);
      await fs.chmod(folder, 0o555);
      await fs.chmod(path, 0o666);
      if (root) process.seteuid!(65534);
      return saveWhole(path, bytes('new'));
    });
    await fs.chmod(folder, 0o755);
    expect(outcome).toEqual({ kind: 'failed', because: 'permission is denied' });
    expect(await fs.readFile(path, 'utf8')).toBe('old');
  });

  test('does not replace a file that is protected against writing, in a folder that is not', async () => {
    const path = join(folder, 'a.skewback');
    await fs.writeFile(path, 'old');
    await fs.chmod(path, 0o444);
    const outcome = await asNobody(() => saveWhole(path, bytes('new')));
    expect(outcome).toEqual({ kind: 'failed', because: 'permission is denied' });
    expect(await fs.readFile(path, 'utf8')).toBe('old');
  });

  test('says that the folder is gone', async () => {
    const path = join(folder, 'gone', 'a.skewback');
    const because = 'there is no such file or folder';
    expect(await saveWhole(path, bytes('new'))).toEqual({ kind: 'failed', because });
  });

  test('does not replace a folder', async () => {
    expect(await saveWhole(folder, bytes('new'))).toMatchObject({ kind: 'failed' });
    expect((await fs.stat(folder)).isDirectory()).toBe(true);
  });

  test('a folder that cannot be made is said to be the cause', async () => {
    await fs.writeFile(join(folder, 'file'), '');
    const path = join(folder, 'file', 'elevation.svg');
    const because = 'its folder cannot be made: there is already a file of that name';
    expect(await saveWholeInFolder(path, bytes('new'))).toEqual({ kind: 'failed', because });
  });

  test('on a disk reported full, the old file stands and nothing is left beside it', async () => {
    const path = join(folder, 'a.skewback');
    await fs.writeFile(path, 'old');
    const probe = await fs.open(path);
    const handles = Object.getPrototypeOf(probe) as { sync: () => Promise<void> };
    await probe.close();
    vi.spyOn(handles, 'sync').mockRejectedValue(Object.assign(new Error('ENOSPC: no space'), { code: 'ENOSPC' }));
    const outcome = await saveWhole(path, bytes('new'));
    expect(outcome).toEqual({ kind: 'failed', because: 'the disk is full' });
    expect(await fs.readFile(path, 'utf8')).toBe('old');
    expect(await fs.readdir(folder)).toEqual(['a.skewback']);
  });
});

/** A disk of 64 kB, where this machine lets one be made. */
function mountTiny(at: string): boolean {
  return root && spawnSync('mount', ['-t', 'tmpfs', '-o', 'size=64k', 'tmpfs', at], { stdio: 'ignore' }).status === 0;
}

test('a disk that fills up half-way through: the old file stands, whole, and nothing is left beside it', async (context) => {
  const disk = join(folder, 'disk');
  await fs.mkdir(disk);
  if (!mountTiny(disk)) context.skip('needs to mount a small disk, which this machine does not allow');
  try {
    const path = join(disk, 'a.skewback');
    await fs.writeFile(path, 'old');
    // The first 60 kB go through: a writer that does not look at how much was taken would keep just those.
    const outcome = await saveWhole(path, new Uint8Array(200_000));
    expect(outcome).toEqual({ kind: 'failed', because: 'the disk is full' });
    expect(await fs.readFile(path, 'utf8')).toBe('old');
    expect(await fs.readdir(disk)).toEqual(['a.skewback']);
  } finally {
    spawnSync('umount', [disk]);
  }
});
