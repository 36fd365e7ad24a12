import type { CrackMark } from '../checks/crack-reading.ts';
import type { Joint } from '../geometry/stations.ts';
import type { Crack } from '../job/schema.ts';

/** Crack marks on joint numbers: a mark placed along the intrados goes to the nearest joint. */
export function marksOf(cracks: readonly Crack[], joints: readonly Joint[]): CrackMark[] {
  return cracks.flatMap(({ joint, along, face, width }): CrackMark[] => {
    const number = joint ?? (along === undefined ? undefined : Math.round(along * (joints.length - 1)));
    if (number === undefined || number >= joints.length) return [];
    return [{ joint: number, face, width: width ?? null }];
  });
}
