/** What stands in for what a job does not say of its ties, each with its source. */
import type { Assumed } from './assumed.ts';
import type { Tie } from './schema.ts';
import { METALS, rowNamed, THREADS, type ThreadRow } from './tables.ts';

export interface ResolvedMetal {
  readonly name: string;
  /** MPa; null for a brittle metal. */
  readonly yield: number | null;
  readonly ultimate: number;
  readonly modulus: number;
  /** 1/K */
  readonly expansion: number;
  readonly source: string;
}

export type TieFactors =
  | { readonly kind: 'global'; readonly safety: number }
  | {
      readonly kind: 'partial';
      readonly forceFactor: number;
      readonly yieldFactor: number;
      readonly ultimateFactor: number;
    };

type BarForm<T> = T extends unknown ? Omit<T, 'count'> & { readonly count: number } : never;

/** Lengths in m, forces in kN, stresses in MPa, warming in K. */
export interface ResolvedTie {
  readonly id: string;
  readonly name: string;
  readonly level: number;
  readonly bar: BarForm<Tie['bar']>;
  readonly material: ResolvedMetal;
  /** Null where the bar is whole to its end. */
  readonly thread: ThreadRow | null;
  readonly age: 'existing' | 'new';
  readonly pretension: number;
  readonly warming: number;
  readonly length: number;
  readonly corrosion: number;
  readonly factors: TieFactors;
  readonly plate: {
    readonly width: number;
    readonly height: number;
    readonly thickness: number;
    readonly hole: number;
    readonly allowable: number | null;
    readonly wall: number | null;
    readonly shear: number | null;
  } | null;
  readonly pin: { readonly diameter: number; readonly planes: number } | null;
}

/** A permissible tension of 77 MPa for wrought iron of 234 MPa, as a handbook of about 1909 has it, is a factor of three. */
const GLOBAL_SAFETY = 3;
/** EN 1990 and EN 1993-1-1, from memory. */
const PARTIAL = { forceFactor: 1.35, yieldFactor: 1, ultimateFactor: 1.25 } as const;

/** @param between m from springing to springing over the ring, for a tie that does not say how long it is. */
export function resolveTies(ties: readonly Tie[], between: number, assumed: Assumed[]): ResolvedTie[] {
  return ties.map((tie, i) => resolveTie(tie, `ties[${i}]`, between, assumed));
}

function resolveTie(tie: Tie, path: string, between: number, assumed: Assumed[]): ResolvedTie {
  const age = tie.age ?? 'existing';
  if (tie.length === undefined) {
    assumed.push({
      field: `${path}.length`,
      value: between,
      because: 'No length between the anchors is given; the span with the ring on both sides is taken, so measure it.',
    });
  }
  const { plate, pin } = tie;
  return {
    id: tie.id,
    name: tie.name ?? tie.id,
    level: tie.level,
    bar: { ...tie.bar, count: tie.bar.count ?? 1 },
    material: resolveMetal(tie.material ?? {}, age, path, assumed),
    thread: THREADS.find(({ name }) => name === tie.thread) ?? null,
    age,
    pretension: tie.pretension ?? 0,
    warming: tie.warming ?? 0,
    length: tie.length ?? between,
    corrosion: tie.corrosion ?? 0,
    factors: resolveFactors(tie.factors, age, path, assumed),
    plate:
      plate === undefined
        ? null
        : {
            width: plate.width,
            height: plate.height,
            thickness: plate.thickness,
            hole: plate.hole ?? 0,
            allowable: plate.allowable ?? null,
            wall: plate.wall ?? null,
            shear: plate.shear ?? null,
          },
    pin: pin === undefined ? null : { diameter: pin.diameter, planes: pin.planes ?? 1 },
  };
}

function resolveMetal(
  material: NonNullable<Tie['material']>,
  age: 'existing' | 'new',
  path: string,
  assumed: Assumed[],
): ResolvedMetal {
  const usual = age === 'existing' ? 'wrought iron' : 'steel S275';
  const row = rowNamed(METALS, material.name) ?? rowNamed(METALS, usual)!;
  const named = row.name.toLowerCase() === material.name?.trim().toLowerCase();
  const metal: ResolvedMetal = {
    name: material.name ?? row.name,
    yield: material.yield === undefined ? row.yield : material.yield,
    ultimate: material.ultimate ?? row.ultimate,
    modulus: material.modulus ?? row.modulus,
    expansion: material.expansion ?? row.expansion,
    source: row.source,
  };
  const taken = (['yield', 'ultimate', 'modulus', 'expansion'] as const).filter(
    (field) => material[field] === undefined,
  );
  if (taken.length > 0) {
    assumed.push({
      field: `${path}.material`,
      value: row.name,
      because: named
        ? `Not every figure of the metal is given; those of ${row.name} are taken (${row.source}).`
        : `${material.name === undefined ? 'No metal is named' : 'The metal is not one of the table'}; the figures not given are those of ${row.name} (${row.source}).`,
    });
  }
  return metal;
}

function resolveFactors(
  factors: Tie['factors'],
  age: 'existing' | 'new',
  path: string,
  assumed: Assumed[],
): TieFactors {
  if (factors === undefined) {
    const existing = age === 'existing';
    assumed.push({
      field: `${path}.factors`,
      value: existing ? 'global' : 'partial',
      because: existing
        ? 'No factors are given; one factor of 3 on the ultimate strength is taken (common practice 3 to 10; a handbook of c. 1909 permits 77 MPa in wrought iron of 234).'
        : 'No factors are given; 1.35 on the force, 1.0 on yield and 1.25 on the ultimate strength are taken (EN 1990 and EN 1993-1-1, from memory; typical, verify).',
    });
    return existing ? { kind: 'global', safety: GLOBAL_SAFETY } : { kind: 'partial', ...PARTIAL };
  }
  return factors.kind === 'global'
    ? { kind: 'global', safety: factors.safety ?? GLOBAL_SAFETY }
    : {
        kind: 'partial',
        forceFactor: factors.forceFactor ?? PARTIAL.forceFactor,
        yieldFactor: factors.yieldFactor ?? PARTIAL.yieldFactor,
        ultimateFactor: factors.ultimateFactor ?? PARTIAL.ultimateFactor,
      };
}
