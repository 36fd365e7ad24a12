import { describe, expect, test } from 'vitest';
import { itemPoints } from '../../../core/drawing/scene.ts';
import { PICTURE_BOX, termPicture } from '../../../renderer/help/term-picture.ts';
import { partsOf, TERMS, termOf, termOfField } from '../../../renderer/help/terms.ts';

describe('the words of the trade', () => {
  test.each(TERMS.map(({ id }) => id))('%s has a sentence, and a picture that brings out its own part', (id) => {
    expect(termOf(id).sentence).toMatch(/^[A-Z].*\.$/);
    const others = TERMS.filter((term) => term.id !== id).map((term) => JSON.stringify(termPicture(term.id)));
    expect(others).not.toContain(JSON.stringify(termPicture(id)));
    for (const { x, y } of termPicture(id).flatMap((item) => itemPoints(item, 1))) {
      expect(x).toBeGreaterThanOrEqual(PICTURE_BOX.left);
      expect(x).toBeLessThanOrEqual(PICTURE_BOX.right);
      expect(y).toBeGreaterThanOrEqual(PICTURE_BOX.bottom);
      expect(y).toBeLessThanOrEqual(PICTURE_BOX.top);
    }
  });

  test('are found in a text once each, the longest first, and nothing of the text is lost', () => {
    const text = 'A line of thrust fits: geometric safety 2. Another line of thrust touches the extrados.';
    const parts = partsOf(text);
    expect(parts.map((part) => part.text).join('')).toBe(text);
    expect(parts.flatMap(({ term }) => term ?? [])).toEqual(['line-of-thrust', 'geometric-safety', 'extrados']);
  });

  test('are not found inside other words', () => {
    expect(partsOf('crowned, backings').every(({ term }) => term === null)).toBe(true);
  });

  test('explain the fields that bear them', () => {
    expect(termOfField('profile.rise')).toBe('rise');
    expect(termOfField('loads.l1.force')).toBeNull();
  });
});
