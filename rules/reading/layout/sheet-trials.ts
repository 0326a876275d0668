import type { SheetGrid } from '../cell-grid';
import { plainText } from '../plain-text';

const inName =
  /(?:^|[\s_-])(?:AC|A\.C\.|Pb|B|BM|TL|binder|bitumen|asphalt|liant|bitume|ligante|bet[uú]n|asfalto|Bindemittel)?\s*[=_ ]?\s*(\d{1,2}[.,]\d{1,2})\s*(%)?\s*(?:AC|Pb|binder|bitumen|asphalt|liant|bitume|ligante|bet[uú]n|asfalto|Bindemittel)?$/i;

/** Sheets that are told apart by their binder content alone hold a trial each, and it is the trial's name. */
export function trialsOfSheets(sheets: readonly SheetGrid[]): Map<string, string> {
  const found = new Map<string, string>();
  for (const { name } of sheets) {
    const match = inName.exec(plainText(name.replace(/_/g, ' ')));
    const says = match?.[2] !== undefined || /[a-z]{2}/i.test(name);
    const content = match?.[1]?.replace(',', '.');
    if (content !== undefined && says && Number(content) > 2 && Number(content) < 12)
      found.set(name, content);
  }
  return new Set(found.values()).size > 1 && new Set(found.values()).size === found.size ? found : new Map();
}
