/**
 * Writes the published JSON Schema of the job file from the one schema that reads it: `npm run schema`.
 *
 * A JSON Schema cannot say what must hold between fields (ids used once, a rise that suits its span); the program
 * checks those beyond it.
 */
import { toJsonSchema } from '@valibot/to-json-schema';
import { writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { rightFor } from '../../core/job/fields.ts';
import { JOB_VERSION, jobSchema } from '../../core/job/schema.ts';

export const JOB_SCHEMA_FILE = fileURLToPath(new URL(`skewback-job-${JOB_VERSION}.schema.json`, import.meta.url));

type Node = Record<string, unknown>;

/** The text of the published file. */
export function jobSchemaText(): string {
  const { $schema, ...rest } = toJsonSchema(jobSchema, {
    // JSON has no infinite numbers, so nothing is lost with this one action.
    overrideAction: ({ valibotAction, jsonSchema }) => (valibotAction.type === 'finite' ? jsonSchema : undefined),
  });
  const published = {
    $schema,
    $id: `urn:skewback:job:${JOB_VERSION}`,
    title: 'Skewback job',
    description:
      'What was measured of arches and what is proposed for them; never a result. Units: m, kN, kN/m², kN/m³; strengths in MPa; angles in degrees. Axes: x to the right, y up, origin on the springing line of the intrados midway between the springings. Forces are for the whole breadth. Fields not named here are kept.',
    ...rest,
  };
  describeFields(published);
  return `${JSON.stringify(published, null, 2)}\n`;
}

/** Gives every field the words that a refused value is answered with. */
function describeFields(node: unknown): void {
  if (typeof node !== 'object' || node === null) return;
  const { properties } = node as { properties?: Record<string, Node> };
  for (const [name, field] of Object.entries(properties ?? {})) {
    const right = 'const' in field ? undefined : rightFor(name);
    if (right !== undefined) field['description'] = `${right.charAt(0).toUpperCase()}${right.slice(1)}.`;
  }
  for (const child of Object.values(node)) describeFields(child);
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  writeFileSync(JOB_SCHEMA_FILE, jobSchemaText());
}
