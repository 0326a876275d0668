import { createHash } from 'node:crypto';
import { z } from 'zod';

const querySchema = z.looseObject({
  model: z.string(),
  where: z.array(z.looseObject({ field: z.string(), value: z.unknown() })).optional(),
  data: z.record(z.string(), z.unknown()).optional(),
  update: z.record(z.string(), z.unknown()).optional(),
});

type Query = z.infer<typeof querySchema>;

/**
 * The sign-in library stores session tokens in clear. Between it and its adapter the token becomes a
 * hash on the way in, and the token that was asked for on the way out, so that a copy of the database
 * opens no session. Rows found without naming their token come back with the hash, which opens nothing.
 */
export function hashSessionTokens<Adapter extends object>(adapter: Adapter): Adapter {
  return new Proxy(adapter, {
    get(target, name) {
      const member: unknown = Reflect.get(target, name);
      if (typeof member !== 'function') return member;
      if (name === 'transaction') {
        return (work: (inner: object) => unknown) =>
          member.call(target, (inner: object) => work(hashSessionTokens(inner)));
      }
      return (...args: unknown[]) => {
        const query = querySchema.safeParse(args[0]);
        if (!query.success || query.data.model !== 'session') return member.apply(target, args);
        const { hashed, tokens } = withHashes(query.data);
        const result: unknown = member.call(target, hashed, ...args.slice(1));
        return result instanceof Promise ? result.then((rows) => withTokens(rows, tokens)) : result;
      };
    },
  });
}

function withHashes(query: Query): { hashed: Query; tokens: Map<string, string> } {
  const tokens = new Map<string, string>();
  const hash = (value: unknown): unknown => {
    if (Array.isArray(value)) return value.map(hash);
    if (typeof value !== 'string') return value;
    const digest = createHash('sha256').update(value).digest('hex');
    tokens.set(digest, value);
    return digest;
  };
  const inFields = (fields: Record<string, unknown>) =>
    'token' in fields ? { ...fields, token: hash(fields.token) } : fields;
  const hashed = {
    ...query,
    ...(query.where && {
      where: query.where.map((part) =>
        part.field === 'token' ? { ...part, value: hash(part.value) } : part,
      ),
    }),
    ...(query.data && { data: inFields(query.data) }),
    ...(query.update && { update: inFields(query.update) }),
  };
  return { hashed, tokens };
}

function withTokens(result: unknown, tokens: Map<string, string>): unknown {
  if (Array.isArray(result)) return result.map((row) => withTokens(row, tokens));
  if (typeof result !== 'object' || result === null || !('token' in result)) return result;
  const token = typeof result.token === 'string' ? tokens.get(result.token) : undefined;
  return token === undefined ? result : { ...result, token };
}
