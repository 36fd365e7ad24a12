import { expect, it } from 'vitest';
import { addCrack, removeCrack, setCrack, setRoad } from '../../../../core/job/edits.ts';
import { freshScheme } from '../../../../core/job/fresh.ts';
import type { Scheme } from '../../../../core/job/schema.ts';

const start: Scheme = freshScheme('segmental');
const marked = addCrack(start, { joint: 10, face: 'intrados' });

it('a mark is put at a joint and the face that gapes', () => {
  expect(marked.cracks).toEqual([{ id: 'k1', joint: 10, face: 'intrados' }]);
  expect(addCrack(marked, { along: 0.2, face: 'extrados' }).cracks?.[1]).toEqual({
    id: 'k2',
    along: 0.2,
    face: 'extrados',
  });
});

it('its width and date are noted, and taken away where they were not', () => {
  const noted = setCrack(marked, 'k1', { width: 0.003, seenOn: '2026-05-14', notes: 'old mortar inside' });
  expect(noted.cracks?.[0]).toEqual({
    id: 'k1',
    joint: 10,
    face: 'intrados',
    width: 0.003,
    seenOn: '2026-05-14',
    notes: 'old mortar inside',
  });
  expect(setCrack(noted, 'k1', { width: undefined, seenOn: undefined, notes: undefined })).toEqual(marked);
});

it('it has one place: a joint, or a share along the intrados', () => {
  expect(setCrack(marked, 'k1', { along: 0.5 }).cracks?.[0]).toEqual({ id: 'k1', along: 0.5, face: 'intrados' });
});

it('figures are held at what can be', () => {
  expect(setCrack(marked, 'k1', { joint: -3, width: -1 }).cracks?.[0]).toMatchObject({ joint: 0, width: 0 });
  expect(setCrack(marked, 'k1', { joint: 4.4 }).cracks?.[0]?.joint).toBe(4);
  expect(setCrack(marked, 'k1', { joint: Number.NaN })).toBe(marked);
});

it('the last mark removed leaves no empty list', () => {
  expect(removeCrack(marked, 'k1')).toEqual(start);
});

it('a road has the factors that were judged, each above nothing and at most one', () => {
  const road = setRoad(start, {});
  expect(road.road).toEqual({});
  expect(setRoad(road, { material: 0.9, condition: 7, jointing: 0 }).road).toEqual({
    material: 0.9,
    condition: 1,
    jointing: 0.001,
  });
  expect(setRoad(setRoad(road, { material: 0.9 }), { material: undefined })).toEqual(road);
  expect(setRoad(road, undefined)).toEqual(start);
});

it('an edit that changes nothing gives the very same scheme', () => {
  expect(setCrack(marked, 'k1', { joint: 10, face: 'intrados' })).toBe(marked);
  expect(setCrack(marked, 'k9', { joint: 3 })).toBe(marked);
  expect(removeCrack(marked, 'k9')).toBe(marked);
  expect(setRoad(start, undefined)).toBe(start);
  const road = setRoad(start, { material: 0.9 });
  expect(setRoad(road, { material: 0.9 })).toBe(road);
});
