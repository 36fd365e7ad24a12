/** Edits of the ties: scheme to scheme. Lengths in m, forces in kN, stresses in MPa. */
import { LIMITS } from '../schema.ts';
import type { Scheme, Tie } from '../schema.ts';
import { nextId } from './ids.ts';
import { held, patched, unlessSame } from './patch.ts';
import type { Patch } from './patch.ts';

/** A tie before it has its id. */
export type NewTie = Omit<Tie, 'id'>;

/** A bar of an inch or so at the springing, for a tie that nobody has measured yet. */
const USUAL: NewTie = { level: 0, bar: { shape: 'round', diameter: 0.025 } };

/** Adds at the end; the scheme as it is where it holds as many ties as it may. */
export function addTie(scheme: Scheme, tie: NewTie = USUAL): Scheme {
  const ties = scheme.ties ?? [];
  if (ties.length >= LIMITS.ties) return scheme;
  const added: Tie = { id: nextId('t', ties), ...tie };
  return patched(scheme, { ties: [...ties, heldTie(added, added)] });
}

export function removeTie(scheme: Scheme, tieId: string): Scheme {
  const ties = scheme.ties ?? [];
  const left = ties.filter(({ id }) => id !== tieId);
  if (left.length === ties.length) return scheme;
  return patched(scheme, { ties: left.length === 0 ? undefined : left });
}

/** Sets the fields given; `undefined` takes an optional one away. Level and bar stay where none is given. */
export function setTie(scheme: Scheme, tieId: string, patch: Patch<NewTie>): Scheme {
  return withTie(scheme, tieId, (tie) =>
    heldTie(patched(tie, { ...patch, level: patch.level ?? tie.level, bar: patch.bar ?? tie.bar }), tie),
  );
}

/** A tie dragged up or down. */
export const moveTie = (scheme: Scheme, tieId: string, level: number): Scheme => setTie(scheme, tieId, { level });

function withTie(scheme: Scheme, tieId: string, edit: (tie: Tie) => Tie): Scheme {
  const ties = scheme.ties ?? [];
  const before = ties.find(({ id }) => id === tieId);
  if (before === undefined) return scheme;
  const after = unlessSame(before, edit(before));
  return after === before ? scheme : patched(scheme, { ties: ties.map((tie) => (tie === before ? after : tie)) });
}

/** m: thinner is wire. */
const THINNEST = 0.001;

function heldTie(tie: Tie, before: Tie): Tie {
  const { bar, pretension, warming, length, corrosion } = tie;
  const size = (value: number): number => held(value, THINNEST, LIMITS.length, THINNEST);
  return patched(tie, {
    level: held(tie.level, -LIMITS.length, LIMITS.length, Number.isFinite(before.level) ? before.level : 0),
    bar: unlessSame(
      bar,
      bar.shape === 'round'
        ? { ...bar, diameter: size(bar.diameter) }
        : { ...bar, width: size(bar.width), thickness: size(bar.thickness) },
    ),
    ...(pretension === undefined ? {} : { pretension: held(pretension, 0, LIMITS.force, 0) }),
    ...(warming === undefined ? {} : { warming: held(warming, 0, 200, 0) }),
    ...(length === undefined ? {} : { length: size(length) }),
    ...(corrosion === undefined ? {} : { corrosion: held(corrosion, 0, 1, 0) }),
  });
}
