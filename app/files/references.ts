import { randomUUID } from 'node:crypto';
import { basename, dirname } from 'node:path';
import type { FileRef } from '../host.ts';

/**
 * The files that a person chose in this run. The page holds a `FileRef` and no path, so it can read and write these
 * files and no others.
 */
export interface References {
  /** The same path gives the same reference for the length of the run. */
  refer(path: string): FileRef;
  /** The path, or null for a reference that was not given out here. */
  pathOf(id: string): string | null;
}

export function references(): References {
  const idOf = new Map<string, string>();
  const pathOf = new Map<string, string>();
  return {
    refer(path) {
      const id = idOf.get(path) ?? randomUUID();
      idOf.set(path, id);
      pathOf.set(id, path);
      return { id, name: basename(path), folder: dirname(path) };
    },
    pathOf: (id) => pathOf.get(id) ?? null,
  };
}
