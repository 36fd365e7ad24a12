/**
 * Geometric factor of safety (Heyman 1966; from memory): shrink every joint about its middle to the smallest share in
 * which a line of thrust still fits; the factor is the inverse of that share.
 *
 * The share of a state is the largest |m| / (N t/2) over the joints, m about mid-joint. Finding the state with the
 * least share is a fractional programme, quasi-convex, solved by Newton on the share: for a trial share σ minimise the
 * slack z with ±m + σ N t/2 + z w ≥ 0, w the half-moments N t/2 of the last state; that state's own share is the next
 * trial (Dinkelbach 1967, in the form of Crouzeix, Ferland & Schaible 1985; from memory). Each trial is a share that a
 * line really attains, and the last z is the proof that none attains less.
 */
import { minimise, type Rows } from './hinge-simplex.ts';
import { hingesOf } from './rows.ts';
import { momentAbout, type RingSystem } from './system.ts';
import type { Hinge } from './hinge.ts';
import { resultantMoment, type State } from './line.ts';

export interface MiddleShare {
  /** Smallest share of every joint, about its middle, in which a line fits; above 1 the ring does not stand. */
  readonly share: number;
  /** (X0, Y0, M0), scaled: the line that stays nearest the middle. */
  readonly state: Float64Array;
  /** Where that line touches the shrunken joints, left to right. */
  readonly touches: readonly Hinge[];
}

/** Trials after which the share must have settled; Newton needs about five. */
const TRIALS = 60;
/** Relative change of the share that counts as settled: a few roundings. */
const SETTLED = 1e-14;
/** Shares beyond this are no statement about a ring any more. */
const LARGEST_SHARE = 1e4;

/** The smallest share, or null when no line crosses every joint in compression, however thick the ring were made. */
export function leastMiddleShare(system: RingSystem): MiddleShare | null {
  let weights = halfLengths(system);
  let share = 1;
  let best: MiddleShare | null = null;
  for (let trial = 0; trial < TRIALS; trial++) {
    const outcome = minimise(shareRows(system, share, weights), [0, 0, 0, 1]);
    if (outcome.kind !== 'optimal') return best;
    const attained = shareOf(system, outcome.s);
    if (attained === null) {
      // this line pulls on a joint: only possible while the trial share is too small for any line
      if (best !== null) return best;
      share *= 2;
      if (share > LARGEST_SHARE) return null;
      continue;
    }
    const improved = best === null || attained < best.share;
    const settled = best !== null && attained >= best.share * (1 - SETTLED);
    if (improved) {
      const touches = hingesOf(outcome.basis).map(({ hinge }) => hinge);
      best = { share: attained, state: outcome.s.slice(0, 3), touches };
    }
    if (settled) break;
    share = attained;
    weights = halfMoments(system, outcome.s, weights);
  }
  return best;
}

function halfLengths(system: RingSystem): Float64Array {
  return Float64Array.from(
    { length: system.joints },
    (_, j) => Math.hypot((system.ex[j] as number) - (system.ix[j] as number), (system.ey[j] as number) - (system.iy[j] as number)) / 2,
  );
}

/** N t/2 at each joint, kept away from zero by a sliver of the mean so that no joint is left without slack. */
function halfMoments(system: RingSystem, s: State, before: Float64Array): Float64Array {
  const moments = before.map((_, j) => {
    const { toExtrados, toIntrados } = endMoments(system, s, j);
    return (toExtrados - toIntrados) / 2;
  });
  const mean = moments.reduce((sum, value) => sum + value, 0) / moments.length;
  return moments.map((value) => Math.max(value, 1e-6 * mean));
}

const endMoments = (system: RingSystem, s: State, j: number): { toExtrados: number; toIntrados: number } => ({
  toExtrados: resultantMoment(system, s, j, system.ex[j] as number, system.ey[j] as number),
  toIntrados: resultantMoment(system, s, j, system.ix[j] as number, system.iy[j] as number),
});

/** The share that a state needs, or null when it pulls on a joint or passes a joint that carries nothing. */
function shareOf(system: RingSystem, s: State): number | null {
  let share = 0;
  for (let j = 0; j < system.joints; j++) {
    const { toExtrados, toIntrados } = endMoments(system, s, j);
    const half = (toExtrados - toIntrados) / 2;
    const moment = Math.abs(toExtrados + toIntrados) / 2;
    if (half <= 0) {
      if (moment > 0 || half < 0) return null;
      continue;
    }
    share = Math.max(share, moment / half);
  }
  return share;
}

/** Rows ±m + σ N t/2 + z w ≥ 0: moments about the two ends of the joint shrunk to `share`, with slack. */
function shareRows(system: RingSystem, share: number, weights: Float64Array): Rows {
  const count = 2 * system.joints;
  const a = new Float64Array(count * 4);
  const b = new Float64Array(count);
  const { ix, iy, ex, ey, sums } = system;
  for (let j = 0; j < system.joints; j++) {
    const middleX = ((ex[j] as number) + (ix[j] as number)) / 2;
    const middleY = ((ey[j] as number) + (iy[j] as number)) / 2;
    const reachX = (share * ((ex[j] as number) - (ix[j] as number))) / 2;
    const reachY = (share * ((ey[j] as number) - (iy[j] as number))) / 2;
    for (let side = 0; side < 2; side++) {
      const sign = side === 0 ? 1 : -1;
      const px = middleX + sign * reachX;
      const py = middleY + sign * reachY;
      const at = (2 * j + side) * 4;
      a[at] = sign * py;
      a[at + 1] = -sign * px;
      a[at + 2] = sign;
      a[at + 3] = weights[j] as number;
      b[2 * j + side] = -sign * momentAbout(sums, j, px, py);
    }
  }
  return { unknowns: 4, count, a, b };
}
