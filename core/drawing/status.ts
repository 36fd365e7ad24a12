/** A status as a mark that can be told without its colour, and as a word. */
import type { Status } from '../assess/assessment.ts';
import type { Point } from '../geometry/point.ts';
import { circle, polygon } from './path.ts';
import type { SceneItem } from './scene.ts';
import type { Role } from './style.ts';

/** Holds is a filled square, narrow a half-filled diamond, fails an open triangle, unknown a dotted ring. */
export function statusMark(status: Status, centre: Point, size: number): SceneItem[] {
  const half = size / 2;
  const at = (x: number, y: number): Point => ({ x: centre.x + x * half, y: centre.y + y * half });
  switch (status) {
    case 'holds':
      return [polygon('mark-holds', [at(-0.9, -0.9), at(0.9, -0.9), at(0.9, 0.9), at(-0.9, 0.9)])];
    case 'narrow':
      return [
        polygon('mark-narrow-half', [at(0, -1.15), at(0, 1.15), at(-1.15, 0)]),
        polygon('mark-narrow', [at(-1.15, 0), at(0, -1.15), at(1.15, 0), at(0, 1.15)]),
      ];
    case 'fails':
      return [polygon('mark-fails', [at(-1.1, -0.95), at(1.1, -0.95), at(0, 1.05)])];
    case 'unknown':
      return [circle('mark-unknown', centre, half)];
  }
}

export const STATUS_ROLES: Readonly<Record<Status, Role>> = {
  holds: 'text-holds',
  narrow: 'text-narrow',
  fails: 'text-fails',
  unknown: 'text-quiet',
};
