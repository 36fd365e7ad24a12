/**
 * HiGHS at the same two questions, least and greatest thrust: at its best, a model of three unknowns kept alive with
 * only its bounds changed; and built anew from typed arrays, as a drag must, which moves every joint.
 */
import loadHighs, { type ModelData } from 'highs';
import { EquilibriumProgramme, type PrintedModel } from '../validation/equilibrium-programme.ts';
import type { Rows } from '../../core/statics/hinge-simplex.ts';

const highs = await loadHighs();
const { optimal, unbounded } = highs.constants.modelStatus;

/** Least and greatest of the first unknown; null where there is no bound. */
export type Range = readonly [number | null, number | null];

export interface PersistentRival {
  /** Solves for other loads on the same ring: only the right-hand sides differ. */
  readonly range: (limits: Float64Array) => Range;
  readonly dispose: () => void;
}

export function persistentRival(rows: Rows): PersistentRival {
  const model = highs.createModel(modelOf(rows));
  model.options.set({ output_flag: false });
  const all = { kind: 'range', from: 0, to: rows.count - 1 } as const;
  const none = new Float64Array(rows.count).fill(highs.infinity);
  return {
    range: (limits) => {
      model.changeRowsBounds(all, limits, none);
      return bothEnds(model);
    },
    dispose: () => model.dispose(),
  };
}

export const rivalBuiltAnew = (rows: Rows): Range => solvedAnew(modelOf(rows), [0], [1]);

/** The least of one cost over rows built anew; null where there is none. */
export function leastBuiltAnew(rows: Rows, cost: readonly number[]): number | null {
  return highs.withModel({ ...modelOf(rows), colCost: Float64Array.from(cost) }, (model) => {
    model.options.set({ output_flag: false });
    model.run();
    return model.getModelStatus() === optimal ? model.getObjectiveValue() : null;
  });
}

/** The same two questions of the whole block programme. */
export function blockRivalBuiltAnew(model: PrintedModel): Range {
  const programme = new EquilibriumProgramme(model);
  const { horizontal } = programme;
  return solvedAnew(
    programme.data(),
    horizontal.map(([column]) => column),
    horizontal.map(([, cost]) => cost),
  );
}

function solvedAnew(data: ModelData, columns: readonly number[], costs: readonly number[]): Range {
  return highs.withModel(data, (model) => {
    model.options.set({ output_flag: false });
    return bothEnds(model, columns, costs);
  });
}

/** Rows of one kind and then of another. */
export function joined(first: Rows, second: Rows): Rows {
  return {
    unknowns: first.unknowns,
    count: first.count + second.count,
    a: Float64Array.from([...first.a, ...second.a]),
    b: Float64Array.from([...first.b, ...second.b]),
  };
}

type Model = Pick<
  ReturnType<typeof highs.createModel>,
  'changeColCost' | 'run' | 'getModelStatus' | 'getObjectiveValue'
>;

function bothEnds(model: Model, columns: readonly number[] = [0], costs: readonly number[] = [1]): Range {
  const end = (sign: 1 | -1): number | null => {
    columns.forEach((column, i) => model.changeColCost(column, sign * (costs[i] ?? 0)));
    model.run();
    const status = model.getModelStatus();
    if (status === unbounded) return null;
    if (status !== optimal) throw new Error(`HiGHS ended with status ${status}`);
    return sign * model.getObjectiveValue();
  };
  return [end(1), end(-1)];
}

function modelOf({ count, a, b, unknowns }: Rows): ModelData {
  return {
    numCols: unknowns,
    numRows: count,
    colCost: new Float64Array(unknowns),
    colLower: new Float64Array(unknowns).fill(-highs.infinity),
    colUpper: new Float64Array(unknowns).fill(highs.infinity),
    rowLower: b,
    rowUpper: new Float64Array(count).fill(highs.infinity),
    matrix: {
      format: 'csr',
      numRows: count,
      numCols: unknowns,
      starts: Int32Array.from({ length: count + 1 }, (_, i) => i * unknowns),
      indices: Int32Array.from({ length: count * unknowns }, (_, i) => i % unknowns),
      values: a,
    },
  };
}
