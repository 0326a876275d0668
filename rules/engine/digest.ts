import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';

/** SHA-256 of a text's UTF-8, in hexadecimal. */
export type Digest = (text: string) => string;

let native: Digest | null = null;

export function digest(text: string): string {
  return native === null ? digestInScript(text) : native(text);
}

/** The same everywhere, and all that a browser has for a check that does not wait. */
export function digestInScript(text: string): string {
  return bytesToHex(sha256(utf8ToBytes(text)));
}

/** A runtime with a SHA-256 of its own, ten times as fast, lends it here. It is one function: the bytes are the same. */
export function lendDigest(own: Digest): void {
  native = own;
}
