export type ContentKind = 'zip' | 'ole-encrypted' | 'ole' | 'html' | 'xml' | 'pdf' | 'text' | 'binary';

const oleSignature = Buffer.from([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1]);
const encryptedStream = Buffer.from('EncryptedPackage', 'utf16le');

/** What the bytes are, whatever the file is called. */
export function contentKind(bytes: Buffer): ContentKind {
  if (bytes.subarray(0, 8).equals(oleSignature)) {
    return bytes.includes(encryptedStream) ? 'ole-encrypted' : 'ole';
  }
  if (bytes.subarray(0, 4).toString('latin1') === 'PK\u0003\u0004') return 'zip';
  const head = bytes.subarray(0, 512).toString('latin1');
  if (head.startsWith('%PDF-')) return 'pdf';
  const text = head.replace(/^(?:\u00ef\u00bb\u00bf|\s)+/, '').toLowerCase();
  if (/^<(?:!doctype html|html|head|body|table|meta)/.test(text)) return 'html';
  if (text.startsWith('<?xml') || text.startsWith('<')) return 'xml';
  return looksLikeText(bytes) ? 'text' : 'binary';
}

function looksLikeText(bytes: Buffer): boolean {
  const start = bytes.subarray(0, 2);
  const isUtf16 =
    start.length === 2 &&
    ((start[0] === 0xff && start[1] === 0xfe) || (start[0] === 0xfe && start[1] === 0xff));
  if (isUtf16) return true;
  for (const byte of bytes.subarray(0, 4096)) {
    if (byte < 9 || (byte > 13 && byte < 27)) return false;
  }
  return true;
}

export const contentWords: Record<ContentKind, string> = {
  zip: 'a zip archive',
  'ole-encrypted': 'a workbook locked with a password',
  ole: 'a workbook in the old .xls format',
  html: 'a web page',
  xml: 'an XML text',
  pdf: 'a PDF',
  text: 'plain text',
  binary: 'something other than a workbook',
};
