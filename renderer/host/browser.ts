/**
 * The browser as a shell. Where the browser lets a page write files in place (the File System Access API) it is used;
 * elsewhere a file is chosen to open, and saving is a download.
 */
import { fileOpen, fileSave, supported } from 'browser-fs-access';
import { version } from '../../package.json';
import type { FileRef, Host, OpenedFile, Outcome, Unlisten } from '../../app/host.ts';
import { browserDrafts } from './drafts.ts';
import { changedSince, handleOf, markSeen, reference } from './handles.ts';
import { watchOthers } from './others.ts';
import { browserRecent, noteRecent } from './recent.ts';
import { keptSaves } from './saves.ts';

const JOB_KINDS = {
  description: 'Skewback job',
  extensions: ['.skewback', '.json'],
  mimeTypes: ['application/x-skewback', 'application/json'],
};
const JOB_TYPE = 'application/x-skewback';
const NEW_JOB_KIND = { description: 'Skewback job', extensions: ['.skewback'], mimeTypes: [JOB_TYPE] };

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

/** A convenience that must not stand in the way of the file itself. */
const remember = (name: string, handle: FileSystemFileHandle | null | undefined): void => {
  if (handle) noteRecent(name, handle).catch(() => undefined);
};

async function opened(file: File, handle: FileSystemFileHandle | null | undefined): Promise<OpenedFile> {
  remember(file.name, handle);
  const bytes = new Uint8Array(await file.arrayBuffer());
  return { file: reference(file.name, handle, file.lastModified), bytes };
}

async function openFile(): Promise<OpenedFile> {
  const chosen = await fileOpen(JOB_KINDS);
  return opened(chosen, chosen.handle);
}

interface Dropped {
  getAsFileSystemHandle?: () => Promise<FileSystemHandle | null>;
}

async function openDropped(file: File, item: (DataTransferItem & Dropped) | undefined): Promise<OpenedFile> {
  const found = await item?.getAsFileSystemHandle?.().catch(() => null);
  return opened(file, found instanceof FileSystemFileHandle ? found : null);
}

interface LaunchQueue {
  setConsumer(consumer: (launch: { readonly files: readonly FileSystemHandle[] }) => void): void;
}

/** Where the page is installed, the system hands it the files of its kind. */
const { launchQueue } = window as Window & { readonly launchQueue?: LaunchQueue };

function onLaunch(queue: LaunchQueue, listener: (opened: Outcome<OpenedFile>) => void): Unlisten {
  queue.setConsumer(({ files }) => {
    const handle = files.find((file) => file instanceof FileSystemFileHandle);
    if (handle === undefined) return;
    const read = async (): Promise<OpenedFile> => opened(await handle.getFile(), handle);
    void settled(read, `${handle.name} could not be opened.`).then(listener);
  });
  return () => queue.setConsumer(() => undefined);
}

async function writeNew(fileName: string, bytes: Uint8Array): Promise<FileRef> {
  const handle = await fileSave(blobOf(bytes, JOB_TYPE), { ...NEW_JOB_KIND, fileName });
  const file = reference(handle?.name ?? fileName, handle);
  await markSeen(file);
  remember(file.name, handle);
  return file;
}

async function writeAgain(file: FileRef, bytes: Uint8Array): Promise<FileRef> {
  const handle = handleOf(file);
  await fileSave(blobOf(bytes, JOB_TYPE), { ...NEW_JOB_KIND, fileName: file.name }, handle, true);
  await markSeen(file);
  remember(file.name, handle);
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
  ...(supported ? { recent: browserRecent } : {}),
  drafts: browserDrafts,
  saves: keptSaves,
  dropped: (file, item) => settled(() => openDropped(file, item), `${file.name} could not be opened.`),
  ...(launchQueue === undefined
    ? {}
    : { onOpenFile: (listener: (opened: Outcome<OpenedFile>) => void) => onLaunch(launchQueue, listener) }),
  changedSince,
  watchOthers,
} satisfies Host;
