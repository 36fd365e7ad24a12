/** What is wrong with the lettering of a sheet: pieces that lie on one another, or reach beyond the frame. */
import { textCorners } from '../../../core/drawing/extent.ts';
import { apart } from '../../../core/drawing/places.ts';
import { insideFrame } from '../../../core/drawing/papers.ts';
import type { Scene } from '../../../core/drawing/scene.ts';
import { onPaper, type Sheet } from '../../../core/drawing/sheet.ts';
import type { Point } from '../../../core/geometry/point.ts';

interface Lettering {
  readonly text: string;
  readonly corners: readonly Point[];
}

export function letteringOf(sheet: Sheet): Lettering[] {
  return sheet.views.flatMap((view) =>
    view.scene.layers.flatMap(({ items }) =>
      items.flatMap((item) =>
        item.kind === 'text' && item.text !== ''
          ? [
              {
                text: item.text,
                corners: textCorners(item, view.scene.millimetresPerUnit).map((corner) => onPaper(view, corner)),
              },
            ]
          : [],
      ),
    ),
  );
}

export function faultsOf(sheet: Sheet): string[] {
  const lettering = letteringOf(sheet);
  const { left, right, bottom, top } = insideFrame(sheet.paper);
  const faults: string[] = [];
  lettering.forEach((a, i) => {
    if (a.corners.some(({ x, y }) => x < left || x > right || y < bottom || y > top))
      faults.push(`"${a.text}" leaves the frame`);
    for (const b of lettering.slice(i + 1)) {
      if (!apart(a.corners, b.corners, 0)) faults.push(`"${a.text}" lies on "${b.text}"`);
    }
  });
  return faults;
}

/** A scene without a sheet has no frame to leave. */
export function overlapsIn(scene: Scene): string[] {
  const size = 1e6;
  const view = { id: 'view', scene, at: { x: size / 2, y: size / 2 } };
  return faultsOf({ title: '', description: '', paper: { name: 'large', width: size, height: size }, views: [view] });
}
