/** Runs between page and desktop: the page gets the host contract and nothing else of Electron or Node. */
import { contextBridge, ipcRenderer } from 'electron';
import { version } from '../../package.json';
import type { Host, Unlisten } from '../host.ts';
import type { News, Questions } from './channels.ts';

function ask<Channel extends keyof Questions>(
  channel: Channel,
  ...details: Parameters<Questions[Channel]>
): Promise<ReturnType<Questions[Channel]>> {
  return ipcRenderer.invoke(channel, ...details) as Promise<ReturnType<Questions[Channel]>>;
}

/** `ask` where the page waits for no answer. */
function tell<Channel extends keyof Questions>(channel: Channel, ...details: Parameters<Questions[Channel]>): void {
  void ask(channel, ...details);
}

function listen<Channel extends keyof News>(channel: Channel, listener: (news: News[Channel]) => void): Unlisten {
  const heard = (_event: unknown, news: News[Channel]): void => listener(news);
  ipcRenderer.on(channel, heard);
  return () => void ipcRenderer.off(channel, heard);
}

const host = {
  shell: 'desktop',
  versions: { app: version, engine: `Chromium ${process.versions.chrome}` },
  open: () => ask('file:open'),
  save: (file, bytes) => ask('file:save', file.id, bytes),
  saveAs: (suggestedName, bytes) => ask('file:save-as', suggestedName, bytes),
  exportFile: (file) => ask('file:export', file),
  exportFiles: (files) => ask('file:export-all', files),
  recent: {
    list: () => ask('recent:list'),
    open: (file) => ask('recent:open', file.id),
    forget: (file) => ask('recent:forget', file.id),
  },
  drafts: {
    keep: (note, bytes) => ask('draft:keep', note, bytes),
    list: () => ask('draft:list'),
    discard: (id) => ask('draft:discard', id),
  },
  print: () => ask('page:print'),
  onOpenFile: (listener) => {
    const unlisten = listen('file:opened', listener);
    tell('page:listens');
    return unlisten;
  },
  window: {
    setDirty: (dirty) => tell('window:dirty', dirty),
    setTitle: (title) => tell('window:title', title),
    onCloseRequested: (listener) => listen('window:close-requested', () => listener()),
    close: () => tell('window:close'),
    onCommand: (listener) => listen('menu:command', listener),
  },
} satisfies Host;

contextBridge.exposeInMainWorld('skewbackHost', host);
