/**
 * The assessment document (`skewback.assessment`, version 1): the open interface that the command line prints, the
 * findings read and the sheets draw from.
 *
 * Units: m, kN, kN·m, kN/m³; forces for the whole breadth. Axes: x right, y up, origin midway between the intrados
 * springings. Thrust is positive in compression. No field is ever NaN or infinite: what cannot be computed is null
 * and a check says why. Fields marked optional belong to questions that were not asked of this scheme.
 */
import type { Check, Status } from '../checks/check.ts';
import type { CrackReading } from '../checks/crack-reading.ts';
import type { ProportionRule } from '../checks/proportion-rules.ts';
import type { RoadAxle } from '../checks/road-axle.ts';
import type { Point } from '../geometry/point.ts';
import type { Joint } from '../geometry/stations.ts';
import type { Assumed } from '../job/assumed.ts';
import type { Block, BlockForce } from '../loading/forces.ts';
import type { CrackPattern } from '../statics/crack-pattern.ts';
import type { CrownBalance } from '../statics/crown-balance.ts';
import type { Hinge, Side } from '../statics/hinge.ts';
import type { TurningHinge } from '../statics/thrust.ts';
import type { SupportAnswer, TieAnswer } from './holding-answers.ts';

export type { SupportAnswer, TieAnswer };
export type { Assumed, Block, BlockForce, Check, CrownBalance, Hinge, Joint, Point, Side, Status };

/** Where the resultant crosses each joint, joint 0 first; null coordinates where it runs parallel to the joint. */
export type LinePoint = { readonly x: number; readonly y: number } | { readonly x: null; readonly y: null };

export interface ThrustState {
  /** Horizontal component at the left springing, kN. Null where no finite value exists. */
  readonly horizontal: number | null;
  readonly line: readonly LinePoint[];
  readonly hinges: readonly Hinge[];
}

export interface Reaction {
  /** Horizontal thrust on the support, positive in compression, kN. */
  readonly horizontal: number;
  /** Vertical load on the support, positive downwards, kN. */
  readonly vertical: number;
  /** Where it crosses the springing joint, m; null where it runs parallel to that joint. */
  readonly x: number | null;
  readonly y: number | null;
}

export interface Thrust {
  readonly stands: boolean;
  /** Null when no line fits. */
  readonly least: ThrustState | null;
  readonly greatest: ThrustState | null;
  /** Least and greatest horizontal when joints may also slide and crush; null when no line obeys those too. */
  readonly usable?: { readonly least: number | null; readonly greatest: number | null } | null;
}

export interface LoadFactor {
  readonly load: string;
  /** Null: no finite limit, or none to be had because the arch does not stand (a check says which). */
  readonly factor: number | null;
  readonly hinges: readonly Hinge[];
}

/** How the arch falls when no line fits: relative rotations at hinges under which the loads do positive work. */
export interface Mechanism {
  /** Four hinges or fewer, left to right; `rotation` is relative and positive, the sense follows from `side`. */
  readonly hinges: readonly TurningHinge[];
  /** Work of the loads for the rotations given, kN·m; positive is the proof that no line fits. */
  readonly work: number;
}

export interface Proof {
  /** Largest unbalanced force or moment of any block from the printed forces, over the total weight (and span). */
  readonly equilibriumResidual: number | null;
  /** Least thrust as the force of a line of thrust. */
  readonly static: number | null;
  /** Least thrust from the virtual work of a mechanism. */
  readonly kinematic: number | null;
  /** |static − kinematic| over the greater of their size and the total weight. */
  readonly gap: number | null;
}

/** The ring under one combination of factored loads. Forces in kN. */
export interface CombinationAnswer {
  readonly combination: string;
  readonly name: string;
  readonly stands: boolean;
  readonly least: number | null;
  readonly greatest: number | null;
  readonly geometricSafety: number | null;
  /** How far the variable loads, factored, can grow together; null without a finite limit or where nothing stands. */
  readonly variableFactor: number | null;
  readonly hinges: readonly Hinge[];
}

/** How far the springings can still part before the ring falls. */
export interface SpreadAnswer {
  /** m; null when it still stands at the furthest spread tried. */
  readonly collapse: number | null;
  readonly furthest: number;
  /** Thrust against spread, from the present place to the last that stands, kN and m. */
  readonly curve: readonly { readonly spread: number; readonly horizontal: number }[];
}

/** The least factor of an axle load as it crosses. */
export interface AxleAnswer {
  readonly load: string;
  /** Null where no place has a limit. */
  readonly worst: { readonly x: number; readonly factor: number; readonly hinges: readonly Hinge[] } | null;
  readonly places: number;
}

export interface SchemeAssessment {
  readonly arch: string;
  readonly scheme: string;
  readonly name: string;
  readonly assumed: readonly Assumed[];
  readonly model: { readonly joints: readonly Joint[]; readonly blocks: readonly Block[] };
  readonly crown: CrownBalance | null;
  readonly thrust: Thrust;
  /** At the least thrust; null when no line fits. */
  readonly reactions: { readonly left: Reaction; readonly right: Reaction } | null;
  readonly geometricSafety: number | null;
  readonly thinnestRing?: number | null;
  readonly loadFactors?: readonly LoadFactor[];
  readonly swayCapacity?: number | null;
  /** Only when the arch does not stand. */
  readonly mechanism?: Mechanism | null;
  readonly checks: readonly Check[];
  /** Bodies at the least and greatest thrust; rigid supports are not among them. */
  readonly supports?: readonly SupportAnswer[];
  readonly ties?: readonly TieAnswer[];
  readonly proof: Proof;
  readonly combinations?: readonly CombinationAnswer[];
  /** How the ring opens under each common movement; `opens` compares the openings of one movement with each other. */
  readonly movements?: readonly CrackPattern[];
  /** Only where cracks are marked. */
  readonly cracks?: CrackReading;
  readonly spread?: SpreadAnswer | null;
  readonly axles?: readonly AxleAnswer[];
  /** Comparisons, never checks. */
  readonly proportions?: readonly ProportionRule[];
  readonly road?: RoadAxle | null;
}

export interface Assessment {
  readonly format: 'skewback.assessment';
  readonly version: 1;
  readonly title: string;
  readonly schemes: readonly SchemeAssessment[];
}
