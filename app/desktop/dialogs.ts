import { dialog, type BrowserWindow } from 'electron';
import type { Dialogs } from './answers.ts';

const JOBS = { name: 'Skewback jobs', extensions: ['skewback', 'json'] };
const ALL = { name: 'All files', extensions: ['*'] };

/** The system's own dialogs, over `window`. */
export function dialogsOver(window: BrowserWindow): Dialogs {
  return {
    async chooseFileToOpen() {
      const { filePaths } = await dialog.showOpenDialog(window, { properties: ['openFile'], filters: [JOBS, ALL] });
      return filePaths[0] ?? null;
    },
    async choosePlaceToSave(suggestedName, ending) {
      const { filePath } = await dialog.showSaveDialog(window, {
        defaultPath: suggestedName,
        filters: [
          ending === 'skewback' ? { ...JOBS, extensions: ['skewback'] } : { name: ending, extensions: [ending] },
        ],
        properties: ['createDirectory', 'showOverwriteConfirmation'],
      });
      return filePath === '' ? null : filePath;
    },
    async chooseFolder() {
      const { filePaths } = await dialog.showOpenDialog(window, { properties: ['openDirectory', 'createDirectory'] });
      return filePaths[0] ?? null;
    },
    async mayReplace(names) {
      const { response } = await dialog.showMessageBox(window, {
        type: 'question',
        message: names.length === 1 ? `Replace ${names[0] ?? ''}?` : `Replace ${names.length} files?`,
        detail: names.slice(0, 12).join('\n'),
        buttons: ['Replace', 'Cancel'],
        defaultId: 0,
        cancelId: 1,
      });
      return response === 0;
    },
  };
}
