/**
 * Where the names of loads go, before anything is drawn. Strips have their names on their bars where there is room
 * between the poles; every other load flies a flag from a pole over its arrow, outwards from the middle of the arch.
 * Poles and flags cannot meet: going inwards, a flag hangs above the tops of all the poles that it would cross. Where
 * that would climb too high, numbers take the place of names, and a key explains them.
 */
import type { ResolvedLoad } from '../job/defaults.ts';
import type { Draught } from './draught.ts';
import { entered } from './entered.ts';
import { cutToWidth, plainText, textWidth } from './text.ts';

export type StripLoad = Extract<ResolvedLoad, { kind: 'strip' }>;

/** Height of capitals, paper mm. */
export const LETTERS = 2.5;
const LONGEST_NAME = 60;
/** Names go no higher than this many flags over one another; numbers may. */
const MOST_TIERS_OF_NAMES = 6;
const MOST_TIERS = 12;
/** Loads beyond these are too many for a drawing: the heaviest are drawn. */
const MOST_LOADS = 40;
const MOST_ROWS = 5;

export interface PlacedLoad {
  readonly load: ResolvedLoad;
  /** Row of a strip, from the arch upwards; 0 for a point load. */
  readonly row: number;
  readonly label: string;
  /** Where the label begins on the strip's bar, m; null when it flies from a pole. */
  readonly onBar: number | null;
  /** Where the pole stands, m. */
  readonly pole: number;
  /** 1 for a flag that flies to the right, −1 to the left. */
  readonly outwards: 1 | -1;
  /** Flags below this one, from 0; null when it found no room and has a pole only. */
  readonly tier: number | null;
}

export interface LoadPlan {
  readonly placed: readonly PlacedLoad[];
  /** Whether numbers stand in for names. */
  readonly numbered: boolean;
  /** Loads that are not drawn. */
  readonly leftOut: number;
}

export function planLoads(draught: Draught): LoadPlan {
  const { loads } = draught.resolved;
  const drawn = inRows(heaviest(loads), draught.mm(2));
  const named = labelled(draught, drawn, labelOf);
  const highest = Math.max(0, ...named.map(({ tier }) => tier ?? 0));
  const numbered = highest >= MOST_TIERS_OF_NAMES;
  const placed = numbered ? labelled(draught, drawn, (load) => String(loads.indexOf(load) + 1)) : named;
  const fitting = placed.map((load) =>
    load.tier !== null && load.tier >= MOST_TIERS ? { ...load, tier: null } : load,
  );
  return { placed: fitting, numbered, leftOut: loads.length - drawn.length };
}

/** Name and amount, as in `beam end: 12 kN`. */
export function labelOf(load: ResolvedLoad): string {
  const amount = load.kind === 'strip' ? load.intensity : load.force;
  const text = `${entered(Math.abs(amount))} ${load.kind === 'strip' ? 'kN/m²' : 'kN'}${amount < 0 ? ' upwards' : ''}`;
  const name = cutToWidth(plainText(load.name), LONGEST_NAME, LETTERS);
  return name === '' ? text : `${name}: ${text}`;
}

function heaviest(loads: readonly ResolvedLoad[]): readonly ResolvedLoad[] {
  if (loads.length <= MOST_LOADS) return loads;
  const size = (load: ResolvedLoad): number =>
    Math.abs(load.kind === 'strip' ? load.intensity * (load.to - load.from) : load.force);
  const chosen = new Set([...loads].sort((a, b) => size(b) - size(a)).slice(0, MOST_LOADS));
  return loads.filter((load) => chosen.has(load));
}

interface Row {
  readonly load: ResolvedLoad;
  readonly row: number;
}

/** Strips that overlap go into different rows, in the order in which they are given. */
function inRows(loads: readonly ResolvedLoad[], gap: number): Row[] {
  const strips: { load: StripLoad; row: number }[] = [];
  return loads.flatMap((load): Row[] => {
    if (load.kind !== 'strip') return [{ load, row: 0 }];
    const clashes = strips.filter(({ load: other }) => load.from < other.to + gap && other.from < load.to + gap);
    let row = 0;
    while (clashes.some((other) => other.row === row)) row++;
    if (row >= MOST_ROWS) return [];
    strips.push({ load, row });
    return [{ load, row }];
  });
}

function labelled(draught: Draught, rows: readonly Row[], textOf: (load: ResolvedLoad) => string): PlacedLoad[] {
  const { mm, sky } = draught;
  const middle = (sky.left.x + sky.right.x) / 2;
  const poles = rows.map(({ load }) => poleOf(load, middle));
  const placed = rows.map(({ load, row }, i): PlacedLoad => {
    const label = textOf(load);
    const pole = poles[i]!;
    const onBar = load.kind === 'strip' ? roomOnBar(load, mm(textWidth(label, LETTERS) + 2), poles) : null;
    return {
      load,
      row,
      label,
      onBar: onBar === null ? null : onBar + mm(1),
      pole,
      outwards: pole < middle ? -1 : 1,
      tier: null,
    };
  });
  return [...hung(draught, placed, -1), ...hung(draught, placed, 1), ...placed.filter(({ onBar }) => onBar !== null)];
}

/** Over a point load, at the outer end of a strip. */
function poleOf(load: ResolvedLoad, middle: number): number {
  if (load.kind !== 'strip') return load.x;
  return (load.from + load.to) / 2 < middle ? load.from : load.to;
}

/** The start of a stretch of the bar between poles that is `width` long. */
function roomOnBar(load: StripLoad, width: number, poles: readonly number[]): number | null {
  const between = poles.filter((x) => x > load.from && x < load.to).sort((a, b) => a - b);
  const edges = [load.from, ...between, load.to];
  return edges.find((start, i) => i + 1 < edges.length && edges[i + 1]! - start >= width) ?? null;
}

function hung({ mm }: Draught, placed: readonly PlacedLoad[], outwards: 1 | -1): PlacedLoad[] {
  const flags: (PlacedLoad & { tier: number })[] = [];
  const own = placed.filter((load) => load.onBar === null && load.outwards === outwards);
  for (const flag of own.sort((a, b) => outwards * (b.pole - a.pole))) {
    const reach = mm(textWidth(flag.label, LETTERS) + 3);
    const crossed = flags.filter(({ pole }) => outwards * (pole - flag.pole) < reach);
    flags.push({ ...flag, tier: crossed.reduce((most, { tier }) => Math.max(most, tier + 1), 0) });
  }
  return flags;
}
