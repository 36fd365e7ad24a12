/** What the foot of a body asks of the ground: bearing, sliding, and turning over about its toe. */
import { earthForce, type Body, type Push, type Slice } from './support-body.ts';
import type { Bed, SupportLine } from './support-line.ts';

export interface BaseState {
  readonly bed: Bed;
  /** Greatest pressure under the base, kN/m²; null where the resultant is outside it. */
  readonly pressure: number | null;
  /** Moment that resists over moment that overturns, about the toe nearer to falling; null where nothing overturns. */
  readonly overturning: number | null;
  /** kN along the base away from the opening; negative into it. */
  readonly drive: number;
  /** kN down on the base. */
  readonly normal: number;
  /** kN of earth that can be called upon where the base slides into it. */
  readonly passive: number;
}

/** Null where the line ends before the base. */
export function baseOf(body: Body, push: Push, line: SupportLine): BaseState | null {
  const bed = line.beds[body.slices.length - 1];
  if (bed === undefined) return null;
  const { slice, normal, shear, stress } = bed;
  return {
    bed,
    pressure: stress === null ? null : Math.max(...stress),
    overturning: overturning(body, push, bed),
    drive: shear,
    normal,
    passive: shear > 0 ? passiveBeyondActive(body, slice) : 0,
  };
}

/** What is there beyond the active pressure, which is counted already; nothing where passive earth is left out. */
function passiveBeyondActive({ earth }: Body, { bottom }: Slice): number {
  const passive = earth?.passive ?? null;
  return earth === null || passive === null ? 0 : earthForce(earth, Math.max(0, passive - earth.active), bottom).force;
}

function overturning(body: Body, push: Push, { slice, normal, at }: Bed): number | null {
  if (at === null) return null;
  const { front, back, bottom } = slice;
  // forces above the base that act away from the opening turn the body about its back, the others about its front
  const levers = [
    { push: push.horizontal, lever: bottom - push.z },
    ...body.horizontal.filter(({ z }) => z <= bottom).map(({ push: force, z }) => ({ push: force, lever: bottom - z })),
  ];
  const moments = levers.map(({ push: force, lever }) => force * lever);
  if (body.earth !== null) moments.push(-earthForce(body.earth, body.earth.active, bottom).moment);
  const outwards = moments.reduce((sum, moment) => sum + Math.max(0, moment), 0);
  const inwards = moments.reduce((sum, moment) => sum + Math.max(0, -moment), 0);
  // what resists is what is left about the toe once the overturning moment is given back
  const factors = [
    outwards > 0 ? (normal * (back - at) + outwards) / outwards : Infinity,
    inwards > 0 ? (normal * (at - front) + inwards) / inwards : Infinity,
  ];
  const least = Math.min(...factors);
  return Number.isFinite(least) ? least : null;
}
