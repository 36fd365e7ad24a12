/** Files opened or saved before, where the browser lets a page come back to them. */
import type { FileRef, OpenedFile, Outcome, RecentFiles } from '../../app/host.ts';
import { handleOf, reference } from './handles.ts';
import { store } from './store.ts';

const MOST = 12;

/** Puts the file first. */
export async function noteRecent(name: string, handle: FileSystemFileHandle): Promise<void> {
  const before = await withoutFile(handle);
  const database = await store();
  await Promise.all(
    before.slice(0, Math.max(0, before.length + 1 - MOST)).map((key) => database.delete('recent', key)),
  );
  await database.add('recent', { name, handle, openedAt: new Date().toISOString() });
}

/** Takes the file off the list. @returns the keys of the others, oldest first */
async function withoutFile(handle: FileSystemFileHandle): Promise<number[]> {
  const database = await store();
  const others: number[] = [];
  for (const key of await database.getAllKeys('recent')) {
    const entry = await database.get('recent', key);
    if (await entry?.handle.isSameEntry(handle)) await database.delete('recent', key);
    else others.push(key);
  }
  return others;
}

async function openAgain(file: FileRef): Promise<Outcome<OpenedFile>> {
  const handle = handleOf(file);
  if (handle === null) return { kind: 'failed', reason: `${file.name} is no longer known here; open it by its place.` };
  try {
    if ((await allowed(handle)) !== 'granted') return { kind: 'cancelled' };
    const found = await handle.getFile();
    await noteRecent(found.name, handle);
    const bytes = new Uint8Array(await found.arrayBuffer());
    return { kind: 'done', value: { file: reference(found.name, handle, found.lastModified), bytes } };
  } catch {
    return { kind: 'failed', reason: `${file.name} is no longer where it was.` };
  }
}

interface Asking {
  requestPermission?: (how: { mode: 'read' }) => Promise<PermissionState>;
}

/** Asks again where the browser has forgotten that it may; a browser that never asks allows it. */
const allowed = (handle: FileSystemFileHandle & Asking): Promise<PermissionState> =>
  handle.requestPermission?.({ mode: 'read' }) ?? Promise.resolve('granted');

export const browserRecent: RecentFiles = {
  async list() {
    const entries = await (await store()).getAll('recent');
    return entries.reverse().map(({ name, handle, openedAt }) => ({ file: reference(name, handle), openedAt }));
  },
  open: openAgain,
  async forget(file) {
    const handle = handleOf(file);
    if (handle !== null) await withoutFile(handle);
  },
};
