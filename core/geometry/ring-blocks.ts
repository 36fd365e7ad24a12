/** The blocks between two joints: exact areas and centroids, the back that faces the sky, and their outlines. */
import { clampBetween } from './clamp.ts';
import type { Curve, Edge } from './curve.ts';
import { centroid, lineMoments, type Moments } from './moments.ts';
import { pieceAt, type Piece } from './pieces.ts';
import type { Point } from './point.ts';
import type { Station } from './stations.ts';

export interface RingBlock {
  readonly area: number;
  readonly centroid: Point;
  /** Boundary integrals along the whole of its extrados, left to right, about its left joint's intrados. */
  readonly back: Moments;
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

export function blockOf(pieces: readonly Piece[], left: Station, right: Station): RingBlock {
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

export function skyFaceOf(
  pieces: readonly Piece[],
  left: Station,
  right: Station,
  { back }: RingBlock,
): SkyFace | null {
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

export function skyFacesBelow(pieces: readonly Piece[], left: Station, right: Station, level: number): SkyFace[] {
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

export function outlineOf(pieces: readonly Piece[], left: Station, right: Station): Outline {
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
