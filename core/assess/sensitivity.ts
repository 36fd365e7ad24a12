/**
 * What an answer hangs on most: each measure in turn a little greater and a little less, the arch assessed anew, and the
 * answers compared. A first look at where a better measurement, or a repair, would tell; no bound on anything.
 */
import { resolveScheme, type ResolvedScheme } from '../job/defaults.ts';
import { setAbove, setLoad, setMasonry, setRise, setSpan, setThickness } from '../job/edits.ts';
import type { Arch, Scheme } from '../job/schema.ts';
import { assessScheme } from './assess.ts';
import type { SchemeAssessment } from './assessment.ts';

/** Each measure is tried by this share greater and less. */
export const TRIED_SHARE = 0.05;

export interface Influence {
  /** Field path of the measure, as in `profile.rise`. */
  readonly field: string;
  /** As it stands in a sentence after "more" or "less": `rise`. */
  readonly name: string;
  /** ± `TRIED_SHARE`. */
  readonly share: number;
  /** The answer as it is and as it would be; null where there is none, as the safety of a ring that does not stand. */
  readonly from: number | null;
  readonly to: number | null;
}

interface Input {
  readonly field: string;
  readonly name: string;
  readonly read: (scheme: ResolvedScheme) => number | null;
  readonly set: (scheme: Scheme, value: number) => Scheme;
}

const INPUTS: readonly Input[] = [
  {
    field: 'profile.span',
    name: 'span',
    read: ({ profile }) => ('span' in profile ? profile.span : null),
    set: setSpan,
  },
  {
    field: 'profile.rise',
    name: 'rise',
    read: ({ profile }) => ('rise' in profile ? profile.rise : null),
    set: setRise,
  },
  { field: 'ring.thickness', name: 'thickness', read: ({ ring }) => ring.thickness, set: setThickness },
  {
    field: 'masonry.unitWeight',
    name: 'weight of the stone',
    read: ({ masonry }) => masonry.unitWeight,
    set: (scheme, unitWeight) => setMasonry(scheme, { unitWeight }),
  },
  {
    field: 'above.height',
    name: 'height above the crown',
    read: ({ above }) => (above.kind === 'none' ? null : above.height),
    set: (scheme, height) => setAbove(scheme, { height }),
  },
  {
    field: 'above.unitWeight',
    name: 'weight of what lies above',
    read: ({ above }) => (above.kind === 'none' ? null : above.unitWeight),
    set: (scheme, unitWeight) => setAbove(scheme, { unitWeight }),
  },
];

const loadInputs = ({ loads }: ResolvedScheme): Input[] =>
  loads.map(({ id, name, kind }) => {
    const field = kind === 'strip' ? 'intensity' : 'force';
    return {
      field: `loads.${id}.${field}`,
      name: `load from ${name}`,
      read: (scheme) => {
        const load = scheme.loads.find((candidate) => candidate.id === id);
        if (load === undefined) return null;
        return load.kind === 'strip' ? load.intensity : load.force;
      },
      set: (scheme, value) => setLoad(scheme, id, { [field]: value }),
    };
  });

/**
 * The influences of all measures on one answer, the strongest first. A measure that is nought, or cannot be changed by
 * so much, is left out; so is one that changes nothing.
 *
 * @param answer reads the figure in question off an assessment; null where it has none.
 */
export function influences(
  arch: Arch,
  scheme: Scheme,
  answer: (result: SchemeAssessment) => number | null,
): readonly Influence[] {
  const before = assessScheme(arch, scheme);
  if (!before.ok) return [];
  const from = answer(before.assessed.result);
  const { resolved } = before.assessed;
  const found = [...INPUTS, ...loadInputs(resolved)].flatMap((input) =>
    [TRIED_SHARE, -TRIED_SHARE].flatMap((share): Influence[] => {
      const value = input.read(resolved);
      if (value === null || value === 0) return [];
      const tried = input.set(scheme, value * (1 + share));
      const taken = input.read(resolveScheme(tried).resolved);
      if (taken === null || Math.abs(taken - value * (1 + share)) > SAME * Math.abs(value)) return [];
      const schemes = arch.schemes.map((other) => (other === scheme ? tried : other));
      const after = assessScheme({ ...arch, schemes }, tried);
      if (!after.ok) return [];
      return [{ field: input.field, name: input.name, share, from, to: answer(after.assessed.result) }];
    }),
  );
  return found.filter((influence) => strength(influence) > LEAST_CHANGE).sort((a, b) => strength(b) - strength(a));
}

/** Rounding only, as a share of a measure. */
const SAME = 1e-9;
/** Share of the answer under which a change is not worth telling. */
const LEAST_CHANGE = 5e-4;

/** Change as a share of the answer; to have an answer or none is more than any. */
function strength({ from, to }: Influence): number {
  if (from === null || to === null) return from === to ? 0 : Infinity;
  return Math.abs(to - from) / Math.max(Math.abs(from), Number.MIN_VALUE);
}
