// @vitest-environment happy-dom
import { render } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { type Finding, resolvedLimitSchema } from '#rules/engine/finding';
import { aFinding } from '#tests/builders/a-finding';
import { Gauge } from '../../../web/components/ui/gauge';
import '../render-page';

const limit = (overrides: object) =>
  resolvedLimitSchema.parse({ min: null, max: null, unit: '%', decimals: 1, ...overrides });
const judged = (rounded: number, text = String(rounded)) => ({
  value: rounded,
  rounded,
  text,
  unit: '%',
  statistic: 'mean',
  count: 2,
});
const draw = (finding: Finding, more: object = {}) =>
  render(<Gauge finding={finding} {...more} />).container.querySelector('svg');
const all = (svg: Element | null, selector: string) => [...(svg?.querySelectorAll(selector) ?? [])];
const xOf = (path: Element | undefined) => Number(/^M([\d.]+)/.exec(path?.getAttribute('d') ?? '')?.[1]);

describe('the drawn gauge', () => {
  it('carries the sentence, value, limit and margin in words', () => {
    const svg = draw(aFinding());
    expect(svg?.getAttribute('role')).toBe('img');
    expect(svg?.getAttribute('aria-label')).toBe(
      'Voids in the mineral aggregate are 13.9 %, at least 14.0. Margin −0.1.',
    );
  });

  // |judged − limit| ≤ precision is what makes a finding borderline; the whisker is the same interval.
  it.each([
    { rounded: 14.3, precision: 0.4, borderline: true },
    { rounded: 14.3, precision: 0.3, borderline: true },
    { rounded: 14.3, precision: 0.2, borderline: false },
    { rounded: 13.9, precision: 0.1, borderline: true },
  ])('reaches the tick with ± $precision on $rounded exactly when borderline is $borderline', (example) => {
    const svg = draw(
      aFinding({
        observed: judged(example.rounded),
        precision: { value: example.precision, origin: 'rule' },
        borderline: example.borderline,
      }),
    );
    const tick = xOf(all(svg, '.tick')[0]);
    const [, from, to] =
      /^M([\d.]+) 11H([\d.]+)/.exec(all(svg, '.whisker')[0]?.getAttribute('d') ?? '') ?? [];
    expect(Number(from) <= tick && tick <= Number(to)).toBe(example.borderline);
  });

  it('has a disc for a pass, a square for a fail, a half diamond for undecided', () => {
    expect(all(draw(aFinding({ outcome: 'pass' })), 'circle.dot')).toHaveLength(1);
    expect(all(draw(aFinding({ outcome: 'fail' })), 'rect.dot')).toHaveLength(1);
    expect(all(draw(aFinding({ outcome: 'undecided' })), '.half-outline')).toHaveLength(1);
  });

  it('draws lane and tick without a value where none is shown', () => {
    const svg = draw(aFinding({ outcome: 'not shown', observed: null, margin: null }));
    expect(all(svg, '.lane')).toHaveLength(1);
    expect(all(svg, '.tick')).toHaveLength(1);
    expect(all(svg, '.dot, .half-outline, .whisker')).toHaveLength(0);
  });

  it('is absent where the rule does not apply', () => {
    expect(draw(aFinding({ outcome: 'not applicable' }))).toBeNull();
  });

  it('breaks the line before a value that is off the scale', () => {
    expect(all(draw(aFinding({ observed: judged(40) })), '.scale-break')).toHaveLength(1);
    expect(all(draw(aFinding()), '.scale-break')).toHaveLength(0);
  });

  it('marks what the workbook reports only where it does not round to what was judged', () => {
    const reporting = (text: string) =>
      aFinding({
        evidence: [
          {
            quantity: 'voids-in-mineral-aggregate',
            value: 13.94,
            unit: '%',
            origin: 'recomputed',
            reported: { value: Number(text), text, source: null },
            source: null,
          },
        ],
      });
    expect(all(draw(reporting('14.2')), '.reported')).toHaveLength(1);
    expect(all(draw(reporting('13.9')), '.reported')).toHaveLength(0);
  });

  it('counts months under the tick of a document and no unit under any other', () => {
    const age = aFinding({
      outcome: 'not shown',
      observed: null,
      limit: limit({ max: 12, decimals: 0, unit: 'months' }),
    });
    expect(all(draw(age), 'text').map((each) => each.textContent)).toEqual(['12 months']);
    expect(all(draw(aFinding()), 'text').map((each) => each.textContent)).toEqual(['14.0']);
  });

  it('dots the limit of another edition', () => {
    expect(all(draw(aFinding(), { otherLimits: [13.5] }), '.tick-other')).toHaveLength(1);
  });

  it('dashes from the last tested value to an extrapolated one', () => {
    const evidence = (value: number, origin: 'measured' | 'extrapolated') => ({
      quantity: 'creep-compliance',
      value,
      unit: '1/GPa',
      origin,
      source: null,
    });
    const svg = draw(
      aFinding({
        outcome: 'undecided',
        observed: judged(14.6),
        evidence: [{ ...evidence(14.6, 'extrapolated'), inputs: [evidence(13.9, 'measured')] }],
      }),
    );
    // Half of 208 px is the span of 1.5: 13.9 stands 0.1 below the tick at 52 px.
    expect(xOf(all(svg, '.beyond')[0])).toBeCloseTo(52 - (0.1 / 1.5) * 104, 1);
  });

  it('is drawn at its own width, never scaled', () => {
    expect(draw(aFinding(), { widthPx: 150 })?.getAttribute('viewBox')).toBe('0 0 150 34');
  });
});
