import { expect } from 'vitest';
import type { Browser } from './test-app';

interface Trial {
  method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  /** The address with the id of the object in it. */
  path: (id: string) => string;
  body?: object;
  version?: number;
}

const nobodys = '0197a0a0-0000-7000-8000-00000000dead';

/** Another tenant's object answers as one that does not exist: the same status, headers that matter and bytes. */
export async function expectSameAsAbsent(person: Browser, theirs: string, trial: Trial): Promise<void> {
  const send = (id: string) => {
    const sending = person[trial.method](trial.path(id)).set('X-Request-Id', 'one-number-for-both');
    if (trial.version !== undefined) sending.set('If-Match', `"${trial.version}"`);
    return trial.body === undefined ? sending : sending.send(trial.body);
  };
  const absent = await send(nobodys);
  const foreign = await send(theirs);
  expect(absent.status).toBe(404);
  expect(foreign.status).toBe(404);
  expect(foreign.text).toBe(absent.text);
  expect(foreign.get('Content-Type')).toBe(absent.get('Content-Type'));
}
