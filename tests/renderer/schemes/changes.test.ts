import { describe, expect, test } from 'vitest';
import {
  addLoad,
  setAbove,
  setBacking,
  setLoad,
  setMasonry,
  setProfileShape,
  setRise,
  setThickness,
} from '../../../core/job/edits.ts';
import { schemeFrom } from '../../support/assessed.ts';
import { changesBetween } from '../../../renderer/schemes/changes.ts';

const found = schemeFrom({
  name: 'As found',
  profile: { shape: 'segmental', span: 3, rise: 0.75 },
  ring: { thickness: 0.35 },
  loads: [{ id: 'l1', name: 'Post', kind: 'point', x: 0.5, force: 20 }],
});
const plain = (text: string): string => text.replace(/\s/gu, ' ');
const told = (after: typeof found) =>
  changesBetween(found, after).map(({ name, before, after: now }) => `${name}: ${plain(before)} → ${plain(now)}`);

describe('what was changed between two schemes', () => {
  test('is nothing between an arch and its copy under another name', () => {
    expect(told({ ...found, id: 's2', name: 'Proposal 1', role: 'proposal' })).toEqual([]);
  });

  test('names each measure with both values', () => {
    expect(told(setThickness(setRise(found, 0.9), 0.4))).toEqual(['Rise: 0.75 m → 0.9 m', 'Thickness: 0.35 m → 0.4 m']);
  });

  test('is nothing where a figure is entered that was assumed before', () => {
    expect(told(setMasonry(found, { unitWeight: 22 }))).toEqual([]);
    expect(told(setMasonry(found, { unitWeight: 24 }))).toEqual(['Unit weight of the stone: 22 kN/m³ → 24 kN/m³']);
  });

  test('tells what is not known from what is', () => {
    expect(told(setMasonry(found, { strength: 5.8 }))).toEqual(['Strength: not known → 5.8 MPa']);
  });

  test('names a load by its own name, and tells one that came as a whole', () => {
    expect(told(setLoad(found, 'l1', { force: 25 }))).toEqual(['Load Post: force: 20 kN → 25 kN']);
    const more = addLoad(found, { kind: 'strip', name: 'Floor', from: -1, to: 1, intensity: 4 });
    expect(told(more)).toEqual(['Load Floor: none → there']);
    expect(told({ ...found, loads: [] })).toEqual(['Load Post: there → none']);
  });

  test('tells another shape, a wall above and a backing with all that they bring', () => {
    expect(told(setProfileShape(found, 'elliptical'))).toContain('Shape of the opening: segmental → elliptical');
    expect(told(setAbove(found, { kind: 'wall', height: 1 }))).toEqual([
      'On the ring: none → wall',
      'Height over the crown: 0 m → 1 m',
      'Unit weight above: 0 kN/m³ → 20 kN/m³',
    ]);
    expect(told(setBacking(found, { level: 0.5, counts: 'weight' }))).toContain('Top of the backing: none → 0.5 m');
  });
});
