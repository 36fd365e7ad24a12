/**
 * The assessment of a scheme and of a job: pure and synchronous, well under a frame for any ring on a drawing.
 * The desktop, the browser and the command line all come through here.
 */
import type { Check } from '../checks/check.ts';
import { compressionOnly } from '../checks/compression-only.ts';
import { crushing, sliding } from '../checks/joint-limits.ts';
import { distance } from '../geometry/point.ts';
import type { RingGeometry } from '../geometry/ring.ts';
import type { Assumed } from '../job/assumed.ts';
import { resolveScheme, type ResolvedScheme } from '../job/defaults.ts';
import { ProblemError, underPath, type Problem } from '../job/problem.ts';
import type { Arch, Job, Scheme } from '../job/schema.ts';
import { loadRing } from '../loading/load-ring.ts';
import { crownBalance } from '../statics/crown-balance.ts';
import { leastMiddleShare, type MiddleShare } from '../statics/geometric-safety.ts';
import { UndecidedError } from '../statics/hinge-simplex.ts';
import { lineOfThrust } from '../statics/line.ts';
import { neededStrength } from '../statics/needed-strength.ts';
import { neededFriction } from '../statics/sliding.ts';
import { ringSystem } from '../statics/system.ts';
import { thinnestRing } from '../statics/thinnest-ring.ts';
import { thrustRange, type Extreme, type ThrustAnswer } from '../statics/thrust.ts';
import { usableThrust } from '../statics/usable-thrust.ts';
import type { Assessment, SchemeAssessment } from './assessment.ts';
import { buildScheme, withoutMeasuredBack, withThickness, type BuiltScheme } from './build.ts';
import { loadFactors, swayCapacity } from './multiples.ts';
import { supportsTogether } from './supports.ts';
import { tieAnswers, tiesTogether } from './ties.ts';
import { printedMechanism, printedProof, printedReaction, printedThrust, springingForces } from './printed.ts';

/** A scheme with everything that was built to assess it, for the board and the drawings. */
export interface AssessedScheme {
  readonly resolved: ResolvedScheme;
  readonly ring: RingGeometry;
  /** For the questions that are asked one by one. */
  readonly built: BuiltScheme;
  readonly result: SchemeAssessment;
}

export type SchemeOutcome =
  | { readonly ok: true; readonly assessed: AssessedScheme }
  | { readonly ok: false; readonly problems: readonly Problem[] };

export type JobOutcome =
  | { readonly ok: true; readonly assessment: Assessment }
  | { readonly ok: false; readonly problems: readonly Problem[] };

/** Assesses every scheme of a job; problems carry paths from the job's root. */
export const assessJob = (job: Job): JobOutcome => assessSchemes(job, ({ result }) => result);

/** The same, with `finish` making each scheme's part of the document. */
export function assessSchemes(job: Job, finish: (assessed: AssessedScheme) => SchemeAssessment): JobOutcome {
  const schemes: SchemeAssessment[] = [];
  const problems: Problem[] = [];
  job.arches.forEach((arch, a) => {
    arch.schemes.forEach((scheme, i) => {
      const outcome = assessScheme(arch, scheme);
      if (outcome.ok) schemes.push(finish(outcome.assessed));
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
    const built = buildScheme(resolved);
    return { ok: true, assessed: { resolved, ring: built.ring, built, result: assess(arch, built, assumed) } };
  } catch (error) {
    if (error instanceof ProblemError) return { ok: false, problems: error.problems };
    if (error instanceof UndecidedError) return { ok: false, problems: [undecided(error)] };
    throw error;
  }
}

const undecided = ({ message }: UndecidedError): Problem => ({
  path: '',
  value: '',
  wrong: `no answer could be decided within the accuracy of the figures: ${message}`,
  right: 'change a measure or a load a little, or the number of voussoirs, and report the file',
});

function assess(arch: Arch, built: BuiltScheme, assumed: readonly Assumed[]): SchemeAssessment {
  const { resolved, ring, joints, blocks, system } = built;
  const { masonry, breadth } = resolved;
  const answer = thrustRange(system);
  const { stands } = answer;
  const middle = leastMiddleShare(system);
  const least = stands ? answer.least : null;
  const line = least === null ? [] : lineOfThrust(system, joints, least.state);
  const springings = least === null ? null : springingForces(system, least, line);
  const ties = tiesTogether(built, answer);
  const supports = supportsTogether(built, answer, ties);
  const tied = ties && tieAnswers(ties, supports.leftOver);
  return {
    arch: arch.id,
    scheme: resolved.id,
    name: `${arch.name ?? arch.id} / ${resolved.name}`,
    assumed,
    model: { joints: joints.map(({ intrados, extrados }) => ({ intrados, extrados })), blocks },
    crown: crownBalance(ring, joints === ring.joints ? system : ringSystem(ring.joints, blocks), (split) =>
      loadRing(split, resolved),
    ),
    thrust: printedThrust(
      system,
      joints,
      answer,
      line,
      stands ? usableThrust(system, { friction: masonry.friction, strength: masonry.strength, breadth }) : null,
    ),
    reactions:
      springings === null ? null : { left: printedReaction(springings.left), right: printedReaction(springings.right) },
    geometricSafety: stands && middle !== null && middle.share > 0 ? 1 / middle.share : null,
    thinnestRing: thinnest(built, middle),
    loadFactors: loadFactors(built),
    swayCapacity: swayCapacity(built),
    ...(stands ? {} : { mechanism: printedMechanism(joints, blocks, answer.mechanism) }),
    checks: [...checksOf(built, answer, middle), ...supports.checks, ...(tied?.checks ?? [])],
    ...(supports.answers.length > 0 ? { supports: supports.answers } : {}),
    ...(tied === null ? {} : { ties: tied.answers }),
    proof: printedProof(joints, system, blocks, least, line, springings),
  };
}

function checksOf(built: BuiltScheme, answer: ThrustAnswer, middle: MiddleShare | null): Check[] {
  const { resolved, system } = built;
  const { masonry, breadth, asked } = resolved;
  const hinges = answer.stands ? (middle?.touches ?? []) : answer.mechanism;
  const numbers = [...new Set(hinges.map(({ joint }) => joint))];
  const governing = built.joints[numbers[0] ?? 0];
  const inside = answer.stands ? stateClearOfEdges(answer.least, middle) : null;
  return [
    compressionOnly({
      stands: answer.stands,
      thickness: governing ? distance(governing.intrados, governing.extrados) : 0,
      altered: built.joints !== built.ring.joints,
      share: middle?.share ?? null,
      endlessThrust: middle !== null && middle.state === null,
      joints: numbers,
      askedSafety: asked.geometricSafety,
    }),
    sliding(masonry.friction, answer.stands ? neededFriction(system) : null),
    crushing(masonry.strength, inside === null ? null : neededStrength(system, inside, breadth), answer.stands),
  ];
}

/** A state whose line stays clear of every face: the middle one, or the least thrust and a good push along the joints' middles. */
function stateClearOfEdges(least: Extreme | null, middle: MiddleShare | null): Float64Array | null {
  if (middle === null || middle.state !== null) return middle?.state ?? null;
  const { direction } = middle;
  return least && direction && least.state.map((value, k) => value + (direction[k] as number));
}

/** Rings are searched up to this share of the span: thicker than any that was ever turned. */
const THICKEST_OF_SPAN = 0.5;

function thinnest({ resolved, ring, system }: BuiltScheme, middle: MiddleShare | null): number | null {
  const { thickness } = resolved.ring;
  const joints = ring.joints;
  const width = Math.abs((joints[joints.length - 1]?.intrados.x ?? 0) - (joints[0]?.intrados.x ?? 0));
  const soffit = withoutMeasuredBack(resolved);
  const systemFor = (trial: number) => buildScheme(withThickness(soffit, trial), 'rests-beside').system;
  try {
    return thinnestRing(systemFor, { thickness, system, middle }, Math.max(thickness, THICKEST_OF_SPAN * width));
  } catch (error) {
    // a trial ring too thick for its curvature, or thinner than its lost mortar, ends the search without an answer
    if (error instanceof ProblemError) return null;
    throw error;
  }
}
