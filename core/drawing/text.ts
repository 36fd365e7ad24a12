/**
 * How wide a piece of lettering is, without a screen: labels are measured in the core so that placing, tests and every
 * export agree. Heights are those of capital letters in paper millimetres, as ISO 3098 counts them.
 */
import { BOLD_WIDTHS, REGULAR_WIDTHS, UNITS_PER_EM } from './text-widths.ts';

export type Face = 'regular' | 'bold' | 'oblique';

/** Height of a capital letter as a share of the em, from the outline of H in DejaVu Sans. */
export const CAPITAL_HEIGHT = 0.729;
/** How far the ink of ordinary text reaches over and under the baseline, as shares of the em: bars and brackets. */
export const ASCENT = 0.77;
const DESCENT = 0.24;
/** Characters that the font lacks are taken as wide as an em: ideographs are, and most others are narrower. */
const FALLBACK_WIDTH = 1;

function readWidths(source: string): ReadonlyMap<number, number> {
  const widths = new Map<number, number>();
  let code = 0;
  for (const token of source.trim().split(/\s+/)) {
    if (token.startsWith('U+')) {
      code = Number.parseInt(token.slice(2), 16);
      continue;
    }
    const [width, count] = token.split('*');
    for (let i = Number(count ?? 1); i > 0; i--) widths.set(code++, Number(width) / UNITS_PER_EM);
  }
  return widths;
}

const REGULAR = readWidths(REGULAR_WIDTHS);
const BOLD = readWidths(BOLD_WIDTHS);

/** The em, mm, that gives capitals this height, mm: what other programs call the font size. */
export const emOf = (height: number): number => height / CAPITAL_HEIGHT;

/** Length of one line of text, mm, with capitals `height` mm high. */
export function textWidth(text: string, height: number, face: Face = 'regular'): number {
  const widths = face === 'bold' ? BOLD : REGULAR;
  let ems = 0;
  for (const character of text) {
    const code = character.codePointAt(0) as number;
    ems += widths.get(code) ?? (COMBINING.test(character) ? 0 : FALLBACK_WIDTH);
  }
  return ems * emOf(height);
}

const COMBINING = /^\p{Mn}$/u;

/** Figures stand on the line. */
const STANDING = /^[\d.−\s]*$/u;

/** How far the ink of this text reaches below its baseline, as a share of the em. */
export const descentOf = (text: string): number => (STANDING.test(text) ? 0.02 : DESCENT);

/** The characters of a text that the program's own font cannot show, each once; another font will stand in for them. */
export function charactersNotInFont(text: string): string[] {
  return [...new Set(Array.from(text))].filter((character) => !REGULAR.has(character.codePointAt(0) as number));
}

/** Control characters, marks that turn the direction of text, stray halves of pairs, line ends, non-characters. */
const NOT_PLAIN = /[\p{Cc}\p{Cf}\p{Cs}\p{Zl}\p{Zp}\p{Noncharacter_Code_Point}]+/gu;
/** More marks than this over one letter would climb out of their line. */
const STACKED_MARKS = /(\p{Mn}{3})\p{Mn}+/gu;

/** One line of inert text: nothing in it can break a line, turn its direction or climb out of its box. */
export function plainText(text: string): string {
  return text.replace(NOT_PLAIN, ' ').replace(STACKED_MARKS, '$1').replace(/ {2,}/g, ' ').trim();
}

const letters = new Intl.Segmenter('en', { granularity: 'grapheme' });

/** The text, or as much of its beginning as fits in `width` mm, with an ellipsis. */
export function cutToWidth(text: string, width: number, height: number, face: Face = 'regular'): string {
  if (textWidth(text, height, face) <= width) return text;
  const room = width - textWidth('…', height, face);
  let kept = '';
  let used = 0;
  for (const { segment } of letters.segment(text)) {
    used += textWidth(segment, height, face);
    if (used > room) break;
    kept += segment;
  }
  return `${kept.trimEnd()}…`;
}

/** The text broken into lines no longer than `width` mm: between words, and inside a word only where it must be. */
export function wrapText(text: string, width: number, height: number, face: Face = 'regular'): string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(' ')) {
    const longer = line === '' ? word : `${line} ${word}`;
    if (textWidth(longer, height, face) <= width) {
      line = longer;
      continue;
    }
    if (line !== '') lines.push(line);
    const parts = breakWord(word, width, height, face);
    lines.push(...parts.slice(0, -1));
    line = parts.at(-1) ?? '';
  }
  if (line !== '') lines.push(line);
  return lines;
}

function breakWord(word: string, width: number, height: number, face: Face): string[] {
  if (textWidth(word, height, face) <= width) return [word];
  const parts: string[] = [];
  let part = '';
  for (const { segment } of letters.segment(word)) {
    if (part !== '' && textWidth(part + segment, height, face) > width) {
      parts.push(part);
      part = '';
    }
    part += segment;
  }
  return [...parts, part];
}
