/**
 * Dimensions as construction drawings have them (ISO 129): thin lines, oblique strokes at their ends, the figure over
 * the line and read from below or from the right. Each figure knows the field that it states, so that the screen can
 * let it be typed.
 */
import type { Point } from '../geometry/point.ts';
import type { Joint } from '../geometry/stations.ts';
import { hingedJoints, put, type Draught } from './draught.ts';
import { heightAt } from './faces.ts';
import { along, lettering, stroke } from './path.ts';
import type { Placing } from './places.ts';
import type { About, PathItem } from './scene.ts';
import { textWidth } from './text.ts';

/** Paper mm. */
const STROKE = 3;
const OVERRUN = 2;
const GAP = 1;
const LETTERS = 2.5;
/** Clear of the oblique strokes at the ends, with the clearance that lettering keeps. */
const OVER_LINE = 1.8;
const SPAN_DROP = 10;
const RING_TAIL = 14;
const SPRINGING_DROP = 18;

export function drawDimensions(draught: Draught): void {
  const dimensions: Dimension[] = [];
  // All lines first: a figure may not lie on a line that is drawn after it.
  const add = (added: Dimension): void => {
    dimensions.push(added);
    put(draught, 'dimensions', ...added.paths);
    for (const path of added.paths) draught.places.blockPath(path);
  };
  for (const added of [spanLine(draught), ...riseLine(draught), ...heightLine(draught)]) add(added);
  const { thickness, springingThickness } = draught.resolved.ring;
  if (thickness === springingThickness) add(ringLine(draught));
  else for (const added of [crownLine(draught), springingLine(draught)]) add(added);
  for (const { label, middle } of dimensions) {
    const placed = draught.places.placeSurely(label, middle);
    put(draught, 'dimensions', ...placed.texts, ...(placed.leader === null ? [] : [placed.leader]));
  }
}

interface Dimension {
  readonly paths: readonly PathItem[];
  readonly label: readonly Placing[];
  readonly middle: Point;
}

/** Between two points of the dimension line itself, with lines that lead there from what is measured. */
function dimension(
  draught: Draught,
  a: Point,
  b: Point,
  measured: readonly [Point, Point],
  text: string,
  about?: About,
): Dimension {
  const { mm } = draught;
  const angle = Math.atan2(b.y - a.y, b.x - a.x);
  const paths = [stroke('dimension', along(a, angle, -mm(OVERRUN)), along(b, angle, mm(OVERRUN)), about)];
  for (const [end, from] of [
    [a, measured[0]],
    [b, measured[1]],
  ] as const) {
    const out = Math.hypot(end.x - from.x, end.y - from.y);
    if (out > mm(GAP)) {
      const direction = Math.atan2(end.y - from.y, end.x - from.x);
      paths.push(stroke('dimension', along(from, direction, mm(GAP)), along(end, direction, mm(OVERRUN))));
    }
    const oblique = angle + Math.PI / 4;
    paths.push(stroke('dimension-stroke', along(end, oblique, -mm(STROKE / 2)), along(end, oblique, mm(STROKE / 2))));
  }
  const middle = { x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 };
  return { paths, middle, label: figurePlaces(draught, a, b, text, about) };
}

/** Over the middle of the line, over its thirds, under it, then beyond either end. */
function figurePlaces({ mm }: Draught, a: Point, b: Point, text: string, about?: About): Placing[] {
  const angle = readable(Math.atan2(b.y - a.y, b.x - a.x));
  const at = (share: number, up: number, beyond = 0): Placing => {
    const on = { x: a.x + share * (b.x - a.x), y: a.y + share * (b.y - a.y) };
    return [lettering(text, along(on, angle, mm(beyond), mm(up)), { align: 'middle', angle, about })];
  };
  const under = -(OVER_LINE + LETTERS);
  const half = textWidth(text, LETTERS) / 2 + OVERRUN + 1;
  const forwards = Math.cos(angle - Math.atan2(b.y - a.y, b.x - a.x)) > 0 ? 1 : -1;
  return [
    ...[0.5, 0.3, 0.7].map((share) => at(share, OVER_LINE)),
    ...[0.5, 0.3, 0.7].map((share) => at(share, under)),
    at(1, OVER_LINE, forwards * half),
    at(0, OVER_LINE, -forwards * half),
  ];
}

/** The same direction or its opposite, whichever reads from below or from the right. */
function readable(angle: number): number {
  const turned = Math.atan2(Math.sin(angle), Math.cos(angle));
  if (turned > Math.PI / 2 + 1e-9) return turned - Math.PI;
  return turned <= -Math.PI / 2 + 1e-9 ? turned + Math.PI : turned;
}

const aboutField = (path: string): About => ({ kind: 'field', path });

function spanLine(draught: Draught): Dimension {
  const { ring, mm, length } = draught;
  const left = ring.joints[0]!.intrados;
  const right = ring.joints.at(-1)!.intrados;
  const y = Math.min(left.y, right.y) - mm(SPAN_DROP);
  return dimension(
    draught,
    { x: left.x, y },
    { x: right.x, y },
    [left, right],
    length(right.x - left.x),
    aboutField('profile.span'),
  );
}

/** From the springing line up to the soffit at the crown. */
function riseLine(draught: Draught): Dimension[] {
  const { ring, resolved, length } = draught;
  const { profile } = resolved;
  const left = ring.joints[0]!.intrados;
  const right = ring.joints.at(-1)!.intrados;
  const rampant = left.y !== right.y;
  const x = rampant ? (left.x + right.x) / 2 : ring.crownIntrados.x;
  const top = { x, y: rampant ? (heightAt(draught.soffit, x) ?? ring.crownIntrados.y) : ring.crownIntrados.y };
  const foot = { x, y: left.y + ((x - left.x) / (right.x - left.x)) * (right.y - left.y) };
  if (!(top.y > foot.y)) return [];
  const about =
    'rise' in profile
      ? aboutField('profile.rise')
      : profile.shape === 'flat'
        ? aboutField('profile.camber')
        : undefined;
  return [dimension(draught, foot, top, [foot, top], length(top.y - foot.y), about)];
}

/** From the crown of the extrados to the top of what lies above; up to the break where it is broken off. */
function heightLine(draught: Draught): Dimension[] {
  const { ring, resolved, top, length } = draught;
  if (resolved.above.kind === 'none' || resolved.above.height === 0) return [];
  const foot = ring.crownExtrados;
  const head = { x: foot.x, y: top.level };
  return [dimension(draught, foot, head, [foot, head], length(resolved.above.height), aboutField('above.height'))];
}

/** Across a tapering ring at its crown, in line with rise and height. */
function crownLine(draught: Draught): Dimension {
  const { ring, resolved, mm, length } = draught;
  const { crownIntrados: foot, crownExtrados: head } = ring;
  const about = aboutField('ring.thickness');
  const text = `crown ${length(resolved.ring.thickness)}`;
  const over = head.y + mm(OVER_LINE);
  const under = foot.y - mm(OVER_LINE + LETTERS);
  const label = [over, over + mm(4), under, under - mm(4)].flatMap((y): Placing[] => [
    [lettering(text, { x: head.x + mm(OVER_LINE), y }, { about })],
    [lettering(text, { x: head.x - mm(OVER_LINE), y }, { about, align: 'end' })],
  ]);
  const { paths, middle } = dimension(draught, foot, head, [foot, head], text, about);
  return { paths, middle, label };
}

/** Behind the left springing joint, further out than the reaction's arrow. */
function springingLine(draught: Draught): Dimension {
  const { ring, resolved, mm, length } = draught;
  const { intrados, extrados } = ring.joints[0]!;
  const outwards = Math.atan2(extrados.y - intrados.y, extrados.x - intrados.x);
  const [a, b] = [intrados, extrados].map((end) => along(end, outwards, 0, mm(SPRINGING_DROP))) as [Point, Point];
  const text = `springing ${length(resolved.ring.springingThickness)}`;
  return dimension(draught, a, b, [intrados, extrados], text, aboutField('ring.springingThickness'));
}

/**
 * Across the ring at a haunch, its tail where the figure has room: in the opening, or outside where the opening has
 * none. The thickness is the same wherever it is written.
 */
function ringLine(draught: Draught): Dimension {
  const dimensions = [true, false].flatMap((inside) => RING_SHARES.map((share) => ringLineAt(draught, share, inside)));
  return (dimensions.find(({ clear }) => clear) ?? dimensions[0]!).dimension;
}

/** Where along the ring its thickness may be dimensioned, in order of preference. */
const RING_SHARES = [0.24, 0.3, 0.18, 0.36, 0.76, 0.7, 0.82, 0.64];

function ringLineAt(draught: Draught, share: number, inside: boolean): { dimension: Dimension; clear: boolean } {
  const { ring, mm, length, joints, places, resolved } = draught;
  const number = joints[Math.round(share * (joints.length - 1))]!;
  const joint = ring.joints[number]!;
  const { intrados, extrados } = resolved.ring.joints === 'radial' ? joint : squareAt(draught, joint.intrados);
  const [near, far] = inside ? [intrados, extrados] : [extrados, intrados];
  const outwards = Math.atan2(near.y - far.y, near.x - far.x);
  const tail = along(near, outwards, mm(RING_TAIL));
  const { paths } = dimension(draught, far, near, [far, near], '');
  const text = length(Math.hypot(extrados.x - intrados.x, extrados.y - intrados.y));
  const start = along(near, outwards, mm(OVERRUN));
  const label = figurePlaces(draught, start, tail, text, aboutField('ring.thickness'));
  return {
    dimension: { paths: [...paths, stroke('dimension', near, tail)], label, middle: tail },
    clear:
      !hingedJoints(draught).has(number) &&
      places.isClear([along(near, outwards, mm(GAP)), tail]) &&
      label.slice(0, 1).every((first) => places.isFree(first)),
  };
}

/** The thickness square to the soffit at one of its points, for a ring whose joints stand plumb. */
function squareAt({ resolved, soffit }: Draught, intrados: Point): Joint {
  const edge = soffit.edges.find(({ to }) => to.x >= intrados.x);
  const from = soffit.edges[soffit.edges.indexOf(edge!) - 1]?.to ?? soffit.start;
  const outwards =
    edge?.kind === 'arc'
      ? Math.atan2(intrados.y - edge.centre.y, intrados.x - edge.centre.x)
      : Math.atan2((edge?.to.y ?? 0) - from.y, (edge?.to.x ?? 1) - from.x) + Math.PI / 2;
  return { intrados, extrados: along(intrados, outwards, resolved.ring.thickness) };
}
