import { describe, expect, it } from 'vitest';
import {
  addLostMortar,
  removeLostMortar,
  setCourses,
  setLostMortar,
  setSpringingThickness,
} from '../../../../core/job/edits.ts';
import { freshScheme } from '../../../../core/job/fresh.ts';
import type { Scheme } from '../../../../core/job/schema.ts';

const start: Scheme = freshScheme('segmental');

describe('the thickness at the springings', () => {
  it('is set, held at what can be, and left to that of the crown again', () => {
    expect(setSpringingThickness(start, 0.5).ring.springingThickness).toBe(0.5);
    expect(setSpringingThickness(start, -1).ring.springingThickness).toBe(0.005);
    expect(setSpringingThickness(setSpringingThickness(start, 0.5), undefined)).toEqual(start);
  });

  it('keeps what it had where the figure is no number', () => {
    expect(setSpringingThickness(setSpringingThickness(start, 0.5), Number.NaN).ring.springingThickness).toBe(0.5);
  });
});

it('courses are whole, one to twenty', () => {
  expect(setCourses(start, 2.6).ring.courses).toBe(3);
  expect(setCourses(start, 0).ring.courses).toBe(1);
  expect(setCourses(start, 900).ring.courses).toBe(20);
  expect(setCourses(setCourses(start, 3), undefined)).toEqual(start);
  expect(setCourses(start, Number.NaN)).toBe(start);
});

describe('lost mortar', () => {
  const one = addLostMortar(start, { face: 'intrados', depth: 0.04 });
  const two = addLostMortar(one, { face: 'extrados', depth: 0.02, joint: 7 });

  it('is listed as it was found, on every joint or on one', () => {
    expect(two.ring.lostMortar).toEqual([
      { face: 'intrados', depth: 0.04 },
      { face: 'extrados', depth: 0.02, joint: 7 },
    ]);
  });

  it('is changed where it stands in the list, within what can be', () => {
    expect(setLostMortar(two, 1, { joint: 8.4, depth: 0.03 }).ring.lostMortar?.[1]).toEqual({
      face: 'extrados',
      depth: 0.03,
      joint: 8,
    });
    expect(setLostMortar(two, 1, { joint: undefined }).ring.lostMortar?.[1]).toEqual({ face: 'extrados', depth: 0.02 });
    expect(setLostMortar(two, 0, { depth: 0 }).ring.lostMortar?.[0]?.depth).toBeGreaterThan(0);
  });

  it('is taken away, and its list with the last of it', () => {
    expect(removeLostMortar(two, 0).ring.lostMortar).toEqual([{ face: 'extrados', depth: 0.02, joint: 7 }]);
    expect(removeLostMortar(one, 0)).toEqual(start);
  });

  it('that is the same or is not there gives the very same scheme', () => {
    expect(setLostMortar(two, 0, { depth: 0.04 })).toBe(two);
    expect(setLostMortar(two, 5, { depth: 0.04 })).toBe(two);
    expect(removeLostMortar(two, 5)).toBe(two);
    expect(removeLostMortar(start, 0)).toBe(start);
    expect(setSpringingThickness(start, undefined)).toBe(start);
    expect(setCourses(start, undefined)).toBe(start);
  });
});
