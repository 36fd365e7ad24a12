import { BrowserWindow, dialog, nativeTheme } from 'electron';
import { join } from 'node:path';
import type { OpenedFile, Outcome } from '../host.ts';
import type { News } from '../preload/channels.ts';
import type { PageWindow } from './answers.ts';
import { PAGE_ORIGIN } from './lockdown.ts';
import { waiting } from './waiting.ts';

export interface MainWindow extends PageWindow {
  readonly window: BrowserWindow;
  /** Loads the page. */
  load(): Promise<void>;
  /** Tells the page; a file opened from outside waits until the page listens. */
  tell<Channel extends keyof News>(channel: Channel, news: News[Channel]): void;
  giveOpened(opened: Outcome<OpenedFile>): void;
  comeForward(): void;
}

/** The paper of the two themes, so that the window does not flash before the page is there. */
const PAPER = { light: '#F7F3EA', dark: '#14181B' };

/** The one window. @param programFolder holds `dist` */
export function mainWindow(programFolder: string): MainWindow {
  const window = new BrowserWindow({
    width: 1440,
    height: 900,
    minWidth: 640,
    minHeight: 480,
    title: 'Skewback',
    backgroundColor: nativeTheme.shouldUseDarkColors ? PAPER.dark : PAPER.light,
    webPreferences: {
      preload: join(programFolder, 'dist', 'preload', 'preload.cjs'),
      sandbox: true,
      contextIsolation: true,
      nodeIntegration: false,
      webviewTag: false,
      spellcheck: false,
    },
  });
  const opened = waiting<Outcome<OpenedFile>>();
  let dirty = false;

  const tell: MainWindow['tell'] = (channel, news) => window.webContents.send(channel, news);
  const close = (): void => {
    dirty = false;
    window.close();
  };

  window.on('close', (event) => {
    if (!dirty) return;
    event.preventDefault();
    tell('window:close-requested', null);
  });
  // A title of the page's document does not replace the one set through the contract.
  window.on('page-title-updated', (event) => event.preventDefault());
  window.webContents.on('did-start-navigation', ({ isMainFrame, isSameDocument }) => {
    if (isMainFrame && !isSameDocument) opened.listener(null);
  });
  window.webContents.on('render-process-gone', () => {
    dirty = false;
    const message = 'The page stopped. It opens again with the last draft kept.';
    void dialog.showMessageBox(window, { type: 'warning', message }).then(() => window.webContents.reload());
  });

  // A page that hangs cannot answer whether it may close.
  window.on('unresponsive', () => {
    const buttons = ['Wait', 'Close'];
    void dialog
      .showMessageBox(window, { type: 'warning', message: 'The page does not answer.', buttons })
      .then(({ response }) => {
        if (response === 1) window.destroy();
      });
  });

  return {
    window,
    load: () => window.loadURL(`${PAGE_ORIGIN}/`),
    tell,
    giveOpened: (outcome) => opened.give(outcome),
    pageListens: () => opened.listener((outcome) => tell('file:opened', outcome)),
    comeForward() {
      if (window.isMinimized()) window.restore();
      window.focus();
    },
    setDirty(now) {
      dirty = now;
      window.setDocumentEdited(now);
    },
    setTitle: (title) => window.setTitle(title === '' ? 'Skewback' : `${title} · Skewback`),
    close,
    print: () =>
      new Promise((printed) => {
        window.webContents.print({}, (success, reason) => {
          if (success) printed({ kind: 'done', value: null });
          else if (/cancel/i.test(reason)) printed({ kind: 'cancelled' });
          else printed({ kind: 'failed', reason: `It could not be printed: ${reason}.` });
        });
      }),
  };
}
