/** What became of reading or writing a file. */
export type Settled<Value> =
  | { readonly kind: 'done'; readonly value: Value }
  /** Why not, as a clause without a full stop: `the disk is full`. The shell that asked makes a sentence of it. */
  | { readonly kind: 'failed'; readonly because: string };

export const done = <Value>(value: Value): Settled<Value> => ({ kind: 'done', value });

export const failed = (because: string): Settled<never> => ({ kind: 'failed', because });

/** System error codes in plain words. */
const WORDS: Readonly<Record<string, string>> = {
  EACCES: 'permission is denied',
  EPERM: 'permission is denied',
  EROFS: 'the disk is read-only',
  ENOSPC: 'the disk is full',
  EDQUOT: 'the disk quota is used up',
  EFBIG: 'the disk takes no file of this size',
  ENOENT: 'there is no such file or folder',
  ENOTDIR: 'part of the path is not a folder',
  EISDIR: 'it is a folder',
  EEXIST: 'there is already a file of that name',
  ENAMETOOLONG: 'the name is too long',
  ELOOP: 'its links lead in a circle',
  EMFILE: 'too many files are open',
  EIO: 'the disk gave an error',
  EBUSY: 'another program holds it',
  ETXTBSY: 'another program holds it',
};

/** A system error as a clause. */
export function clauseFor(error: unknown): string {
  if (!(error instanceof Error)) return String(error);
  const code = 'code' in error && typeof error.code === 'string' ? error.code : '';
  return WORDS[code] ?? error.message;
}
