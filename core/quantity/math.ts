/**
 * The parts of the mathematics library that typed entry needs: its reading of expressions and its units. About half
 * of the whole, and worth loading only when something is typed.
 */
import {
  addDependencies,
  create,
  divideDependencies,
  multiplyDependencies,
  parseDependencies,
  powDependencies,
  subtractDependencies,
  unitDependencies,
} from 'mathjs';
import type { FactoryFunctionMap } from 'mathjs';

const PARTS: readonly (FactoryFunctionMap | undefined)[] = [
  parseDependencies,
  unitDependencies,
  addDependencies,
  subtractDependencies,
  multiplyDependencies,
  divideDependencies,
  powDependencies,
];

export const math = create(PARTS.reduce<FactoryFunctionMap>((all, part) => Object.assign(all, part), {}));

/** The units that an entry may name, as the library spells them. Compound ones are given by exact ones. */
const UNITS: Readonly<Record<string, string>> = {
  m: 'm',
  mm: 'mm',
  cm: 'cm',
  dm: 'dm',
  km: 'km',
  metre: 'm',
  metres: 'm',
  meter: 'm',
  meters: 'm',
  in: 'inch',
  inch: 'inch',
  inches: 'inch',
  ft: 'ft',
  foot: 'ft',
  feet: 'ft',
  yd: 'yd',
  N: 'N',
  kN: 'kN',
  MN: 'MN',
  lbf: 'lbf',
  kip: '1000 lbf',
  kips: '1000 lbf',
  kgf: 'kgf',
  kg: 'kg',
  t: 'tonne',
  tonne: 'tonne',
  tonnes: 'tonne',
  lb: 'lbm',
  lbs: 'lbm',
  Pa: 'Pa',
  kPa: 'kPa',
  MPa: 'MPa',
  GPa: 'GPa',
  bar: '1e5 Pa',
  psi: 'lbf/inch^2',
  ksi: '1000 lbf/inch^2',
  psf: 'lbf/ft^2',
  pcf: 'lbf/ft^3',
  deg: 'deg',
  degree: 'deg',
  degrees: 'deg',
  rad: 'rad',
  gon: '0.9 deg',
};

/** The library's spelling of a unit, or undefined for a name that is none. Spelt as printed: kN, MPa, mm. */
export function unitSpelling(name: string): string | undefined {
  return Object.hasOwn(UNITS, name) ? UNITS[name] : undefined;
}
