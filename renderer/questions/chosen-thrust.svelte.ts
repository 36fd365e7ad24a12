/** The line of thrust that the person chose: between least and greatest, or by hand through three places. */
import { lineAtShare, lineThrough, type JointReport, type LineReport } from '../../core/assess/questions.ts';
import type { Session } from '../session/session.svelte.ts';

/** Shares of the way from intrados to extrados at the left springing, the crown and the right springing. */
export type HandShares = readonly [left: number, crown: number, right: number];

/** How far beyond a face a place may be drawn, as a share of the joint. */
export const BEYOND = 0.75;
const MIDDLE: HandShares = [0.5, 0.5, 0.5];

export class ChosenThrust {
  readonly #session: Session;
  way = $state<'between' | 'by-hand'>('between');
  /** Of the way from least to greatest. */
  share = $state(0.5);
  #hand = $state.raw<HandShares>(MIDDLE);
  /** Counts from 0 at the left springing; held within the joints that there are. */
  #joint = $state(0);

  constructor(session: Session) {
    this.#session = session;
  }

  readonly hand: HandShares = $derived(this.#hand);
  readonly lastJoint: number = $derived.by(() => (this.#session.assessed?.built.joints.length ?? 1) - 1);
  /** Joints of the three places of a line by hand. */
  readonly handJoints: readonly [number, number, number] = $derived([
    0,
    Math.round(this.lastJoint / 2),
    this.lastJoint,
  ]);
  /** No greatest thrust: the ring holds any, and there is no way between. */
  readonly endless: boolean = $derived.by(() => {
    const thrust = this.#session.assessed?.result.thrust;
    return thrust?.stands === true && thrust.greatest === null;
  });

  /** Null where there is no such line. */
  readonly report: LineReport | null = $derived.by(() => {
    const built = this.#session.assessed?.built;
    if (built === undefined) return null;
    if (this.way === 'between') return lineAtShare(built, this.endless ? 0 : this.share);
    const [left, crown, right] = this.handJoints;
    return lineThrough(built, [
      { joint: left, share: this.#hand[0] },
      { joint: crown, share: this.#hand[1] },
      { joint: right, share: this.#hand[2] },
    ]);
  });

  /** The joint inspected: the one pointed at on the board and in the findings, or the last that was. */
  readonly joint: number = $derived.by(() => {
    const { selection } = this.#session;
    const wanted = selection?.kind === 'joint' ? selection.joint : this.#joint;
    return Math.min(this.lastJoint, Math.max(0, wanted));
  });
  readonly inspected: JointReport | null = $derived(this.report?.joints[this.joint] ?? null);

  inspect(joint: number): void {
    if (!Number.isFinite(joint)) return;
    this.#joint = Math.min(this.lastJoint, Math.max(0, Math.round(joint)));
    this.#session.selection = { kind: 'joint', joint: this.#joint };
  }

  /** Draws one of the three places to another share of its joint. */
  draw(place: 0 | 1 | 2, share: number): void {
    if (!Number.isFinite(share)) return;
    const held = Math.min(1 + BEYOND, Math.max(-BEYOND, share));
    this.#hand = this.#hand.map((old, i) => (i === place ? held : old)) as unknown as HandShares;
  }

  /** Begins the line by hand where the chosen line between least and greatest runs. */
  takeUpByHand(): void {
    if (this.way === 'by-hand') return;
    const shares = this.handJoints.map((joint) => this.report?.joints[joint]?.share ?? 0.5);
    this.#hand = shares as unknown as HandShares;
    this.way = 'by-hand';
  }
}
