/**
 * The ring of an arch: its joints from left springing to right, and each block between two joints with exact area and
 * centroid. Lengths in m, areas in m².
 */
import type { Profile } from '../job/schema.ts';
import { ringPieces, type Piece, type Thickness } from './pieces.ts';
import type { Point } from './point.ts';
import {
  blockOf,
  outlineOf,
  skyFaceOf,
  skyFacesBelow,
  type Outline,
  type RingBlock,
  type SkyFace,
} from './ring-blocks.ts';
import { plumb, SAME_PLACE, stationAtLength, stationsOf, widthOf, type Joint, type Station } from './stations.ts';

export interface RingForm {
  readonly profile: Profile;
  readonly thickness: Thickness;
  readonly voussoirs: number;
  readonly joints: 'radial' | 'vertical';
}

export interface RingGeometry {
  readonly joints: readonly Joint[];
  readonly blocks: readonly RingBlock[];
  /** The highest point of the extrados, m. */
  readonly crownExtrados: Point;
  /** The highest point of the intrados, m. */
  readonly crownIntrados: Point;
  /** The ring with one more joint at the crown, or itself where a joint stands there; and the crown joint's number. */
  readonly splitAtCrown: () => { readonly ring: RingGeometry; readonly crown: number };
  /** The sky-facing stretch of one block's extrados; null where its whole back faces down. */
  readonly skyFace: (block: number) => SkyFace | null;
  /** The parts of that stretch at or under a level (m), left to right. */
  readonly skyFacesBelow: (block: number, level: number) => readonly SkyFace[];
  /** The outline of one block: from its left joint's intrados along the soffit, up, back along the extrados. */
  readonly outline: (block: number) => Outline;
}

/**
 * Joints equally spaced along the intrados; radial joints stand square on it, vertical ones are plumb except the two
 * springing joints, which stay square to the intrados as skewbacks do.
 * @throws ProblemError when the profile, the thickness or the joints cannot be built.
 */
export function buildRing(form: RingForm): RingGeometry {
  const pieces = ringPieces(form.profile, form.thickness);
  return ringOf(pieces, stationsOf(pieces, form.voussoirs, form.joints), form.joints);
}

function ringOf(pieces: readonly Piece[], stations: readonly Station[], joints: RingForm['joints']): RingGeometry {
  const station = (k: number): Station => stations[k] as Station;
  const crownIntrados = highestPlace(pieces);
  const blocks = stations.slice(1).map((right, k) => blockOf(pieces, station(k), right));
  const ring: RingGeometry = {
    joints: stations,
    blocks,
    crownExtrados: highestOfBack(pieces),
    crownIntrados,
    splitAtCrown: () => {
      const near = SAME_PLACE * widthOf(pieces);
      const found = stations.findIndex(({ intrados }) => Math.abs(intrados.x - crownIntrados.x) <= near);
      if (found >= 0) return { ring, crown: found };
      const crown = stations.findIndex(({ intrados }) => intrados.x > crownIntrados.x);
      const square = stationAtLength(pieces, crownIntrados.length);
      const split = joints === 'vertical' ? plumb(pieces, square) : square;
      return { ring: ringOf(pieces, [...stations.slice(0, crown), split, ...stations.slice(crown)], joints), crown };
    },
    skyFace: (block) => skyFaceOf(pieces, station(block), station(block + 1), blocks[block] as RingBlock),
    skyFacesBelow: (block, level) => skyFacesBelow(pieces, station(block), station(block + 1), level),
    outline: (block) => outlineOf(pieces, station(block), station(block + 1)),
  };
  return ring;
}

/** The crown: the highest place of the intrados, with its distance along the intrados from the left springing. */
function highestPlace(pieces: readonly Piece[]): Point & { length: number } {
  let best = { x: 0, y: -Infinity, length: 0 };
  let start = 0;
  for (const { intrados, length } of pieces) {
    const u = intrados.highest(intrados.from, intrados.to);
    const { x, y } = intrados.at(u);
    if (y > best.y) best = { x, y, length: start + intrados.length(intrados.from, u) };
    start += length;
  }
  return best;
}

function highestOfBack(pieces: readonly Piece[]): Point {
  return pieces
    .map(({ extrados, extradosFrom, extradosTo }) => extrados.at(extrados.highest(extradosFrom, extradosTo)))
    .reduce((best, point) => (point.y > best.y ? point : best));
}
