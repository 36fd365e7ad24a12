/** What the parts of one elevation share while it is drawn: the arch, its answers, the scale, and the room taken. */
import type { AssessedScheme } from '../assess/assess.ts';
import { layersHeight } from '../loading/above.ts';
import { topLevel } from '../loading/load-ring.ts';
import { skyOver, type Sky } from '../loading/sky.ts';
import type { Edge } from '../geometry/curve.ts';
import type { Point } from '../geometry/point.ts';
import type { Joint } from '../geometry/stations.ts';
import { blockBack, blockSoffit, drawnJoints, mergeArcs } from './faces.ts';
import type { MovedRing } from './moved-ring.ts';
import { Places } from './places.ts';
import { addItems, type Items, type KeyEntry, type LayerName, type SceneItem } from './scene.ts';

/** How lengths, in metres, are lettered; the screen may hand in feet and inches. */
export type LengthText = (metres: number) => string;

export interface Draught extends AssessedScheme {
  readonly millimetresPerMetre: number;
  /** Paper millimetres as metres of the arch. */
  readonly mm: (millimetres: number) => number;
  readonly length: LengthText;
  readonly items: Items;
  /** Filled where a number is lettered instead of a name. */
  readonly key: KeyEntry[];
  readonly places: Places;
  /** Joints that are drawn, by number: all of them unless they would run together on paper. */
  readonly joints: readonly number[];
  /** Both faces from left springing to right. */
  readonly soffit: FacePath;
  readonly back: FacePath;
  readonly top: Top;
  /** The ring after a movement, where it is drawn so. */
  readonly moved: MovedRing | null;
  /** The ring's joints as they are drawn, moved or not. */
  readonly standing: readonly Joint[];
  /** The back that faces the sky, between whose ends what lies above stands. */
  readonly sky: Sky;
}

/** Where what lies above ends on paper, m. */
export interface Top {
  /** Of the wall or fill. */
  readonly level: number;
  /** Whether it really goes on further up. */
  readonly broken: boolean;
  /** Of the layers on it. */
  readonly surface: number;
  /** Drawn thickness of the layers over their real one: 1 unless they would dwarf the arch. */
  readonly layerScale: number;
  /** Where the surface really lies, m. */
  readonly trueSurface: number;
}

export interface FacePath {
  readonly start: Point;
  readonly edges: readonly Edge[];
}

/** A wall taller than this share of the arch's larger measure is broken off on paper. */
const TALLEST_ABOVE = 0.4;

export function beginDraught(
  assessed: AssessedScheme,
  millimetresPerMetre: number,
  length: LengthText,
  moved: MovedRing | null = null,
): Draught {
  const { ring } = assessed;
  const mm = (millimetres: number): number => millimetres / millimetresPerMetre;
  const blocks = ring.blocks.map((_, block) => block);
  const first = ring.joints[0]!;
  const soffit = { start: first.intrados, edges: mergeArcs(blocks.flatMap((block) => blockSoffit(ring, block))) };
  const back = { start: first.extrados, edges: mergeArcs(blocks.flatMap((block) => blockBack(ring, block))) };
  const sky = skyOver(ring);
  return {
    ...assessed,
    millimetresPerMetre,
    mm,
    length,
    items: new Map(),
    key: [],
    places: new Places(millimetresPerMetre),
    joints: drawnJoints(ring, mm(CLOSEST_JOINTS)),
    soffit,
    back,
    top: topOf(assessed, Math.max(sky.right.x - sky.left.x, ring.crownExtrados.y) * TALLEST_ABOVE + mm(12)),
    sky,
    moved,
    standing: moved?.joints ?? ring.joints,
  };
}

function topOf({ ring, resolved }: AssessedScheme, tallest: number): Top {
  const { above } = resolved;
  const crown = ring.crownExtrados.y;
  const real = topLevel(ring, resolved);
  const broken = real - crown > tallest;
  const level = broken ? crown + tallest : real;
  const layers = layersHeight(above.layers);
  const drawn = above.kind === 'none' ? 0 : Math.min(layers, tallest);
  return {
    level,
    broken,
    surface: level + drawn,
    layerScale: layers === 0 ? 1 : drawn / layers,
    trueSurface: real + layers,
  };
}

/** Joints nearer than this on paper, mm, would run into one another. */
const CLOSEST_JOINTS = 0.8;

export const put = (draught: Draught, layer: LayerName, ...items: readonly SceneItem[]): void =>
  addItems(draught.items, layer, ...items);

/** Joints at which some state of the ring hinges, or those that gape where it is drawn moved. */
export function hingedJoints({ result, moved }: Draught): ReadonlySet<number> {
  if (moved !== null) return new Set(moved.openings.map(({ joint }) => joint));
  const { least, greatest } = result.thrust;
  const hinges = [...(least?.hinges ?? []), ...(greatest?.hinges ?? []), ...(result.mechanism?.hinges ?? [])];
  return new Set(hinges.map(({ joint }) => joint));
}
