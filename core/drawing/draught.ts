/** What the parts of one elevation share while it is drawn: the arch, its answers, the scale, and the room taken. */
import type { AssessedScheme } from '../assess/assess.ts';
import { topLevel } from '../loading/load-ring.ts';
import { skyOver } from '../loading/sky.ts';
import type { Edge } from '../geometry/curve.ts';
import type { Point } from '../geometry/point.ts';
import { blockBack, blockSoffit, drawnJoints, mergeArcs } from './faces.ts';
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
  /** Where what lies above ends on paper, m, and whether it really goes on further up. */
  readonly top: { readonly level: number; readonly broken: boolean };
  /** Ends of the back that faces the sky: what lies above stands between them. */
  readonly sky: { readonly left: Point; readonly right: Point };
}

export interface FacePath {
  readonly start: Point;
  readonly edges: readonly Edge[];
}

/** A wall taller than this share of the arch's larger measure is broken off on paper. */
const TALLEST_ABOVE = 0.4;

export function beginDraught(assessed: AssessedScheme, millimetresPerMetre: number, length: LengthText): Draught {
  const { ring, resolved } = assessed;
  const mm = (millimetres: number): number => millimetres / millimetresPerMetre;
  const blocks = ring.blocks.map((_, block) => block);
  const first = ring.joints[0]!;
  const soffit = { start: first.intrados, edges: mergeArcs(blocks.flatMap((block) => blockSoffit(ring, block))) };
  const back = { start: first.extrados, edges: mergeArcs(blocks.flatMap((block) => blockBack(ring, block))) };
  const { left, right } = skyOver(ring);
  const level = topLevel(ring, resolved);
  const crown = ring.crownExtrados.y;
  const tallest = Math.max(right.x - left.x, crown) * TALLEST_ABOVE + mm(12);
  const broken = level - crown > tallest;
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
    top: { level: broken ? crown + tallest : level, broken },
    sky: { left, right },
  };
}

/** Joints nearer than this on paper, mm, would run into one another. */
const CLOSEST_JOINTS = 0.8;

export const put = (draught: Draught, layer: LayerName, ...items: readonly SceneItem[]): void =>
  addItems(draught.items, layer, ...items);

/** Joints at which some state of the ring hinges. */
export function hingedJoints({ result }: AssessedScheme): ReadonlySet<number> {
  const { least, greatest } = result.thrust;
  const hinges = [...(least?.hinges ?? []), ...(greatest?.hinges ?? []), ...(result.mechanism?.hinges ?? [])];
  return new Set(hinges.map(({ joint }) => joint));
}
