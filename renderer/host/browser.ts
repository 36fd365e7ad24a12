/**
 * The browser as a shell. Where the browser lets a page write files in place (the File System Access API) it is used;
 * elsewhere a file is chosen to open, and saving is a download.
 */
import { fileOpen, fileSave, supported } from 'browser-fs-access';
import { version } from '../../package.json';
import type { FileRef, Host, OpenedFile, Outcome } from '../../app/host.ts';

const JOB_KINDS = {
  description: 'Skewback job',
  extensions: ['.skewback', '.json'],
  mimeTypes: ['application/x-skewback', 'application/json'],
};
const NEW_JOB_KIND = { description: 'Skewback job', extensions: ['.skewback'], mimeTypes: ['application/x-skewback'] };

/** Files that the browser lets this page write again, by the id of their reference. */
const handles = new Map<string, FileSystemFileHandle>();
let count = 0;

function reference(name: string, handle: FileSystemFileHandle | null | undefined): FileRef {
  count += 1;
  const id = String(count);
  if (handle) handles.set(id, handle);
  return { id, name, folder: '' };
}

async function settled<Value>(work: () => Promise<Value>, failure: string): Promise<Outcome<Value>> {
  try {
    return { kind: 'done', value: await work() };
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') return { kind: 'cancelled' };
    return { kind: 'failed', reason: `${failure} ${reasonOf(error)}`.trim() };
  }
}

function reasonOf(error: unknown): string {
  if (!(error instanceof DOMException)) return '';
  if (error.name === 'NotAllowedError') return 'The browser was not allowed to write it.';
  if (error.name === 'QuotaExceededError') return 'There is no room left.';
  if (error.name === 'NotFoundError') return 'It is no longer where it was.';
  return '';
}

const blobOf = (bytes: Uint8Array, type: string): Blob => new Blob([bytes.slice()], { type });

async function openFile(): Promise<OpenedFile> {
  const chosen = await fileOpen(JOB_KINDS);
  return { file: reference(chosen.name, chosen.handle), bytes: new Uint8Array(await chosen.arrayBuffer()) };
}

async function writeNew(fileName: string, bytes: Uint8Array): Promise<FileRef> {
  const handle = await fileSave(blobOf(bytes, 'application/x-skewback'), { ...NEW_JOB_KIND, fileName });
  return reference(handle?.name ?? fileName, handle);
}

async function writeAgain(file: FileRef, bytes: Uint8Array): Promise<FileRef> {
  const handle = handles.get(file.id);
  await fileSave(
    blobOf(bytes, 'application/x-skewback'),
    { ...NEW_JOB_KIND, fileName: file.name },
    handle ?? null,
    true,
  );
  return file;
}

async function exportFile(name: string, mime: string, bytes: Uint8Array): Promise<string> {
  const extension = name.slice(name.lastIndexOf('.'));
  const handle = await fileSave(blobOf(bytes, mime), { fileName: name, extensions: [extension], mimeTypes: [mime] });
  return handle?.name ?? (supported ? name : `the downloads as ${name}`);
}

function engine(): string {
  const known = /(Chrome|Firefox|Version)[/]([\d]+)/.exec(navigator.userAgent);
  if (known === null) return 'unknown browser';
  const names: Readonly<Record<string, string>> = { Chrome: 'Chromium', Version: 'Safari' };
  return `${names[known[1] ?? ''] ?? known[1]} ${known[2]}`;
}

export const browserHost = {
  shell: 'browser',
  versions: { app: version, engine: engine() },
  open: () => settled(openFile, 'The file could not be opened.'),
  save: (file, bytes) =>
    settled(() => writeAgain(file, bytes), `${file.name} could not be saved; it is still as it was.`),
  saveAs: (suggestedName, bytes) => settled(() => writeNew(suggestedName, bytes), 'The file could not be saved.'),
  exportFile: ({ name, mime, bytes }) => settled(() => exportFile(name, mime, bytes), `${name} could not be written.`),
} satisfies Host;
