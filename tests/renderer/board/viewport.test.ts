import { describe, expect, test } from 'vitest';
import { fitted, panned, resized, toMetres, toPixels, zoomed } from '../../../renderer/board/viewport.ts';
import { VIEWPORT } from './drawn.ts';

const pixel = { x: 613, y: 222 };

describe('the viewport', () => {
  test('takes pixels to metres and back', () => {
    const metres = toMetres(VIEWPORT, pixel);
    expect(metres.x).toBeCloseTo((613 - 450) / 160, 12);
    expect(metres.y).toBeCloseTo((560 - 222) / 160, 12);
    expect(toPixels(VIEWPORT, metres)).toEqual({ x: expect.closeTo(613, 9), y: expect.closeTo(222, 9) });
  });

  test('zooms about the pointer: what lies under it stays there', () => {
    const before = toMetres(VIEWPORT, pixel);
    const after = toMetres(zoomed(VIEWPORT, 1.7, pixel), pixel);
    expect(after.x).toBeCloseTo(before.x, 12);
    expect(after.y).toBeCloseTo(before.y, 12);
  });

  test('does not zoom beyond its limits, nor shift when it is at one', () => {
    const far = zoomed(VIEWPORT, 1e9, pixel);
    expect(far.scale).toBeLessThan(1e5);
    expect(zoomed(far, 2, { x: 0, y: 0 })).toEqual(far);
  });

  test('pans by pixels', () => {
    expect(panned(VIEWPORT, 10, -5)).toMatchObject({ x: 460, y: 555, scale: 160 });
  });

  test('keeps the middle in the middle when the window changes its size', () => {
    const before = toMetres(VIEWPORT, { x: 450, y: 350 });
    const after = toMetres(resized(VIEWPORT, 1200, 500), { x: 600, y: 250 });
    expect(after).toEqual({ x: expect.closeTo(before.x, 12), y: expect.closeTo(before.y, 12) });
  });
});

describe('fitting', () => {
  const insets = { left: 20, top: 30, right: 40, bottom: 90 };
  /** A drawing 4 m by 2 m with lettering of fixed paper size round it, as the elevation has it. */
  const boundsAt = (scale: number) => ({ left: -2 - 30 / scale, right: 2 + 30 / scale, bottom: -20 / scale, top: 2 });

  test('brings the whole drawing, lettering and all, into the room left, and nearly fills it', () => {
    const view = fitted(1000, 700, insets, boundsAt);
    const box = boundsAt(view.scale / 4.08);
    const upperLeft = toPixels(view, { x: box.left, y: box.top });
    const lowerRight = toPixels(view, { x: box.right, y: box.bottom });
    expect(upperLeft.x).toBeGreaterThanOrEqual(20 - 0.5);
    expect(upperLeft.y).toBeGreaterThanOrEqual(30 - 0.5);
    expect(lowerRight.x).toBeLessThanOrEqual(960 + 0.5);
    expect(lowerRight.y).toBeLessThanOrEqual(610 + 0.5);
    expect(lowerRight.x - upperLeft.x).toBeGreaterThan(0.95 * 940);
  });
});
