import { readdir, unlink } from 'node:fs/promises';
import { join } from 'node:path';
import { failed, type Settled } from './failure.ts';
import { readWithin } from './read.ts';
import { saveWholeInFolder } from './save.ts';

export interface KeptNote {
  /** Letters, digits and hyphens, at most 64. */
  readonly id: string;
  readonly title: string;
  /** The file it is an edit of; null for a document never saved. */
  readonly path: string | null;
}

export interface KeptDraft extends KeptNote {
  /** ISO 8601, UTC. */
  readonly keptAt: string;
  readonly bytes: Uint8Array;
}

/** Work not yet saved, one file a draft: a line of JSON, then the document's bytes. */
export interface DraftStore {
  keep(note: KeptNote, bytes: Uint8Array, now: Date): Promise<Settled<null>>;
  /** Latest first; what cannot be read is left out. */
  list(): Promise<readonly KeptDraft[]>;
  discard(id: string): Promise<void>;
}

const ENDING = '.draft';
const GOOD_ID = /^[A-Za-z0-9-]{1,64}$/;
const LINE_FEED = 10;

/** @param folder made when first needed */
export function draftStore(folder: string): DraftStore {
  const fileOf = (id: string): string => join(folder, `${id}${ENDING}`);
  return {
    async keep({ id, title, path }, bytes, now) {
      if (!GOOD_ID.test(id)) return failed('a draft is named by letters, digits and hyphens');
      const head = new TextEncoder().encode(`${JSON.stringify({ title, path, keptAt: now.toISOString() })}\n`);
      return saveWholeInFolder(fileOf(id), Buffer.concat([head, bytes]));
    },
    async list() {
      const names = await readdir(folder).catch(() => []);
      const ids = names.filter((name) => name.endsWith(ENDING)).map((name) => name.slice(0, -ENDING.length));
      const drafts = await Promise.all(ids.filter((id) => GOOD_ID.test(id)).map((id) => readDraft(id, fileOf(id))));
      return drafts.filter((draft) => draft !== null).sort((a, b) => b.keptAt.localeCompare(a.keptAt));
    },
    async discard(id) {
      if (GOOD_ID.test(id)) await unlink(fileOf(id)).catch(() => undefined);
    },
  };
}

async function readDraft(id: string, file: string): Promise<KeptDraft | null> {
  const read = await readWithin(file);
  if (read.kind === 'failed') return null;
  const end = read.value.indexOf(LINE_FEED);
  try {
    const head: unknown = JSON.parse(new TextDecoder().decode(read.value.subarray(0, Math.max(end, 0))));
    if (typeof head !== 'object' || head === null) return null;
    const { title, path, keptAt } = head as Partial<Record<'title' | 'path' | 'keptAt', unknown>>;
    if (typeof title !== 'string' || typeof keptAt !== 'string') return null;
    if (typeof path !== 'string' && path !== null) return null;
    return { id, title, path, keptAt, bytes: read.value.slice(end + 1) };
  } catch {
    return null;
  }
}
