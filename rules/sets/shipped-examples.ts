import { evaluate } from '../engine/evaluate';
import { templateCells } from '../reading/template-cells';
import { type CheckContext, type MixRecord, mixRecordSchema } from '../record';
import type { ResolvedEdition } from '../rule-sets/resolve';
import dense412 from './examples/cvra-412.json';
import airfield421 from './examples/cvra-421.json';
import dense431 from './examples/cvra-431.json';

export interface ShippedExample {
  /** The rule set that it was invented for; it serves every edition that it fits. */
  ruleSet: string;
  record: MixRecord;
}

/** Invented mixes, one for each shipped rule set, that show how a template is filled in. */
export const shippedExamples: ShippedExample[] = [
  { ruleSet: 'cvra-412', record: mixRecordSchema.parse(dense412) },
  { ruleSet: 'cvra-421', record: mixRecordSchema.parse(airfield421) },
  { ruleSet: 'cvra-431', record: mixRecordSchema.parse(dense431) },
];

/** The day on which the examples would be submitted: their documents and tests are dated before it. */
export const exampleContext: CheckContext = { submittedOn: '2026-03-09', lettingOn: '2026-01-14', facts: {} };

/**
 * The example that an edition's template can be shown with, or null: all that it states has a place there, and it
 * shows and meets all that the edition requires of it.
 */
export function exampleFor(edition: ResolvedEdition): MixRecord | null {
  return shippedExamples.find(({ record }) => fits(record, edition))?.record ?? null;
}

function fits(record: MixRecord, edition: ResolvedEdition): boolean {
  if (templateCells(edition, record).homeless.length > 0) return false;
  // The files of documents are attached after the upload, so that no workbook can hold them.
  const documents = record.documents.map((document) => ({ ...document, enclosed: true }));
  const { findings } = evaluate({ ...record, documents }, edition, exampleContext);
  return findings.every(
    ({ severity, outcome }) => severity !== 'required' || outcome === 'pass' || outcome === 'not applicable',
  );
}
