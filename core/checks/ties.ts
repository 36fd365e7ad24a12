/** Checks of a tie at the force that it must hold if the supports give no help. */
import type { ResolvedTie } from '../job/tie-defaults.ts';
import { figure } from '../quantity/figures.ts';
import type { Check } from './check.ts';
import { pinShear, plateBearing, plateBending, wallCone, type Against } from './tie-anchor.ts';
import { allowedStress, barAreas, forceFactor, stressOf, type BarMovement } from './tie-bar.ts';

export interface TieFacts {
  readonly tie: ResolvedTie;
  /** kN in this tie; null where no line fits, or without bound. */
  readonly least: number | null;
  readonly greatest: number | null;
  /** Both supports rigid: the tie is judged as if they gave no help. */
  readonly rigid: boolean;
  /** Null where no bar or no force is there. */
  readonly moved: BarMovement | null;
}

type Part = 'gross' | 'thread' | 'pin' | 'plate-bearing' | 'plate-bending' | 'cone';

interface PartCheck {
  readonly part: Part;
  readonly title: string;
  readonly unit: string;
  readonly source: string;
  readonly what: string;
  /** Whether the demand grows with the square root of the force. */
  readonly isRoot?: true;
  readonly against: (force: number) => Against | null;
}

/** Parts in the order of the force from bar to wall, at a force in one bar or the whole tie, kN. */
function partsOf(tie: ResolvedTie): PartCheck[] {
  const allowed = allowedStress(tie);
  const areas = barAreas(tie);
  const { count } = tie.bar;
  const anchored = 'each bar on a plate and pin of its own';
  return [
    {
      part: 'gross',
      title: 'Tie bar in tension',
      unit: 'MPa',
      what: 'in the bar',
      source: `Force over area after corrosion; ${tie.material.name}: ${tie.material.source}`,
      against: (force) => ({ demand: stressOf(force, areas.gross) ?? NO_METAL, limit: allowed.gross }),
    },
    {
      part: 'thread',
      title: 'Tie at its thread',
      unit: 'MPa',
      what: 'on the stress area of the thread',
      source:
        'Stress area π/4 (d − 0.9382 p)² of ISO 898-1; 0.9 fu As / γM2 of EN 1993-1-8 with partial factors (from memory; typical, verify)',
      against: (force) =>
        areas.thread === null ? null : { demand: stressOf(force, areas.thread) ?? NO_METAL, limit: allowed.thread },
    },
    {
      part: 'pin',
      title: 'Pin of the tie in shear',
      unit: 'MPa',
      what: `in the pin, ${anchored}`,
      source:
        'F/(m A) against 0.6 of the ultimate strength over its factor, EN 1993-1-8 (from memory; typical, verify)',
      against: (force) => pinShear(tie, allowed, force / count),
    },
    {
      part: 'plate-bearing',
      title: 'Anchor plate on the masonry',
      unit: 'MPa',
      what: `under the plate, ${anchored}`,
      source: "Force over plate less hole; the assessor's own value for the masonry",
      against: (force) => plateBearing(tie, (force / count) * forceFactor(tie.factors)),
    },
    {
      part: 'plate-bending',
      title: 'Anchor plate in bending',
      unit: 'm',
      what: `of plate, ${anchored}`,
      isRoot: true,
      source: 'M = q c²/2 a width over the overhang c beyond the hole, t ≥ √(6 M/f); standard statics',
      against: (force) => plateBending(tie, allowed, force / count),
    },
    {
      part: 'cone',
      title: 'Cone through the wall behind the plate',
      unit: 'kN',
      what: `on the cone, ${anchored}`,
      source: 'Cone at 45°, mean girth by wall thickness; π t (t + D) f for a round plate',
      against: (force) => wallCone(tie, (force / count) * forceFactor(tie.factors)),
    },
  ];
}

/** MPa of a bar that corrosion has eaten: no metal carries it, and no figure is infinite. */
const NO_METAL = 1e6;

/** kN that the weakest part with a known limit may carry. */
export function tieCapacity(tie: ResolvedTie): number {
  const each = partsOf(tie).map(({ against, isRoot }) => {
    const at = against(1);
    if (at === null || at.limit === null || at.demand <= 0) return Infinity;
    const ratio = at.limit / at.demand;
    return isRoot ? ratio * ratio : ratio;
  });
  return Math.min(...each);
}

export function tieChecks(facts: TieFacts): Check[] {
  const checks = partsOf(facts.tie).flatMap((part) => partCheck(part, facts));
  return [...checks, ...heatCheck(facts)];
}

function partCheck({ part, title, unit, what, source, against }: PartCheck, facts: TieFacts): Check[] {
  const { tie, least, greatest, rigid } = facts;
  const common = { id: `tie.${tie.id}.${part}`, title, unit, where: tie.name, joints: [], source } as const;
  const most = greatest === null ? null : against(Math.max(greatest, tie.pretension));
  const found = least === null ? null : against(Math.max(least, tie.pretension));
  if (least === null) {
    if (against(1) === null) return [];
    const because = 'No line of thrust fits in the ring with this tie, so there is no force to hold.';
    return [{ ...common, status: 'unknown', demand: null, limit: null, utilisation: null, because }];
  }
  if (found === null) return [];
  const { demand, limit } = found;
  const force = figure(Math.max(least, tie.pretension));
  if (limit === null) {
    const because = `${figure(demand)} ${unit} ${what} at ${force} kN; what it may be is not known. Enter it to have this checked.`;
    return [{ ...common, status: 'unknown', demand, limit, utilisation: null, because }];
  }
  const isShort = demand > limit;
  const isShortOfMost = !isShort && most !== null && most.limit !== null && most.demand > most.limit;
  const help = rigid
    ? 'The supports are taken as rigid; the tie is judged as if they gave no help.'
    : 'The tie is judged as if the supports gave no help.';
  const more =
    isShortOfMost && greatest !== null ? ` At the greatest thrust, ${figure(greatest)} kN, it would not do.` : '';
  return [
    {
      ...common,
      status: isShort ? 'fails' : 'holds',
      demand,
      limit,
      utilisation: limit > 0 ? demand / limit : null,
      because: `${figure(demand)} ${unit} ${what} at ${force} kN, the least thrust or the pretension; ${figure(limit)} ${unit} ${part === 'plate-bending' ? 'is there' : 'is allowed'}.${more} ${help}`,
    },
  ];
}

/** Slackening is no failure by itself: it says how far the springings part before the tie pulls again. */
function heatCheck({ tie, moved }: TieFacts): Check[] {
  if (moved === null || tie.warming === 0) return [];
  const { heatLoss, slack, spreadToPull, spreadToHold } = moved;
  const millimetres = (length: number): string => `${figure(length * 1000, 2)} mm`;
  return [
    {
      id: `tie.${tie.id}.slack`,
      title: 'Tie in the heat',
      status: slack ? 'narrow' : 'holds',
      demand: heatLoss,
      limit: tie.pretension,
      utilisation: tie.pretension > 0 ? heatLoss / tie.pretension : null,
      unit: 'kN',
      where: tie.name,
      joints: [],
      because: slack
        ? `Slack: ${figure(tie.warming)} K more would take ${figure(heatLoss)} kN, and ${figure(tie.pretension)} kN of pretension are there. The springings must part by ${millimetres(spreadToPull)} before it pulls, and by ${millimetres(spreadToHold)} before it holds the least thrust.`
        : `${figure(tie.warming)} K more take ${figure(heatLoss)} kN of ${figure(tie.pretension)} kN of pretension; it stays tight.`,
      source: 'E A α ΔT with the anchors held, α L ΔT with them free; handbook',
    },
  ];
}
