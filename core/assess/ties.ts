/** Ties of a scheme: the force that they would hold, shared by their stiffness, and what they bear. */
import { barAreas, barMovement, smallestThread, stressOf } from '../checks/tie-bar.ts';
import { tieChecks, tieCapacity } from '../checks/ties.ts';
import type { Check } from '../checks/check.ts';
import type { ResolvedTie } from '../job/tie-defaults.ts';
import { ProblemError } from '../job/problem.ts';
import { tieForce, type TieForce } from '../statics/tie-force.ts';
import type { ThrustAnswer } from '../statics/thrust.ts';
import type { BuiltScheme } from './build.ts';
import type { TieAnswer } from './holding-answers.ts';

export interface TiesTogether {
  readonly ties: readonly ResolvedTie[];
  readonly shares: readonly number[];
  readonly force: TieForce;
  /** Share of the arch's least thrust that the ties can hold, 0 to 1. */
  readonly held: number;
}

/** @throws ProblemError for a tie over the crown. Null where there are no ties. */
export function tiesTogether({ resolved, joints, system }: BuiltScheme, answer: ThrustAnswer): TiesTogether | null {
  const { ties } = resolved;
  if (ties.length === 0) return null;
  // the highest middle of a joint: over it no joint of the ring is left to hold
  const crown = joints.reduce(
    (most, { intrados, extrados }) => Math.max(most, (intrados.y + extrados.y) / 2),
    -Infinity,
  );
  const problems = ties.flatMap(({ level }, i) => {
    if (level < crown) return [];
    const right = `below the crown, under ${Number(crown.toPrecision(4))} m here; at the springing or the lower haunch is usual`;
    const wrong = 'a tie at the crown or over it has no lever to hold the thrust';
    return [{ path: `ties[${i}].level`, value: `${level} m`, wrong, right }];
  });
  if (problems.length > 0) throw new ProblemError(problems);
  const shares = sharesOf(ties);
  const force = tieForce(
    system,
    joints,
    answer,
    ties.map(({ level }, i) => ({ level, share: shares[i]! })),
  );
  return { ties, shares, force, held: heldShare(ties, shares, force, answer) };
}

function sharesOf(ties: readonly ResolvedTie[]): number[] {
  const stiffness = ties.map((tie) => (tie.material.modulus * barAreas(tie).gross) / tie.length);
  const sum = stiffness.reduce((total, one) => total + one, 0);
  return stiffness.map((one) => (sum > 0 ? one / sum : 1 / ties.length));
}

/**
 * The first tie to reach what it may carry ends it for all. The push left to the supports falls at least in proportion
 * to the force of the ties, since the least of a linear programme is convex in it.
 */
function heldShare(
  ties: readonly ResolvedTie[],
  shares: readonly number[],
  { least, leftPush }: TieForce,
  answer: ThrustAnswer,
): number {
  const push = answer.stands ? (answer.least?.horizontal ?? 0) : 0;
  if (least === null || push <= leftPush) return 0;
  const most = Math.min(...ties.map((tie, i) => (shares[i]! > 0 ? tieCapacity(tie) / shares[i]! : Infinity)));
  return (1 - leftPush / push) * Math.min(1, most / least);
}

/** @param leftOver share of the thrust left for ties when supports take what they can; null when they are rigid. */
export function tieAnswers(
  { ties, shares, force }: TiesTogether,
  leftOver: number | null,
): { answers: TieAnswer[]; checks: Check[] } {
  const checks: Check[] = [];
  const answers = ties.map((tie, i): TieAnswer => {
    const share = shares[i]!;
    const least = force.least === null ? null : share * force.least;
    const greatest = force.greatest === null ? null : share * force.greatest;
    const areas = barAreas(tie);
    const moved = least === null ? null : barMovement(tie, areas.gross, Math.max(least, tie.pretension));
    checks.push(...tieChecks({ tie, least, greatest, rigid: leftOver === null, moved }));
    const carried = least === null ? null : Math.max(least, tie.pretension);
    return {
      tie: tie.id,
      name: tie.name,
      share,
      least,
      greatest,
      withSupports: least === null || leftOver === null ? null : least * leftOver,
      gross: areas.gross,
      threadArea: areas.thread,
      stress: carried === null ? null : stressOf(carried, areas.gross),
      threadStress: carried === null || areas.thread === null ? null : stressOf(carried, areas.thread),
      extension: moved?.extension ?? null,
      heatLoss: moved?.heatLoss ?? null,
      slack: moved?.slack ?? null,
      spreadToPull: moved?.spreadToPull ?? null,
      spreadToHold: moved?.spreadToHold ?? null,
      capacity: tieCapacity(tie),
      smallest: {
        least: carried === null ? null : (smallestThread(tie, carried)?.name ?? null),
        greatest: greatest === null ? null : (smallestThread(tie, greatest)?.name ?? null),
      },
    };
  });
  return { answers, checks };
}
