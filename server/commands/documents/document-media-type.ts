export type DocumentMediaType = 'application/pdf' | 'image/png' | 'image/jpeg';

/** What a file is by its first bytes; its name and what the browser says of it count for nothing. */
export function documentMediaType(bytes: Buffer): DocumentMediaType | null {
  const found = signatures.find(({ signature }) => bytes.subarray(0, signature.length).equals(signature));
  return found?.mediaType ?? null;
}

const signatures: { mediaType: DocumentMediaType; signature: Buffer }[] = [
  { mediaType: 'application/pdf', signature: Buffer.from('%PDF-', 'latin1') },
  { mediaType: 'image/png', signature: Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]) },
  { mediaType: 'image/jpeg', signature: Buffer.from([0xff, 0xd8, 0xff]) },
];
