/** What must hold between the fields of a support: each course has one depth and no other. */
import { rightFor } from './fields.ts';
import { underPath, type Problem } from './problem.ts';
import type { Support } from './schema.ts';
import { shown } from './shown.ts';

type Course = NonNullable<Support['courses']>[number];

export function supportProblems(support: Support | undefined): Problem[] {
  let above: number | null = null;
  return (support?.courses ?? []).flatMap((course, i) => {
    const problems = courseProblems(course, above);
    above = course.depth ?? (above ?? 0) + (course.setOffFront ?? 0) + (course.setOffBack ?? 0);
    return underPath(`courses[${i}]`, problems);
  });
}

function courseProblems({ depth, setOffFront = 0, setOffBack }: Course, above: number | null): Problem[] {
  if (depth !== undefined && setOffBack !== undefined) {
    const wrong = 'the depth already says where the back of the course is';
    return [{ path: 'setOffBack', value: shown(setOffBack), wrong, right: 'leave out one of depth and setOffBack' }];
  }
  if (depth !== undefined) return [];
  if (above === null) return [{ path: 'depth', value: '', wrong: 'missing', right: rightFor('depth') ?? '' }];
  const left = above + setOffFront + (setOffBack ?? 0);
  if (left > 0) return [];
  return [
    {
      path: 'setOffBack',
      value: shown(setOffBack ?? 0),
      wrong: `the set-offs leave a course no depth (${Number(left.toPrecision(4))} m)`,
      right: 'give the depth of the course in metres instead',
    },
  ];
}
