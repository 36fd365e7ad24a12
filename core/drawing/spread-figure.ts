/** Thrust against the spread of the springings, to the place where the ring falls. */
import type { SpreadAnswer } from '../assess/assessment.ts';
import { figure } from '../quantity/figures.ts';
import { circle, stroke } from './path.ts';
import { FIGURE_SIZE, Plot, roundOver, type FigureSize } from './plot.ts';
import { makeScene, type Scene } from './scene.ts';

const millimetres = (metres: number): string => `${figure(metres * 1000)} mm`;
const kilonewtons = (force: number): string => `${figure(force)} kN`;

/** @param at a spread to mark on the curve, m, such as that of a slider. */
export function spreadFigure(answer: SpreadAnswer, size: FigureSize = FIGURE_SIZE, at?: number): Scene {
  const { curve, collapse, furthest } = answer;
  const thrusts = curve.map(({ horizontal }) => horizontal);
  const plot = new Plot(
    size,
    { from: 0, to: roundOver((collapse ?? furthest) * 1000), name: 'spread of the springings, mm' },
    { from: 0, to: roundOver(Math.max(...thrusts, 0)), name: 'least thrust, kN' },
  );
  plot.line(
    'curve',
    'curve',
    curve.map(({ spread, horizontal }) => [spread * 1000, horizontal]),
  );
  const first = curve[0];
  const last = curve.at(-1);
  if (first !== undefined && last !== undefined) {
    const end = plot.at(last.spread * 1000, last.horizontal);
    const start = plot.at(0, first.horizontal);
    if (collapse !== null) {
      plot.put('curve', stroke('curve-limit', plot.at(collapse * 1000, 0), end), circle('curve-mark', end, 0.9));
      plot.places.block([plot.at(collapse * 1000, 0), end]);
    }
    const words =
      collapse === null
        ? `still stands at ${millimetres(furthest)}, ${kilonewtons(last.horizontal)}`
        : `falls at ${millimetres(collapse)}, ${kilonewtons(last.horizontal)}`;
    plot.letter(words, end, collapse === null ? 'text-quiet' : 'text-fails');
    plot.letter(`now ${kilonewtons(first.horizontal)}`, start, 'text-force');
  }
  markAt(plot, curve, at);
  return makeScene({ title: 'Spread left', description: descriptionOf(answer), millimetresPerUnit: 1 }, plot.items);
}

function markAt(plot: Plot, curve: SpreadAnswer['curve'], at: number | undefined): void {
  if (at === undefined) return;
  const next = curve.findIndex(({ spread }) => spread >= at);
  const b = curve[next];
  const a = curve[next - 1] ?? b;
  if (a === undefined || b === undefined) return;
  const share = b.spread === a.spread ? 0 : (at - a.spread) / (b.spread - a.spread);
  const horizontal = a.horizontal + share * (b.horizontal - a.horizontal);
  plot.put('curve', circle('load-head', plot.at(at * 1000, horizontal), 0.9));
}

function descriptionOf({ collapse, furthest, curve }: SpreadAnswer): string {
  const now = curve[0] === undefined ? '' : ` The least thrust now is ${kilonewtons(curve[0].horizontal)}.`;
  return collapse === null
    ? `The ring still stands when its springings have parted by ${millimetres(furthest)}.${now}`
    : `The ring falls when its springings have parted by ${millimetres(collapse)}.${now}`;
}
