// @vitest-environment happy-dom
import { act, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { FootPlace, RunningFoot } from '../../../web/components/ui/running-foot';
import { listenForShortcuts, type Shortcut, setSingleKeys, useShortcuts } from '../../../web/lib/shortcuts';
import '../render-page';

function Page({ shortcuts }: { shortcuts: readonly Shortcut[] }) {
  useShortcuts(shortcuts);
  return (
    <>
      <input aria-label="field" />
      <button type="button">button</button>
      <input type="radio" aria-label="radio" />
    </>
  );
}

let stop = () => {};
beforeEach(() => {
  stop = listenForShortcuts(document);
});
afterEach(() => {
  stop();
  act(() => setSingleKeys(true));
});

const press = (key: string, target: Element = document.body, more: object = {}) =>
  fireEvent.keyDown(target, { key, ...more });

describe('single keys', () => {
  it('act while no field has the focus', () => {
    const run = vi.fn();
    render(<Page shortcuts={[{ key: 'j', label: 'next', run }]} />);
    press('j');
    press('j', screen.getByText('button'));
    press('j', screen.getByLabelText('radio'));
    expect(run).toHaveBeenCalledTimes(3);
  });

  it('are letters while a field has the focus', () => {
    const run = vi.fn();
    render(<Page shortcuts={[{ key: 'j', label: 'next', run }]} />);
    press('j', screen.getByLabelText('field'));
    expect(run).not.toHaveBeenCalled();
  });

  it('leave combinations to the browser', () => {
    const run = vi.fn();
    render(<Page shortcuts={[{ key: 'n', label: 'note', run }]} />);
    press('n', document.body, { ctrlKey: true });
    press('n', document.body, { altKey: true });
    press('N', document.body, { shiftKey: true });
    expect(run).not.toHaveBeenCalled();
  });

  it('can be switched off, and what needs Ctrl stays', () => {
    const letter = vi.fn();
    const withCtrl = vi.fn();
    render(
      <Page
        shortcuts={[
          { key: 'j', label: 'next', run: letter },
          { key: 'Enter', label: 'send', run: withCtrl, ctrl: true },
        ]}
      />,
    );
    act(() => setSingleKeys(false));
    press('j');
    press('Enter', screen.getByLabelText('field'), { ctrlKey: true });
    expect(letter).not.toHaveBeenCalled();
    expect(withCtrl).toHaveBeenCalledOnce();
  });

  it('go with their page', () => {
    const run = vi.fn();
    const { unmount } = render(<Page shortcuts={[{ key: 'j', label: 'next', run }]} />);
    unmount();
    press('j');
    expect(run).not.toHaveBeenCalled();
  });

  it('run what the page would do now, not what it would have done when it opened', () => {
    const first = vi.fn();
    const second = vi.fn();
    const { rerender } = render(<Page shortcuts={[{ key: 'j', label: 'next', run: first }]} />);
    rerender(<Page shortcuts={[{ key: 'j', label: 'next', run: second }]} />);
    press('j');
    expect(first).not.toHaveBeenCalled();
    expect(second).toHaveBeenCalledOnce();
  });

  it('stand in the foot with their names', () => {
    const place = document.body.appendChild(document.createElement('footer'));
    render(
      <FootPlace value={place}>
        <Page shortcuts={[{ key: 'j', label: 'next', run: () => undefined, foot: true }]} />
        <RunningFoot texts={['Draft.']} />
      </FootPlace>,
    );
    expect(place.textContent).toBe('Draft.Jnext');
  });
});
