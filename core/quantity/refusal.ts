/** Why an entry cannot be taken: one sentence for the person who typed it, without a full stop. */
export class Refusal extends Error {
  override readonly name = 'Refusal';
}

/** The library would multiply them; a person more likely left something out. */
export const SIDE_BY_SIDE = 'two figures stand side by side with no sign between them';

export function refuse(reason: string): never {
  throw new Refusal(reason);
}
