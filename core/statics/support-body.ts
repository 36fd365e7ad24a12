/**
 * A body of masonry that holds the arch on one side, cut into slices for the walk from the springing to the ground.
 *
 * Local axes of a side: u level, away from the opening, from the end of the intrados; z down from the level of the
 * springing. So the left and the right support read alike. Units m, kN, kN/m³.
 */
import type { ResolvedBody, ResolvedCourse } from '../job/support-defaults.ts';

export interface Slice {
  /** Depth of its upper and lower bed. */
  readonly top: number;
  readonly bottom: number;
  readonly front: number;
  readonly back: number;
  readonly breadth: number;
  readonly unitWeight: number;
  /** The course that it belongs to, from 0 at the springing; the footing is the last. */
  readonly course: number;
  /** Whether its lower bed is that of the course. */
  readonly isBed: boolean;
}

export interface Body {
  readonly slices: readonly Slice[];
  /** Loads on top: kN down at u. */
  readonly vertical: readonly { readonly force: number; readonly u: number }[];
  /** kN away from the opening at depth z; one above the top bears on the top with its whole lever. */
  readonly horizontal: readonly { readonly push: number; readonly z: number }[];
  readonly earth: Earth | null;
  /** For each slice, everything but the arch and the body's own weight, at its lower bed. */
  readonly others: readonly BedForce[];
}

/** kN down and away from the opening, and the moment about u = 0 at the depth of the bed, kN·m. */
export interface BedForce {
  readonly normal: number;
  readonly shear: number;
  readonly moment: number;
}

export interface Earth {
  /** Depth of its surface; negative over the springing. */
  readonly top: number;
  readonly breadth: number;
  /** Horizontal pressure gained for each metre down, kN/m² per m. */
  readonly active: number;
  /** Null where it is left out of account. */
  readonly passive: number | null;
}

/** Force of the arch on the body: kN away from the opening and down, through (u, z). */
export interface Push {
  readonly horizontal: number;
  readonly vertical: number;
  readonly u: number;
  readonly z: number;
}

/** Slices for the whole height: the crack is followed from bed to bed, and a tall course has beds of its own. */
const SLICES = 24;

/** @param level of the springing over the springing line of the arch, m: the step, on the right of a rampant arch. */
export function supportBody(support: ResolvedBody, level = 0): Body {
  const courses = support.footing === null ? support.courses : [...support.courses, support.footing];
  const height = courses.reduce((sum, course) => sum + course.height, 0);
  const lowest = courses[courses.length - 1] as ResolvedCourse;
  const { earth, loads } = support;
  const slices = slicesOf(courses, height / SLICES);
  const forces: Omit<Body, 'others' | 'slices'> = {
    vertical: loads.flatMap((load) => (load.kind === 'vertical' ? [{ force: load.force, u: load.offset }] : [])),
    horizontal: loads.flatMap((load) =>
      load.kind === 'horizontal' ? [{ push: load.push, z: level - load.level }] : [],
    ),
    earth: earth && {
      top: height - earth.height,
      breadth: lowest.breadth,
      active: earth.active * earth.unitWeight,
      passive: earth.passive === null ? null : earth.passive * earth.unitWeight,
    },
  };
  return { ...forces, slices, others: slices.map(({ bottom }) => otherForces(forces, bottom)) };
}

/** The same body with one more load on top, kN down at u. */
export function withLoadOnTop(body: Body, force: number, u: number): Body {
  const vertical = [...body.vertical, { force, u }];
  const others = body.others.map(({ normal, shear, moment }) => ({
    normal: normal + force,
    shear,
    moment: moment + force * u,
  }));
  return { ...body, vertical, others };
}

function slicesOf(courses: readonly ResolvedCourse[], tallest: number): Slice[] {
  const slices: Slice[] = [];
  let z = 0;
  courses.forEach(({ height, depth, front, breadth, unitWeight }, course) => {
    const count = Math.max(1, Math.ceil(height / tallest - 1e-9));
    for (let i = 0; i < count; i++) {
      const top = z + (height * i) / count;
      const bottom = z + (height * (i + 1)) / count;
      slices.push({ top, bottom, front, back: front + depth, breadth, unitWeight, course, isBed: i === count - 1 });
    }
    z += height;
  });
  return slices;
}

/** Force of earth with a pressure gradient (kN/m² per m) on the body down to depth z, and its moment about that depth. */
export function earthForce({ top, breadth }: Earth, gradient: number, z: number): { force: number; moment: number } {
  const from = Math.max(0, -top);
  const to = z - top;
  if (to <= from) return { force: 0, moment: 0 };
  const k = gradient * breadth;
  return {
    force: (k * (to * to - from * from)) / 2,
    moment: k * ((to * (to * to - from * from)) / 2 - (to ** 3 - from ** 3) / 3),
  };
}

function otherForces(
  { vertical, horizontal, earth }: Pick<Body, 'vertical' | 'horizontal' | 'earth'>,
  z: number,
): BedForce {
  let normal = 0;
  let shear = 0;
  let moment = 0;
  for (const { force, u } of vertical) {
    normal += force;
    moment += force * u;
  }
  for (const { push, z: at } of horizontal) {
    if (at > z) continue;
    shear += push;
    moment += push * (z - at);
  }
  if (earth !== null) {
    const pressure = earthForce(earth, earth.active, z);
    shear -= pressure.force;
    moment -= pressure.moment;
  }
  return { normal, shear, moment };
}
