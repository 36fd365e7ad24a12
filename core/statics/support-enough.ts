/**
 * What would be enough: the least depth, weight or footing with which a body holds its push with the margins asked
 * for. Each is a search for the first figure that does, on the whole walk of the body with the wedge left out.
 */
import type { ResolvedBody } from '../job/support-defaults.ts';
import { baseOf } from './support-base.ts';
import { supportBody, withLoadOnTop, type Body, type Push } from './support-body.ts';
import { crackedLine } from './support-line.ts';

export interface Asked {
  readonly overturning: number;
  readonly baseSliding: number;
}

/** What a body falls short of, the gravest first; null when it is enough. */
export type Shortcoming = 'stands' | 'overturning' | 'sliding' | 'bearing' | null;

/** A figure in m or kN, or why no figure does. */
export type Enough =
  { readonly value: number; readonly because: null } | { readonly value: null; readonly because: string };

export interface EnoughAnswers {
  /** Depth of the first course, the others and the footing growing with it at the back, m. */
  readonly depth: Enough;
  /** More weight over the middle of the first course, kN. */
  readonly weight: Enough;
  /** Whole width of the footing, growing at the back, m. */
  readonly footing: Enough;
}

interface Holding {
  readonly support: ResolvedBody;
  readonly push: Push;
  readonly asked: Asked;
  /** m over the springing line of the arch. */
  readonly level: number;
}

/** @param body may be left out; then it is built. */
export function shortcoming({ support, push, asked, level }: Holding, body = supportBody(support, level)): Shortcoming {
  const line = crackedLine(body, push);
  if (!line.stands) return 'stands';
  const base = baseOf(body, push, line);
  if (base === null) return 'stands';
  if (base.overturning !== null && base.overturning < asked.overturning) return 'overturning';
  const { friction, bearing } = support.ground;
  if (
    support.friction !== null &&
    line.beds.some(({ shear, normal }) => Math.abs(shear) > normal * support.friction!)
  ) {
    return 'sliding';
  }
  if (friction !== null && Math.abs(base.drive) * asked.baseSliding > friction * base.normal + base.passive) {
    return 'sliding';
  }
  return bearing !== null && base.pressure !== null && base.pressure > bearing ? 'bearing' : null;
}

export function enough(holding: Holding): EnoughAnswers {
  return { depth: enoughDepth(holding), weight: enoughWeight(holding), footing: enoughFooting(holding) };
}

/** Steps between the least and the greatest figure tried; each is half as much again or so. */
const STEPS = 16;
const HALVINGS = 24;
/** Of the height of the body: a support deeper than twice its height is a wall lying down. */
const DEEPEST = 2;

const WORDS: Readonly<Record<Exclude<Shortcoming, null>, string>> = {
  stands: 'the line of pressure leaves the body',
  overturning: 'the safety against overturning stays short',
  sliding: 'it slides',
  bearing: 'the pressure on the ground stays too high',
};

/** The first figure on a grid that does, refined towards the last that does not. */
function firstThatDoes(
  grid: readonly number[],
  short: (value: number) => Shortcoming,
  furthest: (why: string) => string,
): Enough {
  let last: Shortcoming = null;
  for (const [i, value] of grid.entries()) {
    last = short(value);
    if (last !== null) continue;
    let high = value;
    let low = grid[i - 1] ?? value;
    for (let k = 0; k < HALVINGS && low < high; k++) {
      const middle = (low + high) / 2;
      if (short(middle) === null) high = middle;
      else low = middle;
    }
    return { value: high, because: null };
  }
  return { value: null, because: furthest(last === null ? '' : WORDS[last]) };
}

/** From nothing to the most, close together at first. */
const gridTo = (most: number): number[] => Array.from({ length: STEPS + 1 }, (_, i) => most * (i / STEPS) ** 2);

const heightOf = ({ courses }: ResolvedBody): number => courses.reduce((sum, { height }) => sum + height, 0);

function enoughDepth(holding: Holding): Enough {
  const { support } = holding;
  const least = Math.min(...support.courses.map(({ depth }) => depth));
  const first = support.courses[0]!.depth;
  // what is there already may be more than is needed
  const grid = gridTo(DEEPEST * heightOf(support) + least).map((value) => value - least);
  const found = firstThatDoes(
    grid,
    (more) => shortcoming({ ...holding, support: deeper(support, more) }),
    (why) => `No depth up to twice the height is enough: ${why}.`,
  );
  return found.value === null ? found : { value: first + found.value, because: null };
}

/** Every course and the footing deeper at the back by so much, m. */
function deeper(support: ResolvedBody, more: number): ResolvedBody {
  const { courses, footing } = support;
  return {
    ...support,
    courses: courses.map((course) => ({ ...course, depth: course.depth + more })),
    footing: footing && { ...footing, depth: footing.depth + more },
  };
}

/** Of the thrust: what presses on a body with a hundred times what pushes it is no longer a remedy. */
const HEAVIEST = 100;

function enoughWeight(holding: Holding): Enough {
  const { support, push, level } = holding;
  const body = supportBody(support, level);
  const { front, depth } = support.courses[0]!;
  const most = HEAVIEST * Math.max(Math.abs(push.horizontal), Math.abs(push.vertical), 1);
  const loaded = (weight: number): Body => withLoadOnTop(body, weight, front + depth / 2);
  return firstThatDoes(
    // finer at first: a weight that steadies the body may soon be too much for the ground
    Array.from({ length: 2 * STEPS + 1 }, (_, i) => most * (i / (2 * STEPS)) ** 3),
    (weight) => shortcoming(holding, loaded(weight)),
    (why) => `No weight over the middle of the support is enough: ${why}.`,
  );
}

function enoughFooting(holding: Holding): Enough {
  const { support } = holding;
  const { footing } = support;
  if (footing === null) return { value: null, because: 'No footing is described.' };
  const lowest = support.courses[support.courses.length - 1]!;
  const least = lowest.depth + lowest.front - footing.front;
  const grid = gridTo(DEEPEST * heightOf(support)).map((more) => least + more);
  return firstThatDoes(
    grid,
    (depth) => shortcoming({ ...holding, support: { ...support, footing: { ...footing, depth } } }),
    (why) => `No footing is wide enough by itself: ${why}.`,
  );
}
