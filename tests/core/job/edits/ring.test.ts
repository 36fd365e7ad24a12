import { describe, expect, it } from 'vitest';
import {
  setAbove,
  setAskedSafety,
  setBreadth,
  setJoints,
  setMasonry,
  setSway,
  setThickness,
  setVoussoirs,
} from '../../../../core/job/edits.ts';
import { freshScheme } from '../../../../core/job/fresh.ts';
import type { Scheme } from '../../../../core/job/schema.ts';

const start: Scheme = freshScheme('segmental');

describe('the ring', () => {
  it('is as thick as entered, within what can be', () => {
    expect(setThickness(start, 0.42).ring.thickness).toBe(0.42);
    expect(setThickness(start, -1).ring.thickness).toBe(0.005);
    expect(setThickness(start, 5_000).ring.thickness).toBe(1_000);
    expect(setThickness(start, Number.NaN)).toBe(start);
  });

  it('has whole voussoirs, two at least, or none counted', () => {
    expect(setVoussoirs(start, 18.6).ring).toEqual({ thickness: 0.35, voussoirs: 19 });
    expect(setVoussoirs(start, 0).ring.voussoirs).toBe(2);
    expect(setVoussoirs(start, 1e9).ring.voussoirs).toBe(100_000);
    expect(setVoussoirs(setVoussoirs(start, 19), undefined).ring).toEqual({ thickness: 0.35 });
  });

  it('has its joints one way or the other', () => {
    expect(setJoints(start, 'vertical').ring.joints).toBe('vertical');
    expect(setJoints(setJoints(start, 'vertical'), undefined).ring).toEqual(start.ring);
  });

  it('has a breadth', () => {
    expect(setBreadth(start, 0.9).breadth).toBe(0.9);
    expect(setBreadth(start, 0).breadth).toBe(0.005);
  });
});

describe('the stone', () => {
  it('is known as far as entered', () => {
    const sandstone = setMasonry(start, { name: 'squared sandstone', strength: 5.8 });
    expect(sandstone.masonry).toEqual({ name: 'squared sandstone', strength: 5.8 });
    expect(setMasonry(sandstone, { strength: null }).masonry).toEqual({ name: 'squared sandstone', strength: null });
    expect(setMasonry(sandstone, { strength: undefined }).masonry).toEqual({ name: 'squared sandstone' });
  });

  it('has figures within what can be', () => {
    expect(setMasonry(start, { unitWeight: -3, friction: 50 }).masonry).toEqual({ unitWeight: 0, friction: 10 });
    expect(setMasonry(start, { strength: -1 }).masonry?.strength).toBeGreaterThan(0);
    expect(setMasonry(start, { unitWeight: Number.NaN })).toBe(start);
  });
});

describe('what lies above', () => {
  it('is entered piece by piece', () => {
    const wall = setAbove(start, { kind: 'wall' });
    expect(wall.above).toEqual({ kind: 'wall' });
    expect(setAbove(wall, { height: 1.2, unitWeight: 21 }).above).toEqual({
      kind: 'wall',
      height: 1.2,
      unitWeight: 21,
    });
    expect(setAbove(wall, { height: -1 }).above).toEqual({ kind: 'wall', height: 0 });
  });

  it('keeps its height when its kind changes, and can be left unsaid again', () => {
    const wall = setAbove(start, { kind: 'wall', height: 1.2 });
    expect(setAbove(wall, { kind: 'fill' }).above).toEqual({ kind: 'fill', height: 1.2 });
    expect(setAbove(wall, { height: undefined }).above).toEqual({ kind: 'wall' });
    expect(setAbove(wall, undefined)).toEqual(start);
  });
});

it('sway and the margin asked for are set and taken away', () => {
  expect(setSway(start, 0.1).sway).toBe(0.1);
  expect(setSway(start, -40).sway).toBe(-10);
  expect(setSway(setSway(start, 0.1), undefined)).toEqual(start);
  expect(setAskedSafety(start, 3).asked).toEqual({ geometricSafety: 3 });
  expect(setAskedSafety(start, 0).asked).toEqual({ geometricSafety: 1 });
  expect(setAskedSafety(setAskedSafety(start, 3), undefined).asked).toEqual({});
});

it('an edit that changes nothing gives the very same scheme, so that no undo step is made', () => {
  const full = setAbove(setMasonry(start, { unitWeight: 22 }), { kind: 'wall', height: 1 });
  expect(setThickness(full, 0.35)).toBe(full);
  expect(setBreadth(full, 0.6)).toBe(full);
  expect(setMasonry(full, { unitWeight: 22 })).toBe(full);
  expect(setAbove(full, { height: 1 })).toBe(full);
  expect(setVoussoirs(full, undefined)).toBe(full);
  expect(setSway(full, undefined)).toBe(full);
  expect(setAskedSafety(full, undefined)).toBe(full);
});
