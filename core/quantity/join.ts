/**
 * What stands side by side on a drawing and means a sum: 3 1/2 in, and 8' 3 1/2". Turned into an expression with
 * plain signs, for the library would multiply what stands side by side.
 */
import { SIDE_BY_SIDE, refuse } from './refusal.ts';
import type { Sign, Token } from './tokens.ts';

interface Amount {
  readonly value: number;
  /** Index of the token behind it. */
  readonly next: number;
}

/** The tokens as an expression in the library's spelling. */
export function expressionOf(tokens: readonly Token[]): string {
  const parts: string[] = [];
  let at = 0;
  while (at < tokens.length) {
    const sum = feetAndInches(tokens, at);
    const amount = amountAt(tokens, at);
    if (sum !== undefined) {
      parts.push(sum.text);
      at = sum.next;
    } else if (amount !== undefined) {
      if (isFigure(tokens[at - 1])) refuse(SIDE_BY_SIDE);
      parts.push(String(amount.value));
      at = amount.next;
    } else {
      const token = tokens[at]!;
      parts.push(token.type === 'unit' ? unitText(token.name) : signText(token));
      at += 1;
    }
  }
  return parts.join(' ');
}

function isFigure(token: Token | undefined): boolean {
  return token?.type === 'number' || token?.type === 'fraction';
}

function unitText(name: string): string {
  return name.includes(' ') || name.includes('/') ? `(${name})` : name;
}

function signText(token: Token): string {
  return token.type === 'sign' ? token.sign : '';
}

/** A number, or a whole number and a fraction side by side. */
function amountAt(
  tokens: readonly Token[],
  at: number,
  joint: 'space' | 'space or hyphen' = 'space',
): Amount | undefined {
  const first = tokens[at];
  if (first?.type === 'fraction') return { value: first.value, next: at + 1 };
  if (first?.type !== 'number') return undefined;
  if (!first.isWhole) return { value: first.value, next: at + 1 };
  const from = joint === 'space or hyphen' && isTightMinus(tokens[at + 1]) ? at + 2 : at + 1;
  const second = tokens[from];
  if (second?.type === 'fraction') return { value: first.value + second.value, next: from + 1 };
  const under = tokens[from + 2];
  const isFraction = second?.type === 'number' && under?.type === 'number' && isSign(tokens[from + 1], '/');
  if (isFraction && second.isWhole && under.isWhole && second.value < under.value) {
    return { value: first.value + second.value / under.value, next: from + 3 };
  }
  return { value: first.value, next: at + 1 };
}

/** `8' 3 1/2"`, `8'-3 1/2"`, `8 ft 3 in`, and `8' 3` where the inches' mark was left off. */
function feetAndInches(
  tokens: readonly Token[],
  at: number,
): { readonly text: string; readonly next: number } | undefined {
  const feet = amountAt(tokens, at);
  const mark = feet === undefined ? undefined : tokens[feet.next];
  if (feet === undefined || mark?.type !== 'unit' || mark.name !== 'ft') return undefined;
  const from = mark.isPrime && isTightMinus(tokens[feet.next + 1]) ? feet.next + 2 : feet.next + 1;
  const inches = simpleFraction(tokens, from) ?? amountAt(tokens, from, 'space or hyphen');
  if (inches === undefined) return undefined;
  const end = tokens[inches.next];
  const hasMark = end?.type === 'unit' && end.name === 'inch';
  if (!hasMark && !(mark.isPrime && (end === undefined || end.type === 'sign'))) return undefined;
  return {
    text: `(${feet.value} ft + ${inches.value} inch)`,
    next: hasMark ? inches.next + 1 : inches.next,
  };
}

/** `1/2` by itself, as in 8' 1/2". */
function simpleFraction(tokens: readonly Token[], at: number): Amount | undefined {
  const [over, sign, under] = tokens.slice(at, at + 3);
  if (over?.type !== 'number' || !isSign(sign, '/') || under?.type !== 'number' || under.value === 0) return undefined;
  return { value: over.value / under.value, next: at + 3 };
}

function isSign(token: Token | undefined, sign: Sign): boolean {
  return token?.type === 'sign' && token.sign === sign;
}

function isTightMinus(token: Token | undefined): boolean {
  return token?.type === 'sign' && token.sign === '-' && token.isTight;
}
