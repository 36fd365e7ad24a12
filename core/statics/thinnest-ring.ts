/**
 * The thinnest ring that stands: the search for the share, carried over to the thickness itself, weights re-computed
 * for each trial. At the thickness sought the least slack with which a line fits is nothing; weighed by the moments
 * that the joints can balance, it is near enough the share less one that a secant closes in within a few trials.
 */
import type { MiddleShare } from './geometric-safety.ts';
import type { Multiplier } from './hinge-simplex.ts';
import { halfMomentForms, jointLengths, momentForms } from './joint-forms.ts';
import { leastSlack, valueAt } from './ratio.ts';
import type { RingSystem } from './system.ts';

/**
 * Relative step of the secant that counts as the last. The error that it leaves is a fraction of this step times the one
 * before, which is some hundredths: under 1e-6, as the tests against the block programme see.
 */
const CLOSE = 1e-4;
const MOST_TRIALS = 80;
/** Thicknesses under this share of the present one are no ring any more: the shape stands however thin it is made. */
const NO_RING = 1e-3;

/**
 * @param systemFor the ring and its loads for a crown thickness in m.
 * @param present the ring's thickness and its system, with the share of it that a line needs.
 * @param thickest the greatest thickness that can be built, m.
 * @returns m; 0 when the shape stands however thin; null when no thickness that can be built stands.
 */
export function thinnestRing(
  systemFor: (thickness: number) => RingSystem,
  present: { readonly thickness: number; readonly system: RingSystem; readonly middle: MiddleShare | null },
  thickest: number,
): number | null {
  let basis: readonly Multiplier[] = [];
  const slackAt = (thickness: number): number => {
    const system = systemFor(thickness);
    const least = leastSlack(momentForms(system), halfMomentForms(system), weights, basis);
    basis = least.basis;
    return least.slack;
  };
  const weights = weightsOf(present);
  const thinnest = present.thickness * NO_RING;
  const first = (present.middle?.share ?? 2) * present.thickness;
  if (first < thinnest) return 0;

  // fails is the thickest ring known to fail, stands the thinnest known to stand
  let fails = { t: 0, slack: Infinity };
  let stands = { t: Infinity, slack: -Infinity };
  let t = Math.min(first, thickest);
  // at the present thickness the slack is the share less one, by the weights chosen
  let before: { t: number; slack: number } | null =
    present.middle === null ? null : { t: present.thickness, slack: present.middle.share - 1 };
  for (let trial = 0; trial < MOST_TRIALS; trial++) {
    const here = { t, slack: slackAt(t) };
    if (here.slack > 0) fails = here;
    else stands = here;
    if (here.slack > 0 && t >= thickest) return null;
    if (here.slack <= 0 && t <= thinnest) return 0;
    if (here.slack === 0) return t;
    const next = withinBracket(step(before, here), fails.t, stands.t, thinnest, thickest);
    if (Math.abs(next - t) <= CLOSE * t) return next;
    before = here;
    t = next;
  }
  return Number.isFinite(stands.t) ? stands.t : null;
}

/** The secant through the last two trials; at the first, slack as the share less one: t (1 + slack). */
function step(before: { t: number; slack: number } | null, here: { t: number; slack: number }): number {
  if (!Number.isFinite(here.slack)) return here.t / 2;
  if (before === null || !Number.isFinite(before.slack) || before.slack === here.slack) {
    return here.t * Math.min(2, Math.max(0.5, 1 + here.slack));
  }
  return here.t - (here.slack * (here.t - before.t)) / (here.slack - before.slack);
}

function withinBracket(t: number, fails: number, stands: number, thinnest: number, thickest: number): number {
  const low = Math.max(fails, thinnest / 2);
  const high = Math.min(stands, thickest);
  if (t > low && t < high) return t;
  if (!Number.isFinite(stands)) return Math.min(thickest, fails * 2);
  return fails === 0 ? stands / 2 : (low + high) / 2;
}

/** N t/2 of the middle line at each joint; joint lengths where there is none. */
function weightsOf({ system, middle }: { system: RingSystem; middle: MiddleShare | null }): Float64Array {
  const lengths = jointLengths(system);
  const state = middle?.state;
  if (!state) return lengths;
  const half = halfMomentForms(system);
  return lengths.map((length, j) => Math.max(valueAt(half, state, j), 1e-6 * length));
}
