import { EventEmitter } from 'node:events';

type Handler = (event: unknown, ...details: unknown[]) => unknown;

/**
 * As much of Electron as the built program touches, so that main process and preload run together in plain Node. What
 * the page would ask goes from the preload's bridge through `ipcRenderer` to `ipcMain`, as in the real one.
 */
export class FakeElectron {
  readonly handlers = new Map<string, Handler>();
  readonly windows: FakeWindow[] = [];
  readonly schemes = new Map<string, (request: { url: string }) => Promise<Response>>();
  readonly privileged: unknown[] = [];
  readonly toPage = new EventEmitter();
  /** What the preload gave the page. */
  readonly page: Record<string, unknown> = {};
  readonly session = new FakeSession();
  menu: readonly { readonly label?: string; readonly submenu?: unknown }[] = [];
  /** What the person chooses in the next dialog. */
  choice: { filePaths: string[]; filePath: string; response: number } = { filePaths: [], filePath: '', response: 0 };
  sender = 'app://skewback/';
  readonly app: FakeApp;
  readonly module: Readonly<Record<string, unknown>>;

  constructor(programFolder: string, userData: string, lock = true) {
    this.app = new FakeApp(programFolder, userData, lock);
    const choose = (): Promise<FakeElectron['choice']> => Promise.resolve(this.choice);
    const opened = this.windows;
    const heard = this.toPage;
    this.module = {
      app: this.app,
      session: { defaultSession: this.session },
      protocol: {
        registerSchemesAsPrivileged: (schemes: unknown[]) => this.privileged.push(...schemes),
        handle: (scheme: string, answer: (request: { url: string }) => Promise<Response>) =>
          this.schemes.set(scheme, answer),
      },
      ipcMain: { handle: (channel: string, handler: Handler) => this.handlers.set(channel, handler) },
      dialog: { showOpenDialog: choose, showSaveDialog: choose, showMessageBox: choose },
      nativeTheme: { shouldUseDarkColors: false },
      Menu: {
        buildFromTemplate: (template: FakeElectron['menu']) => template,
        setApplicationMenu: (menu: FakeElectron['menu']) => (this.menu = menu),
      },
      BrowserWindow: class extends FakeWindow {
        constructor(options: Record<string, unknown>) {
          super(options, heard);
          opened.push(this);
        }
      },
      contextBridge: { exposeInMainWorld: (name: string, value: unknown) => (this.page[name] = value) },
      ipcRenderer: {
        invoke: (channel: string, ...details: unknown[]) => this.invoke(channel, ...details),
        on: (channel: string, listener: (...news: unknown[]) => void) => heard.on(channel, listener),
        off: (channel: string, listener: (...news: unknown[]) => void) => heard.off(channel, listener),
      },
    };
  }

  /** A question as it comes to the main process, from the frame at `sender`. */
  async invoke(channel: string, ...details: unknown[]): Promise<unknown> {
    const frame = { url: this.sender };
    const handler = this.handlers.get(channel);
    if (handler === undefined) throw new Error(`nobody answers ${channel}`);
    return await handler({ senderFrame: frame, sender: { mainFrame: frame } }, ...details);
  }
}

class FakeApp extends EventEmitter {
  readonly isPackaged = true;
  hasQuit = false;
  constructor(
    private readonly programFolder: string,
    private readonly userData: string,
    private readonly lock: boolean,
  ) {
    super();
  }
  requestSingleInstanceLock = (): boolean => this.lock;
  whenReady = (): Promise<void> => Promise.resolve();
  getAppPath = (): string => this.programFolder;
  getPath = (): string => this.userData;
  quit = (): void => void (this.hasQuit = true);
}

type PermissionCheck = (contents: unknown, permission: string) => boolean;

class FakeSession {
  mayHave: PermissionCheck = () => true;
  fetches: (url: string) => boolean = () => true;
  spellChecks = true;
  readonly webRequest = {
    onBeforeRequest: (listener: (details: { url: string }, answer: (given: { cancel: boolean }) => void) => void) => {
      this.fetches = (url) => {
        let cancelled = false;
        listener({ url }, ({ cancel }) => (cancelled = cancel));
        return !cancelled;
      };
    },
  };
  setPermissionRequestHandler = (): void => undefined;
  setPermissionCheckHandler = (check: PermissionCheck): void => void (this.mayHave = check);
  setSpellCheckerEnabled = (on: boolean): void => void (this.spellChecks = on);
}

export class FakeWindow extends EventEmitter {
  readonly webContents: EventEmitter;
  address = '';
  title = '';
  isClosed = false;
  isInFront = false;
  constructor(
    readonly options: Record<string, unknown>,
    toPage: EventEmitter,
  ) {
    super();
    this.webContents = Object.assign(new EventEmitter(), {
      send: (channel: string, news: unknown) => toPage.emit(channel, {}, news),
      print: (_options: unknown, printed: (success: boolean, reason: string) => void) => printed(false, 'cancelled'),
      reload: () => undefined,
    });
  }
  loadURL = (address: string): Promise<void> => {
    this.address = address;
    return Promise.resolve();
  };
  setTitle = (title: string): void => void (this.title = title);
  setDocumentEdited = (): void => undefined;
  isMinimized = (): boolean => false;
  focus = (): void => void (this.isInFront = true);
  /** As the person's click on the window's cross. */
  close = (): void => {
    let prevented = false;
    this.emit('close', { preventDefault: () => (prevented = true) });
    this.isClosed = !prevented;
  };
}
