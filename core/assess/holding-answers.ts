/** What the assessment says of the supports and ties. Units m, kN, kN/m², MPa; places in the axes of the arch. */
import type { SupportSide } from '../checks/support-depth.ts';
import type { Point } from '../geometry/point.ts';
import type { ResolvedBody } from '../job/support-defaults.ts';
import type { EnoughAnswers } from '../statics/support-enough.ts';

/** One bed joint of a body, the footing's underside last. */
export interface BedAnswer {
  /** From 0 at the springing; the footing is the last. */
  readonly course: number;
  readonly y: number;
  /** Front and back of the bed. */
  readonly front: number;
  readonly back: number;
  readonly normal: number;
  /** Along the bed, positive away from the opening. */
  readonly shear: number;
  /** Where the resultant crosses the bed; null where nothing presses on it. */
  readonly x: number | null;
  /** From the middle of the bed, positive away from the opening. */
  readonly eccentricity: number | null;
  /** From and to along x, the front end first; null where the resultant is outside the bed. */
  readonly compressed: readonly [number, number] | null;
  /** kN/m² at front and back. */
  readonly stress: readonly [number, number] | null;
}

/** A body under one thrust of the arch. */
export interface SupportState {
  /** Of the arch at this springing, kN. */
  readonly horizontal: number;
  readonly vertical: number;
  /** What ties take off it, kN. */
  readonly heldByTies: number;
  /** In compression alone, the wedge that cracks off left out. */
  readonly stands: boolean;
  /** The same with all masonry counted. */
  readonly standsWhole: boolean;
  /** From the springing down, the springing's own crossing first; with the wedge left out where it stands so. */
  readonly line: readonly Point[];
  /** Edge between what presses and what has cracked off, top down; empty where nothing has. */
  readonly crack: readonly Point[];
  readonly beds: readonly BedAnswer[];
  /** Masonry left out, kN. */
  readonly wedge: number;
  readonly overturning: number | null;
  /** Greatest pressure on the ground, kN/m². */
  readonly pressure: number | null;
  /** Along the base away from the opening, kN, and what could hold it by friction and earth; null when not known. */
  readonly drive: number;
  readonly resistance: number | null;
}

export interface SupportAnswer {
  readonly side: SupportSide;
  readonly kind: ResolvedBody['kind'];
  /** Null when the arch does not stand. */
  readonly least: SupportState | null;
  /** Null also where the thrust has no bound. */
  readonly greatest: SupportState | null;
  /** Thrust with which the body stands, the vertical load staying as it is at the least thrust. */
  readonly capacity: {
    readonly least: number | null;
    /** With the wedge left out. */
    readonly greatest: number | null;
    /** As one piece. */
    readonly whole: number | null;
  };
  /** Range of thrust at the left springing with which arch and this body stand as one piece; null when none. */
  readonly together: { readonly least: number | null; readonly greatest: number | null } | null;
  /** Only where it was asked for. */
  readonly enough?: EnoughAnswers;
}

export interface TieAnswer {
  readonly tie: string;
  readonly name: string;
  /** Of the force of all ties, by stiffness. */
  readonly share: number;
  /** If the supports give no help, kN; null where no line fits or there is no bound. */
  readonly least: number | null;
  readonly greatest: number | null;
  /** What is left for this tie when the supports take all they can, kN; null when they are rigid or unknown. */
  readonly withSupports: number | null;
  /** m², corrosion taken off. */
  readonly gross: number;
  readonly threadArea: number | null;
  /** MPa at the least force. */
  readonly stress: number | null;
  readonly threadStress: number | null;
  readonly extension: number | null;
  readonly heatLoss: number | null;
  readonly slack: boolean | null;
  readonly spreadToPull: number | null;
  readonly spreadToHold: number | null;
  /** Force that the weakest part known may carry, kN. */
  readonly capacity: number | null;
  /** Names of the smallest coarse threads for the least and the greatest force; null where none of the table does. */
  readonly smallest: { readonly least: string | null; readonly greatest: string | null };
}
