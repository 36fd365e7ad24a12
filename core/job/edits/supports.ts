/** Edits of the bodies that hold the arch: scheme to scheme. Lengths in m, forces in kN. */
import { LIMITS } from '../schema.ts';
import type { Scheme, Support } from '../schema.ts';
import type { SupportSide } from '../support-defaults.ts';
import { withChanged, withEntry, without } from './entries.ts';
import { held, patched } from './patch.ts';
import type { Patch } from './patch.ts';
import { SMALLEST } from './shapes.ts';

export type BodyCourse = NonNullable<Support['courses']>[number];
export type BodyLoad = NonNullable<Support['loads']>[number];

const sideOf = (scheme: Scheme, side: SupportSide): Support => scheme.supports?.[side] ?? { kind: 'rigid' };

function withSide(scheme: Scheme, side: SupportSide, patch: Patch<Support>): Scheme {
  const before = sideOf(scheme, side);
  const after = patched(before, patch);
  if (after === before && scheme.supports?.[side] !== undefined) return scheme;
  return patched(scheme, { supports: { ...scheme.supports, [side]: after } });
}

/** A height and depth in believable proportions, for a body that nobody has measured yet. */
const usualCourse = ({ profile }: Scheme): BodyCourse => {
  const span = profile.shape === 'measured' ? USUAL_SPAN : profile.span;
  return { height: figureOf(span / 2), depth: figureOf(span / 4) };
};

const USUAL_SPAN = 3;
const figureOf = (length: number): number => Math.max(SMALLEST.thickness, Math.round(length * 20) / 20);

/** What is already entered of the body stays through a change of kind, so that going back costs nothing. */
export function setSupportKind(scheme: Scheme, side: SupportSide, kind: Support['kind']): Scheme {
  const { courses } = sideOf(scheme, side);
  return withSide(scheme, side, {
    kind,
    courses: kind === 'rigid' || courses !== undefined ? courses : [usualCourse(scheme)],
  });
}

/** Friction of the beds; null when it is not known, `undefined` for that of the ring. */
export function setBedFriction(scheme: Scheme, side: SupportSide, friction: number | null | undefined): Scheme {
  return withSide(scheme, side, {
    friction: friction === undefined || friction === null ? friction : held(friction, LEAST_FRICTION, 10, 0.6),
  });
}

const LEAST_FRICTION = 0.001;

/** Sets the fields given; `undefined` for the whole: none. */
export function setFooting(
  scheme: Scheme,
  side: SupportSide,
  patch: Patch<NonNullable<Support['footing']>> | undefined,
): Scheme {
  if (patch === undefined) return withSide(scheme, side, { footing: undefined });
  const before = sideOf(scheme, side).footing ?? { height: USUAL_FOOTING };
  const after = patched(before, { ...patch, height: patch.height ?? before.height });
  const { projectionFront, projectionBack, breadth } = after;
  return withSide(scheme, side, {
    footing: patched(after, {
      height: held(after.height, SMALLEST.thickness, LIMITS.length, before.height),
      ...(projectionFront === undefined ? {} : { projectionFront: held(projectionFront, 0, LIMITS.length, 0) }),
      ...(projectionBack === undefined ? {} : { projectionBack: held(projectionBack, 0, LIMITS.length, 0) }),
      ...(breadth === undefined ? {} : { breadth: held(breadth, SMALLEST.breadth, LIMITS.length, scheme.breadth) }),
    }),
  });
}

const USUAL_FOOTING = 0.4;

/** Sets the fields given; `undefined` for the whole: nothing is said of the ground. */
export function setGround(
  scheme: Scheme,
  side: SupportSide,
  patch: Patch<NonNullable<Support['ground']>> | undefined,
): Scheme {
  const before = sideOf(scheme, side).ground ?? {};
  return withSide(scheme, side, { ground: patch === undefined ? undefined : patched(before, patch) });
}

/** Sets the fields given; `undefined` for the whole: no earth leans on the body. */
export function setEarth(
  scheme: Scheme,
  side: SupportSide,
  patch: Patch<NonNullable<Support['earth']>> | undefined,
): Scheme {
  if (patch === undefined) return withSide(scheme, side, { earth: undefined });
  const before = sideOf(scheme, side).earth ?? { active: USUAL_ACTIVE, height: USUAL_EARTH };
  const { active = before.active, height = before.height } = patch;
  return withSide(scheme, side, {
    earth: patched(before, {
      ...patch,
      active: held(active, 0, 10, before.active),
      height: held(height, SMALLEST.thickness, LIMITS.length, before.height),
    }),
  });
}

/** Loose sand of 30°: (1 − sin φ)/(1 + sin φ). */
const USUAL_ACTIVE = 0.33;
const USUAL_EARTH = 1;

/** One more course under the others, as deep as the one above. */
export function addCourse(scheme: Scheme, side: SupportSide, course: BodyCourse): Scheme {
  const { courses } = sideOf(scheme, side);
  if ((courses?.length ?? 0) >= LIMITS.courses) return scheme;
  return withSide(scheme, side, { courses: withEntry(courses, heldCourse(course)) });
}

/** Sets the fields given. A depth takes the set-off at the back away, and the other way round: one says the other. */
export function setCourse(scheme: Scheme, side: SupportSide, place: number, patch: Patch<BodyCourse>): Scheme {
  const edit = (course: BodyCourse): BodyCourse =>
    heldCourse(
      patched(course, {
        ...(patch.depth !== undefined ? { setOffBack: undefined } : {}),
        ...(patch.setOffBack !== undefined && place > 0 ? { depth: undefined } : {}),
        ...patch,
        height: patch.height ?? course.height,
        ...(place === 0 ? { setOffBack: undefined, depth: patch.depth ?? course.depth } : {}),
      }),
      course,
    );
  return withSide(scheme, side, { courses: withChanged(sideOf(scheme, side).courses, place, edit) });
}

/** The last course of a body stays; a course that becomes the first keeps the depth that it had by its set-offs. */
export function removeCourse(scheme: Scheme, side: SupportSide, place: number): Scheme {
  const { courses = [] } = sideOf(scheme, side);
  if (courses.length < 2 || courses[place] === undefined) return scheme;
  const left = without(courses, place) ?? [];
  const [first, ...rest] = left;
  if (first === undefined || first.depth !== undefined) return withSide(scheme, side, { courses: left });
  const above = courses[0]?.depth ?? 0;
  const depth = above + (first.setOffFront ?? 0) + (first.setOffBack ?? 0);
  return withSide(scheme, side, { courses: [heldCourse(patched(first, { depth, setOffBack: undefined })), ...rest] });
}

function heldCourse(course: BodyCourse, before: BodyCourse = course): BodyCourse {
  const { height, depth, setOffFront, setOffBack, breadth } = course;
  const limits = [SMALLEST.thickness, LIMITS.length] as const;
  return patched(course, {
    height: held(height, ...limits, before.height),
    ...(depth === undefined ? {} : { depth: held(depth, ...limits, before.depth ?? SMALLEST.thickness) }),
    ...(setOffFront === undefined ? {} : { setOffFront: held(setOffFront, -LIMITS.length, LIMITS.length, 0) }),
    ...(setOffBack === undefined ? {} : { setOffBack: held(setOffBack, -LIMITS.length, LIMITS.length, 0) }),
    ...(breadth === undefined ? {} : { breadth: held(breadth, SMALLEST.breadth, LIMITS.length, SMALLEST.breadth) }),
  });
}

export function addBodyLoad(scheme: Scheme, side: SupportSide, load: BodyLoad): Scheme {
  return withSide(scheme, side, { loads: withEntry(sideOf(scheme, side).loads, load) });
}

export function setBodyLoad(scheme: Scheme, side: SupportSide, place: number, load: BodyLoad): Scheme {
  return withSide(scheme, side, { loads: withChanged(sideOf(scheme, side).loads, place, () => load) });
}

export function removeBodyLoad(scheme: Scheme, side: SupportSide, place: number): Scheme {
  return withSide(scheme, side, { loads: without(sideOf(scheme, side).loads, place) });
}

/** A remedy in its smallest size, as the assessment finds it: depth of the first course, weight on top, width of the footing. */
export function applyEnough(
  scheme: Scheme,
  side: SupportSide,
  what: 'depth' | 'weight' | 'footing',
  value: number,
): Scheme {
  const { courses = [], footing } = sideOf(scheme, side);
  const first = courses[0];
  if (first?.depth === undefined || !Number.isFinite(value)) return scheme;
  const more = value - first.depth;
  switch (what) {
    case 'depth': {
      // courses that go by their set-offs follow the one above by themselves
      const deeper = courses.map((course) =>
        course.depth === undefined ? course : heldCourse({ ...course, depth: course.depth + more }),
      );
      return withSide(scheme, side, { courses: deeper });
    }
    case 'weight':
      return addBodyLoad(scheme, side, {
        kind: 'vertical',
        name: 'Weight added',
        force: held(value, 0, LIMITS.force, 0),
        offset: first.depth / 2 - (first.setOffFront ?? 0),
      });
    case 'footing': {
      if (footing === undefined) return scheme;
      const { depth } = courses.reduce(
        (above, course) => ({
          depth: course.depth ?? above.depth + (course.setOffFront ?? 0) + (course.setOffBack ?? 0),
        }),
        { depth: 0 },
      );
      return setFooting(scheme, side, { projectionBack: value - depth - (footing.projectionFront ?? 0) });
    }
  }
}
