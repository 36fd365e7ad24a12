/** What a browser keeps on this machine between visits. One database; where it cannot be had, nothing is kept. */
import { openDB, type DBSchema, type IDBPDatabase } from 'idb';

export interface StoredDraft {
  readonly id: string;
  readonly title: string;
  /** Name of the file it is an edit of; null for a document never saved. */
  readonly fileName: string | null;
  /** By which that file can be written again, where the browser gave it. */
  readonly handle: FileSystemFileHandle | null;
  readonly keptAt: string;
  readonly bytes: Uint8Array;
}

export interface StoredRecent {
  readonly name: string;
  readonly handle: FileSystemFileHandle;
  readonly openedAt: string;
}

export interface StoredSave {
  /** Folder and name of the file. */
  readonly file: string;
  readonly savedAt: string;
  readonly bytes: Uint8Array;
}

interface Shelves extends DBSchema {
  drafts: { key: string; value: StoredDraft };
  recent: { key: number; value: StoredRecent };
  saves: { key: number; value: StoredSave; indexes: { file: string } };
}

export type Store = IDBPDatabase<Shelves>;

let opened: Promise<Store> | null = null;

/** @throws DOMException where the browser keeps nothing, as in some private windows */
export function store(): Promise<Store> {
  opened ??= openDB<Shelves>('skewback', 1, {
    upgrade(database) {
      database.createObjectStore('drafts', { keyPath: 'id' });
      database.createObjectStore('recent', { autoIncrement: true });
      database.createObjectStore('saves', { autoIncrement: true }).createIndex('file', 'file');
    },
    blocking: (_old, _new, { target }) => {
      (target as IDBDatabase).close();
      opened = null;
    },
    terminated: () => (opened = null),
  }).catch((error: unknown) => {
    opened = null;
    throw error;
  });
  return opened;
}
