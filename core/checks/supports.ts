/** Checks of one support at the least thrust, to which a support that yields brings the arch; ties hold their share. */
import type { ResolvedBody } from '../job/support-defaults.ts';
import { figure } from '../quantity/figures.ts';
import type { Check } from './check.ts';
import type { SupportSide } from './support-depth.ts';

/** One bed, as far as the checks ask. Lengths in m, kN, kN/m². */
export interface BedFacts {
  readonly course: number;
  readonly front: number;
  readonly back: number;
  readonly normal: number;
  readonly shear: number;
  readonly eccentricity: number | null;
  readonly stress: readonly [number, number] | null;
}

export interface SupportFacts {
  readonly support: ResolvedBody;
  readonly answer: {
    readonly side: SupportSide;
    readonly capacity: { readonly greatest: number | null; readonly whole: number | null };
    readonly together: object | null;
  };
  readonly least: {
    readonly horizontal: number;
    readonly heldByTies: number;
    readonly stands: boolean;
    readonly standsWhole: boolean;
    readonly wedge: number;
    readonly beds: readonly BedFacts[];
    readonly overturning: number | null;
    readonly pressure: number | null;
    readonly drive: number;
    readonly resistance: number | null;
  };
  readonly asked: { readonly overturning: number; readonly baseSliding: number };
  /** Of the masonry, MPa; null when it is not known. */
  readonly strength: number | null;
}

const NOTHING = { demand: null, limit: null, utilisation: null, joints: [] } as const;

/** The one check of a support under an arch that does not stand by itself. */
export const unaskedSupport = (side: SupportSide, kind: ResolvedBody['kind']): Check => ({
  ...NOTHING,
  id: `support.${side}.stands`,
  title: `${capital(side)} ${kind} holds the thrust`,
  status: 'unknown',
  unit: 'kN',
  where: `${side} ${kind}`,
  because: 'No line of thrust fits in the ring, so there is no thrust to carry to the ground.',
  source: STANDS_SOURCE,
});

export function supportChecks(facts: SupportFacts): Check[] {
  return [
    stands(facts),
    middleThird(facts),
    bedSliding(facts),
    bedCrushing(facts),
    overturning(facts),
    baseSliding(facts),
    bearing(facts),
  ];
}

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

const STANDS_SOURCE =
  'Resultant at every bed with the masonry that cracks off left out: S. Huerta 2010; J. A. Ochsendorf, J. I. Hernando & S. Huerta 2004 (from memory)';

const NO_LINE = 'The line of pressure leaves the body.';

const share = (demand: number, limit: number | null): number | null =>
  limit !== null && limit > 0 ? Math.max(0, demand / limit) : null;

function common({ answer, support }: SupportFacts, what: string, title: string, course?: number) {
  const { side } = answer;
  const name = `${side} ${support.kind}`;
  return {
    id: `support.${side}.${what}`,
    title: `${capital(name)} ${title}`,
    where: course === undefined ? name : `${name}, ${courseInWords(support, course)}`,
    joints: [],
  } as const;
}

const courseInWords = ({ courses }: ResolvedBody, course: number): string =>
  course >= courses.length ? 'underside of the footing' : `bed under course ${course + 1}`;

function stands(facts: SupportFacts): Check {
  const { answer, least } = facts;
  const { capacity } = answer;
  const limit = capacity.greatest === null ? null : capacity.greatest + least.heldByTies;
  const pushes = `The arch pushes at least ${figure(least.horizontal)} kN`;
  const tied = least.heldByTies > 0 ? `, of which ties hold ${figure(least.heldByTies)} kN` : '';
  const takes =
    capacity.greatest === null
      ? 'there is no thrust with which this support stands'
      : `the support can take ${figure(capacity.greatest)} kN`;
  const cracks = least.wedge > 0 ? ` A wedge of ${figure(least.wedge)} kN cracks off and is left out.` : '';
  const base = {
    ...common(facts, 'stands', 'holds the thrust'),
    demand: least.horizontal,
    limit,
    utilisation: limit === null ? null : share(least.horizontal, limit),
    unit: 'kN',
    source: STANDS_SOURCE,
  };
  if (least.stands) return { ...base, status: 'holds', because: `${pushes}${tied}; ${takes}.${cracks}` };
  if (least.standsWhole || (answer.together !== null && least.heldByTies === 0)) {
    const whole = capacity.whole === null ? '' : ` (as one piece ${figure(capacity.whole)} kN)`;
    const because = `${pushes}${tied}; with the wedge that cracks off left out ${takes}${whole}. Arch and support stand together only while the support holds as one piece.`;
    return { ...base, status: 'narrow', because };
  }
  const because = `Arch and support cannot stand together: ${lower(pushes)}${tied}, and ${takes}.`;
  return { ...base, status: 'fails', because };
}

const lower = (text: string): string => text.charAt(0).toLowerCase() + text.slice(1);

/** The bed for which `of` is greatest. */
function worst(beds: readonly BedFacts[], of: (bed: BedFacts) => number): BedFacts {
  return beds.reduce((most, bed) => (of(bed) > of(most) ? bed : most));
}

const depthOf = ({ front, back }: BedFacts): number => Math.abs(back - front);

function middleThird(facts: SupportFacts): Check {
  const { beds } = facts.least;
  const of = (bed: BedFacts): number =>
    bed.eccentricity === null || depthOf(bed) === 0 ? Infinity : Math.abs(bed.eccentricity) / depthOf(bed);
  const bed = worst(beds, of);
  const demand = bed.eccentricity === null ? null : Math.abs(bed.eccentricity);
  const limit = depthOf(bed) / 6;
  const status = of(bed) <= 1 / 6 ? 'holds' : of(bed) < 1 / 2 ? 'narrow' : 'fails';
  const off =
    demand === null
      ? 'Nothing presses on it'
      : `The line passes ${figure(demand)} m from the middle of a bed of ${figure(depthOf(bed))} m`;
  const says = {
    holds: 'within the middle third, so no bed opens.',
    narrow: 'beyond the middle third, so the bed opens over part of its depth.',
    fails: 'outside the bed.',
  } as const;
  return {
    ...common(facts, 'middle-third', 'within its middle third', bed.course),
    status,
    demand,
    limit,
    utilisation: demand === null ? null : share(demand, limit),
    unit: 'm',
    because: demand === null ? `${off}.` : `${off}, ${says[status]}`,
    source: 'Middle third and triangular pressure without tension; standard statics',
  };
}

function bedSliding(facts: SupportFacts): Check {
  const { support, least } = facts;
  const { friction } = support;
  // under the footing the ground's own friction counts
  const beds = support.footing === null ? least.beds : least.beds.slice(0, -1);
  const needed = (bed: BedFacts): number => (bed.normal > 0 ? Math.abs(bed.shear) / bed.normal : Infinity);
  const bed = worst(beds, needed);
  const base = {
    ...common(facts, 'sliding', 'against sliding on its beds', bed.course),
    unit: '',
    source: 'Coulomb friction on a bed joint; standard statics',
  };
  const demand = Number.isFinite(needed(bed)) ? needed(bed) : null;
  if (demand === null)
    return {
      ...base,
      ...NOTHING,
      limit: friction,
      status: 'fails',
      because: 'Nothing presses on the bed, so no friction holds it.',
    };
  if (friction === null) {
    const because = `The friction of the beds is not known; ${figure(demand)} is needed.`;
    return { ...base, status: 'unknown', demand, limit: null, utilisation: null, because };
  }
  const holds = demand <= friction;
  return {
    ...base,
    status: holds ? 'holds' : 'fails',
    demand,
    limit: friction,
    utilisation: share(demand, friction),
    because: `A friction of ${figure(demand)} is needed; ${holds ? '' : 'only '}${figure(friction)} is there.`,
  };
}

function bedCrushing(facts: SupportFacts): Check {
  const { strength, least } = facts;
  const pressed = (bed: BedFacts): number => (bed.stress === null ? -1 : Math.max(...bed.stress) / 1000);
  const bed = worst(least.beds, pressed);
  const base = {
    ...common(facts, 'crushing', 'against crushing', bed.course),
    unit: 'MPa',
    source: 'Pressure in a straight line over the compressed part of the bed; standard statics',
  };
  if (least.beds.some(({ stress }) => stress === null))
    return {
      ...base,
      ...NOTHING,
      limit: strength,
      status: 'unknown',
      because: `${NO_LINE} There is no stress to hold against its strength.`,
    };
  const demand = pressed(bed);
  if (strength === null) {
    const because = `The strength of the masonry is not known; ${figure(demand)} MPa is needed.`;
    return { ...base, status: 'unknown', demand, limit: null, utilisation: null, because };
  }
  return {
    ...base,
    status: demand <= strength ? 'holds' : 'fails',
    demand,
    limit: strength,
    utilisation: share(demand, strength),
    because: `The bed is pressed with ${figure(demand)} MPa at its edge; the strength is ${figure(strength)} MPa.`,
  };
}

function overturning(facts: SupportFacts): Check {
  const { least, asked } = facts;
  const base = {
    ...common(facts, 'overturning', 'against overturning'),
    unit: '',
    source:
      'Resisting over overturning moment about the toe; standard statics. Margin 2 (1.5 in some codes), from memory',
  };
  const found = least.overturning;
  if (found === null)
    return {
      ...base,
      ...NOTHING,
      status: least.stands ? 'holds' : 'fails',
      because: least.stands ? 'Nothing overturns it.' : NO_LINE,
    };
  return {
    ...base,
    status: found < 1 ? 'fails' : found < asked.overturning ? 'narrow' : 'holds',
    demand: asked.overturning,
    limit: found,
    utilisation: share(asked.overturning, found),
    because: `The moment that resists is ${figure(found)} times the one that overturns; ${figure(asked.overturning)} is asked for.`,
  };
}

function baseSliding(facts: SupportFacts): Check {
  const { least, asked } = facts;
  const drive = Math.abs(least.drive);
  const base = {
    ...common(facts, 'base-sliding', 'against sliding on the ground'),
    unit: 'kN',
    source: 'Friction on the base, with passive earth only where it was entered. Margin 1.5, from memory',
  };
  const demand = drive * asked.baseSliding;
  if (least.resistance === null) {
    const because = `The friction on the ground is not known; ${figure(drive)} kN drive the base.`;
    return { ...base, status: 'unknown', demand, limit: null, utilisation: null, because };
  }
  const { resistance } = least;
  return {
    ...base,
    status: drive > resistance ? 'fails' : demand > resistance ? 'narrow' : 'holds',
    demand,
    limit: resistance,
    utilisation: share(demand, resistance),
    because: `${figure(drive)} kN drive the base and ${figure(resistance)} kN can hold it; ${figure(asked.baseSliding)} times is asked for.`,
  };
}

function bearing(facts: SupportFacts): Check {
  const { least, support } = facts;
  const { bearing: limit, name } = support.ground;
  const base = {
    ...common(facts, 'bearing', 'on the ground'),
    unit: 'kN/m²',
    source: `Pressure in a straight line under the base; bearing resistance of the ground (${name}): presumed, preliminary`,
  };
  if (least.pressure === null)
    return { ...base, ...NOTHING, limit, status: 'fails', because: 'The line of pressure leaves the base.' };
  const demand = least.pressure;
  if (limit === null) {
    const because = `What the ground may bear is not known; it is pressed with ${figure(demand)} kN/m².`;
    return { ...base, status: 'unknown', demand, limit, utilisation: null, because };
  }
  return {
    ...base,
    status: demand <= limit ? 'holds' : 'fails',
    demand,
    limit,
    utilisation: share(demand, limit),
    because: `The ground is pressed with ${figure(demand)} kN/m² at the toe; ${figure(limit)} kN/m² are presumed.`,
  };
}
