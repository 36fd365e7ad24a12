import { expect, it } from 'vitest';
import {
  addCombination,
  addLoad,
  removeCombination,
  removeLoad,
  setCombination,
  setLoad,
  setLoadFactor,
} from '../../../../core/job/edits.ts';
import { freshScheme } from '../../../../core/job/fresh.ts';
import type { Scheme } from '../../../../core/job/schema.ts';

const bare: Scheme = freshScheme('segmental');
const start: Scheme = addLoad(bare, { name: 'cart', kind: 'axle', x: 0, force: 30 });
const combined = addCombination(start, { name: 'Strength', permanent: 1.35, variable: 1.5 });

it('a combination is added, named and factored', () => {
  expect(combined.combinations).toEqual([{ id: 'c1', name: 'Strength', permanent: 1.35, variable: 1.5 }]);
  expect(setCombination(combined, 'c1', { variable: 1.2 }).combinations?.[0]).toMatchObject({ variable: 1.2 });
  expect(setCombination(combined, 'c1', { permanent: undefined }).combinations?.[0]).not.toHaveProperty('permanent');
  expect(setCombination(combined, 'c1', { permanent: -2, variable: 900 }).combinations?.[0]).toMatchObject({
    permanent: 0,
    variable: 100,
  });
});

it('a load may have a factor of its own, which goes with the load', () => {
  const own = setLoadFactor(combined, 'c1', 'l1', 1.1);
  expect(own.combinations?.[0]?.factors).toEqual([{ load: 'l1', factor: 1.1 }]);
  expect(setLoadFactor(own, 'c1', 'l1', 1.3).combinations?.[0]?.factors).toEqual([{ load: 'l1', factor: 1.3 }]);
  expect(setLoadFactor(own, 'c1', 'l1', undefined)).toEqual(combined);
  expect(removeLoad(own, 'l1').combinations).toEqual(combined.combinations);
});

it('a combination removed leaves no empty list', () => {
  expect(removeCombination(combined, 'c1')).toEqual(start);
});

it('an axle has its print and spread, or leaves them to what is usual', () => {
  const axle = setLoad(start, 'l1', { patch: 0.4, dispersal: 0.6, action: 'permanent' });
  expect(axle.loads?.[0]).toEqual({
    id: 'l1',
    name: 'cart',
    kind: 'axle',
    x: 0,
    force: 30,
    patch: 0.4,
    dispersal: 0.6,
    action: 'permanent',
  });
  expect(setLoad(axle, 'l1', { dispersal: 80, patch: -1 }).loads?.[0]).toMatchObject({ dispersal: 5, patch: 0 });
  expect(setLoad(axle, 'l1', { dispersal: undefined, patch: undefined, action: undefined })).toEqual(start);
});

it('an edit that changes nothing gives the very same scheme', () => {
  expect(setCombination(combined, 'c1', { permanent: 1.35 })).toBe(combined);
  expect(setCombination(combined, 'c9', { permanent: 2 })).toBe(combined);
  expect(setLoadFactor(combined, 'c1', 'l1', undefined)).toBe(combined);
  const own = setLoadFactor(combined, 'c1', 'l1', 1.1);
  expect(setLoadFactor(own, 'c1', 'l1', 1.1)).toBe(own);
  expect(removeCombination(combined, 'c9')).toBe(combined);
});
