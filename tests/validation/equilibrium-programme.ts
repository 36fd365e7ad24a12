/**
 * The whole ring as one linear programme, for HiGHS: three equations of equilibrium for every block, and at every joint
 * a force square to it at the intrados end, another at the extrados end, and one along it. It shares nothing with the
 * core but the printed model (joints and block forces), so that an agreement is an agreement of two methods.
 *
 * Forces are scaled by the total of all loads and lengths by the mean length of the joints; moments are taken about the
 * middle of each block's left joint. Figures are then of order one, and HiGHS's own tolerances mean the same anywhere.
 */
import loadHighs, { type ModelData } from 'highs';
import type { Block, BlockForce, Joint, Point } from '../../core/assess/assessment.ts';

/** What an assessment prints of the ring. */
export interface PrintedModel {
  readonly joints: readonly Joint[];
  readonly blocks: readonly Block[];
}

export type Optimum =
  | { readonly kind: 'optimal'; readonly value: number; readonly unknowns: Float64Array }
  | { readonly kind: 'infeasible' }
  | { readonly kind: 'unbounded' };

const highs = await loadHighs();

/**
 * The tightest that HiGHS takes; forces are of order one, so a thrust is good to about 1e-9 of the total load. On very
 * thin rings it may lose its way so, and is asked again in another manner, at last with a little more room.
 */
const within = (tolerance: number) =>
  ({ presolve: 'off', primal_feasibility_tolerance: tolerance, dual_feasibility_tolerance: tolerance }) as const;
const WAYS = [within(1e-10), { ...within(1e-10), presolve: 'on' }, { ...within(1e-9), simplex_strategy: 4 }] as const;
const { optimal, infeasible, unbounded, unboundedOrInfeasible } = highs.constants.modelStatus;

/** Unknowns of one joint: columns 3j, 3j + 1 and 3j + 2. */
export const INTRADOS_PUSH = 0;
export const EXTRADOS_PUSH = 1;
export const SHEAR = 2;

interface Column {
  readonly lower: number;
  cost: number;
  readonly entries: { readonly row: number; readonly value: number }[];
}

/** Coefficients by column. */
export type Terms = readonly (readonly [column: number, coefficient: number])[];

export class EquilibriumProgramme {
  /** kN and m in one unit of the programme. */
  readonly force: number;
  readonly length: number;
  private readonly columns: Column[] = [];
  private readonly lower: number[] = [];
  private readonly upper: number[] = [];

  /** @param share each joint is shrunk to this share of itself, about its middle. */
  constructor(
    private readonly model: PrintedModel,
    share = 1,
  ) {
    const { joints, blocks } = model;
    const force = blocks.reduce(
      (sum, { forces }) => sum + forces.reduce((part, { fx, fy }) => part + Math.hypot(fx, fy), 0),
      0,
    );
    this.force = force > 0 ? force : 1;
    this.length = joints.reduce((sum, joint) => sum + lengthOf(joint), 0) / joints.length;
    this.addJointColumns(share);
    for (const value of this.sumOf(blocks.map(({ forces }) => forces))) this.addRow(-value, -value);
  }

  /** Another unknown, with its part in the equilibrium of the blocks; without one it is free of them. */
  addUnknown(lower: number, equilibrium: ArrayLike<number> = []): number {
    const entries = Array.from(equilibrium, (value, row) => ({ row, value })).filter(({ value }) => value !== 0);
    this.columns.push({ lower, cost: 0, entries });
    return this.columns.length - 1;
  }

  /** An unknown not less than nought that multiplies a set of forces, block by block, besides those of the model. */
  addMultiplier(set: readonly (readonly BlockForce[])[]): number {
    return this.addUnknown(0, this.sumOf(set));
  }

  /** The unknowns are bound to Σ coefficient · unknown ≥ least. */
  addLimit(terms: Terms, least: number): void {
    const row = this.addRow(least, highs.infinity);
    for (const [column, value] of terms) this.columns[column]?.entries.push({ row, value });
  }

  minimise(cost: Terms): Optimum {
    for (const column of this.columns) column.cost = 0;
    for (const [column, value] of cost) {
      const to = this.columns[column];
      if (to) to.cost += value;
    }
    const data = this.data();
    for (const way of WAYS) {
      const answer = solvedBy(data, way);
      if (answer !== null) return answer;
    }
    throw new Error('HiGHS found no answer in any way');
  }

  /** The horizontal force of the left abutment on the ring, over the total load. */
  get horizontal(): Terms {
    const { along, square } = directionsOf(this.model.joints[0]!);
    return [
      [INTRADOS_PUSH, square.x],
      [EXTRADOS_PUSH, square.x],
      [SHEAR, along.x],
    ];
  }

  /** The programme as HiGHS takes it. */
  data(): ModelData {
    const { columns } = this;
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
      numRows: this.lower.length,
      colCost: Float64Array.from(columns, ({ cost }) => cost),
      colLower: Float64Array.from(columns, ({ lower }) => lower),
      colUpper: new Float64Array(columns.length).fill(highs.infinity),
      rowLower: Float64Array.from(this.lower),
      rowUpper: Float64Array.from(this.upper),
      matrix: { format: 'csc', numRows: this.lower.length, numCols: columns.length, starts, indices, values },
    };
  }

  private addRow(lower: number, upper: number): number {
    this.lower.push(lower);
    return this.upper.push(upper) - 1;
  }

  private addJointColumns(share: number): void {
    const { joints } = this.model;
    joints.forEach((joint, j) => {
      const { along, square } = directionsOf(joint);
      const centre = middle(joint);
      const reach = (share * lengthOf(joint)) / 2;
      const end = (sign: number): Point => ({
        x: centre.x + sign * reach * along.x,
        y: centre.y + sign * reach * along.y,
      });
      const add = (direction: Point, at: Point, lower: number): void => {
        const column: Column = { lower, cost: 0, entries: [] };
        const push = (block: number, sign: number): void => {
          const about = middle(joints[block]!);
          const moment = ((at.x - about.x) * direction.y - (at.y - about.y) * direction.x) / this.length;
          column.entries.push({ row: 3 * block, value: sign * direction.x });
          column.entries.push({ row: 3 * block + 1, value: sign * direction.y });
          column.entries.push({ row: 3 * block + 2, value: sign * moment });
        };
        if (j > 0) push(j - 1, -1);
        if (j < joints.length - 1) push(j, 1);
        this.columns.push(column);
      };
      add(square, end(-1), 0);
      add(square, end(1), 0);
      add(along, centre, -highs.infinity);
    });
  }

  /** Three components a block, scaled. */
  private sumOf(set: readonly (readonly BlockForce[])[]): Float64Array {
    const { joints } = this.model;
    const sum = new Float64Array(3 * set.length);
    set.forEach((forces, k) => {
      const about = middle(joints[k]!);
      for (const { x, y, fx, fy } of forces) {
        sum[3 * k]! += fx / this.force;
        sum[3 * k + 1]! += fy / this.force;
        sum[3 * k + 2]! += ((x - about.x) * fy - (y - about.y) * fx) / (this.force * this.length);
      }
    });
    return sum;
  }
}

/** Least (+1) or greatest (−1) horizontal thrust at the left springing, kN; every joint taking compression alone. */
export function extremeThrust(model: PrintedModel, sign: 1 | -1): Optimum {
  const programme = new EquilibriumProgramme(model);
  return inKilonewtons(programme, programme.minimise(times(sign, programme.horizontal)), sign);
}

/**
 * The least pull, over the total load, that must be allowed at the ends of every joint, each shrunk to `share` about
 * its middle, before equilibrium is possible. Positive: no line of thrust fits. Negative: one fits with that in hand;
 * minus infinity where thrust without limit leaves as much in hand as one likes.
 */
export function leastPull(model: PrintedModel, share: number): number {
  const programme = new EquilibriumProgramme(model, share);
  // an end force is its push less the pull z that is allowed everywhere: n = push − z
  const equilibrium = new Float64Array(3 * model.blocks.length);
  const { starts, indices, values } = programme.data().matrix;
  for (let column = 0; column < 3 * model.joints.length; column++) {
    if (column % 3 === SHEAR) continue;
    for (let at = Number(starts[column]); at < Number(starts[column + 1]); at++) {
      equilibrium[Number(indices[at])]! -= Number(values[at]);
    }
  }
  const pull = programme.addUnknown(-highs.infinity, equilibrium);
  return leastOf(programme.minimise([[pull, 1]]));
}

export function leastOf(answer: Optimum): number {
  switch (answer.kind) {
    case 'optimal':
      return answer.value;
    case 'unbounded':
      return -Infinity;
    case 'infeasible':
      return Infinity;
  }
}

export const times = (factor: number, terms: Terms): Terms =>
  terms.map(([column, value]): [number, number] => [column, factor * value]);

/** A thrust found with its sign turned, back in kN. */
export const inKilonewtons = (programme: EquilibriumProgramme, answer: Optimum, sign: 1 | -1): Optimum =>
  answer.kind === 'optimal' ? { ...answer, value: sign * answer.value * programme.force } : answer;

const lengthOf = ({ intrados: i, extrados: e }: Joint): number => Math.hypot(e.x - i.x, e.y - i.y);
const middle = ({ intrados: i, extrados: e }: Joint): Point => ({ x: (i.x + e.x) / 2, y: (i.y + e.y) / 2 });

/** Along the joint outwards, and square to it as the left part pushes the right part. */
function directionsOf(joint: Joint): { along: Point; square: Point } {
  const { intrados: i, extrados: e } = joint;
  const t = lengthOf(joint);
  const along = { x: (e.x - i.x) / t, y: (e.y - i.y) / t };
  return { along, square: { x: along.y, y: -along.x } };
}

/** The answer, or null where HiGHS gives up in this way. */
function solvedBy(data: ModelData, way: (typeof WAYS)[number]): Optimum | null {
  return highs.withModel(data, (model): Optimum | null => {
    model.options.set({ output_flag: false, ...way });
    try {
      model.run();
    } catch {
      return null;
    }
    switch (model.getModelStatus()) {
      case optimal:
        return { kind: 'optimal', value: model.getObjectiveValue(), unknowns: model.getSolution().colValue };
      case infeasible:
        return { kind: 'infeasible' };
      case unbounded:
      case unboundedOrInfeasible:
        return { kind: 'unbounded' };
      default:
        return null;
    }
  });
}
