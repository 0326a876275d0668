// @vitest-environment happy-dom
import { render } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { cssString, usePrintedRevision } from '../../../web/lib/print-frame';
import '../render-page';

function Page() {
  usePrintedRevision({
    agency: { name: 'Carrow Valley Roads Authority' },
    project: { number: 'CV-2031' },
    mixDesignation: 'BW-125-S4',
    number: 1,
  });
  return null;
}
const margin = (name: string) => document.documentElement.style.getPropertyValue(name);

describe('the margins of a printed page', () => {
  it('carry agency and reference while the page is open, and no longer', () => {
    const { unmount } = render(<Page />);
    expect(margin('--print-agency')).toBe('"Carrow Valley Roads Authority"');
    expect(margin('--print-reference')).toBe('"CV-2031 / BW-125-S4 / r1"');
    unmount();
    expect(margin('--print-reference')).toBe('');
  });

  // A CSS string ends at its quote and knows a line break by its code only (CSS Syntax Level 3, 4.3.5 and 4.3.7; from memory, verify).
  it('take any words as one string', () => {
    expect(cssString('one "two" \\ three')).toBe('"one \\"two\\" \\\\ three"');
    expect(cssString('first\nsecond')).toBe('"first\\A second"');
  });
});
