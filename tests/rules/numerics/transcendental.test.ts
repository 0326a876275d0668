import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { exp, expm1, ln, log10, power, squared, tenTo } from '#rules/numerics/transcendental';

const rules = join(import.meta.dirname, '../../../rules');
const sources = readdirSync(rules, { recursive: true, encoding: 'utf8' }).filter((name) =>
  name.endsWith('.ts'),
);

/** Of Math, what the language leaves to each engine; square roots are rounded in one way by its standard. */
const FREE = /\bMath\.(?!abs|ceil|clz32|floor|fround|imul|max|min|round|sign|sqrt|trunc)[a-z]\w*/;
const POWER = /[\w)\]!] \*\* [-+\w(]/;

function withoutComments(source: string): string {
  return source.replaceAll(/\/\*[\s\S]*?\*\//g, '').replaceAll(/(^|\s)\/\/.*$/gm, '');
}

describe('the engine', () => {
  it('takes no value whose last bit is left to whoever runs it', () => {
    expect(sources.length).toBeGreaterThan(200);
    const found = sources.flatMap((name) =>
      withoutComments(readFileSync(join(rules, name), 'utf8'))
        .split('\n')
        .filter((line) => FREE.test(line) || POWER.test(line))
        .map((line) => `${name}: ${line.trim()}`),
    );
    expect(found).toEqual([]);
  });

  it.each(['Math.exp(x)', 'Math.log10', '.map(Math.cbrt)', 'x ** 2', 'f(x) ** -n', 'values[i]! ** (1 / 3)'])(
    'would be told of %s',
    (line) => {
      expect(FREE.test(line) || POWER.test(line)).toBe(true);
    },
  );
});

describe('transcendental functions', () => {
  // The constants are written out in the language's standard (ECMA-262, Value Properties of the Math Object).
  it.each([
    ['e', exp(1), Math.E],
    ['e less one', expm1(1), 1.718281828459045],
    ['ln 2', ln(2), Math.LN2],
    ['ln 10', ln(10), Math.LN10],
    ['the square root of 2', power(2, 0.5), Math.SQRT2],
  ])('give %s to the last digit but one', (_, given, known) => {
    expect(Math.abs(given - known)).toBeLessThanOrEqual(2 ** -52 * known);
  });

  it('keep what is left of e^x − 1 where x is small: x + x²/2', () => {
    expect(expm1(1e-10)).toBeCloseTo(1.00000000005e-10, 24);
  });

  it('end where numbers end', () => {
    expect([exp(-800), exp(800), exp(0), ln(0), ln(1)]).toEqual([
      0,
      Number.POSITIVE_INFINITY,
      1,
      Number.NEGATIVE_INFINITY,
      0,
    ]);
    expect(ln(-1)).toBeNaN();
    expect(power(-8, 1 / 3)).toBeNaN();
  });

  it('give whole powers and logarithms of ten as they are', () => {
    expect([-7, -3, -1, 0, 1, 5].map(tenTo)).toEqual([1e-7, 0.001, 0.1, 1, 10, 100_000]);
    expect([0.001, 0.1, 1, 10, 1000, 1e9].map(log10)).toEqual([-3, -1, 0, 1, 3, 9]);
    expect([squared(-1.5), squared(0.1)]).toEqual([2.25, 0.1 * 0.1]);
  });
});
