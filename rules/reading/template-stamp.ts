import type { CellGrid } from './cell-grid';

export interface TemplateStamp {
  version: number;
  /** Hash of the resolved edition that the template was made for. */
  editionHash: string;
}

/** Name of the custom document property that carries the stamp. */
export const stampProperty = 'ClausewayTemplate';

export function stampText({ version, editionHash }: TemplateStamp): string {
  return `${version};${editionHash}`;
}

/** The line on the first sheet, for people and for programs that drop document properties. */
export function stampLine({ version, editionHash }: TemplateStamp): string {
  return `Clauseway template ${version}, edition ${editionHash}`;
}

/** The template's stamp in a workbook, or null where it is another layout. */
export function recogniseTemplate(grid: CellGrid): TemplateStamp | null {
  const property = /^(\d+);([0-9a-z]+)$/i.exec(grid.properties[stampProperty] ?? '');
  if (property) return { version: Number(property[1]), editionHash: property[2] as string };
  for (const sheet of grid.sheets) {
    for (const cell of sheet.cells) {
      if (cell.row > 3) break;
      const line = /^Clauseway template (\d+), edition ([0-9a-z]+)$/i.exec(cell.text.trim());
      if (line) return { version: Number(line[1]), editionHash: line[2] as string };
    }
  }
  return null;
}
