/**
 * The kinds of figure that are typed and shown, the unit in which each is kept, and the units in which a person may
 * prefer to see it. Kept in: m, kN, kN/m³, kN/m², MPa, degrees; plain figures have no unit.
 */
export type QuantityKind = 'length' | 'force' | 'unitWeight' | 'intensity' | 'strength' | 'angle' | 'plain';

export interface Preferences {
  /** Metres, millimetres for lengths with the other units metric, or feet and inches with pounds. */
  readonly units: 'm' | 'mm' | 'ft-in';
  /** The decimal mark that is shown. Either is taken when typed. */
  readonly decimal: 'point' | 'comma';
  /**
   * What an entry such as 1,234 means, which can be read either way. The decimal mark where not said: thousands are
   * seldom typed for the figures of an arch.
   */
  readonly openComma?: 'decimal' | 'thousands';
}

export const DEFAULT_PREFERENCES: Preferences = { units: 'm', decimal: 'point' };

export interface DisplayUnit {
  /** As printed behind a figure; empty for plain figures. */
  readonly symbol: string;
  /** As the entry's unit names it; empty for plain figures. */
  readonly entry: string;
  /** How many of the unit in which the kind is kept. */
  readonly size: number;
}

interface KindWords {
  /** With its article, for a sentence. */
  readonly noun: string;
  /** Units one may type, for a sentence. */
  readonly typed: string;
  readonly example: string;
  readonly base: DisplayUnit;
  readonly imperial: DisplayUnit;
  /** Beyond this in the base unit it is a slip of the hand; the same limits as in the job's schema. */
  readonly most: number;
}

/** Exact by the international yard and pound agreement of 1959 and standard gravity. */
export const FOOT = 0.3048;
export const INCH = 0.0254;
export const STANDARD_GRAVITY = 9.80665;
const POUND_FORCE_KN = (0.45359237 * STANDARD_GRAVITY) / 1_000;

const DEGREE: DisplayUnit = { symbol: '°', entry: 'deg', size: 1 };
const NO_UNIT: DisplayUnit = { symbol: '', entry: '', size: 1 };

export const KINDS: Readonly<Record<QuantityKind, KindWords>> = {
  length: {
    noun: 'a length',
    typed: 'm, cm, mm, ft or in',
    example: '2.45 m',
    base: { symbol: 'm', entry: 'm', size: 1 },
    imperial: { symbol: 'ft', entry: 'ft', size: FOOT },
    most: 1_000,
  },
  force: {
    noun: 'a force',
    typed: 'kN, N, t, kg, lbf or kip',
    example: '12 kN',
    base: { symbol: 'kN', entry: 'kN', size: 1 },
    imperial: { symbol: 'lbf', entry: 'lbf', size: POUND_FORCE_KN },
    most: 1e7,
  },
  unitWeight: {
    noun: 'a unit weight',
    typed: 'kN/m³, kg/m³ or lbf/ft³',
    example: '22 kN/m³',
    base: { symbol: 'kN/m³', entry: 'kN/m^3', size: 1 },
    imperial: { symbol: 'lbf/ft³', entry: 'lbf/ft^3', size: POUND_FORCE_KN / FOOT ** 3 },
    most: 200,
  },
  intensity: {
    noun: 'a load on an area',
    typed: 'kN/m², kg/m² or lbf/ft²',
    example: '8 kN/m²',
    base: { symbol: 'kN/m²', entry: 'kN/m^2', size: 1 },
    imperial: { symbol: 'lbf/ft²', entry: 'lbf/ft^2', size: POUND_FORCE_KN / FOOT ** 2 },
    most: 1e7,
  },
  strength: {
    noun: 'a strength',
    typed: 'MPa, N/mm², kPa or psi',
    example: '5.8 MPa',
    base: { symbol: 'MPa', entry: 'MPa', size: 1 },
    imperial: { symbol: 'psi', entry: 'psi', size: POUND_FORCE_KN / 1_000 / INCH ** 2 },
    most: 1_000,
  },
  angle: {
    noun: 'an angle',
    typed: '° or rad',
    example: '70°',
    base: DEGREE,
    imperial: DEGREE,
    most: 360,
  },
  plain: {
    noun: 'a figure without a unit',
    typed: 'none',
    example: '0.6',
    base: NO_UNIT,
    imperial: NO_UNIT,
    most: 1e9,
  },
};

const MILLIMETRE: DisplayUnit = { symbol: 'mm', entry: 'mm', size: 0.001 };

/** The unit in which a bare figure of this kind is taken and shown. */
export function displayUnit(kind: QuantityKind, preferences: Preferences): DisplayUnit {
  if (preferences.units === 'ft-in') return KINDS[kind].imperial;
  return kind === 'length' && preferences.units === 'mm' ? MILLIMETRE : KINDS[kind].base;
}
