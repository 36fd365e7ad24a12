/**
 * Every figure of a scheme that a person can enter: where it stands in the document, what it is called, how it is read
 * and how it is set. The panels list them, the board opens them where they are lettered; both through this one table.
 */
import {
  setAbove,
  setAskedSafety,
  setBreadth,
  setLoad,
  setMasonry,
  setRise,
  setShapeMeasure,
  setSpan,
  setSway,
  setThickness,
  setVoussoirs,
} from '../../core/job/edits.ts';
import type { ShapeMeasure } from '../../core/job/edits.ts';
import type { ResolvedLoad, ResolvedProfile, ResolvedScheme } from '../../core/job/defaults.ts';
import type { Scheme } from '../../core/job/schema.ts';
import type { Check } from '../../core/assess/assessment.ts';
import type { QuantityKind } from '../../core/quantity/kinds.ts';

export interface Measure {
  /** Field path from the scheme's root, as in `profile.span`; loads by their id, as in `loads.l1.x`. */
  readonly path: string;
  readonly name: string;
  readonly kind: QuantityKind;
  /** In the unit of its kind; null where it is not known. */
  readonly read: (scheme: ResolvedScheme) => number | null;
  readonly set: (scheme: Scheme, value: number) => Scheme;
  /** Takes the entry away, so that what is usually assumed counts again. Absent where an entry must be. */
  readonly forget?: (scheme: Scheme) => Scheme;
  /** What no figure means, where it is not that it is not known. */
  readonly empty?: string;
  /** A count: whole figures only. */
  readonly whole?: true;
}

const SPAN: Measure = {
  path: 'profile.span',
  name: 'Span',
  kind: 'length',
  read: ({ profile }) => ('span' in profile ? profile.span : null),
  set: setSpan,
};

const RISE: Measure = {
  path: 'profile.rise',
  name: 'Rise',
  kind: 'length',
  read: ({ profile }) => ('rise' in profile ? profile.rise : null),
  set: setRise,
};

function shapeMeasure(measure: ShapeMeasure, name: string, kind: QuantityKind, optional: boolean): Measure {
  return {
    path: `profile.${measure}`,
    name,
    kind,
    read: ({ profile }) => (profile as Readonly<Partial<Record<ShapeMeasure, number>>>)[measure] ?? null,
    set: (scheme, value) => setShapeMeasure(scheme, measure, value),
    ...(optional ? { forget: (scheme: Scheme) => setShapeMeasure(scheme, measure, undefined) } : {}),
  };
}

const STEP = shapeMeasure('step', 'Right end higher by', 'length', true);
const HAUNCH_ANGLE = shapeMeasure('haunchAngle', 'Haunch angle', 'angle', false);
const SKEWBACK = shapeMeasure('skewbackAngle', 'Skewback', 'angle', false);
const CAMBER = shapeMeasure('camber', 'Camber', 'length', false);

/** The opening as its shape is set out; nothing for a measured one, whose points are entered elsewhere. */
export function openingMeasures({ shape }: ResolvedProfile): readonly Measure[] {
  switch (shape) {
    case 'measured':
      return [];
    case 'semicircular':
      return [SPAN, STEP];
    case 'flat':
      return [SPAN, CAMBER, SKEWBACK, STEP];
    case 'three-centred':
      return [SPAN, RISE, shapeMeasure('haunchRadius', 'Haunch radius', 'length', true), STEP];
    case 'four-centred':
      return [SPAN, RISE, shapeMeasure('haunchRadius', 'Haunch radius', 'length', false), HAUNCH_ANGLE, STEP];
    default:
      return [SPAN, RISE, STEP];
  }
}

export const RING_MEASURES: readonly Measure[] = [
  { path: 'ring.thickness', name: 'Thickness', kind: 'length', read: ({ ring }) => ring.thickness, set: setThickness },
  { path: 'breadth', name: 'Breadth', kind: 'length', read: ({ breadth }) => breadth, set: setBreadth },
  {
    path: 'ring.voussoirs',
    name: 'Voussoirs',
    kind: 'plain',
    read: ({ ring }) => ring.voussoirs,
    set: setVoussoirs,
    forget: (scheme) => setVoussoirs(scheme, undefined),
    whole: true,
  },
];

export const STONE_MEASURES: readonly Measure[] = [
  stoneMeasure('unitWeight', 'Unit weight', 'unitWeight'),
  stoneMeasure('strength', 'Strength', 'strength'),
  stoneMeasure('friction', 'Friction', 'plain'),
];

function stoneMeasure(field: 'unitWeight' | 'strength' | 'friction', name: string, kind: QuantityKind): Measure {
  return {
    path: `masonry.${field}`,
    name,
    kind,
    read: ({ masonry }) => masonry[field],
    set: (scheme, value) => setMasonry(scheme, { [field]: value }),
    forget: (scheme) => setMasonry(scheme, { [field]: undefined }),
  };
}

const ABOVE_MEASURES: readonly Measure[] = [
  {
    path: 'above.height',
    name: 'Height over crown',
    kind: 'length',
    read: ({ above }) => above.height,
    set: (scheme, height) => setAbove(scheme, { height }),
    forget: (scheme) => setAbove(scheme, { height: undefined }),
  },
  {
    path: 'above.unitWeight',
    name: 'Unit weight',
    kind: 'unitWeight',
    read: ({ above }) => above.unitWeight,
    set: (scheme, unitWeight) => setAbove(scheme, { unitWeight }),
    forget: (scheme) => setAbove(scheme, { unitWeight: undefined }),
  },
];

export function aboveMeasures({ above }: ResolvedScheme): readonly Measure[] {
  return above.kind === 'none' ? [] : ABOVE_MEASURES;
}

type LoadField = 'x' | 'force' | 'from' | 'to' | 'intensity';

const LOAD_FIELDS = {
  point: [
    ['force', 'Force', 'force'],
    ['x', 'From mid-span', 'length'],
  ],
  axle: [
    ['force', 'Force', 'force'],
    ['x', 'From mid-span', 'length'],
  ],
  strip: [
    ['intensity', 'Intensity', 'intensity'],
    ['from', 'From', 'length'],
    ['to', 'To', 'length'],
  ],
} as const satisfies Record<ResolvedLoad['kind'], readonly (readonly [LoadField, string, QuantityKind])[]>;

/** The figure by which a load is known first, then where it stands. */
export function loadMeasures({ id, kind }: ResolvedLoad): readonly Measure[] {
  return LOAD_FIELDS[kind].map(([field, name, quantity]) => ({
    path: `loads.${id}.${field}`,
    name,
    kind: quantity,
    read: ({ loads }) => {
      const load = loads.find((candidate) => candidate.id === id);
      return load === undefined ? null : ((load as Readonly<Partial<Record<LoadField, number>>>)[field] ?? null);
    },
    set: (scheme, value) => setLoad(scheme, id, { [field]: value }),
  }));
}

export const SWAY: Measure = {
  path: 'sway',
  name: 'Sway, share of gravity',
  kind: 'plain',
  read: ({ sway }) => sway,
  set: (scheme, value) => setSway(scheme, value === 0 ? undefined : value),
  forget: (scheme) => setSway(scheme, undefined),
};

export const ASKED_SAFETY: Measure = {
  path: 'asked.geometricSafety',
  name: 'Safety asked for',
  kind: 'plain',
  read: ({ asked }) => asked.geometricSafety,
  set: setAskedSafety,
  forget: (scheme) => setAskedSafety(scheme, undefined),
};

/** What a check cannot do without. */
const NEEDED: Readonly<Record<string, string>> = {
  'ring.sliding': 'masonry.friction',
  'ring.crushing': 'masonry.strength',
};

/** The measure whose value is not known and for want of which a check says nothing; null where that is not why. */
export function missingFor({ id, status }: Check, scheme: ResolvedScheme): Measure | null {
  const path = NEEDED[id];
  if (status !== 'unknown' || path === undefined) return null;
  const measure = measureAt(scheme, path);
  return measure?.read(scheme) === null ? measure : null;
}

/** The measure that a figure on the board states; null where the figure is computed. */
export function measureAt(scheme: ResolvedScheme, path: string): Measure | null {
  const all = [
    ...openingMeasures(scheme.profile),
    ...RING_MEASURES,
    ...STONE_MEASURES,
    ...aboveMeasures(scheme),
    ...scheme.loads.flatMap(loadMeasures),
    SWAY,
    ASKED_SAFETY,
  ];
  return all.find((measure) => measure.path === path) ?? null;
}
