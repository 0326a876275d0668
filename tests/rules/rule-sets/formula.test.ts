import { describe, expect, it } from 'vitest';
import { computeFormula } from '#rules/engine/compute-formula';
import { viewOf } from '#rules/rule-sets/edition-view';
import { type Formula, readFormula } from '#rules/rule-sets/formula';
import { parseRuleSet } from '#rules/rule-sets/schema';
import { anEdition, aRule, aRuleSet } from '#tests/builders/a-rule-set';

const view = viewOf(anEdition());

function formulaOf(expression: string): Formula {
  const result = readFormula(expression, view);
  if (!result.ok) throw new Error(result.detail);
  return result.formula;
}

function resultOf(expression: string, values: Record<string, number> = {}) {
  return computeFormula(formulaOf(expression).expression, new Map(Object.entries(values)));
}

describe('a formula over trade symbols', () => {
  it.each([
    // Expected values by hand, from the usual precedence of signs.
    ['A^2 - B', { A: 3, B: 2 }, 7],
    ['A - B^2', { A: 3, B: 2 }, -1],
    ['-A^2', { A: 3 }, -9],
    ['(-A)^2', { A: 3 }, 9],
    ['A^-1', { A: 4 }, 0.25],
    ['2^A^2', { A: 3 }, 512],
    ['A - B - C', { A: 9, B: 4, C: 3 }, 2],
    ['A/B/C', { A: 24, B: 4, C: 3 }, 2],
    ['A/B*C', { A: 24, B: 4, C: 3 }, 18],
    ['A - -B', { A: 1, B: 2 }, 3],
    ['+A', { A: 1 }, 1],
    ['2*(A + (B - C)/2)', { A: 1, B: 5, C: 1 }, 6],
    ['max(A, B) - min(A, B, C)', { A: 1, B: 5, C: -1 }, 6],
    ['abs(A - B)', { A: 1, B: 5 }, 4],
    ['sqrt(A)', { A: 2.25 }, 1.5],
    ['log10(A)', { A: 1000 }, 3],
    ['ln(exp(A))', { A: 2 }, 2],
    ['1.5e1*A', { A: 2 }, 30],
    ['A·B − C', { A: 2, B: 3, C: 1 }, 5],
  ] as const)('%s with %o is %d', (expression, values, expected) => {
    expect(resultOf(expression, values)).toEqual({ ok: true, value: expected });
  });

  it('counts in decimals: 2.651 − 2.648 is 0.003, and a third three times is one', () => {
    expect(resultOf('Gse - Gsb', { Gse: 2.651, Gsb: 2.648 })).toEqual({ ok: true, value: 0.003 });
    expect(resultOf('A/3*3', { A: 1 })).toEqual({ ok: true, value: 1 });
  });

  it('keeps what comes from a root or a logarithm to 12 significant digits', () => {
    // √3 = 1.732050807568877…, log10 3 = 0.477121254719662…
    expect(resultOf('sqrt(A)', { A: 3 })).toEqual({ ok: true, value: 1.73205080757 });
    expect(resultOf('log10(A)', { A: 3 })).toEqual({ ok: true, value: 0.47712125472 });
    expect(resultOf('A^0.5', { A: 3 })).toEqual({ ok: true, value: 1.73205080757 });
  });

  it.each([
    ['A/B', { A: 1, B: 0 }, 'divides by zero'],
    ['A/(B - C)', { A: 1, B: 2, C: 2 }, 'divides by zero'],
    ['0*(A/B)', { A: 1, B: 0 }, 'divides by zero'],
    ['A^-1', { A: 0 }, 'divides by zero'],
    ['A^B', { A: 0, B: 0 }, 'zero to the power of zero'],
    ['A^0.5', { A: -1 }, 'power of a negative number'],
    ['sqrt(A)', { A: -1 }, 'root of a negative number'],
    ['ln(A)', { A: 0 }, 'logarithm'],
    ['log10(A)', { A: -1 }, 'logarithm'],
    ['10^(A*1000)', { A: 1 }, 'without bounds'],
    ['A + B', { A: 1 }, 'B has no value'],
    ['A + B', { A: 1, B: Number.NaN }, 'B has no value'],
  ] as const)('%s with %o has no value', (expression, values, reason) => {
    const result = resultOf(expression, values);
    expect(result).toMatchObject({ ok: false });
    expect(result.ok ? '' : result.reason).toContain(reason);
  });

  it('knows symbols with commas and signs in them, and a sieve behind a symbol', () => {
    const { symbols, text } = formulaOf('(P0.6 - P0.075)/(P2.36 - P0.075) + 0*Va,field + 0*G*/sinδ');
    expect(symbols.map(({ symbol, quantity, sieve }) => [symbol, quantity, sieve])).toEqual([
      ['P0.6', 'percent-passing', 0.6],
      ['P0.075', 'percent-passing', 0.075],
      ['P2.36', 'percent-passing', 2.36],
      ['Va,field', 'in-place-air-voids', null],
      ['G*/sinδ', 'rutting-parameter', null],
    ]);
    expect(text).toBe('(P0.6 − P0.075)/(P2.36 − P0.075) + 0·Va,field + 0·G*/sinδ');
  });

  it('takes the longest symbol that stands there as a whole', () => {
    expect(formulaOf('S1/S').symbols.map(({ symbol }) => symbol)).toEqual(['S1', 'S']);
    expect(formulaOf('VMA - Va').symbols.map(({ symbol }) => symbol)).toEqual(['VMA', 'Va']);
  });

  it.each([
    ['Gse - Gxx', 'the symbol Gxx is not known'],
    ['Gse - Ps', 'the symbol Ps is not known'],
    ['Gse -', 'unexpected end of expression'],
    ['(Gse', 'parenthesis ) expected'],
    ['', 'the formula is empty'],
    ['   ', 'the formula is empty'],
    ['2 + 3', 'names no quantity'],
    ['2 Gse', 'side by side without a sign'],
    ['(Gse)(Gsb)', 'side by side without a sign'],
    ['1/2 Gse', 'side by side without a sign'],
    ['Gse(2)', 'Gse is not a function'],
    ['sin(Gse)', 'sin is not a function'],
    ['log(Gse)', 'log is not a function'],
    ['max(Gse)', 'max is given 1 value'],
    ['sqrt(Gse, Gsb)', 'sqrt is given 2 values'],
    ['sqrt - Gse', 'the function sqrt is given nothing'],
    ['Gse%', 'the sign %'],
    ['Gse!', 'the sign !'],
    ['Gse > Gsb', 'the sign >'],
    ['Gse ? 1 : 2', 'a condition'],
    ['[Gse, 2]', 'a list'],
    ['Gse; Gsb', 'more than one formula'],
    ['Gse = 2', 'an assignment'],
    ['{a: Gse}', 'the symbol a is not known'],
    ['Gse[1]', 'an index'],
    ['1:Gse', 'a range'],
    ['P200', 'P200 names a sieve of 200 mm'],
    ['P0.07 - 1', 'P0.07 names a sieve of 0.07 mm'],
  ])('refuses "%s": %s', (expression, detail) => {
    const result = readFormula(expression, view);
    expect(result.ok ? 'read' : result.detail).toContain(detail);
  });
});

describe('a rule set with a formula', () => {
  const problemsOf = (measure: object, extra: object = {}) => {
    const rule = aRule({
      id: 'gse-over-gsb',
      measure: { kind: 'formula', ...measure } as never,
      limit: { min: 0 },
    });
    const parsed = parseRuleSet(aRuleSet({ rules: [rule], ...extra }));
    return parsed.ok ? [] : parsed.problems;
  };

  it('is refused with the rule and the symbol that is not known', () => {
    expect(problemsOf({ expression: 'Gse - Gxx' })).toEqual([
      {
        pointer: '/rules/0/measure/expression',
        detail: 'Rule gse-over-gsb: in the formula "Gse - Gxx", the symbol Gxx is not known.',
        fix: 'Use a trade symbol of the registry, such as Gmm, or declare a quantity with this symbol.',
      },
    ]);
  });

  it("reads symbols of the edition's own quantities", () => {
    const quantities = [{ id: 'filler-demand', symbol: 'Fd', label: 'filler demand', unit: '%' }];
    expect(problemsOf({ expression: 'Fd/Pbe' }, { quantities })).toEqual([]);
  });

  it('is refused where a symbol stands for a quantity of its own and one of the registry', () => {
    const quantities = [{ id: 'filler-demand', symbol: 'Gse', label: 'filler demand', unit: '%' }];
    const [problem] = problemsOf({ expression: 'Gse' }, { quantities });
    expect(problem?.detail).toContain('stands for filler-demand and effective-specific-gravity-aggregate');
  });

  it('is refused where a symbol measured by sieve names none', () => {
    const [problem] = problemsOf({ expression: 'P/Pbe' });
    expect(problem?.detail).toContain('P does not say at which sieve');
    expect(problemsOf({ expression: 'P/Pbe', at: { sieve: 0.075 } })).toEqual([]);
  });

  it('is refused where its unit is not known', () => {
    expect(problemsOf({ expression: 'Gse', unit: 'furlongs' })[0]?.detail).toContain('the unit furlongs');
  });
});
