import { assessScheme } from '../../core/assess/assess.ts';
import type { SchemeAssessment } from '../../core/assess/assessment.ts';
import { buildScheme, type BuiltScheme } from '../../core/assess/build.ts';
import { resolveScheme } from '../../core/job/defaults.ts';
import type { Problem } from '../../core/job/problem.ts';
import type { Scheme } from '../../core/job/schema.ts';

/** A scheme by what matters to a test; the id and the breadth of one metre go without saying. */
export type SchemeDraft = Partial<Scheme> & Pick<Scheme, 'profile' | 'ring'>;

export const schemeFrom = (draft: SchemeDraft): Scheme => ({ id: 's1', breadth: 1, ...draft });

/** The assessment of a scheme that is expected to be sound. */
export function assessed(draft: SchemeDraft): SchemeAssessment {
  const scheme = schemeFrom(draft);
  const outcome = assessScheme({ id: 'a1', schemes: [scheme] }, scheme);
  if (outcome.ok) return outcome.assessed.result;
  throw new Error(outcome.problems.map(({ path, wrong }) => `${path}: ${wrong}`).join('\n'));
}

/** What the assessment finds wrong with a scheme that is not. */
export function problemsWith(draft: SchemeDraft): readonly Problem[] {
  const scheme = schemeFrom(draft);
  const outcome = assessScheme({ id: 'a1', schemes: [scheme] }, scheme);
  return outcome.ok ? [] : outcome.problems;
}

/** The same, with what was built to assess it. */
export function builtFrom(draft: SchemeDraft): BuiltScheme {
  return buildScheme(resolveScheme(schemeFrom(draft)).resolved);
}
