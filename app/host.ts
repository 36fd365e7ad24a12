/**
 * The one contract between the page and the shell that holds it. Types only: the desktop preload and the browser's own
 * host both say `satisfies Host`.
 *
 * Bytes in, bytes out: the shell knows no job, the page knows no path. A file is named by a `FileRef` that only its shell
 * can turn into a place on disk. Nothing here throws: what did not happen comes back as a cancelled or failed outcome,
 * and a failure carries one sentence to show to a person. Whatever a shell lacks is absent, so the page offers only what
 * is there (`host.recent?.list()`).
 */

/** What became of something asked of the shell. */
export type Outcome<Value> =
  | { readonly kind: 'done'; readonly value: Value }
  /** The person closed the dialog. Say nothing. */
  | { readonly kind: 'cancelled' }
  /** `reason` is a whole sentence for a person. A file that was to be overwritten is still as it was. */
  | { readonly kind: 'failed'; readonly reason: string };

/** A file that the person chose. Keep it as it came and hand it back; `id` means something to its shell alone. */
export interface FileRef {
  readonly id: string;
  /** File name with its ending, such as `north-door.skewback`. */
  readonly name: string;
  /** The folder as a person knows it; empty where the shell cannot tell. */
  readonly folder: string;
}

export interface OpenedFile {
  readonly file: FileRef;
  readonly bytes: Uint8Array;
}

/** A drawing or sheet to be written beside the job. */
export interface ExportedFile {
  /** File name with its ending, no folder. */
  readonly name: string;
  /** Media type, such as `image/svg+xml`. */
  readonly mime: string;
  readonly bytes: Uint8Array;
}

export interface RecentFile {
  readonly file: FileRef;
  /** ISO 8601, UTC. */
  readonly openedAt: string;
}

/** Files opened or saved before, latest first. */
export interface RecentFiles {
  list(): Promise<readonly RecentFile[]>;
  open(file: FileRef): Promise<Outcome<OpenedFile>>;
  forget(file: FileRef): Promise<void>;
}

/** Work not yet saved, kept aside by the shell so that a crash or a flat battery loses little. */
export interface DraftNote {
  /** Chosen by the page, one per open document: letters, digits and hyphens, at most 64. */
  readonly id: string;
  readonly title: string;
  /** The file it is an edit of; null for a document never saved. */
  readonly file: FileRef | null;
}

export interface Draft extends DraftNote {
  /** ISO 8601, UTC. */
  readonly keptAt: string;
  readonly bytes: Uint8Array;
}

export interface Drafts {
  /** Replaces the draft of the same id. */
  keep(note: DraftNote, bytes: Uint8Array): Promise<Outcome<null>>;
  /** Latest first. A draft that cannot be read is left out. */
  list(): Promise<readonly Draft[]>;
  /** After saving, or when the person lets it go. */
  discard(id: string): Promise<void>;
}

/** One earlier save of a file. */
export interface KeptSave {
  /** ISO 8601, UTC. */
  readonly savedAt: string;
  readonly bytes: Uint8Array;
}

/** The last saves of each file, so that one can go back to what it held. */
export interface KeptSaves {
  keep(file: FileRef, bytes: Uint8Array): Promise<void>;
  /** Latest first. */
  list(file: FileRef): Promise<readonly KeptSave[]>;
}

/** What a shell's own menu can ask of the page. */
export type Command =
  'new' | 'open' | 'save' | 'save-as' | 'export' | 'print' | 'undo' | 'redo' | 'zoom-in' | 'zoom-out' | 'zoom-to-fit';

/** Takes the listener off again. */
export type Unlisten = () => void;

/** A window of the shell's own. */
export interface ShellWindow {
  /** Whether closing now would lose work. */
  setDirty(dirty: boolean): void;
  /** Shown in the title bar: the job's title or file name. */
  setTitle(title: string): void;
  /** The person asked to close while dirty. The page decides, and calls `close` when it may. */
  onCloseRequested(listener: () => void): Unlisten;
  /** Closes without asking again. */
  close(): void;
  onCommand(listener: (command: Command) => void): Unlisten;
}

export interface Versions {
  readonly app: string;
  /** Engine and its version, such as `Chromium 140`; for the report's foot and for help. */
  readonly engine: string;
}

export interface Host {
  readonly shell: 'desktop' | 'browser';
  readonly versions: Versions;
  /** Asks the person for a job file. */
  open(): Promise<Outcome<OpenedFile>>;
  /** Writes over the file, whole or not at all. */
  save(file: FileRef, bytes: Uint8Array): Promise<Outcome<FileRef>>;
  /** Asks the person for a place, then writes. */
  saveAs(suggestedName: string, bytes: Uint8Array): Promise<Outcome<FileRef>>;
  /** Asks for a place and writes one drawing or sheet. The value is where it went, as a person would say it. */
  exportFile(file: ExportedFile): Promise<Outcome<string>>;
  /** Asks for a folder and writes all of them there. The value is where they went. */
  readonly exportFiles?: (files: readonly ExportedFile[]) => Promise<Outcome<string>>;
  readonly recent?: RecentFiles;
  readonly drafts?: Drafts;
  readonly saves?: KeptSaves;
  /** A file dropped onto the window. A browser finds by its item where the file can be written again. */
  readonly dropped?: (file: File, item?: DataTransferItem) => Promise<Outcome<OpenedFile>>;
  /** Whether something else has written the file since it was read or written here. */
  readonly changedSince?: (file: FileRef) => Promise<boolean>;
  /** Tells whether other windows have the file open, whenever that changes. */
  readonly watchOthers?: (file: FileRef, listener: (others: boolean) => void) => Unlisten;
  readonly print?: () => Promise<Outcome<null>>;
  /**
   * A file opened from outside: double-clicked, or given on the command line. One that came before the page was
   * listening is handed over on subscribing.
   */
  readonly onOpenFile?: (listener: (opened: Outcome<OpenedFile>) => void) => Unlisten;
  readonly window?: ShellWindow;
}

declare global {
  interface Window {
    /** Put there by the desktop's preload; absent in a browser. */
    readonly skewbackHost?: Host;
  }
}
