import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatQuantity } from '../../../core/quantity/format.ts';
import { KINDS } from '../../../core/quantity/kinds.ts';
import type { Preferences, QuantityKind } from '../../../core/quantity/kinds.ts';
import { math } from '../../../core/quantity/math.ts';
import { parseQuantity } from '../../../core/quantity/parse.ts';

const METRES: Preferences = { units: 'm', decimal: 'point' };
const MILLIMETRES: Preferences = { units: 'mm', decimal: 'comma' };
const FEET: Preferences = { units: 'ft-in', decimal: 'point' };

function valueOf(text: string, kind: QuantityKind = 'length', preferences = METRES): number {
  const parsed = parseQuantity(text, kind, preferences);
  if (!parsed.ok) throw new Error(`${text}: ${parsed.reason}`);
  return parsed.value;
}

function understood(text: string, kind: QuantityKind = 'length', preferences = METRES): string {
  const parsed = parseQuantity(text, kind, preferences);
  return parsed.ok ? parsed.understood.replace(/[\u2009\u00a0]/g, ' ') : `refused: ${parsed.reason}`;
}

function reason(text: string, kind: QuantityKind = 'length', preferences = METRES): string {
  const parsed = parseQuantity(text, kind, preferences);
  return parsed.ok ? `taken: ${parsed.understood}` : parsed.reason;
}

describe('a length as typed', () => {
  it.each([
    ['2.45', 2.45],
    ['2,45 m', 2.45],
    ['.35', 0.35],
    ['350 mm', 0.35],
    ['2300 mm', 2.3],
    ['1 450 mm', 1.45],
    ['1\u2009450\u00a0mm', 1.45],
    ['1.2 + 0.35', 1.55],
    ['2 m + 14 cm', 2.14],
    ['3.2 m - 2 * 35 cm', 2.5],
    ['(1.2 + 0.8) / 2', 1],
    ['1/3 m', 1 / 3],
    ['2^2 m', 4],
    ['−0,4', -0.4],
    ['½ m', 0.5],
    ['1.2e1 m', 12],
    ['2 yd', 1.8288],
  ])('%s', (text, metres) => {
    expect(valueOf(text)).toBeCloseTo(metres, 14);
  });

  // 8 ft 3 1/2 in is 99.5 in of 25.4 mm each (the international inch, exact since 1959).
  it.each([
    `8' 3 1/2"`,
    `8'3 1/2"`,
    `8'-3 1/2"`,
    `8'-3-1/2"`,
    '8′ 3½″',
    '8’ 3½”',
    '8ft 3 1/2in',
    '8 ft 3-1/2 in',
    '8 feet 3.5 inches',
    '8ft3.5in',
    `8' 3 1/2`,
    '99 1/2 in',
    `7' + 15 1/2"`,
  ])('%s, in feet and inches', (text) => {
    expect(valueOf(text)).toBe(2.5273);
  });

  it('is negative as a whole where feet and inches have a minus before them', () => {
    expect(valueOf(`-8' 3"`)).toBe(-2.5146);
  });

  it('is subtracted where the minus stands apart', () => {
    expect(valueOf(`8' - 3"`)).toBeCloseTo(7.75 * 0.3048, 14);
  });

  it('has a fraction of an inch by itself', () => {
    expect(valueOf(`3/4"`)).toBe(0.01905);
    expect(valueOf(`8' 1/2"`)).toBe(2.4511);
  });

  it('is in the preferred unit when it has none', () => {
    expect(valueOf('350', 'length', MILLIMETRES)).toBe(0.35);
    expect(valueOf('8', 'length', FEET)).toBe(2.4384);
  });
});

describe('other kinds as typed', () => {
  // Exact: 1 lb = 0.45359237 kg (international pound), standard gravity 9.80665 m/s².
  it.each<[string, QuantityKind, number]>([
    ['12 kN', 'force', 12],
    ['12', 'force', 12],
    ['850 N', 'force', 0.85],
    ['1.2 t', 'force', 11.76798],
    ['100 kg', 'force', 0.980665],
    ['1000 lbf', 'force', 4.4482216152605],
    ['2 kip', 'force', 8.896443230521],
    ['22 kN/m3', 'unitWeight', 22],
    ['22 kN/m³', 'unitWeight', 22],
    ['1450 kg/m³', 'unitWeight', 14.2196425],
    ['140 lbf/ft^3', 'unitWeight', 21.9922449],
    ['140 pcf', 'unitWeight', 21.9922449],
    ['8 kN/m2', 'intensity', 8],
    ['500 kg/m²', 'intensity', 4.903325],
    ['100 psf', 'intensity', 4.7880259],
    ['5.8 MPa', 'strength', 5.8],
    ['5.8 N/mm²', 'strength', 5.8],
    ['840 psi', 'strength', 5.7915961],
    ['70°', 'angle', 70],
    ['1 rad', 'angle', 57.29577951],
    ['0,6', 'plain', 0.6],
    ['21', 'plain', 21],
    ['3 m / 2 m', 'plain', 1.5],
  ])('%s is %s %f', (text, kind, value) => {
    expect(valueOf(text, kind)).toBeCloseTo(value, 7);
  });

  it('says that a mass was taken with its weight', () => {
    expect(understood('1.2 t', 'force')).toBe('11.768 kN; a mass, taken with its weight under g = 9.80665 m/s²');
  });

  it('shows what was kept beside what was typed where the units differ', () => {
    expect(understood('8', 'length', FEET)).toBe('8′ = 2.4384 m');
    expect(understood('500', 'force', FEET)).toBe('500 lbf = 2.22411 kN');
    expect(understood('2.45')).toBe('2.45 m');
  });
});

describe('commas and points', () => {
  it('take a single comma with three figures as the decimal mark, and say so', () => {
    expect(valueOf('1,234')).toBe(1.234);
    expect(understood('1,234')).toBe('1.234 m; 1,234 taken as 1.234, the comma as the decimal mark');
  });

  it('take it between thousands where that is preferred, and say so', () => {
    const preferences: Preferences = { ...METRES, units: 'mm', openComma: 'thousands' };
    expect(valueOf('1,234', 'length', preferences)).toBe(1.234);
    expect(understood('1,234', 'length', preferences)).toContain('1,234 taken as 1234, the comma between thousands');
  });

  it.each([
    ['0,350', 0.35],
    ['1,2345', 1.2345],
    ['1,234.5 mm', 1.2345],
    ['1.234,5 mm', 1.2345],
  ])('leave no doubt in %s', (text, metres) => {
    expect(parseQuantity(text, 'length', METRES)).toEqual({ ok: true, value: metres, understood: `${metres}\u00a0m` });
  });

  it('stand between thousands where there is more than one', () => {
    expect(valueOf('1,234,500 N', 'force')).toBe(1234.5);
    expect(valueOf('1.234.500 N', 'force')).toBe(1234.5);
  });
});

describe('what cannot be taken', () => {
  it.each<[string, string]>([
    ['', 'nothing is entered'],
    ['   ', 'nothing is entered'],
    ['m', 'a figure is missing'],
    ['12 kN', 'this is a force; a length is wanted, in m, cm, mm, ft or in, such as 2.45 m'],
    ['2 m^2', 'the unit does not suit; a length is wanted, in m, cm, mm, ft or in, such as 2.45 m'],
    ['6 m / 2 m', 'the units cancel one another out'],
    ['1/0', 'this divides by nothing'],
    ['1 m / (2 - 2)', 'this divides by nothing'],
    ['0^-1', 'this divides by nothing'],
    ['(-1)^0.5', 'this has no real value'],
    ['2 km', 'too large for a length; at most 1\u2009000 m is taken'],
    ['1e999', '1e999 is too large'],
    ['9^9^9', 'the result is too large'],
    ['2^(1 m)', 'a power is a figure without a unit'],
    ['(2 m)^13', 'a unit is raised to whole powers up to 12'],
    ['2 + 3 m', 'a figure with a unit and one without cannot be added; give both their unit'],
    ['2 m + 3 kN', 'these units cannot be added to one another'],
    ['2 m 3', 'two figures stand side by side with no sign between them'],
    ['2 3 m', 'two figures stand side by side with no sign between them'],
    ['(2 + 3', 'this is not complete arithmetic'],
    ['2 *', 'this is not complete arithmetic'],
    ['1..2', '1..2 is no number'],
    ['1,2,3', '1,2,3 is no number'],
    ['5 furlongs', 'furlongs is no unit known here'],
    ['2 # 3', 'the mark # has no meaning here'],
    ['9'.repeat(201), 'an entry has at most 200 characters'],
  ])('%s', (text, why) => {
    expect(reason(text)).toBe(why);
  });

  it.each([
    'sqrt(4)',
    'f(x) = x',
    'x',
    'pi',
    'e',
    'i',
    'true',
    'Infinity',
    'NaN',
    'import("a")',
    'constructor',
    '__proto__',
  ])('nothing but numbers, units and arithmetic: %s', (text) => {
    expect(reason(text)).toMatch(/is no unit known here|is a function, and only arithmetic|has no meaning here/);
  });

  it.each(['[1, 2]', '{a: 1}', '"1"', '1; 2', '1:3', '3!', '5 % 3', 'a = 1', '2 < 3', '2 and 3', '1 to 2', "5'[0]"])(
    'no other part of the mathematics library: %s',
    (text) => {
      expect(parseQuantity(text, 'plain', METRES).ok).toBe(false);
    },
  );

  it('a unit in a plain figure', () => {
    expect(reason('5 m', 'plain')).toBe('this is a length; a figure without a unit is wanted, such as 0.6');
  });

  it('never throws and never yields what is not finite, whatever is typed', () => {
    const typed = fc.oneof(
      fc.string({ maxLength: 30 }),
      fc
        .array(fc.constantFrom(...Array.from('0123456789.,\'"+-*/^() ½²mk'), 'ft', 'in', 'kN', ' m', '1/2'), {
          maxLength: 14,
        })
        .map((parts) => parts.join('')),
    );
    fc.assert(
      fc.property(typed, fc.constantFrom<QuantityKind>('length', 'force', 'plain'), (text, kind) => {
        const parsed = parseQuantity(text, kind, METRES);
        return parsed.ok ? Number.isFinite(parsed.value) && !Object.is(parsed.value, -0) : parsed.reason !== '';
      }),
      { numRuns: 2_000 },
    );
  });
});

describe('what is shown can be typed again', () => {
  const kinds = Object.keys(KINDS) as QuantityKind[];
  const preferences = [METRES, MILLIMETRES, FEET];
  const cases = fc
    .record({ kind: fc.constantFrom(...kinds), choice: fc.constantFrom(...preferences) })
    .chain(({ kind, choice }) => {
      const { most } = KINDS[kind];
      return fc.record({
        kind: fc.constant(kind),
        choice: fc.constant(choice),
        value: fc
          .double({ min: -0.99 * most, max: 0.99 * most, noNaN: true })
          .filter((value) => Math.abs(value) > 1e-9),
      });
    });

  it('exactly, with every figure', () => {
    fc.assert(
      fc.property(cases, ({ kind, choice, value }) => {
        const again = valueOf(formatQuantity(value, kind, choice, { figures: 'exact' }), kind, choice);
        // Feet and inches go to half a ten-thousandth of an inch; the rest lose the roundings of one change of unit.
        const tolerance = kind === 'length' && choice.units === 'ft-in' ? 0.0254 * 0.51e-4 : 1e-11 * Math.abs(value);
        expect(Math.abs(again - value)).toBeLessThanOrEqual(tolerance);
      }),
      { numRuns: 500 },
    );
  });

  it('to three figures', () => {
    fc.assert(
      fc.property(cases, ({ kind, choice, value }) => {
        const again = valueOf(formatQuantity(value, kind, choice), kind, choice);
        // Half of the third figure is at most five in a thousand; in feet and inches half a sixteenth of an inch.
        const tolerance = kind === 'length' && choice.units === 'ft-in' ? 0.0254 / 31.9 : 0.005001 * Math.abs(value);
        expect(Math.abs(again - value)).toBeLessThanOrEqual(tolerance);
      }),
      { numRuns: 500 },
    );
  });

  it('with the sizes of units that the mathematics library has too', () => {
    for (const { base, imperial } of Object.values(KINDS)) {
      if (base.entry === '') continue;
      const size = math.unit(imperial.entry).toNumber(base.entry);
      // The library keeps psi to twelve figures.
      expect(imperial.size / size).toBeCloseTo(1, 9);
    }
  });
});
