import type { SheetOptions } from '../../core/drawing/elevation-sheet.ts';
import { metres } from '../../core/quantity/figures.ts';
import { formatQuantity } from '../../core/quantity/format.ts';
import type { Preferences } from '../../core/quantity/kinds.ts';
import { display } from './display.svelte.ts';

/** How figures are shown and typed, as the person has chosen. */
export const SHOWN: Preferences = {
  get units() {
    return display.units;
  },
  get decimal() {
    return display.decimal;
  },
};

/** A length, m, as drawings letter it: metres or millimetres without their sign, feet and inches with theirs. */
export function letteredLength(length: number): string {
  if (display.units === 'ft-in') return formatQuantity(length, 'length', SHOWN);
  if (display.units === 'mm') {
    const whole = Math.round(length * 1_000);
    return whole < 0 ? `\u2212${-whole}` : String(whole);
  }
  const text = metres(length);
  return display.decimal === 'comma' ? text.replace('.', ',') : text;
}

/** The same with its unit, for a sentence. */
export const lengthInWords = (length: number): string =>
  display.units === 'ft-in' ? letteredLength(length) : `${letteredLength(length)}\u00a0${display.units}`;

/** How a sheet letters lengths, and what it says of that; forces stay metric, as the findings are. */
export function sheetLettering(): Pick<SheetOptions, 'length' | 'lengthUnit' | 'units'> {
  const unit = display.units === 'ft-in' ? '' : display.units;
  return { length: letteredLength, lengthUnit: unit, units: `${unit === '' ? 'ft, in' : unit}, kN` };
}
