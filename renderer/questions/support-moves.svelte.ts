/** A movement of one support, and what the ring does: where it opens and how far; or how a ring falls that does not stand. */
import { movement } from '../../core/assess/questions.ts';
import {
  factorFor,
  mechanismFrame,
  motionsOfOpenings,
  movedRing,
  type MovedRing,
} from '../../core/drawing/moved-ring.ts';
import type { MovementAnswer, Opening, SupportMovement } from '../../core/statics/support-movement.ts';
import type { Session } from '../session/session.svelte.ts';

export type Move = 'spreads' | 'closes' | 'sinks' | 'rises' | 'turns-out' | 'turns-in';

export const MOVES: readonly (readonly [move: Move, words: string])[] = [
  ['spreads', 'spreads'],
  ['closes', 'closes'],
  ['sinks', 'sinks'],
  ['rises', 'rises'],
  ['turns-out', 'turns out'],
  ['turns-in', 'turns in'],
];

export const turns = (move: Move): boolean => move === 'turns-out' || move === 'turns-in';

/** Of the ring's thickness: how far the furthest point goes on the board. */
const SHOWN_OF_THICKNESS = 0.35;
/** Radians. */
const MOST_TURN = 0.12;

export class SupportMoves {
  readonly #session: Session;
  side = $state<'left' | 'right'>('left');
  move = $state<Move>('spreads');
  /** m */
  distance = $state(0.01);
  /** Degrees. */
  angle = $state(0.1);

  constructor(session: Session) {
    this.#session = session;
  }

  readonly moved: SupportMovement = $derived.by(() => {
    const outwards = this.side === 'left' ? -1 : 1;
    // the left support turns outwards anticlockwise, the right one clockwise
    const turn = (this.angle * Math.PI * -outwards) / 180;
    const still = { side: this.side, dx: 0, dy: 0, turn: 0 };
    switch (this.move) {
      case 'spreads':
        return { ...still, dx: outwards * this.distance };
      case 'closes':
        return { ...still, dx: -outwards * this.distance };
      case 'sinks':
        return { ...still, dy: -this.distance };
      case 'rises':
        return { ...still, dy: this.distance };
      case 'turns-out':
        return { ...still, turn };
      case 'turns-in':
        return { ...still, turn: -turn };
    }
  });

  /** Null where nothing is to move, or the arch cannot be built. */
  readonly answer: MovementAnswer | null = $derived.by(() => {
    const built = this.#session.assessed?.built;
    const size = turns(this.move) ? this.angle : this.distance;
    return built === undefined || !(size > 0) ? null : movement(built, this.moved);
  });

  readonly ring: MovedRing | null = $derived.by(() => {
    const { assessed } = this.#session;
    const { answer } = this;
    if (assessed === null || answer?.kind !== 'opens' || answer.openings.length === 0) return null;
    const motions = motionsOfOpenings(assessed, answer.openings, this.side);
    const most = SHOWN_OF_THICKNESS * assessed.resolved.ring.thickness;
    const factor = factorFor(assessed.built.joints, motions, most, MOST_TURN);
    if (factor === null) return null;
    const ring = movedRing(assessed, motions, Math.max(1, roundFactor(factor)));
    // drawn larger, gaps are no longer in proportion: what is lettered is the answer's own
    const openings = ring.openings.map((opening) => ({ ...opening, width: widthAt(answer.openings, opening.joint) }));
    return { ...ring, openings };
  });

  readonly words: string = $derived(`${this.side} support ${this.move.replace('-', ' ')}`);
}

const widthAt = (openings: readonly Opening[], joint: number): number | null =>
  openings.find((opening) => opening.joint === joint)?.width ?? null;

/** 1, 2, 5, 10 …: a drawing is enlarged by a plain number. */
function roundFactor(factor: number): number {
  const power = 10 ** Math.floor(Math.log10(factor));
  const lead = factor / power;
  return power * (lead >= 5 ? 5 : lead >= 2 ? 2 : 1);
}

/** The fall of an arch that does not stand, as a film that can be stopped and wound by hand. */
export class Fall {
  readonly #session: Session;
  /** 0 as it is … 1 moved by about its thickness. */
  at = $state(0.5);
  #request = $state(0);

  constructor(session: Session) {
    this.#session = session;
  }

  readonly playing: boolean = $derived(this.#request !== 0);
  readonly frame: MovedRing | null = $derived.by(() => {
    const { assessed } = this.#session;
    return assessed === null || assessed.result.thrust.stands ? null : mechanismFrame(assessed, this.at);
  });

  play(): void {
    this.stop();
    if (this.at >= 1) this.at = 0;
    const from = this.at;
    let begun: number | null = null;
    const step = (now: number): void => {
      begun ??= now;
      this.at = Math.min(1, from + (now - begun) / FILM);
      this.#request = this.at < 1 ? requestAnimationFrame(step) : 0;
    };
    this.#request = requestAnimationFrame(step);
  }

  stop(): void {
    if (this.#request !== 0) cancelAnimationFrame(this.#request);
    this.#request = 0;
  }
}

/** ms */
const FILM = 2_400;
