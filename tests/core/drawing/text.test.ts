import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import {
  charactersNotInFont,
  cutToWidth,
  emOf,
  plainText,
  textWidth,
  wrapText,
  type Face,
} from '../../../core/drawing/text.ts';
import { advanceWidths } from './font-file.ts';

const font = (name: string): Buffer => readFileSync(new URL(`../../../assets/fonts/${name}.ttf`, import.meta.url));

describe('widths of lettering', () => {
  const faces: [Face, string][] = [
    ['regular', 'dejavu-sans'],
    ['bold', 'dejavu-sans-bold'],
  ];
  it.each(faces)('are those of the %s font that is shipped, for every character in it', (face, file) => {
    const widths = advanceWidths(font(file));
    expect(widths.size).toBeGreaterThan(1500);
    for (const [code, width] of widths) {
      const character = String.fromCodePoint(code);
      expect([character, textWidth(character, 1, face)]).toEqual([character, width * emOf(1)]);
    }
  });

  it('counts capitals 2.5 mm high as an em of 3.43 mm', () => {
    expect(emOf(2.5)).toBeCloseTo(3.43, 2);
  });

  it('takes ideographs and other characters of no font as an em each', () => {
    expect(textWidth('橋門', 2.5)).toBeCloseTo(2 * emOf(2.5), 12);
    expect(charactersNotInFont('North 橋門 door 門')).toEqual(['橋', '門']);
    expect(charactersNotInFont('≤ ≥ √ ⌀ ½ α Ж 3.2 kN/m² −')).toEqual([]);
  });
});

describe('plain text', () => {
  it.each([
    ['a\u0000b\nc\td', 'a b c d'],
    ['line\u2028end\u2029', 'line end'],
    ['\u202egnp.exe\u202c', 'gnp.exe'],
    ['\u2066a\u2069 \u200fb', 'a b'],
    ['lone \ud800 half', 'lone half'],
    ['\ufffe\uffff', ''],
    ['  many   spaces ', 'many spaces'],
    ['a\u0301\u0302\u0303\u0304\u0305\u0306', 'a\u0301\u0302\u0303'],
    ['<script>alert(1)</script> %%d &amp;', '<script>alert(1)</script> %%d &amp;'],
  ])('makes %j into %j', (text, plain) => {
    expect(plainText(text)).toBe(plain);
  });

  it('keeps the narrow space that parts the thousands', () => {
    expect(plainText('12\u202f500 kN')).toBe('12\u202f500 kN');
  });
});

describe('lines', () => {
  const words = 'Do not stand under, prop or take material from an arch that shows recent movement';

  it('breaks between words, no line longer than asked, no word lost', () => {
    const lines = wrapText(words, 40, 1.8);
    expect(lines.length).toBeGreaterThan(2);
    for (const line of lines) expect(textWidth(line, 1.8)).toBeLessThanOrEqual(40);
    expect(lines.join(' ')).toBe(words);
  });

  it('breaks inside a word only where the word alone is too long', () => {
    const lines = wrapText(`ring ${'x'.repeat(200)}`, 40, 1.8);
    for (const line of lines) expect(textWidth(line, 1.8)).toBeLessThanOrEqual(40);
    expect(lines.join('').replace('ring', '')).toBe('x'.repeat(200));
  });

  it('cuts what is too long, with an ellipsis, and never through a letter with its accents', () => {
    const cut = cutToWidth('o\u0308'.repeat(60), 30, 2.5);
    expect(textWidth(cut, 2.5)).toBeLessThanOrEqual(30);
    expect(cut).toMatch(/^(?:o\u0308)+…$/);
    expect(cutToWidth('short', 30, 2.5)).toBe('short');
  });
});
