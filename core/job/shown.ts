/** How long a found value may be in a message before it is cut. */
const LONGEST = 60;

/** Control characters, and marks that turn the direction of text, are dropped so that a message stays one line. */
const UNPRINTABLE = /[\p{Cc}\p{Cf}\p{Zl}\p{Zp}]+/gu;

/** A value from a file as a short printable text for a message; lists and objects by their size. */
export function shown(value: unknown): string {
  if (value === undefined) return 'nothing';
  if (Array.isArray(value)) return value.length === 0 ? 'an empty list' : `a list of ${value.length}`;
  if (typeof value === 'object' && value !== null) {
    const names = Object.keys(value);
    return names.length === 0 ? 'an empty object' : `an object with ${cut(names.slice(0, 6).join(', '))}`;
  }
  if (typeof value === 'string') return `"${cut(value)}"`;
  return typeof value === 'number' || typeof value === 'boolean' ? String(value) : 'null';
}

function cut(text: string): string {
  const printable = text.slice(0, 4 * LONGEST).replace(UNPRINTABLE, ' ');
  return printable.length > LONGEST || text.length > 4 * LONGEST ? `${printable.slice(0, LONGEST)}…` : printable;
}
