/** What must be said beside every result: always, and on account of what this arch shows. */
import type { Assumed } from '../job/assumed.ts';

/** Printed on every sheet and shown in the program, in this order. */
export const standingCautions: readonly string[] = [
  'This assists the judgement of a licensed or chartered engineer and does not replace it.',
  'It shows equilibrium under the stated assumptions only. Hidden construction is not verified.',
  'Do not stand under, prop or take material from an arch that shows recent movement, dropped stones or a pattern of hinges until a competent person has made it safe.',
  'Temporary works need the same competence as permanent ones.',
  'Local codes and consents come first. Presumed bearing values are preliminary.',
];

export interface RaisedCaution {
  readonly id: string;
  readonly text: string;
}

export interface CautionFacts {
  readonly stands: boolean;
  readonly geometricSafety: number | null;
  readonly assumed: readonly Assumed[];
}

/** A line within the middle third at every joint has a geometric safety of three. */
const MIDDLE_THIRD = 3;

/** Cautions that an arch raises by itself; empty when it raises none. */
export function raisedCautions({ stands, geometricSafety, assumed }: CautionFacts): RaisedCaution[] {
  const raised: RaisedCaution[] = [];
  if (!stands) {
    raised.push({
      id: 'does-not-stand',
      text: 'No line of thrust fits in this ring. If the arch is standing, something that is not in this model holds it up: keep clear of it and find out what.',
    });
  } else if (geometricSafety !== null && geometricSafety < MIDDLE_THIRD) {
    raised.push({
      id: 'outside-middle-third',
      text: 'The thrust leaves the middle third of the ring, so that some joints are open over part of their depth: look for cracks there and for mortar lost.',
    });
  }
  const materials = assumed.map(({ field }) => MATERIAL_WORDS[field]).filter((word) => word !== undefined);
  if (materials.length > 0) {
    raised.push({
      id: 'default-material',
      text: `The material is not as measured: no ${inWords(materials)} is given, and a usual value or none stands in.`,
    });
  }
  if (assumed.some(({ field }) => field === 'ring.voussoirs')) {
    raised.push({
      id: 'joints-not-counted',
      text: 'The joints were not counted. A ring hinges only at its joints: count them where it matters.',
    });
  }
  return raised;
}

const MATERIAL_WORDS: Readonly<Record<string, string>> = {
  'masonry.unitWeight': 'unit weight',
  'masonry.strength': 'strength',
  'masonry.friction': 'friction',
};

function inWords(words: readonly string[]): string {
  return words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} or ${words.at(-1)}`;
}
