/** Where the joints of a ring stand on the curves of its two faces. */
import { clampBetween } from './clamp.ts';
import { ProblemError } from '../job/problem.ts';
import { pieceAt, type Piece } from './pieces.ts';
import type { Point } from './point.ts';

export interface Joint {
  readonly intrados: Point;
  readonly extrados: Point;
}

/** A joint and where it stands on the curves of both faces. */
export interface Station extends Joint {
  readonly piece: number;
  readonly u: number;
  readonly topPiece: number;
  readonly topU: number;
}

/** Two places on the intrados closer than this share of the span are one joint. */
export const SAME_PLACE = 1e-9;

export const widthOf = (pieces: readonly Piece[]): number => {
  const first = pieceAt(pieces, 0).intrados;
  const last = pieceAt(pieces, pieces.length - 1).intrados;
  return last.at(last.to).x - first.at(first.from).x;
};

/** Joints equally spaced along the intrados, left springing first. */
export function stationsOf(pieces: readonly Piece[], count: number, joints: 'radial' | 'vertical'): Station[] {
  const total = pieces.reduce((sum, { length }) => sum + length, 0);
  const stations: Station[] = [];
  for (let i = 0; i <= count; i++) {
    const square = stationAtLength(pieces, (total * i) / count);
    stations.push(joints === 'vertical' && i > 0 && i < count ? plumb(pieces, square) : square);
  }
  return stations;
}

/** The joint that stands square at `length` metres along the intrados. */
export function stationAtLength(pieces: readonly Piece[], length: number): Station {
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
export function plumb(pieces: readonly Piece[], square: Station): Station {
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
