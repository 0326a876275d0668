import { describe, expect, it } from 'vitest';
import { parseFormula, symbolsOf } from '#shared/format/formula-tree';

describe('a printed formula', () => {
  it('sets a division as a fraction without the brackets that its bar makes needless', () => {
    expect(parseFormula('A/(B − C)')).toEqual({
      kind: 'fraction',
      over: { kind: 'symbol', name: 'A' },
      under: {
        kind: 'operation',
        operator: '−',
        left: { kind: 'symbol', name: 'B' },
        right: { kind: 'symbol', name: 'C' },
      },
    });
  });

  it('divides only the product before the stroke, as the formula is read', () => {
    const tree = parseFormula('100 − Gmb·Ps/Gsb');
    expect(tree?.kind).toBe('operation');
    expect(tree?.kind === 'operation' && tree.right.kind).toBe('fraction');
    expect(tree && symbolsOf(tree)).toEqual(['Gmb', 'Ps', 'Gsb']);
  });

  it('keeps subtraction to the left', () => {
    const tree = parseFormula('a − b − c');
    expect(tree?.kind === 'operation' && tree.right).toEqual({ kind: 'symbol', name: 'c' });
  });

  it('binds a power before a product', () => {
    const tree = parseFormula('D1·t^m');
    expect(tree?.kind === 'operation' && tree.operator).toBe('·');
    expect(tree?.kind === 'operation' && tree.right.kind === 'operation' && tree.right.operator).toBe('^');
  });

  it('knows absolute values and functions', () => {
    expect(parseFormula('0.01·Gf/|m|')?.kind).toBe('fraction');
    expect(parseFormula('ln(D)')).toEqual({ kind: 'call', name: 'ln', of: [{ kind: 'symbol', name: 'D' }] });
  });

  it('answers null for words, so that they are shown as written', () => {
    expect(parseFormula('100 − cumulative percent retained')).toBeNull();
    expect(parseFormula('mean of 3')).toBeNull();
    expect(parseFormula('A/(B')).toBeNull();
    expect(parseFormula('')).toBeNull();
  });
});
