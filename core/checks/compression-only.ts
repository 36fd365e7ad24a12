import { figure, safetyFigure } from '../quantity/figures.ts';
import { jointsInWords, type Check } from './check.ts';

/** What the check needs to know of the ring. */
export interface CompressionState {
  readonly stands: boolean;
  /** Length of the joint where the line needs most of it, m: the ring's thickness, or what is left and added of it. */
  readonly thickness: number;
  /** Whether joints bear on other than the ring's own thickness: less lost mortar, or on through backing. */
  readonly altered: boolean;
  /** Smallest share of every joint, about its middle, in which a line fits; null when no thickness would do. */
  readonly share: number | null;
  /** Whether that share is only approached as the thrust grows without limit. */
  readonly endlessThrust: boolean;
  /** The joints at which that line touches the shrunken ring, or turns when the ring falls. */
  readonly joints: readonly number[];
  /** Geometric safety that the assessor asks for. */
  readonly askedSafety: number;
}

const SOURCE =
  'Safe theorem of limit analysis applied to masonry: J. Heyman, The stone skeleton, Int. J. Solids Structures 2 (1966) 249–279 (from memory)';

/** Does a line of thrust fit in the ring, and in how much of it? Demand and limit are ring thicknesses in metres. */
export function compressionOnly(state: CompressionState): Check {
  const { stands, thickness, share, joints, askedSafety } = state;
  const demand = share === null ? null : share * thickness;
  const safety = share === null || share === 0 ? null : 1 / share;
  // a line down the very middle leaves the whole ring in hand
  const enough = share === 0 || (safety !== null && safety >= askedSafety);
  return {
    id: 'ring.compression-only',
    title: 'Ring in compression alone',
    status: !stands ? 'fails' : enough ? 'holds' : 'narrow',
    demand,
    limit: thickness,
    utilisation: share,
    unit: 'm',
    where: jointsInWords(joints),
    joints,
    because: reason(state, demand, safety),
    source: SOURCE,
  };
}

const ringOf = ({ thickness, altered }: CompressionState): string =>
  altered
    ? `joints that bear on ${figure(thickness)} m, less lost mortar and with backing that counts`
    : `the ring of ${figure(thickness)} m`;

/** m; what lies below cannot be measured on stone. */
const LEAST_MIDDLE = 0.001;

function reason(state: CompressionState, demand: number | null, safety: number | null): string {
  const { stands, askedSafety } = state;
  if (!stands) {
    const wanting =
      demand === null
        ? 'no ring of this shape would hold one, however thick'
        : `it would have to be about ${figure(demand)} m thick, about its present middle, to hold one`;
    return `No line of thrust fits within ${ringOf(state)}; ${wanting}. The loads can turn the ring about the hinges named.`;
  }
  const supports = state.endlessThrust
    ? ' The line comes this near the middle only as the thrust grows, so it asks what holds the arch to take any thrust.'
    : '';
  if (demand === null || safety === null) return `A line of thrust runs through the middle of every joint.${supports}`;
  const against =
    safety >= askedSafety
      ? `at least the ${figure(askedSafety)} asked for`
      : `less than the ${figure(askedSafety)} asked for`;
  const middle = demand < LEAST_MIDDLE ? 'a middle strip of less than a millimetre' : `the middle ${figure(demand)} m`;
  return `A line of thrust fits within ${middle} of ${ringOf(state)}: geometric safety ${safetyFigure(safety)}, ${against}.${supports}`;
}
