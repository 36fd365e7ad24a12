import type { Point } from '../geometry/point.ts';

/**
 * Parallel lines that fill a figure with straight sides, `gap` apart, leaning by `angle` (radians). Even-odd, so that a
 * figure that crosses itself is filled in both its lobes.
 */
export function hatchLines(figure: readonly Point[], angle: number, gap: number): [Point, Point][] {
  const cos = Math.cos(angle);
  const sin = Math.sin(angle);
  const turned = figure.map(({ x, y }) => ({ along: x * cos + y * sin, across: y * cos - x * sin }));
  const least = turned.reduce((low, point) => Math.min(low, point.across), Infinity);
  const most = turned.reduce((high, point) => Math.max(high, point.across), -Infinity);
  const lines: [Point, Point][] = [];
  for (let line = Math.ceil(least / gap); line * gap < most; line++) {
    const across = line * gap;
    const crossings: number[] = [];
    turned.forEach((a, i) => {
      const b = turned[(i + 1) % turned.length] as (typeof turned)[number];
      if (a.across < across === b.across < across) return;
      crossings.push(a.along + ((across - a.across) / (b.across - a.across)) * (b.along - a.along));
    });
    crossings.sort((a, b) => a - b);
    for (let i = 0; i + 1 < crossings.length; i += 2) {
      const place = (on: number): Point => ({ x: on * cos - across * sin, y: on * sin + across * cos });
      lines.push([place(crossings[i] as number), place(crossings[i + 1] as number)]);
    }
  }
  return lines;
}
