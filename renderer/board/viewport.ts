/** Where the arch stands on the screen: metres to pixels and back. Pixels are CSS pixels, y down from the upper edge. */
import type { Box } from '../../core/drawing/extent.ts';
import type { Point } from '../../core/geometry/point.ts';

/**
 * Pixels in a millimetre of the drawing's own paper: lettering of 2.5 mm capitals becomes type of 14 px. Pens, dashes
 * and lettering keep this size whatever the zoom; only the arch grows.
 */
export const PIXELS_PER_MILLIMETRE = 4.08;

export interface Viewport {
  readonly width: number;
  readonly height: number;
  /** Pixels per metre. */
  readonly scale: number;
  /** Pixel at which the origin of the arch stands. */
  readonly x: number;
  readonly y: number;
}

export interface Insets {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

/** A metre over the whole screen, or a hundred of them over a thumb. */
const LEAST_SCALE = 2;
const MOST_SCALE = 20_000;

export const toPixels = ({ scale, x, y }: Viewport, point: Point): Point => ({
  x: x + point.x * scale,
  y: y - point.y * scale,
});

export const toMetres = ({ scale, x, y }: Viewport, pixel: Point): Point => ({
  x: (pixel.x - x) / scale,
  y: (y - pixel.y) / scale,
});

export const millimetresPerMetre = ({ scale }: Viewport): number => scale / PIXELS_PER_MILLIMETRE;

export const samePlace = (a: Viewport, b: Viewport): boolean =>
  a.width === b.width && a.height === b.height && a.scale === b.scale && a.x === b.x && a.y === b.y;

export const panned = (viewport: Viewport, dx: number, dy: number): Viewport => ({
  ...viewport,
  x: viewport.x + dx,
  y: viewport.y + dy,
});

/** Zoomed by `factor` so that what lies at `pixel` stays there. */
export function zoomed(viewport: Viewport, factor: number, pixel: Point): Viewport {
  const scale = Math.min(MOST_SCALE, Math.max(LEAST_SCALE, viewport.scale * factor));
  const real = scale / viewport.scale;
  return { ...viewport, scale, x: pixel.x + (viewport.x - pixel.x) * real, y: pixel.y + (viewport.y - pixel.y) * real };
}

/** The same place in the middle of a window of another size. */
export function resized(viewport: Viewport, width: number, height: number): Viewport {
  return {
    ...viewport,
    width,
    height,
    x: viewport.x + (width - viewport.width) / 2,
    y: viewport.y + (height - viewport.height) / 2,
  };
}

/**
 * The whole drawing as large as the window has room for. Lettering keeps its size, so the bounds of the drawing depend
 * on its scale; `boundsAt` gives them in metres at so many paper millimetres to the metre.
 */
export function fitted(
  width: number,
  height: number,
  insets: Insets,
  boundsAt: (millimetresPerMetre: number) => Box | null,
): Viewport {
  const roomX = Math.max(50, width - insets.left - insets.right);
  const roomY = Math.max(50, height - insets.top - insets.bottom);
  let viewport: Viewport = { width, height, scale: FIRST_SCALE, x: width / 2, y: height / 2 };
  for (let i = 0; i < FIT_ROUNDS; i++) {
    const box = boundsAt(millimetresPerMetre(viewport));
    if (box === null) break;
    const factor = Math.min(
      roomX / ((box.right - box.left) * viewport.scale),
      roomY / ((box.top - box.bottom) * viewport.scale),
    );
    // Half the way in the last rounds would oscillate no less; a little under is always safe.
    const scale = Math.min(
      MOST_SCALE,
      Math.max(LEAST_SCALE, viewport.scale * (factor < 1 ? factor * 0.995 : factor ** 0.9)),
    );
    viewport = {
      ...viewport,
      scale,
      x: insets.left + roomX / 2 - ((box.left + box.right) / 2) * scale,
      y: insets.top + roomY / 2 + ((box.bottom + box.top) / 2) * scale,
    };
  }
  return viewport;
}

const FIRST_SCALE = 100;
/** The lettering's share of the bounds shrinks with each round; five bring it to the pixel. */
const FIT_ROUNDS = 6;
