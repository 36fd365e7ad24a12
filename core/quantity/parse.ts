/**
 * Typed entry: what a person writes into a field, to the unit in which its kind is kept. Units and arithmetic, metric
 * and imperial, comma or point. No function, name or code is ever evaluated.
 *
 * This brings the mathematics library in: load it when first needed, `import('core/quantity/parse.ts')`.
 */
import { evaluated } from './evaluate.ts';
import type { Amount } from './evaluate.ts';
import { formatFigure, formatQuantity, tidied } from './format.ts';
import { expressionOf } from './join.ts';
import { DEFAULT_PREFERENCES, KINDS, STANDARD_GRAVITY, displayUnit } from './kinds.ts';
import type { Preferences, QuantityKind } from './kinds.ts';
import { math } from './math.ts';
import { Refusal, refuse } from './refusal.ts';
import { tokensOf } from './tokens.ts';

export type ParsedQuantity =
  | {
      readonly ok: true;
      /** In the unit in which the kind is kept: m, kN, kN/m³, kN/m², MPa, degrees, or plain. */
      readonly value: number;
      /** How the entry was taken, for the person to see: the figure, and a remark where it could be read otherwise. */
      readonly understood: string;
    }
  | { readonly ok: false; readonly reason: string };

const LONGEST = 200;
const GRAVITY = math.unit(STANDARD_GRAVITY, 'm/s^2');

/** Never throws. A bare figure is taken in the display unit of its kind. Signs and ranges of a field are the field's. */
export function parseQuantity(
  text: string,
  kind: QuantityKind,
  preferences: Preferences = DEFAULT_PREFERENCES,
): ParsedQuantity {
  try {
    const remarks: string[] = [];
    const value = valueOf(text, kind, preferences, (remark) => remarks.push(remark));
    return { ok: true, value, understood: [figureText(value, kind, preferences), ...remarks].join('; ') };
  } catch (error) {
    if (error instanceof Refusal) return { ok: false, reason: error.message };
    return { ok: false, reason: 'this could not be understood' };
  }
}

function valueOf(text: string, kind: QuantityKind, preferences: Preferences, note: (remark: string) => void): number {
  if (text.length > LONGEST) refuse(`an entry has at most ${LONGEST} characters`);
  const tokens = tokensOf(text, preferences, note);
  if (tokens.length === 0) refuse('nothing is entered');
  if (!tokens.some(({ type }) => type === 'number' || type === 'fraction')) refuse('a figure is missing');
  const amount = evaluated(expressionOf(tokens));
  const isBare = !tokens.some(({ type }) => type === 'unit');
  if (typeof amount === 'number' && !isBare && kind !== 'plain') refuse('the units cancel one another out');
  const value = typeof amount === 'number' ? amount * displayUnit(kind, preferences).size : inBase(amount, kind, note);
  const kept = tidied(value) + 0;
  const { noun, most, base } = KINDS[kind];
  if (Math.abs(kept) > most) {
    const limit = `${formatFigure(most, 'exact', preferences)} ${base.symbol}`.trim();
    refuse(`too large for ${noun}; at most ${limit} is taken`);
  }
  return kept;
}

function inBase(amount: Exclude<Amount, number>, kind: QuantityKind, note: (remark: string) => void): number {
  const { base } = KINDS[kind];
  if (isOfKind(amount, kind)) return amount.toNumber(base.entry);
  const weight = math.multiply(amount, GRAVITY) as Amount;
  if (typeof weight !== 'number' && isOfKind(weight, kind)) {
    note(`a mass, taken with its weight under g = ${STANDARD_GRAVITY} m/s²`);
    return weight.toNumber(base.entry);
  }
  return refuse(wrongKind(amount, kind));
}

function isOfKind(amount: Exclude<Amount, number>, kind: QuantityKind): boolean {
  const { entry } = KINDS[kind].base;
  return entry !== '' && amount.equalBase(math.unit(entry));
}

function wrongKind(amount: Exclude<Amount, number>, kind: QuantityKind): string {
  const { noun, typed, example } = KINDS[kind];
  const wanted =
    kind === 'plain' ? `${noun} is wanted, such as ${example}` : `${noun} is wanted, in ${typed}, such as ${example}`;
  const given = (Object.keys(KINDS) as QuantityKind[]).find((other) => isOfKind(amount, other));
  return given === undefined ? `the unit does not suit; ${wanted}` : `this is ${KINDS[given].noun}; ${wanted}`;
}

/** Six figures in the preferred unit, and in the one in which it is kept where that is another. */
function figureText(value: number, kind: QuantityKind, preferences: Preferences): string {
  const shown = sixFigures(value, kind, preferences);
  const kept = sixFigures(value, kind, { units: 'm', decimal: preferences.decimal });
  return shown === kept ? shown : `${shown} = ${kept}`;
}

function sixFigures(value: number, kind: QuantityKind, preferences: Preferences): string {
  const { size } = displayUnit(kind, preferences);
  return formatQuantity(Number((value / size).toPrecision(6)) * size, kind, preferences, { figures: 'exact' });
}
