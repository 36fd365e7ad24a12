import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { JOB_SCHEMA_FILE, jobSchemaText } from '../../../assets/schema/generate.ts';
import { JOB_NODE } from '../../../core/job/fields-of.ts';
import type { SchemaNode } from '../../../core/job/fields-of.ts';
import { rightFor } from '../../../core/job/fields.ts';

/** Names of all fields that the schema has, at any depth. */
function fieldNames(node: SchemaNode): string[] {
  const within = Object.entries(node.entries ?? {}).flatMap(([name, field]) => [name, ...fieldNames(field)]);
  const options = (node.options ?? []).flatMap((option) => (typeof option === 'string' ? [] : fieldNames(option)));
  const nested = [node.wrapped, node.item].flatMap((inner) => (inner === undefined ? [] : fieldNames(inner)));
  return [...within, ...options, ...nested];
}

describe('the published JSON Schema', () => {
  it('is the one that the program reads by (npm run schema writes it anew)', () => {
    expect(readFileSync(JOB_SCHEMA_FILE, 'utf8')).toBe(jobSchemaText());
  });

  it('has every shape of profile and no word of this program’s insides', () => {
    const text = readFileSync(JOB_SCHEMA_FILE, 'utf8');
    for (const shape of ['semicircular', 'segmental', 'pointed', 'catenary', 'measured']) {
      expect(text).toContain(`"const": "${shape}"`);
    }
    expect(text).not.toContain('valibot');
  });
});

describe('the words for fields', () => {
  // `shape` and `kind` are answered with the list of their words.
  it.each([...new Set(fieldNames(JOB_NODE))].filter((name) => name !== 'shape' && name !== 'kind'))(
    'say what belongs in %s',
    (name) => {
      expect(rightFor(name)).toMatch(/^(give|write) .*[^.]$/);
    },
  );

  it('know no other field', () => {
    expect(rightFor('toString')).toBeUndefined();
  });
});
