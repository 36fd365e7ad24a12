import { figure, safetyFigure } from '../quantity/figures.ts';

export interface HeadlineFacts {
  readonly stands: boolean;
  readonly geometricSafety: number | null;
  readonly least: number | null;
  readonly greatest: number | null;
  /** Whether both springings feel the same thrust; sideways forces make them differ. */
  readonly alike: boolean;
}

/** The finding as a sentence that can be read out to a client. Thrusts in kN. */
export function headline({ stands, geometricSafety, least, greatest, alike }: HeadlineFacts): string {
  if (!stands) return 'Does not stand in compression alone: no line of thrust fits within the ring.';
  const inHand =
    geometricSafety === null
      ? 'Stands in compression alone.'
      : `Stands in compression alone; the ring is ${safetyFigure(geometricSafety)} times the least that would do.`;
  return `${inHand} ${push(least, greatest, alike ? 'on each side' : 'on the left side')}`;
}

function push(least: number | null, greatest: number | null, where: string): string {
  if (least === null) return 'It needs no thrust from what holds it.';
  if (greatest === null) return `It pushes at least ${figure(least)} kN ${where}.`;
  return figure(least) === figure(greatest)
    ? `It pushes ${figure(least)} kN ${where}.`
    : `It pushes ${figure(least)} to ${figure(greatest)} kN ${where}.`;
}
