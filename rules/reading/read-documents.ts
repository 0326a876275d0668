import type { DocumentRecord } from '../record';
import type { DocumentType } from '../rule-sets/document-types';
import { normaliseText } from '../rule-sets/match-value';
import type { Cell } from './cell-grid';
import { understandDate } from './parse-date';
import { plainText } from './plain-text';
import type { RuleAtAnchor } from './read-rule';
import { placeOf, type ReadingContext } from './reading-log';
import { certain, doubtOf, type Understood } from './settled';
import { unreadReasons } from './unread-reason';

/** Reads one row of a list of documents, from the cell that names the document. */
export function readDocument(
  bound: RuleAtAnchor,
  cell: Cell,
  types: DocumentType[],
  context: ReadingContext,
): void {
  const { index } = bound;
  const { log } = context;
  const place = placeOf(index.sheet, cell);
  const issuer = textOf(bound, 'issuer', cell, context);
  const reference = textOf(bound, 'reference', cell, context);
  const statedType = documentType(cell.text, types);
  const about = statedType.state === 'value' ? { document: statedType.value } : {};
  const blank: Omit<DocumentRecord, 'type'> = {
    issuer,
    reference,
    date: null,
    validTo: null,
    enclosed: false,
    source: place,
  };
  const type = log.settle(place, statedType, about, (value) => ({ document: { ...blank, type: value } }));
  if (type.state === 'left out') log.passOver(place, unreadReasons.leftOut);
  if (type.state !== 'value') return;
  const date = dateOf(bound, 'date', cell, { ...blank, type: type.value }, context);
  const validTo = dateOf(bound, 'validTo', cell, { ...blank, type: type.value, date: date.value }, context);
  // A document whose date is in doubt is neither shown nor missing: the doubt stands in the record for it.
  if (date.inDoubt || validTo.inDoubt) return;
  log.use(place, 'read', `Document: ${labelOf(type.value, types)}.`);
  log.documents.push({ ...blank, type: type.value, date: date.value, validTo: validTo.value });
}

function documentType(text: string, types: DocumentType[]): Understood<string> {
  const plain = plainText(text);
  const found = types.find(({ type, label, aliases }) =>
    [type, label, ...(aliases ?? [])].some(
      (name) => name !== undefined && normaliseText(name) === normaliseText(plain),
    ),
  );
  if (found) return certain(found.type);
  return doubtOf(
    `says "${text}", which is no document that the rules know`,
    types.map(({ type, label }) => ({ answer: type, label: label ?? type, value: type })),
  );
}

function dateOf(
  bound: RuleAtAnchor,
  name: 'date' | 'validTo',
  cell: Cell,
  document: DocumentRecord,
  context: ReadingContext,
): { value: string | null; inDoubt: boolean } {
  const dateCell = bound.locators.get(name)?.cellFor(cell) ?? null;
  if (!dateCell) return { value: null, inDoubt: false };
  const place = placeOf(bound.index.sheet, dateCell);
  const understood = understandDate(dateCell, context.grid.date1904);
  const settled = context.log.settle(place, understood, { document: document.type }, (value) => ({
    document: { ...document, [name]: value },
  }));
  if (settled.state === 'left out') context.log.passOver(place, unreadReasons.leftOut);
  if (settled.state === 'none') context.log.passOver(place, unreadReasons.noValue);
  if (settled.state !== 'value') return { value: null, inDoubt: settled.state === 'doubt' };
  context.log.use(place, 'read', `${name === 'date' ? 'Dated' : 'Valid to'} ${settled.value}.`);
  return { value: settled.value, inDoubt: false };
}

function textOf(
  bound: RuleAtAnchor,
  name: 'issuer' | 'reference',
  cell: Cell,
  context: ReadingContext,
): string | null {
  const textCell = bound.locators.get(name)?.cellFor(cell) ?? null;
  const text = textCell === null ? '' : plainText(textCell.text);
  if (!textCell || text === '') return null;
  context.log.use(placeOf(bound.index.sheet, textCell), 'read', name === 'issuer' ? 'Issuer.' : 'Reference.');
  return text;
}

function labelOf(type: string, types: DocumentType[]): string {
  return types.find((each) => each.type === type)?.label ?? type;
}
