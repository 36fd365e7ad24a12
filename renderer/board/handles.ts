/**
 * What can be taken hold of on the board: each handle has a place on the arch, an axis along which it moves, and the
 * value that it sets. Values and places in metres.
 */
import type { AssessedScheme } from '../../core/assess/assess.ts';
import { boxOf } from '../../core/drawing/extent.ts';
import { itemPoints, type PathItem, type Scene } from '../../core/drawing/scene.ts';
import type { Point } from '../../core/geometry/point.ts';
import type { ResolvedLoad } from '../../core/job/defaults.ts';
import {
  crownHeightOf,
  moveCrown,
  moveLoad,
  moveSpringing,
  resizeStrip,
  setAbove,
  setLoad,
  setThickness,
} from '../../core/job/edits.ts';
import type { Scheme } from '../../core/job/schema.ts';

export interface Handle {
  readonly id: string;
  /** What it sets, as a screen reader says it: `Rise, at the crown`. */
  readonly name: string;
  /** Of the step that a drag makes: `rise`. */
  readonly measure: string;
  readonly at: Point;
  readonly axis: 'x' | 'y';
  readonly value: number;
  /** Change of the value for each metre along the axis. */
  readonly rate: number;
  readonly set: (scheme: Scheme, value: number) => Scheme;
  /** Field that the same figure has in the panels; null where it is set by hand only. */
  readonly path: string | null;
}

/** In the order in which one measures, which is the order of the Tab key. */
export function handlesOf(assessed: AssessedScheme, scene: Scene): Handle[] {
  const { resolved } = assessed;
  return [
    ...openingHandles(assessed),
    thicknessHandle(assessed),
    ...topHandle(assessed, scene),
    ...resolved.loads.flatMap((load) => loadHandles(load, scene)),
  ];
}

function openingHandles({ resolved, ring }: AssessedScheme): Handle[] {
  const { profile } = resolved;
  if (profile.shape === 'measured') return [];
  const { span } = profile;
  const springing = (side: 'left' | 'right', at: Point): Handle => ({
    id: `springing-${side}`,
    name: `Span, at the ${side} springing`,
    measure: 'span',
    at,
    axis: 'x',
    value: span,
    rate: side === 'left' ? -2 : 2,
    set: (scheme, value) => moveSpringing(scheme, side, { x: side === 'left' ? -value / 2 : value / 2, y: 0 }),
    path: 'profile.span',
  });
  const flat = profile.shape === 'flat';
  return [
    springing('left', ring.joints[0]!.intrados),
    {
      id: 'crown',
      name: flat ? 'Camber, at the crown' : 'Rise, at the crown',
      measure: flat ? 'camber' : 'rise',
      at: ring.crownIntrados,
      axis: 'y',
      value: crownHeightOf(profile),
      rate: 1,
      set: (scheme, value) => moveCrown(scheme, { x: 0, y: value }),
      path: flat ? 'profile.camber' : profile.shape === 'semicircular' ? 'profile.span' : 'profile.rise',
    },
    springing('right', ring.joints.at(-1)!.intrados),
  ];
}

function thicknessHandle({ resolved, ring }: AssessedScheme): Handle {
  return {
    id: 'thickness',
    name: 'Thickness of the ring, over the crown',
    measure: 'thickness',
    at: ring.crownExtrados,
    axis: 'y',
    value: resolved.ring.thickness,
    // Over a point the back stands further above the soffit than the ring is thick.
    rate: resolved.ring.thickness / (ring.crownExtrados.y - ring.crownIntrados.y),
    set: setThickness,
    path: 'ring.thickness',
  };
}

/** Paper millimetres from the right end of the top to its handle, clear of the corner. */
const FROM_CORNER = 9;

/** On the top as it is drawn: a wall too tall for the drawing is broken off, and taken hold of there. */
function topHandle({ resolved }: AssessedScheme, scene: Scene): Handle[] {
  const body = scene.layers
    .find(({ name }) => name === 'above')
    ?.items.find((item) => item.kind === 'path' && item.closed);
  if (resolved.above.kind === 'none' || body === undefined) return [];
  const box = boxOf(itemPoints(body, scene.millimetresPerUnit));
  if (box === null) return [];
  const inwards = Math.min(FROM_CORNER / scene.millimetresPerUnit, (box.right - box.left) / 4);
  return [
    {
      id: 'top',
      name: `Height of the ${resolved.above.kind} over the crown`,
      measure: 'height above',
      at: { x: box.right - inwards, y: box.top },
      axis: 'y',
      value: resolved.above.height,
      rate: 1,
      set: (scheme, height) => setAbove(scheme, { height }),
      path: 'above.height',
    },
  ];
}

function loadHandles(load: ResolvedLoad, scene: Scene): Handle[] {
  const drawn = drawnLoad(scene, load.id);
  if (drawn === null) return [];
  const handle = (
    id: string,
    name: string,
    measure: string,
    at: Point,
    value: number,
    set: Handle['set'],
    path: string | null,
  ): Handle => ({
    id: `load-${load.id}-${id}`,
    name,
    measure: `${load.name} ${measure}`,
    at,
    axis: 'x',
    value,
    rate: 1,
    set,
    path,
  });
  const field = (name: string): string => `loads.${load.id}.${name}`;
  if (load.kind !== 'strip') {
    const at = { x: load.x, y: lowest(drawn) };
    return [
      handle(
        'x',
        `Place of ${load.name}, from mid-span`,
        'place',
        at,
        load.x,
        (scheme, x) => moveLoad(scheme, load.id, x),
        field('x'),
      ),
    ];
  }
  const bar = highest(drawn);
  const { from, to } = load;
  const middle = tidy((from + to) / 2);
  /** Both ends by the same, to the micrometre: a file keeps no dust of binary fractions. */
  const shifted = (scheme: Scheme, x: number): Scheme =>
    setLoad(scheme, load.id, { from: tidy(from + x - middle), to: tidy(to + x - middle) });
  const end = (name: 'from' | 'to', words: string): Handle =>
    handle(
      name,
      `${words} end of ${load.name}, from mid-span`,
      `${words.toLowerCase()} end`,
      { x: load[name], y: bar },
      load[name],
      (scheme, x) => resizeStrip(scheme, load.id, name, x),
      field(name),
    );
  return [
    end('from', 'Left'),
    handle('middle', `Middle of ${load.name}, from mid-span`, 'place', { x: middle, y: bar }, middle, shifted, null),
    end('to', 'Right'),
  ];
}

/** The strokes of a load; null when it is not drawn, as the lightest of very many are not. */
function drawnLoad(scene: Scene, id: string): PathItem[] | null {
  const layer = scene.layers.find(({ name }) => name === 'loads');
  const items = layer?.items.filter((item) => item.about?.kind === 'load' && item.about.load === id) ?? [];
  const paths = items.filter((item) => item.kind === 'path');
  return paths.length === 0 ? null : paths;
}

const heights = (paths: readonly PathItem[]): number[] =>
  paths.flatMap(({ start, edges }) => [start.y, ...edges.map(({ to }) => to.y)]);
const lowest = (paths: readonly PathItem[]): number => Math.min(...heights(paths));
/** The bar of a strip is its first stroke, whatever flag flies over it. */
const highest = ([bar]: readonly PathItem[]): number => bar?.start.y ?? 0;

/** The nearest handle within `reach` pixels of a pixel; `place` gives a handle's own pixel. */
export function nearestHandle(
  handles: readonly Handle[],
  pixel: Point,
  reach: number,
  place: (point: Point) => Point,
): Handle | null {
  let nearest: Handle | null = null;
  let least = reach;
  for (const handle of handles) {
    const { x, y } = place(handle.at);
    const distance = Math.hypot(x - pixel.x, y - pixel.y);
    if (distance < least) [nearest, least] = [handle, distance];
  }
  return nearest;
}

/** Steps that a dragged value is rounded to, m: the finest one that a pixel can tell. */
const ROUND = [0.0005, 0.001, 0.002, 0.005, 0.01, 0.02, 0.05, 0.1, 0.2, 0.5, 1];

/** A dragged value without digits that no hand can place, at so many pixels per metre. */
export function rounded(value: number, pixelsPerMetre: number): number {
  const step = ROUND.find((candidate) => candidate * pixelsPerMetre >= 0.9) ?? 1;
  return tidy(Math.round(value / step) * step);
}

/** Steps of the arrow keys, m. */
export const NUDGE = { fine: 0.001, usual: 0.01, coarse: 0.1 } as const;

/** A nudged value without the last digits that binary fractions leave behind. */
export const tidy = (value: number): number => Number(value.toFixed(6)) + 0;
