import { describe, expect, it } from 'vitest';
import { runAgreement } from './agreement-run';

const KINDS = ['attribute', 'creep-compliance', 'difference', 'document', 'formula', 'gradation', 'reading'];

describe('the engine and the second evaluator', () => {
  const tally = runAgreement({ seed: 20261201, cases: 1500 });

  it('agree on outcome, rounded value, margin and borderline of every drawn finding', () => {
    expect(tally.findings).toBeGreaterThan(2500);
    expect(tally.borderline).toBeGreaterThan(50);
  });

  it('judge every kind of measure', () => {
    expect(tally.kinds).toEqual(KINDS);
  });

  it('meet each outcome in at least 5 % of the findings of every kind', () => {
    expect(tally.seldom(5)).toEqual([]);
  });
});
