/**
 * JSON text to a value, with the place and the cause of a fault in words. The parser itself is the platform's; only
 * when it refuses is the text read a second time to find the line and column, which its own messages do not promise.
 */
import { shown } from './shown.ts';
import type { Problem } from './problem.ts';

export function parseJson(text: string): { ok: true; value: unknown } | { ok: false; problem: Problem } {
  try {
    return { ok: true, value: JSON.parse(text) as unknown };
  } catch {
    const { at, found, wanted } = firstFault(text);
    const { line, column } = lineAndColumn(text, at);
    return {
      ok: false,
      problem: {
        path: '',
        value: found,
        wrong: `not JSON at line ${line}, column ${column}`,
        right: `${wanted} belongs there`,
      },
    };
  }
}

interface Fault {
  readonly at: number;
  readonly found: string;
  readonly wanted: string;
}

type Expecting = 'value' | 'value or ]' | 'name' | 'name or }' | 'colon' | 'next' | 'end';

const NUMBER = /-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?/y;
const WORD = /[\p{L}\p{N}_+.-]+/uy;
const ESCAPE = /\\(?:["\\/bfnrt]|u[0-9a-fA-F]{4})/y;

const WANTED: Record<Expecting, string> = {
  value: 'a value (text in double quotes, a number, true, false, null, a list or an object)',
  'value or ]': 'a value or the closing ]',
  name: 'a field name in double quotes (no comma before a closing bracket)',
  'name or }': 'a field name in double quotes or the closing }',
  colon: 'a colon after the field name',
  next: 'a comma or the closing bracket',
  end: 'nothing more',
};

/** Walks the text as the grammar asks and stops where it leaves the grammar. Only called on text that is not JSON. */
function firstFault(text: string): Fault {
  const open: ('{' | '[')[] = [];
  let expecting: Expecting = 'value';
  let at = 0;
  const afterValue = (): Expecting => (open.length === 0 ? 'end' : 'next');
  for (;;) {
    while (' \t\n\r'.includes(text.charAt(at)) && at < text.length) at += 1;
    const character = text.charAt(at);
    const fault: Fault = { at, found: foundAt(text, at), wanted: WANTED[expecting] };
    if (character === '') return fault;
    const container = open.at(-1);
    if (expecting === 'value' || expecting === 'value or ]') {
      if (character === ']' && expecting === 'value or ]') {
        open.pop();
        at += 1;
        expecting = afterValue();
      } else if (character === '{' || character === '[') {
        open.push(character);
        at += 1;
        expecting = character === '{' ? 'name or }' : 'value or ]';
      } else {
        const end = endOfScalar(text, at);
        if (typeof end !== 'number') return end ?? fault;
        at = end;
        expecting = afterValue();
      }
    } else if (expecting === 'name' || expecting === 'name or }') {
      if (character === '}' && expecting === 'name or }') {
        open.pop();
        at += 1;
        expecting = afterValue();
      } else if (character === '"') {
        const end = endOfString(text, at);
        if (typeof end !== 'number') return end;
        at = end;
        expecting = 'colon';
      } else return fault;
    } else if (expecting === 'colon') {
      if (character !== ':') return fault;
      at += 1;
      expecting = 'value';
    } else if (expecting === 'next') {
      if (character === ',') expecting = container === '{' ? 'name' : 'value';
      else if (character === (container === '{' ? '}' : ']')) {
        open.pop();
        expecting = afterValue();
      } else return fault;
      at += 1;
    } else return fault;
  }
}

function endOfScalar(text: string, at: number): number | Fault | undefined {
  if (text.charAt(at) === '"') return endOfString(text, at);
  const word = wordAt(text, at);
  if (word === 'true' || word === 'false' || word === 'null') return at + word.length;
  NUMBER.lastIndex = at;
  const number = NUMBER.exec(text)?.[0];
  if (number !== undefined && number === word) return at + number.length;
  if (/^[+-]?(?:nan|inf|infinity)$/i.test(word)) {
    return { at, found: word, wanted: 'a finite number, or null for what is not known,' };
  }
  return /^[-+.]?\d/.test(word)
    ? { at, found: word, wanted: 'a plain number with a decimal point and no unit, such as 0.35,' }
    : undefined;
}

/** Index after the closing quote, or the fault inside the string. */
function endOfString(text: string, start: number): number | Fault {
  let at = start + 1;
  for (;;) {
    const character = text.charAt(at);
    if (character === '"') return at + 1;
    if (character === '') return { at: start, found: foundAt(text, start), wanted: 'text with a closing double quote' };
    if (character < ' ') {
      return {
        at,
        found: 'a line break or control character',
        wanted: 'a closing double quote, or \\n for a line break,',
      };
    }
    if (character === '\\') {
      ESCAPE.lastIndex = at;
      const escape = ESCAPE.exec(text)?.[0];
      if (escape === undefined) return { at, found: text.slice(at, at + 2), wanted: '\\\\ for a backslash' };
      at += escape.length;
    } else at += 1;
  }
}

function wordAt(text: string, at: number): string {
  WORD.lastIndex = at;
  return WORD.exec(text)?.[0] ?? '';
}

function foundAt(text: string, at: number): string {
  if (at >= text.length) return 'the end of the file';
  return shown(wordAt(text, at) || String.fromCodePoint(text.codePointAt(at) ?? 0));
}

function lineAndColumn(text: string, at: number): { line: number; column: number } {
  const before = text.slice(0, at).split(/\r\n|\r|\n/);
  return { line: before.length, column: (before.at(-1) ?? '').length + 1 };
}
