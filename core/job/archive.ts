/**
 * The `.skewback` file: a zip that holds `job.json` and, beside it, the photographs. A bare `job.json` is read as well.
 *
 * Sizes are judged by what the archive declares before anything is unpacked, what was unpacked is held against its
 * check sum, and every refusal is one sentence. Nothing is thrown by reading.
 */
import { strFromU8, strToU8, unzipSync, zipSync } from 'fflate';
import type { UnzipFileInfo, Zippable } from 'fflate';
import { ProblemError } from './problem.ts';
import type { Problem } from './problem.ts';
import { READ_LIMITS, readJob, tooLong } from './read.ts';
import type { Reading } from './read.ts';
import type { Job } from './schema.ts';
import { shown } from './shown.ts';
import { writeJob } from './write.ts';
import { checkSum, checkSumsOf } from './zip-check.ts';

const JOB_NAME = 'job.json';

/** What one archive may hold. A photograph of 64 MB is beyond any camera's compressed file. */
const ARCHIVE_LIMITS = {
  entries: 2_000,
  /** Bytes unpacked, of one file and of all. */
  file: 64 * 1024 * 1024,
  total: 512 * 1024 * 1024,
} as const;

/** File name to bytes, as in the archive; names may have folders, divided by `/`. */
export type Photographs = ReadonlyMap<string, Uint8Array>;

/** Reads the bytes of a `.skewback` file or of a bare `job.json`. */
export function readJobFile(bytes: Uint8Array): Reading<{ readonly job: Job; readonly photographs: Photographs }> {
  try {
    return isZip(bytes) ? readArchive(bytes) : withPhotographs(jobIn(bytes), new Map());
  } catch (error) {
    if (error instanceof ProblemError) return { ok: false, problems: error.problems };
    return { ok: false, problems: [damaged()] };
  }
}

/**
 * The job and its photographs as an archive; the same bytes for the same content, wherever and whenever written.
 *
 * @throws RangeError when a photograph's name could not be read back.
 */
export function writeJobFile(job: Job, photographs: Photographs = new Map()): Uint8Array {
  // Zip keeps local time from 1980 on, so a date given by its parts reads the same in every time zone.
  const mtime = new Date(1980, 0, 1);
  const entries: Zippable = { [JOB_NAME]: [strToU8(writeJob(job)), { level: 6, mtime }] };
  for (const name of [...photographs.keys()].sort()) {
    if (name === JOB_NAME || !isPlainName(name)) throw new RangeError(`a photograph cannot be called "${name}"`);
    entries[name] = [photographs.get(name)!, { level: 0, mtime }];
  }
  return zipSync(entries);
}

function isZip(bytes: Uint8Array): boolean {
  return bytes[0] === 0x50 && bytes[1] === 0x4b && (bytes[2] === 3 || bytes[2] === 5);
}

function readArchive(bytes: Uint8Array): Reading<{ readonly job: Job; readonly photographs: Photographs }> {
  const photographs = unpacked(bytes);
  const job = photographs.get(JOB_NAME);
  if (job === undefined) refuse('', `the archive holds no ${JOB_NAME}`, 'choose a file saved by Skewback');
  photographs.delete(JOB_NAME);
  return withPhotographs(jobIn(job), photographs);
}

function withPhotographs(
  reading: Reading<{ readonly job: Job }>,
  photographs: Photographs,
): Reading<{ readonly job: Job; readonly photographs: Photographs }> {
  return reading.ok ? { ...reading, photographs } : reading;
}

/** All files of the archive that are not folders, each whole and unharmed. */
function unpacked(bytes: Uint8Array): Map<string, Uint8Array> {
  const sizes = new Map<string, number>();
  const contents = unzipSync(bytes, { filter: admitted(sizes) });
  const sums = checkSumsOf(bytes);
  const files = new Map<string, Uint8Array>();
  for (const [name, size] of sizes) {
    const content = contents[name];
    if (content?.length !== size || checkSum(content) !== sums.get(name)) throw new ProblemError([damaged(name)]);
    files.set(name, content);
  }
  return files;
}

/** Looks at each entry before it is unpacked; notes its size, skips folders, throws on what is not allowed. */
function admitted(sizes: Map<string, number>): (entry: UnzipFileInfo) => boolean {
  let count = 0;
  let total = 0;
  return ({ name, size, originalSize }) => {
    count += 1;
    if (count > ARCHIVE_LIMITS.entries) {
      refuse('', 'the archive holds too many files', `a job has at most ${ARCHIVE_LIMITS.entries}`);
    }
    if (name.endsWith('/')) return false;
    if (!isPlainName(name)) {
      refuse(name, 'the archive holds a file whose name is not allowed', 'use plain names within the archive');
    }
    if (sizes.has(name)) refuse(name, 'the archive holds two files of one name', 'keep only one of them');
    const largest = Math.max(size, originalSize);
    if (name === JOB_NAME && largest > READ_LIMITS.characters) throw new ProblemError([tooLong(largest)]);
    total += largest;
    if (largest > ARCHIVE_LIMITS.file) {
      refuse(name, 'a file in the archive is too large', `each has at most ${megabytes(ARCHIVE_LIMITS.file)} unpacked`);
    }
    if (total > ARCHIVE_LIMITS.total) {
      refuse('', 'the archive is too large', `it has at most ${megabytes(ARCHIVE_LIMITS.total)} unpacked`);
    }
    sizes.set(name, originalSize);
    return true;
  };
}

/** A name that stays where it is put: no way up, no root, no drive, nothing that a prototype would answer to. */
function isPlainName(name: string): boolean {
  const parts = name.split('/');
  return (
    name.length <= 200 &&
    name !== '__proto__' &&
    !/[\\:\p{Cc}]/u.test(name) &&
    parts.every((part) => part !== '' && part !== '.' && part !== '..')
  );
}

function jobIn(bytes: Uint8Array): Reading<{ readonly job: Job }> {
  if (bytes.length > READ_LIMITS.characters) throw new ProblemError([tooLong(bytes.length)]);
  return readJob(textOf(bytes));
}

function textOf(bytes: Uint8Array): string {
  const [first, second] = bytes;
  if ((first === 0xff && second === 0xfe) || (first === 0xfe && second === 0xff)) {
    refuse('', 'the text is in UTF-16', 'save it in UTF-8');
  }
  // What is not UTF-8 is decoded to replacement marks, and those do not come back as the same bytes.
  const text = strFromU8(bytes);
  const mark = bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf && !text.startsWith('\uFEFF') ? 3 : 0;
  const again = strToU8(text);
  if (again.length + mark !== bytes.length || again.some((byte, index) => byte !== bytes[index + mark])) {
    refuse('', 'neither an archive nor text in UTF-8', 'choose a .skewback file or a job.json');
  }
  return text;
}

function damaged(name = ''): Problem {
  return {
    path: '',
    value: name === '' ? '' : shown(name),
    wrong: name === '' ? 'the archive is damaged or locked' : 'a file in the archive is damaged',
    right: 'take an earlier copy',
  };
}

function refuse(name: string, wrong: string, right: string): never {
  throw new ProblemError([{ path: '', value: name === '' ? '' : shown(name), wrong, right }]);
}

function megabytes(bytes: number): string {
  return `${bytes / 1024 / 1024} MB`;
}
