/**
 * The open document and everything that follows from it: undo, what is being dragged, what is pointed at, and the
 * assessment. Documents are plain and never changed; this holds which one is shown.
 */
import type { AssessedScheme, SchemeOutcome } from '../../core/assess/assess.ts';
import type { About } from '../../core/drawing/scene.ts';
import type { Photographs } from '../../core/job/archive.ts';
import { addArch, patchScheme } from '../../core/job/edits.ts';
import type { Arch, Job, Scheme } from '../../core/job/schema.ts';
import type { FileRef } from '../../app/host.ts';
import { outcomeOf } from './assessed.ts';
import { NO_PHOTOGRAPHS, type OpenDocument } from './document.ts';
import { historyOf, presentOf, recorded, redone, stepToRedo, stepToUndo, undone, type History } from './history.ts';
import type { Measure } from './measures.ts';
import { changedPlace, type Place } from './place.ts';
import { tried, triedEntry, type Trial } from './trial.ts';

/** A gesture under way. It shows the document it started with, changed; release makes one step of it. */
export interface Drag {
  preview(edit: (scheme: Scheme) => Scheme): void;
  release(name: string): void;
  abandon(): void;
}

const NOWHERE: Place = { arch: '', scheme: '' };

export class Session {
  #history: History = $state.raw() as History;
  #preview = $state.raw<Job | null>(null);
  #place = $state.raw<Place>(NOWHERE);
  /** The document as its file has it. */
  #kept = $state.raw<Job | null>(null);
  file = $state.raw<FileRef | null>(null);
  photographs: Photographs = NO_PHOTOGRAPHS;
  /** What is pointed at, on the board and in the panels alike. */
  selection = $state.raw<About | null>(null);
  /** Counts the documents opened, so that a view can tell another document from an edit. */
  opened = $state(0);
  /** Why the last drag or edit went no further; empty when it went through. */
  refusal = $state('');

  constructor(document: OpenDocument) {
    this.open(document);
  }

  readonly job: Job = $derived(this.#preview ?? presentOf(this.#history));
  readonly arch: Arch = $derived(byId(this.job.arches, this.#place.arch));
  readonly scheme: Scheme = $derived(byId(this.arch.schemes, this.#place.scheme));
  readonly outcome: SchemeOutcome = $derived(outcomeOf(this.arch, this.scheme));
  /** The scheme as drawn; null when it cannot be built, and `outcome` says why. */
  readonly assessed: AssessedScheme | null = $derived(this.outcome.ok ? this.outcome.assessed : null);
  readonly dragging: boolean = $derived(this.#preview !== null);
  readonly dirty: boolean = $derived(presentOf(this.#history) !== this.#kept);
  readonly toUndo: string | null = $derived(stepToUndo(this.#history));
  readonly toRedo: string | null = $derived(stepToRedo(this.#history));

  /** Puts another document in the place of this one, with a history of its own. */
  open({ job, photographs, file, unsaved }: OpenDocument): void {
    this.opened += 1;
    this.#history = historyOf(job);
    this.#preview = null;
    this.#kept = unsaved === true ? null : job;
    this.#place = NOWHERE;
    this.photographs = photographs;
    this.file = file;
    this.selection = null;
    this.refusal = '';
  }

  /** The document as it stands now is what the file holds. */
  kept(job: Job, file: FileRef): void {
    this.#kept = job;
    this.file = file;
  }

  /** The document without what is being dragged: what a file gets. */
  get settled(): Job {
    return presentOf(this.#history);
  }

  show(arch: string, scheme: string): void {
    this.#preview = null;
    this.#place = { arch, scheme };
    this.selection = null;
    this.refusal = '';
  }

  /** One step on the scheme shown, or a refusal that says why not. */
  edit(name: string, edit: (scheme: Scheme) => Scheme): void {
    this.#preview = null;
    this.#take(name, tried(this.arch, this.scheme, edit));
  }

  /** A typed figure. Returns why it cannot be taken, or null when it was. */
  enter(measure: Measure, value: number, shown: string): string | null {
    this.#preview = null;
    const trial = triedEntry(this.arch, this.scheme, measure, value);
    if (!trial.ok) return trial.reason;
    this.#take(`${measure.name.toLowerCase()} ${shown}`, trial);
    return null;
  }

  editJob(name: string, edit: (job: Job) => Job): void {
    this.#preview = null;
    this.#history = recorded(this.#history, name, edit(this.settled));
  }

  /** Another arch of the job, shown at once. */
  addArch(scheme: Scheme): void {
    this.editJob('arch added', (job) => addArch(job, scheme));
    const added = this.settled.arches.at(-1);
    if (added !== undefined) this.show(added.id, '');
  }

  undo(): void {
    this.#step(undone);
  }

  redo(): void {
    this.#step(redone);
  }

  drag(): Drag {
    this.#preview = null;
    this.refusal = '';
    const { arch, scheme, settled } = this;
    const going = (): boolean => this.settled === settled;
    return {
      preview: (edit) => {
        if (!going()) return;
        const trial = tried(arch, scheme, edit);
        this.refusal = trial.ok ? '' : trial.reason;
        if (trial.ok) this.#preview = patchScheme(settled, arch.id, scheme.id, () => trial.scheme);
      },
      release: (name) => {
        const preview = this.#preview;
        this.#preview = null;
        this.refusal = '';
        if (going() && preview !== null) this.#history = recorded(this.#history, name, preview);
      },
      abandon: () => {
        this.#preview = null;
        this.refusal = '';
      },
    };
  }

  #take(name: string, trial: Trial): void {
    this.refusal = trial.ok ? '' : trial.reason;
    if (!trial.ok) return;
    const { arch, scheme } = this;
    this.#history = recorded(
      this.#history,
      name,
      patchScheme(this.settled, arch.id, scheme.id, () => trial.scheme),
    );
  }

  #step(step: (history: History) => History): void {
    this.#preview = null;
    this.refusal = '';
    const before = this.settled;
    this.#history = step(this.#history);
    // the eye follows the step to the scheme that it was about
    const place = changedPlace(before, this.settled);
    if (place === null || (place.arch === this.arch.id && place.scheme === this.scheme.id)) return;
    this.show(place.arch, place.scheme);
  }
}

/** The entry with this id, or the first where it is gone. */
function byId<T extends { readonly id: string }>(entries: readonly T[], id: string): T {
  return (entries.find((entry) => entry.id === id) ?? entries[0]) as T;
}
