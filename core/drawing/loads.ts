/** Loads as arrows with their names and figures, over what lies above or over the back of a bare ring. */
import type { Point } from '../geometry/point.ts';
import { put, type Draught } from './draught.ts';
import { heightAt } from './faces.ts';
import { axleSpread } from './axles.ts';
import { labelOf, LETTERS, planLoads, type PlacedLoad, type StripLoad } from './load-labels.ts';
import { arrowhead, lettering, stroke } from './path.ts';
import type { About, PathItem, TextItem } from './scene.ts';

/** Paper mm. */
const ARROWHEAD = 2.6;
const STRIP_HEIGHT = 6;
const ROW_HEIGHT = 11;
const POLE = 11;
const FLAG_HEIGHT = 4.6;
const ARROW_SPACING = 6;
const MOST_ARROWS = 60;

export function drawLoads(draught: Draught): void {
  if (draught.resolved.loads.length === 0) return;
  const { placed, numbered, leftOut } = planLoads(draught);
  const rows = placed.reduce((most, { load, row }) => (load.kind === 'strip' ? Math.max(most, row + 1) : most), 0);
  const lowestTop = baseOf(draught) + draught.mm(rows * ROW_HEIGHT + POLE);
  for (const { load, row } of placed) {
    if (load.kind === 'strip') drawStrip(draught, load, row);
    if (load.kind === 'axle') putPaths(draught, axleSpread(draught, load, aboutLoad({ load })));
  }
  for (const load of placed) drawLabel(draught, load, lowestTop);
  if (numbered) {
    draught.resolved.loads.forEach((load, i) => draught.key.push({ mark: String(i + 1), meaning: labelOf(load) }));
  }
  if (leftOut > 0) noteLeftOut(draught, leftOut, lowestTop);
}

const aboutLoad = ({ load }: Pick<PlacedLoad, 'load'>): About => ({ kind: 'load', load: load.id });

/** The level over which loads are drawn, m. */
const baseOf = ({ resolved, top, ring }: Draught): number =>
  resolved.above.kind === 'none' ? ring.crownExtrados.y : top.surface;

/** Where an arrow's point touches: the top of what lies above, or the back of a bare ring. */
const surfaceAt = (draught: Draught, x: number): number =>
  draught.resolved.above.kind === 'none'
    ? (heightAt(draught.back, x) ?? draught.ring.crownExtrados.y)
    : draught.top.surface;

const barOf = (draught: Draught, row: number): number => baseOf(draught) + draught.mm(row * ROW_HEIGHT + STRIP_HEIGHT);

function drawStrip(draught: Draught, load: StripLoad, row: number): void {
  const about = aboutLoad({ load });
  const bar = barOf(draught, row);
  const length = load.to - load.from;
  const spaces = Math.min(MOST_ARROWS, Math.max(1, Math.round((length * draught.millimetresPerMetre) / ARROW_SPACING)));
  const paths: PathItem[] = [stroke('load', { x: load.from, y: bar }, { x: load.to, y: bar }, about)];
  for (let i = 0; i <= spaces; i++) {
    const x = load.from + (length * i) / spaces;
    const foot = { x, y: row === 0 ? surfaceAt(draught, x) : bar - draught.mm(STRIP_HEIGHT) };
    paths.push(...arrow(draught, { x, y: bar }, foot, load.intensity, about));
  }
  putPaths(draught, paths);
}

/** A shaft from `tail` to `foot` with its head at the foot for a load downwards, at the tail for one upwards. */
function arrow({ mm }: Draught, tail: Point, foot: Point, amount: number, about: About): PathItem[] {
  const length = Math.min(mm(ARROWHEAD), tail.y - foot.y);
  const head =
    amount < 0
      ? arrowhead('load-head', tail, Math.PI / 2, length, about)
      : arrowhead('load-head', foot, -Math.PI / 2, length, about);
  return [stroke('load', tail, foot, about), head];
}

function drawLabel(draught: Draught, placed: PlacedLoad, lowestTop: number): void {
  const { mm } = draught;
  const { load, row, label, onBar, pole, outwards, tier } = placed;
  const about = aboutLoad(placed);
  if (onBar !== null) {
    putText(draught, lettering(label, { x: onBar, y: barOf(draught, row) + mm(1.3) }, { about }));
    return;
  }
  const top = { x: pole, y: lowestTop + mm((tier ?? 0) * FLAG_HEIGHT) };
  if (load.kind !== 'strip') {
    putPaths(draught, pointLoad(draught, top, { x: pole, y: surfaceAt(draught, pole) }, load.force, about));
  } else if (tier !== null) {
    putPaths(draught, [stroke('load-leader', top, { x: pole, y: barOf(draught, row) }, about)]);
  }
  if (tier === null) return;
  const at = { x: top.x + outwards * mm(1), y: top.y - mm(LETTERS) };
  putText(draught, lettering(label, at, { about, align: outwards > 0 ? 'start' : 'end' }));
}

/** The head of an upward load stands below the lowest flags, where no other lettering is. */
function pointLoad(draught: Draught, top: Point, foot: Point, force: number, about: About): PathItem[] {
  if (force >= 0) return arrow(draught, top, foot, force, about);
  const head = { x: foot.x, y: foot.y + draught.mm(POLE - LETTERS) };
  return [stroke('load', top, foot, about), arrowhead('load-head', head, Math.PI / 2, draught.mm(ARROWHEAD), about)];
}

function noteLeftOut(draught: Draught, count: number, y: number): void {
  const at = { x: (draught.sky.left.x + draught.sky.right.x) / 2, y };
  const text = lettering(`and ${count} lighter loads, not drawn`, at, { align: 'middle', role: 'text-quiet' });
  put(draught, 'loads', ...draught.places.placeSurely([[text]], at).texts);
}

function putPaths(draught: Draught, paths: readonly PathItem[]): void {
  put(draught, 'loads', ...paths);
  for (const path of paths) draught.places.blockPath(path);
}

function putText(draught: Draught, text: TextItem): void {
  put(draught, 'loads', text);
  draught.places.blockText(text);
}
