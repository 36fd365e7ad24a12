import { expect, test } from 'vitest';
import { THEMES } from '../../../core/drawing/style.ts';
import { Painter } from '../../../renderer/board/paint.ts';
import { toPixels } from '../../../renderer/board/viewport.ts';
import { drawnArch, VIEWPORT } from './drawn.ts';

function painted(theme: keyof typeof THEMES) {
  const container = document.createElement('div');
  document.body.append(container);
  const painter = new Painter(container);
  const arch = drawnArch();
  painter.show({ scene: arch.scene, viewport: VIEWPORT, theme: THEMES[theme], marked: [] });
  const canvas = container.querySelector('canvas');
  const context = canvas?.getContext('2d');
  if (!context) throw new Error('nothing was painted');
  /** Colour at a place of the arch as #RRGGBB, or null where nothing is painted. */
  const colourAt = (x: number, y: number): string | null => {
    const pixel = toPixels(VIEWPORT, { x, y });
    const [r = 0, g = 0, b = 0, a = 0] = context.getImageData(
      Math.round(pixel.x * devicePixelRatio),
      Math.round(pixel.y * devicePixelRatio),
      1,
      1,
    ).data;
    return a === 0 ? null : `#${[r, g, b].map((part) => part.toString(16).padStart(2, '0')).join('')}`.toUpperCase();
  };
  return { colourAt, painter, container, arch };
}

test('the scene is painted where it stands, in the colours of its theme', () => {
  const { colourAt, painter, container } = painted('light');
  // In the wall over the haunch, clear of lettering; and in the open under the crown.
  expect(colourAt(-1.2, 1.45)).toBe(THEMES.light.sheet);
  expect(colourAt(0.3, 0.5)).toBeNull();
  painter.destroy();
  expect(container.querySelector('canvas')).toBeNull();
});
