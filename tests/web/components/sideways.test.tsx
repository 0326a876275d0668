// @vitest-environment happy-dom
import { act, cleanup, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { Sideways } from '../../../web/components/ui/sideways';

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

/** Lays the frame out as a browser would: so wide inside, so wide itself. */
function laidOut(scrollWidth: number, clientWidth: number) {
  vi.spyOn(HTMLElement.prototype, 'scrollWidth', 'get').mockReturnValue(scrollWidth);
  vi.spyOn(HTMLElement.prototype, 'clientWidth', 'get').mockReturnValue(clientWidth);
  const measures: (() => void)[] = [];
  vi.stubGlobal(
    'ResizeObserver',
    class {
      constructor(measure: () => void) {
        measures.push(measure);
      }
      observe() {}
      disconnect() {}
    },
  );
  render(
    <Sideways label="Limits">
      <table />
    </Sideways>,
  );
  act(() => {
    for (const measure of measures) measure();
  });
}

describe('a frame that scrolls sideways', () => {
  it('can be reached and scrolled by keyboard where it is too narrow for what it holds', () => {
    laidOut(900, 600);
    expect(screen.getByRole('region', { name: 'Limits' }).tabIndex).toBe(0);
  });

  it('is no stop for the keyboard where everything fits', () => {
    laidOut(600, 600);
    expect(screen.queryByRole('region')).toBeNull();
    expect(document.querySelector('.sideways')?.hasAttribute('tabindex')).toBe(false);
  });
});
