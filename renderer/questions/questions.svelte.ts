/** What is asked of the arch beyond the findings: which question is open, and what the board shows for it. */
import type { AxleEnvelope, Axle } from '../../core/assess/long-questions.ts';
import type { Overlays } from '../../core/drawing/elevation.ts';
import { movedRing } from '../../core/drawing/moved-ring.ts';
import type { Point } from '../../core/geometry/point.ts';
import { figure, metres } from '../../core/quantity/figures.ts';
import type { Session } from '../session/session.svelte.ts';
import { placementsAt, type Spread, type SpreadStep } from '../worker/answers.ts';
import { openDesk, type Desk } from '../worker/desk.ts';
import { LongQuestion } from '../worker/long-question.svelte.ts';
import { ChosenThrust } from './chosen-thrust.svelte.ts';
import { CrackMarks, nearestEnd } from './crack-marks.svelte.ts';
import { Fall, SupportMoves } from './support-moves.svelte.ts';

export const VIEWS = ['findings', 'thrust', 'movement', 'axle', 'cracks'] as const;
export type View = (typeof VIEWS)[number];

export class Questions {
  readonly #session: Session;
  view = $state<View>('findings');
  readonly thrust: ChosenThrust;
  readonly moves: SupportMoves;
  readonly fall: Fall;
  readonly cracks: CrackMarks;
  readonly spread: LongQuestion<void, Spread | null>;
  readonly axle: LongQuestion<Axle, AxleEnvelope | null>;
  /** What the movement view shows: a movement typed, or the spread slider. */
  moving = $state<'once' | 'until-it-falls'>('once');
  /** Which place of the spread is shown. */
  spreadPlace = $state(0);
  axleTyped = $state.raw<Axle>(USUAL_AXLE);

  constructor(session: Session, open: () => Desk = openDesk) {
    this.#session = session;
    this.thrust = new ChosenThrust(session);
    this.moves = new SupportMoves(session);
    this.fall = new Fall(session);
    this.cracks = new CrackMarks(session);
    const scheme = () => session.scheme;
    this.spread = new LongQuestion(scheme, (desk, of, _, told) => desk.spread(of, told), open);
    this.axle = new LongQuestion(scheme, (desk, of, axle, told) => desk.axle(of, axle, told), open);
  }

  /** The place that the spread slider stands at; null where there is no answer yet. */
  readonly spreadStep: SpreadStep | null = $derived.by(() => {
    const places = this.spread.answer?.places ?? [];
    return places[Math.min(this.spreadPlace, places.length - 1)] ?? null;
  });

  /** Laid over the elevation. Nothing while a measure is dragged on a moved ring: what is dragged is the arch as it is. */
  readonly overlays: Overlays = $derived.by(() => {
    const { assessed, dragging } = this.#session;
    if (assessed === null) return {};
    switch (this.view) {
      case 'thrust':
        return this.#chosen();
      case 'movement':
        return dragging ? {} : this.#moved();
      case 'cracks':
        return dragging ? {} : this.#pattern();
      default:
        return {};
    }
  });

  #chosen(): Overlays {
    const { report } = this.thrust;
    if (report === null) return {};
    const { line, horizontal } = report;
    return { chosen: { line, label: `${figure(horizontal)} kN` } };
  }

  #moved(): Overlays {
    const { assessed } = this.#session;
    if (assessed === null) return {};
    if (!assessed.result.thrust.stands) {
      const { frame } = this.fall;
      return frame === null ? {} : { moved: { ring: frame, label: 'how it begins to fall' } };
    }
    if (this.moving === 'once') {
      const { ring, words } = this.moves;
      return ring === null ? {} : { moved: { ring, label: words } };
    }
    const { spreadStep: step } = this;
    return step === null
      ? {}
      : {
          moved: {
            ring: movedRing(assessed, placementsAt(step)),
            label: `springings ${metres(step.moved)} m further apart`,
          },
        };
  }

  #pattern(): Overlays {
    const { ring } = this.cracks;
    return ring === null ? {} : { moved: { ring, label: 'how this movement opens the ring' } };
  }

  /** A press on the board that a question takes for itself. `reach` in metres. */
  press(at: Point, reach: number): boolean {
    if (this.view === 'cracks' && this.cracks.marking) return this.cracks.markAt(at, reach);
    if (this.view !== 'thrust') return false;
    const end = nearestEnd(this.#session.assessed, at, reach);
    if (end !== null) this.thrust.inspect(end.joint);
    return end !== null;
  }

  show(view: View): void {
    this.view = view;
    this.fall.stop();
    this.cracks.marking = false;
    this.cracks.pointed = null;
  }
}

/** kN, and the print and spread that are taken where none are given. */
const USUAL_AXLE: Axle = { force: 100, patch: 0.3, dispersal: 0.5 };
