/**
 * Unsaved work kept aside within five seconds, and work found again that a crash or a closed tab left behind. A draft
 * is held by a lock for as long as its window lives, so that no other window takes it for left behind.
 */
import type { Draft, Drafts, Unlisten } from '../../app/host.ts';
import { readJobFile, writeJobFile } from '../../core/job/archive.ts';
import type { Job } from '../../core/job/schema.ts';
import type { Session } from './session.svelte.ts';

/** From the first change not yet kept to the keeping of it, ms. */
const DELAY = 2_000;
const LOCK = 'skewback.draft.';

/** As much of the browser's locks as is needed. */
export interface Holding {
  hold(name: string): Unlisten;
  /** Names held by any window. */
  held(): Promise<ReadonlySet<string>>;
}

export class Autosave {
  /** Work that no window holds any more, latest first. */
  found = $state.raw<readonly Draft[]>([]);
  readonly #session: Session;
  readonly #drafts: Drafts;
  readonly #holding: Holding;
  readonly #tell: (reason: string) => void;
  #id = '';
  #letGo: Unlisten = () => undefined;
  #opened = -1;
  #timer: ReturnType<typeof setTimeout> | undefined;
  #kept: Job | null = null;
  /** The draft that the open document came from; it goes when there is a newer one. */
  #origin: string | null = null;
  /** One thing after the other, so that a discarding never overtakes a keeping. */
  #last: Promise<unknown> = Promise.resolve();

  constructor(session: Session, drafts: Drafts, holding: Holding, tell: (reason: string) => void) {
    this.#session = session;
    this.#drafts = drafts;
    this.#holding = holding;
    this.#tell = tell;
  }

  /** Looks for work left behind and watches the document from now on. */
  start(): Unlisten {
    void this.#look();
    return $effect.root(() => {
      $effect(() => this.#follow(this.#session.opened, this.#session.dirty ? this.#session.settled : null));
    });
  }

  /** Keeps what waits at once: the page may be gone in a moment. */
  flush(): void {
    if (this.#timer === undefined) return;
    this.#clear();
    this.#keep();
  }

  /** The document is put away for good. Resolves when its draft is gone. */
  async done(): Promise<void> {
    this.#clear();
    this.#discard();
    await this.#last;
  }

  /** Opens work found again, unsaved as it is. @returns why it cannot be, or null */
  recover(draft: Draft): string | null {
    const reading = readJobFile(draft.bytes);
    if (!reading.ok) return `The work kept of ${draft.title} can no longer be read.`;
    const { job, photographs } = reading;
    this.#session.open({ job, photographs, file: draft.file, unsaved: true });
    this.#begin(this.#session.opened);
    this.#origin = draft.id;
    this.#drop(draft);
    return null;
  }

  throwAway(draft: Draft): void {
    this.#drop(draft);
    this.#then(() => this.#drafts.discard(draft.id));
  }

  async #look(): Promise<void> {
    const [drafts, held] = await Promise.all([this.#drafts.list(), this.#holding.held()]);
    this.found = drafts.filter(({ id }) => !held.has(LOCK + id) && id !== this.#id);
  }

  #follow(opened: number, unsaved: Job | null): void {
    if (opened !== this.#opened) {
      this.#discard();
      this.#begin(opened);
    }
    if (unsaved === null) {
      this.#clear();
      this.#discard();
    } else if (unsaved !== this.#kept) {
      this.#timer ??= setTimeout(() => this.flush(), DELAY);
    }
  }

  #begin(opened: number): void {
    this.#clear();
    this.#discard();
    this.#opened = opened;
    this.#letGo();
    this.#id = crypto.randomUUID();
    this.#letGo = this.#holding.hold(LOCK + this.#id);
  }

  #keep(): void {
    const { settled, photographs, file } = this.#session;
    const id = this.#id;
    const title = settled.title ?? 'Untitled';
    const origin = this.#origin;
    this.#origin = null;
    this.#kept = settled;
    this.#then(async () => {
      const outcome = await this.#drafts.keep({ id, title, file }, writeJobFile(settled, photographs));
      if (outcome.kind === 'failed') this.#tell(outcome.reason);
      else if (origin !== null) await this.#drafts.discard(origin);
    });
  }

  #discard(): void {
    const ids = [this.#kept === null ? null : this.#id, this.#origin].filter((id) => id !== null);
    this.#kept = null;
    this.#origin = null;
    for (const id of ids) this.#then(() => this.#drafts.discard(id));
  }

  #drop(draft: Draft): void {
    this.found = this.found.filter((other) => other !== draft);
  }

  #clear(): void {
    clearTimeout(this.#timer);
    this.#timer = undefined;
  }

  #then(work: () => Promise<unknown>): void {
    this.#last = this.#last.then(work).catch(() => undefined);
  }
}
