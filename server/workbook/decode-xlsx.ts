import type { CellGrid } from '#rules/reading/cell-grid';
import { decodeSheet } from './decode-sheet';
import type { WorkbookLimits } from './limits';
import { refuse, refuseTooLarge } from './refusal';
import {
  parsePart,
  readCustomProperties,
  readRelations,
  readWorkbookParts,
  relationsPath,
} from './workbook-parts';
import { readSharedStrings, readStyles } from './workbook-styles';
import { type OpenZip, openZip } from './zip-reader';

/** Raised when the grid that is made of the same bytes changes. */
export const decoderVersion = 'clauseway/decoder@1';

export interface DecodeOptions {
  fileName: string;
  limits: WorkbookLimits;
  onProgress: (done: number, total: number) => void;
}

export async function decodeXlsx(bytes: Buffer, options: DecodeOptions): Promise<CellGrid> {
  const { fileName, limits, onProgress } = options;
  const zip = await openZip(bytes, fileName, limits);
  try {
    const parts = await readWorkbookParts(zip, fileName);
    if (parts.sheets.length === 0)
      refuse(`${fileName} has no sheet in it.`, 'Upload a workbook that holds the data.');
    const strings = await readSharedStrings(zip, parts.sharedStringsPath, fileName);
    const styles = await readStyles(zip, parts.stylesPath, fileName);
    const properties = await readCustomProperties(zip, fileName);
    const grid: CellGrid = { decoder: decoderVersion, date1904: parts.date1904, properties, sheets: [] };
    let cells = 0;
    const onCell = () => {
      cells += 1;
      if (cells > limits.cells) {
        refuseTooLarge(
          `${fileName} holds more than ${limits.cells} filled cells.`,
          'Remove the sheets and rows that the submittal does not need and upload it again.',
        );
      }
    };
    onProgress(0, parts.sheets.length);
    for (const part of parts.sheets) {
      const comments = await readComments(zip, part.path, fileName);
      const { date1904 } = parts;
      grid.sheets.push(
        await decodeSheet(zip, part, { fileName, strings, styles, date1904, comments, onCell }),
      );
      onProgress(grid.sheets.length, parts.sheets.length);
    }
    return grid;
  } finally {
    zip.close();
  }
}

async function readComments(zip: OpenZip, sheetPath: string, fileName: string): Promise<Map<string, string>> {
  const comments = new Map<string, string>();
  const relations = await readRelations(zip, relationsPath(sheetPath), fileName);
  const relation = [...relations.values()].find(({ type }) => type.endsWith('/comments'));
  const entry = relation && zip.entries.get(relation.target);
  if (!entry) return comments;
  let address: string | null = null;
  let inText = false;
  await parsePart(zip, entry, fileName, {
    open: (name, attributes) => {
      if (name === 'comment') address = attributes.ref ?? null;
      else if (name === 't') inText = true;
    },
    text: (text) => {
      if (address !== null && inText) comments.set(address, (comments.get(address) ?? '') + text);
    },
    close: (name) => {
      if (name === 't') inText = false;
      else if (name === 'comment') address = null;
    },
  });
  return comments;
}
