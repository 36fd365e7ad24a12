import { constants } from 'node:fs';
import { open } from 'node:fs/promises';
import { clauseFor, done, failed, type Settled } from './failure.ts';

/** The largest job file that is read, in bytes; photographs included. Above it the file is some other thing. */
export const LARGEST_FILE = 50_000_000;

/**
 * The file's bytes, unless it is larger than `limit` or no ordinary file (a folder, a pipe, a device). Reads at most
 * `limit` bytes whatever the file's size claims.
 */
export async function readWithin(path: string, limit = LARGEST_FILE): Promise<Settled<Uint8Array>> {
  try {
    // Without O_NONBLOCK, opening a pipe that nobody writes to would wait for ever.
    const handle = await open(path, constants.O_RDONLY | constants.O_NONBLOCK);
    try {
      const { size, isFile } = await handle.stat().then((stat) => ({ size: stat.size, isFile: stat.isFile() }));
      if (!isFile) return failed('it is not a file');
      if (size > limit) return failed(tooLarge(limit));
      // One byte more than was promised shows a file that is still growing.
      const bytes = new Uint8Array(size + 1);
      let filled = 0;
      while (filled < bytes.length) {
        const { bytesRead } = await handle.read(bytes, filled, bytes.length - filled);
        if (bytesRead === 0) break;
        filled += bytesRead;
      }
      if (filled > size) return failed('another program is writing to it');
      return done(bytes.subarray(0, filled));
    } finally {
      await handle.close();
    }
  } catch (error) {
    return failed(clauseFor(error));
  }
}

/** The whole of a stream such as standard input, within the same limit. */
export async function readStreamWithin(
  stream: AsyncIterable<unknown>,
  limit = LARGEST_FILE,
): Promise<Settled<Uint8Array>> {
  const chunks: Uint8Array[] = [];
  let length = 0;
  try {
    for await (const chunk of stream) {
      const bytes = chunk instanceof Uint8Array ? chunk : Buffer.from(String(chunk));
      length += bytes.length;
      if (length > limit) return failed(tooLarge(limit));
      chunks.push(bytes);
    }
  } catch (error) {
    return failed(clauseFor(error));
  }
  return done(Buffer.concat(chunks, length));
}

const tooLarge = (limit: number): string => `it is larger than ${Math.floor(limit / 1_000_000)} MB`;
