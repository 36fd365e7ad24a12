/**
 * What can be asked of the window by a key: one table for the bar, the keyboard and the sheet of keys. The shell's menu
 * asks for its own part of it.
 */
import type { Command, Host } from '../../app/host.ts';
import { singleKeys } from './single-keys.svelte.ts';

type Shell = Host['shell'];

/** A place among the schemes, 1 for the first. */
type SchemeAt = `scheme-${1 | 2 | 3 | 4 | 5 | 6 | 7 | 8 | 9}`;

/** What a key can ask for: the shell's commands, and what the page does by itself. */
export type Action =
  | Command
  | SchemeAt
  | 'next-scheme'
  | 'previous-scheme'
  | 'duplicate-scheme'
  | 'rename-scheme'
  | 'scheme-table'
  | 'help';

export const KEY_GROUPS = ['Document', 'Steps', 'Schemes', 'Board', 'Help'] as const;
type KeyGroup = (typeof KEY_GROUPS)[number];

export interface Shortcut {
  readonly action: Action;
  readonly name: string;
  readonly group: KeyGroup;
  /** `mod` is Ctrl, or the command key of a Mac. A plain figure or mark counts only where nothing is being typed. */
  readonly held: 'plain' | 'mod' | 'mod+shift' | 'alt';
  /** As the event names it, in lower case; with Alt the key's place on the board, since Alt may write another letter. */
  readonly key: string;
  /** Only in this shell: browsers keep some keys for themselves. */
  readonly shell?: Shell;
  /** Another way to the same, left out of the sheet. */
  readonly second?: true;
}

const DIGITS = [1, 2, 3, 4, 5, 6, 7, 8, 9] as const;

const SHORTCUTS: readonly Shortcut[] = [
  { action: 'new', name: 'New arch', group: 'Document', held: 'mod', key: 'n', shell: 'desktop' },
  { action: 'new', name: 'New arch', group: 'Document', held: 'alt', key: 'KeyN', shell: 'browser' },
  { action: 'open', name: 'Open', group: 'Document', held: 'mod', key: 'o' },
  { action: 'save', name: 'Save', group: 'Document', held: 'mod', key: 's' },
  { action: 'save-as', name: 'Save as', group: 'Document', held: 'mod+shift', key: 's' },
  { action: 'export', name: 'Export the drawing', group: 'Document', held: 'mod', key: 'e' },
  { action: 'undo', name: 'Undo', group: 'Steps', held: 'mod', key: 'z' },
  { action: 'redo', name: 'Redo', group: 'Steps', held: 'mod+shift', key: 'z' },
  { action: 'redo', name: 'Redo', group: 'Steps', held: 'mod', key: 'y', second: true },
  { action: 'next-scheme', name: 'Next scheme', group: 'Schemes', held: 'alt', key: 'PageDown' },
  { action: 'previous-scheme', name: 'Scheme before', group: 'Schemes', held: 'alt', key: 'PageUp' },
  ...DIGITS.map((place): Shortcut => {
    const name = place === 1 ? 'First scheme, and so on to 9' : `Scheme ${place}`;
    const scheme: Shortcut = {
      action: `scheme-${place}`,
      name,
      group: 'Schemes',
      held: 'plain',
      key: String(place),
    };
    return place === 1 ? scheme : { ...scheme, second: true };
  }),
  { action: 'duplicate-scheme', name: 'Duplicate as a proposal', group: 'Schemes', held: 'alt', key: 'KeyP' },
  { action: 'rename-scheme', name: 'Rename the scheme', group: 'Schemes', held: 'plain', key: 'f2' },
  { action: 'scheme-table', name: 'All findings side by side', group: 'Schemes', held: 'alt', key: 'KeyC' },
  { action: 'zoom-in', name: 'Nearer', group: 'Board', held: 'plain', key: '+' },
  { action: 'zoom-in', name: 'Nearer', group: 'Board', held: 'plain', key: '=', second: true },
  { action: 'zoom-out', name: 'Further', group: 'Board', held: 'plain', key: '-' },
  { action: 'zoom-to-fit', name: 'Fit the drawing', group: 'Board', held: 'plain', key: '0' },
  { action: 'zoom-in', name: 'Nearer', group: 'Board', held: 'mod', key: '+', shell: 'desktop', second: true },
  { action: 'zoom-in', name: 'Nearer', group: 'Board', held: 'mod', key: '=', shell: 'desktop', second: true },
  { action: 'zoom-out', name: 'Further', group: 'Board', held: 'mod', key: '-', shell: 'desktop', second: true },
  {
    action: 'zoom-to-fit',
    name: 'Fit the drawing',
    group: 'Board',
    held: 'mod',
    key: '0',
    shell: 'desktop',
    second: true,
  },
  { action: 'help', name: 'Keys and words', group: 'Help', held: 'plain', key: 'f1' },
  { action: 'help', name: 'Keys and words', group: 'Help', held: 'plain', key: '?' },
];

const mac = /Mac|iPhone|iPad/.test(navigator.userAgent);
const HELD = mac
  ? { plain: '', mod: '⌘', 'mod+shift': '⇧⌘', alt: '⌥' }
  : { plain: '', mod: 'Ctrl+', 'mod+shift': 'Ctrl+Shift+', alt: 'Alt+' };

const KEY_NAMES: Readonly<Record<string, string>> = { PageDown: 'Page Down', PageUp: 'Page Up', '-': '−' };

/** For the eye: `Ctrl+Shift+Z`, `Alt+Page Down`. */
export function shortcutShown({ held, key }: Shortcut): string {
  return `${HELD[held]}${KEY_NAMES[key] ?? key.replace(/^Key/, '').toUpperCase()}`;
}

const inShell = (shell: Shell) => (shortcut: Shortcut) => shortcut.shell === undefined || shortcut.shell === shell;

/** The rows of the sheet of keys. */
export const shortcutsOf = (shell: Shell): readonly Shortcut[] =>
  SHORTCUTS.filter(inShell(shell)).filter(({ second }) => second !== true);

/** How an action's key is shown; browsers keep Ctrl+N for themselves. */
export function keyShown(action: Action, shell: Shell): string | undefined {
  const shortcut = shortcutsOf(shell).find((candidate) => candidate.action === action);
  return shortcut === undefined ? undefined : shortcutShown(shortcut);
}

/** A key of one letter, figure or mark, which a slip of speech or hand could press; those with names are safe. */
const isSingle = ({ held, key }: Shortcut): boolean => held === 'plain' && key.length === 1;

/** The action that a key press asks for. */
export function actionOf(event: KeyboardEvent, shell: Shell): Action | null {
  const typing = event.target instanceof HTMLElement && event.target.matches('input, textarea, select');
  const found = SHORTCUTS.filter(inShell(shell)).find((shortcut) => {
    if (isSingle(shortcut) && (typing || !singleKeys.on)) return false;
    return isHeld(shortcut, event) && isKey(shortcut, event);
  });
  return found?.action ?? null;
}

function isHeld({ held }: Shortcut, event: KeyboardEvent): boolean {
  const mod = mac ? event.metaKey : event.ctrlKey;
  const other = mac ? event.ctrlKey : event.metaKey;
  if (other) return false;
  switch (held) {
    case 'alt':
      return event.altKey && !mod && !event.shiftKey;
    case 'plain':
      // a plain mark may need Shift to be written
      return !event.altKey && !mod;
    default:
      return mod && !event.altKey && event.shiftKey === (held === 'mod+shift');
  }
}

const isKey = ({ held, key }: Shortcut, event: KeyboardEvent): boolean =>
  held === 'alt' ? event.code === key : event.key.toLowerCase() === key;
