/** An edit tried before it is taken: is the scheme still one that can be built, and did the entry survive as typed? */
import { resolveScheme } from '../../core/job/defaults.ts';
import type { Arch, Scheme } from '../../core/job/schema.ts';
import { formatQuantity } from '../../core/quantity/format.ts';
import { outcomeOf } from './assessed.ts';
import type { Measure } from './measures.ts';
import { SHOWN } from './preferences.ts';
import { plainSentences } from './sentences.ts';

export type Trial =
  | { readonly ok: true; readonly scheme: Scheme }
  /** Whole sentences for a person. */
  | { readonly ok: false; readonly reason: string };

/**
 * Refuses what could not be assessed. A scheme that cannot be assessed as it is, as an opened file may bring one, takes
 * any edit: it can only get better.
 */
export function tried(arch: Arch, scheme: Scheme, edit: (scheme: Scheme) => Scheme): Trial {
  const next = edit(scheme);
  if (next === scheme || !outcomeOf(arch, scheme).ok) return { ok: true, scheme: next };
  const schemes = arch.schemes.map((other) => (other === scheme ? next : other));
  const outcome = outcomeOf({ ...arch, schemes }, next);
  return outcome.ok ? { ok: true, scheme: next } : { ok: false, reason: plainSentences(outcome.problems) };
}

/** The same for a typed figure, which is taken as it was typed or not at all; edits by hand are held at their limits. */
export function triedEntry(arch: Arch, scheme: Scheme, measure: Measure, value: number): Trial {
  if (measure.whole === true && !Number.isInteger(value)) return { ok: false, reason: 'A whole number is wanted.' };
  const next = measure.set(scheme, value);
  const taken = measure.read(resolveScheme(next).resolved);
  if (taken !== null && Math.abs(taken - value) > SAME * Math.abs(value)) {
    const limit = formatQuantity(taken, measure.kind, SHOWN, { figures: 4 });
    return {
      ok: false,
      reason: taken < value ? `At most ${limit} is possible here.` : `At least ${limit} is needed here.`,
    };
  }
  return tried(arch, scheme, () => next);
}

/** Share by which a figure may differ from what was typed and still be the same: rounding in the last place. */
const SAME = 1e-12;
