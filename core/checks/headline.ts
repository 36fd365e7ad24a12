import { figure } from '../quantity/figures.ts';

export interface HeadlineFacts {
  readonly stands: boolean;
  readonly geometricSafety: number | null;
  readonly least: number | null;
  readonly greatest: number | null;
}

/** The finding as a sentence that can be read out to a client. Thrusts in kN. */
export function headline({ stands, geometricSafety, least, greatest }: HeadlineFacts): string {
  if (!stands) return 'Does not stand in compression alone: no line of thrust fits within the ring.';
  const inHand =
    geometricSafety === null
      ? 'Stands in compression alone.'
      : `Stands in compression alone; the ring is ${figure(geometricSafety)} times the least that would do.`;
  return `${inHand} ${push(least, greatest)}`;
}

function push(least: number | null, greatest: number | null): string {
  if (least === null) return 'It needs no thrust from what holds it.';
  if (greatest === null) return `It pushes at least ${figure(least)} kN on each side.`;
  return figure(least) === figure(greatest)
    ? `It pushes ${figure(least)} kN on each side.`
    : `It pushes ${figure(least)} to ${figure(greatest)} kN on each side.`;
}
