/** An axle on the ground over the arch: the wheels' print, and dotted how its load spreads on the way down to the ring. */
import type { Point } from '../geometry/point.ts';
import type { ResolvedLoad } from '../job/defaults.ts';
import { backAt, blocksUnder } from '../loading/sky.ts';
import type { Draught } from './draught.ts';
import { heightAt } from './faces.ts';
import { polyline, rectangle } from './path.ts';
import type { About, PathItem } from './scene.ts';

type AxleLoad = Extract<ResolvedLoad, { kind: 'axle' }>;

/** Height of the print and the least length at which it can be seen, paper mm. */
const PRINT = { height: 0.9, least: 1.2 } as const;

export function axleSpread(draught: Draught, load: AxleLoad, about: About): PathItem[] {
  const { mm, top, resolved } = draught;
  const surface = resolved.above.kind === 'none' ? (heightAt(draught.back, load.x) ?? top.surface) : top.surface;
  const length = Math.max(load.patch, mm(PRINT.least));
  const print = { ...rectangle('wheel', load.x - length / 2, surface, length, mm(PRINT.height)), about };
  if (resolved.above.kind === 'none') return [print];
  return [print, ...([-1, 1] as const).flatMap((side) => edgeOfSpread(draught, load, side, about))];
}

/** The width at each depth is that of the load's calculation: `patch` and `dispersal` to each side for each metre down. */
function edgeOfSpread(draught: Draught, { x, patch, dispersal }: AxleLoad, side: 1 | -1, about: About): PathItem[] {
  const { sky, back, top } = draught;
  const [under] = blocksUnder(sky, x);
  if (under === undefined) return [];
  const foot = backAt(sky, under.block, x);
  // a fill that is broken off on paper has its upper part missing, and the spread there with it
  const start = top.broken || top.layerScale !== 1 ? top.level : top.surface;
  const edgeAt = (y: number): number => x + side * (patch / 2 + dispersal * Math.max(0, top.trueSurface - y));
  const meets = whereItMeets(back, start, foot, edgeAt);
  const line: [Point, ...Point[]] = [
    { x: edgeAt(start), y: start },
    { x: edgeAt(meets), y: meets },
  ];
  const end = heightAt(back, edgeAt(meets));
  // where the back lies deeper than beneath the axle, the load goes on plumb
  if (end !== null && end < meets) line.push({ x: edgeAt(meets), y: end });
  return [polyline('load-spread', line, about)];
}

const HALVINGS = 40;

/** The level at which the edge comes upon the back of the ring; that beneath the axle where it does not before. */
function whereItMeets(back: Draught['back'], start: number, foot: number, edgeAt: (y: number) => number): number {
  const over = (y: number): boolean => {
    const height = heightAt(back, edgeAt(y));
    return height === null || y > height;
  };
  if (over(foot)) return foot;
  let [low, high] = [foot, start];
  for (let step = 0; step < HALVINGS; step++) {
    const middle = (low + high) / 2;
    if (over(middle)) high = middle;
    else low = middle;
  }
  return high;
}
