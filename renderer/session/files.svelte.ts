/** Documents between session and shell: new, open, save, export; and what the person must be told or asked on the way. */
import type { Draft, ExportedFile, FileRef, Host, KeptSave, OpenedFile, Outcome } from '../../app/host.ts';
import { readJobFile, writeJobFile } from '../../core/job/archive.ts';
import type { DrawnShape } from '../../core/job/edits.ts';
import { freshJob } from '../../core/job/fresh.ts';
import type { Job } from '../../core/job/schema.ts';
import { problemSentence } from '../../core/job/problem.ts';
import { NO_PHOTOGRAPHS } from './document.ts';
import { jobFileName } from './names.ts';
import type { Session } from './session.svelte.ts';

export interface Notice {
  readonly kind: 'problem' | 'done';
  readonly text: string;
  /** One line for each thing that is wrong with a file. */
  readonly details: readonly string[];
}

export type UnsavedAnswer = 'save' | 'discard' | 'stay';
export type ClashAnswer = 'over' | 'copy' | 'stay';

/** Beyond these, the rest of a file's problems are counted. */
const MOST_DETAILS = 8;

export class Files {
  notice = $state.raw<Notice | null>(null);
  /** Set while the person is asked what to do with unsaved work. */
  question = $state.raw<((answer: UnsavedAnswer) => void) | null>(null);
  /** Set while the person is asked what to do about a file that something else has written meanwhile. */
  clash = $state.raw<((answer: ClashAnswer) => void) | null>(null);
  readonly #session: Session;
  readonly #host: Host;

  constructor(session: Session, host: Host) {
    this.#session = session;
    this.#host = host;
  }

  async begin(shape: DrawnShape): Promise<void> {
    if (!(await this.mayLeave())) return;
    this.#session.open({ job: freshJob(shape), photographs: NO_PHOTOGRAPHS, file: null });
    this.notice = null;
  }

  async open(): Promise<void> {
    if (!(await this.mayLeave())) return;
    this.take(await this.#host.open());
  }

  /** A file that the shell brings by itself. */
  async receive(opened: Outcome<OpenedFile>): Promise<void> {
    if (opened.kind !== 'done' || (await this.mayLeave())) this.take(opened);
  }

  async openRecent(file: FileRef): Promise<void> {
    const { recent } = this.#host;
    if (recent === undefined || !(await this.mayLeave())) return;
    const opened = await recent.open(file);
    // What cannot be opened any more need not be offered again.
    if (opened.kind === 'failed') await recent.forget(file);
    this.take(opened);
  }

  /** Opens work that was kept aside. `recover` puts it in place, or says why it cannot. */
  async recover(draft: Draft, recover: (draft: Draft) => string | null): Promise<void> {
    if (!(await this.mayLeave())) return;
    const text = recover(draft);
    this.notice = text === null ? null : { kind: 'problem', text, details: [] };
  }

  /** Back to what an earlier save held, as one more step. `when` is how the person knows that save. */
  restore({ bytes }: KeptSave, when: string): void {
    const reading = readJobFile(bytes);
    if (reading.ok) this.#session.editJob(`back to the save of ${when}`, () => reading.job);
    else this.notice = { kind: 'problem', text: `The save of ${when} can no longer be read.`, details: [] };
  }

  take(opened: Outcome<OpenedFile>): void {
    const found = this.#settled(opened);
    if (found === null) return;
    const { file, bytes } = found;
    const reading = readJobFile(bytes);
    if (reading.ok) {
      this.#session.open({ job: reading.job, photographs: reading.photographs, file });
      this.notice = null;
      return;
    }
    const sentences = reading.problems.map(problemSentence);
    const left = sentences.length - MOST_DETAILS;
    const details = left > 0 ? [...sentences.slice(0, MOST_DETAILS), `and ${left} more`] : sentences;
    this.notice = { kind: 'problem', text: `${file.name} could not be opened.`, details };
  }

  /** @returns whether the work is now in a file. */
  async save(): Promise<boolean> {
    const { file, settled, photographs } = this.#session;
    if (file === null) return this.saveAs();
    if (await this.#host.changedSince?.(file)) {
      const answer = await new Promise<ClashAnswer>((resolve) => {
        this.clash?.('stay');
        this.clash = resolve;
      });
      this.clash = null;
      if (answer !== 'over') return answer === 'copy' && this.saveAs();
    }
    const bytes = writeJobFile(settled, photographs);
    return this.#saved(settled, bytes, await this.#host.save(file, bytes));
  }

  async saveAs(): Promise<boolean> {
    const { file, settled, photographs } = this.#session;
    const bytes = writeJobFile(settled, photographs);
    return this.#saved(settled, bytes, await this.#host.saveAs(file?.name ?? jobFileName(settled), bytes));
  }

  async export(file: ExportedFile): Promise<void> {
    const where = this.#settled(await this.#host.exportFile(file));
    if (where !== null) this.notice = { kind: 'done', text: `The drawing is in ${where}.`, details: [] };
  }

  /** Whether the open document may be put away: it is saved, or the person lets its changes go. */
  async mayLeave(): Promise<boolean> {
    if (!this.#session.dirty) return true;
    const answer = await new Promise<UnsavedAnswer>((resolve) => {
      this.question?.('stay');
      this.question = resolve;
    });
    this.question = null;
    return answer === 'save' ? this.save() : answer === 'discard';
  }

  #saved(job: Job, bytes: Uint8Array, outcome: Outcome<FileRef>): boolean {
    const file = this.#settled(outcome);
    if (file === null) return false;
    this.#session.kept(job, file);
    this.notice = { kind: 'done', text: `Saved as ${file.name}.`, details: [] };
    // Earlier saves are a convenience; the file itself is written.
    this.#host.saves?.keep(file, bytes).catch(() => undefined);
    return true;
  }

  /** The value of what went well; a failure is told, a closed dialog is not. */
  #settled<Value>(outcome: Outcome<Value>): Value | null {
    if (outcome.kind === 'done') return outcome.value;
    if (outcome.kind === 'failed') this.notice = { kind: 'problem', text: outcome.reason, details: [] };
    return null;
  }
}
