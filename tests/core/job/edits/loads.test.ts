import { describe, expect, it } from 'vitest';
import { addLoad, moveLoad, nextLoadId, removeLoad, resizeStrip, setLoad } from '../../../../core/job/edits.ts';
import { freshScheme } from '../../../../core/job/fresh.ts';
import type { Scheme } from '../../../../core/job/schema.ts';

const bare: Scheme = freshScheme('segmental');
const withBeam = addLoad(bare, { name: 'beam end', kind: 'point', x: 0.4, force: 12 });
const withFloor = addLoad(withBeam, { kind: 'strip', from: -1, to: 0.5, intensity: 8 });

describe('a load added', () => {
  it('has the next free id', () => {
    expect(withFloor.loads).toEqual([
      { id: 'l1', name: 'beam end', kind: 'point', x: 0.4, force: 12 },
      { id: 'l2', kind: 'strip', from: -1, to: 0.5, intensity: 8 },
    ]);
    expect(nextLoadId(withFloor)).toBe('l3');
  });

  it('never takes an id that is in use', () => {
    const later = addLoad(removeLoad(withFloor, 'l1'), { kind: 'point', x: 0, force: 1 });
    expect(later.loads?.map(({ id }) => id)).toEqual(['l2', 'l3']);
  });

  it('lies on the sheet, with a strip that has some length', () => {
    const strip = addLoad(bare, { kind: 'strip', from: 2, to: 1, intensity: Number.NaN });
    expect(strip.loads).toEqual([{ id: 'l1', kind: 'strip', from: 2, to: 2.001, intensity: 0 }]);
  });
});

describe('a load dragged', () => {
  it('goes where the pointer is, a strip by its middle', () => {
    expect(moveLoad(withFloor, 'l1', -0.2).loads?.[0]).toMatchObject({ x: -0.2 });
    expect(moveLoad(withFloor, 'l2', 0).loads?.[1]).toMatchObject({ from: -0.75, to: 0.75 });
  });

  it('leaves the other loads as the same objects', () => {
    expect(moveLoad(withFloor, 'l1', -0.2).loads?.[1]).toBe(withFloor.loads?.[1]);
  });

  it('by one end of a strip stops short of the other', () => {
    expect(resizeStrip(withFloor, 'l2', 'to', 1.2).loads?.[1]).toMatchObject({ from: -1, to: 1.2 });
    expect(resizeStrip(withFloor, 'l2', 'to', -4).loads?.[1]).toMatchObject({ from: -1, to: -0.999 });
    expect(resizeStrip(withFloor, 'l2', 'from', 4).loads?.[1]).toMatchObject({ from: 0.499, to: 0.5 });
    expect(resizeStrip(withFloor, 'l1', 'to', 4)).toBe(withFloor);
  });
});

describe('a load typed', () => {
  it('takes the figures of its kind and passes over others', () => {
    expect(setLoad(withFloor, 'l1', { force: 20, intensity: 3 }).loads?.[0]).toEqual({
      id: 'l1',
      name: 'beam end',
      kind: 'point',
      x: 0.4,
      force: 20,
    });
    expect(setLoad(withFloor, 'l2', { name: 'floor', intensity: 5 }).loads?.[1]).toMatchObject({
      name: 'floor',
      intensity: 5,
    });
    expect(setLoad(withFloor, 'l1', { name: undefined }).loads?.[0]).not.toHaveProperty('name');
  });

  it('is turned the right way round where the ends of a strip cross', () => {
    expect(setLoad(withFloor, 'l2', { from: 1.5 }).loads?.[1]).toMatchObject({ from: 0.5, to: 1.5 });
  });

  it('keeps what it had where the figure is no number', () => {
    expect(setLoad(withFloor, 'l1', { force: Infinity, x: Number.NaN })).toBe(withFloor);
  });
});

it('a load that is not there changes nothing', () => {
  expect(moveLoad(withFloor, 'l9', 0)).toBe(withFloor);
  expect(removeLoad(withFloor, 'l9')).toBe(withFloor);
  expect(setLoad(bare, 'l1', { force: 1 })).toBe(bare);
});
