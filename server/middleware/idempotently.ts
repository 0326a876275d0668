import { createHash } from 'node:crypto';
import { and, eq, sql } from 'drizzle-orm';
import { idempotencyKeys } from '../db/schema/work';
import type { Deps } from '../deps';
import { Problem } from '../problem';
import type { RawExchange } from '../routes/define-route';

const leaseSeconds = 20;
/**
 * The whole act is one transaction. By MariaDB's default it would go on seeing the rows as they were at its first
 * read, so that a look after taking a lock would miss what others wrote in between.
 */
const readCommitted = { isolationLevel: 'read committed' } as const;
const keyPattern = /^[\x21-\x7e]{8,120}$/;

interface Act {
  raw: RawExchange;
  scope: { personId: string; organisationId: string };
  run(raw: RawExchange): Promise<unknown>;
}

/**
 * Runs an act once for its key. The answer is kept in the transaction of the act, so that a repeat after
 * any crash either finds both or neither. A repeat while the first is running is told to wait.
 */
export async function idempotently({ raw, scope, run }: Act): Promise<unknown> {
  const { deps } = raw;
  const sent = raw.http.request.get('idempotency-key');
  if (sent === undefined || !keyPattern.test(sent)) throw new Problem('key-missing');
  const key = createHash('sha256').update(sent).digest('hex');
  const claim = { key, scope, owner: deps.newId(), requestHash: hashRequest(raw) };
  const kept = await claimKey(deps, claim);
  if (kept !== null) return kept.response;
  const woken = new Set<'jobs' | 'mail'>();
  try {
    const response = await deps.db.transaction(async (tx) => {
      const inner: Deps = {
        ...deps,
        db: tx,
        wake: { jobs: () => woken.add('jobs'), mail: () => woken.add('mail') },
      };
      const result = await run({ ...raw, deps: inner });
      const [kept] = await tx
        .update(idempotencyKeys)
        .set({ status: 200, response: result, owner: null, leaseUntil: null })
        .where(and(ofScope(claim), eq(idempotencyKeys.owner, claim.owner)));
      // Slower than its lease, and a repeat has taken over: one of the two acts may stand, and it is not this one.
      if (kept.affectedRows !== 1) throw stillRunning();
      return result;
    }, readCommitted);
    for (const name of woken) deps.wake[name]();
    return response;
  } catch (error) {
    await deps.db.delete(idempotencyKeys).where(and(ofScope(claim), eq(idempotencyKeys.owner, claim.owner)));
    throw error;
  }
}

interface Claim {
  key: string;
  scope: Act['scope'];
  owner: string;
  requestHash: string;
}

function ofScope({ key, scope }: Claim) {
  return and(
    eq(idempotencyKeys.personId, scope.personId),
    eq(idempotencyKeys.organisationId, scope.organisationId),
    eq(idempotencyKeys.key, key),
  );
}

/** Null: the key is ours and the act may run. Else the kept answer. */
async function claimKey(deps: Deps, claim: Claim): Promise<{ response: unknown } | null> {
  const lease = sql`utc_timestamp(3) + interval ${leaseSeconds} second`;
  const [inserted] = await deps.db.execute<{ affectedRows: number }>(sql`
    insert ignore into ${idempotencyKeys}
      (id, person_id, organisation_id, idempotency_key, request_hash, owner, lease_until, created_at)
    values (${deps.newId()}, ${claim.scope.personId}, ${claim.scope.organisationId}, ${claim.key},
      ${claim.requestHash}, ${claim.owner}, ${lease}, utc_timestamp(3))`);
  if (affectedRows(inserted) === 1) return null;
  const [row] = await deps.db.select().from(idempotencyKeys).where(ofScope(claim)).limit(1);
  // Released between the two statements: the first one failed, so this one may try.
  if (!row) return claimKey(deps, claim);
  if (row.requestHash !== claim.requestHash) throw new Problem('key-reused');
  if (row.status !== null) return { response: row.response };
  const takenOver = await deps.db
    .update(idempotencyKeys)
    .set({ owner: claim.owner, leaseUntil: lease })
    .where(and(ofScope(claim), sql`${idempotencyKeys.leaseUntil} < utc_timestamp(3)`));
  if (takenOver[0].affectedRows === 1) return null;
  throw stillRunning();
}

function stillRunning(): Problem {
  return new Problem('wrong-state', {
    detail: 'The same request is still being carried out.',
    fix: 'Wait a few seconds, then send it again with the same key.',
    retryAfterSeconds: 2,
  });
}

function affectedRows(result: unknown): number {
  if (typeof result === 'object' && result !== null && 'affectedRows' in result) {
    return Number(result.affectedRows);
  }
  return 0;
}

function hashRequest({ http: { request }, body, files, version }: RawExchange): string {
  const hash = createHash('sha256');
  hash.update(JSON.stringify([request.method, request.originalUrl, version, body ?? null]));
  for (const file of files) {
    hash
      .update(`\n${file.field}\n${file.fileName}\n`)
      .update(createHash('sha256').update(file.bytes).digest());
  }
  return hash.digest('hex');
}
