import { afterEach, expect, test, vi } from 'vitest';
import { browserHost } from '../../../renderer/host/browser.ts';

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);

/** A real file handle of the browser's private file system, given out where a person would choose a place. */
async function chosen(name: string): Promise<FileSystemFileHandle> {
  const root = await navigator.storage.getDirectory();
  const handle = await root.getFileHandle(name, { create: true });
  vi.stubGlobal('showSaveFilePicker', () => Promise.resolve(handle));
  vi.stubGlobal('showOpenFilePicker', () => Promise.resolve([handle]));
  return handle;
}

afterEach(() => vi.unstubAllGlobals());

test('a file is written where the person chose, written over in place, and opened again', async () => {
  const handle = await chosen('door.skewback');
  const first = await browserHost.saveAs('job.skewback', bytes('first and longer'));
  if (first.kind !== 'done') throw new Error(first.kind);
  expect(first.value.name).toBe('door.skewback');
  vi.stubGlobal('showSaveFilePicker', () => Promise.reject(new Error('asked again')));
  expect(await browserHost.save(first.value, bytes('second'))).toEqual({ kind: 'done', value: first.value });
  expect(await (await handle.getFile()).text()).toBe('second');
  const opened = await browserHost.open();
  expect(opened.kind === 'done' && new TextDecoder().decode(opened.value.bytes)).toBe('second');
});

test('a closed dialog is no failure', async () => {
  vi.stubGlobal('showSaveFilePicker', () => Promise.reject(new DOMException('closed', 'AbortError')));
  expect(await browserHost.saveAs('job.skewback', bytes('x'))).toEqual({ kind: 'cancelled' });
});

test('a refused place is told in a sentence', async () => {
  vi.stubGlobal('showSaveFilePicker', () => Promise.reject(new DOMException('no', 'NotAllowedError')));
  const outcome = await browserHost.saveAs('job.skewback', bytes('x'));
  expect(outcome).toEqual({
    kind: 'failed',
    reason: 'The file could not be saved. The browser was not allowed to write it.',
  });
});
