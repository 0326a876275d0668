/** A random key for one act. `crypto.randomUUID` exists only on https and loopback, so the bytes are asked for. */
export function newKey(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16));
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
}
