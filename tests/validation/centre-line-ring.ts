/**
 * Rings whose loads act on the centre line, as the published solutions take them. Built by hand, so that these tests
 * rest on the statics alone: joints square to the centre line, one downward force a block.
 */
import type { Block, Joint, Point } from '../../core/assess/assessment.ts';

export interface HandBuiltRing {
  readonly joints: readonly Joint[];
  readonly blocks: readonly Block[];
}

/** A joint of length t about a point of the centre line, across the direction of the line there. */
export function jointAcross({ x, y }: Point, direction: Point, t: number): Joint {
  const size = Math.hypot(direction.x, direction.y);
  const outwards = { x: -direction.y / size, y: direction.x / size };
  return {
    intrados: { x: x - (t / 2) * outwards.x, y: y - (t / 2) * outwards.y },
    extrados: { x: x + (t / 2) * outwards.x, y: y + (t / 2) * outwards.y },
  };
}

export const weightAt = (at: Point, weight: number): Block => ({
  forces: [{ ...at, fx: 0, fy: -weight, from: 'self-weight' }],
});

/** A semicircle of mid-ring radius 1 m in n blocks; its weight, 1 kN a metre of centre line, at the centroid of each arc. */
export function semicircleOnCentreLine(n: number, t: number): HandBuiltRing {
  const step = Math.PI / n;
  const lever = Math.sin(step / 2) / (step / 2);
  const onCircle = (angle: number, radius: number): Point => ({
    x: -radius * Math.cos(angle),
    y: radius * Math.sin(angle),
  });
  return {
    joints: Array.from({ length: n + 1 }, (_, j) => {
      const angle = j * step;
      return jointAcross(onCircle(angle, 1), { x: Math.sin(angle), y: Math.cos(angle) }, t);
    }),
    blocks: Array.from({ length: n }, (_, k) => weightAt(onCircle((k + 0.5) * step, lever), step)),
  };
}
