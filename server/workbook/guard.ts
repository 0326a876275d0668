import type { Entry } from 'yauzl';
import { contentKind, contentWords } from './content-kind';
import { type WorkbookLimits, workbookLimits } from './limits';
import { refuse, refuseTooLarge, type WorkbookProblem, WorkbookRefusal } from './refusal';
import { type OpenZip, openZip } from './zip-reader';

export type WorkbookKind = 'xlsx' | 'csv';

export type GuardResult = { ok: true; kind: WorkbookKind } | { ok: false; problem: WorkbookProblem };

const saveAsXlsx = 'Save it as an Excel workbook (.xlsx) in the spreadsheet program and upload that.';

/**
 * Decides whether a file may be parsed at all: what it is, how large it becomes, whether it carries macros or a
 * password. Every part is inflated and counted here, so that a zip that lies about its sizes never reaches the parser.
 */
export async function guardWorkbook(
  bytes: Buffer,
  fileName: string,
  limits: WorkbookLimits = workbookLimits,
): Promise<GuardResult> {
  try {
    return { ok: true, kind: await admit(bytes, fileName, limits) };
  } catch (error) {
    if (error instanceof WorkbookRefusal) return { ok: false, problem: error.problem };
    throw error;
  }
}

async function admit(bytes: Buffer, fileName: string, limits: WorkbookLimits): Promise<WorkbookKind> {
  if (bytes.length === 0) refuse(`${fileName} is empty.`, 'Choose the workbook again and upload it.');
  if (bytes.length > limits.fileBytes) {
    const size = (bytes.length / 1024 / 1024).toFixed(1);
    refuseTooLarge(
      `${fileName} has ${size} MB; at most ${Math.floor(limits.fileBytes / 1024 / 1024)} MB are read.`,
      'Remove pictures and sheets that the submittal does not need, save it and upload it again.',
    );
  }
  const extension = /\.([a-z0-9]+)$/i.exec(fileName)?.[1]?.toLowerCase() ?? '';
  refuseByName(extension, fileName);
  const content = contentKind(bytes);
  if (content === 'ole-encrypted') {
    refuse(
      `${fileName} is locked with a password.`,
      'Remove the password in the spreadsheet program, save it and upload it again.',
    );
  }
  if (content === 'ole') {
    refuse(`${fileName} is a workbook in the old .xls format, whatever its name ends in.`, saveAsXlsx);
  }
  if (extension === 'csv' || extension === 'tsv') {
    if (content !== 'text') {
      refuse(`${fileName} is ${contentWords[content]}, not the text that a .${extension} holds.`, saveAsXlsx);
    }
    return 'csv';
  }
  if (content !== 'zip') {
    refuse(`${fileName} is ${contentWords[content]}, though its name ends in .xlsx.`, saveAsXlsx);
  }
  await admitZip(bytes, fileName, limits);
  return 'xlsx';
}

function refuseByName(extension: string, fileName: string): void {
  if (extension === 'xlsx' || extension === 'csv' || extension === 'tsv') return;
  if (extension === 'xlsm' || extension === 'xltm') {
    refuse(`${fileName} may carry macros (.${extension}), and macros are never taken in.`, saveAsXlsx);
  }
  if (extension === 'xls') refuse(`${fileName} is a workbook in the old .xls format.`, saveAsXlsx);
  refuse(
    `${fileName} is not a workbook that is read here: its name ends in none of .xlsx, .csv and .tsv.`,
    saveAsXlsx,
  );
}

async function admitZip(bytes: Buffer, fileName: string, limits: WorkbookLimits): Promise<void> {
  const zip = await openZip(bytes, fileName, limits);
  try {
    refuseByParts(zip, fileName, limits);
    for (const [name, entry] of zip.entries) {
      if (name.endsWith('/')) continue;
      await inflateAndLook(zip, name, entry, fileName);
    }
  } finally {
    zip.close();
  }
}

function refuseByParts(zip: OpenZip, fileName: string, limits: WorkbookLimits): void {
  const names = [...zip.entries.keys()];
  if (names.some((name) => /vbaProject\.bin$/i.test(name))) {
    refuse(
      `${fileName} carries macros (${names.find((name) => /vbaProject\.bin$/i.test(name))}).`,
      saveAsXlsx,
    );
  }
  if (names.includes('EncryptedPackage') || [...zip.entries.values()].some((entry) => entry.isEncrypted())) {
    refuse(
      `${fileName} is locked with a password.`,
      'Remove the password in the spreadsheet program, save it and upload it again.',
    );
  }
  if (names.includes('xl/workbook.bin')) refuse(`${fileName} is a binary workbook (.xlsb).`, saveAsXlsx);
  if (
    !names.includes('[Content_Types].xml') ||
    !names.some((name) => /^xl\/worksheets\/.+\.xml$/.test(name))
  ) {
    refuse(`${fileName} is a zip archive without a worksheet in it.`, saveAsXlsx);
  }
  const sheetCount = names.filter((name) => /^xl\/worksheets\/[^/]+\.xml$/.test(name)).length;
  if (sheetCount > limits.sheets) {
    refuseTooLarge(
      `${fileName} has ${sheetCount} sheets; at most ${limits.sheets} are read.`,
      'Remove the sheets that the submittal does not need and upload it again.',
    );
  }
}

async function inflateAndLook(zip: OpenZip, name: string, entry: Entry, fileName: string): Promise<void> {
  const kept: Buffer[] = [];
  await zip.inflate(entry, (chunk) => {
    if (name === '[Content_Types].xml') kept.push(chunk);
  });
  if (name === '[Content_Types].xml' && /macroEnabled/i.test(Buffer.concat(kept).toString('utf8'))) {
    refuse(`${fileName} is a workbook with macros under another name.`, saveAsXlsx);
  }
}
