/**
 * What was changed between two schemes, field by field, in words. Both are compared as the assessment takes them, so that
 * a figure entered where the same one was assumed counts as no change.
 */
import { resolveScheme, type ResolvedScheme } from '../../core/job/defaults.ts';
import type { ProfileShape, Scheme } from '../../core/job/schema.ts';
import { formatQuantity } from '../../core/quantity/format.ts';
import type { QuantityKind } from '../../core/quantity/kinds.ts';
import { measureAt } from '../session/measures.ts';
import { SHOWN } from '../session/preferences.ts';
import { shapeName } from '../session/shapes.ts';

export interface Change {
  /** Field path from the scheme's root, as in `profile.span`; entries of lists by their id, as in `loads.l1.x`. */
  readonly path: string;
  /** As a heading: `Rise`, `Hoist floor beam: force`. */
  readonly name: string;
  readonly before: string;
  readonly after: string;
}

/** Both filled as the arch has them; `indexes` are their places in it. */
export function changesBetween(before: Scheme, after: Scheme, indexes: readonly [number, number] = [0, 1]): Change[] {
  const old = fieldsOf(before, indexes[0]);
  const now = fieldsOf(after, indexes[1]);
  const paths = new Set([...old.fields.keys(), ...now.fields.keys()]);
  const changes = [...paths].flatMap((path): Change[] => {
    const was = old.fields.get(path);
    const is = now.fields.get(path);
    if (same(was, is)) return [];
    const from = now.fields.has(path) ? now : old;
    return [
      { path, name: nameOf(path, from.resolved), before: shownAs(path, was, old), after: shownAs(path, is, now) },
    ];
  });
  return withoutEchoes(changes, old.fields, now.fields);
}

type Leaf = string | number | boolean | null | readonly unknown[];
type Fields = ReadonlyMap<string, Leaf>;

interface Flat {
  readonly resolved: ResolvedScheme;
  readonly fields: Fields;
}

/** What tells a scheme from another without changing the arch. */
const OWN = ['id', 'name', 'role'];

function fieldsOf(scheme: Scheme, index: number): Flat {
  const { resolved } = resolveScheme(scheme, index);
  const fields = new Map<string, Leaf>();
  for (const [field, value] of Object.entries({ ...scheme, ...resolved })) {
    if (!OWN.includes(field)) gather(fields, field, value);
  }
  return { resolved, fields };
}

function gather(fields: Map<string, Leaf>, path: string, value: unknown): void {
  if (value === undefined) return;
  if (Array.isArray(value)) {
    const entries: readonly unknown[] = value;
    if (entries.length > 0 && entries.every(isNamed)) {
      for (const entry of entries) {
        fields.set(`${path}.${entry.id}`, 'there');
        for (const [field, of] of Object.entries(entry))
          if (field !== 'id') gather(fields, `${path}.${entry.id}.${field}`, of);
      }
    } else if (entries.length > 0) {
      fields.set(path, entries);
    }
  } else if (typeof value === 'object' && value !== null) {
    for (const [field, of] of Object.entries(value)) gather(fields, `${path}.${field}`, of);
  } else {
    fields.set(path, value as Leaf);
  }
}

const isNamed = (entry: unknown): entry is { readonly id: string } =>
  typeof entry === 'object' && entry !== null && 'id' in entry && typeof entry.id === 'string';

const same = (a: Leaf | undefined, b: Leaf | undefined): boolean => a === b || JSON.stringify(a) === JSON.stringify(b);

/** Fields that only repeat another change: the parts of what came or went as a whole, and a thickness alike throughout. */
function withoutEchoes(changes: readonly Change[], old: Fields, now: Fields): Change[] {
  const whole = changes
    .filter(({ path }) => old.get(path) === 'there' || now.get(path) === 'there')
    .map(({ path }) => path);
  const even = (fields: Fields): boolean => fields.get('ring.thickness') === fields.get('ring.springingThickness');
  return changes.filter(({ path }) => {
    if (whole.some((root) => path.startsWith(`${root}.`))) return false;
    return path !== 'ring.springingThickness' || !even(old) || !even(now);
  });
}

/** Names of the fields that are no measure of the panels. */
const NAMES: Readonly<Record<string, string>> = {
  'profile.shape': 'Shape of the opening',
  'profile.points': 'Measured intrados',
  'profile.extrados': 'Measured extrados',
  'ring.springingThickness': 'Thickness at the springings',
  'ring.joints': 'Direction of the joints',
  'ring.courses': 'Courses of the ring',
  'ring.lostMortar': 'Mortar lost',
  'masonry.name': 'Kind of stone',
  'masonry.unitWeight': 'Unit weight of the stone',
  'above.kind': 'On the ring',
  'above.height': 'Height over the crown',
  'above.unitWeight': 'Unit weight above',
  'above.layers': 'Layers above',
  'above.openings': 'Openings above',
  'above.sidePressure': 'Side pressure of the fill',
  'backing.level': 'Top of the backing',
  'backing.counts': 'Backing counted as',
  'backing.unitWeight': 'Unit weight of the backing',
  sway: 'Sway, share of gravity',
};

/** Lists whose entries have names of their own. */
const ENTRIES: Readonly<Record<string, string>> = {
  loads: 'Load',
  ties: 'Tie',
  cracks: 'Crack',
  combinations: 'Combination',
};

function nameOf(path: string, resolved: ResolvedScheme): string {
  const known = NAMES[path];
  if (known !== undefined) return known;
  const [list = '', id = '', ...rest] = path.split('.');
  const kind = ENTRIES[list];
  if (kind !== undefined && id !== '') {
    const entry = entryName(resolved, list, id) ?? id;
    const part = rest.length === 0 ? '' : `: ${measureAt(resolved, path)?.name.toLowerCase() ?? spelt(rest)}`;
    return `${kind} ${entry}${part}`;
  }
  return measureAt(resolved, path)?.name ?? capital(spelt(path.split('.')));
}

function entryName(resolved: ResolvedScheme, list: string, id: string): string | null {
  const entries = (resolved as unknown as Readonly<Record<string, unknown>>)[list];
  if (!Array.isArray(entries)) return null;
  const entry: unknown = entries.find((one) => isNamed(one) && one.id === id);
  return typeof entry === 'object' && entry !== null && 'name' in entry && typeof entry.name === 'string'
    ? entry.name
    : null;
}

/** `springingThickness` as `springing thickness`. */
const spelt = (parts: readonly string[]): string =>
  parts.map((part) => part.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`)).join(', ');
const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** Kinds of the fields that are no measure of the panels, by the last part of their path. */
const KINDS: Readonly<Record<string, QuantityKind>> = {
  springingThickness: 'length',
  level: 'length',
  height: 'length',
  thickness: 'length',
  width: 'length',
  diameter: 'length',
  length: 'length',
  patch: 'length',
  unitWeight: 'unitWeight',
  force: 'force',
  pretension: 'force',
  yield: 'strength',
  ultimate: 'strength',
};

/** Finer than anything measured on stone. */
const FIGURES = 6;

function shownAs(path: string, value: Leaf | undefined, { resolved }: Flat): string {
  if (value === undefined) return 'none';
  if (value === null) return 'not known';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'string')
    return path === 'profile.shape' ? shapeName(value as ProfileShape).toLowerCase() : value;
  if (typeof value !== 'number') return `${value.length} ${value.length === 1 ? 'entry' : 'entries'}`;
  const kind = measureAt(resolved, path)?.kind ?? KINDS[path.split('.').at(-1) ?? ''] ?? 'plain';
  return formatQuantity(Number(value.toPrecision(FIGURES)), kind, SHOWN, { figures: 'exact' });
}
