import type { ResolvedBody, ResolvedCourse } from '../../core/job/support-defaults.ts';

/** A body of one course a metre deep, three metres high, a metre broad, 20 kN/m³: 60 kN. */
export const bodyOf = (draft: Partial<ResolvedBody> = {}): ResolvedBody => ({
  kind: 'buttress',
  courses: [course({})],
  friction: 0.6,
  loads: [],
  footing: null,
  ground: { name: 'rock', bearing: null, friction: null },
  earth: null,
  ...draft,
});

export const course = (draft: Partial<ResolvedCourse>): ResolvedCourse => ({
  height: 3,
  depth: 1,
  front: 0,
  breadth: 1,
  unitWeight: 20,
  ...draft,
});
