/** Assessments kept for as long as their scheme lives: undo, redo and a repaint never assess the same scheme twice. */
import { assessScheme, type SchemeOutcome } from '../../core/assess/assess.ts';
import type { Arch, Scheme } from '../../core/job/schema.ts';

interface Kept {
  readonly arch: string;
  readonly name: string | undefined;
  readonly index: number;
  readonly outcome: SchemeOutcome;
}

const kept = new WeakMap<Scheme, Kept>();

/** The assessment of a scheme of this arch; the arch lends its name, and the place among its schemes a name and role. */
export function outcomeOf(arch: Arch, scheme: Scheme): SchemeOutcome {
  const index = arch.schemes.indexOf(scheme);
  const before = kept.get(scheme);
  if (before?.arch === arch.id && before.name === arch.name && before.index === index) return before.outcome;
  const outcome = assessScheme(arch, scheme);
  kept.set(scheme, { arch: arch.id, name: arch.name, index, outcome });
  return outcome;
}
