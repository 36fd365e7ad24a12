/** What can be asked of the window from the bar, the keyboard and the shell's menu: one list for all three. */
import type { Command, Host } from '../../app/host.ts';

interface Shortcut {
  readonly key: string;
  readonly shift: boolean;
  /** For screen readers and the pointer's hint: `Ctrl+Shift+Z`. */
  readonly shown: string;
}

const mac = /Mac|iPhone|iPad/.test(navigator.userAgent);
const shortcut = (key: string, shift = false): Shortcut => ({
  key,
  shift,
  shown: mac ? `${shift ? '⇧' : ''}⌘${key.toUpperCase()}` : `Ctrl+${shift ? 'Shift+' : ''}${key.toUpperCase()}`,
});

const SHORTCUTS: Readonly<Partial<Record<Command, Shortcut>>> = {
  new: shortcut('n'),
  open: shortcut('o'),
  save: shortcut('s'),
  'save-as': shortcut('s', true),
  export: shortcut('e'),
  undo: shortcut('z'),
  redo: shortcut('z', true),
};

/** How a command's key is shown; browsers keep Ctrl+N for themselves. */
export function keyShown(command: Command, shell: Host['shell']): string | undefined {
  return command === 'new' && shell === 'browser' ? (mac ? '⌥N' : 'Alt+N') : SHORTCUTS[command]?.shown;
}

/** Plain keys on the board, where nothing is being typed. */
const BOARD_KEYS: Readonly<Record<string, Command>> = {
  '+': 'zoom-in',
  '=': 'zoom-in',
  '-': 'zoom-out',
  '0': 'zoom-to-fit',
};

/**
 * The command that a key press asks for. Alt+N stands in for the browser's own Ctrl+N, and its zoom keys are left to it.
 */
export function commandOf(event: KeyboardEvent, shell: Host['shell']): Command | null {
  if (event.altKey) return event.code === 'KeyN' && !event.ctrlKey && !event.metaKey ? 'new' : null;
  const typing = event.target instanceof HTMLElement && event.target.matches('input, textarea, select');
  const held = mac ? event.metaKey : event.ctrlKey;
  if (!held) return typing ? null : (BOARD_KEYS[event.key] ?? null);
  const key = event.key.toLowerCase();
  if (key === 'y' && !event.shiftKey) return 'redo';
  if (shell === 'desktop' && BOARD_KEYS[key] !== undefined) return BOARD_KEYS[key];
  const found = Object.entries(SHORTCUTS).find(([, { key: own, shift }]) => own === key && shift === event.shiftKey);
  return (found?.[0] as Command | undefined) ?? null;
}
