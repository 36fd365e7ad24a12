import type { Command, Draft, DraftNote, ExportedFile, FileRef, OpenedFile, Outcome, RecentFile } from '../host.ts';

/** What the page asks of the desktop, through the preload: one channel a question, types only. */
export interface Questions {
  'file:open': () => Outcome<OpenedFile>;
  'file:save': (id: string, bytes: Uint8Array) => Outcome<FileRef>;
  'file:save-as': (suggestedName: string, bytes: Uint8Array) => Outcome<FileRef>;
  'file:export': (file: ExportedFile) => Outcome<string>;
  'file:export-all': (files: readonly ExportedFile[]) => Outcome<string>;
  'recent:list': () => readonly RecentFile[];
  'recent:open': (id: string) => Outcome<OpenedFile>;
  'recent:forget': (id: string) => void;
  'draft:keep': (note: DraftNote, bytes: Uint8Array) => Outcome<null>;
  'draft:list': () => readonly Draft[];
  'draft:discard': (id: string) => void;
  'page:print': () => Outcome<null>;
  /** The page now listens for files opened from outside; those that came before follow. */
  'page:listens': () => void;
  'window:dirty': (dirty: boolean) => void;
  'window:title': (title: string) => void;
  'window:close': () => void;
}

/** What the desktop tells the page. */
export interface News {
  'file:opened': Outcome<OpenedFile>;
  'window:close-requested': null;
  'menu:command': Command;
}
