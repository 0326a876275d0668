import type { SheetGrid } from '#rules/reading/cell-grid';
import type { Correction } from '#rules/reading/correction';
import type { WordsFor } from '#rules/reading/mapping-sentence';
import type { Answer, ReadingResult } from '#rules/reading/reading-result';
import type { MixRecord, Reading } from '#rules/record';
import type { Scalar } from '#rules/rule-sets/attribute';
import type { DocumentType } from '#rules/rule-sets/document-types';
import type { DocumentRow, ReadingView } from '#shared/contracts/readings';
import type { DocumentRow as StoredDocument } from '../db/queries/records';
import { type AttributeSources, askedAttributes } from './asked-attributes';
import { doubtLetter } from './doubt-letter';
import { overrulingReading } from './overruling-reading';
import { readingLabel } from './present-preview';
import { understoodGroups } from './understood-groups';

interface ReadingParts {
  version: number;
  workbook: { fileName: string; sha256: string };
  mappingName: string;
  sheets: Pick<SheetGrid, 'name' | 'hidden'>[];
  /** As read, with every doubt, answered or not. */
  reading: ReadingResult;
  /** As judged. */
  record: MixRecord;
  answers: Answer[];
  typed: Record<string, Scalar>;
  facts: Record<string, Scalar>;
  edition: AttributeSources['edition'];
  documents: StoredDocument[];
  documentTypes: DocumentType[];
  mapping: { id: string; name: string; number: number } | null;
  learned: ReadingView['learned'];
  corrections: { id: string; by: string; at: Date; correction: Correction }[];
  typedReadings: { id: string; by: string; at: Date; reading: Reading }[];
  words: WordsFor;
  mayAnswer: boolean;
}

export function presentReading(parts: ReadingParts): ReadingView {
  const { reading, record, documents, typed, facts, edition } = parts;
  const answerOf = new Map(parts.answers.map((answer) => [placeOf(answer), answer]));
  return {
    version: parts.version,
    fileName: parts.workbook.fileName,
    sha256: parts.workbook.sha256,
    mappingName: parts.mappingName,
    sheets: parts.sheets.map(({ name, hidden }) => ({ name, hidden, ...countsOf(name, reading) })),
    doubts: reading.doubts.map((doubt, index) => {
      const answer = answerOf.get(placeOf(doubt));
      return {
        ...doubt,
        letter: doubtLetter(index),
        // An answer to a cell that holds another text by now is not an answer to this doubt.
        answer: answer?.text === doubt.text ? answer.answer : null,
      };
    }),
    stale: reading.stale,
    unread: reading.unread,
    counts: {
      readings: record.readings.length,
      attributes: Object.keys(record.attributes).length,
      documents: documents.length,
    },
    understood: understoodGroups(record.readings),
    asked: askedAttributes({ edition, workbook: reading.record.attributes, facts, typed }),
    documents: documents.map((row) => presentDocument(row, parts.documentTypes)),
    mapping: parts.mapping && { ...parts.mapping, departures: reading.departures },
    learned: parts.learned,
    corrections: parts.corrections.map(({ id, by, at, correction }) => ({
      ...correction,
      id,
      by,
      at: at.toISOString(),
    })),
    typed: parts.typedReadings.map(({ id, by, at, reading: typedReading }) => ({
      id,
      reading: typedReading,
      label: readingLabel(typedReading, parts.words),
      overruled: overruledBy(typedReading, reading),
      by,
      at: at.toISOString(),
    })),
    abilities: { answer: parts.mayAnswer, attach: parts.mayAnswer },
  };
}

function overruledBy(typed: Reading, { record }: ReadingResult): string | null {
  const stated = overrulingReading(typed, record);
  if (stated === null) return null;
  const { sheet = '', cell = '', text = '' } = stated.source ?? {};
  return `The workbook says ${text} in ${sheet === '' ? cell : `${sheet} ${cell}`}.`;
}

function countsOf(sheet: string, { uses, doubts, unread }: ReadingResult) {
  return {
    read: uses.filter((use) => use.sheet === sheet && use.use === 'read').length,
    doubts: doubts.filter((doubt) => doubt.sheet === sheet).length,
    unused: unread.filter((cell) => cell.sheet === sheet).length,
  };
}

function presentDocument({ document, file }: StoredDocument, types: readonly DocumentType[]): DocumentRow {
  const { id, type, issuer, reference, date, validTo, source, added } = document;
  return {
    id,
    type,
    label: types.find((each) => each.type === type)?.label ?? type,
    issuer,
    reference,
    date,
    validTo,
    enclosed: file !== null,
    source,
    file:
      file === null
        ? null
        : { id: file.id, fileName: file.fileName, mediaType: file.mediaType, bytes: file.sizeBytes },
    added,
  };
}

function placeOf({ sheet, cell }: { sheet: string; cell: string }): string {
  return `${sheet}!${cell}`;
}
