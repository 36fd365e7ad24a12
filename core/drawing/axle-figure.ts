/** The load factor of an axle against its place as it crosses, with the place where it is least. */
import type { AxleEnvelope, AxlePlace } from '../assess/long-questions.ts';
import { figure } from '../quantity/figures.ts';
import { circle, stroke } from './path.ts';
import { FIGURE_SIZE, Plot, roundOver, type FigureSize } from './plot.ts';
import { makeScene, type Scene } from './scene.ts';

/** Factors beyond this many times the least are off the figure: the least is what matters. */
const TALLEST = 4;
/** The line at which the axle itself is just held would lie on the axis of a figure taller than this. */
const TALLEST_WITH_LIMIT = 20;

export function axleFigure(envelope: AxleEnvelope, size: FigureSize = FIGURE_SIZE): Scene {
  const { places, worst } = envelope;
  const least = worst?.factor ?? 1;
  const reach = Math.max(...places.map(({ x }) => Math.abs(x)), 1e-3);
  const half = reach * (1 + 0.5 / Math.max(1, places.length));
  const greatest = Math.max(least, ...places.map(({ factor }) => Math.min(factor ?? 0, TALLEST * least)));
  const top = roundOver(Math.max(greatest, 1));
  const plot = new Plot(
    size,
    { from: -half, to: half, name: 'place of the axle, m' },
    { from: 0, to: top, name: 'load factor' },
  );
  for (const run of runsUnder(places, top)) plot.line('curve', 'curve', run);
  if (top <= TALLEST_WITH_LIMIT) {
    const [left, right] = [plot.at(-half, 1), plot.at(half, 1)];
    plot.put('curve', stroke('curve-limit', left, right));
    plot.places.block([left, right]);
  }
  if (worst !== null) {
    const at = plot.at(worst.x, least);
    plot.put('curve', circle('curve-mark', at, 0.9));
    plot.letter(wordsOf(worst.x, least), at, least < 1 ? 'text-fails' : 'text');
  } else {
    plot.letter('no place has a limit', plot.at(0, top / 2), 'text-quiet');
  }
  const description =
    worst === null
      ? 'The ring holds any multiple of this axle wherever it stands.'
      : `The load factor is ${wordsOf(worst.x, least)}.`;
  return makeScene({ title: 'Axle crossing', description, millimetresPerUnit: 1 }, plot.items);
}

const wordsOf = (x: number, factor: number): string => `least ${figure(factor)} at x = ${figure(x)} m`;

/** Stretches of the curve under the top of the figure, cut where they pass it. */
function runsUnder(places: readonly AxlePlace[], top: number): [number, number][][] {
  const runs: [number, number][][] = [];
  let open = false;
  places.forEach(({ x, factor }, i) => {
    const before = places[i - 1];
    const crossing = crossingAt(before, { x, factor }, top);
    if (factor === null || factor > top) {
      if (open && crossing !== null) runs.at(-1)!.push(crossing);
      open = false;
      return;
    }
    if (!open) runs.push(crossing === null ? [] : [crossing]);
    runs.at(-1)!.push([x, factor]);
    open = true;
  });
  return runs;
}

/** Where the line between two places passes the top, one of them over it and one under. */
function crossingAt(
  a: AxlePlace | undefined,
  b: Pick<AxlePlace, 'x' | 'factor'>,
  top: number,
): [number, number] | null {
  if (a === undefined || a.factor === null || b.factor === null) return null;
  if (a.factor > top === b.factor > top) return null;
  return [a.x + ((top - a.factor) / (b.factor - a.factor)) * (b.x - a.x), top];
}
