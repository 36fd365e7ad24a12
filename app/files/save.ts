import { randomBytes } from 'node:crypto';
import type { Stats } from 'node:fs';
import { mkdir, open, realpath, rename, stat, unlink } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { clauseFor, done, failed, type Settled } from './failure.ts';

/** The last save asked for of each path that is being written, so that a later one waits and is the one that stays. */
const underWay = new Map<string, Promise<unknown>>();

/**
 * Writes the file whole or not at all: into a temporary file beside it, flushed to the disk, then renamed over it. What
 * stood there before stays until that last step, and its permissions and owner are kept. A link is followed. A file
 * that may not be written to, or is no ordinary file, is refused although its folder would let it be replaced.
 */
export async function saveWhole(path: string, bytes: Uint8Array): Promise<Settled<null>> {
  const before = underWay.get(path) ?? Promise.resolve();
  const saving = before
    .then(() => replace(path, bytes))
    .then(
      () => done(null),
      (error: unknown) => failed(clauseFor(error)),
    );
  underWay.set(path, saving);
  const outcome = await saving;
  if (underWay.get(path) === saving) underWay.delete(path);
  return outcome;
}

/** The same, making the folder first where it is missing. */
export async function saveWholeInFolder(path: string, bytes: Uint8Array): Promise<Settled<null>> {
  const folder = dirname(path);
  try {
    await mkdir(folder, { recursive: true });
  } catch (error) {
    return failed(`its folder cannot be made: ${clauseFor(error)}`);
  }
  return saveWhole(path, bytes);
}

async function replace(path: string, bytes: Uint8Array): Promise<void> {
  const target = await realpath(path).catch(() => path);
  const old = await stat(target).catch(() => null);
  if (old !== null && !old.isFile()) throw new Error('it is not a file');
  if (old !== null) await (await open(target, 'r+')).close();
  const folder = dirname(target);
  // Its own short name: the target's with something added could be longer than the disk allows.
  const aside = join(folder, `.skewback-${randomBytes(6).toString('hex')}.tmp`);
  try {
    await writeFlushed(aside, bytes, old);
    await rename(aside, target);
  } catch (error) {
    await unlink(aside).catch(() => undefined);
    throw error;
  }
  await flushFolder(folder);
}

/**
 * Every byte on the disk, or an error. `FileHandle.writeFile` goes on after a short write, which is how a disk that
 * fills up half-way shows itself first.
 */
async function writeFlushed(path: string, bytes: Uint8Array, old: Stats | null): Promise<void> {
  const handle = await open(path, 'wx', old === null ? 0o666 : old.mode & 0o777);
  try {
    await handle.writeFile(bytes);
    if (old !== null) {
      // Only a superuser may give a file away; for anyone else it stays the saver's own.
      await handle.chown(old.uid, old.gid).catch(() => undefined);
      await handle.chmod(old.mode & 0o7777);
    }
    await handle.sync();
  } finally {
    await handle.close();
  }
}

/** Puts the rename itself on the disk. Not every system lets a folder be opened; the file is safe without. */
async function flushFolder(folder: string): Promise<void> {
  try {
    const handle = await open(folder, 'r');
    try {
      await handle.sync();
    } finally {
      await handle.close();
    }
  } catch {
    return;
  }
}
