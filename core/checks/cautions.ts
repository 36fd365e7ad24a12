/** What must be said beside every result: always, and on account of what this arch shows. */
import type { Assumed } from '../job/assumed.ts';
import type { ResolvedScheme } from '../job/defaults.ts';
import type { Crack } from '../job/schema.ts';
import type { MovementKind } from '../statics/crack-pattern.ts';
import type { CrackReading } from './crack-reading.ts';

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
  /** What the openings marked were read as. */
  readonly cracks?: CrackReading;
  /** What was entered, where it is at hand. */
  readonly scheme?: Pick<ResolvedScheme, 'ring' | 'above' | 'backing' | 'cracks'>;
}

/** A line within the middle third at every joint has a geometric safety of three. */
const MIDDLE_THIRD = 3;

/** Cautions that an arch raises by itself; empty when it raises none. */
export function raisedCautions(facts: CautionFacts): RaisedCaution[] {
  const { stands, geometricSafety, assumed } = facts;
  const raised: RaisedCaution[] = [...ofCracks(facts)];
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
  return [...raised, ...ofScheme(facts)];
}

/** Openings at so many joints make a ring a mechanism, or one hinge short of it. */
const HINGES = 3;

function ofCracks({ cracks: reading, scheme }: CautionFacts): RaisedCaution[] {
  const marks = scheme?.cracks ?? [];
  const raised: RaisedCaution[] = [];
  const places = new Set(marks.map((mark) => placeOf(mark, scheme?.ring.voussoirs ?? 0)));
  if (places.size >= HINGES) {
    raised.push({
      id: 'hinges-seen',
      text: `Openings are marked at ${places.size} joints: a ring with three hinges is one short of falling. Keep clear of it until a competent person has seen it.`,
    });
  }
  const undated = marks.filter(({ seenOn }) => (seenOn ?? '').trim() === '').length;
  if (undated > 0) {
    const which = undated === 1 ? 'One opening marked bears' : `${undated} openings marked bear`;
    raised.push({
      id: speaksOf(reading, 'spreading') ? 'spread-undated' : 'cracks-undated',
      text: speaksOf(reading, 'spreading')
        ? `${which} no date, and the marks speak for springings that have spread: without dates nobody can tell whether they still do. Measure again and date it.`
        : `${which} no date: without dates nobody can tell whether the ring still moves. Measure again and date it.`,
    });
  }
  return raised;
}

/** Marks at one joint are one hinge, whether placed by its number or along the intrados. */
const placeOf = ({ joint, along }: Crack, voussoirs: number): number => joint ?? Math.round((along ?? 0) * voussoirs);

/** Whether the best explanation is this movement, alone or beside others that crack alike. */
function speaksOf(reading: CrackReading | undefined, kind: MovementKind): boolean {
  const best = reading?.ranking[0];
  if (best === undefined || (reading?.verdict !== 'clear' && reading?.verdict !== 'undecided')) return false;
  return [best.pattern, ...best.alike].some((pattern) => pattern.kind === kind);
}

/** What the result relies on and no survey of the face can show. */
function ofScheme({ scheme }: CautionFacts): RaisedCaution[] {
  if (scheme === undefined) return [];
  const { ring, above, backing } = scheme;
  const raised: RaisedCaution[] = [];
  if (backing?.counts === 'masonry') {
    raised.push({
      id: 'backing-counted',
      text: 'The backing is counted as masonry that carries thrust. It is hidden: open it up and see that it is sound and bonded before relying on it.',
    });
  }
  if (ring.courses > 1) {
    raised.push({
      id: 'rings-together',
      text: `The ring is laid in ${ring.courses} courses that are taken to act together. Sound them: rings that have come apart carry far less.`,
    });
  }
  if (above.sidePressure > 0) {
    raised.push({
      id: 'side-pressure',
      text: 'The fill is counted on to push against the back of the ring. It does so only while it stays in place and undisturbed.',
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
