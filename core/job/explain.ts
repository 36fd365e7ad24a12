/** Turns what the schema refused into problems for a person: where, what was found, what would be right. */
import type { BaseIssue } from 'valibot';
import { rightFor } from './fields.ts';
import type { Problem } from './problem.ts';
import { LIMITS } from './schema.ts';
import { shown } from './shown.ts';

/** More than this is no help to anyone; the rest are counted. */
const MOST_PROBLEMS = 50;

type Issue = BaseIssue<unknown>;

/** One problem a field: a value can offend twice (infinite, and so beyond the limit too), its first word is enough. */
export function explained(issues: readonly Issue[]): Problem[] {
  const byPath = new Map<string, Issue>();
  for (const issue of issues) {
    const path = pathText(keysOf(issue));
    if (!byPath.has(path)) byPath.set(path, issue);
  }
  const shownIssues = [...byPath.values()].slice(0, MOST_PROBLEMS + 1);
  return capped(shownIssues.map(problemOf), byPath.size);
}

/** The first problems, and one that counts the others where there are too many. */
export function capped(problems: readonly Problem[], total = problems.length): Problem[] {
  if (total <= MOST_PROBLEMS) return [...problems];
  const rest: Problem = {
    path: '',
    value: '',
    wrong: `${total - MOST_PROBLEMS} more problems of this kind are not listed`,
    right: 'mend these first',
  };
  return [...problems.slice(0, MOST_PROBLEMS), rest];
}

/** `a.b[2].c`; a name that is not plain is quoted in brackets. */
export function pathText(keys: readonly (string | number)[]): string {
  return keys.reduce<string>((path, key) => {
    if (typeof key === 'number') return `${path}[${key}]`;
    if (!/^[A-Za-z_][\w-]*$/.test(key)) return `${path}[${shown(key)}]`;
    return path === '' ? key : `${path}.${key}`;
  }, '');
}

function problemOf(issue: Issue): Problem {
  const keys = keysOf(issue);
  return { path: pathText(keys), value: foundIn(issue), wrong: wrongWith(issue), right: rightInstead(issue, keys) };
}

function keysOf(issue: Issue): (string | number)[] {
  return (issue.path ?? []).map(({ key }) => (typeof key === 'number' ? key : String(key)));
}

function isMissing(issue: Issue): boolean {
  return issue.kind === 'schema' && issue.input === undefined;
}

function foundIn(issue: Issue): string {
  return isMissing(issue) ? '' : shown(issue.input);
}

const NOT_THIS_TYPE: Readonly<Record<string, string>> = {
  number: 'not a number',
  string: 'not text',
  array: 'not a list',
  loose_object: 'not an object',
  strict_tuple: 'not a point',
  picklist: 'not one of the words known here',
  literal: 'not the word known here',
};

function wrongWith(issue: Issue): string {
  if (isMissing(issue)) return 'missing';
  const requirement = String(issue.requirement);
  switch (issue.type) {
    case 'gt_value':
      return `must be above ${requirement}`;
    case 'min_value':
      return `must be at least ${requirement.replace('-', '−')}`;
    case 'max_value':
      return `must be at most ${requirement}`;
    case 'integer':
      return 'must be a whole number';
    case 'finite':
      return 'too large to be held as a number';
    case 'min_length':
      return typeof issue.input === 'string' ? 'empty' : `must hold at least ${requirement}`;
    case 'max_length':
      return typeof issue.input === 'string'
        ? `longer than ${requirement} characters`
        : `must hold at most ${requirement}`;
    case 'variant':
      if (issue.expected === 'Object') return 'not an object';
      return typeof issue.input === 'string'
        ? `no ${lastName(issue)} that is known`
        : 'not one of the words known here';
    default:
      return NOT_THIS_TYPE[issue.type] ?? 'not what belongs here';
  }
}

function lastName(issue: Issue): string {
  return String(keysOf(issue).at(-1) ?? 'word');
}

function rightInstead(issue: Issue, keys: readonly (string | number)[]): string {
  const { input, expected } = issue;
  if (issue.type === 'number' && typeof input === 'string' && input.trim() !== '' && Number.isFinite(Number(input))) {
    return `write ${input.trim()} without the quotes`;
  }
  if (expected === 'Object' && typeof keys.at(-1) === 'number')
    return `give an object for each of the ${String(keys.at(-2))}`;
  if (issue.type === 'variant' || issue.type === 'picklist') return oneOf(expected ?? '', lastName(issue));
  const field = keys.findLast((key) => typeof key === 'string') ?? '';
  if (typeof keys.at(-1) === 'number') {
    if (field === 'points' || field === 'extrados') {
      return `give each point as [x, y] in metres, between −${LIMITS.length} and ${LIMITS.length}`;
    }
    return `give an object for each of the ${field}`;
  }
  return rightFor(field) ?? 'see the published schema of the job file';
}

/** From the schema's own list of words, `("a" | "b")`. */
function oneOf(expected: string, name: string): string {
  const words = expected.replace(/^\(|\)$/g, '').split(' | ');
  if (words.includes('Object')) return rightFor(name) ?? 'give an object';
  const last = words.pop() ?? '';
  return words.length === 0 ? `write ${last}` : `write ${words.join(', ')} or ${last}`;
}
