/**
 * Something in the input that cannot be used as it stands. Problems are collected, never thrown one by one, so that
 * a person can mend a file in one go.
 */
export interface Problem {
  /** Field path from the job's root, as in `arches[0].schemes[1].profile.rise`; empty for the file as a whole. */
  readonly path: string;
  /** What was found there, as a short printable text. */
  readonly value: string;
  /** What is wrong with it, one clause without a full stop. */
  readonly wrong: string;
  /** What would be right, one clause without a full stop. */
  readonly right: string;
}

/** The problem as one sentence for a person: where, what, and what would be right. */
export function problemSentence(problem: Problem): string {
  const where = problem.path === '' ? '' : `${problem.path}: `;
  const found = problem.value === '' ? '' : ` (found ${problem.value})`;
  return `${where}${problem.wrong}${found}; ${problem.right}`;
}

/** Carries problems out of a computation that cannot go on. Caught where input enters: read, assess, edit. */
export class ProblemError extends Error {
  override readonly name = 'ProblemError';
  constructor(readonly problems: readonly Problem[]) {
    super(problems.map(problemSentence).join('\n'));
  }
}

/** Puts a prefix before every path: a scheme's problems become the job's. */
export function underPath(prefix: string, problems: readonly Problem[]): Problem[] {
  return problems.map((problem) => ({ ...problem, path: problem.path === '' ? prefix : `${prefix}.${problem.path}` }));
}
