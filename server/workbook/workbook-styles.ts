import { builtInFormats } from './number-format';
import { parsePart } from './workbook-parts';
import { isTrue } from './xml-events';
import type { OpenZip } from './zip-reader';

export interface CellStyle {
  format: string;
  bold: boolean;
}

/** Styles by the index that cells carry. */
export async function readStyles(zip: OpenZip, path: string | null, fileName: string): Promise<CellStyle[]> {
  const entry = path === null ? undefined : zip.entries.get(path);
  if (!entry) return [];
  const formats = new Map<number, string>(
    Object.entries(builtInFormats).map(([id, code]) => [Number(id), code]),
  );
  const boldFonts: boolean[] = [];
  const cellFormats: { formatId: number; fontId: number }[] = [];
  let section = '';
  await parsePart(zip, entry, fileName, {
    open: (name, attributes) => {
      if (name === 'fonts' || name === 'cellXfs' || name === 'cellStyleXfs' || name === 'dxfs')
        section = name;
      else if (name === 'numFmt' && section !== 'dxfs') {
        formats.set(Number(attributes.numFmtId), attributes.formatCode ?? 'General');
      } else if (name === 'font' && section === 'fonts') boldFonts.push(false);
      else if (name === 'b' && section === 'fonts') {
        boldFonts[boldFonts.length - 1] = attributes.val === undefined || isTrue(attributes.val);
      } else if (name === 'xf' && section === 'cellXfs') {
        cellFormats.push({
          formatId: Number(attributes.numFmtId ?? 0),
          fontId: Number(attributes.fontId ?? 0),
        });
      }
    },
    close: (name) => {
      if (name === section) section = '';
    },
  });
  return cellFormats.map(({ formatId, fontId }) => ({
    format: formats.get(formatId) ?? 'General',
    bold: boldFonts[fontId] ?? false,
  }));
}

/** The texts that cells refer to by number; reading aids over East Asian text are left out. */
export async function readSharedStrings(
  zip: OpenZip,
  path: string | null,
  fileName: string,
): Promise<string[]> {
  const entry = path === null ? undefined : zip.entries.get(path);
  if (!entry) return [];
  const strings: string[] = [];
  let current: string | null = null;
  let inText = false;
  let inReadingAid = false;
  await parsePart(zip, entry, fileName, {
    open: (name) => {
      if (name === 'si') current = '';
      else if (name === 'rPh') inReadingAid = true;
      else if (name === 't') inText = true;
    },
    text: (text) => {
      if (inText && !inReadingAid && current !== null) current += text;
    },
    close: (name) => {
      if (name === 't') inText = false;
      else if (name === 'rPh') inReadingAid = false;
      else if (name === 'si') {
        strings.push(unescapeText(current ?? ''));
        current = null;
      }
    },
  });
  return strings;
}

/** `_x000D_` stands for a control character in stored text. */
export function unescapeText(text: string): string {
  if (!text.includes('_x')) return text;
  return text.replace(/_x([0-9A-F]{4})_/gi, (_, code: string) =>
    String.fromCharCode(Number.parseInt(code, 16)),
  );
}
