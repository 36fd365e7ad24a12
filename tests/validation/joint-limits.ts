/** Friction and strength of the joints as rows of the whole block programme. */
import {
  EXTRADOS_PUSH,
  INTRADOS_PUSH,
  SHEAR,
  inKilonewtons,
  times,
  type EquilibriumProgramme,
  type Optimum,
  type Terms,
} from './equilibrium-programme.ts';

const normalOf = (joint: number, factor: number): Terms => [
  [3 * joint + INTRADOS_PUSH, factor],
  [3 * joint + EXTRADOS_PUSH, factor],
];

/** |shear| ≤ μ · normal, at every joint; with `slack`, an unknown that is added to the right-hand side. */
export function addFriction(programme: EquilibriumProgramme, joints: number, friction: number, slack?: number): void {
  for (let j = 0; j < joints; j++) {
    for (const sign of [1, -1]) {
      const shear: Terms = [[3 * j + SHEAR, sign]];
      programme.addLimit(
        [...normalOf(j, friction), ...shear, ...(slack === undefined ? [] : [[slack, 1] as const])],
        0,
      );
    }
  }
}

/** One line above the crushing curve |m| = N/2 (t − N/p), p = f·b: half-moment per normal force and what it starts from. */
interface Chord {
  readonly slope: number;
  readonly start: number;
}

/** The tangent at a normal force. */
const tangentAt = (normal: number, t: number, p: number): Chord => ({
  slope: t / 2 - normal / p,
  start: (normal * normal) / (2 * p),
});

/** |m| ≤ start + slope · N at one joint of length t, all in the programme's units. */
export function addMomentLimit(
  programme: EquilibriumProgramme,
  joint: number,
  t: number,
  { slope, start }: Chord,
): void {
  for (const sign of [1, -1]) {
    // the moment about mid-joint is the difference of the two pushes times half the joint
    programme.addLimit(
      [
        [3 * joint + INTRADOS_PUSH, slope - (sign * t) / 2],
        [3 * joint + EXTRADOS_PUSH, slope + (sign * t) / 2],
      ],
      -start,
    );
  }
}

/** Tangents or chords of the crushing curve in even steps of the normal force: a limit outside it, and one inside. */
export function polygon(side: 'outside' | 'inside', count: number, t: number, p: number): Chord[] {
  const step = (p * t) / count;
  return Array.from({ length: side === 'outside' ? count + 1 : count }, (_, i) => {
    if (side === 'outside') return tangentAt(i * step, t, p);
    // the chord from N to N + step: the slope midway, and less start by step²/8p than the tangent there
    const { slope, start } = tangentAt((i + 0.5) * step, t, p);
    return { slope, start: start - (step * step) / (8 * p) };
  });
}

/** What the programme finds when the tangents of the crushing curve are added wherever its answer passes the curve. */
export function extremeUncrushed(
  programme: EquilibriumProgramme,
  lengths: readonly number[],
  p: number,
  sign: 1 | -1,
): Optimum {
  lengths.forEach((t, j) => {
    for (const chord of polygon('outside', 4, t, p)) addMomentLimit(programme, j, t, chord);
  });
  for (let round = 0; round < 60; round++) {
    const answer = programme.minimise(times(sign, programme.horizontal));
    if (answer.kind !== 'optimal') return answer;
    const { unknowns } = answer;
    const crushed = lengths.flatMap((t, joint) => {
      const [inner, outer] = [unknowns[3 * joint + INTRADOS_PUSH]!, unknowns[3 * joint + EXTRADOS_PUSH]!];
      const normal = inner + outer;
      const beyond = (Math.abs(inner - outer) * t) / 2 - (normal / 2) * (t - normal / p);
      return beyond > 1e-10 ? [{ joint, t, normal }] : [];
    });
    if (crushed.length === 0) return inKilonewtons(programme, answer, sign);
    for (const { joint, t, normal } of crushed) addMomentLimit(programme, joint, t, tangentAt(normal, t, p));
  }
  throw new Error('the crushing limit was not met');
}
