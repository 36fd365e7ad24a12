/**
 * Which movement explains the openings seen: the one whose hinge pattern lies nearest to the marks, by joint and face.
 *
 * The score of a pattern is the share of the marks that it explains, less a quarter for each opening that it asks for
 * and nobody saw (fine cracks are missed, or lie behind plaster). A mark counts in full at the very joint and fades
 * with distance along the ring. It measures likeness and is no probability; the wording never goes beyond it.
 */
import type { Side } from '../statics/hinge.ts';
import type { CrackPattern } from '../statics/crack-pattern.ts';

/** An opening seen on the arch: which joint, and the face at which it gapes. */
export interface CrackMark {
  readonly joint: number;
  readonly face: Side;
  /** m; null when not measured. */
  readonly width: number | null;
}

export interface Explanation {
  readonly pattern: CrackPattern;
  /** Other movements that open the very same joints, which no mark can tell from it. */
  readonly alike: readonly CrackPattern[];
  /** 0 … 1 */
  readonly score: number;
  /** Marks that it explains at least by half. */
  readonly explains: number;
  /** Openings that it asks for and that no mark shows. */
  readonly unseen: number;
}

export interface CrackReading {
  readonly verdict: 'too-few-marks' | 'no-pattern' | 'none-fits' | 'undecided' | 'clear';
  /** Best first; each kind of movement stands once, beside those that crack alike. */
  readonly ranking: readonly Explanation[];
  readonly because: string;
}

/** Distance along the ring, as a share of all joints, at which a mark counts for about a third (1/e). */
const NEAR = 0.1;
/** What an opening asked for and not seen takes off, in marks. */
const UNSEEN = 0.25;
const FEWEST_MARKS = 2;
/** Scores under this explain less than half of what was seen. */
const FITS = 0.5;
/** Two scores closer than this cannot be told apart by marks placed to the nearest joint. */
const APART = 0.1;

export function readCracks(
  marks: readonly CrackMark[],
  patterns: readonly CrackPattern[],
  joints: number,
): CrackReading {
  const ranking = together(bestOfEachKind(patterns.map((pattern) => explain(marks, pattern, joints))));
  return { ...verdict(marks.length, ranking), ranking };
}

function verdict(marks: number, ranking: readonly Explanation[]): Pick<CrackReading, 'verdict' | 'because'> {
  const [best, second] = ranking;
  if (best === undefined) {
    return {
      verdict: 'no-pattern',
      because:
        'The ring as entered holds no line of thrust, so no movement can be read from its cracks; check what was measured first.',
    };
  }
  if (marks < FEWEST_MARKS) {
    return {
      verdict: 'too-few-marks',
      because: `${marks === 0 ? 'No opening is' : 'One opening alone is'} marked; mark at least ${FEWEST_MARKS}, better all that are seen, before a movement is read from them.`,
    };
  }
  const name = explanationInWords(best);
  const explained = `${best.explains} of ${marks} marks`;
  if (best.score < FITS) {
    return {
      verdict: 'none-fits',
      because: `No single movement explains the marks; the nearest, ${name}, explains ${explained}. Look for more than one movement, for older repairs, or for marks on the wrong face.`,
    };
  }
  if (second !== undefined && best.score - second.score < APART) {
    return {
      verdict: 'undecided',
      because: `The marks speak for ${name} (${explained}), but ${explanationInWords(second)} explains them nearly as well; they cannot be told apart from these marks.`,
    };
  }
  return {
    verdict: 'clear',
    because: `The marks speak for ${name}: it explains ${explained}. They do not say when it happened, nor whether it goes on.`,
  };
}

/** The movement, and those that crack alike. */
export const explanationInWords = ({ pattern, alike }: Explanation): string =>
  [pattern, ...alike].map(movementInWords).join(' or ');

function movementInWords({ kind, x }: CrackPattern): string {
  switch (kind) {
    case 'spreading':
      return 'the springings having spread apart';
    case 'closing':
      return 'the springings having come closer';
    case 'left-sinks':
      return 'the left springing having sunk';
    case 'right-sinks':
      return 'the right springing having sunk';
    case 'left-turns-out':
      return 'the left support having turned outwards';
    case 'left-turns-in':
      return 'the left support having turned inwards';
    case 'right-turns-out':
      return 'the right support having turned outwards';
    case 'right-turns-in':
      return 'the right support having turned inwards';
    case 'pushed-left':
      return 'a push to the left';
    case 'pushed-right':
      return 'a push to the right';
    case 'overload':
      return `a heavy load near x = ${(x ?? 0).toFixed(2).replace('-', '\u2212')} m`;
  }
}

function bestOfEachKind(all: readonly Explanation[]): Explanation[] {
  const best = new Map<string, Explanation>();
  for (const explanation of all) {
    const held = best.get(explanation.pattern.kind);
    if (held === undefined || explanation.score > held.score) best.set(explanation.pattern.kind, explanation);
  }
  return [...best.values()].sort((p, q) => q.score - p.score);
}

/** Puts explanations that ask for the very same openings into one. */
function together(ranking: readonly Explanation[]): Explanation[] {
  const byOpenings = new Map<string, Explanation>();
  for (const explanation of ranking) {
    const key = explanation.pattern.openings.map(({ joint, side }) => `${joint} ${side}`).join(', ');
    const held = byOpenings.get(key);
    byOpenings.set(key, held ? { ...held, alike: [...held.alike, explanation.pattern] } : explanation);
  }
  return [...byOpenings.values()];
}

function explain(marks: readonly CrackMark[], pattern: CrackPattern, joints: number): Explanation {
  const { openings } = pattern;
  const sorted = [...marks].sort((p, q) => p.joint - q.joint);
  const credit = (mark: CrackMark, i: number): number => {
    const opening = openings[i];
    // a joint hinged at one face opens at the other
    if (opening === undefined || opening.side === mark.face) return 0;
    const distance = Math.abs(mark.joint - opening.joint) / (joints * NEAR);
    return Math.exp(-distance * distance);
  };
  const pairs = bestPairs(sorted, openings.length, credit);
  const sum = pairs.reduce((total, pair) => total + pair, 0);
  const explains = pairs.filter((pair) => pair >= 0.5).length;
  const unseen = openings.length - explains;
  const score = marks.length === 0 ? 0 : sum / (marks.length + UNSEEN * unseen);
  return { pattern, alike: [], score, explains, unseen };
}

/** Pairs marks with openings, both in order along the ring and each used once, for the greatest sum of credits. */
function bestPairs(
  marks: readonly CrackMark[],
  openings: number,
  credit: (mark: CrackMark, i: number) => number,
): number[] {
  let row: { sum: number; pairs: number[] }[] = Array.from({ length: openings + 1 }, () => ({ sum: 0, pairs: [] }));
  for (const mark of marks) {
    const next = [{ sum: row[0]?.sum ?? 0, pairs: row[0]?.pairs ?? [] }];
    for (let i = 0; i < openings; i++) {
      const value = credit(mark, i);
      const paired = row[i] ?? { sum: 0, pairs: [] };
      const options = [next[i], row[i + 1], { sum: paired.sum + value, pairs: [...paired.pairs, value] }];
      next.push(options.reduce((best, option) => (option && best && option.sum > best.sum ? option : best)) ?? paired);
    }
    row = next;
  }
  return row[openings]?.pairs ?? [];
}
