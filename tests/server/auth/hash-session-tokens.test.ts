import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { hashSessionTokens } from '#server/auth/hash-session-tokens';

const hash = (token: string) => createHash('sha256').update(token).digest('hex');

/** An adapter that keeps what it was asked and answers with one row. */
function recording(row: object | object[] | null) {
  const asked: unknown[] = [];
  const answer = async (query: unknown) => {
    asked.push(query);
    return row;
  };
  const adapter = {
    id: 'recording',
    create: answer,
    findOne: answer,
    findMany: answer,
    update: answer,
    deleteMany: answer,
    transaction: (work: (inner: object) => unknown) => work(adapter),
  };
  return { adapter: hashSessionTokens(adapter), asked };
}

describe('session tokens between the sign-in library and the database', () => {
  it('are stored as hashes and handed back as they were made', async () => {
    const { adapter, asked } = recording({ id: '1', token: hash('secret') });
    const made = await adapter.create({ model: 'session', data: { token: 'secret', userId: '1' } });
    expect(asked).toEqual([{ model: 'session', data: { token: hash('secret'), userId: '1' } }]);
    expect(made).toEqual({ id: '1', token: 'secret' });
  });

  it('are looked up by their hash, also several at once', async () => {
    const { adapter, asked } = recording([{ token: hash('b') }]);
    const found = await adapter.findMany({
      model: 'session',
      where: [{ field: 'token', operator: 'in', value: ['a', 'b'] }],
    });
    expect(asked).toEqual([
      { model: 'session', where: [{ field: 'token', operator: 'in', value: [hash('a'), hash('b')] }] },
    ]);
    expect(found).toEqual([{ token: 'b' }]);
  });

  it('stay hashes where a row was found by anything else', async () => {
    const { adapter } = recording({ token: hash('secret') });
    const where = [{ field: 'userId', value: '1' }];
    expect(await adapter.findOne({ model: 'session', where })).toEqual({ token: hash('secret') });
  });

  it('cannot be replaced by the hash itself', async () => {
    const { adapter, asked } = recording(null);
    await adapter.findOne({ model: 'session', where: [{ field: 'token', value: hash('secret') }] });
    expect(JSON.stringify(asked)).not.toContain(`"${hash('secret')}"`);
  });

  it('are hashed inside a transaction too', async () => {
    const { adapter, asked } = recording(null);
    await adapter.transaction(async (inner) => {
      const within = inner as typeof adapter;
      await within.update({ model: 'session', where: [], update: { token: 'secret' } });
    });
    expect(asked).toEqual([{ model: 'session', where: [], update: { token: hash('secret') } }]);
  });

  it('of other tables are left alone', async () => {
    const { adapter, asked } = recording(null);
    await adapter.create({ model: 'verification', data: { token: 'plain' } });
    expect(asked).toEqual([{ model: 'verification', data: { token: 'plain' } }]);
  });
});
