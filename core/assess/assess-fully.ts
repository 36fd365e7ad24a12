/** The assessment with every question asked, for the command line and the sheets: some tens of milliseconds a scheme. */
import type { Job } from '../job/schema.ts';
import { assessSchemes, type AssessedScheme, type JobOutcome } from './assess.ts';
import type { AxleAnswer, SchemeAssessment, SpreadAnswer, SupportAnswer } from './assessment.ts';
import type { BuiltScheme } from './build.ts';
import { combinationAnswers, crackReading, movementPatterns, proportions, roadComparison } from './further.ts';
import { axleEnvelope, spreadLeft } from './long-questions.ts';
import { supportEnough } from './supports.ts';

/** Assesses every scheme of a job with all questions; problems carry paths from the job's root. */
export function assessJobFully(job: Job): JobOutcome {
  return assessSchemes(job, askEverything);
}

/** A spread of half the span is further than any ring can follow. */
const FURTHEST_OF_SPAN = 0.5;
const AXLE_PLACES = 200;

function askEverything({ built, result }: AssessedScheme): SchemeAssessment {
  const movements = movementPatterns(built);
  return {
    ...result,
    combinations: combinationAnswers(built),
    movements,
    ...(result.supports ? { supports: result.supports.map((answer) => withEnough(built, answer)) } : {}),
    ...(built.resolved.cracks.length > 0 ? { cracks: crackReading(built, movements) } : {}),
    spread: spreadAnswer(built),
    axles: axleAnswers(built),
    proportions: proportions(built),
    road: roadComparison(built),
  };
}

function withEnough(built: BuiltScheme, answer: SupportAnswer): SupportAnswer {
  const enough = supportEnough(built, answer.side);
  return enough === null ? answer : { ...answer, enough };
}

function spreadAnswer(built: BuiltScheme): SpreadAnswer | null {
  const { joints } = built;
  const width = (joints[joints.length - 1]?.intrados.x ?? 0) - (joints[0]?.intrados.x ?? 0);
  const furthest = FURTHEST_OF_SPAN * width;
  const answer = spreadLeft(built, { x: -1, y: 0 }, furthest, () => true);
  if (answer === null) return null;
  const curve = answer.places.map(({ moved, horizontal }) => ({ spread: moved, horizontal }));
  return { collapse: answer.collapse, furthest, curve };
}

function axleAnswers(built: BuiltScheme): AxleAnswer[] {
  return built.resolved.loads.flatMap((load): AxleAnswer[] => {
    if (load.kind !== 'axle') return [];
    const envelope = axleEnvelope(built, load, AXLE_PLACES, () => true, load.id);
    const worst = envelope?.worst ?? null;
    return [
      {
        load: load.id,
        worst:
          worst === null || worst.factor === null ? null : { x: worst.x, factor: worst.factor, hinges: worst.hinges },
        places: AXLE_PLACES,
      },
    ];
  });
}
