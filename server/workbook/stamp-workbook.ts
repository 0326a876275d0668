import type ExcelJS from 'exceljs';
import JSZip from 'jszip';

const head = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>';
const type = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships/custom-properties';
const contentType = 'application/vnd.openxmlformats-officedocument.custom-properties+xml';

/** Writes a workbook with custom document properties, which the workbook library cannot write itself. */
export async function writeWithProperties(
  workbook: ExcelJS.Workbook,
  properties: Record<string, string>,
): Promise<Buffer> {
  const zip = await JSZip.loadAsync(await workbook.xlsx.writeBuffer());
  const list = Object.entries(properties)
    .map(
      ([name, value], at) =>
        `<property fmtid="{D5CDD505-2E9C-101B-9397-08002B2CF9AE}" pid="${at + 2}" name="${escapeXml(name)}"><vt:lpwstr>${escapeXml(value)}</vt:lpwstr></property>`,
    )
    .join('');
  zip.file(
    'docProps/custom.xml',
    `${head}<Properties xmlns="http://schemas.openxmlformats.org/officeDocument/2006/custom-properties" xmlns:vt="http://schemas.openxmlformats.org/officeDocument/2006/docPropsVTypes">${list}</Properties>`,
  );
  await insertBefore(
    zip,
    '[Content_Types].xml',
    '</Types>',
    `<Override PartName="/docProps/custom.xml" ContentType="${contentType}"/>`,
  );
  await insertBefore(
    zip,
    '_rels/.rels',
    '</Relationships>',
    `<Relationship Id="rIdCustom" Type="${type}" Target="docProps/custom.xml"/>`,
  );
  return zip.generateAsync({ type: 'nodebuffer', compression: 'DEFLATE' });
}

async function insertBefore(zip: JSZip, part: string, end: string, xml: string): Promise<void> {
  const file = zip.file(part);
  if (!file) throw new Error(`the workbook library wrote no ${part}`);
  zip.file(part, (await file.async('string')).replace(end, `${xml}${end}`));
}

function escapeXml(text: string): string {
  return text.replace(/&/g, '&amp;').replace(/</g, '&lt;').replace(/>/g, '&gt;').replace(/"/g, '&quot;');
}
