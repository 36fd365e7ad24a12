/** Figures that only some arches need, as the panels enter them: one table beside that of the session. */
import type { Combination } from '../../core/job/schema.ts';
import {
  setBacking,
  setCombination,
  setCourses,
  setLayer,
  setLoad,
  setLoadFactor,
  setLostMortar,
  setOpening,
  setRoad,
  setSidePressure,
  setSpringingThickness,
} from '../../core/job/edits.ts';
import type { ResolvedLoad } from '../../core/job/defaults.ts';
import type { Measure } from '../session/measures.ts';

export const RING_DETAILS: readonly Measure[] = [
  {
    path: 'ring.springingThickness',
    name: 'Thick at springings',
    kind: 'length',
    read: ({ ring }) => ring.springingThickness,
    set: setSpringingThickness,
    forget: (scheme) => setSpringingThickness(scheme, undefined),
  },
  {
    path: 'ring.courses',
    name: 'Courses',
    kind: 'plain',
    read: ({ ring }) => ring.courses,
    set: setCourses,
    forget: (scheme) => setCourses(scheme, undefined),
    whole: true,
  },
];

export const lostMortarMeasures = (place: number): readonly Measure[] => [
  {
    path: `ring.lostMortar.${place}.depth`,
    name: 'Depth lost',
    kind: 'length',
    read: ({ ring }) => ring.lostMortar[place]?.depth ?? null,
    set: (scheme, depth) => setLostMortar(scheme, place, { depth }),
  },
  {
    path: `ring.lostMortar.${place}.joint`,
    name: 'At joint',
    kind: 'plain',
    empty: 'all joints',
    read: ({ ring }) => ring.lostMortar[place]?.joint ?? null,
    set: (scheme, joint) => setLostMortar(scheme, place, { joint }),
    forget: (scheme) => setLostMortar(scheme, place, { joint: undefined }),
    whole: true,
  },
];

export const BACKING: readonly Measure[] = [
  {
    path: 'backing.level',
    name: 'Up to level',
    kind: 'length',
    read: ({ backing }) => backing?.level ?? null,
    set: (scheme, level) => setBacking(scheme, { level }),
  },
  {
    path: 'backing.unitWeight',
    name: 'Unit weight',
    kind: 'unitWeight',
    read: ({ backing }) => backing?.unitWeight ?? null,
    set: (scheme, unitWeight) => setBacking(scheme, { unitWeight }),
    forget: (scheme) => setBacking(scheme, { unitWeight: undefined }),
  },
];

export const SIDE_PRESSURE: Measure = {
  path: 'above.sidePressure',
  name: 'Side pressure, share',
  kind: 'plain',
  read: ({ above }) => above.sidePressure,
  set: setSidePressure,
  forget: (scheme) => setSidePressure(scheme, undefined),
};

export const layerMeasures = (place: number): readonly Measure[] => [
  {
    path: `above.layers.${place}.thickness`,
    name: 'Thickness',
    kind: 'length',
    read: ({ above }) => above.layers[place]?.thickness ?? null,
    set: (scheme, thickness) => setLayer(scheme, place, { thickness }),
  },
  {
    path: `above.layers.${place}.unitWeight`,
    name: 'Unit weight',
    kind: 'unitWeight',
    read: ({ above }) => above.layers[place]?.unitWeight ?? null,
    set: (scheme, unitWeight) => setLayer(scheme, place, { unitWeight }),
  },
];

const OPENING_FIELDS = [
  ['from', 'From, off mid-span'],
  ['to', 'To, off mid-span'],
  ['sill', 'Sill over springing'],
  ['head', 'Head over springing'],
] as const;

export const openingMeasures = (place: number): readonly Measure[] =>
  OPENING_FIELDS.map(([field, name]) => ({
    path: `above.openings.${place}.${field}`,
    name,
    kind: 'length',
    read: ({ above }) => above.openings[place]?.[field] ?? null,
    set: (scheme, value) => setOpening(scheme, place, { [field]: value }),
  }));

/** Print and spread of an axle; nothing for other loads. */
export function axleMeasures({ id, kind }: ResolvedLoad): readonly Measure[] {
  if (kind !== 'axle') return [];
  return (
    [
      ['patch', 'Print along the span', 'length'],
      ['dispersal', 'Spread a metre down', 'plain'],
    ] as const
  ).map(([field, name, quantity]) => ({
    path: `loads.${id}.${field}`,
    name,
    kind: quantity,
    read: ({ loads }) => {
      const load = loads.find((candidate) => candidate.id === id);
      return load?.kind === 'axle' ? load[field] : null;
    },
    set: (scheme, value) => setLoad(scheme, id, { [field]: value }),
    forget: (scheme) => setLoad(scheme, id, { [field]: undefined }),
  }));
}

/** The two factors of a combination, and those that single loads have of their own. */
export function combinationMeasures({ id }: Combination, loads: readonly ResolvedLoad[]): readonly Measure[] {
  const factor = (field: 'permanent' | 'variable', name: string): Measure => ({
    path: `combinations.${id}.${field}`,
    name,
    kind: 'plain',
    read: ({ combinations }) => combinations.find((entry) => entry.id === id)?.[field] ?? null,
    set: (scheme, value) => setCombination(scheme, id, { [field]: value }),
    forget: (scheme) => setCombination(scheme, id, { [field]: undefined }),
  });
  const own = loads.map((load): Measure => ({
    path: `combinations.${id}.factors.${load.id}`,
    name: `${load.name}, its own`,
    kind: 'plain',
    read: ({ combinations }) =>
      combinations.find((entry) => entry.id === id)?.factors.find((entry) => entry.load === load.id)?.factor ?? null,
    set: (scheme, value) => setLoadFactor(scheme, id, load.id, value),
    forget: (scheme) => setLoadFactor(scheme, id, load.id, undefined),
  }));
  return [factor('permanent', 'On permanent'), factor('variable', 'On variable'), ...own];
}

const ROAD_FIELDS = [
  ['spanRise', 'Span/rise factor'],
  ['material', 'Material factor'],
  ['jointing', 'Joint factor'],
  ['condition', 'Condition factor'],
] as const;

export const ROAD: readonly Measure[] = ROAD_FIELDS.map(([field, name]) => ({
  path: `road.${field}`,
  name,
  kind: 'plain',
  empty: field === 'spanRise' ? 'to be read' : 'taken as 1',
  read: ({ road }) => road?.[field] ?? null,
  set: (scheme, value) => setRoad(scheme, { [field]: value }),
  forget: (scheme) => setRoad(scheme, { [field]: undefined }),
}));
