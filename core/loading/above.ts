/** What stands on the back of the ring: wall or fill, backing, layers, openings, and the side pressure of fill. */
import { centroid, lineMoments, type Moments } from '../geometry/moments.ts';
import type { RingGeometry } from '../geometry/ring.ts';
import type { SkyFace } from '../geometry/ring-blocks.ts';
import type { ResolvedAbove, ResolvedBacking } from '../job/defaults.ts';
import type { Problem } from '../job/problem.ts';
import type { BlockForces } from './forces.ts';
import type { Sky } from './sky.ts';
import { addEvenly } from './strips.ts';

/** Every force made here is printed as coming from `above`. */
const ABOVE = 'above';

/** What stands between the back of the ring and a level top at `top` (m). `unitWeight` kN/m³, `breadth` m. */
export function addColumns(forces: BlockForces, sky: Sky, top: number, unitWeight: number, breadth: number): void {
  if (unitWeight === 0) return;
  for (const k of sky.open) {
    const face = sky.faces[k];
    if (face) addColumn(forces, k, face, top, unitWeight * breadth);
  }
}

/** Backing up to its level, in place of the fill there or on the bare ring: `instead` is the unit weight it replaces. */
export function addBacking(
  forces: BlockForces,
  ring: RingGeometry,
  backing: ResolvedBacking,
  instead: number,
  breadth: number,
): void {
  ring.blocks.forEach((_, k) => {
    for (const face of ring.skyFacesBelow(k, backing.level)) {
      addColumn(forces, k, face, backing.level, (backing.unitWeight - instead) * breadth);
    }
  });
}

function addColumn(forces: BlockForces, block: number, face: SkyFace, top: number, weightPerArea: number): void {
  const column = columnMoments(face, top);
  if (!(column.area > 0) || weightPerArea === 0) return;
  const { x, y } = centroid(column, face.origin);
  forces[block]?.push({ x, y, fx: 0, fy: -column.area * weightPerArea, from: ABOVE });
}

/** The column between a stretch of the back and the level top: along the back, up, back along the top, down. */
function columnMoments(face: SkyFace, top: number): Moments {
  const { origin } = face;
  const right = { x: face.to.x, y: top };
  const left = { x: face.from.x, y: top };
  const parts = [
    face.moments,
    lineMoments(face.to, right, origin),
    lineMoments(right, left, origin),
    lineMoments(left, face.from, origin),
  ];
  return {
    area: parts.reduce((sum, part) => sum + part.area, 0),
    sx: parts.reduce((sum, part) => sum + part.sx, 0),
    sy: parts.reduce((sum, part) => sum + part.sy, 0),
  };
}

/** Layers lie level over the whole ring. */
export function addLayers(forces: BlockForces, sky: Sky, layers: ResolvedAbove['layers'], breadth: number): void {
  for (const { thickness, unitWeight } of layers) {
    addEvenly(forces, sky, sky.left.x, sky.right.x, thickness * unitWeight * breadth, ABOVE);
  }
}

export const layersHeight = (layers: ResolvedAbove['layers']): number =>
  layers.reduce((sum, { thickness }) => sum + thickness, 0);

/** Takes the weight of each opening off the blocks beneath it; paths of problems from `above`. */
export function takeOutOpenings(
  forces: BlockForces,
  sky: Sky,
  { openings, unitWeight }: ResolvedAbove,
  top: number,
  breadth: number,
): Problem[] {
  return openings.flatMap(({ from, to, sill, head }, i): Problem[] => {
    const path = `openings[${i}]`;
    if (!(from < to) || !(sill < head)) {
      return [
        {
          path,
          value: `${from} to ${to}, ${sill} to ${head} m`,
          wrong: 'the opening has no size',
          right: 'let it end after it begins and its head stand over its sill',
        },
      ];
    }
    const back = highestBack(sky, from, to);
    if (sill < back || head > top) {
      return [
        {
          path,
          value: `sill ${sill} m, head ${head} m`,
          wrong: 'the opening does not lie within what stands above the ring',
          right: `between ${Number(back.toPrecision(4))} and ${Number(top.toPrecision(4))} m there`,
        },
      ];
    }
    const perMetre = (head - sill) * unitWeight * breadth;
    addEvenly(forces, sky, from, to, -perMetre, ABOVE, (sill + head) / 2);
    return [];
  });
}

/** The highest point of the back between two places, from the ends of the blocks there: at most a block's rise too high. */
function highestBack(sky: Sky, from: number, to: number): number {
  let highest = -Infinity;
  for (const block of sky.open) {
    const face = sky.faces[block];
    if (face && face.to.x > from && face.from.x < to) highest = Math.max(highest, face.from.y, face.to.y);
  }
  return highest;
}

/**
 * Horizontal pressure of fill on the back: `coefficient` times the vertical pressure at each depth, on the height of
 * the back alone, so that each side is pushed towards the crown. At its own centre of pressure.
 */
export function addSidePressure(
  forces: BlockForces,
  sky: Sky,
  top: number,
  coefficient: number,
  unitWeight: number,
  breadth: number,
): void {
  const scale = coefficient * unitWeight * breadth;
  if (scale === 0) return;
  for (const k of sky.open) {
    const face = sky.faces[k];
    if (!face) continue;
    // ∫ (top − y) dy and ∫ y (top − y) dy up the back
    const [a, b] = [face.from.y, face.to.y];
    const pressure = top * (b - a) - (b * b - a * a) / 2;
    const moment = (top * (b * b - a * a)) / 2 - (b ** 3 - a ** 3) / 3;
    if (pressure === 0) continue;
    forces[k]?.push({
      x: (face.from.x + face.to.x) / 2,
      y: moment / pressure,
      fx: scale * pressure,
      fy: 0,
      from: ABOVE,
    });
  }
}
