import { describe, expect, test } from 'vitest';
import { textCorners } from '../../../core/drawing/extent.ts';
import type { TextItem } from '../../../core/drawing/scene.ts';
import { itemAt } from '../../../renderer/board/hit.ts';
import { drawnArch } from './drawn.ts';

const { scene, assessed } = drawnArch();
const TOLERANCE = 0.02;

function lettering(text: string): TextItem {
  const items = scene.layers.flatMap((layer) => layer.items);
  const item = items.find((candidate) => candidate.kind === 'text' && candidate.text.startsWith(text));
  if (item?.kind !== 'text') throw new Error(`"${text}" is not on the drawing`);
  return item;
}

function middleOf(text: TextItem) {
  const [a, , c] = textCorners(text, scene.millimetresPerUnit);
  return { x: (a.x + c.x) / 2, y: (a.y + c.y) / 2 };
}

describe('what lies under the pointer', () => {
  test('is the figure of a dimension, with the field that it states', () => {
    const span = lettering('3.00');
    expect(itemAt(scene, middleOf(span), TOLERANCE)).toMatchObject({ about: { kind: 'field', path: 'profile.span' } });
  });

  test('is the load whose name is lettered there', () => {
    expect(itemAt(scene, middleOf(lettering('post')), TOLERANCE)?.about).toEqual({ kind: 'load', load: 'l1' });
  });

  test('is the joint whose line passes there, before the stone behind it', () => {
    const { intrados, extrados } = assessed.ring.joints[1]!;
    const at = { x: 0.5 * (intrados.x + extrados.x), y: 0.5 * (intrados.y + extrados.y) };
    expect(itemAt(scene, at, 0.001)?.about).toEqual({ kind: 'joint', joint: 1 });
  });

  test('is nothing in the open air', () => {
    expect(itemAt(scene, { x: 40, y: 40 }, TOLERANCE)).toBeNull();
  });
});
