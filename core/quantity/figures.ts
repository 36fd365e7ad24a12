/** Figures as they stand in a sentence or beside a dimension, with a decimal point. */
import { formatFigure } from './format.ts';

/** Rounded to `digits` significant figures. */
export const figure = (value: number, digits = 3): string => formatFigure(value, digits, { decimal: 'point' });

/** Metres to the millimetre, with at least two decimals: 3.20, 0.355. */
export function metres(value: number): string {
  const text = Math.abs(value).toFixed(3).replace(/0$/, '');
  return value < 0 && /[1-9]/.test(text) ? `\u2212${text}` : text;
}

/** Safeties above this say no more than that the ring is far thicker than it need be. */
const MOST_SAFETY = 100;

/** A geometric safety in words that go after "is": `1.93`, or `more than 100`. */
export const safetyFigure = (safety: number): string =>
  safety > MOST_SAFETY ? `more than ${MOST_SAFETY}` : figure(safety);
