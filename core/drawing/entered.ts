import { figure } from '../quantity/figures.ts';

/** A figure that a person entered, as far as it was given: 12, 0.35, 21.5; six significant figures at most. */
export function entered(value: number): string {
  const text = figure(value, 6);
  return text.includes('.') ? text.replace(/\.?0+$/, '') : text;
}

/** A width as it is read off a crack gauge: tenths under a centimetre, whole millimetres over it. */
export function millimetres(metres: number): string {
  const value = metres * 1000;
  return `${entered(Math.abs(value) < 10 ? Math.round(value * 10) / 10 : Math.round(value))} mm`;
}
