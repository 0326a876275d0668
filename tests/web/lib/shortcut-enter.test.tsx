// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { listenForShortcuts, useShortcuts } from '../../../web/lib/shortcuts';

afterEach(cleanup);

function Page({ run }: { run: () => void }) {
  useShortcuts([{ key: 'Enter', label: 'open', run }]);
  return (
    <>
      <a href="/projects">Projects</a>
      <p>Text</p>
    </>
  );
}

describe('Enter as a key of the page', () => {
  it('acts where nothing else has the focus', () => {
    const run = vi.fn();
    const stop = listenForShortcuts(document);
    render(<Page run={run} />);
    fireEvent.keyDown(screen.getByText('Text'), { key: 'Enter' });
    expect(run).toHaveBeenCalledTimes(1);
    stop();
  });

  it('leaves a focused link to be followed', () => {
    const run = vi.fn();
    const stop = listenForShortcuts(document);
    render(<Page run={run} />);
    const followed = fireEvent.keyDown(screen.getByRole('link'), { key: 'Enter' });
    expect(run).not.toHaveBeenCalled();
    expect(followed).toBe(true);
    stop();
  });
});
