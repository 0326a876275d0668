import type { ReadingEdition } from './edition-contents';
import { LabelReader } from './layout/label-meaning';
import { vocabularyOf } from './words/phrase-index';

const readers = new WeakMap<ReadingEdition, LabelReader>();

export function labelReaderOf(edition: ReadingEdition): LabelReader {
  const known = readers.get(edition);
  if (known) return known;
  const reader = new LabelReader(vocabularyOf(edition));
  readers.set(edition, reader);
  return reader;
}
