import type { Conditions } from '../../record';
import type { Scalar } from '../../rule-sets/attribute';
import { attributeLabel, withStandardAttributes } from '../../rule-sets/attribute';
import type { ReadingEdition } from '../edition-contents';
import { dateInWords, understandDate } from '../parse-date';
import { placeOf, type ReadingContext } from '../reading-log';
import type { SheetIndex } from '../sheet-index';
import { submittalFacts } from '../submittal-facts';
import { understandAttribute } from '../understand-attribute';
import { unreadReasons } from '../unread-reason';
import type { Candidate } from './candidate';
import { bareCandidate } from './heading-candidates';
import type { Told, ToldCells } from './told';

interface SettleTold extends ReadingContext {
  edition: ReadingEdition;
  indexes: readonly SheetIndex[];
  /** Conditions of a cell that no candidate stands for. */
  atOf?: (place: { sheet: string; cell: string }) => Conditions;
}

/**
 * Puts what was said of cells in place of what their headings made of them, and gives back the candidates that are
 * left to settle.
 */
export function settleTold(told: ToldCells, candidates: Candidate[], context: SettleTold): Candidate[] {
  if (told.size === 0) return candidates;
  const kept = candidates.flatMap((each): Candidate[] => {
    const of = told.at(each.index.sheet.name, each.cell);
    if (of === null) return [each];
    return of.says.kind === 'reading' && each.written === null ? [{ ...each, told: of.says }] : [];
  });
  const placed = new Set(kept.flatMap(({ told: said, cell }) => (said ? [cell] : [])));
  for (const of of told.all()) {
    if (of.says.kind !== 'reading') settleOther(of, context);
    else if (!placed.has(of.cell)) {
      const index = context.indexes.find(({ sheet }) => sheet.name === of.sheet);
      if (index) kept.push({ ...nowhere(index, of, context), told: of.says });
    }
  }
  return kept;
}

/** A cell that no heading speaks for: what is known of it is what was said. */
function nowhere(index: SheetIndex, { sheet, cell }: Told, { atOf }: SettleTold): Candidate {
  const around = { index, far: {}, tableSubset: null, tableDomains: [], number: -1 };
  return { ...bareCandidate(around, cell), at: atOf?.({ sheet, cell: cell.address }) ?? {} };
}

function settleOther(of: Told, context: SettleTold): void {
  const { says, sheet, cell } = of;
  const place = { sheet, cell: cell.address, text: cell.text };
  const { log } = context;
  switch (says.kind) {
    case 'not a reading':
      log.passOver(place, unreadReasons.saidToBeNone);
      return;
    case 'left out':
      log.passOver(place, unreadReasons.leftOut);
      return;
    case 'in doubt':
      log.passOver(place, unreadReasons.keyInDoubt);
      return;
    case 'attribute':
      settleAttribute(of, says.name, context);
      return;
    case 'document date':
      settleDate(of, says, context);
      return;
    case 'reading':
      return;
  }
}

function settleAttribute(
  { sheet, cell }: Told,
  name: string,
  { log, grid, edition, indexes }: SettleTold,
): void {
  const index = indexes.find((each) => each.sheet.name === sheet);
  const attribute = [...withStandardAttributes(edition.attributes), ...submittalFacts].find(
    (each) => each.name === name,
  );
  if (!index) return;
  const place = placeOf(index.sheet, cell);
  if (!attribute) {
    log.passOver(place, unreadReasons.notRecognised);
    return;
  }
  const build = (value: Scalar) => ({
    value,
    ...(attribute.unit ? { unit: attribute.unit } : {}),
    origin: 'reported' as const,
    source: place,
  });
  const understood = understandAttribute(attribute, cell, null, grid.date1904);
  const settled = log.settle(place, understood, { attribute: name }, (value) => ({
    attribute: { name, value: build(value) },
  }));
  if (settled.state === 'none' || settled.state === 'blank') log.passOver(place, unreadReasons.noValue);
  if (settled.state === 'left out') log.passOver(place, unreadReasons.leftOut);
  if (settled.state !== 'value') return;
  log.use(place, 'read', `${attributeLabel(attribute)}: ${String(settled.value)}.`);
  log.attributes.push({ name, value: build(settled.value), place });
}

/** The date goes to the document of that kind that still lacks it, else it is a document of its own. */
function settleDate(
  { sheet, cell }: Told,
  { type, part }: { type: string; part: 'date' | 'validTo' },
  { log, grid }: SettleTold,
): void {
  const place = { sheet, cell: cell.address, text: cell.text };
  const settled = log.settle(place, understandDate(cell, grid.date1904), { document: type }, () => ({}));
  if (settled.state === 'none' || settled.state === 'blank') log.passOver(place, unreadReasons.noValue);
  if (settled.state === 'left out') log.passOver(place, unreadReasons.leftOut);
  if (settled.state !== 'value') return;
  log.use(place, 'read', `${part === 'date' ? 'Date' : 'Valid to'}: ${dateInWords(settled.value)}.`);
  const lacking = log.documents.find((each) => each.type === type && each[part] === null);
  if (lacking) {
    lacking[part] = settled.value;
    return;
  }
  const stated = { issuer: null, reference: null, date: null, validTo: null, enclosed: false };
  log.documents.push({ ...stated, type, [part]: settled.value, source: place });
}
