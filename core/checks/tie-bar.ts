/** The bar of a tie: areas, stresses in shank and thread, extension, and what heat does to it. Units m, kN, MPa, K. */
import type { ResolvedTie, TieFactors } from '../job/tie-defaults.ts';
import { THREADS, type ThreadRow } from '../job/tables.ts';

export interface BarAreas {
  /** m², all bars together, corrosion taken off. */
  readonly gross: number;
  /** Null where the bar has no thread. */
  readonly thread: number | null;
}

const circle = (diameter: number): number => (Math.PI / 4) * Math.max(0, diameter) ** 2;

export function barAreas({ bar, thread, corrosion }: Pick<ResolvedTie, 'bar' | 'thread' | 'corrosion'>): BarAreas {
  const one =
    bar.shape === 'round'
      ? circle(bar.diameter - corrosion)
      : Math.max(0, bar.width - corrosion) * Math.max(0, bar.thickness - corrosion);
  return {
    gross: bar.count * one,
    thread: thread && bar.count * circle(Math.sqrt((4 * thread.stressArea) / Math.PI) - corrosion),
  };
}

/** What the metal may be stressed with under the force as it is, MPa. */
export interface AllowedStress {
  readonly gross: number;
  readonly thread: number;
  readonly shear: number;
  readonly bending: number;
}

/** EN 1993-1-8: 0.9 on the ultimate strength of a bolt in tension, 0.6 of it in shear. */
const IN_THREAD = 0.9;
const IN_SHEAR = 0.6;

/**
 * Partial: yield over its factor in the gross section, 0.9 of the ultimate strength over its factor in the thread
 * (EN 1993-1-1, EN 1993-1-8), each over the factor on the force. Global: the ultimate strength over one factor, and
 * never more than yield. A brittle metal has its ultimate strength alone.
 */
export function allowedStress({ material, factors }: Pick<ResolvedTie, 'material' | 'factors'>): AllowedStress {
  const { yield: yielding, ultimate } = material;
  if (factors.kind === 'global') {
    const tension = Math.min(ultimate / factors.safety, yielding ?? Infinity);
    return { gross: tension, thread: tension, shear: IN_SHEAR * tension, bending: tension };
  }
  const { forceFactor, yieldFactor, ultimateFactor } = factors;
  const breaking = ultimate / ultimateFactor / forceFactor;
  const gross = yielding === null ? breaking : Math.min(breaking, yielding / yieldFactor / forceFactor);
  return { gross, thread: IN_THREAD * breaking, shear: IN_SHEAR * breaking, bending: gross };
}

/** The factor on the force for what is not metal. */
export const forceFactor = (factors: TieFactors): number => (factors.kind === 'global' ? 1 : factors.forceFactor);

/** kN in m² as MPa. */
export const stressOf = (force: number, area: number): number | null => (area > 0 ? force / area / 1000 : null);

export interface BarMovement {
  /** Under the force over the pretension, m. */
  readonly extension: number;
  /** What heat takes from the force while the anchors keep their distance, kN. */
  readonly heatLoss: number;
  /** Whether heat takes the whole pretension. */
  readonly slack: boolean;
  /** How far the springings must part in the heat before the tie pulls, and before it holds the force, m. */
  readonly spreadToPull: number;
  readonly spreadToHold: number;
}

/** ΔL = F L / (E A); restrained heat E A α ΔT, free α L ΔT. Null where corrosion has left no bar. */
export function barMovement(tie: ResolvedTie, area: number, force: number): BarMovement | null {
  if (!(area > 0)) return null;
  const { material, length, warming, pretension } = tie;
  const stiffness = (material.modulus * 1000 * area) / length;
  const growth = material.expansion * warming * length;
  return {
    extension: Math.max(0, force - pretension) / stiffness,
    heatLoss: stiffness * growth,
    slack: warming > 0 && stiffness * growth >= pretension,
    spreadToPull: Math.max(0, growth - pretension / stiffness),
    spreadToHold: Math.max(0, growth + (force - pretension) / stiffness),
  };
}

/** Smallest coarse thread, and round bar of its diameter, that carries the force in as many bars; null when none does. */
export function smallestThread(tie: ResolvedTie, force: number): ThreadRow | null {
  const allowed = allowedStress(tie);
  const does = (thread: ThreadRow): boolean => {
    const bar = { shape: 'round', diameter: thread.diameter, count: tie.bar.count } as const;
    const areas = barAreas({ bar, thread, corrosion: tie.corrosion });
    const gross = stressOf(force, areas.gross) ?? Infinity;
    const inThread = stressOf(force, areas.thread ?? 0) ?? Infinity;
    return gross <= allowed.gross && inThread <= allowed.thread;
  };
  return THREADS.find(does) ?? null;
}
