import { figure } from '../quantity/figures.ts';

/** A figure that a person entered, as far as it was given: 12, 0.35, 21.5; six significant figures at most. */
export function entered(value: number): string {
  const text = figure(value, 6);
  return text.includes('.') ? text.replace(/\.?0+$/, '') : text;
}
