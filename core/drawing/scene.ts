/**
 * The one model of a drawing: plain data that feeds screen, bounds and every export, so that they cannot disagree.
 *
 * A scene is made for one scale. Its coordinates are metres of the arch (or paper millimetres, for what stands on the
 * sheet itself), x to the right and y up; lettering and pens are always paper millimetres. `millimetresPerUnit` says
 * how large one unit of the coordinates is on paper: 50 at 1:20 in metres, 1 for the sheet itself.
 *
 * Everything is a path of lines and true arcs or a line of text. There is nothing else to teach an export.
 */
import type { Edge } from '../geometry/curve.ts';
import type { Point } from '../geometry/point.ts';
import { Extent, pathPoints, textCorners, type Box } from './extent.ts';
import type { Role } from './style.ts';
import type { Face } from './text.ts';

/** Layers by what they hold, from the back of the drawing to the front. */
export const LAYERS = [
  'frame',
  'above',
  'backing',
  'voussoirs',
  'thrust-band',
  'courses',
  'joints',
  'lost-mortar',
  'as-it-was',
  'other-scheme',
  'supports',
  'springing',
  'mechanism',
  'thrust-least',
  'thrust-greatest',
  'thrust-chosen',
  'openings',
  'hinges',
  'cracks',
  'loads',
  'stress',
  'curve',
  'axes',
  'reactions',
  'dimensions',
  'notes',
  'legend',
  'figures',
  'cautions',
  'title',
] as const;
export type LayerName = (typeof LAYERS)[number];

/** What an item stands for, so that the screen can point at it, highlight it and let its figure be typed. */
export type About =
  | { readonly kind: 'joint'; readonly joint: number }
  | { readonly kind: 'block'; readonly block: number }
  | { readonly kind: 'load'; readonly load: string }
  | { readonly kind: 'support'; readonly side: 'left' | 'right' }
  | { readonly kind: 'thrust'; readonly state: 'least' | 'greatest' | 'chosen' }
  | { readonly kind: 'crack'; readonly crack: string }
  /** A field of the scheme by its path, as in `profile.span`. */
  | { readonly kind: 'field'; readonly path: string };

interface Item {
  readonly role: Role;
  readonly about?: About | undefined;
}

export interface PathItem extends Item {
  readonly kind: 'path';
  readonly start: Point;
  readonly edges: readonly Edge[];
  /** A closed path is filled as its role says. */
  readonly closed: boolean;
}

/** Lettering of ISO 3098, height of capitals in mm. */
export type Lettering = 1.8 | 2.5 | 3.5 | 5 | 7;
export type Align = 'start' | 'middle' | 'end';

export interface TextItem extends Item {
  readonly kind: 'text';
  /** One plain line: no control characters. */
  readonly text: string;
  /** On the baseline, at its start, middle or end. */
  readonly at: Point;
  readonly align: Align;
  readonly height: Lettering;
  readonly face: Face;
  /** Radians anticlockwise from the horizontal. */
  readonly angle: number;
}

export type SceneItem = PathItem | TextItem;

export interface Layer {
  readonly name: LayerName;
  readonly items: readonly SceneItem[];
}

/** What a numbered mark on the drawing stands for. */
export interface KeyEntry {
  readonly mark: string;
  readonly meaning: string;
}

export interface Scene {
  readonly title: string;
  readonly description: string;
  readonly millimetresPerUnit: number;
  /** In the order of `LAYERS`; empty ones are left out. */
  readonly layers: readonly Layer[];
  /** Round everything drawn, lettering included; null when nothing is. */
  readonly bounds: Box | null;
  /** Explains marks that stand in for longer lettering; empty where everything is lettered in place. */
  readonly key: readonly KeyEntry[];
}

/** Gathers items by layer. Kept apart from `Scene` so that a scene, once made, does not change. */
export type Items = Map<LayerName, SceneItem[]>;

export function addItems(items: Items, layer: LayerName, ...added: readonly SceneItem[]): void {
  const list = items.get(layer);
  if (list === undefined) items.set(layer, [...added]);
  else for (const item of added) list.push(item);
}

type SceneHead = Pick<Scene, 'title' | 'description' | 'millimetresPerUnit'>;

export function makeScene(
  head: SceneHead,
  items: Items,
  key: readonly KeyEntry[] = [],
  hide: readonly LayerName[] = [],
): Scene {
  const layers = LAYERS.flatMap((name) => {
    const list = items.get(name) ?? [];
    return list.length === 0 || hide.includes(name) ? [] : [{ name, items: list }];
  });
  const extent = new Extent();
  for (const { items: drawn } of layers) {
    for (const item of drawn) for (const point of itemPoints(item, head.millimetresPerUnit)) extent.add(point);
  }
  return { ...head, layers, key, bounds: extent.box() };
}

/** Points whose box is the item's box. */
export function itemPoints(item: SceneItem, millimetresPerUnit: number): readonly Point[] {
  return item.kind === 'path' ? pathPoints(item) : textCorners(item, millimetresPerUnit);
}
