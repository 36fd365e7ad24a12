import type { MenuItemConstructorOptions } from 'electron';
import type { Command } from '../host.ts';

/**
 * The window's menu. The page handles the keys itself, as it does in a browser, so they are shown here and not taken
 * (`registerAccelerator: false`); macOS takes them all the same and says the same thing by the menu.
 */
export function menuTemplate(say: (command: Command) => void, mac: boolean): MenuItemConstructorOptions[] {
  const item = (label: string, accelerator: string, command: Command): MenuItemConstructorOptions => ({
    label,
    accelerator,
    registerAccelerator: false,
    click: () => say(command),
  });
  const line: MenuItemConstructorOptions = { type: 'separator' };
  return [
    ...(mac ? [{ role: 'appMenu' } as const] : []),
    {
      label: '&File',
      submenu: [
        item('&New arch', 'CmdOrCtrl+N', 'new'),
        item('&Open…', 'CmdOrCtrl+O', 'open'),
        line,
        item('&Save', 'CmdOrCtrl+S', 'save'),
        item('Save &as…', 'CmdOrCtrl+Shift+S', 'save-as'),
        line,
        item('&Export drawings…', 'CmdOrCtrl+E', 'export'),
        item('&Print…', 'CmdOrCtrl+P', 'print'),
        ...(mac ? [] : [line, { role: 'quit' } as const]),
      ],
    },
    {
      label: '&Edit',
      submenu: [
        item('&Undo', 'CmdOrCtrl+Z', 'undo'),
        item('&Redo', 'CmdOrCtrl+Shift+Z', 'redo'),
        line,
        { role: 'cut' },
        { role: 'copy' },
        { role: 'paste' },
        { role: 'selectAll' },
      ],
    },
    {
      label: '&View',
      submenu: [
        item('Zoom &in', 'CmdOrCtrl+Plus', 'zoom-in'),
        item('Zoom &out', 'CmdOrCtrl+-', 'zoom-out'),
        item('Zoom to &fit', 'CmdOrCtrl+0', 'zoom-to-fit'),
        line,
        { role: 'togglefullscreen' },
      ],
    },
  ];
}
