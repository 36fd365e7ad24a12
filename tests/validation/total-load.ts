import type { Block } from '../../core/assess/assessment.ts';

/** The sizes of all forces on the ring added up, kN: the measure that differences of thrust are held against. */
export function totalLoad(blocks: readonly Block[]): number {
  return blocks.reduce((sum, { forces }) => sum + forces.reduce((part, { fx, fy }) => part + Math.hypot(fx, fy), 0), 0);
}
