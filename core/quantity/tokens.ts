/**
 * A typed entry cut into numbers, units and signs, whatever marks the keyboard or a drawing gave it: comma or point,
 * primes for feet and inches, raised figures, fractions of one character.
 */
import type { Preferences } from './kinds.ts';
import { unitSpelling } from './math.ts';
import { refuse } from './refusal.ts';

export type Token =
  | { readonly type: 'number'; readonly value: number; readonly isWhole: boolean }
  /** A fraction of one character, such as ½. */
  | { readonly type: 'fraction'; readonly value: number }
  | { readonly type: 'unit'; readonly name: string; readonly isPrime: boolean }
  | { readonly type: 'sign'; readonly sign: Sign; readonly isTight: boolean };

export type Sign = '+' | '-' | '*' | '/' | '^' | '(' | ')';

const SAME_SIGN: Readonly<Record<string, string>> = {
  '−': '-',
  '–': '-',
  '×': '*',
  '·': '*',
  '⋅': '*',
  '÷': '/',
  '∕': '/',
  '⁄': '/',
  '’': "'",
  '‘': "'",
  '′': "'",
  '“': '"',
  '”': '"',
  '″': '"',
};

const FRACTIONS: Readonly<Record<string, number>> = {
  '½': 1 / 2,
  '¼': 1 / 4,
  '¾': 3 / 4,
  '⅛': 1 / 8,
  '⅜': 3 / 8,
  '⅝': 5 / 8,
  '⅞': 7 / 8,
  '⅓': 1 / 3,
  '⅔': 2 / 3,
};

const RAISED = '⁰¹²³⁴⁵⁶⁷⁸⁹';

const SPACE = /[\s\u00a0\u2009\u202f]+/y;
/** Groups of three may stand apart: 1 450. Not before a fraction, where 2 350/1000 would be another thing. */
const NUMBER =
  /(?:\d{1,3}(?:[ \u00a0\u2009\u202f]\d{3})+(?![\d\u00a0 ]*\/|\d)[\d.,]*|[\d.,]*\d[\d.,]*)(?:[eE][+-]?\d+)?/y;
const RAISED_NUMBER = /⁻?[⁰¹²³⁴⁵⁶⁷⁸⁹]+/y;
/** The 3 of m3, but not that of 8ft3in or 8ft3 1/2in. */
const POWER_BEHIND = /[23](?![\d.,'"’′″\p{L}]|\s*\d)/uy;
const NAME = /[\p{L}°]+/uy;

/**
 * @param note takes a remark on how something was read that could be read otherwise.
 * @throws Refusal with the first thing that has no meaning here.
 */
export function tokensOf(text: string, preferences: Preferences, note: (remark: string) => void): Token[] {
  const tokens: Token[] = [];
  let at = 0;
  const match = (pattern: RegExp): string | undefined => {
    pattern.lastIndex = at;
    const found = pattern.exec(text)?.[0];
    if (found !== undefined) at += found.length;
    return found;
  };
  let spaced = true;
  while (at < text.length) {
    if (match(SPACE) !== undefined) {
      spaced = true;
      continue;
    }
    const number = match(NUMBER);
    const raised = number === undefined ? match(RAISED_NUMBER) : undefined;
    const name = number === undefined && raised === undefined ? match(NAME) : undefined;
    if (number !== undefined) tokens.push(numberToken(number, preferences, note));
    else if (raised !== undefined) tokens.push(...power(raisedValue(raised)));
    else if (name !== undefined) tokens.push(...unitTokens(name, text, at, () => match(POWER_BEHIND)));
    else {
      const character = text.charAt(at);
      at += 1;
      tokens.push(markToken(SAME_SIGN[character] ?? character, !spaced && !/\s/.test(text.charAt(at))));
    }
    spaced = false;
  }
  return tokens;
}

function markToken(mark: string, isTight: boolean): Token {
  if (mark === "'") return { type: 'unit', name: 'ft', isPrime: true };
  if (mark === '"') return { type: 'unit', name: 'inch', isPrime: true };
  const fraction = FRACTIONS[mark];
  if (fraction !== undefined) return { type: 'fraction', value: fraction };
  if (!'+-*/^()'.includes(mark)) refuse(`the mark ${mark} has no meaning here`);
  return { type: 'sign', sign: mark as Sign, isTight };
}

/** A unit, with the 2 or 3 of m2 and m3 as its power. */
function unitTokens(name: string, text: string, at: number, powerBehind: () => string | undefined): Token[] {
  const spelling = name === '°' ? 'deg' : unitSpelling(name);
  if (spelling === undefined) {
    const isCall = /^\s*\(/.test(text.slice(at));
    refuse(
      isCall ? `${cut(name)}( ) is a function, and only arithmetic is taken` : `${cut(name)} is no unit known here`,
    );
  }
  const unit: Token = { type: 'unit', name: spelling, isPrime: false };
  const raised = powerBehind();
  return raised === undefined ? [unit] : [unit, ...power(Number(raised))];
}

function cut(name: string): string {
  return name.length > 20 ? `${name.slice(0, 20)}…` : name;
}

function power(value: number): Token[] {
  const signs: Token[] = value < 0 ? [{ type: 'sign', sign: '-', isTight: false }] : [];
  return [
    { type: 'sign', sign: '^', isTight: false },
    ...signs,
    { type: 'number', value: Math.abs(value), isWhole: true },
  ];
}

function raisedValue(raised: string): number {
  return Number(raised.replace(/./g, (digit) => (digit === '⁻' ? '-' : String(RAISED.indexOf(digit)))));
}

function numberToken(written: string, preferences: Preferences, note: (remark: string) => void): Token {
  const text = written.replace(/[ \u00a0\u2009\u202f]/g, '');
  const plain = withPoint(text, preferences, note);
  if (!/^(?:\d+(?:\.\d*)?|\.\d+)(?:[eE][+-]?\d+)?$/.test(plain)) refuse(`${written} is no number`);
  if (!Number.isFinite(Number(plain))) refuse(`${cut(written)} is too large`);
  return { type: 'number', value: Number(plain), isWhole: /^\d+$/.test(plain) };
}

/** The number with a decimal point and no marks between thousands. */
function withPoint(text: string, { openComma = 'decimal' }: Preferences, note: (remark: string) => void): string {
  const commas = text.split(',').length - 1;
  const points = text.split('.').length - 1;
  if (commas > 0 && points > 0) {
    const [thousands, mark] = text.lastIndexOf(',') > text.lastIndexOf('.') ? ['.', ','] : [',', '.'];
    return isGrouped(text.split(mark)[0] ?? '', thousands) ? text.replaceAll(thousands, '').replace(mark, '.') : text;
  }
  if (commas > 1) return isGrouped(text, ',') ? text.replaceAll(',', '') : text;
  if (points > 1) return isGrouped(text, '.') ? text.replaceAll('.', '') : text;
  if (commas === 0) return text;
  const isOpen = /^[1-9]\d{0,2},\d{3}$/.test(text);
  const asDecimal = text.replace(',', '.');
  if (!isOpen) return asDecimal;
  const isDecimal = openComma === 'decimal';
  const taken = isDecimal ? asDecimal : text.replace(',', '');
  note(`${text} taken as ${taken}, the comma ${isDecimal ? 'as the decimal mark' : 'between thousands'}`);
  return taken;
}

function isGrouped(text: string, mark: string): boolean {
  const [first = '', ...groups] = text.split(mark);
  return /^\d{1,3}$/.test(first) && groups.length > 0 && groups.every((group) => /^\d{3}$/.test(group));
}
