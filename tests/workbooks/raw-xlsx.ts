import JSZip from 'jszip';

export interface RawSheet {
  name: string;
  /** Inner XML of the worksheet element. */
  xml: string;
  state?: 'hidden' | 'veryHidden';
  /** Text of the comments part: address to text. */
  comments?: Record<string, string>;
}

export interface RawWorkbook {
  sheets: RawSheet[];
  sharedStrings?: string;
  styles?: string;
  workbookProperties?: string;
  /** Relationship and namespace base of the strict variant of the format. */
  strict?: boolean;
  extraParts?: Record<string, string | Buffer>;
}

const head = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>';

/** A workbook written part by part, for files that no library of ours would write. */
export async function rawXlsx(workbook: RawWorkbook): Promise<Buffer> {
  const base = workbook.strict
    ? 'http://purl.oclc.org/ooxml/officeDocument/relationships'
    : 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';
  const main = workbook.strict
    ? 'http://purl.oclc.org/ooxml/spreadsheetml/main'
    : 'http://schemas.openxmlformats.org/spreadsheetml/2006/main';
  const zip = new JSZip();
  zip.file(
    '[Content_Types].xml',
    `${head}<Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types"/>`,
  );
  zip.file('_rels/.rels', relationships([[`${base}/officeDocument`, 'xl/workbook.xml']]));
  const links: [string, string][] = workbook.sheets.map((_, at) => [
    `${base}/worksheet`,
    `worksheets/sheet${at + 1}.xml`,
  ]);
  if (workbook.sharedStrings !== undefined) links.push([`${base}/sharedStrings`, 'sharedStrings.xml']);
  if (workbook.styles !== undefined) links.push([`${base}/styles`, 'styles.xml']);
  zip.file('xl/_rels/workbook.xml.rels', relationships(links));
  const tabs = workbook.sheets
    .map(
      ({ name, state }, at) =>
        `<sheet name="${name}" sheetId="${at + 1}" ${state ? `state="${state}"` : ''} r:id="r${at}"/>`,
    )
    .join('');
  zip.file(
    'xl/workbook.xml',
    `${head}<workbook xmlns="${main}" xmlns:r="${base}">${workbook.workbookProperties ?? ''}<sheets>${tabs}</sheets></workbook>`,
  );
  workbook.sheets.forEach(({ xml, comments }, at) => {
    zip.file(`xl/worksheets/sheet${at + 1}.xml`, `${head}<worksheet xmlns="${main}">${xml}</worksheet>`);
    if (!comments) return;
    zip.file(
      `xl/worksheets/_rels/sheet${at + 1}.xml.rels`,
      relationships([[`${base}/comments`, `../comments${at + 1}.xml`]]),
    );
    const list = Object.entries(comments)
      .map(([cell, text]) => `<comment ref="${cell}"><text><r><t>${text}</t></r></text></comment>`)
      .join('');
    zip.file(
      `xl/comments${at + 1}.xml`,
      `${head}<comments xmlns="${main}"><commentList>${list}</commentList></comments>`,
    );
  });
  if (workbook.sharedStrings !== undefined)
    zip.file('xl/sharedStrings.xml', `${head}<sst xmlns="${main}">${workbook.sharedStrings}</sst>`);
  if (workbook.styles !== undefined)
    zip.file('xl/styles.xml', `${head}<styleSheet xmlns="${main}">${workbook.styles}</styleSheet>`);
  for (const [name, content] of Object.entries(workbook.extraParts ?? {})) zip.file(name, content);
  return zip.generateAsync({ type: 'nodebuffer', compression: 'DEFLATE' });
}

function relationships(links: [type: string, target: string][]): string {
  const list = links
    .map(([type, target], at) => `<Relationship Id="r${at}" Type="${type}" Target="${target}"/>`)
    .join('');
  return `${head}<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships">${list}</Relationships>`;
}

/** A one-sheet workbook from rows of plain values. */
export function sheetData(rows: (string | number | null)[][]): string {
  const body = rows
    .map((cells, row) => {
      const inner = cells
        .map((value, column) => {
          const address = `${String.fromCharCode(65 + column)}${row + 1}`;
          if (value === null) return '';
          if (typeof value === 'number') return `<c r="${address}"><v>${value}</v></c>`;
          return `<c r="${address}" t="inlineStr"><is><t>${value}</t></is></c>`;
        })
        .join('');
      return `<row r="${row + 1}">${inner}</row>`;
    })
    .join('');
  return `<sheetData>${body}</sheetData>`;
}

/** The same zip whose directory declares another inflated size for one part. */
export function withDeclaredSize(bytes: Buffer, partName: string, declaredBytes: number): Buffer {
  const patched = Buffer.from(bytes);
  for (let at = 0; at < patched.length - 46; at += 1) {
    if (patched.readUInt32LE(at) !== 0x02014b50) continue;
    const nameLength = patched.readUInt16LE(at + 28);
    if (patched.subarray(at + 46, at + 46 + nameLength).toString('latin1') !== partName) continue;
    patched.writeUInt32LE(declaredBytes, at + 24);
    return patched;
  }
  throw new Error(`no part ${partName}`);
}
