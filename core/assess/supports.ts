/** The bodies that hold the arch, under the thrust of a state of the ring less what the ties hold. */
import type { Check } from '../checks/check.ts';
import type { SupportSide } from '../checks/support-depth.ts';
import { supportChecks, unaskedSupport } from '../checks/supports.ts';
import type { Point } from '../geometry/point.ts';
import type { ResolvedBody } from '../job/support-defaults.ts';
import type { State } from '../statics/line.ts';
import { baseOf } from '../statics/support-base.ts';
import { supportBody, type Body, type Push } from '../statics/support-body.ts';
import { thrustCapacity } from '../statics/support-capacity.ts';
import { enough, type EnoughAnswers } from '../statics/support-enough.ts';
import { crackedLine, wholeLine, type Bed, type SupportLine } from '../statics/support-line.ts';
import { pushAtSpringing } from '../statics/support-push.ts';
import { standTogether } from '../statics/support-rows.ts';
import { thrustRange, type ThrustAnswer } from '../statics/thrust.ts';
import type { BuiltScheme } from './build.ts';
import type { BedAnswer, SupportAnswer, SupportState } from './holding-answers.ts';
import { tiesTogether, type TiesTogether } from './ties.ts';

export interface SupportsTogether {
  readonly answers: readonly SupportAnswer[];
  readonly checks: readonly Check[];
  /** Share of the least thrust that the weaker body leaves to ties; null where both supports are rigid or nothing stands. */
  readonly leftOver: number | null;
}

/** Every body of the scheme; none where both supports are rigid. */
export function supportsTogether(
  built: BuiltScheme,
  answer: ThrustAnswer,
  ties: TiesTogether | null,
): SupportsTogether {
  const answers: SupportAnswer[] = [];
  const checks: Check[] = [];
  let leftOver: number | null = null;
  for (const side of SIDES) {
    const support = built.resolved.supports[side];
    if (support.kind === 'rigid') continue;
    const place = placeOf(built, side, support);
    const found = supportAnswer(place, answer, ties);
    answers.push(found);
    checks.push(
      ...(found.least === null
        ? [unaskedSupport(side, support.kind)]
        : supportChecks({
            support,
            answer: found,
            least: found.least,
            asked: built.resolved.asked,
            strength: built.resolved.masonry.strength,
          })),
    );
    if (found.least !== null && found.least.horizontal > 0) {
      const taken = Math.max(0, found.capacity.greatest ?? 0);
      leftOver = Math.max(leftOver ?? 0, 1 - Math.min(1, taken / found.least.horizontal));
    }
  }
  return { answers, checks, leftOver };
}

/** The body on one side under any state of the ring that fits; null where that side is rigid. Ties hold their share. */
export function supportUnder(built: BuiltScheme, side: SupportSide, state: State): SupportState | null {
  const support = built.resolved.supports[side];
  if (support.kind === 'rigid') return null;
  return stateOf(placeOf(built, side, support), state, tiesTogether(built, thrustRange(built.system)));
}

/** What would be enough on one side at the least thrust, less what ties hold; null where there is nothing to ask. */
export function supportEnough(built: BuiltScheme, side: SupportSide): EnoughAnswers | null {
  const support = built.resolved.supports[side];
  const answer = thrustRange(built.system);
  if (support.kind === 'rigid' || !answer.stands || answer.least === null) return null;
  const place = placeOf(built, side, support);
  const pushed = pushOf(place, answer.least.state, tiesTogether(built, answer));
  if (pushed === null) return null;
  return enough({ support, push: pushed.net, asked: built.resolved.asked, level: place.springing.y });
}

const SIDES = ['left', 'right'] as const;

interface Place {
  readonly built: BuiltScheme;
  readonly side: SupportSide;
  readonly support: ResolvedBody;
  readonly body: Body;
  /** End of the intrados: u = 0, z = 0. */
  readonly springing: Point;
  /** −1 on the left, where u runs to the left. */
  readonly outwards: 1 | -1;
}

function placeOf(built: BuiltScheme, side: SupportSide, support: ResolvedBody): Place {
  const { joints } = built.ring;
  const springing = joints[side === 'left' ? 0 : joints.length - 1]!.intrados;
  const outwards = side === 'left' ? -1 : 1;
  return { built, side, support, body: supportBody(support, springing.y), springing, outwards };
}

function supportAnswer(place: Place, answer: ThrustAnswer, ties: TiesTogether | null): SupportAnswer {
  const { side, support, body, built } = place;
  const common = { side, kind: support.kind };
  const nothing = {
    least: null,
    greatest: null,
    together: null,
    capacity: { least: null, greatest: null, whole: null },
  };
  if (!answer.stands || answer.least === null) return { ...common, ...nothing };
  const pushed = pushOf(place, answer.least.state, ties);
  if (pushed === null) return { ...common, ...nothing };
  const capacity = thrustCapacity(body, pushed.arch);
  const together = standTogether(built.system, [{ side, body }]);
  return {
    ...common,
    least: stateOf(place, answer.least.state, ties),
    greatest: answer.greatest === null ? null : stateOf(place, answer.greatest.state, ties),
    capacity: {
      least: finite(capacity.whole?.least),
      greatest: finite(capacity.cracked),
      whole: finite(capacity.whole?.greatest),
    },
    together: together && { least: together.least, greatest: together.greatest },
  };
}

const finite = (value: number | null | undefined): number | null =>
  value !== null && value !== undefined && Number.isFinite(value) ? value : null;

/** The push of the arch, and what is left of it when the ties have taken theirs; null where it crosses nowhere. */
function pushOf(
  { built, side, body, springing }: Place,
  state: State,
  ties: TiesTogether | null,
): { arch: Push; net: Push } | null {
  const arch = pushAtSpringing(built.system, built.joints, state, side, springing);
  if (arch === null) return null;
  const relief = Math.max(0, arch.horizontal) * (ties?.held ?? 0);
  if (relief === 0) return { arch, net: arch };
  const even = evenThrust(body, arch);
  return { arch, net: { ...arch, horizontal: Math.min(arch.horizontal, Math.max(even, arch.horizontal - relief)) } };
}

/** The thrust with which the resultant crosses the middle of the base; none at all where nothing presses on it. */
function evenThrust(body: Body, push: Push): number {
  const { slice, normal, eccentricity } = wholeLine(body, push).beds.at(-1)!;
  const lever = slice.bottom - push.z;
  return eccentricity === null || lever <= 0 ? -Infinity : push.horizontal - (eccentricity * normal) / lever;
}

function stateOf(place: Place, state: State, ties: TiesTogether | null): SupportState | null {
  const { body, support } = place;
  const pushed = pushOf(place, state, ties);
  if (pushed === null) return null;
  const { arch, net } = pushed;
  const whole = wholeLine(body, net);
  const cracked = crackedLine(body, net);
  const line = cracked.stands ? cracked : whole;
  const base = baseOf(body, net, line)!;
  const { friction } = support.ground;
  return {
    horizontal: arch.horizontal,
    vertical: arch.vertical,
    heldByTies: arch.horizontal - net.horizontal,
    stands: cracked.stands,
    standsWhole: whole.stands,
    line: [placed(place, net.u, net.z), ...linePoints(place, line)],
    crack: cracked.wedge > 0 ? crackPoints(place, cracked) : [],
    beds: line.beds.filter(({ slice }) => slice.isBed).map((bed) => bedAnswer(place, bed)),
    wedge: cracked.wedge,
    overturning: base.overturning,
    pressure: base.pressure,
    drive: base.drive,
    resistance: friction === null ? null : friction * base.normal + base.passive,
  };
}

const placed = ({ springing, outwards }: Place, u: number, z: number): Point => ({
  x: springing.x + outwards * u,
  y: springing.y - z,
});

const linePoints = (place: Place, { beds }: SupportLine): Point[] =>
  beds.flatMap(({ at, slice }) => (at === null ? [] : [placed(place, at, slice.bottom)]));

/** Along the open edge, bed by bed. */
function crackPoints(place: Place, { beds }: SupportLine): Point[] {
  return beds.flatMap(({ slice, compressed }) => {
    if (compressed === null) return [];
    const [from, to] = compressed;
    if (from > slice.front) return [placed(place, from, slice.bottom)];
    return to < slice.back ? [placed(place, to, slice.bottom)] : [];
  });
}

function bedAnswer(place: Place, bed: Bed): BedAnswer {
  const { slice, normal, shear, at, eccentricity, compressed, stress } = bed;
  const x = (u: number): number => placed(place, u, 0).x;
  return {
    course: slice.course,
    y: placed(place, 0, slice.bottom).y,
    front: x(slice.front),
    back: x(slice.back),
    normal,
    shear,
    x: at === null ? null : x(at),
    eccentricity,
    compressed: compressed && [x(compressed[0]), x(compressed[1])],
    stress,
  };
}
