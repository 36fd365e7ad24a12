/** What the worker answers: plain schemes in, plain figures out, so that both can be handed between threads. */
import { buildScheme } from '../../core/assess/build.ts';
import { axleEnvelope, spreadLeft, type Axle, type AxleEnvelope } from '../../core/assess/long-questions.ts';
import { resolveScheme } from '../../core/job/defaults.ts';
import type { Scheme } from '../../core/job/schema.ts';
import type { SpreadPlace } from '../../core/statics/remaining-spread.ts';

/** Told the share of the way done. */
export type Told = (share: number) => void;

/** A place on the way, without the joints, which follow from the placements. */
export interface SpreadStep extends Pick<SpreadPlace, 'moved' | 'horizontal' | 'hinges'> {
  /** Four figures for each part, from the left support to the right: cosine, sine, dx, dy. A long ring has many. */
  readonly packed: Float64Array;
}

const packed = (placements: SpreadPlace['placements']): Float64Array =>
  Float64Array.from(placements.flatMap(({ cos, sin, dx, dy }) => [cos, sin, dx, dy]));

/** The placements of a place, as the drawing takes them. */
export function placementsAt({ packed: figures }: SpreadStep): Pick<SpreadPlace, 'placements'> {
  const placements = Array.from({ length: figures.length / 4 }, (_, part) => {
    const [cos, sin, dx, dy] = figures.subarray(4 * part, 4 * part + 4) as unknown as [number, number, number, number];
    return { cos, sin, dx, dy };
  });
  return { placements };
}

export interface Spread {
  readonly places: readonly SpreadStep[];
  /** m; null when it still stands at `furthest`. */
  readonly collapse: number | null;
  readonly furthest: number;
}

/** A spread of half the span is further than any ring can follow; the command line asks the same. */
const FURTHEST_OF_SPAN = 0.5;
/** Places across the ring, as on the command line. */
const AXLE_PLACES = 200;
/** The page is told this often on the way: a bar needs no more. */
const REPORTS = 50;

export const longAnswers = {
  /** Null when no line fits at the present place. */
  spread(scheme: Scheme, told: Told): Spread | null {
    const built = buildScheme(resolveScheme(scheme).resolved);
    const { joints } = built;
    const furthest = FURTHEST_OF_SPAN * Math.abs(joints.at(-1)!.intrados.x - joints[0]!.intrados.x);
    const answer = spreadLeft(built, { x: -1, y: 0 }, furthest, inSteps(told));
    if (answer === null) return null;
    const places = answer.places.map(({ moved, horizontal, hinges, placements }) => ({
      moved,
      horizontal,
      hinges,
      packed: packed(placements),
    }));
    return { places, collapse: answer.collapse, furthest };
  },

  /** Null when the ring does not stand by itself. */
  axle(scheme: Scheme, axle: Axle, told: Told): AxleEnvelope | null {
    return axleEnvelope(buildScheme(resolveScheme(scheme).resolved), axle, AXLE_PLACES, inSteps(told));
  },
};

export type LongAnswers = typeof longAnswers;

function inSteps(told: Told): (share: number) => boolean {
  let last = -1;
  return (share) => {
    const step = Math.floor(share * REPORTS);
    if (step !== last) told(share);
    last = step;
    return true;
  };
}
