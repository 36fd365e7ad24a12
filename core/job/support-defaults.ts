/** What stands in for what a job does not say of the bodies that hold the arch, each with its source. */
import type { Assumed } from './assumed.ts';
import type { Scheme, Support } from './schema.ts';
import { GROUNDS, rowNamed } from './tables.ts';

export type SupportSide = 'left' | 'right';

/** One course of a body, from the springing down. Lengths in m, kN/m³. */
export interface ResolvedCourse {
  readonly height: number;
  /** Level, away from the opening; not above zero where the set-offs leave nothing. */
  readonly depth: number;
  /** Of the front face behind the end of the intrados; negative where it stands forward of it. */
  readonly front: number;
  readonly breadth: number;
  readonly unitWeight: number;
}

export type BodyLoad = NonNullable<Support['loads']>[number];

export interface ResolvedBody {
  readonly kind: 'abutment' | 'pier' | 'buttress';
  /** At least one; the footing is not among them. */
  readonly courses: readonly ResolvedCourse[];
  /** On the bed joints; null when it is not known. */
  readonly friction: number | null;
  readonly loads: readonly BodyLoad[];
  /** Null where the lowest course stands on the ground. */
  readonly footing: ResolvedCourse | null;
  /** Each null when it is not known. */
  readonly ground: { readonly name: string; readonly bearing: number | null; readonly friction: number | null };
  readonly earth: {
    readonly active: number;
    readonly passive: number | null;
    readonly unitWeight: number;
    readonly height: number;
  } | null;
}

export type ResolvedSupport = { readonly kind: 'rigid' } | ResolvedBody;

export interface ResolvedSupports {
  readonly left: ResolvedSupport;
  readonly right: ResolvedSupport;
}

/** What the supports take from the arch where they do not say it themselves. */
interface OfArch {
  readonly breadth: number;
  readonly masonry: { readonly unitWeight: number; readonly friction: number | null };
}

const EARTH_UNIT_WEIGHT = 18;
const RIGID = { kind: 'rigid' } as const;

export function resolveSupports(
  { left, right }: NonNullable<Scheme['supports']>,
  arch: OfArch,
  assumed: Assumed[],
): ResolvedSupports {
  const taken = 'taken to neither spread, sink nor turn (the usual first step).';
  if (left === undefined && right === undefined) {
    assumed.push({ field: 'supports', value: 'rigid', because: `The supports are not described; they are ${taken}` });
  } else if (left === undefined || right === undefined) {
    const side = left === undefined ? 'left' : 'right';
    assumed.push({
      field: `supports.${side}`,
      value: 'rigid',
      because: `The ${side} support is not described; it is ${taken}`,
    });
  }
  return {
    left: resolveSupport(left ?? RIGID, 'left', arch, assumed),
    right: resolveSupport(right ?? RIGID, 'right', arch, assumed),
  };
}

function resolveSupport(support: Support, side: SupportSide, arch: OfArch, assumed: Assumed[]): ResolvedSupport {
  const { kind, courses = [] } = support;
  if (kind === 'rigid') return RIGID;
  const path = `supports.${side}`;
  if (courses.length === 0) {
    assumed.push({
      field: `${path}.courses`,
      value: 'rigid',
      because: `No courses of the ${side} ${kind} are given; it is taken to neither spread, sink nor turn until they are.`,
    });
    return RIGID;
  }
  if (courses.some(({ unitWeight }) => unitWeight === undefined)) {
    assumed.push({
      field: `${path}.courses.unitWeight`,
      value: arch.masonry.unitWeight,
      because: `The ${side} ${kind} is taken to weigh as much as the ring where no unit weight is given (common practice; verify on site).`,
    });
  }
  if (support.friction === undefined) {
    assumed.push({
      field: `${path}.friction`,
      value: arch.masonry.friction,
      because: `The bed joints of the ${side} ${kind} are taken to rub as the joints of the ring do (common practice; verify on site).`,
    });
  }
  const stacked = stackedCourses(courses, arch);
  const lowest = stacked[stacked.length - 1] as ResolvedCourse;
  return {
    kind,
    courses: stacked,
    friction: support.friction === undefined ? arch.masonry.friction : support.friction,
    loads: support.loads ?? [],
    footing: footingUnder(lowest, support.footing),
    ground: resolveGround(support.ground, side, kind, path, assumed),
    earth: support.earth === undefined ? null : resolveEarth(support.earth, path, assumed),
  };
}

/** Every course with its own depth and the place of its front face. */
function stackedCourses(courses: NonNullable<Support['courses']>, arch: OfArch): ResolvedCourse[] {
  let front = 0;
  let depth = 0;
  return courses.map((course) => {
    const forward = course.setOffFront ?? 0;
    front -= forward;
    depth = course.depth ?? depth + forward + (course.setOffBack ?? 0);
    const { height, breadth = arch.breadth, unitWeight = arch.masonry.unitWeight } = course;
    return { height, depth, front, breadth, unitWeight };
  });
}

function footingUnder(lowest: ResolvedCourse, footing: Support['footing']): ResolvedCourse | null {
  if (footing === undefined) return null;
  const { height, projectionFront = 0, projectionBack = 0 } = footing;
  return {
    height,
    depth: lowest.depth + projectionFront + projectionBack,
    front: lowest.front - projectionFront,
    breadth: footing.breadth ?? lowest.breadth,
    unitWeight: footing.unitWeight ?? lowest.unitWeight,
  };
}

function resolveGround(
  ground: Support['ground'],
  side: SupportSide,
  kind: ResolvedBody['kind'],
  path: string,
  assumed: Assumed[],
): ResolvedBody['ground'] {
  const row = rowNamed(GROUNDS, ground?.name);
  const name = ground?.name ?? 'not recorded';
  const bearing = ground?.bearing === undefined ? (row?.bearing ?? null) : ground.bearing;
  const friction = ground?.friction === undefined ? (row?.friction ?? null) : ground.friction;
  const left = `under the ${side} ${kind}`;
  const from = row === undefined ? '' : `of ${row.name} is taken (${row.source})`;
  if (ground?.bearing === undefined) {
    assumed.push({
      field: `${path}.ground.bearing`,
      value: bearing,
      because:
        bearing === null
          ? `No bearing resistance is given ${left} and none is taken; bearing is left unchecked until one is known.`
          : `No bearing resistance is given ${left}; ${bearing} kN/m² ${from}.`,
    });
  }
  if (ground?.friction === undefined) {
    assumed.push({
      field: `${path}.ground.friction`,
      value: friction,
      because:
        friction === null
          ? `No friction is given ${left} and none is taken; sliding on the ground is left unchecked until one is known.`
          : `No friction is given ${left}; ${friction} ${from}.`,
    });
  }
  return { name, bearing, friction };
}

function resolveEarth(earth: NonNullable<Support['earth']>, path: string, assumed: Assumed[]): ResolvedBody['earth'] {
  if (earth.unitWeight === undefined) {
    assumed.push({
      field: `${path}.earth.unitWeight`,
      value: EARTH_UNIT_WEIGHT,
      because:
        'No unit weight is given for the earth behind; 18 kN/m³ is taken, between sand and gravel at 15–16 and hardcore at 18.5–19.5 (EN 1991-1-1 Annex A, from memory; typical, verify).',
    });
  }
  const { active, passive, height, unitWeight } = earth;
  return { active, passive: passive ?? null, height, unitWeight: unitWeight ?? EARTH_UNIT_WEIGHT };
}
