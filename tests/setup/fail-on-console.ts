import { afterEach, beforeEach, expect, vi } from 'vitest';

/** Unexpected console output is a defect: a test that provokes some says so by its own spy. */
const methods = ['log', 'info', 'warn', 'error', 'debug'] as const;

beforeEach(() => {
  for (const method of methods) vi.spyOn(console, method).mockImplementation(() => undefined);
});

afterEach(() => {
  for (const method of methods) {
    const spy = vi.mocked(console[method]);
    const calls = vi.isMockFunction(spy) ? spy.mock.calls : [];
    expect(calls, `unexpected console.${method}`).toEqual([]);
    if (vi.isMockFunction(spy)) spy.mockRestore();
  }
});
