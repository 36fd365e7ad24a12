/** Files that the browser lets this page write again, by the id of their reference. */
import type { FileRef } from '../../app/host.ts';

interface Held {
  readonly handle: FileSystemFileHandle;
  /** When the file was last changed, as this page last saw it, ms. */
  seen: number | null;
}

const held = new Map<string, Held>();
let count = 0;

/** @param seen when the file was last changed, ms; null where it has not been looked at */
export function reference(
  name: string,
  handle: FileSystemFileHandle | null | undefined,
  seen: number | null = null,
): FileRef {
  count += 1;
  const id = String(count);
  if (handle) held.set(id, { handle, seen });
  return { id, name, folder: '' };
}

export const handleOf = (file: FileRef): FileSystemFileHandle | null => held.get(file.id)?.handle ?? null;

/** The file as it is now is what this page knows. */
export async function markSeen(file: FileRef): Promise<void> {
  const entry = held.get(file.id);
  if (entry !== undefined) entry.seen = (await entry.handle.getFile()).lastModified;
}

/** False where it cannot be told: the file is gone, or may not be read now. */
export async function changedSince(file: FileRef): Promise<boolean> {
  const entry = held.get(file.id);
  const seen = entry?.seen ?? null;
  if (entry === undefined || seen === null) return false;
  return entry.handle.getFile().then(
    ({ lastModified }) => lastModified !== seen,
    () => false,
  );
}
