/** Works an expression out with its units. Only numbers, units, + − × / ^ and brackets; anything else is refused. */
import type { MathNode, OperatorNode, ParenthesisNode, ConstantNode, SymbolNode, Unit } from 'mathjs';
import { math } from './math.ts';
import { SIDE_BY_SIDE, refuse } from './refusal.ts';

export type Amount = number | Unit;

/** The greatest power of a unit; beyond it there is no use in a measure. */
const MOST_POWER = 12;

/**
 * @param expression in the library's spelling, see `join.ts`.
 * @throws Refusal where the expression is no arithmetic, divides by nothing, or mixes what cannot be mixed.
 */
export function evaluated(expression: string): Amount {
  const amount = valueOf(parsed(expression));
  const size = typeof amount === 'number' ? amount : amount.toSI().value;
  return Number.isFinite(size) ? amount : refuse('the result is too large');
}

function parsed(expression: string): MathNode {
  try {
    return math.parse(expression);
  } catch {
    return refuse('this is not complete arithmetic');
  }
}

function valueOf(node: MathNode): Amount {
  switch (node.type) {
    case 'ConstantNode': {
      const { value } = node as ConstantNode;
      return typeof value === 'number' ? value : refuse('only numbers and units are taken');
    }
    case 'SymbolNode':
      return math.unit((node as SymbolNode).name);
    case 'ParenthesisNode':
      return valueOf((node as ParenthesisNode).content);
    case 'OperatorNode':
      return operated(node as OperatorNode);
    default:
      return refuse('only numbers, units, + − × / ^ and brackets are taken');
  }
}

function operated({ fn, args, implicit }: OperatorNode): Amount {
  const [first, second] = args;
  if (first === undefined) return refuse('this is not complete arithmetic');
  const left = valueOf(first);
  const operation: string = fn;
  if (second === undefined) return signed(operation, left);
  if (implicit && !isUnitText(second)) refuse(SIDE_BY_SIDE);
  const right = valueOf(second);
  switch (operation) {
    case 'add':
      return summed(left, right, 1);
    case 'subtract':
      return summed(left, right, -1);
    case 'multiply':
      return math.multiply(left, right) as Amount;
    case 'divide':
      if (typeof right === 'number' ? right === 0 : right.value === 0) refuse('this divides by nothing');
      return math.divide(left, right) as Amount;
    case 'pow':
      return raised(left, right);
    default:
      return refuse('only + − × / ^ and brackets are taken');
  }
}

function signed(operation: string, amount: Amount): Amount {
  if (operation === 'unaryPlus') return amount;
  if (operation === 'unaryMinus') return math.multiply(-1, amount) as Amount;
  return refuse('only + − × / ^ and brackets are taken');
}

function summed(left: Amount, right: Amount, sign: 1 | -1): Amount {
  if (typeof left === 'number' && typeof right === 'number') return left + sign * right;
  if (typeof left === 'number' || typeof right === 'number') {
    return refuse('a figure with a unit and one without cannot be added; give both their unit');
  }
  if (!left.equalBase(right)) refuse('these units cannot be added to one another');
  return sign === 1 ? math.add(left, right) : math.subtract(left, right);
}

function raised(base: Amount, power: Amount): Amount {
  if (typeof power !== 'number') return refuse('a power is a figure without a unit');
  if (typeof base !== 'number') {
    const isUsual = Number.isInteger(power) && Math.abs(power) <= MOST_POWER;
    return isUsual ? (math.pow(base, power) as Amount) : refuse(`a unit is raised to whole powers up to ${MOST_POWER}`);
  }
  if (base === 0 && power < 0) refuse('this divides by nothing');
  const value = base ** power;
  return Number.isNaN(value) ? refuse('this has no real value') : value;
}

/** A unit, a power of one, or a compound one in brackets: what may stand behind a figure without a sign. */
function isUnitText(node: MathNode): boolean {
  if (node.type === 'SymbolNode') return true;
  if (node.type === 'ParenthesisNode') return node.filter(({ type }) => type === 'SymbolNode').length > 0;
  if (node.type !== 'OperatorNode') return false;
  const { fn, args } = node as OperatorNode;
  return (fn as string) === 'pow' && args[0] !== undefined && isUnitText(args[0]);
}
