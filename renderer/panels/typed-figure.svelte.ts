/** One figure being typed: what stands in the field, how it is understood, and why it cannot be taken. */
import { formatQuantity } from '../../core/quantity/format.ts';
import type { QuantityKind } from '../../core/quantity/kinds.ts';
import { SHOWN } from '../session/preferences.ts';

export interface FigureSource {
  readonly kind: QuantityKind;
  /** In the unit of its kind; null where it is not known. */
  readonly value: number | null;
  /** Why the figure cannot be taken; null when it was. `shown` is the figure as it is written. */
  readonly enter: (value: number, shown: string) => string | null;
  /** Leaves the figure to what is usually assumed; absent where one must be given. */
  readonly forget: (() => void) | null;
}

const shownFigure = (value: number | null, kind: QuantityKind): string =>
  value === null ? '' : formatQuantity(value, kind, SHOWN, { figures: 'exact' });

/** The reading of entries brings the mathematics with it: loaded when a field is first entered. */
const reader = () => import('../../core/quantity/parse.ts');

const sentence = (text: string): string =>
  `${text.charAt(0).toUpperCase()}${text.slice(1)}${/[.!?]$/.test(text) ? '' : '.'}`;

export class TypedFigure {
  readonly #source: () => FigureSource;
  /** Null while nothing has been typed. */
  #draft = $state<string | null>(null);
  understood = $state('');
  problem = $state('');

  constructor(source: () => FigureSource) {
    this.#source = source;
  }

  readonly text: string = $derived.by(() => {
    const { value, kind } = this.#source();
    return this.#draft ?? shownFigure(value, kind);
  });
  readonly changed: boolean = $derived(this.#draft !== null);

  /** Gets the reading of entries ready. */
  prepare(): void {
    void reader();
  }

  async type(text: string): Promise<void> {
    this.#draft = text;
    this.problem = '';
    const { parseQuantity } = await reader();
    if (this.#draft !== text) return;
    const parsed = parseQuantity(text, this.#source().kind, SHOWN);
    this.understood = parsed.ok ? parsed.understood : '';
  }

  /** Takes what was typed, if it can be. @returns whether the field is settled now */
  async commit(): Promise<boolean> {
    const text = this.#draft;
    if (text === null) return true;
    const { kind, enter, forget } = this.#source();
    if (text.trim() === '' && forget !== null) {
      this.restore();
      forget();
      return true;
    }
    const { parseQuantity } = await reader();
    if (this.#draft !== text) return false;
    const parsed = parseQuantity(text, kind, SHOWN);
    const refusal = parsed.ok ? enter(parsed.value, shownFigure(parsed.value, kind)) : parsed.reason;
    if (refusal === null) {
      this.restore();
      return true;
    }
    this.problem = sentence(refusal);
    this.understood = '';
    return false;
  }

  /** Back to the figure as it is in the document. */
  restore(): void {
    this.#draft = null;
    this.understood = '';
    this.problem = '';
  }
}
