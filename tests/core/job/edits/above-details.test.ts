import { describe, expect, it } from 'vitest';
import {
  addLayer,
  addOpening,
  removeLayer,
  removeOpening,
  setAbove,
  setBacking,
  setLayer,
  setOpening,
  setSidePressure,
} from '../../../../core/job/edits.ts';
import { freshScheme } from '../../../../core/job/fresh.ts';
import type { Scheme } from '../../../../core/job/schema.ts';

const start: Scheme = setAbove(freshScheme('segmental'), { kind: 'fill', height: 0.6 });

describe('backing', () => {
  const backed = setBacking(start, { level: 0.5 });

  it('begins as weight only, and counts as masonry when the assessor says so', () => {
    expect(backed.backing).toEqual({ level: 0.5, counts: 'weight' });
    expect(setBacking(backed, { counts: 'masonry', unitWeight: 21 }).backing).toEqual({
      level: 0.5,
      counts: 'masonry',
      unitWeight: 21,
    });
  });

  it('has figures within what can be, and goes altogether', () => {
    expect(setBacking(backed, { unitWeight: -4, level: 9e9 }).backing).toMatchObject({ unitWeight: 0, level: 1_000 });
    expect(setBacking(backed, { level: Number.NaN })).toBe(backed);
    expect(setBacking(backed, undefined)).toEqual(start);
    expect(setBacking(start, undefined)).toBe(start);
  });
});

describe('layers', () => {
  const paved = addLayer(start, { name: 'Setts', thickness: 0.12, unitWeight: 25 });

  it('lie one over the other, change and go', () => {
    const two = addLayer(paved, { thickness: 0.05, unitWeight: 23 });
    expect(two.above?.layers).toHaveLength(2);
    expect(setLayer(two, 0, { thickness: 0.15 }).above?.layers?.[0]).toEqual({
      name: 'Setts',
      thickness: 0.15,
      unitWeight: 25,
    });
    expect(setLayer(two, 0, { name: undefined }).above?.layers?.[0]).toEqual({ thickness: 0.12, unitWeight: 25 });
    expect(removeLayer(two, 1)).toEqual(paved);
    expect(removeLayer(paved, 0)).toEqual(start);
  });

  it('have figures within what can be', () => {
    expect(setLayer(paved, 0, { thickness: 0, unitWeight: -1 }).above?.layers?.[0]).toMatchObject({
      thickness: 0.005,
      unitWeight: 0,
    });
  });

  it('on nothing make a place above that is otherwise bare', () => {
    expect(addLayer(freshScheme('segmental'), { thickness: 0.1, unitWeight: 20 }).above).toEqual({
      kind: 'none',
      layers: [{ thickness: 0.1, unitWeight: 20 }],
    });
  });
});

it('openings have their sides and heights in order', () => {
  const pierced = addOpening(start, { from: 0.4, to: -0.4, sill: 1.6, head: 1.1 });
  expect(pierced.above?.openings).toEqual([{ from: -0.4, to: 0.4, sill: 1.1, head: 1.6 }]);
  expect(setOpening(pierced, 0, { head: 2 }).above?.openings?.[0]?.head).toBe(2);
  expect(removeOpening(pierced, 0)).toEqual(start);
});

it('side pressure is off unless a ratio is given', () => {
  expect(setSidePressure(start, 0.3).above?.sidePressure).toBe(0.3);
  expect(setSidePressure(start, 40).above?.sidePressure).toBe(10);
  expect(setSidePressure(setSidePressure(start, 0.3), 0)).toEqual(start);
  expect(setSidePressure(setSidePressure(start, 0.3), undefined)).toEqual(start);
});

it('an edit that changes nothing gives the very same scheme', () => {
  const full = setSidePressure(addLayer(setBacking(start, { level: 0.4 }), { thickness: 0.1, unitWeight: 24 }), 0.2);
  expect(setBacking(full, { level: 0.4 })).toBe(full);
  expect(setLayer(full, 0, { thickness: 0.1 })).toBe(full);
  expect(setLayer(full, 3, { thickness: 0.1 })).toBe(full);
  expect(removeLayer(full, 3)).toBe(full);
  expect(removeOpening(full, 0)).toBe(full);
  expect(setOpening(full, 0, { from: 1 })).toBe(full);
  expect(setSidePressure(full, 0.2)).toBe(full);
  expect(setSidePressure(start, undefined)).toBe(start);
});
