/** A small plot: round figures along its axes, and where its points stand. */

export interface Axis {
  readonly from: number;
  readonly to: number;
  /** Where figures stand. */
  readonly ticks: readonly number[];
}

/** Parts of ten at which a person reads an axis easily. */
const STEPS = [1, 2, 5, 10] as const;

/** An axis over these values with about so many round figures; ends are round. Values that are not finite are passed over. */
export function axisOver(values: readonly number[], wanted: number, fromZero: boolean): Axis {
  const finite = values.filter(Number.isFinite);
  const least = Math.min(...finite, ...(fromZero ? [0] : []));
  const most = Math.max(...finite, ...(fromZero ? [0] : []));
  if (!(most > least))
    return { from: least - 1 || 0, to: least + 1 || 1, ticks: Number.isFinite(least) ? [least] : [] };
  const rough = (most - least) / wanted;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = (STEPS.find((part) => part * power >= rough) ?? 10) * power;
  const first = Math.floor(least / step + ROUNDING) * step;
  const count = Math.ceil((most - first) / step - ROUNDING);
  const ticks = Array.from({ length: count + 1 }, (_, i) => Number((first + i * step).toPrecision(12)));
  return { from: first, to: ticks.at(-1) ?? most, ticks };
}

const ROUNDING = 1e-9;

export const shareOf = ({ from, to }: Axis, value: number): number => (value - from) / (to - from);

/** Runs of points that follow one another without a gap; `null` is a gap. */
export function runs<T>(points: readonly (T | null)[]): T[][] {
  const found: T[][] = [];
  let open = false;
  for (const point of points) {
    if (point === null) open = false;
    else if (open) found.at(-1)!.push(point);
    else {
      found.push([point]);
      open = true;
    }
  }
  return found;
}
