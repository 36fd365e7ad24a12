/**
 * The ring of an arch: its joints from left springing to right, and each block between two joints with exact area and
 * centroid. Lengths in m, areas in m².
 */
import { ProblemError } from '../job/problem.ts';
import type { Profile } from '../job/schema.ts';
import type { Edge } from './curve.ts';
import { centroid, lineMoments, type Moments } from './moments.ts';
import { ringPieces, type Piece, type Thickness } from './pieces.ts';
import type { Point } from './point.ts';

export interface Joint {
  readonly intrados: Point;
  readonly extrados: Point;
}

/** A joint and where it stands on the curves of both faces. */
interface Station extends Joint {
  readonly piece: number;
  readonly u: number;
  readonly topPiece: number;
  readonly topU: number;
}

export interface RingBlock {
  readonly area: number;
  readonly centroid: Point;
}

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
  /** Boundary integrals along the sky-facing extrados of one block, with the ends of that stretch; null where none is. */
  readonly skyFace: (block: number, origin: Point) => SkyFace | null;
  /** The outline of one block: from its left joint's intrados along the soffit, up, back along the extrados. */
  readonly outline: (block: number) => Outline;
}

export interface SkyFace {
  readonly from: Point;
  readonly to: Point;
  readonly moments: Moments;
}

/** A closed figure; the last edge returns to `start`. */
export interface Outline {
  readonly start: Point;
  readonly edges: readonly Edge[];
}

/**
 * Joints equally spaced along the intrados; radial joints stand square on it, vertical ones are plumb except the two
 * springing joints, which stay square to the intrados as skewbacks do.
 * @throws ProblemError when the profile, the thickness or the joints cannot be built.
 */
export function buildRing(form: RingForm): RingGeometry {
  const pieces = ringPieces(form.profile, form.thickness);
  return ringOf(pieces, stationsOf(pieces, form.voussoirs, form.joints));
}

/** The ring with one more joint, plumb or square like the others, at the crown; and the crown joint's number. */
export function buildRingSplitAtCrown(form: RingForm): { ring: RingGeometry; crown: number } {
  const pieces = ringPieces(form.profile, form.thickness);
  const stations = stationsOf(pieces, form.voussoirs, form.joints);
  const place = highestPlace(pieces);
  const found = stations.findIndex((station) => Math.abs(station.intrados.x - place.x) <= SAME_PLACE * widthOf(pieces));
  if (found >= 0) return { ring: ringOf(pieces, stations), crown: found };
  const crown = stations.findIndex((station) => station.intrados.x > place.x);
  const square = stationAtLength(pieces, place.length);
  const split = form.joints === 'vertical' ? plumb(pieces, square) : square;
  return { ring: ringOf(pieces, [...stations.slice(0, crown), split, ...stations.slice(crown)]), crown };
}

/** The crown: the highest place of the intrados, with its distance along the intrados from the left springing. */
function highestPlace(pieces: readonly Piece[]): Point & { length: number } {
  let best = { x: 0, y: -Infinity, length: 0 };
  let start = 0;
  for (const { intrados } of pieces) {
    const u = intrados.highest(intrados.from, intrados.to);
    const { x, y } = intrados.at(u);
    if (y > best.y) best = { x, y, length: start + intrados.length(intrados.from, u) };
    start += intrados.length(intrados.from, intrados.to);
  }
  return best;
}

function highestOfBack(pieces: readonly Piece[]): Point {
  return pieces
    .map(({ extrados, extradosFrom, extradosTo }) => extrados.at(extrados.highest(extradosFrom, extradosTo)))
    .reduce((best, point) => (point.y > best.y ? point : best));
}

/** Two places on the intrados closer than this share of the span are one joint. */
const SAME_PLACE = 1e-9;

const widthOf = (pieces: readonly Piece[]): number => {
  const first = pieceAt(pieces, 0).intrados;
  const last = pieceAt(pieces, pieces.length - 1).intrados;
  return last.at(last.to).x - first.at(first.from).x;
};

function pieceAt(pieces: readonly Piece[], index: number): Piece {
  const piece = pieces[index];
  if (piece === undefined) throw new RangeError(`no piece ${index} among ${pieces.length}`);
  return piece;
}

function ringOf(pieces: readonly Piece[], stations: readonly Station[]): RingGeometry {
  const blocks: RingBlock[] = [];
  for (let k = 0; k + 1 < stations.length; k++) blocks.push(blockOf(pieces, stations[k] as Station, stations[k + 1] as Station));
  const station = (k: number): Station => stations[k] as Station;
  return {
    joints: stations.map(({ intrados, extrados }) => ({ intrados, extrados })),
    blocks,
    crownExtrados: highestOfBack(pieces),
    crownIntrados: highestPlace(pieces),
    skyFace: (block, origin) => skyFaceOf(pieces, station(block), station(block + 1), origin),
    outline: (block) => outlineOf(pieces, station(block), station(block + 1)),
  };
}

function stationsOf(pieces: readonly Piece[], count: number, joints: RingForm['joints']): Station[] {
  const total = pieces.reduce((sum, { intrados }) => sum + intrados.length(intrados.from, intrados.to), 0);
  const stations: Station[] = [];
  for (let i = 0; i <= count; i++) {
    const square = stationAtLength(pieces, (total * i) / count);
    stations.push(joints === 'vertical' && i > 0 && i < count ? plumb(pieces, square) : square);
  }
  return stations;
}

function stationAtLength(pieces: readonly Piece[], length: number): Station {
  let start = 0;
  for (let i = 0; i < pieces.length; i++) {
    const { intrados, across, extradosFrom, extradosTo, extrados } = pieceAt(pieces, i);
    const own = intrados.length(intrados.from, intrados.to);
    const into = length - start;
    const last = i === pieces.length - 1;
    const tolerance = SAME_PLACE * own;
    if (into < own - tolerance || last) {
      const atStart = into <= tolerance;
      const atEnd = into >= own - tolerance;
      const u = atStart ? intrados.from : atEnd ? intrados.to : intrados.parameterAtLength(into);
      const topU = atStart ? extradosFrom : atEnd ? extradosTo : across(u);
      return { piece: i, u, topPiece: i, topU, intrados: intrados.at(u), extrados: extrados.at(topU) };
    }
    start += own;
  }
  throw new RangeError('a ring has at least one piece');
}

/** The plumb joint that rises from the intrados point of a square one. */
function plumb(pieces: readonly Piece[], square: Station): Station {
  const { x } = square.intrados;
  for (let i = 0; i < pieces.length; i++) {
    const { extrados, extradosFrom, extradosTo } = pieceAt(pieces, i);
    if (x > extrados.at(extradosTo).x && i < pieces.length - 1) continue;
    const topU = clampBetween(extrados.parameterAtX(x), extradosFrom, extradosTo);
    const top = extrados.at(topU);
    if (Math.abs(top.x - x) > SAME_PLACE * widthOf(pieces)) break;
    return { ...square, topPiece: i, topU, extrados: { x, y: top.y } };
  }
  throw new ProblemError([
    {
      path: 'ring.joints',
      value: 'vertical',
      wrong: 'plumb joints need an intrados that does not lean back under itself',
      right: 'use "radial" for this profile',
    },
  ]);
}

const clampBetween = (u: number, a: number, b: number): number =>
  Math.min(Math.max(u, Math.min(a, b)), Math.max(a, b));

/** Stretches of one face between two places, left to right, each on one curve. */
function stretches(
  pieces: readonly Piece[],
  face: 'intrados' | 'extrados',
  from: { piece: number; u: number },
  to: { piece: number; u: number },
): { curve: Piece['intrados']; u0: number; u1: number }[] {
  const found = [];
  for (let i = from.piece; i <= to.piece; i++) {
    const piece = pieceAt(pieces, i);
    const curve = piece[face];
    const start = face === 'intrados' ? curve.from : piece.extradosFrom;
    const end = face === 'intrados' ? curve.to : piece.extradosTo;
    const u0 = i === from.piece ? from.u : start;
    const u1 = i === to.piece ? to.u : end;
    if (u0 !== u1) found.push({ curve, u0, u1 });
  }
  return found;
}

const soffit = (pieces: readonly Piece[], left: Station, right: Station) => stretches(pieces, 'intrados', left, right);
const back = (pieces: readonly Piece[], left: Station, right: Station) =>
  stretches(pieces, 'extrados', { piece: left.topPiece, u: left.topU }, { piece: right.topPiece, u: right.topU });

function blockOf(pieces: readonly Piece[], left: Station, right: Station): RingBlock {
  const origin = left.intrados;
  let area = 0;
  let sx = 0;
  let sy = 0;
  const add = (part: Moments, sign: number): void => {
    area += sign * part.area;
    sx += sign * part.sx;
    sy += sign * part.sy;
  };
  for (const { curve, u0, u1 } of soffit(pieces, left, right)) add(curve.moments(u0, u1, origin), 1);
  add(lineMoments(right.intrados, right.extrados, origin), 1);
  for (const { curve, u0, u1 } of back(pieces, left, right)) add(curve.moments(u0, u1, origin), -1);
  add(lineMoments(left.extrados, left.intrados, origin), 1);
  return { area, centroid: centroid({ area, sx, sy }, origin) };
}

function skyFaceOf(pieces: readonly Piece[], left: Station, right: Station, origin: Point): SkyFace | null {
  let from: Point | null = null;
  let to: Point | null = null;
  let area = 0;
  let sx = 0;
  let sy = 0;
  for (const { curve, u0, u1 } of back(pieces, left, right)) {
    const { from: sky0, to: sky1 } = curve.skyward;
    const a = clampBetween(u0, sky0, sky1);
    const b = clampBetween(u1, sky0, sky1);
    if (a === b) continue;
    const part = curve.moments(a, b, origin);
    area += part.area;
    sx += part.sx;
    sy += part.sy;
    from ??= curve.at(a);
    to = curve.at(b);
  }
  return from === null || to === null ? null : { from, to, moments: { area, sx, sy } };
}

function outlineOf(pieces: readonly Piece[], left: Station, right: Station): Outline {
  return {
    start: left.intrados,
    edges: [
      ...soffit(pieces, left, right).flatMap(({ curve, u0, u1 }) => curve.edges(u0, u1)),
      { kind: 'line', to: right.extrados },
      ...back(pieces, left, right)
        .reverse()
        .flatMap(({ curve, u0, u1 }) => curve.edges(u1, u0)),
      { kind: 'line', to: left.intrados },
    ],
  };
}
