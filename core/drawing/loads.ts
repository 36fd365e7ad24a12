/**
 * Loads as arrows with names and figures. Strips lie in rows over the arch, each with its name on its bar where there
 * is room; everything else flies a flag from a pole that stands over its arrow. Poles and flags cannot meet: going
 * from right to left, a flag is hung above the tops of all the poles to its right that it would cross.
 */
import type { Point } from '../geometry/point.ts';
import type { ResolvedLoad } from '../job/defaults.ts';
import { put, type Draught } from './draught.ts';
import { heightAt } from './faces.ts';
import { figure } from '../quantity/figures.ts';
import { arrowhead, lettering, stroke } from './path.ts';
import type { About, PathItem, TextItem } from './scene.ts';
import { cutToWidth, plainText, textWidth } from './text.ts';

type StripLoad = Extract<ResolvedLoad, { kind: 'strip' }>;

/** Paper mm. */
const ARROWHEAD = 2.6;
const STRIP_HEIGHT = 6;
const ROW_HEIGHT = 11;
const POLE = 11;
const FLAG_HEIGHT = 4.6;
const LETTERS = 2.5;
const LONGEST_NAME = 60;
const ARROW_SPACING = 6;

/** Beyond this many loads, the heaviest are drawn and the rest are counted in a note. */
const MOST_LOADS = 40;

export function drawLoads(draught: Draught): void {
  const loads = heaviest(draught.resolved.loads);
  if (loads.length === 0) return;
  const strips = inRows(loads.filter((load) => load.kind === 'strip'), draught.mm(2));
  const rows = strips.reduce((most, { row }) => Math.max(most, row + 1), 0);
  const poles = loads.map(poleOf);
  const flags: Flag[] = [];
  for (const { load, row } of strips) {
    drawStrip(draught, load, row);
    const label = labelOnBar(draught, load, row, poles);
    if (label === null) flags.push({ load, x: load.to, foot: barOf(draught, row) });
    else putText(draught, label);
  }
  for (const load of loads) {
    if (load.kind === 'point') flags.push({ load, x: load.x, foot: surfaceAt(draught, load.x) });
  }
  drawFlags(draught, flags, baseOf(draught) + draught.mm(rows * ROW_HEIGHT + POLE));
  const left = draught.resolved.loads.length - loads.length;
  if (left > 0) noteTheRest(draught, left, baseOf(draught) + draught.mm(rows * ROW_HEIGHT + POLE));
}

const aboutLoad = (load: ResolvedLoad): About => ({ kind: 'load', load: load.id });

/** Where the flag's pole would stand: over a point load, at the right end of a strip. */
const poleOf = (load: ResolvedLoad): number => (load.kind === 'point' ? load.x : load.to);

function heaviest(loads: readonly ResolvedLoad[]): readonly ResolvedLoad[] {
  if (loads.length <= MOST_LOADS) return loads;
  const size = (load: ResolvedLoad): number =>
    Math.abs(load.kind === 'point' ? load.force : load.intensity * (load.to - load.from));
  const ranked = [...loads].sort((a, b) => size(b) - size(a)).slice(0, MOST_LOADS);
  return loads.filter((load) => ranked.includes(load));
}

/** Height over which everything loads are drawn with stands, m. */
const baseOf = ({ resolved, top, ring }: Draught): number =>
  resolved.above.kind === 'none' ? ring.crownExtrados.y : top.level;

/** Where an arrow's point touches: the top of what lies above, or the back of a bare ring. */
const surfaceAt = (draught: Draught, x: number): number =>
  draught.resolved.above.kind === 'none' ? (heightAt(draught.back, x) ?? draught.ring.crownExtrados.y) : draught.top.level;

const barOf = (draught: Draught, row: number): number => baseOf(draught) + draught.mm(row * ROW_HEIGHT + STRIP_HEIGHT);

/** Strips that overlap go into different rows, in the order in which they are given. */
function inRows(loads: readonly StripLoad[], gap: number): { load: StripLoad; row: number }[] {
  const placed: { load: StripLoad; row: number }[] = [];
  for (const load of loads) {
    const clashes = placed.filter(({ load: other }) => load.from < other.to + gap && other.from < load.to + gap);
    let row = 0;
    while (clashes.some((other) => other.row === row)) row++;
    placed.push({ load, row });
  }
  return placed;
}

function drawStrip(draught: Draught, load: StripLoad, row: number): void {
  const about = aboutLoad(load);
  const bar = barOf(draught, row);
  const length = load.to - load.from;
  const spaces = Math.min(MOST_ARROWS, Math.max(1, Math.round((length * draught.millimetresPerMetre) / ARROW_SPACING)));
  const shafts: PathItem[] = [stroke('load', { x: load.from, y: bar }, { x: load.to, y: bar }, about)];
  for (let i = 0; i <= spaces; i++) {
    const x = load.from + (length * i) / spaces;
    const foot = { x, y: row === 0 ? surfaceAt(draught, x) : bar - draught.mm(STRIP_HEIGHT) };
    shafts.push(...arrow(draught, { x, y: bar }, foot, load.intensity, about));
  }
  putPaths(draught, shafts);
}

const MOST_ARROWS = 60;

/** A shaft from `tail` to `foot` with its head at the foot for a load downwards, at the tail for one upwards. */
function arrow({ mm }: Draught, tail: Point, foot: Point, amount: number, about: About): PathItem[] {
  const length = Math.min(mm(ARROWHEAD), tail.y - foot.y);
  const head =
    amount < 0
      ? arrowhead('load-head', tail, Math.PI / 2, length, about)
      : arrowhead('load-head', foot, -Math.PI / 2, length, about);
  return [stroke('load', tail, foot, about), head];
}

/** The strip's name over its bar, clear of every pole; null when no stretch between poles is long enough. */
function labelOnBar(draught: Draught, load: StripLoad, row: number, poles: readonly number[]): TextItem | null {
  const { mm } = draught;
  const text = labelOf(load);
  const width = mm(textWidth(text, LETTERS)) + mm(2);
  const edges = [load.from, ...poles.filter((x) => x > load.from && x < load.to).sort((a, b) => a - b), load.to];
  for (let i = 0; i + 1 < edges.length; i++) {
    const start = edges[i]!;
    if (edges[i + 1]! - start < width) continue;
    return lettering(text, { x: start + mm(1), y: barOf(draught, row) + mm(1.3) }, { about: aboutLoad(load) });
  }
  return null;
}

function labelOf(load: ResolvedLoad): string {
  const amount = load.kind === 'point' ? `${figure(Math.abs(load.force))} kN` : `${figure(Math.abs(load.intensity))} kN/m²`;
  const upwards = (load.kind === 'point' ? load.force : load.intensity) < 0 ? ' upwards' : '';
  const name = cutToWidth(plainText(load.name), LONGEST_NAME, LETTERS);
  return name === '' ? `${amount}${upwards}` : `${name} ${amount}${upwards}`;
}

interface Flag {
  readonly load: ResolvedLoad;
  readonly x: number;
  readonly foot: number;
}

/** @param base height of the lowest pole's top. */
function drawFlags(draught: Draught, flags: readonly Flag[], base: number): void {
  const { mm } = draught;
  const hung: { x: number; tier: number }[] = [];
  for (const flag of [...flags].sort((a, b) => b.x - a.x)) {
    const text = labelOf(flag.load);
    const end = flag.x + mm(textWidth(text, LETTERS) + 3);
    const crossed = hung.filter(({ x }) => x < end);
    const tier = crossed.reduce((most, other) => Math.max(most, other.tier + 1), 0);
    hung.push({ x: flag.x, tier });
    const about = aboutLoad(flag.load);
    const top = { x: flag.x, y: base + mm(tier * FLAG_HEIGHT) };
    const foot = { x: flag.x, y: flag.foot };
    putPaths(draught, flag.load.kind === 'point' ? raised(draught, top, foot, flag.load.force, about) : [stroke('load-leader', top, foot, about)]);
    putText(draught, lettering(text, { x: top.x + mm(1), y: top.y - mm(LETTERS) }, { about }));
  }
}

/** A point load's pole; the head of an upward load stands at the height of the lowest pole's top, under its flag. */
function raised(draught: Draught, top: Point, foot: Point, force: number, about: About): PathItem[] {
  if (force >= 0) return arrow(draught, top, foot, force, about);
  const head = { x: foot.x, y: foot.y + draught.mm(POLE - LETTERS) };
  return [stroke('load', top, foot, about), arrowhead('load-head', head, Math.PI / 2, draught.mm(ARROWHEAD), about)];
}

function noteTheRest(draught: Draught, count: number, y: number): void {
  const text = `and ${count} lighter loads, not drawn`;
  const at = { x: draught.sky.left.x - draught.mm(4), y };
  putText(draught, lettering(text, at, { align: 'end', role: 'text-quiet' }));
}

function putPaths(draught: Draught, paths: readonly PathItem[]): void {
  put(draught, 'loads', ...paths);
  for (const path of paths) draught.places.blockPath(path);
}

function putText(draught: Draught, text: TextItem): void {
  put(draught, 'loads', text);
  draught.places.blockText(text);
}
