/** Lists of a scheme whose entries have no id and are known by their place: lost mortar, layers, openings. */
import { LIMITS } from '../schema.ts';
import { unlessSame } from './patch.ts';

/** One more at the end; the same list where it holds as many as it may. */
export function withEntry<T>(entries: readonly T[] | undefined, entry: T): readonly T[] {
  const before = entries ?? [];
  return before.length >= LIMITS.marks ? before : [...before, entry];
}

/** The entry at a place changed; the same list where nothing changes or nothing stands there. */
export function withChanged<T extends object>(
  entries: readonly T[] | undefined,
  place: number,
  edit: (entry: T) => T,
): readonly T[] | undefined {
  const before = entries?.[place];
  if (entries === undefined || before === undefined) return entries;
  const after = unlessSame(before, edit(before));
  return after === before ? entries : entries.map((entry, i) => (i === place ? after : entry));
}

/** Without the entry at a place; an emptied list goes altogether. */
export function without<T>(entries: readonly T[] | undefined, place: number): readonly T[] | undefined {
  if (entries?.[place] === undefined) return entries;
  const left = entries.filter((_, i) => i !== place);
  return left.length === 0 ? undefined : left;
}
