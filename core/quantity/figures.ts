/** Figures as they stand in a sentence or beside a dimension: a true minus sign, no exponent, never a minus before nothing. */

/** Rounded to `digits` significant figures, groups of three digits parted by a narrow space. */
export function figure(value: number, digits = 3): string {
  if (value === 0) return '0';
  const decimals = Math.min(6, Math.max(0, digits - 1 - Math.floor(Math.log10(Math.abs(value)))));
  return written(Math.abs(value).toFixed(decimals), value < 0);
}

/** Metres to the millimetre, with at least two decimals: 3.20, 0.355. */
export function metres(value: number): string {
  return written(Math.abs(value).toFixed(3).replace(/0$/, ''), value < 0);
}

function written(digits: string, negative: boolean): string {
  const [whole = '0', decimals] = digits.split('.');
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, '\u202f') : whole;
  const text = decimals === undefined ? grouped : `${grouped}.${decimals}`;
  return negative && /[1-9]/.test(text) ? `\u2212${text}` : text;
}
