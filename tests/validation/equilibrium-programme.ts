/**
 * The whole ring as one linear programme, for HiGHS: three equations of equilibrium for every block, and at every joint
 * a force square to it at the intrados end, another at the extrados end, and one along it. It shares nothing with the
 * core but the printed model (joints and block forces), so that an agreement is an agreement of two methods.
 *
 * Forces are scaled by the total of all loads and lengths by the mean length of the joints; moments are taken about the
 * middle of each block's left joint. Figures are then of order one, and HiGHS's own tolerances mean the same anywhere.
 */
import loadHighs, { type ModelData, type ModelStatusCode } from 'highs';
import type { Block, Joint, Point } from '../../core/assess/assessment.ts';

/** What an assessment prints of the ring. */
export interface PrintedModel {
  readonly joints: readonly Joint[];
  readonly blocks: readonly Block[];
}

export type Optimum =
  | { readonly kind: 'optimal'; readonly value: number }
  | { readonly kind: 'infeasible' }
  | { readonly kind: 'unbounded' };

const highs = await loadHighs();

const FREE = { lower: -highs.infinity, upper: highs.infinity };
const PUSH = { lower: 0, upper: highs.infinity };

/** The tightest that HiGHS takes; forces are of order one, so a thrust is good to about 1e-9 of the total load. */
const TOLERANCE = 1e-10;
const { optimal, infeasible, unbounded, unboundedOrInfeasible } = highs.constants.modelStatus;

interface Entry {
  readonly row: number;
  readonly value: number;
}

interface Column {
  readonly lower: number;
  readonly upper: number;
  readonly cost: number;
  readonly entries: readonly Entry[];
}

/**
 * The programme as HiGHS takes it, with the horizontal thrust at the left springing over the total load as its cost;
 * for benches, which time other ways of solving it.
 */
export function blockProgramme(model: PrintedModel): ModelData {
  const scale = scaleOf(model);
  return modelOf(
    jointColumns(model, scale, 1, (along) => along.x),
    loadVector(model, scale),
  );
}

/** Least (+1) or greatest (−1) horizontal thrust at the left springing, kN; every joint taking compression alone. */
export function extremeThrust(model: PrintedModel, sign: 1 | -1): Optimum {
  const scale = scaleOf(model);
  const columns = jointColumns(model, scale, 1, (along) => sign * along.x);
  const answer = solve(columns, loadVector(model, scale));
  return answer.kind === 'optimal' ? { kind: 'optimal', value: sign * answer.value * scale.force } : answer;
}

/**
 * The least pull, over the total load, that must be allowed at the ends of every joint, each shrunk to `share` about
 * its middle, before equilibrium is possible. Positive: no line of thrust fits. Negative: one fits with that in hand;
 * minus infinity where thrust without limit leaves as much in hand as one likes.
 */
export function leastPull(model: PrintedModel, share: number): number {
  const scale = scaleOf(model);
  const columns = jointColumns(model, scale, share, () => 0);
  // an end force is its push less the pull z that is allowed everywhere: n = push − z
  const rows = new Map<number, number>();
  columns.forEach(({ entries }, i) => {
    if (i % 3 === 2) return;
    for (const { row, value } of entries) rows.set(row, (rows.get(row) ?? 0) - value);
  });
  const entries = [...rows].map(([row, value]) => ({ row, value }));
  const answer = solve([...columns, { ...FREE, cost: 1, entries }], loadVector(model, scale));
  switch (answer.kind) {
    case 'optimal':
      return answer.value;
    case 'unbounded':
      return -Infinity;
    case 'infeasible':
      // enough pull balances anything unless no joint can carry a force at all
      throw new Error('no pull, however great, gives equilibrium');
  }
}

interface Scale {
  readonly force: number;
  readonly length: number;
}

function scaleOf({ joints, blocks }: PrintedModel): Scale {
  let force = 0;
  for (const { forces } of blocks) for (const { fx, fy } of forces) force += Math.hypot(fx, fy);
  const length = joints.reduce((sum, { intrados: i, extrados: e }) => sum + Math.hypot(e.x - i.x, e.y - i.y), 0);
  return { force: force > 0 ? force : 1, length: length / joints.length };
}

const middle = ({ intrados: i, extrados: e }: Joint): Point => ({ x: (i.x + e.x) / 2, y: (i.y + e.y) / 2 });

/** Three columns a joint: push at the intrados end, push at the extrados end, force along the joint outwards. */
function jointColumns(
  { joints }: PrintedModel,
  scale: Scale,
  share: number,
  cost: (direction: Point) => number,
): Column[] {
  const columns: Column[] = [];
  joints.forEach((joint, j) => {
    const { intrados, extrados } = joint;
    const length = Math.hypot(extrados.x - intrados.x, extrados.y - intrados.y);
    const along = { x: (extrados.x - intrados.x) / length, y: (extrados.y - intrados.y) / length };
    // the left part pushes the right part this way
    const square = { x: along.y, y: -along.x };
    const centre = middle(joint);
    const end = (sign: number): Point => ({
      x: centre.x + (sign * share * length * along.x) / 2,
      y: centre.y + (sign * share * length * along.y) / 2,
    });
    const add = (direction: Point, at: Point, bounds: { lower: number; upper: number }): void => {
      const entries: Entry[] = [];
      const push = (block: number, sign: number): void => {
        const about = middle(joints[block]!);
        const moment = ((at.x - about.x) * direction.y - (at.y - about.y) * direction.x) / scale.length;
        entries.push({ row: 3 * block, value: sign * direction.x });
        entries.push({ row: 3 * block + 1, value: sign * direction.y });
        entries.push({ row: 3 * block + 2, value: sign * moment });
      };
      if (j > 0) push(j - 1, -1);
      if (j < joints.length - 1) push(j, 1);
      columns.push({ ...bounds, cost: j === 0 ? cost(direction) : 0, entries });
    };
    add(square, end(-1), PUSH);
    add(square, end(1), PUSH);
    add(along, centre, FREE);
  });
  return columns;
}

/** What the joint forces must balance: three components a block. */
function loadVector({ joints, blocks }: PrintedModel, scale: Scale): Float64Array {
  const right = new Float64Array(3 * blocks.length);
  blocks.forEach(({ forces }, k) => {
    const about = middle(joints[k]!);
    for (const { x, y, fx, fy } of forces) {
      right[3 * k]! -= fx / scale.force;
      right[3 * k + 1]! -= fy / scale.force;
      right[3 * k + 2]! -= ((x - about.x) * fy - (y - about.y) * fx) / (scale.force * scale.length);
    }
  });
  return right;
}

function modelOf(columns: readonly Column[], right: Float64Array): ModelData {
  const count = columns.reduce((sum, { entries }) => sum + entries.length, 0);
  const starts = new Int32Array(columns.length + 1);
  const indices = new Int32Array(count);
  const values = new Float64Array(count);
  let at = 0;
  columns.forEach(({ entries }, i) => {
    for (const { row, value } of entries) {
      indices[at] = row;
      values[at++] = value;
    }
    starts[i + 1] = at;
  });
  return {
    numCols: columns.length,
    numRows: right.length,
    colCost: Float64Array.from(columns, ({ cost }) => cost),
    colLower: Float64Array.from(columns, ({ lower }) => lower),
    colUpper: Float64Array.from(columns, ({ upper }) => upper),
    rowLower: right,
    rowUpper: right,
    matrix: { format: 'csc', numRows: right.length, numCols: columns.length, starts, indices, values },
  };
}

function solve(columns: readonly Column[], right: Float64Array): Optimum {
  return highs.withModel(modelOf(columns, right), (model) => {
    model.options.set({
      output_flag: false,
      presolve: 'off',
      primal_feasibility_tolerance: TOLERANCE,
      dual_feasibility_tolerance: TOLERANCE,
    });
    model.run();
    return readOptimum(model.getModelStatus(), () => model.getObjectiveValue());
  });
}

function readOptimum(status: ModelStatusCode, value: () => number): Optimum {
  switch (status) {
    case optimal:
      return { kind: 'optimal', value: value() };
    case infeasible:
      return { kind: 'infeasible' };
    case unbounded:
    case unboundedOrInfeasible:
      return { kind: 'unbounded' };
    default:
      throw new Error(`HiGHS ended with status ${status}`);
  }
}
