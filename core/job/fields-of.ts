/**
 * Walks the schema beside a value: which fields an object has in its place, in schema order, and what a list holds.
 * Reading uses it to tell lists from objects, writing for the order of fields.
 */
import { jobSchema } from './schema.ts';

/** The part of a valibot schema that a walk needs. */
export interface SchemaNode {
  readonly type: string;
  /** Of an optional or nullable one. */
  readonly wrapped?: SchemaNode;
  /** Of an object. */
  readonly entries?: Readonly<Record<string, SchemaNode>>;
  /** Of a list. */
  readonly item?: SchemaNode;
  /** Of a variant: the field that decides and the objects to choose from. */
  readonly key?: string;
  readonly options?: readonly (SchemaNode | string)[];
  /** Of a literal. */
  readonly literal?: unknown;
}

export const JOB_NODE: SchemaNode = jobSchema;

function bare(node: SchemaNode): SchemaNode {
  return node.wrapped === undefined ? node : bare(node.wrapped);
}

/** True where the schema has an object in this place. */
export function isObjectPlace(node: SchemaNode): boolean {
  const { type } = bare(node);
  return type === 'loose_object' || type === 'variant';
}

/** The known fields of an object in this place, in schema order; none where the schema does not reach. */
export function fieldsOf(
  node: SchemaNode | undefined,
  value: Readonly<Record<string, unknown>>,
): Readonly<Record<string, SchemaNode>> {
  if (node === undefined) return {};
  const { entries, key, options = [] } = bare(node);
  if (entries !== undefined) return entries;
  if (key === undefined) return {};
  const chosen = options.find((option) => typeof option !== 'string' && option.entries?.[key]?.literal === value[key]);
  return typeof chosen === 'object' ? (chosen.entries ?? {}) : {};
}

/** The schema of one field of an object in this place; undefined for an unknown field. */
export function fieldNode(
  node: SchemaNode | undefined,
  value: Readonly<Record<string, unknown>>,
  name: string,
): SchemaNode | undefined {
  const fields = fieldsOf(node, value);
  return Object.hasOwn(fields, name) ? fields[name] : undefined;
}

/** What a list in this place holds; undefined where the schema does not reach. */
export function itemOf(node: SchemaNode | undefined): SchemaNode | undefined {
  return node === undefined ? undefined : bare(node).item;
}
