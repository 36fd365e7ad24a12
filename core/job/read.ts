/**
 * Reads a job from JSON text. Every refusal says where, what was found and what would be right; nothing is thrown.
 *
 * In order: size, JSON, format and version, depth and count, migration to the present version, the schema, then what
 * must hold between fields. Unknown fields are kept at every level (see `write.ts`). Minus zero is read as zero.
 */
import * as v from 'valibot';
import { capped, explained, pathText } from './explain.ts';
import { JOB_NODE, fieldNode, isObjectPlace, itemOf } from './fields-of.ts';
import type { SchemaNode } from './fields-of.ts';
import { parseJson } from './json-text.ts';
import { OLDEST_VERSION, migrated } from './migrations.ts';
import type { RawDocument } from './migrations.ts';
import type { Problem } from './problem.ts';
import { relationProblems } from './relations.ts';
import { JOB_FORMAT, JOB_VERSION, jobSchema } from './schema.ts';
import type { Job } from './schema.ts';
import { shown } from './shown.ts';

export type Reading<T> = ({ readonly ok: true } & T) | { readonly ok: false; readonly problems: readonly Problem[] };

/** A job at the upper limits of `LIMITS` in its lists has about a million values; these leave room and no more. */
export const READ_LIMITS = {
  characters: 32 * 1024 * 1024,
  /** Objects and lists within one another; the schema itself goes nine deep. */
  depth: 32,
  /** Numbers, texts, lists and objects in all. */
  values: 2_000_000,
} as const;

/** Reads the text of a `job.json`. Units as in the schema: m, kN, kN/m², kN/m³, MPa, degrees. */
export function readJob(text: string): Reading<{ readonly job: Job }> {
  if (text.length > READ_LIMITS.characters) return refused(tooLong(text.length));
  const body = text.startsWith('\uFEFF') ? text.slice(1) : text;
  if (body.trim() === '') {
    return refused({ path: '', value: '', wrong: 'the file is empty', right: 'choose a file saved by Skewback' });
  }
  const parsed = parseJson(body);
  if (!parsed.ok) return refused(parsed.problem);
  return jobFrom(parsed.value);
}

function jobFrom(value: unknown): Reading<{ readonly job: Job }> {
  const envelope = envelopeProblem(value);
  if (envelope !== undefined) return refused(envelope);
  const overgrown = structureProblems(value, undefined);
  if (overgrown.length > 0) return refused(...overgrown);

  const document = migrated(value as RawDocument, (value as { version: number }).version);
  const misplaced = structureProblems(document, JOB_NODE);
  if (misplaced.length > 0) return refused(...misplaced);
  const checked = v.safeParse(jobSchema, document);
  if (!checked.success) return refused(...explained(checked.issues));
  // The document itself and not valibot's copy of it, which leaves out unknown fields called `constructor`.
  const job = document as unknown as Job;
  const unrelated = relationProblems(job);
  return unrelated.length > 0 ? refused(...capped(unrelated)) : { ok: true, job };
}

function refused(...problems: readonly Problem[]): { ok: false; problems: readonly Problem[] } {
  return { ok: false, problems };
}

/** Refuses text beyond the limit; shared with the archive, which knows the size before it has the text. */
export function tooLong(characters: number): Problem {
  const million = (count: number): string => `${(count / 1024 / 1024).toFixed(0)} MB`;
  return {
    path: '',
    value: million(characters),
    wrong: 'the job is too large to be one',
    right: `a job has at most ${million(READ_LIMITS.characters)} of text; keep photographs beside it in the archive`,
  };
}

/** Format and version, before anything else is looked at: one problem that says what kind of file this is. */
function envelopeProblem(value: unknown): Problem | undefined {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) {
    return {
      path: '',
      value: shown(value),
      wrong: 'not a job',
      right: `a job is an object with "format": "${JOB_FORMAT}"`,
    };
  }
  const { format, version } = value as RawDocument;
  if (format === 'skewback.assessment') {
    const right = 'open the job that it came from';
    return { path: 'format', value: shown(format), wrong: 'this is a result, not a job', right };
  }
  if (format !== JOB_FORMAT) {
    const wrong = format === undefined ? 'missing, so this is not known to be a Skewback job' : 'not a Skewback job';
    return { path: 'format', value: format === undefined ? '' : shown(format), wrong, right: `write "${JOB_FORMAT}"` };
  }
  const right = `write ${JOB_VERSION}`;
  if (version === undefined) return { path: 'version', value: '', wrong: 'missing', right };
  if (typeof version !== 'number' || !Number.isInteger(version) || version < OLDEST_VERSION) {
    return { path: 'version', value: shown(version), wrong: 'not a version of the job file', right };
  }
  if (version > JOB_VERSION) {
    return {
      path: 'version',
      value: '',
      wrong: `made by a newer Skewback: version ${version}, this one reads up to ${JOB_VERSION}`,
      right: 'open it with the newer one',
    };
  }
  return undefined;
}

/**
 * Depth, count, names that could reach a prototype, and lists where objects belong (which valibot lets through).
 * Turns minus zero to zero on the way, for the text has no use for it.
 */
function structureProblems(root: unknown, rootNode: SchemaNode | undefined): Problem[] {
  const problems: Problem[] = [];
  let keys: (string | number)[] = [];
  let values = 0;
  const report = (wrong: string, right: string, value = ''): void => {
    problems.push({ path: pathText(keys), value, wrong, right });
  };
  const visit = (value: unknown, node: SchemaNode | undefined): void => {
    values += 1;
    if (values > READ_LIMITS.values) {
      keys = [];
      report('the file holds too many values to be a job', `a job holds at most ${READ_LIMITS.values}`);
    } else if (typeof value !== 'object' || value === null) {
      return;
    } else if (keys.length >= READ_LIMITS.depth) {
      report('nested too deeply', `a job goes at most ${READ_LIMITS.depth} levels deep`);
    } else if (Array.isArray(value)) {
      if (node !== undefined && isObjectPlace(node)) {
        report('a list where an object belongs', 'give an object in braces', shown(value));
      }
      const list: unknown[] = value;
      const item = itemOf(node);
      for (let index = 0; index < list.length && problems.length === 0; index += 1) enter(list, index, item);
    } else {
      const record = value as Record<string, unknown>;
      for (const name of Object.keys(record)) {
        if (problems.length > 0) break;
        enter(record, name, fieldNode(node, record, name));
      }
    }
  };
  const enter = (
    container: unknown[] | Record<string, unknown>,
    key: string | number,
    node: SchemaNode | undefined,
  ): void => {
    const inside = container as Record<string | number, unknown>;
    keys.push(key);
    if (key === '__proto__') report('a field name that is not allowed', 'rename it or take it out');
    else if (Object.is(inside[key], -0)) inside[key] = 0;
    else visit(inside[key], node);
    keys.pop();
  };
  visit(root, rootNode);
  return problems;
}
