import type { EditionContents } from '../rule-sets/edition-view';

/** What reading needs to know of an edition: which attributes, documents and quantities it has words for. */
export type ReadingEdition = Pick<
  EditionContents,
  'rules' | 'tables' | 'attributes' | 'quantities' | 'documents'
>;
