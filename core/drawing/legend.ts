/** The legend: what is on the drawing and nothing else, each in the very pens that draw it. */
import type { SchemeAssessment } from '../assess/assessment.ts';
import type { ResolvedScheme } from '../job/defaults.ts';
import type { Point } from '../geometry/point.ts';
import type { Column } from './column.ts';
import { hatchLines } from './hatch.ts';
import { arrowhead, circle, lettering, polygon, stroke } from './path.ts';
import type { Lettering, SceneItem } from './scene.ts';
import type { Role } from './style.ts';

/** mm */
const SWATCH = 14;
const ROW = 4.4;
const HEADING = 6;

export interface LegendEntry {
  readonly words: string;
  /** Drawn in a box SWATCH wide and ROW high round the origin. */
  readonly swatch: readonly SceneItem[];
}

/** Room that the legend needs, mm. */
export const legendHeight = (scheme: ResolvedScheme, assessment: SchemeAssessment): number =>
  HEADING + ROW * legendEntries(scheme, assessment).length;

export function drawLegend(
  column: Column,
  scheme: ResolvedScheme,
  assessment: SchemeAssessment,
  letters: Lettering,
): void {
  const entries = legendEntries(scheme, assessment);
  column.heading('legend', 'Legend');
  for (const { words, swatch } of entries) {
    const centre = { x: column.left + SWATCH / 2, y: column.top - ROW / 2 };
    column.put('legend', ...swatch.map((item) => shifted(item, centre)));
    column.put(
      'legend',
      lettering(words, { x: column.left + SWATCH + 2.5, y: centre.y - letters / 2 }, { height: letters }),
    );
    column.space(ROW);
  }
}

export function legendEntries(
  { loads }: ResolvedScheme,
  { thrust, reactions, mechanism }: SchemeAssessment,
): LegendEntry[] {
  const { least, greatest } = thrust;
  const moving = mechanism !== null && mechanism !== undefined && mechanism.hinges.length > 0;
  return [
    ...(least ? [{ words: 'Line of least thrust', swatch: [level('thrust-least')] }] : []),
    ...(greatest ? [{ words: 'Line of greatest thrust', swatch: [level('thrust-greatest')] }] : []),
    ...(least && greatest ? [{ words: 'Between least and greatest', swatch: band() }] : []),
    ...(least ? [{ words: 'Hinge at least thrust', swatch: wedge('hinge-least') }] : []),
    ...(greatest ? [{ words: 'Hinge at greatest thrust', swatch: wedge('hinge-greatest') }] : []),
    ...(moving ? [{ words: 'Hinge of the mechanism', swatch: wedge('hinge-mechanism') }] : []),
    ...(moving ? [{ words: 'First movement, enlarged', swatch: [level('ghost')] }] : []),
    ...(loads.length > 0 ? [{ words: 'Load', swatch: pointer('load', 'load-head', 3) }] : []),
    ...(reactions ? [{ words: 'Reaction at least thrust', swatch: pointer('reaction', 'reaction-head', 1.8) }] : []),
    { words: 'Springing line', swatch: [level('datum')] },
  ];
}

const HALF = SWATCH / 2;

const level = (role: Role): SceneItem => stroke(role, { x: -HALF, y: 0 }, { x: HALF, y: 0 });

function band(): SceneItem[] {
  const figure: [Point, ...Point[]] = [
    { x: -HALF, y: -1.6 },
    { x: HALF, y: -1.6 },
    { x: HALF, y: 1.6 },
    { x: -HALF, y: 1.6 },
  ];
  const hatching = hatchLines(figure, Math.PI / 4, 1.5).map(([from, to]) => stroke('thrust-band-hatch', from, to));
  return [polygon('thrust-band', figure), ...hatching];
}

function wedge(role: Role): SceneItem[] {
  return [
    polygon(role, [
      { x: -4, y: 0 },
      { x: 4, y: 0.9 },
      { x: 4, y: -0.9 },
    ]),
    circle(role, { x: -4, y: 0 }, 0.6),
  ];
}

const pointer = (shaft: Role, head: Role, slender: number): SceneItem[] => [
  stroke(shaft, { x: -HALF, y: 0 }, { x: HALF - 3, y: 0 }),
  arrowhead(head, { x: HALF, y: 0 }, 0, 3.2, undefined, slender),
];

function shifted(item: SceneItem, by: Point): SceneItem {
  const move = ({ x, y }: Point): Point => ({ x: x + by.x, y: y + by.y });
  if (item.kind === 'text') return { ...item, at: move(item.at) };
  const edges = item.edges.map((edge) =>
    edge.kind === 'line' ? { ...edge, to: move(edge.to) } : { ...edge, to: move(edge.to), centre: move(edge.centre) },
  );
  return { ...item, start: move(item.start), edges };
}
