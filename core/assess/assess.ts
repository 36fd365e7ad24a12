/**
 * The assessment of a scheme and of a job: pure and synchronous, well under a frame for any ring on a drawing.
 * The desktop, the browser and the command line all come through here.
 */
import { compressionOnly } from '../checks/compression-only.ts';
import { distance, type Point } from '../geometry/point.ts';
import { buildRing, type RingForm, type RingGeometry } from '../geometry/ring.ts';
import type { Assumed } from '../job/assumed.ts';
import { resolveScheme, type ResolvedScheme } from '../job/defaults.ts';
import { ProblemError, underPath, type Problem } from '../job/problem.ts';
import type { Arch, Job, Scheme } from '../job/schema.ts';
import type { Block } from '../loading/forces.ts';
import { loadRing } from '../loading/load-ring.ts';
import { crownBalance } from '../statics/crown-balance.ts';
import { leastMiddleShare, type MiddleShare } from '../statics/geometric-safety.ts';
import type { Hinge } from '../statics/hinge.ts';
import { lineOfThrust } from '../statics/line.ts';
import { motionsOf, thrustByVirtualWork, workOf } from '../statics/mechanism.ts';
import { equilibriumResidual, type SpringingForce } from '../statics/proof.ts';
import { ringSystem, type RingSystem } from '../statics/system.ts';
import { thrustRange, type Extreme, type ThrustAnswer, type TurningHinge } from '../statics/thrust.ts';
import type { Assessment, Mechanism, Proof, SchemeAssessment, Thrust, ThrustState } from './assessment.ts';

/** A scheme with everything that was built to assess it, for the board and the drawings. */
export interface AssessedScheme {
  readonly resolved: ResolvedScheme;
  readonly ring: RingGeometry;
  readonly result: SchemeAssessment;
}

export type SchemeOutcome =
  | { readonly ok: true; readonly assessed: AssessedScheme }
  | { readonly ok: false; readonly problems: readonly Problem[] };

export type JobOutcome =
  | { readonly ok: true; readonly assessment: Assessment }
  | { readonly ok: false; readonly problems: readonly Problem[] };

/** Assesses every scheme of a job; problems carry paths from the job's root. */
export function assessJob(job: Job): JobOutcome {
  const schemes: SchemeAssessment[] = [];
  const problems: Problem[] = [];
  job.arches.forEach((arch, a) => {
    arch.schemes.forEach((scheme, i) => {
      const outcome = assessScheme(arch, scheme);
      if (outcome.ok) schemes.push(outcome.assessed.result);
      else problems.push(...underPath(`arches[${a}].schemes[${i}]`, outcome.problems));
    });
  });
  if (problems.length > 0) return { ok: false, problems };
  return { ok: true, assessment: { format: 'skewback.assessment', version: 1, title: job.title ?? '', schemes } };
}

/** Assesses one scheme of an arch; problems carry paths from the scheme's root. */
export function assessScheme(arch: Arch, scheme: Scheme): SchemeOutcome {
  const { resolved, assumed } = resolveScheme(scheme, Math.max(0, arch.schemes.indexOf(scheme)));
  try {
    return { ok: true, assessed: assess(arch, resolved, assumed) };
  } catch (error) {
    if (error instanceof ProblemError) return { ok: false, problems: error.problems };
    throw error;
  }
}

function assess(arch: Arch, resolved: ResolvedScheme, assumed: readonly Assumed[]): AssessedScheme {
  const form = ringForm(resolved);
  const ring = buildRing(form);
  const blocks = loadRing(ring, resolved);
  const system = ringSystem(ring.joints, blocks);
  const answer = thrustRange(system);
  const middle = leastMiddleShare(system);
  const stands = answer.stands;
  const least = stands ? answer.least : null;
  const line = least === null ? [] : lineOfThrust(system, ring.joints, least.state);
  const springings = least === null ? null : springingForces(system, least, line);
  const result: SchemeAssessment = {
    arch: arch.id,
    scheme: resolved.id,
    name: `${arch.name ?? arch.id} / ${resolved.name}`,
    assumed,
    model: { joints: ring.joints.map(({ intrados, extrados }) => ({ intrados, extrados })), blocks },
    crown: crownBalance(ring, system, (split) => loadRing(split, resolved)),
    thrust: printedThrust(system, ring, answer, line),
    reactions: springings === null ? null : { left: printedReaction(springings.left), right: printedReaction(springings.right) },
    geometricSafety: stands && middle !== null && middle.share > 0 ? 1 / middle.share : null,
    ...(stands ? {} : { mechanism: printedMechanism(ring, blocks, answer.mechanism) }),
    checks: [compressionCheck(ring, answer, middle, resolved.asked.geometricSafety)],
    proof: proofOf(ring, system, blocks, least, line, springings),
  };
  return { resolved, ring, result };
}

function ringForm({ profile, ring }: ResolvedScheme): RingForm {
  return {
    profile,
    thickness: { crown: ring.thickness, springing: ring.thickness },
    voussoirs: ring.voussoirs,
    joints: ring.joints,
  };
}

const plainHinges = (hinges: readonly TurningHinge[]): Hinge[] => hinges.map(({ joint, side }) => ({ joint, side }));

const printedPoint = (point: Point | null) => point ?? { x: null, y: null };

function printedThrust(
  system: RingSystem,
  ring: RingGeometry,
  answer: ThrustAnswer,
  leastLine: readonly (Point | null)[],
): Thrust {
  if (!answer.stands) return { stands: false, least: null, greatest: null };
  const printed = (extreme: Extreme | null, line: readonly (Point | null)[]): ThrustState | null =>
    extreme && { horizontal: extreme.horizontal, line: line.map(printedPoint), hinges: plainHinges(extreme.hinges) };
  return {
    stands: true,
    least: printed(answer.least, leastLine),
    greatest: printed(answer.greatest, answer.greatest ? lineOfThrust(system, ring.joints, answer.greatest.state) : []),
  };
}

function springingForces(
  system: RingSystem,
  { state }: Extreme,
  line: readonly (Point | null)[],
): { left: SpringingForce; right: SpringingForce } {
  const last = system.joints - 1;
  const { force } = system.frame;
  const horizontal = state[0] as number;
  const vertical = state[1] as number;
  return {
    left: { horizontal: horizontal * force, vertical: vertical * force, at: line[0] ?? null },
    right: {
      horizontal: (horizontal + (system.sums.fx[last] as number)) * force,
      vertical: -(vertical + (system.sums.fy[last] as number)) * force,
      at: line[last] ?? null,
    },
  };
}

const printedReaction = ({ horizontal, vertical, at }: SpringingForce) => ({
  horizontal,
  vertical,
  x: at?.x ?? null,
  y: at?.y ?? null,
});

function printedMechanism(ring: RingGeometry, blocks: readonly Block[], hinges: readonly TurningHinge[]): Mechanism {
  return { hinges, work: workOf(blocks, motionsOf(ring.joints, hinges)) };
}

function compressionCheck(
  ring: RingGeometry,
  answer: ThrustAnswer,
  middle: MiddleShare | null,
  askedSafety: number,
) {
  const hinges = answer.stands ? (middle?.touches ?? []) : answer.mechanism;
  const joints = [...new Set(hinges.map(({ joint }) => joint))];
  const governing = ring.joints[joints[0] ?? 0];
  return compressionOnly({
    stands: answer.stands,
    thickness: governing ? distance(governing.intrados, governing.extrados) : 0,
    share: middle?.share ?? null,
    endlessThrust: middle !== null && middle.state === null,
    joints,
    askedSafety,
  });
}

function proofOf(
  ring: RingGeometry,
  system: RingSystem,
  blocks: readonly Block[],
  least: Extreme | null,
  line: readonly (Point | null)[],
  springings: { left: SpringingForce; right: SpringingForce } | null,
): Proof {
  if (least === null || springings === null) {
    return { equilibriumResidual: null, static: null, kinematic: null, gap: null };
  }
  const kinematic = thrustByVirtualWork(ring.joints, blocks, least.hinges);
  return {
    equilibriumResidual: equilibriumResidual(blocks, line, springings.left, springings.right),
    static: least.horizontal,
    kinematic,
    gap:
      kinematic === null
        ? null
        : Math.abs(least.horizontal - kinematic) / Math.max(Math.abs(least.horizontal), system.frame.force),
  };
}
