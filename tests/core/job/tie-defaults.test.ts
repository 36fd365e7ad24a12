import { describe, expect, it } from 'vitest';
import type { Assumed } from '../../../core/job/assumed.ts';
import type { Tie } from '../../../core/job/schema.ts';
import { resolveTies } from '../../../core/job/tie-defaults.ts';

const tie: Tie = { id: 't1', level: 0, bar: { shape: 'flat', width: 0.05, thickness: 0.01 }, length: 4 };
const factors = { kind: 'global', safety: 4 } as const;

function resolved(draft: Partial<Tie>) {
  const assumed: Assumed[] = [];
  const [filled] = resolveTies([{ ...tie, factors, ...draft }], 5, assumed);
  return { filled: filled!, assumed };
}

describe('the metal of a tie', () => {
  it('without a name is wrought iron where it is old and S275 where it is new, and says so', () => {
    expect(resolved({}).filled.material).toMatchObject({ name: 'wrought iron', yield: 159, ultimate: 234 });
    expect(resolved({ age: 'new' }).filled.material).toMatchObject({ name: 'steel S275', yield: 275 });
    expect(resolved({}).assumed[0]!.because).toMatch(/^No metal is named; .* wrought iron/);
  });

  it('picked by name keeps the figures that the assessor gives instead', () => {
    const { filled, assumed } = resolved({ material: { name: 'Wrought iron', yield: 180 } });
    expect(filled.material).toMatchObject({ yield: 180, ultimate: 234, modulus: 193_000 });
    expect(assumed[0]!.because).toMatch(/^Not every figure of the metal is given/);
  });

  it('given in full is nobody’s guess', () => {
    const material = { name: 'iron of the mill', yield: 170, ultimate: 260, modulus: 190_000, expansion: 0.000012 };
    expect(resolved({ material }).assumed).toEqual([]);
  });
});
