/**
 * Pointers on the board: one that takes hold of a handle drags it, one that does not moves the paper, two of them
 * stretch it, the wheel zooms, and a press without a move is a click. Pixels are from the board's upper left corner.
 */
import type { Point } from '../../core/geometry/point.ts';
import { onceAFrame } from './frame.ts';

/** What a pointer that took hold of something does to it. */
export interface Grip {
  move(pixel: Point): void;
  release(): void;
  abandon(): void;
}

export interface GestureTarget {
  /** A grip on what lies under the pixel, or null to move the paper. */
  take(pixel: Point, reach: number): Grip | null;
  pan(dx: number, dy: number): void;
  zoom(factor: number, pixel: Point): void;
  click(pixel: Point, reach: number): void;
}

/** Radius within which a pointer finds its mark, px: half a fingertip's target of 44, less for a mouse. */
const REACH = { touch: 22, mouse: 14 } as const;
/** A pointer that stays within this, px, has not moved. */
const STILL = 4;
/** Zoom for a notch of the wheel, about 100 px of its movement. */
const WHEEL_ZOOM = 0.0018;

interface Held {
  readonly start: Point;
  at: Point;
  moved: boolean;
}

/** Listens on the board; returns what takes the listeners off again. */
export function listen(board: HTMLElement, target: GestureTarget): () => void {
  const held = new Map<number, Held>();
  let grip: Grip | null = null;
  const dragging = onceAFrame<Point>((pixel) => grip?.move(pixel));
  let panned: Point = { x: 0, y: 0 };
  const panning = onceAFrame<null>(() => {
    const { x, y } = panned;
    panned = { x: 0, y: 0 };
    target.pan(x, y);
  });

  const pixelOf = (event: MouseEvent): Point => {
    const { left, top } = board.getBoundingClientRect();
    return { x: event.clientX - left, y: event.clientY - top };
  };
  const pan = (dx: number, dy: number): void => {
    panned = { x: panned.x + dx, y: panned.y + dy };
    panning.later(null);
  };
  const drop = (): void => {
    dragging.forget();
    grip?.abandon();
    grip = null;
  };

  const down = (event: PointerEvent): void => {
    if (event.button > 1 || isTyping(event.target)) return;
    const pixel = pixelOf(event);
    held.set(event.pointerId, { start: pixel, at: pixel, moved: false });
    if (held.size === 1 && event.button === 0) grip = target.take(pixel, reachOf(event));
    else drop();
    board.setPointerCapture(event.pointerId);
    event.preventDefault();
  };

  const move = (event: PointerEvent): void => {
    const pointer = held.get(event.pointerId);
    if (pointer === undefined) return;
    const pixel = pixelOf(event);
    if (held.size === 2) pinch(event.pointerId, pointer, pixel);
    pointer.moved ||= Math.hypot(pixel.x - pointer.start.x, pixel.y - pointer.start.y) > STILL;
    if (held.size === 1 && pointer.moved) {
      if (grip !== null) dragging.later(pixel);
      else pan(pixel.x - pointer.at.x, pixel.y - pointer.at.y);
    }
    if (pointer.moved) pointer.at = pixel;
  };

  const pinch = (id: number, pointer: Held, pixel: Point): void => {
    const other = [...held].find(([otherId]) => otherId !== id)?.[1];
    if (other === undefined) return;
    const before = Math.hypot(pointer.at.x - other.at.x, pointer.at.y - other.at.y);
    const after = Math.hypot(pixel.x - other.at.x, pixel.y - other.at.y);
    pan((pixel.x - pointer.at.x) / 2, (pixel.y - pointer.at.y) / 2);
    panning.now();
    if (before > 0 && after > 0)
      target.zoom(after / before, { x: (pixel.x + other.at.x) / 2, y: (pixel.y + other.at.y) / 2 });
    pointer.at = pixel;
    pointer.moved = true;
    other.moved = true;
  };

  const up = (event: PointerEvent): void => {
    const pointer = held.get(event.pointerId);
    if (pointer === undefined) return;
    held.delete(event.pointerId);
    dragging.now();
    const taken = grip;
    grip = null;
    if (pointer.moved) taken?.release();
    else {
      taken?.abandon();
      if (event.button === 0 && held.size === 0) target.click(pixelOf(event), reachOf(event));
    }
  };

  const cancel = (event: PointerEvent): void => {
    if (held.delete(event.pointerId)) drop();
  };

  const wheel = (event: WheelEvent): void => {
    event.preventDefault();
    // A trackpad's pinch comes as a wheel with Ctrl and in smaller steps.
    const step = event.deltaY * (event.deltaMode === WheelEvent.DOM_DELTA_LINE ? 33 : 1) * (event.ctrlKey ? 5 : 1);
    if (event.shiftKey) pan(-step, 0);
    else target.zoom(Math.exp(-step * WHEEL_ZOOM), pixelOf(event));
  };

  const key = (event: KeyboardEvent): void => {
    if (event.key === 'Escape') drop();
  };

  const stop = new AbortController();
  const { signal } = stop;
  board.addEventListener('pointerdown', down, { signal });
  board.addEventListener('pointermove', move, { signal });
  board.addEventListener('pointerup', up, { signal });
  board.addEventListener('pointercancel', cancel, { signal });
  board.addEventListener('wheel', wheel, { signal, passive: false });
  window.addEventListener('keydown', key, { signal });
  return () => {
    drop();
    stop.abort();
  };
}

const reachOf = ({ pointerType }: PointerEvent): number => (pointerType === 'touch' ? REACH.touch : REACH.mouse);

/** Fields and buttons that lie over the board, other than its handles, keep their own pointers. */
const isTyping = (target: EventTarget | null): boolean =>
  target instanceof Element && target.closest('[data-over-board]') !== null;
