/** The lines between the rings of an arch laid in several: at even shares of its thickness, true to its curves. */
import { ringPieces } from '../geometry/pieces.ts';
import { between } from '../geometry/point.ts';
import { put, type Draught } from './draught.ts';
import { mergeArcs } from './faces.ts';
import { linesTo } from './path.ts';
import type { PathItem } from './scene.ts';

/** Courses thinner than this on paper, mm, would run into one another. */
const THINNEST_COURSE = 0.8;

export function drawCourses(draught: Draught): void {
  const { courses, thickness } = draught.resolved.ring;
  if (thickness / courses < draught.mm(THINNEST_COURSE)) return;
  for (let course = 1; course < courses; course++) put(draught, 'courses', courseLine(draught, course / courses));
}

/** The back of a ring of a share of the thickness; where the back was measured, through that share of every joint. */
function courseLine({ resolved, ring }: Draught, share: number): PathItem {
  const about = { kind: 'field', path: 'ring.courses' } as const;
  const line = { kind: 'path', role: 'course', closed: false, about } as const;
  const { profile } = resolved;
  const { thickness, springingThickness } = resolved.ring;
  if (profile.shape === 'measured' && profile.extrados !== undefined) {
    const [start, ...rest] = ring.joints.map(({ intrados, extrados }) => between(intrados, extrados, share));
    return { ...line, start: start!, edges: linesTo(rest) };
  }
  const pieces = ringPieces(profile, { crown: thickness * share, springing: springingThickness * share });
  const first = pieces[0]!;
  return {
    ...line,
    start: first.extrados.at(first.extradosFrom),
    edges: mergeArcs(
      pieces.flatMap(({ extrados, extradosFrom, extradosTo }) => extrados.edges(extradosFrom, extradosTo)),
    ),
  };
}
