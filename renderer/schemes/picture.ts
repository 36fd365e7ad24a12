/** A scheme as a small picture: its ring, its joints and its lines of thrust. */
import type { AssessedScheme } from '../../core/assess/assess.ts';
import { boxOf, type Box } from '../../core/drawing/extent.ts';
import { bodyOutline } from '../../core/drawing/faces.ts';
import { outlined, polyline, stroke } from '../../core/drawing/path.ts';
import { itemPoints, type SceneItem } from '../../core/drawing/scene.ts';
import { unbroken } from '../../core/drawing/thrust.ts';

/** Joints nearer than this share of the picture would run together. */
const MOST_JOINTS = 40;

const pictures = new WeakMap<AssessedScheme, SceneItem[]>();

/** In metres of the arch. */
export function schemePicture(assessed: AssessedScheme): SceneItem[] {
  const kept = pictures.get(assessed);
  if (kept !== undefined) return kept;
  const { ring, result } = assessed;
  const outline = bodyOutline(ring, 0, ring.blocks.length);
  const every = Math.ceil(ring.joints.length / MOST_JOINTS);
  const joints = ring.joints.filter((_, joint) => joint % every === 0);
  const picture = [
    outlined('stone', outline),
    ...joints.map(({ intrados, extrados }) => stroke('joint', intrados, extrados)),
    outlined('ring-edge', outline),
    ...(['greatest', 'least'] as const).flatMap((state) =>
      unbroken(result.thrust[state]?.line ?? []).map((run) => polyline(`thrust-${state}`, run)),
    ),
  ];
  pictures.set(assessed, picture);
  return picture;
}

/** Round all of the pictures, so that they can be drawn at one scale and compared. */
export function boxRound(pictures: readonly (readonly SceneItem[])[]): Box {
  const points = pictures.flatMap((items) => items.flatMap((item) => itemPoints(item, 1)));
  return boxOf(points) ?? { left: 0, bottom: 0, right: 1, top: 1 };
}
