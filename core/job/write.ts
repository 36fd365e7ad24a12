/**
 * Writes a job as JSON text, the same text for the same job whatever order its fields were entered in: the known
 * fields in the order of the schema, then the unknown ones by the alphabet; two spaces a level; a list of plain
 * numbers (a point) on one line; a line break at the end.
 *
 * Decided: unknown fields are kept, at every level, when a job is read and written again. A file from a newer edition
 * or another program thus loses nothing by passing through this one. `read(write(job))` is the job, and writing what
 * was read from written text gives that text again.
 */
import { JOB_NODE, fieldNode, fieldsOf, itemOf } from './fields-of.ts';
import type { SchemaNode } from './fields-of.ts';
import type { Job } from './schema.ts';

export function writeJob(job: Job): string {
  return `${written(job, JOB_NODE, '')}\n`;
}

function written(value: unknown, node: SchemaNode | undefined, indent: string): string {
  if (typeof value !== 'object' || value === null) return JSON.stringify(value);
  const inner = `${indent}  `;
  if (Array.isArray(value)) {
    const entries: readonly unknown[] = value;
    if (entries.every((entry) => typeof entry === 'number'))
      return `[${entries.map((entry) => JSON.stringify(entry)).join(', ')}]`;
    const lines = entries.map((entry) => `${inner}${written(entry, itemOf(node), inner)}`);
    return `[\n${lines.join(',\n')}\n${indent}]`;
  }
  const record = value as Readonly<Record<string, unknown>>;
  const lines = orderedNames(record, Object.keys(fieldsOf(node, record))).map(
    (name) => `${inner}${JSON.stringify(name)}: ${written(record[name], fieldNode(node, record, name), inner)}`,
  );
  return lines.length === 0 ? '{}' : `{\n${lines.join(',\n')}\n${indent}}`;
}

/** Known names first, in their order, then the others by code unit, so that no locale can change the file. */
function orderedNames(record: Readonly<Record<string, unknown>>, known: readonly string[]): string[] {
  const present = Object.keys(record).filter((name) => record[name] !== undefined);
  const knownNames = new Set(known);
  return [...known.filter((name) => present.includes(name)), ...present.filter((name) => !knownNames.has(name)).sort()];
}
