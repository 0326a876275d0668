import { hash, verify } from '@node-rs/argon2';

/**
 * argon2id with 19 MiB, two passes and one lane: the minimum that OWASP's Password Storage Cheat Sheet
 * names (from memory, verify).
 */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export function hashPassword(password: string): Promise<string> {
  return hash(password.normalize('NFKC'), cost);
}

export function verifyPassword({
  hash: stored,
  password,
}: {
  hash: string;
  password: string;
}): Promise<boolean> {
  return verify(stored, password.normalize('NFKC'));
}
