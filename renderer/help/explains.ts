/** Shows what the label of a field means while the pointer rests on it; by keyboard, F1 in the field does. */
import { mount, unmount } from 'svelte';
import TermCard from './TermCard.svelte';
import { termOfField } from './terms.ts';

/** As long as for a word in a text, ms. */
const PATIENCE = 400;

/** An attachment for the label of the field at a path; it does nothing where the field explains itself. */
export function explains(path: string | undefined): (label: HTMLElement) => (() => void) | undefined {
  return (label) => {
    const term = path === undefined ? null : termOfField(path);
    if (term === null) return undefined;
    let waiting = 0;
    let card: Record<string, unknown> | null = null;
    const hide = (): void => {
      clearTimeout(waiting);
      if (card !== null) void unmount(card);
      card = null;
    };
    const wait = ({ pointerType }: PointerEvent): void => {
      if (pointerType !== 'mouse') return;
      clearTimeout(waiting);
      waiting = window.setTimeout(() => {
        card ??= mount(TermCard, { target: document.body, props: { term, anchor: label } });
      }, PATIENCE);
    };
    const key = ({ key: pressed }: KeyboardEvent): void => {
      if (pressed === 'Escape') hide();
    };
    label.addEventListener('pointerenter', wait);
    label.addEventListener('pointerleave', hide);
    window.addEventListener('keydown', key);
    return () => {
      hide();
      label.removeEventListener('pointerenter', wait);
      label.removeEventListener('pointerleave', hide);
      window.removeEventListener('keydown', key);
    };
  };
}
