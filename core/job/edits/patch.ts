/** Some fields of an object; `undefined` takes an optional field away, so that its default counts again. */
export type Patch<T> = { readonly [Key in keyof T]?: T[Key] | undefined };

/** The object with the patch laid over it; the same object when nothing changes, so that no undo step is made. */
export function patched<T extends object>(object: T, patch: Patch<T>): T {
  const before = object as Readonly<Record<string, unknown>>;
  const changes = Object.entries(patch).filter(([field, value]) => !Object.is(before[field], value));
  if (changes.length === 0) return object;
  const after: Record<string, unknown> = { ...before };
  for (const [field, value] of changes) {
    if (value === undefined) Reflect.deleteProperty(after, field);
    else after[field] = value;
  }
  return after as T;
}

/** `after`, or `before` itself where both have the same fields. */
export function unlessSame<T extends object>(before: T, after: T): T {
  const fields = Object.entries(after);
  const old = before as Readonly<Record<string, unknown>>;
  const isSame = fields.length === Object.keys(before).length && fields.every(([field, value]) => old[field] === value);
  return isSame ? before : after;
}

/** A number held between two limits; `otherwise` where it is not a finite number. Never minus zero. */
export function held(value: number, least: number, most: number, otherwise: number): number {
  return Number.isFinite(value) ? Math.min(Math.max(value, least), most) + 0 : otherwise;
}
