/**
 * The values that stand in for what a job does not say, each with its source.
 *
 * They are starting points for an assessor, not design values. Every one that weighs on an answer is listed as
 * `Assumed`; what is merely absent (no loads, no sway, level springings, no name) is filled without a word.
 */
import type { Assumed } from './assumed.ts';
import type { Above, Backing, Combination, Crack, Load, Masonry, Profile, Ring, Road, Scheme } from './schema.ts';
import { resolveSupports, type ResolvedSupports } from './support-defaults.ts';
import { resolveTies, type ResolvedTie } from './tie-defaults.ts';

/** Every field given; `null` only where the value is not known and nothing sensible stands in for it. */
type Filled<T> = T extends unknown ? { readonly [Key in keyof T]-?: Exclude<T[Key], undefined> } : never;

type MeasuredProfile = Extract<Profile, { shape: 'measured' }>;

/** A profile with its step and, where it has one, its haunch radius. A measured one may still lack an extrados. */
export type ResolvedProfile =
  Filled<Exclude<Profile, MeasuredProfile>> | (Omit<MeasuredProfile, 'step'> & { readonly step: number });
export type ResolvedRing = Filled<Ring>;
export type ResolvedMasonry = Filled<Masonry>;
export type ResolvedAbove = Filled<Above>;
export type ResolvedLoad = Filled<Load>;
export type ResolvedBacking = Filled<Backing>;
export type ResolvedCombination = Filled<Combination>;

/** A scheme with nothing left open; the same units and axes as the job. */
export interface ResolvedScheme {
  readonly id: string;
  readonly name: string;
  readonly role: 'as-found' | 'proposal';
  readonly profile: ResolvedProfile;
  readonly ring: ResolvedRing;
  readonly breadth: number;
  readonly masonry: ResolvedMasonry;
  readonly above: ResolvedAbove;
  /** Null where there is none. */
  readonly backing: ResolvedBacking | null;
  readonly loads: readonly ResolvedLoad[];
  readonly sway: number;
  readonly combinations: readonly ResolvedCombination[];
  /** Null where no road goes over the arch. */
  readonly road: Road | null;
  readonly cracks: readonly Crack[];
  readonly supports: ResolvedSupports;
  readonly ties: readonly ResolvedTie[];
  readonly asked: {
    readonly geometricSafety: number;
    /** Of the supports about their toe. */
    readonly overturning: number;
    /** Of the supports on the ground. */
    readonly baseSliding: number;
  };
}

const VOUSSOIRS = 21;
const VOUSSOIRS_WITH_CROWN_JOINT = 20;
const UNIT_WEIGHT = 22;
const FRICTION = 0.6;
const ABOVE_UNIT_WEIGHT = { wall: 20, fill: 18 } as const;
const GEOMETRIC_SAFETY = 2;
/** Length of a wheel's print along the span, m; a point load where the fill is deep makes little of it. */
const PATCH = 0.3;
/** Spread to each side for each metre down. */
const DISPERSAL = 0.5;

/**
 * Fills every optional field of a scheme.
 *
 * @param index the scheme's place in its arch; the first is the arch as found, the rest are proposals.
 */
export function resolveScheme(scheme: Scheme, index = 0): { resolved: ResolvedScheme; assumed: Assumed[] } {
  const assumed: Assumed[] = [];
  const role = scheme.role ?? (index === 0 ? 'as-found' : 'proposal');
  const resolved: ResolvedScheme = {
    id: scheme.id,
    name: scheme.name ?? (role === 'as-found' ? 'As found' : `Proposal ${Math.max(index, 1)}`),
    role,
    profile: resolveProfile(scheme.profile, assumed),
    ring: resolveRing(scheme, assumed),
    breadth: scheme.breadth,
    masonry: resolveMasonry(scheme.masonry ?? {}, assumed),
    above: resolveAbove(scheme.above, assumed),
    backing: scheme.backing === undefined ? null : resolveBacking(scheme.backing, assumed),
    loads: (scheme.loads ?? []).map((load, i) => resolveLoad(load, `loads[${i}]`, assumed)),
    sway: scheme.sway ?? 0,
    combinations: (scheme.combinations ?? []).map(resolveCombination),
    road: scheme.road ?? null,
    cracks: scheme.cracks ?? [],
    ...resolveHolding(scheme, assumed),
    asked: resolveAsked(scheme, assumed),
  };
  return { resolved, assumed };
}

/** Supports and ties. What they take from the ring is already listed with the ring. */
function resolveHolding(scheme: Scheme, assumed: Assumed[]): Pick<ResolvedScheme, 'supports' | 'ties'> {
  const { breadth, ring, profile, supports = {}, ties = [] } = scheme;
  const masonry = resolveMasonry(scheme.masonry ?? {}, []);
  const between = spanOf(profile) + 2 * (ring.springingThickness ?? ring.thickness);
  return {
    supports: resolveSupports(supports, { breadth, masonry }, assumed),
    ties: resolveTies(ties, between, assumed),
  };
}

function spanOf(profile: Profile): number {
  if (profile.shape !== 'measured') return profile.span;
  const [first, last] = [profile.points[0], profile.points[profile.points.length - 1]];
  return first !== undefined && last !== undefined ? last[0] - first[0] : 0;
}

const OVERTURNING = 2;
const BASE_SLIDING = 1.5;

/** The margins of the supports weigh on nothing where the supports are rigid. */
function resolveAsked({ asked, supports }: Scheme, assumed: Assumed[]): ResolvedScheme['asked'] {
  const geometricSafety = asked?.geometricSafety ?? assumeSafety(assumed);
  const hasBody = [supports?.left, supports?.right].some((side) => side !== undefined && side.kind !== 'rigid');
  if (hasBody && asked?.overturning === undefined) {
    assumed.push({
      field: 'asked.overturning',
      value: OVERTURNING,
      because:
        'No safety against overturning is asked for; 2 is taken (1.5 in some codes; from memory; typical, verify).',
    });
  }
  if (hasBody && asked?.baseSliding === undefined) {
    assumed.push({
      field: 'asked.baseSliding',
      value: BASE_SLIDING,
      because: 'No safety against sliding on the ground is asked for; 1.5 is taken (from memory; typical, verify).',
    });
  }
  return {
    geometricSafety,
    overturning: asked?.overturning ?? OVERTURNING,
    baseSliding: asked?.baseSliding ?? BASE_SLIDING,
  };
}

function resolveProfile(profile: Profile, assumed: Assumed[]): ResolvedProfile {
  const step = profile.step ?? 0;
  if (profile.shape !== 'three-centred') return { ...profile, step };
  return {
    ...profile,
    step,
    haunchRadius: profile.haunchRadius ?? assumeHaunchRadius(profile.span, profile.rise, assumed),
  };
}

function assumeHaunchRadius(span: number, rise: number, assumed: Assumed[]): number {
  const value = classicalHaunchRadius(span, rise);
  assumed.push({
    field: 'profile.haunchRadius',
    value,
    because:
      'No haunch radius is given; the classical setting-out of a three-centred arch is taken, ' +
      'r = c (c − (a − f)) / 2a with c = √(a² + f²), a the half-span and f the rise (common practice).',
  });
  return value;
}

/**
 * Radius of the haunch arcs in the classical setting-out of a three-centred arch, m (common practice): with a the
 * half-span, f the rise and c = √(a² + f²), r = c (c − (a − f)) / 2a. It lies below the rise as long as f < a.
 */
export function classicalHaunchRadius(span: number, rise: number): number {
  const half = span / 2;
  const chord = Math.hypot(half, rise);
  return (chord * (chord - (half - rise))) / span;
}

/** The number of voussoirs taken where none was counted: odd for a keystone, even where two arcs meet at the crown. */
export function usualVoussoirs(shape: Profile['shape']): number {
  return shape === 'pointed' || shape === 'four-centred' ? VOUSSOIRS_WITH_CROWN_JOINT : VOUSSOIRS;
}

function resolveRing(scheme: Scheme, assumed: Assumed[]): ResolvedRing {
  const { ring, profile } = scheme;
  return {
    ...ring,
    voussoirs: ring.voussoirs ?? assumeVoussoirs(profile.shape, assumed),
    joints: ring.joints ?? assumeJoints(assumed),
    springingThickness: ring.springingThickness ?? ring.thickness,
    courses: ring.courses ?? 1,
    lostMortar: ring.lostMortar ?? [],
  };
}

function assumeVoussoirs(shape: Profile['shape'], assumed: Assumed[]): number {
  const value = usualVoussoirs(shape);
  const crown = value % 2 === 0 ? 'a joint at the crown' : 'a keystone';
  assumed.push({
    field: 'ring.voussoirs',
    value,
    because: `The voussoirs were not counted; ${value} with ${crown} are taken (common practice). A ring can only hinge at its joints, so count them where it matters.`,
  });
  return value;
}

function assumeJoints(assumed: Assumed[]): 'radial' {
  assumed.push({
    field: 'ring.joints',
    value: 'radial',
    because: 'The direction of the joints is not recorded; square to the intrados is taken (common practice).',
  });
  return 'radial';
}

function resolveMasonry(masonry: Masonry, assumed: Assumed[]): ResolvedMasonry {
  const { unitWeight, friction, strength } = masonry;
  if (unitWeight === undefined) {
    assumed.push({
      field: 'masonry.unitWeight',
      value: UNIT_WEIGHT,
      because: 'No unit weight is given; 22 kN/m³ of squared ashlar is taken (Circolare 2019, Table C8.5.I).',
    });
  }
  if (strength === undefined) {
    assumed.push({
      field: 'masonry.strength',
      value: null,
      because: 'No compressive strength is given and none is taken; crushing is left unchecked until one is known.',
    });
  }
  if (friction === undefined) {
    assumed.push({
      field: 'masonry.friction',
      value: FRICTION,
      because:
        'No friction is given; 0.6 is taken, the usual figure for an assessment (from memory; typical, verify; 0.4 is cautious).',
    });
  }
  return {
    ...masonry,
    name: masonry.name ?? 'not recorded',
    unitWeight: unitWeight ?? UNIT_WEIGHT,
    strength: strength ?? null,
    friction: friction === undefined ? FRICTION : friction,
  };
}

function resolveAbove(above: Above | undefined, assumed: Assumed[]): ResolvedAbove {
  const rest = {
    layers: (above?.layers ?? []).map((layer, i) => ({ ...layer, name: layer.name ?? `Layer ${i + 1}` })),
    openings: above?.openings ?? [],
    sidePressure: above?.sidePressure ?? 0,
  };
  if (above === undefined) {
    assumed.push({
      field: 'above.kind',
      value: 'none',
      because: 'Nothing is said of what the ring carries above it; it is taken as bare.',
    });
    return { ...rest, kind: 'none', height: 0, unitWeight: 0 };
  }
  if (above.kind === 'none') return { ...above, ...rest, height: 0, unitWeight: 0 };
  const { kind, height, unitWeight } = above;
  if (height === undefined) {
    assumed.push({
      field: 'above.height',
      value: 0,
      because: `No height is given for the ${kind} above; it is taken to end level with the crown of the extrados.`,
    });
  }
  if (unitWeight === undefined) {
    assumed.push({
      field: 'above.unitWeight',
      value: ABOVE_UNIT_WEIGHT[kind],
      because:
        kind === 'wall'
          ? 'No unit weight is given for the wall above; 20 kN/m³ of roughly dressed masonry is taken (Circolare 2019, Table C8.5.I).'
          : 'No unit weight is given for the fill above; 18 kN/m³ is taken, between sand and gravel at 15–16 and hardcore at 18.5–19.5 (EN 1991-1-1 Annex A, from memory; typical, verify).',
    });
  }
  return { ...above, ...rest, height: height ?? 0, unitWeight: unitWeight ?? ABOVE_UNIT_WEIGHT[kind] };
}

function resolveBacking(backing: Backing, assumed: Assumed[]): ResolvedBacking {
  if (backing.unitWeight === undefined) {
    assumed.push({
      field: 'backing.unitWeight',
      value: ABOVE_UNIT_WEIGHT.wall,
      because:
        'No unit weight is given for the backing; 20 kN/m³ of roughly dressed masonry is taken (Circolare 2019, Table C8.5.I).',
    });
  }
  return { ...backing, unitWeight: backing.unitWeight ?? ABOVE_UNIT_WEIGHT.wall };
}

function resolveLoad(load: Load, path: string, assumed: Assumed[]): ResolvedLoad {
  const common = { name: load.name ?? load.id, action: load.action ?? 'variable' } as const;
  if (load.kind !== 'axle') return { ...load, ...common };
  if (load.dispersal === undefined) {
    assumed.push({
      field: `${path}.dispersal`,
      value: DISPERSAL,
      because:
        'No spread through the fill is given; one across for two down is taken (common practice in bridge assessment).',
    });
  }
  return { ...load, ...common, patch: load.patch ?? PATCH, dispersal: load.dispersal ?? DISPERSAL };
}

const resolveCombination = (combination: Combination): ResolvedCombination => ({
  ...combination,
  name: combination.name ?? combination.id,
  permanent: combination.permanent ?? 1,
  variable: combination.variable ?? 1,
  factors: combination.factors ?? [],
});

function assumeSafety(assumed: Assumed[]): number {
  assumed.push({
    field: 'asked.geometricSafety',
    value: GEOMETRIC_SAFETY,
    because:
      'No margin is asked for; a geometric safety of 2 is taken, which keeps the line within the middle half of the ring (Heyman, from memory; typical, verify).',
  });
  return GEOMETRIC_SAFETY;
}
