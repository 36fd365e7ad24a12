/**
 * The data files of materials, metals, threads and grounds, with the source on every row. A job keeps the values that
 * were picked, so an old job does not change when a row does.
 */
import grounds from '../../assets/data/grounds.json' with { type: 'json' };
import masonry from '../../assets/data/masonry.json' with { type: 'json' };
import metals from '../../assets/data/metals.json' with { type: 'json' };
import plateBearings from '../../assets/data/plate-bearings.json' with { type: 'json' };
import threads from '../../assets/data/threads.json' with { type: 'json' };

interface Row {
  readonly name: string;
  readonly source: string;
}

export interface MetalRow extends Row {
  /** MPa; null for a brittle metal. */
  readonly yield: number | null;
  readonly ultimate: number;
  readonly modulus: number;
  /** 1/K */
  readonly expansion: number;
}

export interface ThreadRow extends Row {
  /** m and m². */
  readonly diameter: number;
  readonly pitch: number;
  readonly stressArea: number;
}

export interface GroundRow extends Row {
  /** kN/m², presumed, preliminary. */
  readonly bearing: number;
  readonly friction: number | null;
}

export interface MasonryRow extends Row {
  /** kN/m³ and MPa. */
  readonly unitWeight: number;
  readonly strength: number;
  readonly shear: number;
}

export interface PlateBearingRow extends Row {
  /** MPa */
  readonly allowable: number;
}

export const METALS: readonly MetalRow[] = metals;
/** Coarse threads, the thinnest first. */
export const THREADS: readonly ThreadRow[] = threads;
export const GROUNDS: readonly GroundRow[] = grounds;
export const MASONRY: readonly MasonryRow[] = masonry;
export const PLATE_BEARINGS: readonly PlateBearingRow[] = plateBearings;

export const THREAD_NAMES: readonly string[] = THREADS.map(({ name }) => name);

/** The row of that name, whatever its letters' case. */
export function rowNamed<T extends Row>(rows: readonly T[], name: string | undefined): T | undefined {
  const wanted = name?.trim().toLowerCase();
  return rows.find((row) => row.name.toLowerCase() === wanted);
}
