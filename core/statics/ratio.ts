/**
 * The least ratio question: the state whose largest |p_j| / q_j over the joints is least, p_j and q_j being affine in
 * the state and q_j > 0. Geometric safety (moment over half-moment) and the friction that a ring needs (shear over
 * normal force) are both of this form.
 *
 * A fractional programme, quasi-convex, solved by Newton on the ratio: for a trial ratio σ minimise the slack z with
 * ±p + σ q + z w ≥ 0, w the q of the last state; that state's own ratio is the next trial (Dinkelbach 1967, in the form
 * of Crouzeix, Ferland & Schaible 1985; from memory). Each trial is a ratio that a line really attains, and the last z
 * is the proof that none attains less.
 */
import { minimise, type Multiplier, type Rows, type SimplexOutcome } from './hinge-simplex.ts';
import type { State } from './line.ts';

/** An affine form of the state at each joint: a·s + b, three coefficients a joint. */
export interface JointForms {
  readonly a: Float64Array;
  readonly b: Float64Array;
}

export interface LeastRatio {
  readonly ratio: number;
  /** (X0, Y0, M0), scaled; null when the ratio is only approached as the thrust grows without limit. */
  readonly state: Float64Array | null;
  /** Where the state goes as the thrust grows, when the ratio is only approached so; else null. */
  readonly direction: Float64Array | null;
  /** Multipliers of the last programme: rows 2j and 2j + 1 for +p and −p at joint j, then the hard rows. */
  readonly basis: readonly Multiplier[];
}

/** Trials after which the ratio must have settled; Newton needs about five. */
const TRIALS = 60;
/** Slack of the last programme that counts as none: what Newton leaves is of the order of its square, a rounding. */
const SETTLED = 1e-9;
/** A ratio below this is nothing but rounding on figures of order one: the state runs where p is zero at every joint. */
const NOTHING = 1e-12;
/** Ratios beyond this are no statement about a ring any more. */
const LARGEST_RATIO = 1e4;

/**
 * @param hard rows in three unknowns that every state must obey besides.
 * @returns null when no state obeys the hard rows with q > 0 at every joint.
 */
export function leastRatio(p: JointForms, q: JointForms, firstWeights: Float64Array, hard?: Rows): LeastRatio | null {
  let weights = firstWeights;
  let ratio = 1;
  let best: LeastRatio | null = null;
  let basis: readonly Multiplier[] | undefined;
  for (let trial = 0; trial < TRIALS; trial++) {
    const outcome = minimise(slackRows(p, q, ratio, weights, hard), [0, 0, 0, 1], basis);
    if (outcome.kind === 'infeasible') return best;
    if (outcome.kind === 'unbounded') {
      // the slack falls without end as the thrust grows: below this ratio lies the one that loads no longer matter to
      best = ratioAtEndlessThrust(p, q, firstWeights, hard);
      if (best === null || best.ratio === 0) return best;
      const within = ratioWithin(best.ratio, (lower) => minimise(slackRows(p, q, lower, weights, hard), [0, 0, 0, 1]));
      if (within === null) return best;
      ratio = within;
      continue;
    }
    basis = outcome.basis;
    const attained = ratioOf(p, q, outcome.s);
    if (attained === null) {
      // this state pulls on a joint: only possible while the trial ratio is too small for any state
      if (best !== null) return best;
      ratio *= 2;
      if (ratio > LARGEST_RATIO) return null;
      continue;
    }
    const settled = best !== null && outcome.value > -SETTLED;
    if (best === null || attained < best.ratio) {
      best = { ratio: attained, state: outcome.s.slice(0, 3), direction: null, basis: outcome.basis };
    }
    if (settled || attained === 0) break;
    ratio = attained;
    weights = valuesOf(q, outcome.s);
  }
  return best;
}

/**
 * The least slack z with ±p + q + z w ≥ 0 at every joint: not positive where a state of ratio one or less exists,
 * −∞ where it falls without end. `start` is the basis of a neighbouring question.
 */
export function leastSlack(
  p: JointForms,
  q: JointForms,
  weights: Float64Array,
  start?: readonly Multiplier[],
): { slack: number; basis: readonly Multiplier[] } {
  const outcome = minimise(slackRows(p, q, 1, weights), [0, 0, 0, 1], start);
  return outcome.kind === 'optimal' ? { slack: outcome.value, basis: outcome.basis } : { slack: -Infinity, basis: [] };
}

/** How far below the ratio at endless thrust to look for states of finite thrust, as shares of it, far ones first. */
const BELOW_ENDLESS = [1e-1, 1e-2, 1e-4, 1e-6, 1e-9];

/** A ratio below the one at endless thrust that a state of finite thrust attains, or null. */
function ratioWithin(endless: number, leastSlackAt: (ratio: number) => SimplexOutcome): number | null {
  for (const share of BELOW_ENDLESS) {
    const lower = endless * (1 - share);
    const outcome = leastSlackAt(lower);
    if (outcome.kind === 'optimal' && outcome.value < -SETTLED) return lower;
  }
  return null;
}

/** The least ratio of a thrust so great that the loads do not count: the forms without their loads, the q summing to one. */
function ratioAtEndlessThrust(p: JointForms, q: JointForms, weights: Float64Array, hard?: Rows): LeastRatio | null {
  const joints = q.b.length;
  const extra = hard?.count ?? 0;
  const a = new Float64Array(3 * (extra + 2));
  if (hard) a.set(hard.a);
  for (let k = 0; k < 3; k++) {
    let sum = 0;
    for (let j = 0; j < joints; j++) sum += q.a[3 * j + k] as number;
    a[3 * extra + k] = sum / joints;
    a[3 * extra + 3 + k] = -sum / joints;
  }
  const b = new Float64Array(extra + 2);
  b[extra] = 1;
  b[extra + 1] = -1;
  const unloaded = new Float64Array(joints);
  const least = leastRatio({ a: p.a, b: unloaded }, { a: q.a, b: unloaded }, weights, {
    unknowns: 3,
    count: extra + 2,
    a,
    b,
  });
  return least && { ...least, state: null, direction: least.state };
}

/** The forms' values for a state, kept away from zero by a sliver of their mean so that no joint is left without slack. */
function valuesOf(forms: JointForms, s: State): Float64Array {
  const joints = forms.b.length;
  const values = new Float64Array(joints);
  let sum = 0;
  for (let j = 0; j < joints; j++) sum += values[j] = valueAt(forms, s, j);
  const least = (1e-6 * sum) / joints;
  for (let j = 0; j < joints; j++) if ((values[j] as number) < least) values[j] = least;
  return values;
}

/** The form's value at joint j. */
export const valueAt = ({ a, b }: JointForms, s: State, j: number): number =>
  (a[3 * j] as number) * (s[0] as number) +
  (a[3 * j + 1] as number) * (s[1] as number) +
  (a[3 * j + 2] as number) * (s[2] as number) +
  (b[j] as number);

/** The ratio that a state needs, or null when q fails to be positive at a joint where p is not nothing. */
function ratioOf(p: JointForms, q: JointForms, s: State): number | null {
  let ratio = 0;
  for (let j = 0; j < p.b.length; j++) {
    const under = valueAt(q, s, j);
    const over = Math.abs(valueAt(p, s, j));
    if (under > 0) ratio = Math.max(ratio, over / under);
    else if (under < 0 || over > 0) return null;
  }
  return ratio < NOTHING ? 0 : ratio;
}

function slackRows(p: JointForms, q: JointForms, ratio: number, weights: Float64Array, hard?: Rows): Rows {
  const joints = p.b.length;
  const count = 2 * joints + (hard?.count ?? 0);
  const a = new Float64Array(count * 4);
  const b = new Float64Array(count);
  for (let j = 0; j < joints; j++) {
    for (let side = 0; side < 2; side++) {
      const sign = side === 0 ? 1 : -1;
      const at = (2 * j + side) * 4;
      for (let k = 0; k < 3; k++) a[at + k] = sign * (p.a[3 * j + k] as number) + ratio * (q.a[3 * j + k] as number);
      a[at + 3] = weights[j] as number;
      b[2 * j + side] = -sign * (p.b[j] as number) - ratio * (q.b[j] as number);
    }
  }
  if (hard) {
    for (let r = 0; r < hard.count; r++) {
      const at = (2 * joints + r) * 4;
      for (let k = 0; k < 3; k++) a[at + k] = hard.a[3 * r + k] as number;
      b[2 * joints + r] = hard.b[r] as number;
    }
  }
  return { unknowns: 4, count, a, b };
}
