/**
 * What the old rules of proportion would have made of this arch, beside what was surveyed. They record what builders
 * did; they are no checks, so a rule has a value and no status.
 */
import type { Point } from '../geometry/point.ts';
import type { ProfileShape } from '../job/schema.ts';
import { figure, metres } from '../quantity/figures.ts';
import { FOOT, INCH } from '../quantity/kinds.ts';
import { supportDepth, type SupportSide } from './support-depth.ts';

/** Lengths in m. */
export interface ProportionFacts {
  readonly shape: ProfileShape;
  readonly span: number;
  /** Of the intrados, over the springings. */
  readonly rise: number;
  /** Radius of the intrados at the crown; null where the crown is a point, where it is straight, and where not known. */
  readonly crownRadius: number | null;
  /** Springings at two levels. */
  readonly rampant: boolean;
  /** Of the ring at the crown, as surveyed; null when it was not measured. */
  readonly ringThickness: number | null;
  /** The intrados at a share of its length, 0 at the left springing and 1 at the right. */
  readonly pointAtShare: (share: number) => Point;
}

export interface ProportionRule {
  readonly id: string;
  readonly name: string;
  readonly what: 'crown thickness' | 'support depth';
  /** In printed symbols, with what they stand for. */
  readonly formula: string;
  /** m; null outside the rule's field. */
  readonly value: number | null;
  /** The formula with its numbers, to be followed by hand; null where there is no value. */
  readonly working: string | null;
  /** Why the rule says nothing of this arch; null where it has a value. */
  readonly outside: string | null;
  /** The same dimension as surveyed, m; null when it is not known. */
  readonly surveyed: number | null;
  readonly source: string;
  readonly confidence: 'read' | 'from memory';
}

type Outcome = { readonly value: number; readonly working: string } | { readonly outside: string };

type Rule = Pick<ProportionRule, 'id' | 'name' | 'formula' | 'source' | 'confidence'> & {
  readonly apply: (facts: ProportionFacts) => Outcome;
};

/** Every rule in a fixed order, those of the crown first; one that does not apply stays, with its reason. */
export function proportionRules(facts: ProportionFacts): ProportionRule[] {
  const ofCrown = CROWN_RULES.map((rule) => stated(rule, facts, 'crown thickness', facts.ringThickness));
  return [...ofCrown, ...supportRules(facts).map((rule) => stated(rule, facts, 'support depth', null))];
}

function stated(
  { apply, ...rule }: Rule,
  facts: ProportionFacts,
  what: ProportionRule['what'],
  surveyed: number | null,
): ProportionRule {
  const outcome: Outcome =
    facts.shape === 'flat' ? { outside: 'The rule is for arches that rise; this one is flat.' } : apply(facts);
  const found =
    'outside' in outcome ? { value: null, working: null, outside: outcome.outside } : { ...outcome, outside: null };
  return { ...rule, what, ...found, surveyed };
}

const inFeet = (length: number): number => length / FOOT;

/** A thickness worked out in feet, with its metres. */
const fromFeet = (feet: number, steps: string): Outcome => ({
  value: feet * FOOT,
  working: `${steps} = ${figure(feet)} ft = ${metres(feet * FOOT)} m`,
});

function rankine(id: string, name: string, constant: number, confidence: Rule['confidence']): Rule {
  return {
    id,
    name,
    formula: `t = √(${constant} R); R radius of the intrados at the crown; feet`,
    source: 'W. J. M. Rankine, A Manual of Civil Engineering (1862)',
    confidence,
    apply(facts) {
      if (facts.crownRadius === null) return { outside: withoutRadius(facts) };
      const radius = inFeet(facts.crownRadius);
      return fromFeet(Math.sqrt(constant * radius), `√(${constant} × ${figure(radius)})`);
    },
  };
}

const HAS_APEX: ReadonlySet<ProfileShape> = new Set(['pointed', 'four-centred']);

const POINTED_CROWN = 'The rule goes by the radius at the crown; here the crown is a point.';
const TWO_LEVELS = 'The rule is for springings at one level.';

function withoutRadius({ shape, rampant }: ProportionFacts): string {
  if (HAS_APEX.has(shape)) return POINTED_CROWN;
  return rampant ? TWO_LEVELS : 'The radius of the intrados at the crown is not known.';
}

const trautwine: Rule = {
  id: 'trautwine',
  name: 'Trautwine',
  formula: 't = √(R + s/2)/4 + 0.2, R = (s²/4 + f²)/(2f); s span, f rise; first-class cut stone; feet',
  source:
    'J. C. Trautwine, The Civil Engineer’s Pocket-Book (read as quoted); R as the circle through both springings and the crown, whatever the curve (from memory)',
  confidence: 'read',
  apply({ shape, span, rise, rampant }) {
    if (HAS_APEX.has(shape)) return { outside: POINTED_CROWN };
    if (rampant) return { outside: TWO_LEVELS };
    const halfSpan = inFeet(span) / 2;
    const radius = (halfSpan ** 2 + inFeet(rise) ** 2) / (2 * inFeet(rise));
    return fromFeet(Math.sqrt(radius + halfSpan) / 4 + 0.2, `√(${figure(radius)} + ${figure(halfSpan)})/4 + 0.2`);
  },
};

const perronet: Rule = {
  id: 'perronet',
  name: 'Perronet',
  formula: 't = 0.325 + 0.0347 s; s span; metres',
  source: 'J.-R. Perronet’s rule for bridges, as handed down in metres',
  confidence: 'from memory',
  apply: ({ span }) => ({
    value: 0.325 + 0.0347 * span,
    working: `0.325 + 0.0347 × ${metres(span)} = ${metres(0.325 + 0.0347 * span)} m`,
  }),
};

/** Share by which a span that was typed in feet may miss a limit in feet after its change to metres and back. */
const ROUNDING = 1e-12;

const vose: Rule = {
  id: 'vose',
  name: 'Vose (Gauthey)',
  formula: 't = 13 in + s/48 for 6–50 ft, t = s/24 for 50–100 ft; s span',
  source: 'G. L. Vose, Manual for Railroad Engineers (1873), Gauthey’s rule in another dress',
  confidence: 'read',
  apply({ span }) {
    const feet = inFeet(span);
    const inches = span / INCH;
    const within = (least: number, most: number) => feet >= least * (1 - ROUNDING) && feet <= most * (1 + ROUNDING);
    if (within(6, 50)) return fromInches(13 + inches / 48, `13 + ${figure(inches)}/48`);
    if (within(50, 100)) return fromInches(inches / 24, `${figure(inches)}/24`);
    return { outside: `The rule is for spans of 6 to 100 ft (1.83 to 30.48 m); this one is ${metres(span)} m.` };
  },
};

const fromInches = (inches: number, steps: string): Outcome => ({
  value: inches * INCH,
  working: `${steps} = ${figure(inches)} in = ${metres(inches * INCH)} m`,
});

const CROWN_RULES: readonly Rule[] = [
  rankine('rankine.single', 'Rankine, single arch', 0.12, 'from memory'),
  rankine('rankine.series', 'Rankine, arch in a series', 0.17, 'read'),
  trautwine,
  perronet,
  vose,
];

/** m: finer than stone is measured, so that an arch drawn in halves is not taken for a lopsided one. */
const SAME_DEPTH = 0.0005;

/** One rule where both supports come out alike, one for each side where they do not. */
function supportRules({ pointAtShare }: ProportionFacts): Rule[] {
  const [left, right] = [supportDepth(pointAtShare, 'left'), supportDepth(pointAtShare, 'right')];
  if (Math.abs(left - right) <= SAME_DEPTH) return [derandBlondel(left, null)];
  return [derandBlondel(left, 'left'), derandBlondel(right, 'right')];
}

function derandBlondel(depth: number, side: SupportSide | null): Rule {
  return {
    id: side === null ? 'derand-blondel' : `derand-blondel.${side}`,
    name: `Derand–Blondel, ${side === null ? 'pier or abutment' : `${side} pier or abutment`}`,
    formula:
      'd = |x(⅓) − x(0)|; the intrados cut in three equal lengths, its outer chord carried on by its own length beyond the springing',
    source: 'F. Derand, L’Architecture des voûtes (1643), and F. Blondel, Cours d’architecture (1675–83)',
    confidence: 'from memory',
    apply: ({ span }) =>
      depth > SAME_DEPTH
        ? { value: depth, working: `${metres(depth)} m, ${figure(depth / span)} of the span` }
        : { outside: 'The chord carried on beyond the springing does not reach behind the opening’s edge.' },
  };
}
