/** Edits of the load combinations: scheme to scheme. Factors have no unit. */
import { LIMITS } from '../schema.ts';
import type { Combination, Scheme } from '../schema.ts';
import { nextId } from './ids.ts';
import { held, patched } from './patch.ts';
import type { Patch } from './patch.ts';

const MOST_FACTOR = 100;

export type CombinationPatch = Patch<Pick<Combination, 'name' | 'permanent' | 'variable'>>;

/** Adds at the end; the scheme as it is where it holds as many as it may. */
export function addCombination(scheme: Scheme, combination: Omit<Combination, 'id'>): Scheme {
  const before = scheme.combinations ?? [];
  if (before.length >= LIMITS.marks) return scheme;
  return patched(scheme, { combinations: [...before, { id: nextId('c', before), ...combination }] });
}

/** `undefined` takes a factor away: 1 counts. */
export function setCombination(scheme: Scheme, id: string, patch: CombinationPatch): Scheme {
  return withCombination(scheme, id, (combination) => {
    const factor = (field: 'permanent' | 'variable'): CombinationPatch => {
      if (!(field in patch)) return {};
      const value = patch[field];
      return { [field]: value === undefined ? undefined : held(value, 0, MOST_FACTOR, combination[field] ?? 1) };
    };
    return patched<Combination>(combination, { ...patch, ...factor('permanent'), ...factor('variable') });
  });
}

/** A load's own factor; `undefined` leaves it to that of its action. */
export function setLoadFactor(scheme: Scheme, id: string, load: string, factor: number | undefined): Scheme {
  return withCombination(scheme, id, (combination) => {
    const before = combination.factors ?? [];
    const own = before.find((entry) => entry.load === load);
    if (factor === undefined)
      return own === undefined
        ? combination
        : withFactors(
            combination,
            before.filter((entry) => entry !== own),
          );
    const value = held(factor, 0, MOST_FACTOR, own?.factor ?? 1);
    if (own === undefined) return withFactors(combination, [...before, { load, factor: value }]);
    const after = patched(own, { factor: value });
    return after === own
      ? combination
      : withFactors(
          combination,
          before.map((entry) => (entry === own ? after : entry)),
        );
  });
}

const withFactors = (combination: Combination, factors: NonNullable<Combination['factors']>): Combination =>
  patched(combination, { factors: factors.length === 0 ? undefined : factors });

export function removeCombination(scheme: Scheme, id: string): Scheme {
  const before = scheme.combinations ?? [];
  const left = before.filter((combination) => combination.id !== id);
  if (left.length === before.length) return scheme;
  return patched(scheme, { combinations: left.length === 0 ? undefined : left });
}

/** Combinations without a load's own factor, as when the load goes. */
export function withoutLoadFactors(scheme: Scheme, load: string): Scheme {
  return (scheme.combinations ?? []).reduce((before, { id }) => setLoadFactor(before, id, load, undefined), scheme);
}

function withCombination(scheme: Scheme, id: string, edit: (combination: Combination) => Combination): Scheme {
  const combinations = scheme.combinations ?? [];
  const before = combinations.find((combination) => combination.id === id);
  if (before === undefined) return scheme;
  const after = edit(before);
  return after === before
    ? scheme
    : patched(scheme, { combinations: combinations.map((other) => (other === before ? after : other)) });
}
