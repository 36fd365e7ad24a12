/** The first of `a1`, `a2`, … that none of the entries has. */
export function nextId(letter: string, entries: readonly { readonly id: string }[]): string {
  const taken = new Set(entries.map(({ id }) => id));
  let number = entries.length + 1;
  while (taken.has(`${letter}${number}`)) number += 1;
  return `${letter}${number}`;
}
