/**
 * A kept figure as text for a person: significant figures, U+2212 for minus, thin spaces between thousands, lengths in
 * feet, inches and sixteenths where preferred. Whatever it writes, `parseQuantity` reads back.
 */
import { FOOT, INCH, displayUnit } from './kinds.ts';
import type { Preferences, QuantityKind } from './kinds.ts';

export interface FormatOptions {
  /**
   * Significant figures, 3 where not said; `exact` for every figure that was entered, with no noughts added. Lengths
   * in inches go by sixteenths instead, exact ones by decimals where they are no sixteenth.
   */
  readonly figures?: number | 'exact';
  /** Without its unit for columns that have it in their head. Feet and inches always carry theirs. */
  readonly unit?: boolean;
}

const MINUS = '\u2212';
const THIN_SPACE = '\u2009';
const NO_BREAK_SPACE = '\u00a0';
const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** Figures this small or large are written with a power of ten. */
const LEAST_PLAIN = 1e-6;
const MOST_PLAIN = 1e12;

/** Decimals of an inch in an exact length that is no sixteenth: 0.0025 mm, finer than stone is measured. */
const INCH_DECIMALS = 4;
const SAME_INCH = 10 ** -INCH_DECIMALS / 2;
const SIXTEENTHS = 16;

/**
 * @param value in the unit in which the kind is kept: m, kN, kN/m³, kN/m², MPa, degrees.
 * @throws RangeError when the value is not finite; what is not known is the caller's to word.
 */
export function formatQuantity(
  value: number,
  kind: QuantityKind,
  preferences: Preferences,
  options: FormatOptions = {},
): string {
  if (!Number.isFinite(value)) throw new RangeError('only a finite figure can be written');
  const { figures = 3, unit = true } = options;
  if (kind === 'length' && preferences.units === 'ft-in') return feetAndInches(value, figures === 'exact', preferences);
  const { symbol, size } = displayUnit(kind, preferences);
  const shown = value / size;
  const figure = formatFigure(figures === 'exact' ? tidied(shown) : shown, figures, preferences);
  if (!unit || symbol === '') return figure;
  return symbol === '°' ? `${figure}°` : `${figure}${NO_BREAK_SPACE}${symbol}`;
}

/** A figure without a unit. */
export function formatFigure(
  value: number,
  figures: number | 'exact',
  { decimal }: Pick<Preferences, 'decimal'>,
): string {
  const size = Math.abs(value);
  const rounded = figures === 'exact' ? size : Number(size.toPrecision(figures));
  if (rounded === 0) return '0';
  const isPlain = rounded >= LEAST_PLAIN && rounded < MOST_PLAIN;
  const text = isPlain ? plain(rounded, figures) : withPower(rounded, figures);
  return `${value < 0 ? MINUS : ''}${decimal === 'comma' ? text.replace('.', ',') : text}`;
}

function plain(value: number, figures: number | 'exact'): string {
  const digits = figures === 'exact' ? exactDigits(value) : value.toFixed(decimalsFor(value, figures));
  const [whole = '', fraction] = digits.split('.');
  const grouped = whole.length > 3 ? whole.replace(/\B(?=(?:\d{3})+$)/g, THIN_SPACE) : whole;
  return fraction === undefined ? grouped : `${grouped}.${fraction}`;
}

/** Every digit of a figure without the exponent that figures below a millionth would carry. */
function exactDigits(value: number): string {
  const text = String(value);
  return text.includes('e') ? value.toFixed(20).replace(/0+$/, '') : text;
}

function decimalsFor(value: number, figures: number): number {
  return Math.max(0, figures - 1 - Math.floor(Math.log10(value) + 1e-12));
}

function withPower(value: number, figures: number | 'exact'): string {
  const [mantissa = '', power = ''] = value.toExponential(figures === 'exact' ? undefined : figures - 1).split('e');
  const raised = power
    .replace('+', '')
    .replace(/[-\d]/g, (digit) => (digit === '-' ? '⁻' : SUPERSCRIPTS.charAt(Number(digit))));
  return `${mantissa} × 10${raised}`;
}

/** Without the last digits that a change of unit leaves behind, as in 2300.0000000000005 mm. */
export function tidied(value: number): number {
  const short = Number(value.toPrecision(12));
  return Math.abs(short - value) <= 8 * Number.EPSILON * Math.abs(value) ? short : value;
}

function feetAndInches(value: number, exact: boolean, preferences: Preferences): string {
  const inches = Math.abs(value) / INCH;
  const sixteenths = Math.round(inches * SIXTEENTHS);
  if (exact && Math.abs(inches - sixteenths / SIXTEENTHS) > SAME_INCH) {
    const feet = Math.floor(tidied(Math.abs(value) / FOOT));
    const rest = formatFigure(Number((inches - 12 * feet).toFixed(INCH_DECIMALS)), 'exact', preferences);
    return signed(value, feet === 0 ? `${rest}″` : `${feetText(feet)} ${rest}″`);
  }
  const feet = Math.floor(sixteenths / (12 * SIXTEENTHS));
  const inchText = inchesAndFraction(sixteenths - feet * 12 * SIXTEENTHS);
  if (sixteenths === 0) return '0′';
  if (feet === 0) return signed(value, `${inchText}″`);
  return signed(value, inchText === '0' ? feetText(feet) : `${feetText(feet)} ${inchText}″`);
}

function feetText(feet: number): string {
  return `${plain(feet, 'exact')}′`;
}

function signed(value: number, text: string): string {
  return value < 0 ? `${MINUS}${text}` : text;
}

/** `3 1/2` of 56 sixteenths; below one foot. */
function inchesAndFraction(sixteenths: number): string {
  const whole = Math.floor(sixteenths / SIXTEENTHS);
  let over = sixteenths % SIXTEENTHS;
  let under = SIXTEENTHS;
  if (over === 0) return String(whole);
  while (over % 2 === 0) [over, under] = [over / 2, under / 2];
  return whole === 0 ? `${over}/${under}` : `${whole} ${over}/${under}`;
}
