/** The anchor of one bar: pin in shear, plate on the masonry, plate in bending, the cone behind it. Units m, kN, MPa. */
import type { ResolvedTie } from '../job/tie-defaults.ts';
import type { AllowedStress } from './tie-bar.ts';

/** What is there against what may be; the limit is null where it is not known. */
export interface Against {
  readonly demand: number;
  readonly limit: number | null;
}

/** F / (m A) on the planes of the pin, MPa. */
export function pinShear({ pin }: ResolvedTie, allowed: AllowedStress, force: number): Against | null {
  if (pin === null) return null;
  const area = pin.planes * (Math.PI / 4) * pin.diameter ** 2;
  return { demand: force / area / 1000, limit: allowed.shear };
}

const bearingArea = (plate: NonNullable<ResolvedTie['plate']>): number =>
  Math.max(0, plate.width * plate.height - (Math.PI / 4) * plate.hole ** 2);

/** H / (plate − hole), MPa. Null where the hole leaves no plate. */
export function plateBearing({ plate }: ResolvedTie, force: number): Against | null {
  if (plate === null || bearingArea(plate) === 0) return null;
  return { demand: force / bearingArea(plate) / 1000, limit: plate.allowable };
}

/** Thickness needed, m: the plate hangs over the edge of its hole by c, M = q c² / 2 a width, t = √(6 M / f). */
export function plateBending({ plate }: ResolvedTie, allowed: AllowedStress, force: number): Against | null {
  if (plate === null || bearingArea(plate) === 0) return null;
  const pressure = force / bearingArea(plate);
  const overhang = (Math.max(plate.width, plate.height) - plate.hole) / 2;
  const moment = (pressure * overhang ** 2) / 2;
  return { demand: Math.sqrt((6 * moment) / (allowed.bending * 1000)), limit: plate.thickness };
}

/**
 * kN against the shear of a cone at 45° through the wall: its mean girth times the wall's thickness t. Round plate:
 * π t (t + D) f; here t (2 (width + height) + π t) f.
 */
export function wallCone({ plate }: ResolvedTie, force: number): Against | null {
  if (plate === null || plate.wall === null) return null;
  const { width, height, wall, shear } = plate;
  const area = wall * (2 * (width + height) + Math.PI * wall);
  return { demand: force, limit: shear === null ? null : area * shear * 1000 };
}
