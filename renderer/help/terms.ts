/** The words of the trade that the program uses, each in a sentence. Their pictures are drawn in term-picture.ts. */
export type TermId =
  | 'abutment'
  | 'backing'
  | 'crown'
  | 'extrados'
  | 'fill'
  | 'geometric-safety'
  | 'haunch'
  | 'hinge'
  | 'intrados'
  | 'joint'
  | 'keystone'
  | 'line-of-thrust'
  | 'middle-third'
  | 'ring'
  | 'rise'
  | 'skewback'
  | 'spandrel'
  | 'span'
  | 'springing'
  | 'thrust'
  | 'voussoir';

export interface Term {
  readonly id: TermId;
  readonly word: string;
  readonly sentence: string;
  /** Spellings under which it is marked in a text; none for everyday words, which would be marked at every turn. */
  readonly marked: readonly string[];
}

export const TERMS: readonly Term[] = [
  {
    id: 'abutment',
    word: 'Abutment',
    sentence: 'The masonry or ground on each side that takes the thrust of the arch.',
    marked: ['abutment', 'abutments'],
  },
  {
    id: 'backing',
    word: 'Backing',
    sentence: 'Masonry laid over the haunches up to a level, behind what is seen; it weighs, and may carry thrust.',
    marked: ['backing'],
  },
  {
    id: 'crown',
    word: 'Crown',
    sentence: 'The highest part of the ring, at or near the middle of the span.',
    marked: ['crown'],
  },
  {
    id: 'extrados',
    word: 'Extrados',
    sentence: 'The outer face of the ring, its back.',
    marked: ['extrados'],
  },
  {
    id: 'fill',
    word: 'Fill',
    sentence: 'Loose material on the back of the ring, up to a road or a floor.',
    marked: [],
  },
  {
    id: 'geometric-safety',
    word: 'Geometric safety',
    sentence:
      'The thickness of the ring over that of the thinnest strip in its middle that would still hold a line of thrust.',
    marked: ['geometric safety'],
  },
  {
    id: 'haunch',
    word: 'Haunch',
    sentence: 'The part of the ring between springing and crown, where it would first swing outwards.',
    marked: ['haunch', 'haunches'],
  },
  {
    id: 'hinge',
    word: 'Hinge',
    sentence:
      'A joint at which the stones touch at one face only, so that they can turn about it; the other face gapes.',
    marked: ['hinge', 'hinges'],
  },
  {
    id: 'intrados',
    word: 'Intrados',
    sentence: 'The inner face of the ring, seen from below as the soffit.',
    marked: ['intrados', 'soffit'],
  },
  {
    id: 'joint',
    word: 'Joint',
    sentence: 'The face between two stones. It presses, but does not pull; joints are counted from the left springing.',
    marked: [],
  },
  {
    id: 'keystone',
    word: 'Keystone',
    sentence: 'The stone across the crown, set last.',
    marked: ['keystone'],
  },
  {
    id: 'line-of-thrust',
    word: 'Line of thrust',
    sentence:
      'Through each joint the place where the whole force passes. While one such line fits within the ring, the ring can stand.',
    marked: ['line of thrust', 'lines of thrust'],
  },
  {
    id: 'middle-third',
    word: 'Middle third',
    sentence: 'The strip within which the force may pass without any joint opening.',
    marked: ['middle third'],
  },
  {
    id: 'ring',
    word: 'Ring',
    sentence: 'The stones of the arch itself; its thickness is measured square to the intrados.',
    marked: [],
  },
  {
    id: 'rise',
    word: 'Rise',
    sentence: 'Height of the intrados at the crown over the springing line.',
    marked: [],
  },
  {
    id: 'skewback',
    word: 'Skewback',
    sentence: 'The sloping face on which the ring stands.',
    marked: ['skewback', 'skewbacks'],
  },
  {
    id: 'spandrel',
    word: 'Spandrel',
    sentence: 'What lies between the back of the ring and a level line through its crown.',
    marked: ['spandrel', 'spandrels'],
  },
  {
    id: 'span',
    word: 'Span',
    sentence: 'Width of the opening between the springings, in the clear.',
    marked: [],
  },
  {
    id: 'springing',
    word: 'Springing',
    sentence: 'Where the ring begins on each side; the line between the two is the springing line.',
    marked: ['springing', 'springings'],
  },
  {
    id: 'thrust',
    word: 'Thrust',
    sentence: 'The sideways push of the arch on what holds it. It lies between a least and a greatest.',
    marked: [],
  },
  {
    id: 'voussoir',
    word: 'Voussoir',
    sentence: 'One wedge-shaped stone of the ring.',
    marked: ['voussoir', 'voussoirs'],
  },
];

export function termOf(id: TermId): Term {
  return TERMS.find((term) => term.id === id) as Term;
}

const TERM_OF_PATH: Readonly<Record<string, TermId>> = {
  'profile.span': 'span',
  'profile.rise': 'rise',
  'profile.haunchRadius': 'haunch',
  'profile.haunchAngle': 'haunch',
  'profile.skewbackAngle': 'skewback',
  'profile.step': 'springing',
  'ring.thickness': 'ring',
  'ring.springingThickness': 'ring',
  'ring.voussoirs': 'voussoir',
  'backing.level': 'backing',
  'backing.counts': 'backing',
  'backing.unitWeight': 'backing',
  'asked.geometricSafety': 'geometric-safety',
};

/** The word that explains a field; null for one that explains itself. */
export const termOfField = (path: string): TermId | null => TERM_OF_PATH[path] ?? null;

export interface Part {
  readonly text: string;
  readonly term: TermId | null;
}

const SPELLINGS = new Map(TERMS.flatMap(({ id, marked }) => marked.map((spelling) => [spelling, id] as const)));
const LONGEST_FIRST = [...SPELLINGS.keys()].sort((a, b) => b.length - a.length);
const WORDS = new RegExp(`\\b(${LONGEST_FIRST.join('|')})\\b`, 'gi');

/** A text cut where it names a word of the trade, each word marked where it first stands. */
export function partsOf(text: string): Part[] {
  const seen = new Set<TermId>();
  const parts: Part[] = [];
  let from = 0;
  for (const { 0: word, index } of text.matchAll(WORDS)) {
    const term = SPELLINGS.get(word.toLowerCase());
    if (term === undefined || seen.has(term)) continue;
    seen.add(term);
    if (index > from) parts.push({ text: text.slice(from, index), term: null });
    parts.push({ text: word, term });
    from = index + word.length;
  }
  if (from < text.length) parts.push({ text: text.slice(from), term: null });
  return parts;
}
