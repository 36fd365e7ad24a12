/** Undo as a list of documents with the names of the steps that led to them; documents share what did not change. */
import type { Job } from '../../core/job/schema.ts';

interface Step {
  /** What was done, as it follows "Undo": `span 3.2 m`. Empty for the document that was opened. */
  readonly name: string;
  readonly job: Job;
}

export interface History {
  /** At least one. */
  readonly steps: readonly Step[];
  /** Which of them is the present one. */
  readonly at: number;
}

export function historyOf(job: Job): History {
  return { steps: [{ name: '', job }], at: 0 };
}

export function presentOf({ steps, at }: History): Job {
  return (steps[at] as Step).job;
}

/** One step further; what had been undone is let go. The same history where the document is the same. */
export function recorded(history: History, name: string, job: Job): History {
  if (job === presentOf(history)) return history;
  const steps = [...history.steps.slice(0, history.at + 1), { name, job }];
  return { steps, at: steps.length - 1 };
}

export function undone(history: History): History {
  return history.at === 0 ? history : { ...history, at: history.at - 1 };
}

export function redone(history: History): History {
  return history.at + 1 === history.steps.length ? history : { ...history, at: history.at + 1 };
}

/** The step that undo would take back; null when there is none. */
export function stepToUndo({ steps, at }: History): string | null {
  return at === 0 ? null : (steps[at]?.name ?? null);
}

/** The step that redo would do again; null when there is none. */
export function stepToRedo({ steps, at }: History): string | null {
  return steps[at + 1]?.name ?? null;
}
