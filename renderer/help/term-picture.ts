/** A small arch for each word, with the part that it names brought out: the same drawing model as the board's. */
import { assessScheme, type AssessedScheme } from '../../core/assess/assess.ts';
import { blockBack, blockSoffit, bodyOutline, mergeArcs } from '../../core/drawing/faces.ts';
import { along, arrowhead, circle, outlined, polygon, polyline, stroke } from '../../core/drawing/path.ts';
import type { PathItem, SceneItem } from '../../core/drawing/scene.ts';
import { unbroken } from '../../core/drawing/thrust.ts';
import { between, midpoint, type Point } from '../../core/geometry/point.ts';
import type { RingGeometry } from '../../core/geometry/ring.ts';
import type { Scheme } from '../../core/job/schema.ts';
import type { TermId } from './terms.ts';

/** What every picture shows, m. */
export const PICTURE_BOX = { left: -2.45, bottom: -0.75, right: 2.45, top: 2.05 };

/** Thick, with few stones, so that its parts can be told at the size of a stamp. */
const SCHEME: Scheme = {
  id: 's1',
  profile: { shape: 'segmental', span: 3, rise: 1.1 },
  ring: { thickness: 0.5, voussoirs: 11, joints: 'radial' },
  breadth: 1,
  above: { kind: 'none' },
};

interface Arch {
  readonly assessed: AssessedScheme;
  readonly ring: RingGeometry;
  readonly left: { readonly intrados: Point; readonly extrados: Point };
  readonly right: { readonly intrados: Point; readonly extrados: Point };
  readonly ground: readonly SceneItem[];
}

let kept: Arch | null = null;

function arch(): Arch {
  if (kept !== null) return kept;
  const outcome = assessScheme({ id: 'a1', schemes: [SCHEME] }, SCHEME);
  if (!outcome.ok) throw new Error('the arch that explains the words cannot be built');
  const { ring } = outcome.assessed;
  const outline = bodyOutline(ring, 0, ring.blocks.length);
  const ground = [
    outlined('stone', outline),
    ...ring.joints.map(({ intrados, extrados }) => stroke('joint', intrados, extrados)),
    outlined('swatch-edge', outline),
  ];
  kept = { assessed: outcome.assessed, ring, left: ring.joints[0]!, right: ring.joints.at(-1)!, ground };
  return kept;
}

const pictures = new Map<TermId, SceneItem[]>();

export function termPicture(id: TermId): SceneItem[] {
  const before = pictures.get(id);
  if (before !== undefined) return before;
  const built = arch();
  const picture = [...built.ground, ...PARTS[id](built)];
  pictures.set(id, picture);
  return picture;
}

const PARTS: Readonly<Record<TermId, (arch: Arch) => SceneItem[]>> = {
  abutment: ({ left, right }) => [abutment(left, -1), abutment(right, 1)],
  backing: ({ ring }) => behind(ring, 0.85),
  crown: ({ ring }) => [circle('curve', midpoint(ring.crownIntrados, ring.crownExtrados), 0.42)],
  extrados: ({ ring }) => [face(ring, 'back')],
  fill: ({ ring, left, right }) => {
    const back = ring.joints.map(({ extrados }) => extrados);
    const top = ring.crownExtrados.y + 0.35;
    return [
      polygon('stress-block', [
        left.extrados,
        ...back,
        { x: right.extrados.x, y: top },
        { x: left.extrados.x, y: top },
      ]),
    ];
  },
  'geometric-safety': ({ ring, assessed }) => strip(ring, 1 / (assessed.result.geometricSafety ?? 3)),
  haunch: ({ ring }) => [body(ring, 2, 4), body(ring, 7, 9)],
  hinge: ({ ring }) => hinge(ring, 3),
  intrados: ({ ring }) => [face(ring, 'soffit')],
  joint: ({ ring }) =>
    [3, 8].map((joint) => stroke('curve', ring.joints[joint]!.intrados, ring.joints[joint]!.extrados)),
  keystone: ({ ring }) => [body(ring, 5, 6)],
  'line-of-thrust': ({ assessed }) =>
    unbroken(assessed.result.thrust.least?.line ?? []).map((run) => polyline('thrust-least', run)),
  'middle-third': ({ ring }) => strip(ring, 1 / 3),
  ring: ({ ring }) => {
    const { intrados, extrados } = ring.joints[4]!;
    return [body(ring, 0, ring.blocks.length), ...measured(intrados, extrados)];
  },
  rise: ({ ring, left, right }) => [
    stroke('datum', left.intrados, right.intrados),
    ...measured({ x: ring.crownIntrados.x, y: left.intrados.y }, ring.crownIntrados),
  ],
  skewback: ({ left, right }) => [left, right].map(({ intrados, extrados }) => stroke('curve', intrados, extrados)),
  spandrel: ({ ring }) => behind(ring, ring.crownExtrados.y),
  span: ({ left, right }) => measured(left.intrados, right.intrados),
  springing: ({ left, right }) => [
    stroke('datum', left.intrados, right.intrados),
    ...[left, right].map(({ intrados }) => circle('hinge-least', intrados, 0.09)),
  ],
  thrust: ({ left, right }) =>
    [push(midpoint(left.intrados, left.extrados), -1), push(midpoint(right.intrados, right.extrados), 1)].flat(),
  voussoir: ({ ring }) => [body(ring, 3, 4)],
};

const body = (ring: RingGeometry, from: number, to: number): PathItem =>
  outlined('stress-block', bodyOutline(ring, from, to));

function face(ring: RingGeometry, which: 'soffit' | 'back'): PathItem {
  const edgesOf = which === 'soffit' ? blockSoffit : blockBack;
  const edges = mergeArcs(ring.blocks.flatMap((_, block) => edgesOf(ring, block)));
  const first = ring.joints[0]!;
  return {
    kind: 'path',
    role: 'curve',
    start: which === 'soffit' ? first.intrados : first.extrados,
    edges,
    closed: false,
  };
}

/** A line with a head at both ends. */
function measured(from: Point, to: Point): SceneItem[] {
  const angle = Math.atan2(to.y - from.y, to.x - from.x);
  return [
    stroke('curve', from, to),
    arrowhead('load-head', to, angle, 0.22),
    arrowhead('load-head', from, angle + Math.PI, 0.22),
  ];
}

function push(from: Point, way: 1 | -1): SceneItem[] {
  const tip = { x: from.x + way * 0.6, y: from.y };
  return [stroke('curve', from, tip), arrowhead('reaction-head', tip, way > 0 ? 0 : Math.PI, 0.26, undefined, 1.5)];
}

function abutment({ intrados, extrados }: Arch['left'], way: 1 | -1): PathItem {
  const back = extrados.x + way * 0.32;
  return polygon('stress-block', [
    intrados,
    extrados,
    { x: back, y: extrados.y },
    { x: back, y: PICTURE_BOX.bottom + 0.1 },
    { x: intrados.x, y: PICTURE_BOX.bottom + 0.1 },
  ]);
}

/** Between the back of the ring and a level line, on both sides; m over the springing line. */
function behind(ring: RingGeometry, level: number): SceneItem[] {
  const back = ring.joints.map(({ extrados }) => extrados);
  const half = (side: readonly Point[]): SceneItem[] => {
    const under: Point[] = [];
    side.forEach((point, i) => {
      const before = side[i - 1];
      if (point.y <= level) under.push(point);
      else if (before !== undefined && before.y < level) {
        under.push(between(before, point, (level - before.y) / (point.y - before.y)));
      }
    });
    const [foot, ...rest] = under;
    if (foot === undefined) return [];
    return [
      polygon('stress-block', [foot, ...rest, { x: rest.at(-1)?.x ?? foot.x, y: level }, { x: foot.x, y: level }]),
    ];
  };
  const middle = Math.ceil(back.length / 2);
  const crown = { x: ring.crownExtrados.x, y: ring.crownExtrados.y };
  return [...half([...back.slice(0, middle), crown]), ...half([...back.slice(-middle).reverse(), crown])];
}

/** The middle of the ring, of this share of its thickness. */
function strip(ring: RingGeometry, share: number): SceneItem[] {
  const at = (side: number): Point[] =>
    ring.joints.map(({ intrados, extrados }) => between(intrados, extrados, 0.5 + (side * share) / 2));
  const [first, ...rest] = at(-1);
  return [polygon('stress-block', [first!, ...rest, ...at(1).reverse()])];
}

/** A joint that gapes at the intrados and is in contact at the extrados. */
function hinge(ring: RingGeometry, joint: number): SceneItem[] {
  const { intrados, extrados } = ring.joints[joint]!;
  const across = Math.atan2(extrados.y - intrados.y, extrados.x - intrados.x) + Math.PI / 2;
  return [
    polygon('opening-gap', [extrados, along(intrados, across, 0.09), along(intrados, across, -0.09)]),
    circle('hinge-mechanism', extrados, 0.07),
  ];
}
