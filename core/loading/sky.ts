/**
 * The back of the ring as what lies above sees it: which block carries a plumb line at x. Everything above is cut by
 * plumb lines at the extrados ends of the joints and rests on the block beneath.
 */
import type { Point } from '../geometry/point.ts';
import type { RingGeometry } from '../geometry/ring.ts';
import type { SkyFace } from '../geometry/ring-blocks.ts';

export interface Sky {
  /** The sky-facing stretch of each block; null where a block's back faces down. */
  readonly faces: readonly (SkyFace | null)[];
  readonly left: Point;
  readonly right: Point;
  /** Block numbers whose back faces the sky, left to right. */
  readonly open: readonly number[];
}

export function skyOver(ring: RingGeometry): Sky {
  const faces = ring.blocks.map((_, k) => ring.skyFace(k));
  const open = faces.flatMap((face, k) => (face === null ? [] : [k]));
  const face = (k: number | undefined): SkyFace => {
    const found = k === undefined ? null : faces[k];
    if (!found) throw new RangeError('a ring has at least one block with its back to the sky');
    return found;
  };
  return { faces, open, left: face(open[0]).from, right: face(open[open.length - 1]).to };
}

/** Distance, as a share of the ring's width, under which a plumb line counts as standing on a joint. */
const ON_JOINT = 1e-9;

/**
 * The blocks under a plumb line at x with their shares: one block, or the two beside a joint with a half each, so that
 * a load on the crown joint of a symmetric arch stays symmetric. Empty when x is off the ring.
 */
export function blocksUnder(sky: Sky, x: number): { block: number; share: number }[] {
  const tolerance = ON_JOINT * (sky.right.x - sky.left.x);
  if (x < sky.left.x - tolerance || x > sky.right.x + tolerance) return [];
  // the last open block that begins left of x
  let low = 0;
  let high = sky.open.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if (fromOf(sky, middle) <= x) low = middle;
    else high = middle - 1;
  }
  if (low > 0 && Math.abs(x - fromOf(sky, low)) <= tolerance) return halves(sky, low);
  if (low + 1 < sky.open.length && Math.abs(x - fromOf(sky, low + 1)) <= tolerance) return halves(sky, low + 1);
  return [{ block: sky.open[low] as number, share: 1 }];
}

const fromOf = (sky: Sky, index: number): number => (sky.faces[sky.open[index] as number] as SkyFace).from.x;

const halves = (sky: Sky, index: number): { block: number; share: number }[] => [
  { block: sky.open[index - 1] as number, share: 0.5 },
  { block: sky.open[index] as number, share: 0.5 },
];

/** Height of the back at x, on the chord of the block there, m. */
export function backAt(sky: Sky, block: number, x: number): number {
  const face = sky.faces[block];
  if (!face) return NaN;
  const width = face.to.x - face.from.x;
  const share = width === 0 ? 0.5 : Math.min(1, Math.max(0, (x - face.from.x) / width));
  return face.from.y + share * (face.to.y - face.from.y);
}
