import { describe, expect, it } from 'vitest';
import { formatFigure, formatQuantity } from '../../../core/quantity/format.ts';
import { DEFAULT_PREFERENCES } from '../../../core/quantity/kinds.ts';
import type { Preferences, QuantityKind } from '../../../core/quantity/kinds.ts';

const METRES = DEFAULT_PREFERENCES;
const MILLIMETRES: Preferences = { units: 'mm', decimal: 'comma' };
const FEET: Preferences = { units: 'ft-in', decimal: 'point' };

/** With the spaces of typesetting as plain ones, to be read in this file. */
function plain(text: string): string {
  return text.replace(/[\u2009\u00a0]/g, ' ');
}

describe('a figure for a person', () => {
  it.each<[number, QuantityKind, string]>([
    [2.4537, 'length', '2.45 m'],
    [0.35, 'length', '0.350 m'],
    [14, 'force', '14.0 kN'],
    [1453.2, 'force', '1 450 kN'],
    [999.6, 'force', '1 000 kN'],
    [0.09996, 'force', '0.100 kN'],
    [22, 'unitWeight', '22.0 kN/m³'],
    [8, 'intensity', '8.00 kN/m²'],
    [5.8, 'strength', '5.80 MPa'],
    [70, 'angle', '70.0°'],
    [0.6, 'plain', '0.600'],
    [-12.34, 'force', '−12.3 kN'],
    [2e-9, 'plain', '2.00 × 10⁻⁹'],
  ])('%f %s has three significant figures: %s', (value, kind, text) => {
    expect(plain(formatQuantity(value, kind, METRES))).toBe(text);
  });

  it('has every figure that was entered where exactness is asked', () => {
    expect(plain(formatQuantity(1453.25, 'force', METRES, { figures: 'exact' }))).toBe('1 453.25 kN');
    expect(plain(formatQuantity(0.35, 'length', METRES, { figures: 'exact' }))).toBe('0.35 m');
    expect(plain(formatQuantity(2.3, 'length', MILLIMETRES, { figures: 'exact' }))).toBe('2 300 mm');
    expect(plain(formatQuantity(0.1 + 0.2, 'length', MILLIMETRES, { figures: 'exact' }))).toBe('300 mm');
  });

  it('has a true minus, thin spaces between thousands and a space before the unit that does not break', () => {
    expect(formatQuantity(-12500, 'force', METRES)).toBe('\u221212\u2009500\u00a0kN');
  });

  it('has a decimal comma where preferred', () => {
    expect(plain(formatQuantity(2.5273, 'length', MILLIMETRES, { figures: 'exact' }))).toBe('2 527,3 mm');
  });

  it('has no unit where its column has one', () => {
    expect(formatQuantity(14.04, 'force', METRES, { unit: false })).toBe('14.0');
  });

  it('is never minus nought', () => {
    expect(formatQuantity(-0, 'length', METRES)).toBe('0\u00a0m');
    expect(formatQuantity(-0, 'length', FEET)).toBe('0′');
    expect(formatQuantity(-1e-5, 'length', FEET)).toBe('0′');
    expect(formatFigure(-0, 'exact', METRES)).toBe('0');
  });

  it('is refused when it is not finite, so that no NaN is ever shown', () => {
    expect(() => formatQuantity(Number.NaN, 'length', METRES)).toThrow(RangeError);
    expect(() => formatQuantity(Infinity, 'length', FEET)).toThrow(RangeError);
  });
});

describe('a length in feet and inches', () => {
  it.each([
    [2.5273, '8′ 3 1/2″'],
    [2.4384, '8′'],
    [0.3047999, '1′'],
    [0.0889, '3 1/2″'],
    [0.0254 / 16, '1/16″'],
    [-2.5146, '−8′ 3″'],
    [2.4384 + 0.0254 / 2, '8′ 1/2″'],
    [0.35, '1′ 1 3/4″'],
    [304.8, '1 000′'],
  ])('%f m is %s, to the nearest sixteenth', (metres, text) => {
    expect(plain(formatQuantity(metres, 'length', FEET))).toBe(text);
  });

  it('goes by decimals of an inch where exactness is asked and it is no sixteenth', () => {
    expect(formatQuantity(0.35, 'length', FEET, { figures: 'exact' })).toBe('1′ 1.7795″');
    expect(formatQuantity(2.5273, 'length', FEET, { figures: 'exact' })).toBe('8′ 3 1/2″');
  });
});
