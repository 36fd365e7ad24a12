import { spawnSync } from 'node:child_process';
import fs from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { LARGEST_FILE, readStreamWithin, readWithin } from '../../../app/files/read.ts';

let folder: string;
beforeEach(async () => {
  folder = await fs.mkdtemp(join(tmpdir(), 'skewback-read-'));
});
afterEach(() => fs.rm(folder, { recursive: true, force: true }));

test('reads a file as it is', async () => {
  const path = join(folder, 'a.skewback');
  await fs.writeFile(path, 'text');
  const outcome = await readWithin(path);
  expect(outcome.kind === 'done' && new TextDecoder().decode(outcome.value)).toBe('text');
});

test('reads an empty file as no bytes', async () => {
  await fs.writeFile(join(folder, 'empty'), '');
  expect(await readWithin(join(folder, 'empty'))).toEqual({ kind: 'done', value: new Uint8Array() });
});

test('refuses a file past the limit without reading it, and takes one at the limit', async () => {
  const path = join(folder, 'large');
  await fs.writeFile(path, '');
  await fs.truncate(path, LARGEST_FILE + 1);
  const because = 'it is larger than 50 MB';
  expect(await readWithin(path)).toEqual({ kind: 'failed', because });
  await fs.truncate(path, LARGEST_FILE);
  expect(await readWithin(path)).toMatchObject({ kind: 'done' });
});

test('says that there is no such file', async () => {
  const path = join(folder, 'none');
  const because = 'there is no such file or folder';
  expect(await readWithin(path)).toEqual({ kind: 'failed', because });
});

test('refuses a folder', async () => {
  expect(await readWithin(folder)).toEqual({ kind: 'failed', because: 'it is not a file' });
});

test.skipIf(process.platform === 'win32')(
  'refuses a pipe that nobody writes to, and does not wait for it',
  async () => {
    const path = join(folder, 'pipe');
    spawnSync('mkfifo', [path]);
    expect(await readWithin(path)).toEqual({ kind: 'failed', because: 'it is not a file' });
  },
);

test('refuses a device without end', async () => {
  expect(await readWithin('/dev/zero')).toMatchObject({ kind: 'failed' });
});

test('reads a stream to its end, and refuses one past the limit', async () => {
  const stream = (): Readable => Readable.from([Buffer.from('ab'), Buffer.from('cd')]);
  const outcome = await readStreamWithin(stream(), 4);
  expect(outcome.kind === 'done' && new TextDecoder().decode(outcome.value)).toBe('abcd');
  const because = 'it is larger than 2 MB';
  const large = Readable.from([Buffer.alloc(1_500_000), Buffer.alloc(1_500_000)]);
  expect(await readStreamWithin(large, 2_000_000)).toEqual({ kind: 'failed', because });
});
