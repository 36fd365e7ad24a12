/** The legend: what is on the drawing and nothing else, each in the very pens that draw it. */
import type { SchemeAssessment } from '../assess/assessment.ts';
import type { ResolvedScheme } from '../job/defaults.ts';
import type { Point } from '../geometry/point.ts';
import type { Column } from './column.ts';
import { crackMark } from './cracks.ts';
import { hatchLines } from './hatch.ts';
import { arrowhead, circle, lettering, polygon, rectangle, shifted, stroke } from './path.ts';
import type { Lettering, PathItem, SceneItem } from './scene.ts';
import type { Role } from './style.ts';
import { cutToWidth, plainText } from './text.ts';

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
export const legendHeight = (entries: readonly LegendEntry[]): number => HEADING + ROW * entries.length;

export function drawLegend(column: Column, entries: readonly LegendEntry[], letters: Lettering): void {
  column.heading('legend', 'Legend');
  for (const { words, swatch } of entries) {
    const centre = { x: column.left + SWATCH / 2, y: column.top - ROW / 2 };
    column.put('legend', ...swatch.map((item) => shifted(item, centre)));
    column.put(
      'legend',
      lettering(
        cutToWidth(plainText(words), column.width - SWATCH - 2.5, letters),
        { x: column.left + SWATCH + 2.5, y: centre.y - letters / 2 },
        { height: letters },
      ),
    );
    column.space(ROW);
  }
}

/** What is laid over the elevation and wants explaining. */
export interface LegendOverlays {
  readonly chosen?: boolean;
  readonly moved?: boolean;
  /** Name of the scheme laid over this one. */
  readonly other?: string | undefined;
}

export function legendEntries(
  resolved: ResolvedScheme,
  assessment: SchemeAssessment,
  { chosen = false, moved = false, other }: LegendOverlays = {},
): LegendEntry[] {
  return [
    ...(moved ? movedEntries() : stateEntries(assessment)),
    ...(chosen ? [{ words: 'Chosen line of thrust', swatch: [level('thrust-chosen')] }] : []),
    ...(chosen ? [{ words: 'Where it leaves the ring', swatch: outside() }] : []),
    ...(other === undefined || moved ? [] : otherEntries(other)),
    ...schemeEntries(resolved),
    ...(assessment.reactions && !moved
      ? [{ words: 'Reaction at least thrust', swatch: pointer('reaction', 'reaction-head', 1.8) }]
      : []),
    { words: 'Springing line', swatch: [level('datum')] },
  ];
}

const movedEntries = (): LegendEntry[] => [
  { words: 'Joint that opens, in contact at the dot', swatch: wedge('opening-gap', 'hinge-mechanism') },
  { words: 'Ring before the movement', swatch: [level('as-it-was')] },
];

/** Which of its lines are there is seen from the board; the pens are explained together. */
const otherEntries = (name: string): LegendEntry[] => [
  { words: `${name}: outline of the ring`, swatch: [level('other-outline')] },
  { words: `${name}: line of least thrust`, swatch: [level('other-least')] },
  { words: `${name}: line of greatest thrust`, swatch: [level('other-greatest')] },
];

function stateEntries({ thrust, mechanism }: SchemeAssessment): LegendEntry[] {
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
  ];
}

function schemeEntries({ loads, ring, backing, above, cracks }: ResolvedScheme): LegendEntry[] {
  const openings = above.kind !== 'none' && above.openings.length > 0;
  return [
    ...(cracks.length > 0 ? [{ words: 'Opening seen, at the face that gapes', swatch: crack() }] : []),
    ...(ring.lostMortar.length > 0 ? [{ words: 'Mortar lost from the joint', swatch: slot() }] : []),
    ...(backing?.counts === 'weight' ? [{ words: 'Backing, weight only', swatch: block(backingHatch) }] : []),
    ...(backing?.counts === 'masonry' ? [{ words: 'Backing, counted as masonry', swatch: block(backingBond) }] : []),
    ...(backing?.counts === 'masonry'
      ? [{ words: 'Joint taken on through backing', swatch: [level('joint-onward')] }]
      : []),
    ...(openings ? [{ words: 'Opening through the wall', swatch: hole() }] : []),
    ...(loads.length > 0 ? [{ words: 'Load', swatch: pointer('load', 'load-head', 3) }] : []),
    ...(loads.some(({ kind }) => kind === 'axle')
      ? [{ words: 'Spread of an axle load', swatch: [level('load-spread')] }]
      : []),
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

function wedge(role: Role, contact: Role = role): SceneItem[] {
  return [
    polygon(role, [
      { x: -4, y: 0 },
      { x: 4, y: 0.9 },
      { x: 4, y: -0.9 },
    ]),
    circle(contact, { x: -4, y: 0 }, 0.6),
  ];
}

const box = (role: Role): PathItem => rectangle(role, -HALF, -1.7, SWATCH, 3.4);

const block = (fill: (figure: PathItem) => SceneItem[]): SceneItem[] => [...fill(box('backing')), box('swatch-edge')];

const cornersOf = ({ start, edges }: PathItem): Point[] => [start, ...edges.slice(0, -1).map(({ to }) => to)];

const backingHatch = (figure: PathItem): SceneItem[] =>
  hatchLines(cornersOf(figure), -Math.PI / 4, 2).map(([from, to]) => stroke('backing-hatch', from, to));

const backingBond = (figure: PathItem): SceneItem[] => [
  { ...figure, role: 'backing-masonry' },
  stroke('backing-bond', { x: -HALF, y: 0 }, { x: HALF, y: 0 }),
  ...[-4, 2].map((x) => stroke('backing-bond', { x, y: 0 }, { x, y: 1.7 })),
  ...[-1, 5].map((x) => stroke('backing-bond', { x, y: -1.7 }, { x, y: 0 })),
];

const hole = (): SceneItem[] => [
  rectangle('opening', -3, -1.7, 6, 3.4),
  stroke('opening-cross', { x: -3, y: -1.7 }, { x: 3, y: 1.7 }),
  stroke('opening-cross', { x: -3, y: 1.7 }, { x: 3, y: -1.7 }),
];

const slot = (): SceneItem[] => [level('joint'), rectangle('lost-mortar', -HALF, -0.45, 5, 0.9)];

/** A joint lying level, its gaping face at the left. */
const crack = (): SceneItem[] =>
  crackMark({ intrados: { x: -HALF + 2.4, y: 0 }, extrados: { x: HALF, y: 0 } }, 'intrados', (mm) => mm);

const outside = (): SceneItem[] => [
  stroke('thrust-outside', { x: -2, y: 0 }, { x: 2, y: 0 }),
  circle('thrust-outside', { x: 2, y: 0 }, 0.9),
];

const pointer = (shaft: Role, head: Role, slender: number): SceneItem[] => [
  stroke(shaft, { x: -HALF, y: 0 }, { x: HALF - 3, y: 0 }),
  arrowhead(head, { x: HALF, y: 0 }, 0, 3.2, undefined, slender),
];
