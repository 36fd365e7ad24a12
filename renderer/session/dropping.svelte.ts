/** A file dragged onto the window and dropped there is opened. */
import type { Host } from '../../app/host.ts';
import type { Files } from './files.svelte.ts';

export class Dropping {
  /** A file is over the window now. */
  over = $state(false);
  readonly #files: Files;
  readonly #host: Host;

  constructor(files: Files, host: Host) {
    this.#files = files;
    this.#host = host;
  }

  hover(event: DragEvent): void {
    if (event.dataTransfer?.types.includes('Files') !== true) return;
    // Without this the browser would leave the page for the file.
    event.preventDefault();
    event.dataTransfer.dropEffect = this.#host.dropped === undefined ? 'none' : 'copy';
    this.over = this.#host.dropped !== undefined;
  }

  left({ relatedTarget }: DragEvent): void {
    // Between two parts of the page there is a next one.
    if (relatedTarget === null) this.over = false;
  }

  drop(event: DragEvent): void {
    this.over = false;
    const item = [...(event.dataTransfer?.items ?? [])].find(({ kind }) => kind === 'file');
    const file = item?.getAsFile();
    if (!file || this.#host.dropped === undefined) return;
    event.preventDefault();
    // A desktop is handed the file alone: nothing else of a drop passes its border.
    const opened = this.#host.shell === 'browser' ? this.#host.dropped(file, item) : this.#host.dropped(file);
    void opened.then((outcome) => this.#files.receive(outcome));
  }
}
