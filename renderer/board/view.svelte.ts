/** What the board shows of the session: the place on the screen, the drawing at that scale, and what can be taken hold of. */
import { elevation, type Overlays } from '../../core/drawing/elevation.ts';
import type { About, Scene } from '../../core/drawing/scene.ts';
import type { Theme } from '../../core/drawing/style.ts';
import { textCorners } from '../../core/drawing/extent.ts';
import type { Point } from '../../core/geometry/point.ts';
import { formatQuantity } from '../../core/quantity/format.ts';
import { measureAt, loadMeasures, type Measure } from '../session/measures.ts';
import { letteredLength, SHOWN } from '../session/preferences.ts';
import type { Session } from '../session/session.svelte.ts';
import { theme } from '../session/theme.svelte.ts';
import type { Grip } from './gestures.ts';
import { handlesOf, nearestHandle, rounded, type Handle } from './handles.ts';
import { itemAt } from './hit.ts';
import type { MarkedJoint } from './paint.ts';
import { boardTheme } from './theme.ts';
import {
  fitted,
  millimetresPerMetre,
  panned,
  resized,
  samePlace,
  toMetres,
  toPixels,
  zoomed,
  type Viewport,
} from './viewport.ts';

/** Room left round the drawing, px. */
const MARGIN = 20;
/** Zoom for a press of a key or button. */
const ZOOM_STEP = 1.25;
/** A drawing smaller than this share of what would fit is fitted anew. */
const SMALLEST_SHARE = 0.5;

/** A figure opened for typing where it is lettered. */
export interface Entry {
  readonly measure: Measure;
  /** Middle of the figure. */
  readonly at: Point;
}

/** What is asked of the arch, as far as the board must know it. */
interface Asked {
  /** Laid over the elevation to show the answer. */
  readonly overlays: Overlays;
  /** Takes a press at a place, m; false leaves it to the board. `reach` in m. */
  press(at: Point, reach: number): boolean;
}

export class BoardView {
  readonly #session: Session;
  readonly #asked: Asked;
  #viewport = $state.raw<Viewport | null>(null);
  /** Height of the legend along the lower edge, px. */
  foot = $state(0);
  /** The person has not moved the paper, so it may be moved to keep the whole drawing in sight. */
  #follows = true;
  entry = $state.raw<Entry | null>(null);
  /** The last move was by pointer: the mark of the keyboard's place keeps out of its way. */
  byPointer = $state(false);
  /** The handle that is being moved. */
  active = $state.raw<string | null>(null);

  constructor(session: Session, asked: Asked = NOTHING_ASKED) {
    this.#session = session;
    this.#asked = asked;
  }

  readonly #insets = $derived({ left: MARGIN, top: MARGIN, right: MARGIN, bottom: MARGIN + this.foot });
  readonly viewport: Viewport | null = $derived(this.#viewport);
  /** What is laid over the elevation to show an answer. */
  readonly overlays: Overlays = $derived.by(() => this.#asked.overlays);
  readonly #scale: number | null = $derived(this.#viewport === null ? null : millimetresPerMetre(this.#viewport));
  readonly scene: Scene | null = $derived.by(() => {
    const { assessed } = this.#session;
    if (assessed === null || this.#scale === null) return null;
    return elevation(assessed, { millimetresPerMetre: this.#scale, length: letteredLength, ...this.overlays });
  });
  readonly handles: readonly Handle[] = $derived.by(() => {
    const { assessed } = this.#session;
    // measures are taken hold of on the arch as it is, not on a moved one
    const moved = this.overlays.moved !== undefined;
    return assessed === null || this.scene === null || moved ? [] : handlesOf(assessed, this.scene);
  });
  readonly theme: Theme = $derived(boardTheme(theme.dark, theme.forced));
  /** Joints that the selection points at. */
  readonly marked: readonly MarkedJoint[] = $derived.by(() => {
    const { selection, assessed } = this.#session;
    if (selection?.kind !== 'joint') return [];
    const ring = this.overlays.moved?.ring ?? assessed?.ring;
    const joint = ring?.joints[selection.joint];
    return joint === undefined ? [] : [{ number: selection.joint, joint }];
  });

  resize(width: number, height: number): void {
    if (width === 0 || height === 0) return;
    const before = this.#viewport;
    if (before === null || this.#follows) this.fit(width, height);
    else this.#viewport = resized(before, width, height);
  }

  /** The whole drawing in sight, and kept in sight from now on. */
  fit(width = this.#viewport?.width ?? 0, height = this.#viewport?.height ?? 0): void {
    const { assessed } = this.#session;
    this.#follows = true;
    const { overlays } = this;
    const found = fitted(width, height, this.#insets, (scale) =>
      assessed === null
        ? null
        : elevation(assessed, { millimetresPerMetre: scale, length: letteredLength, ...overlays }).bounds,
    );
    // the same place again is no change: what keeps the drawing in sight would fit it for ever
    if (this.#viewport === null || !samePlace(this.#viewport, found)) this.#viewport = found;
  }

  /** After an edit: fits again where the drawing has grown out of sight or shrunk to little, unless the paper was moved. */
  keepInSight(): void {
    const { scene, viewport } = this;
    const bounds = scene?.bounds ?? null;
    if (!this.#follows || bounds === null || viewport === null) return;
    const { x: left, y: top } = toPixels(viewport, { x: bounds.left, y: bounds.top });
    const { x: right, y: bottom } = toPixels(viewport, { x: bounds.right, y: bounds.bottom });
    const { width, height } = viewport;
    const lower = height - this.foot - MARGIN / 2;
    const inSight = left >= 0 && top >= 0 && right <= width && bottom <= lower;
    const share = Math.max((right - left) / (width - 2 * MARGIN), (bottom - top) / (lower - MARGIN));
    if (!inSight || share < SMALLEST_SHARE) this.fit();
  }

  pan(dx: number, dy: number): void {
    if (this.#viewport === null) return;
    this.#follows = false;
    this.entry = null;
    this.#viewport = panned(this.#viewport, dx, dy);
  }

  zoom(factor: number, pixel: Point): void {
    if (this.#viewport === null) return;
    this.#follows = false;
    this.entry = null;
    this.#viewport = zoomed(this.#viewport, factor, pixel);
  }

  zoomStep(direction: 1 | -1): void {
    const { width, height } = this.#viewport ?? { width: 0, height: 0 };
    this.zoom(ZOOM_STEP ** direction, { x: width / 2, y: height / 2 });
  }

  handleAt(pixel: Point, reach: number): Handle | null {
    const { viewport } = this;
    return viewport === null ? null : nearestHandle(this.handles, pixel, reach, (point) => toPixels(viewport, point));
  }

  /** Takes hold of a handle: it follows the pointer by as much as the pointer moves. */
  grip(handle: Handle, start: Point): Grip {
    const drag = this.#session.drag();
    this.byPointer = true;
    const scale = this.#viewport?.scale ?? 1;
    this.active = handle.id;
    this.entry = null;
    const done = (): void => {
      this.active = null;
    };
    return {
      move: (pixel) => {
        const metres = handle.axis === 'x' ? (pixel.x - start.x) / scale : (start.y - pixel.y) / scale;
        const value = rounded(handle.value + handle.rate * metres, scale / Math.abs(handle.rate));
        drag.preview((scheme) => handle.set(scheme, value));
      },
      release: () => {
        drag.release(this.stepName(handle.id));
        done();
      },
      abandon: () => {
        drag.abandon();
        done();
      },
    };
  }

  /** What a move of this handle is called, with the value it has come to: `rise 0.83 m`. */
  stepName(id: string): string {
    const handle = this.handles.find((candidate) => candidate.id === id);
    return handle === undefined ? 'drag' : `${handle.measure} ${valueText(handle)}`;
  }

  /** A click that moved nothing: opens the figure under it, or points at what lies there. */
  click(pixel: Point, reach: number): void {
    const { scene, viewport } = this;
    if (scene === null || viewport === null) return;
    const at = toMetres(viewport, pixel);
    if (this.#asked.press(at, reach / viewport.scale)) return;
    const item = itemAt(scene, at, reach / 2 / viewport.scale);
    const about = item?.about ?? null;
    this.#session.selection = about;
    const measure = item?.kind === 'text' && about !== null ? this.#measureOf(about) : null;
    if (measure === null || item?.kind !== 'text') {
      this.entry = null;
      return;
    }
    const [lowerLeft, , upperRight] = textCorners(item, scene.millimetresPerUnit);
    this.entry = { measure, at: { x: (lowerLeft.x + upperRight.x) / 2, y: (lowerLeft.y + upperRight.y) / 2 } };
  }

  /** Opens the figure that a handle sets, beside the handle. */
  type(handle: Handle): void {
    const measure = handle.path === null ? null : this.#measureOf({ kind: 'field', path: handle.path });
    this.entry = measure === null ? null : { measure, at: handle.at };
  }

  #measureOf(about: About): Measure | null {
    const resolved = this.#session.assessed?.resolved;
    if (resolved === undefined) return null;
    if (about.kind === 'field') return measureAt(resolved, about.path);
    if (about.kind !== 'load') return null;
    const load = resolved.loads.find(({ id }) => id === about.load);
    return load === undefined ? null : (loadMeasures(load)[0] ?? null);
  }
}

const NOTHING_ASKED: Asked = { overlays: {}, press: () => false };

export const valueText = ({ value }: Handle): string => formatQuantity(value, 'length', SHOWN, { figures: 'exact' });
