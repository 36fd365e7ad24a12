/**
 * Friction of the joints: |shear| ≤ μ · normal. Rows of this kind treat sliding as if the joint opened while it slides
 * (associated flow), so where one governs, the answer is not guaranteed for real friction (Drucker 1954; from memory).
 */
import type { Rows } from './hinge-simplex.ts';
import { jointLengths, normalForms, shearForms } from './joint-forms.ts';
import { leastRatio, type JointForms } from './ratio.ts';
import { lineRows } from './rows.ts';
import type { RingSystem } from './system.ts';

/** Two rows a joint: 2j, shear towards the intrados, and 2j + 1, towards the extrados, each at most μ · normal. */
export function slidingRows(system: RingSystem, friction: number): Rows {
  const normal = normalForms(system);
  const shear = shearForms(system);
  const count = 2 * system.joints;
  const a = new Float64Array(3 * count);
  const b = new Float64Array(count);
  for (let j = 0; j < system.joints; j++) {
    for (let side = 0; side < 2; side++) {
      const sign = side === 0 ? 1 : -1;
      const row = 2 * j + side;
      for (let k = 0; k < 3; k++) a[3 * row + k] = formAt(normal, j, k) * friction + sign * formAt(shear, j, k);
      b[row] = -(friction * (normal.b[j] as number) + sign * (shear.b[j] as number));
    }
  }
  return { unknowns: 3, count, a, b };
}

const formAt = (forms: JointForms, j: number, k: number): number => forms.a[3 * j + k] as number;

export interface NeededFriction {
  /** The least coefficient of friction with which a line in the ring obeys sliding at every joint. */
  readonly coefficient: number;
  /** Joints at which that line is about to slide, left to right. */
  readonly joints: readonly number[];
}

/** The friction that the ring needs, or null when no line fits in it at all. */
export function neededFriction(system: RingSystem): NeededFriction | null {
  const least = leastRatio(shearForms(system), normalForms(system), jointLengths(system), lineRows(system));
  if (least === null) return null;
  const sliding = least.basis.filter(({ row, y }) => row < 2 * system.joints && y > 0).map(({ row }) => row >> 1);
  return { coefficient: least.ratio, joints: [...new Set(sliding)].sort((i, j) => i - j) };
}
