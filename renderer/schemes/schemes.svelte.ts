/** What is done with the schemes of the arch that is shown: switched, copied, renamed, taken away, laid over one another. */
import type { Overlays } from '../../core/drawing/elevation.ts';
import type { OtherScheme } from '../../core/drawing/other.ts';
import { duplicateScheme, removeScheme, renameScheme } from '../../core/job/edits.ts';
import { LIMITS, type Arch, type Scheme } from '../../core/job/schema.ts';
import type { Point } from '../../core/geometry/point.ts';
import { outcomeOf } from '../session/assessed.ts';
import type { Action } from '../session/commands.ts';
import type { Session } from '../session/session.svelte.ts';

/** A scheme's name as it is shown, given or not. */
export function schemeName({ schemes }: Arch, scheme: Scheme): string {
  const place = schemes.findIndex(({ id }) => id === scheme.id);
  return scheme.name ?? (place === 0 ? 'As found' : `Proposal ${place}`);
}

/** Places that have a key of their own. */
const PLACES = [1, 2, 3, 4, 5, 6, 7, 8, 9];

/** What the board is told by others: what lies over the elevation, and who takes a press on it. */
interface Asked {
  readonly overlays: Overlays;
  press(at: Point, reach: number): boolean;
}

export class Schemes {
  readonly #session: Session;
  /** The scheme chosen to lie over the one that is shown. */
  #laid = $state.raw<string | null>(null);
  /** The scheme whose name is being typed. */
  renaming = $state.raw<string | null>(null);
  /** The table of all schemes lies open. */
  table = $state(false);

  constructor(session: Session) {
    this.#session = session;
  }

  /** The scheme laid over the one that is shown; null when there is none. */
  readonly laid: Scheme | null = $derived.by(() => {
    const { arch, scheme } = this.#session;
    const other = arch.schemes.find(({ id }) => id === this.#laid);
    return other === undefined || other.id === scheme.id ? null : other;
  });

  readonly other: OtherScheme | null = $derived.by(() => {
    if (this.laid === null) return null;
    const { arch } = this.#session;
    const outcome = outcomeOf(arch, this.laid);
    return outcome.ok ? { assessed: outcome.assessed, name: schemeName(arch, this.laid) } : null;
  });

  readonly canDuplicate: boolean = $derived.by(() => this.#session.arch.schemes.length < LIMITS.schemes);
  /** The arch as found stays. */
  readonly canRemove: boolean = $derived.by(() => this.#session.arch.schemes[0]?.id !== this.#session.scheme.id);

  /** What keys can ask of the schemes. */
  readonly actions: Readonly<Partial<Record<Action, () => void>>> = {
    'next-scheme': () => this.step(1),
    'previous-scheme': () => this.step(-1),
    'duplicate-scheme': () => this.duplicate(),
    'rename-scheme': () => (this.renaming = this.#session.scheme.id),
    'scheme-table': () => (this.table = true),
    ...Object.fromEntries(PLACES.map((place) => [`scheme-${place}`, () => this.showAt(place)])),
  };

  /** The same, with the other scheme laid under whatever else lies there. */
  over(asked: Asked): Asked {
    const other = (): OtherScheme | null => this.other;
    return {
      get overlays(): Overlays {
        const laid = other();
        return laid === null ? asked.overlays : { ...asked.overlays, other: laid };
      },
      press: (at, reach) => asked.press(at, reach),
    };
  }

  /** Shows a scheme; where that one lay over the present one, the two change places. */
  show(id: string): void {
    const { arch, scheme } = this.#session;
    if (id === scheme.id) return;
    if (this.laid?.id === id) this.#laid = scheme.id;
    this.#session.show(arch.id, id);
  }

  /** The scheme at a place, 1 for the first; nothing where there is none. */
  showAt(place: number): void {
    const scheme = this.#session.arch.schemes[place - 1];
    if (scheme !== undefined) this.show(scheme.id);
  }

  /** The next or the one before, round the end. */
  step(by: 1 | -1): void {
    const { arch, scheme } = this.#session;
    const { length } = arch.schemes;
    const at = arch.schemes.findIndex(({ id }) => id === scheme.id);
    this.showAt(((at + by + length) % length) + 1);
  }

  /** Lays a scheme over the one that is shown, or takes it away again. */
  lay(id: string): void {
    this.#laid = this.laid?.id === id ? null : id;
  }

  /** Copies the scheme that is shown as a proposal and shows the copy. */
  duplicate(): void {
    const { arch, scheme } = this.#session;
    this.#session.editJob(`duplicate of ${schemeName(arch, scheme)}`, (job) =>
      duplicateScheme(job, arch.id, scheme.id),
    );
    const copy = this.#session.arch.schemes.at(-1);
    if (copy !== undefined && !arch.schemes.some(({ id }) => id === copy.id)) this.#session.show(arch.id, copy.id);
  }

  rename(id: string, name: string): void {
    this.renaming = null;
    const { arch } = this.#session;
    if (name !== '') this.#session.editJob(`name ${name}`, (job) => renameScheme(job, arch.id, id, name));
  }

  /** Takes the scheme that is shown away; the one before it is shown. Undo brings it back. */
  remove(): void {
    const { arch, scheme } = this.#session;
    const before = arch.schemes[arch.schemes.findIndex(({ id }) => id === scheme.id) - 1];
    if (before === undefined) return;
    const name = schemeName(arch, scheme);
    this.#session.editJob(`${name} taken away`, (job) => removeScheme(job, arch.id, scheme.id));
    this.#session.show(arch.id, before.id);
  }
}
