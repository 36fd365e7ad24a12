/** Which of the assumptions a check rests on, by the fields that its figure is made from. */
import type { Assumed } from '../job/assumed.ts';

/** Shape, stone, what lies above and what holds the ring: every figure is made from these. */
const COMMON = ['profile', 'ring', 'breadth', 'masonry.unitWeight', 'above', 'backing', 'loads', 'supports', 'ties'];

/** What only one check asks for. */
const OWN: Readonly<Record<string, readonly string[]>> = {
  'ring.compression-only': ['asked.geometricSafety'],
  'ring.sliding': ['masonry.friction'],
  'ring.crushing': ['masonry.strength'],
};

/** The check's own assumptions first, then those that it shares. */
export function restsOn(checkId: string, assumed: readonly Assumed[]): Assumed[] {
  const under = (roots: readonly string[]): Assumed[] =>
    assumed.filter(({ field }) =>
      roots.some((root) => field === root || (/^[.[]/.test(field.slice(root.length)) && field.startsWith(root))),
    );
  const own = under(OWN[checkId] ?? []);
  return [...own, ...under(COMMON).filter((entry) => !own.includes(entry))];
}
