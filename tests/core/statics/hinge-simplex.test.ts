/** The hinge simplex as a small linear programme: against HiGHS, against its own certificates, and on ties. */
import fc from 'fast-check';
import loadHighs from 'highs';
import { describe, expect, test } from 'vitest';
import { minimise, type Rows } from '../../../core/statics/hinge-simplex.ts';

const highs = await loadHighs();

function rowsOf(list: readonly (readonly [...number[], number])[]): Rows {
  const unknowns = (list[0]?.length ?? 1) - 1;
  return {
    unknowns,
    count: list.length,
    a: Float64Array.from(list.flatMap((row) => row.slice(0, unknowns))),
    b: Float64Array.from(list, (row) => row[unknowns] ?? NaN),
  };
}

/** The least value by HiGHS, or why there is none. */
function byHighs({ unknowns, count, a, b }: Rows, c: readonly number[]): number | 'infeasible' | 'unbounded' {
  const free = new Float64Array(unknowns).fill(highs.infinity);
  return highs.withModel(
    {
      numCols: unknowns,
      numRows: count,
      colCost: Float64Array.from(c),
      colLower: free.map((value) => -value),
      colUpper: free,
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
    },
    (model) => {
      model.options.set({ output_flag: false, presolve: 'off', primal_feasibility_tolerance: 1e-10 });
      model.run();
      const { optimal, infeasible } = highs.constants.modelStatus;
      const status = model.getModelStatus();
      return status === optimal ? model.getObjectiveValue() : status === infeasible ? 'infeasible' : 'unbounded';
    },
  );
}

/** Small whole numbers make ties, parallel rows and repeated ones common. */
const whole = fc.integer({ min: -3, max: 3 });
const programme = fc.integer({ min: 3, max: 5 }).chain((unknowns) =>
  fc.record({
    rows: fc.array(
      fc
        .tuple(fc.array(whole, { minLength: unknowns, maxLength: unknowns }), whole)
        .filter(([row]) => row.some((v) => v !== 0)),
      { minLength: 1, maxLength: 25 },
    ),
    c: fc.array(whole, { minLength: unknowns, maxLength: unknowns }),
  }),
);

describe('any programme in three to five unknowns', () => {
  test('has the value that HiGHS finds, or the same want of one', () => {
    fc.assert(
      fc.property(programme, ({ rows: list, c }) => {
        const rows = rowsOf(list.map(([row, least]) => [...row, least]));
        const own = minimise(rows, c);
        const expected = byHighs(rows, c);
        if (own.kind === 'optimal') expect(own.value).toBeCloseTo(Number(expected), 7);
        else expect(own.kind).toBe(expected);
      }),
      { numRuns: 1500, seed: 12 },
    );
  });

  test('an optimum obeys every row, and its multipliers prove it', () => {
    fc.assert(
      fc.property(programme, ({ rows: list, c }) => {
        const rows = rowsOf(list.map(([row, least]) => [...row, least]));
        const answer = minimise(rows, c);
        if (answer.kind !== 'optimal') return;
        list.forEach(([row, least]) => {
          expect(row.reduce((sum, value, k) => sum + value * answer.s[k]!, 0)).toBeGreaterThan(least - 1e-9);
        });
        // Aᵀy = c with y ≥ 0, and y·b is the value
        c.forEach((cost, k) => {
          const sum = answer.basis.reduce((total, { row, y }) => total + y * list[row]![0][k]!, 0);
          expect(sum).toBeCloseTo(cost, 9);
        });
        expect(answer.basis.every(({ y }) => y >= 0)).toBe(true);
        expect(answer.basis.reduce((total, { row, y }) => total + y * list[row]![1], 0)).toBeCloseTo(answer.value, 8);
      }),
      { numRuns: 800, seed: 13 },
    );
  });

  test('rows that cannot hold together come with weights that say so', () => {
    let refused = 0;
    fc.assert(
      fc.property(programme, ({ rows: list, c }) => {
        const answer = minimise(rowsOf(list.map(([row, least]) => [...row, least])), c);
        if (answer.kind !== 'infeasible') return;
        refused++;
        const { certificate } = answer;
        expect(certificate.every(({ y }) => y > 0)).toBe(true);
        c.forEach((_, k) => {
          expect(certificate.reduce((sum, { row, y }) => sum + y * list[row]![0][k]!, 0)).toBeCloseTo(0, 9);
        });
        expect(certificate.reduce((sum, { row, y }) => sum + y * list[row]![1], 0)).toBeGreaterThan(1e-9);
      }),
      { numRuns: 800, seed: 14 },
    );
    expect(refused).toBeGreaterThan(100);
  });

  test('a start from any other rows does not change the value', () => {
    fc.assert(
      fc.property(programme, fc.array(fc.nat(24), { minLength: 5, maxLength: 5 }), ({ rows: list, c }, picked) => {
        const rows = rowsOf(list.map(([row, least]) => [...row, least]));
        const start = picked.slice(0, rows.unknowns).map((row) => ({ row, y: 1 }));
        const cold = minimise(rows, c);
        const warm = minimise(rows, c, start);
        expect(warm.kind).toBe(cold.kind);
        if (warm.kind === 'optimal' && cold.kind === 'optimal') expect(warm.value).toBeCloseTo(cold.value, 9);
      }),
      { numRuns: 800, seed: 15 },
    );
  });
});

describe('ties', () => {
  test('one row a thousand times over', () => {
    const corner = [
      [1, 0, 0, 1],
      [0, 1, 0, 2],
      [0, 0, 1, 3],
    ] as const;
    const rows = rowsOf(Array.from({ length: 3000 }, (_, i) => corner[i % 3]!));
    const answer = minimise(rows, [1, 1, 1]);
    expect(answer).toMatchObject({ kind: 'optimal', value: 6 });
  });

  test('a cone of a thousand rows through one point', () => {
    const rows = rowsOf(
      Array.from({ length: 1000 }, (_, i): [number, number, number, number] => {
        const angle = (2 * Math.PI * i) / 1000;
        return [Math.cos(angle), Math.sin(angle), 1, 0];
      }),
    );
    const answer = minimise(rows, [0, 0, 1]);
    expect(answer.kind).toBe('optimal');
    expect(answer.kind === 'optimal' && Math.abs(answer.value)).toBeLessThan(1e-12);
  });

  test('the same row from both sides', () => {
    const rows = rowsOf([
      [1, 2, 3, 4],
      [-1, -2, -3, -4],
      [1, 0, 0, 0],
      [0, 1, 0, 0],
      [0, 0, 1, 0],
    ]);
    expect(minimise(rows, [1, 1, 1])).toMatchObject({ kind: 'optimal' });
    const [value, expected] = [minimise(rows, [1, 1, 1]), byHighs(rows, [1, 1, 1])];
    expect(value.kind === 'optimal' && value.value).toBeCloseTo(Number(expected), 9);
  });
});
