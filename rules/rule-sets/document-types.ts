import { z } from 'zod';

export const documentTypeSchema = z.strictObject({
  type: z.string().min(1),
  label: z.string().optional(),
  /** Other names under which workbooks list it. */
  aliases: z.array(z.string()).optional(),
});

export type DocumentType = z.infer<typeof documentTypeSchema>;

/** The documents that every edition knows without declaring them. */
export const STANDARD_DOCUMENTS: DocumentType[] = [
  { type: 'binder-certificate', label: 'Binder certificate' },
  { type: 'mix-design-report', label: 'Mix design report' },
  { type: 'aggregate-source-approval', label: 'Aggregate source approval' },
  { type: 'laboratory-accreditation', label: 'Laboratory accreditation' },
  { type: 'technician-certificate', label: 'Technician certificate' },
  { type: 'recycled-material-report', label: 'Recycled material report' },
  { type: 'additive-certificate', label: 'Additive certificate' },
  { type: 'safety-data-sheet', label: 'Safety data sheet' },
  { type: 'equipment-calibration', label: 'Equipment calibration record' },
  { type: 'mixing-temperature-chart', label: 'Mixing and compaction temperature chart' },
  { type: 'performance-test-report', label: 'Performance test report' },
  { type: 'certificate-of-compliance', label: 'Certificate of compliance' },
];

/** Standard documents with the edition's own in place of or beside them. */
export function withStandardDocuments(declared: DocumentType[]): DocumentType[] {
  const own = new Set(declared.map((document) => document.type));
  return [...declared, ...STANDARD_DOCUMENTS.filter((document) => !own.has(document.type))];
}
