/** The desktop program: one window on the built page, and the files that a person chooses. */
import { app, ipcMain, Menu, protocol, session } from 'electron';
import { join } from 'node:path';
import { draftStore } from '../files/drafts.ts';
import { recentPaths } from '../files/recent.ts';
import { references } from '../files/references.ts';
import { pageFile } from '../page/page.ts';
import { answers, openPath, type Desk } from './answers.ts';
import { filesNamed } from './arguments.ts';
import { dialogsOver } from './dialogs.ts';
import { lockDown, PAGE_ORIGIN, PAGE_SCHEME } from './lockdown.ts';
import { menuTemplate } from './menu.ts';
import { answerQuestions } from './questions.ts';
import { waiting } from './waiting.ts';
import { mainWindow } from './window.ts';

/** Paths opened from outside, by a double click or on the command line; they may come before the window is there. */
const fromOutside = waiting<string>();

function start(): void {
  const programFolder = app.getAppPath();
  const userData = app.getPath('userData');
  lockDown(session.defaultSession);
  protocol.handle(PAGE_SCHEME, async (request) => {
    const { host, pathname } = new URL(request.url);
    const path = `${PAGE_SCHEME}://${host}` === PAGE_ORIGIN ? pathname : '';
    const { status, headers, body } = await pageFile(join(programFolder, 'dist', 'renderer'), path);
    return new Response(Buffer.from(body), { status, headers });
  });

  const shown = mainWindow(programFolder);
  const desk: Desk = {
    references: references(),
    recent: recentPaths(userData),
    drafts: draftStore(join(userData, 'drafts')),
    dialogs: dialogsOver(shown.window),
    window: shown,
    now: () => new Date(),
  };
  answerQuestions(ipcMain, answers(desk), PAGE_ORIGIN);
  Menu.setApplicationMenu(
    Menu.buildFromTemplate(
      menuTemplate((command) => shown.tell('menu:command', command), process.platform === 'darwin'),
    ),
  );
  fromOutside.listener((path) => {
    shown.comeForward();
    void openPath(desk, path).then((opened) => shown.giveOpened(opened));
  });
  app.on('second-instance', () => shown.comeForward());
  void shown.load();
}

if (app.requestSingleInstanceLock()) {
  protocol.registerSchemesAsPrivileged([
    { scheme: PAGE_SCHEME, privileges: { standard: true, secure: true, supportFetchAPI: true } },
  ]);
  // Only the last of several files is shown in one window; each is remembered.
  const open = (argv: readonly string[], folder: string): void =>
    filesNamed(argv, folder, app.isPackaged).forEach((path) => fromOutside.give(path));
  open(process.argv, process.cwd());
  app.on('second-instance', (_event, argv, folder) => open(argv, folder));
  app.on('open-file', (event, path) => {
    event.preventDefault();
    fromOutside.give(path);
  });
  app.on('window-all-closed', () => app.quit());
  void app.whenReady().then(start);
} else {
  app.quit();
}
