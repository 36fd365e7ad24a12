/** Answers of the questions as sentences. Lengths in m, forces in kN. */
import type { Excursion } from '../../core/assess/questions.ts';
import { figure, metres } from '../../core/quantity/figures.ts';
import type { Hinge } from '../../core/statics/hinge.ts';
import type { MovementAnswer } from '../../core/statics/support-movement.ts';

/** Millimetres as one writes a gap: tenths below ten. */
export function millimetres(length: number): string {
  const mm = length * 1_000;
  return `${Math.abs(mm) < 10 ? (Math.round(mm * 10) / 10).toFixed(1) : String(Math.round(mm))} mm`.replace(
    '-',
    '\u2212',
  );
}

const MOST_NAMED = 4;

/** Where a line leaves the ring and by how much, the furthest first; empty where it stays within. */
export function excursionsInWords(outside: readonly Excursion[]): string {
  if (outside.length === 0) return '';
  const worst = [...outside].sort((p, q) => q.by - p.by);
  const named = worst
    .slice(0, MOST_NAMED)
    .map(({ joint, side, by }) => `joint ${joint} by ${millimetres(by)} beyond the ${side}`);
  const left = worst.length - named.length;
  const rest = left > 0 ? `, and at ${left} more` : '';
  return `The line leaves the ring at ${named.join(', ')}${rest}.`;
}

/** What the ring makes of a movement that opens nothing. */
export function unopenedInWords(answer: MovementAnswer | null): string {
  if (answer === null) return 'Nothing moves yet.';
  if (answer.kind === 'no-line') return 'The ring does not stand as it is, so it cannot follow a movement.';
  if (answer.kind === 'locked') {
    return 'The movement drives the ring against its supports, and without crushing it can push without limit: no joint opens.';
  }
  return 'No joint opens.';
}

export const hingeInWords = ({ joint, side }: Hinge): string =>
  `joint ${joint}, opening at the ${side === 'intrados' ? 'extrados' : 'intrados'}`;

export function placeInWords(x: number): string {
  if (Math.abs(x) < 0.0005) return 'at mid-span';
  return `${metres(Math.abs(x))} m ${x < 0 ? 'left' : 'right'} of mid-span`;
}

export const percent = (share: number): string => `${figure(100 * share, 2)}\u00a0%`;
