/**
 * The ring of an arch: its joints from left springing to right, and each block between two joints with exact area and
 * centroid. Lengths in m, areas in m².
 */
import { ProblemError } from '../job/problem.ts';
import type { Profile } from '../job/schema.ts';
import type { Curve, Edge } from './curve.ts';
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
  /** Boundary integrals along the whole of its extrados, left to right, about its left joint's intrados. */
  readonly back: Moments;
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
  /** The ring with one more joint at the crown, or itself where a joint stands there; and the crown joint's number. */
  readonly splitAtCrown: () => { readonly ring: RingGeometry; readonly crown: number };
  /** The sky-facing stretch of one block's extrados; null where its whole back faces down. */
  readonly skyFace: (block: number) => SkyFace | null;
  /** The parts of that stretch at or under a level (m), left to right. */
  readonly skyFacesBelow: (block: number, level: number) => readonly SkyFace[];
  /** The outline of one block: from its left joint's intrados along the soffit, up, back along the extrados. */
  readonly outline: (block: number) => Outline;
}

export interface SkyFace {
  readonly from: Point;
  readonly to: Point;
  /** Boundary integrals from `from` to `to`, about `origin`. */
  readonly moments: Moments;
  readonly origin: Point;
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
  return ringOf(pieces, stationsOf(pieces, form.voussoirs, form.joints), form.joints);
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

function stationsOf(pieces: readonly Piece[], count: number, joints: RingForm['joints']): Station[] {
  const total = pieces.reduce((sum, { length }) => sum + length, 0);
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
    const { intrados, across, extradosFrom, extradosTo, extrados, length: own } = pieceAt(pieces, i);
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
  const soffit = pieceAt(pieces, square.piece).intrados;
  const leansBack = soffit.derivative(square.u).x * (soffit.to - soffit.from) < 0;
  for (let i = 0; i < pieces.length && !leansBack; i++) {
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

const clampBetween = (u: number, a: number, b: number): number => Math.min(Math.max(u, Math.min(a, b)), Math.max(a, b));

/** Visits the stretches of one face between two places, left to right, each on one curve. */
function eachStretch(
  pieces: readonly Piece[],
  face: 'intrados' | 'extrados',
  left: Station,
  right: Station,
  visit: (curve: Curve, u0: number, u1: number) => void,
): void {
  const soffit = face === 'intrados';
  const first = soffit ? left.piece : left.topPiece;
  const last = soffit ? right.piece : right.topPiece;
  for (let i = first; i <= last; i++) {
    const { intrados, extrados, extradosFrom, extradosTo } = pieceAt(pieces, i);
    const start = soffit ? intrados.from : extradosFrom;
    const end = soffit ? intrados.to : extradosTo;
    const u0 = i > first ? start : soffit ? left.u : left.topU;
    const u1 = i < last ? end : soffit ? right.u : right.topU;
    if (u0 !== u1) visit(soffit ? intrados : extrados, u0, u1);
  }
}

function blockOf(pieces: readonly Piece[], left: Station, right: Station): RingBlock {
  const origin = left.intrados;
  const soffit = faceMoments(pieces, 'intrados', left, right, origin);
  const back = faceMoments(pieces, 'extrados', left, right, origin);
  const rightJoint = lineMoments(right.intrados, right.extrados, origin);
  const leftJoint = lineMoments(left.extrados, left.intrados, origin);
  const area = soffit.area + rightJoint.area - back.area + leftJoint.area;
  const sx = soffit.sx + rightJoint.sx - back.sx + leftJoint.sx;
  const sy = soffit.sy + rightJoint.sy - back.sy + leftJoint.sy;
  return { area, centroid: centroid({ area, sx, sy }, origin), back };
}

function faceMoments(
  pieces: readonly Piece[],
  face: 'intrados' | 'extrados',
  left: Station,
  right: Station,
  origin: Point,
): Moments {
  const soffit = face === 'intrados';
  const first = soffit ? left.piece : left.topPiece;
  if (first === (soffit ? right.piece : right.topPiece)) {
    // nearly every block lies on one curve
    const piece = pieceAt(pieces, first);
    return soffit
      ? piece.intrados.moments(left.u, right.u, origin)
      : piece.extrados.moments(left.topU, right.topU, origin);
  }
  let sum: Moments = { area: 0, sx: 0, sy: 0 };
  eachStretch(pieces, face, left, right, (curve, u0, u1) => {
    const { area, sx, sy } = curve.moments(u0, u1, origin);
    sum = { area: sum.area + area, sx: sum.sx + sx, sy: sum.sy + sy };
  });
  return sum;
}

const facesSky = (u: number, { from, to }: Curve['skyward']): boolean => (u - from) * (u - to) <= 0;

function skyFaceOf(pieces: readonly Piece[], left: Station, right: Station, { back }: RingBlock): SkyFace | null {
  const origin = left.intrados;
  if (left.topPiece === right.topPiece) {
    const { skyward } = pieceAt(pieces, left.topPiece).extrados;
    if (facesSky(left.topU, skyward) && facesSky(right.topU, skyward)) {
      return { from: left.extrados, to: right.extrados, moments: back, origin };
    }
  }
  const stretches: { curve: Curve; a: number; b: number; whole: boolean }[] = [];
  eachStretch(pieces, 'extrados', left, right, (curve, u0, u1) => {
    const { from, to } = curve.skyward;
    const a = clampBetween(u0, from, to);
    const b = clampBetween(u1, from, to);
    stretches.push({ curve, a, b, whole: a === u0 && b === u1 });
  });
  const open = stretches.filter(({ a, b }) => a !== b);
  const first = open[0];
  const last = open[open.length - 1];
  if (!first || !last) return null;
  if (stretches.every(({ whole }) => whole)) {
    return { from: left.extrados, to: right.extrados, moments: back, origin };
  }
  let moments: Moments = { area: 0, sx: 0, sy: 0 };
  for (const { curve, a, b } of open) {
    const { area, sx, sy } = curve.moments(a, b, origin);
    moments = { area: moments.area + area, sx: moments.sx + sx, sy: moments.sy + sy };
  }
  return { from: first.curve.at(first.a), to: last.curve.at(last.b), moments, origin };
}

function skyFacesBelow(pieces: readonly Piece[], left: Station, right: Station, level: number): SkyFace[] {
  const faces: SkyFace[] = [];
  const origin = left.intrados;
  eachStretch(pieces, 'extrados', left, right, (curve, u0, u1) => {
    const a = clampBetween(u0, curve.skyward.from, curve.skyward.to);
    const b = clampBetween(u1, curve.skyward.from, curve.skyward.to);
    if (a === b) return;
    const peak = curve.highest(a, b);
    for (const [low, high, rising] of [
      [a, peak, true],
      [peak, b, false],
    ] as const) {
      if (low === high) continue;
      const [foot, top] = rising ? [low, high] : [high, low];
      if (curve.at(foot).y >= level) continue;
      const end = curve.at(top).y <= level ? top : whereAtLevel(curve, foot, top, level);
      const [from, to] = rising ? [foot, end] : [end, foot];
      faces.push({ from: curve.at(from), to: curve.at(to), moments: curve.moments(from, to, origin), origin });
    }
  });
  return faces;
}

/** Between a parameter under the level and one over it, by halving to the rounding of the ends. */
function whereAtLevel(curve: Curve, under: number, over: number, level: number): number {
  for (let step = 0; step < 60; step++) {
    const u = (under + over) / 2;
    if (curve.at(u).y <= level) under = u;
    else over = u;
  }
  return under;
}

function outlineOf(pieces: readonly Piece[], left: Station, right: Station): Outline {
  const soffit: Edge[] = [];
  const back: Edge[][] = [];
  eachStretch(pieces, 'intrados', left, right, (curve, u0, u1) => {
    soffit.push(...curve.edges(u0, u1));
  });
  eachStretch(pieces, 'extrados', left, right, (curve, u0, u1) => {
    back.push(curve.edges(u1, u0));
  });
  return {
    start: left.intrados,
    edges: [
      ...soffit,
      { kind: 'line', to: right.extrados },
      ...back.reverse().flat(),
      { kind: 'line', to: left.intrados },
    ],
  };
}
