/** The two faces of the ring as pairs of curves, and how a joint crosses from one to the other. */
import type { Profile } from '../job/schema.ts';
import { ProblemError } from '../job/problem.ts';
import type { Curve, OffsettableCurve } from './curve.ts';
import { flatFaces } from './flat.ts';
import { measuredFaces } from './measured.ts';
import type { Point } from './point.ts';
import { intradosCurves } from './profile.ts';

export interface Piece {
  readonly intrados: Curve;
  readonly extrados: Curve;
  /** The extrados parameter of the joint that stands square on the intrados at u, or as the shape's joints run. */
  readonly across: (u: number) => number;
  /** Length of the intrados, m. */
  readonly length: number;
  /** Where the extrados really begins and ends: at an apex it runs on, or stops short, to meet its neighbour. */
  readonly extradosFrom: number;
  readonly extradosTo: number;
}

/** @throws RangeError when there is no such piece. */
export function pieceAt(pieces: readonly Piece[], index: number): Piece {
  const piece = pieces[index];
  if (piece === undefined) throw new RangeError(`no piece ${index} among ${pieces.length}`);
  return piece;
}

/** Ring thickness in metres at the crown and at both springings; it changes evenly along the intrados between them. */
export interface Thickness {
  readonly crown: number;
  readonly springing: number;
}

/** Distance, as a share of the thickness, under which two ends of the extrados count as joined. */
const JOINED = 1e-12;

/** @throws ProblemError when the profile cannot be built or the ring is too thick for its curvature. */
export function ringPieces(profile: Profile, thickness: Thickness): Piece[] {
  if (profile.shape === 'flat') return joined([flatFaces(profile, thickness.crown)]);
  if (profile.shape === 'measured' && profile.extrados) return joined([measuredFaces(profile, profile.extrados)]);
  const curves = intradosCurves(profile);
  refuseTooThick(curves, Math.max(thickness.crown, thickness.springing));
  return joined(
    thickness.crown === thickness.springing ? evenPieces(curves, thickness.crown) : taperedPieces(curves, thickness),
  );
}

function refuseTooThick(curves: readonly OffsettableCurve[], thickness: number): void {
  const first = curves[0] as OffsettableCurve;
  const last = curves[curves.length - 1] as OffsettableCurve;
  const left = first.at(first.from);
  const right = last.at(last.to);
  const top = Math.max(...curves.map((curve) => curve.at(curve.highest(curve.from, curve.to)).y));
  const a = (right.x - left.x) / 2;
  const rise = top - (left.y + right.y) / 2;
  const radius = Math.min((a * a + rise * rise) / (2 * rise), ...curves.map((curve) => curve.hollowRadius));
  if (rise > 0 && thickness < radius) return;
  throw new ProblemError([
    rise > 0
      ? {
          path: 'ring.thickness',
          value: `${thickness} m`,
          wrong: 'the ring is thicker than the radius of its intrados',
          right: `less than ${Number(radius.toPrecision(4))} m here`,
        }
      : {
          path: 'profile',
          value: `crown ${Number(rise.toPrecision(4))} m over the springings`,
          wrong: 'the intrados does not rise above its springings',
          right: 'give a crown above the line between the springings',
        },
  ]);
}

type Faces = Pick<Piece, 'intrados' | 'extrados' | 'across'>;

const sameParameter = (u: number): number => u;

function evenPieces(curves: readonly OffsettableCurve[], thickness: number): Faces[] {
  return curves.map((intrados) => ({
    intrados,
    extrados: intrados.offset({ atStart: thickness, rate: 0 }),
    across: sameParameter,
  }));
}

function taperedPieces(curves: readonly OffsettableCurve[], { crown, springing }: Thickness): Faces[] {
  const half = curves.reduce((sum, curve) => sum + curve.length(curve.from, curve.to), 0) / 2;
  const rate = (crown - springing) / half;
  const pieces: Faces[] = [];
  let start = 0;
  for (const curve of curves) {
    const length = curve.length(curve.from, curve.to);
    const end = start + length;
    const add = (part: OffsettableCurve, from: number): void => {
      const rising = from < half * (1 - JOINED);
      const atStart = crown - rate * Math.abs(half - from);
      const extrados = part.offset({ atStart, rate: rising ? rate : -rate });
      pieces.push({ intrados: part, extrados, across: sameParameter });
    };
    if (start < half * (1 - JOINED) && end > half * (1 + JOINED)) {
      const middle = curve.parameterAtLength(half - start);
      add(curve.part(curve.from, middle), start);
      add(curve.part(middle, curve.to), half);
    } else {
      add(curve, start);
    }
    start = end;
  }
  return pieces;
}

function joined(faces: readonly Faces[]): Piece[] {
  const pieces = faces.map((face) => ({
    ...face,
    length: face.intrados.length(face.intrados.from, face.intrados.to),
    extradosFrom: face.extrados.from,
    extradosTo: face.extrados.to,
  }));
  for (let i = 0; i + 1 < pieces.length; i++) {
    const left = pieces[i] as (typeof pieces)[number];
    const right = pieces[i + 1] as (typeof pieces)[number];
    const meeting = whereTheyMeet(left.extrados, right.extrados);
    left.extradosTo = meeting.left;
    right.extradosFrom = meeting.right;
  }
  return pieces;
}

/** Parameters at which the left curve, carried on past its end, meets the right one carried back: Newton in two unknowns. */
function whereTheyMeet(left: Curve, right: Curve): { left: number; right: number } {
  let u = left.to;
  let v = right.from;
  const scale = Math.max(1e-3, size(left.at(u)));
  for (let step = 0; step < 50; step++) {
    const a = left.at(u);
    const b = right.at(v);
    const gapX = b.x - a.x;
    const gapY = b.y - a.y;
    if (Math.hypot(gapX, gapY) <= JOINED * scale) break;
    const da = left.derivative(u);
    const db = right.derivative(v);
    const determinant = db.x * da.y - da.x * db.y;
    u += (db.x * gapY - gapX * db.y) / determinant;
    v += (da.x * gapY - gapX * da.y) / determinant;
  }
  return { left: u, right: v };
}

const size = (point: Point): number => Math.hypot(point.x, point.y);
