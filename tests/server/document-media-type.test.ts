import { expect, it } from 'vitest';
import { documentMediaType } from '#server/commands/documents/document-media-type';
import { readCursor, writeCursor } from '#server/db/queries/cursor';

// Signatures: ISO 32000-1, 7.5.2 (PDF); ISO/IEC 15948, 5.2 (PNG); ITU-T T.81, B.1.1.3 (JPEG, SOI and a marker).
it('knows PDF, PNG and JPEG by their first bytes and nothing else', () => {
  expect(documentMediaType(Buffer.from('%PDF-1.7\n'))).toBe('application/pdf');
  expect(documentMediaType(Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0]))).toBe(
    'image/png',
  );
  expect(documentMediaType(Buffer.from([0xff, 0xd8, 0xff, 0xe0]))).toBe('image/jpeg');
  expect(documentMediaType(Buffer.from('<html>%PDF-'))).toBeNull();
  expect(documentMediaType(Buffer.from([0xff, 0xd8]))).toBeNull();
  expect(documentMediaType(Buffer.from('GIF89a'))).toBeNull();
  expect(documentMediaType(Buffer.alloc(0))).toBeNull();
});

it('reads back the cursor that it wrote and refuses any other text', () => {
  const cursor = { at: new Date('2026-03-09T14:02:11.123Z'), id: '018f3c1e-7a4b-7c00-8000-0000000000aa' };
  expect(readCursor(writeCursor(cursor))).toEqual(cursor);
  expect(readCursor('nonsense')).toBeNull();
  expect(readCursor(Buffer.from('["2026","x"]').toString('base64url'))).toBeNull();
});
