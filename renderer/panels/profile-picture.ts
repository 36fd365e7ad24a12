/** Small pictures of the shapes, drawn by the same geometry as the arch on the board. */
import { bodyOutline } from '../../core/drawing/faces.ts';
import { outlined, stroke } from '../../core/drawing/path.ts';
import type { SceneItem } from '../../core/drawing/scene.ts';
import { buildRing } from '../../core/geometry/ring.ts';
import { usualVoussoirs } from '../../core/job/defaults.ts';
import { spanOf, type DrawnShape } from '../../core/job/edits.ts';
import { freshScheme } from '../../core/job/fresh.ts';
import type { Profile } from '../../core/job/schema.ts';

/** Fewer and thicker stones than a real ring has, so that they can be told apart at the size of a stamp. */
const VOUSSOIRS_SHOWN = 0.6;
const THICKNESS_SHOWN = 0.16;

const pictures = new Map<DrawnShape, SceneItem[]>();

/** The shape in its usual proportions. */
export function shapePicture(shape: DrawnShape): SceneItem[] {
  const kept = pictures.get(shape);
  if (kept !== undefined) return kept;
  const { profile } = freshScheme(shape);
  const picture = drawn(profile, THICKNESS_SHOWN * spanOf(profile));
  pictures.set(shape, picture);
  return picture;
}

function drawn(profile: Profile, thickness: number): SceneItem[] {
  const usual = usualVoussoirs(profile.shape);
  const voussoirs = 2 * Math.round((usual * VOUSSOIRS_SHOWN) / 2) + (usual % 2);
  const ring = buildRing({
    profile,
    thickness: { crown: thickness, springing: thickness },
    voussoirs,
    joints: 'radial',
  });
  const outline = bodyOutline(ring, 0, ring.blocks.length);
  return [
    outlined('stone', outline),
    ...ring.joints.map(({ intrados, extrados }) => stroke('joint', intrados, extrados)),
    outlined('ring-edge', outline),
  ];
}
