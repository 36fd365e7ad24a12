/**
 * One joint laid flat, its intrados at the left: the resultant where it crosses, and under the joint the stress that
 * answers it, linear and without tension. Paper mm; the block's depth is scaled to the greater edge stress.
 */
import type { JointReport } from '../assess/questions.ts';
import type { Point } from '../geometry/point.ts';
import { figure, metres } from '../quantity/figures.ts';
import { hatchLines } from './hatch.ts';
import { along, arrowhead, lettering, polygon, rectangle, stroke } from './path.ts';
import { Places } from './places.ts';
import { addItems, makeScene, type Items, type LayerName, type Scene, type SceneItem, type TextItem } from './scene.ts';
import type { Role } from './style.ts';
import { textWidth, wrapText } from './text.ts';

export interface StressFigureOptions {
  /** Compressive strength, MPa; null where it is not known. */
  readonly strength: number | null;
}

/** mm: the joint from 0 to WIDTH at height 0. */
const WIDTH = 46;
const STONE = 9;
const DEPTH = 15;
const ARROW = 20;
const HEAD = 3.4;
const LETTERS = 1.8;
/** A resultant further out than this share of the joint is drawn at it. */
const FURTHEST = 0.22;
/** Longest line of lettering, mm. */
const LINE = 90;

interface Sketch {
  readonly items: Items;
  readonly places: Places;
}

export function stressBlockFigure(report: JointReport, { strength }: StressFigureOptions): Scene {
  const sketch: Sketch = { items: new Map(), places: new Places(1) };
  drawJoint(sketch);
  drawStress(sketch, report, strength);
  drawResultant(sketch, report);
  const words = wordsOf(report);
  letter(
    sketch,
    'notes',
    `Joint ${report.joint}, ${metres(report.length)} m deep`,
    { x: 0, y: ARROW + STONE + 9 },
    'start',
    'text',
    'bold',
  );
  words
    .flatMap((text) => wrapText(text, LINE, LETTERS))
    .forEach((text, i) => letter(sketch, 'notes', text, { x: 0, y: -DEPTH - 11 - i * 3.6 }, 'start', 'text'));
  return makeScene(
    { title: `Joint ${report.joint}`, description: words.join(' '), millimetresPerUnit: 1 },
    sketch.items,
  );
}

function put({ items, places }: Sketch, layer: LayerName, ...drawn: readonly SceneItem[]): void {
  addItems(items, layer, ...drawn);
  for (const item of drawn) if (item.kind === 'path' && !item.closed) places.blockPath(item);
}

function letter(
  { items, places }: Sketch,
  layer: LayerName,
  text: string,
  at: Point,
  align: TextItem['align'],
  role: Role = 'text-quiet',
  face: TextItem['face'] = 'regular',
): void {
  const item = lettering(text, at, { height: face === 'bold' ? 2.5 : LETTERS, align, role, face });
  addItems(items, layer, item);
  places.blockText(item);
}

/** The stones over and under the joint, its ends named, and its middle third. */
function drawJoint(sketch: Sketch): void {
  put(sketch, 'voussoirs', rectangle('stone', 0, 0, WIDTH, STONE));
  put(sketch, 'joints', stroke('ring-edge', { x: 0, y: 0 }, { x: WIDTH, y: 0 }));
  for (const x of [0, WIDTH]) put(sketch, 'joints', stroke('joint', { x, y: 0 }, { x, y: STONE }));
  letter(sketch, 'notes', 'intrados', { x: -2, y: -3 }, 'end');
  letter(sketch, 'notes', 'extrados', { x: WIDTH + 2, y: -3 }, 'start');
  const third = WIDTH / 3;
  const y = STONE + 2;
  for (const x of [third, 2 * third]) put(sketch, 'dimensions', stroke('leader', { x, y: 0 }, { x, y: y + 1 }));
  put(sketch, 'dimensions', stroke('leader', { x: third, y }, { x: 2 * third, y }));
}

function drawStress(sketch: Sketch, { stress, length }: JointReport, strength: number | null): void {
  if (stress === null) return;
  const { intradosStress, extradosStress, compressed } = stress;
  const greatest = Math.max(intradosStress, extradosStress);
  if (!(greatest > 0)) return;
  const towardsIntrados = intradosStress >= extradosStress;
  const reach = (WIDTH * compressed) / length;
  const depth = (value: number): number => (-DEPTH * value) / greatest;
  const [left, right] = towardsIntrados ? [0, reach] : [WIDTH - reach, WIDTH];
  const figurePoints: [Point, ...Point[]] = [
    { x: left, y: 0 },
    { x: left, y: depth(intradosStress) },
    { x: right, y: depth(extradosStress) },
    { x: right, y: 0 },
  ];
  put(sketch, 'stress', polygon('stress-block', figurePoints));
  for (const [a, b] of hatchLines(figurePoints, Math.PI / 2, 2)) put(sketch, 'stress', stroke('stress-hatch', a, b));
  const of = strength === null ? '' : ` of ${figure(strength * 1000)}`;
  const letterEdge = (value: number, x: number, align: TextItem['align']): void => {
    if (value === 0) return;
    const text = `${figure(value)} kPa${value === greatest ? of : ''}`;
    // under the block all along the lettering: its edge falls away towards the greater stress
    const width = textWidth(text, LETTERS);
    const inner = Math.min(right, Math.max(left, align === 'start' ? x + width : x - width));
    const share = right === left ? 0 : (inner - left) / (right - left);
    const atInner = depth(intradosStress + share * (extradosStress - intradosStress));
    letter(sketch, 'stress', text, { x, y: Math.min(depth(value), atInner) - 3.6 }, align, 'text-force');
  };
  letterEdge(intradosStress, left, 'start');
  letterEdge(extradosStress, right, 'end');
}

/** The force of the part at the left on that at the right, leaning by the shear, with its distance from the middle. */
function drawResultant(sketch: Sketch, { share, normal, shear, length }: JointReport): void {
  if (share === null) return;
  const shown = Math.min(1 + FURTHEST, Math.max(-FURTHEST, share));
  const tip = { x: shown * WIDTH, y: 0 };
  const middle = WIDTH / 2;
  const angle = Math.atan2(-normal, shear);
  const tail = along(tip, angle, -(ARROW + STONE));
  put(sketch, 'reactions', stroke('reaction', tail, along(tip, angle, -HEAD)));
  addItems(sketch.items, 'reactions', arrowhead('reaction-head', tip, angle, HEAD, undefined, 1.8));
  letterFree(sketch, 'reactions', `${figure(Math.hypot(normal, shear))} kN`, tail, [
    { dx: 2, dy: -2, align: 'start' },
    { dx: -2, dy: -2, align: 'end' },
  ]);
  const y = STONE + 7;
  const on = Math.abs(Math.sin(angle)) < STEEP ? tip : along(tip, angle, y / Math.sin(angle));
  put(sketch, 'dimensions', stroke('leader', { x: middle, y: 0 }, { x: middle, y: y + 1.5 }));
  if (Math.abs(on.x - middle) > 0.5) put(sketch, 'dimensions', stroke('dimension', { x: middle, y }, { x: on.x, y }));
  const away = on.x < middle ? 2 : -2;
  const align = away > 0 ? 'start' : 'end';
  const text = `e ${metres(Math.abs(0.5 - share) * length)} m`;
  letterFree(
    sketch,
    'dimensions',
    text,
    { x: middle, y: y - LETTERS / 2 },
    [0, 3, 6].map((dy) => ({ dx: away, dy, align })),
  );
  letterFree(
    sketch,
    'dimensions',
    'middle third',
    { x: middle, y: STONE + 2 - LETTERS / 2 },
    [
      { dx: -WIDTH / 6 - 2, dy: 0, align: 'end' },
      { dx: WIDTH / 6 + 2, dy: 0, align: 'start' },
    ],
    'text-quiet',
  );
}

/** The sine of an angle under which a force lies too flat to be met at a height. */
const STEEP = 0.2;

interface Aside {
  readonly dx: number;
  readonly dy: number;
  readonly align: TextItem['align'];
}

/** Lettering where the first of some places beside a point is free. */
function letterFree(
  sketch: Sketch,
  layer: LayerName,
  text: string,
  by: Point,
  asides: readonly Aside[],
  role: Role = 'text-force',
): void {
  const placings = asides.map(({ dx, dy, align }) => [
    lettering(text, { x: by.x + dx, y: by.y + dy }, { height: LETTERS, align, role }),
  ]);
  const placed = sketch.places.placeSurely(placings, by);
  addItems(sketch.items, layer, ...placed.texts, ...(placed.leader === null ? [] : [placed.leader]));
}

/** What the joint carries, in words; the first line says why there is no stress block where there is none. */
function wordsOf({ share, length, normal, shear, friction, stress }: JointReport): string[] {
  const forces = `Normal ${figure(normal)} kN, shear ${figure(Math.abs(shear))} kN${friction === null ? '' : `, needs friction ${figure(friction, 2)}`}.`;
  if (share === null) return ['The resultant runs along the joint and crosses it nowhere.', forces];
  if (stress === null) {
    const by = Math.max(-share, share - 1) * length;
    const reason =
      by > 0
        ? `The resultant passes ${metres(by)} m outside: this joint cannot carry it without tension.`
        : 'The joint is not pressed together: it cannot carry this without tension.';
    return [reason, forces];
  }
  const { compressed, eccentricity } = stress;
  const carries =
    compressed >= length * (1 - 1e-9)
      ? 'Pressed over its whole depth: the resultant passes within the middle third.'
      : `Pressed over ${metres(compressed)} m of its depth; open at the ${eccentricity >= 0 ? 'extrados' : 'intrados'}.`;
  return [carries, forces];
}
