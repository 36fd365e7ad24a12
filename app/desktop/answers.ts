import { access } from 'node:fs/promises';
import { basename, extname, join } from 'node:path';
import type { DraftStore } from '../files/drafts.ts';
import { readWithin } from '../files/read.ts';
import type { RecentPaths } from '../files/recent.ts';
import type { References } from '../files/references.ts';
import { saveWhole } from '../files/save.ts';
import type { ExportedFile, FileRef, OpenedFile, Outcome } from '../host.ts';
import type { Questions } from '../preload/channels.ts';

/** What the desktop shows a person; null where it was closed without choosing. */
export interface Dialogs {
  chooseFileToOpen(): Promise<string | null>;
  /** `ending` without its full stop. */
  choosePlaceToSave(suggestedName: string, ending: string): Promise<string | null>;
  chooseFolder(): Promise<string | null>;
  mayReplace(names: readonly string[]): Promise<boolean>;
}

/** The window that the page is in. */
export interface PageWindow {
  setDirty(dirty: boolean): void;
  setTitle(title: string): void;
  close(): void;
  print(): Promise<Outcome<null>>;
  /** Hands over what was opened from outside before the page listened. */
  pageListens(): void;
}

export interface Desk {
  readonly references: References;
  readonly recent: RecentPaths;
  readonly drafts: DraftStore;
  readonly dialogs: Dialogs;
  readonly window: PageWindow;
  readonly now: () => Date;
}

/** One answer to each question. */
export type Answers = {
  readonly [Channel in keyof Questions]: (
    ...details: Parameters<Questions[Channel]>
  ) => ReturnType<Questions[Channel]> | Promise<ReturnType<Questions[Channel]>>;
};

const ENDING = 'skewback';
const CANCELLED = { kind: 'cancelled' } as const;
const UNKNOWN_FILE = { kind: 'failed', reason: 'This file was not chosen in this window; open it again.' } as const;

/** Opens the file at a path that a person chose, and remembers it. */
export async function openPath({ references, recent, now }: Desk, path: string): Promise<Outcome<OpenedFile>> {
  const read = await readWithin(path);
  if (read.kind === 'failed') return { kind: 'failed', reason: `${basename(path)} cannot be read: ${read.because}.` };
  await recent.note(path, now());
  return { kind: 'done', value: { file: references.refer(path), bytes: read.value } };
}

/** The desktop's side of the contract, everything but Electron itself. */
export function answers(desk: Desk): Answers {
  const { references, recent, drafts, dialogs, window, now } = desk;

  const saveJob = async (path: string, bytes: Uint8Array): Promise<Outcome<FileRef>> => {
    const written = await write(path, bytes);
    if (written.kind === 'failed') return written;
    await recent.note(path, now());
    return { kind: 'done', value: references.refer(path) };
  };

  return {
    'file:open': async () => {
      const path = await dialogs.chooseFileToOpen();
      return path === null ? CANCELLED : openPath(desk, path);
    },
    'file:save': async (id, bytes) => {
      const path = references.pathOf(id);
      return path === null ? UNKNOWN_FILE : saveJob(path, bytes);
    },
    'file:save-as': async (suggestedName, bytes) => {
      const path = await dialogs.choosePlaceToSave(fileName(suggestedName), ENDING);
      return path === null ? CANCELLED : saveJob(path, bytes);
    },
    'file:export': async (file) => {
      const name = fileName(file.name);
      const path = await dialogs.choosePlaceToSave(name, extname(name).slice(1));
      if (path === null) return CANCELLED;
      const written = await write(path, file.bytes);
      return written.kind === 'failed' ? written : { kind: 'done', value: path };
    },
    'file:export-all': async (files) => {
      const folder = await dialogs.chooseFolder();
      return folder === null ? CANCELLED : exportInto(folder, files, dialogs);
    },
    'recent:list': async () =>
      (await recent.list()).map(({ path, openedAt }) => ({ file: references.refer(path), openedAt })),
    'recent:open': async (id) => {
      const path = references.pathOf(id);
      return path === null ? UNKNOWN_FILE : openPath(desk, path);
    },
    'recent:forget': async (id) => {
      const path = references.pathOf(id);
      if (path !== null) await recent.forget(path);
    },
    'draft:keep': async ({ id, title, file }, bytes) => {
      const path = file === null ? null : references.pathOf(file.id);
      const kept = await drafts.keep({ id, title, path }, bytes, now());
      return kept.kind === 'done' ? kept : { kind: 'failed', reason: `A draft cannot be kept: ${kept.because}.` };
    },
    'draft:list': async () =>
      (await drafts.list()).map(({ path, ...draft }) => ({
        ...draft,
        file: path === null ? null : references.refer(path),
      })),
    'draft:discard': (id) => drafts.discard(id),
    'page:print': () => window.print(),
    'page:listens': () => window.pageListens(),
    'window:dirty': (dirty) => window.setDirty(dirty),
    'window:title': (title) => window.setTitle(title),
    'window:close': () => window.close(),
  };
}

async function exportInto(folder: string, files: readonly ExportedFile[], dialogs: Dialogs): Promise<Outcome<string>> {
  const paths = files.map((file) => join(folder, fileName(file.name)));
  const standing = await Promise.all(
    paths.map((path) =>
      access(path).then(
        () => true,
        () => false,
      ),
    ),
  );
  const replaced = paths.filter((_, k) => standing[k]).map((path) => basename(path));
  if (replaced.length > 0 && !(await dialogs.mayReplace(replaced))) return CANCELLED;
  for (const [k, file] of files.entries()) {
    const written = await write(paths[k]!, file.bytes);
    if (written.kind === 'failed') return written;
  }
  return { kind: 'done', value: folder };
}

async function write(path: string, bytes: Uint8Array): Promise<Exclude<Outcome<null>, { kind: 'cancelled' }>> {
  const saved = await saveWhole(path, bytes);
  if (saved.kind === 'done') return saved;
  return { kind: 'failed', reason: `${basename(path)} cannot be written: ${saved.because}.` };
}

/** A name that every system takes: no folders, no reserved signs, not hidden, not empty, its ending kept. */
export function fileName(suggested: string): string {
  const plain = suggested.replace(/[\p{Cc}<>:"/\\|?*\s]+/gu, ' ').replace(/ (?=[.])|^[ .]+|[ .]+$/g, '');
  const ending = extname(plain);
  const stem = basename(plain, ending).slice(0, 180);
  return plain === '' ? 'unnamed' : `${stem}${ending.slice(0, 20)}`;
}
