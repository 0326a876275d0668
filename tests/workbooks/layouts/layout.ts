import { Book } from './book';
import type { Headings } from './headings';
import { inventedMix } from './invented-mix';
import type { Section } from './sections';

export interface Layout {
  name: string;
  make: () => Book;
}

/** A workbook of several sections, all of one invented mix in one language. */
export function layout(
  seed: number,
  name: string,
  words: Headings,
  us: boolean,
  sections: Section[],
  options: Parameters<typeof inventedMix>[1] = {},
): Layout {
  return {
    name,
    make: () => {
      const book = new Book();
      const mix = inventedMix(seed, options);
      for (const section of sections) section(book, mix, { words, us });
      return book;
    },
  };
}
