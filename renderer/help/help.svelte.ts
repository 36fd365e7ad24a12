/** Which leaf of the help lies open, and at which word. */
import { termOfField, type TermId } from './terms.ts';

export type Leaf = 'keys' | 'words';

class Help {
  leaf = $state<Leaf | null>(null);
  word = $state.raw<TermId | null>(null);

  /** The keys; or, from a field that a word explains, that word. */
  open(from: Element | null): void {
    const path = from instanceof HTMLElement ? from.dataset['path'] : undefined;
    this.word = path === undefined ? null : termOfField(path);
    this.leaf = this.word === null ? 'keys' : 'words';
  }

  close(): void {
    this.leaf = null;
  }
}

export const help = new Help();
