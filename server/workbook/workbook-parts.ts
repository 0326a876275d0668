import type { Entry } from 'yauzl';
import { refuse } from './refusal';
import { attributeOf, isTrue, type XmlHandlers, xmlSink } from './xml-events';
import type { OpenZip } from './zip-reader';

export interface SheetPart {
  name: string;
  hidden: boolean;
  path: string;
}

export interface WorkbookParts {
  sheets: SheetPart[];
  date1904: boolean;
  sharedStringsPath: string | null;
  stylesPath: string | null;
}

export async function parsePart(
  zip: OpenZip,
  entry: Entry,
  fileName: string,
  handlers: XmlHandlers,
): Promise<void> {
  const sink = xmlSink(handlers);
  try {
    await zip.inflate(entry, (chunk) => sink.write(chunk));
    sink.end();
  } catch (error) {
    if (error instanceof Error && error.name === 'WorkbookRefusal') throw error;
    const reason = error instanceof Error ? error.message : String(error);
    refuse(
      `${fileName} is damaged in its part ${entry.fileName} (${reason.split('\n')[0]?.slice(0, 120)}).`,
      'Open it in the spreadsheet program, save it again as an Excel workbook (.xlsx) and upload that.',
    );
  }
}

/** Finds the sheets in the order of their tabs, and the parts that they share. */
export async function readWorkbookParts(zip: OpenZip, fileName: string): Promise<WorkbookParts> {
  const rootRelations = await readRelations(zip, '_rels/.rels', fileName);
  const workbookPath =
    [...rootRelations.values()].find((relation) => relation.type.endsWith('/officeDocument'))?.target ??
    'xl/workbook.xml';
  const entry = zip.entries.get(workbookPath);
  if (!entry) {
    refuse(
      `${fileName} has no list of sheets (${workbookPath} is missing).`,
      'Open it in the spreadsheet program, save it again as an Excel workbook (.xlsx) and upload that.',
    );
  }
  const relations = await readRelations(zip, relationsPath(workbookPath), fileName);
  const sheets: SheetPart[] = [];
  let date1904 = false;
  await parsePart(zip, entry, fileName, {
    open: (name, attributes) => {
      if (name === 'workbookPr') date1904 = isTrue(attributes.date1904);
      if (name !== 'sheet') return;
      const relation = relations.get(attributeOf(attributes, 'id') ?? '');
      if (!relation?.type.endsWith('/worksheet')) return;
      const hidden = attributes.state === 'hidden' || attributes.state === 'veryHidden';
      sheets.push({ name: attributes.name ?? '', hidden, path: relation.target });
    },
  });
  const shared = [...relations.values()];
  return {
    sheets,
    date1904,
    sharedStringsPath: shared.find((relation) => relation.type.endsWith('/sharedStrings'))?.target ?? null,
    stylesPath: shared.find((relation) => relation.type.endsWith('/styles'))?.target ?? null,
  };
}

export interface Relation {
  type: string;
  target: string;
}

export async function readRelations(
  zip: OpenZip,
  path: string,
  fileName: string,
): Promise<Map<string, Relation>> {
  const relations = new Map<string, Relation>();
  const entry = zip.entries.get(path);
  if (!entry) return relations;
  const folder = path.replace(/_rels\/[^/]+$/, '');
  await parsePart(zip, entry, fileName, {
    open: (name, attributes) => {
      if (name !== 'Relationship' || attributes.TargetMode === 'External') return;
      const target = resolvePath(folder, attributes.Target ?? '');
      relations.set(attributes.Id ?? '', { type: attributes.Type ?? '', target });
    },
  });
  return relations;
}

export function relationsPath(path: string): string {
  const slash = path.lastIndexOf('/');
  return `${path.slice(0, slash + 1)}_rels/${path.slice(slash + 1)}.rels`;
}

/** Custom document properties: name to text. */
export async function readCustomProperties(zip: OpenZip, fileName: string): Promise<Record<string, string>> {
  const properties: Record<string, string> = {};
  const entry = zip.entries.get('docProps/custom.xml');
  if (!entry) return properties;
  let name: string | null = null;
  await parsePart(zip, entry, fileName, {
    open: (tag, attributes) => {
      if (tag === 'property') {
        name = attributes.name ?? null;
        if (name !== null) properties[name] = '';
      }
    },
    text: (text) => {
      if (name !== null && text.trim() !== '') properties[name] = `${properties[name] ?? ''}${text}`;
    },
    close: (tag) => {
      if (tag === 'property') name = null;
    },
  });
  return properties;
}

function resolvePath(folder: string, target: string): string {
  if (target.startsWith('/')) return target.slice(1);
  const parts = folder.split('/').filter((part) => part !== '');
  for (const part of target.split('/')) {
    if (part === '..') parts.pop();
    else if (part !== '.' && part !== '') parts.push(part);
  }
  return parts.join('/');
}
