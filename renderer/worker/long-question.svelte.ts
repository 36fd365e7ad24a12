/**
 * One long question: asked, on its way, answered, or given up. An answer belongs to the scheme that it was asked of, and
 * counts for nothing under another; undo brings scheme and answer back together.
 */
import type { Scheme } from '../../core/job/schema.ts';
import { openDesk, type Desk } from './desk.ts';
import type { Told } from './answers.ts';

export type Stage<Answer> =
  | { readonly kind: 'not-asked' }
  /** `share` of the way done, 0 … 1. */
  | { readonly kind: 'working'; readonly share: number }
  | { readonly kind: 'answered'; readonly answer: Answer }
  | { readonly kind: 'failed'; readonly because: string };

const NOT_ASKED = { kind: 'not-asked' } as const;

export class LongQuestion<Input, Answer> {
  readonly #scheme: () => Scheme;
  readonly #ask: (desk: Desk, scheme: Scheme, input: Input, told: Told) => Promise<Answer>;
  readonly #open: () => Desk;
  #desk: Desk | null = null;
  /** Counts the askings: what comes back for an older one is dropped. */
  #asking = 0;
  #of = $state.raw<Scheme | null>(null);
  #stage = $state.raw<Stage<Answer>>(NOT_ASKED);

  /** @param scheme the scheme that is shown now. */
  constructor(
    scheme: () => Scheme,
    ask: (desk: Desk, scheme: Scheme, input: Input, told: Told) => Promise<Answer>,
    open: () => Desk = openDesk,
  ) {
    this.#scheme = scheme;
    this.#ask = ask;
    this.#open = open;
  }

  /** How far the question has come for the scheme that is shown. */
  readonly stage: Stage<Answer> = $derived.by(() => (this.#of === this.#scheme() ? this.#stage : NOT_ASKED));
  readonly answer: Answer | null = $derived.by(() => (this.stage.kind === 'answered' ? this.stage.answer : null));

  async ask(input: Input): Promise<void> {
    this.cancel();
    const asking = ++this.#asking;
    const scheme = this.#scheme();
    this.#of = scheme;
    this.#stage = { kind: 'working', share: 0 };
    this.#desk ??= this.#open();
    const told = (share: number): void => {
      // reports have a road of their own and may come in after the answer
      if (asking !== this.#asking || this.#stage.kind !== 'working') return;
      // another document needs no answer to this one
      if (this.#scheme() === scheme) this.#stage = { kind: 'working', share };
      else this.cancel();
    };
    try {
      const answer = await this.#ask(this.#desk, scheme, input, told);
      if (asking === this.#asking) this.#stage = { kind: 'answered', answer };
    } catch (error) {
      if (asking !== this.#asking) return;
      this.#stage = { kind: 'failed', because: error instanceof Error ? error.message : String(error) };
      this.#end();
    }
  }

  /** Gives up what is on its way; an answer already there stays. */
  cancel(): void {
    if (this.#stage.kind !== 'working') return;
    this.#asking++;
    this.#stage = NOT_ASKED;
    this.#end();
  }

  /** Puts the answer away too: it was to another question. */
  forget(): void {
    this.cancel();
    this.#stage = NOT_ASKED;
  }

  #end(): void {
    this.#desk?.close();
    this.#desk = null;
  }
}
