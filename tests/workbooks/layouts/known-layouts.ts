import { Book } from './book';
import { english, englishAbbreviated, french, german, type Headings, spanish } from './headings';
import { inventedMix } from './invented-mix';
import type { Section } from './sections';
import * as s from './sections';

export interface Layout {
  name: string;
  make: () => Book;
}

function layout(
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

export const knownLayouts: Layout[] = [
  layout(1, 'plain English, SI', english, false, [
    s.coverBeside,
    s.stockpilesInRows,
    s.gradationSi,
    s.trialsInRows,
    s.maximumGravities,
    s.moistureStacked,
    s.performanceSheets,
    s.creepList,
    s.documentList,
  ]),
  layout(2, 'abbreviated English, US', englishAbbreviated, true, [
    s.coverBeside,
    s.stockpilesInColumns,
    s.gradationUs,
    s.trialsInColumns,
    s.moistureStacked,
    s.creepMatrices,
  ]),
  layout(3, 'German', german, false, [
    s.coverTwoColumns,
    s.stockpilesInRows,
    s.gradationSi,
    s.trialsInRows,
    s.aggregateTests,
    s.moistureStacked,
    s.creepMatrices,
  ]),
  layout(4, 'French', french, false, [
    s.coverBeside,
    s.stockpilesInColumns,
    s.gradationAcross,
    s.trialsInColumns,
    s.aggregateTests,
    s.performanceSheets,
    s.creepList,
  ]),
  layout(5, 'Spanish', spanish, false, [
    s.coverBelow,
    s.stockpilesInRows,
    s.gradationRetained,
    s.summaryInRows,
    s.trialsGrouped,
    s.aggregateTests,
    s.moistureStacked,
    s.performanceSheets,
  ]),
  layout(
    6,
    'binder contents over the columns',
    english,
    true,
    [
      s.coverTwoColumns,
      s.gradationUs,
      s.trialsByBinder,
      s.aggregateTests,
      s.performanceSheets,
      s.documentList,
    ],
    { trialNames: ['1', '2', '3', '4'] },
  ),
  layout(
    7,
    'numbered trials in two heading rows',
    englishAbbreviated,
    false,
    [s.coverBelow, s.gradationAcross, s.trialsGrouped, s.maximumGravities, s.creepMatrices],
    { trialNames: ['1', '2', '3'] },
  ),
  layout(8, 'summary with the design last', english, false, [
    s.coverBeside,
    s.gradationRetained,
    s.summaryInRows,
    s.aggregateTests,
    s.moistureStacked,
  ]),
  layout(
    9,
    'German, EN sieves',
    german,
    false,
    [s.coverBeside, s.gradationAcross, s.summaryInRows, s.maximumGravities, s.performanceSheets, s.creepList],
    { sieves: [16, 11.2, 8, 5.6, 2, 1, 0.5, 0.25, 0.125, 0.063] },
  ),
  layout(
    10,
    'French, EN sieves',
    french,
    false,
    [s.coverTwoColumns, s.gradationSi, s.trialsInRows, s.moistureStacked, s.creepMatrices],
    { sieves: [20, 16, 14, 10, 6.3, 4, 2, 0.5, 0.25, 0.063] },
  ),
  layout(11, 'Spanish, US units', spanish, true, [
    s.coverBeside,
    s.gradationUs,
    s.trialsInColumns,
    s.moistureStacked,
    s.creepMatrices,
  ]),
  layout(12, 'abbreviated English, SI', englishAbbreviated, false, [
    s.coverTwoColumns,
    s.stockpilesInRows,
    s.gradationSi,
    s.trialsInRows,
    s.summaryInRows,
    s.aggregateTests,
    s.performanceSheets,
  ]),
  layout(13, 'German by binder content', german, false, [
    s.coverBelow,
    s.stockpilesInColumns,
    s.gradationRetained,
    s.trialsByBinder,
    s.moistureStacked,
  ]),
  layout(14, 'French in groups', french, false, [
    s.coverBelow,
    s.stockpilesInRows,
    s.gradationSi,
    s.trialsGrouped,
    s.summaryInRows,
    s.aggregateTests,
  ]),
  layout(15, 'Spanish in rows', spanish, false, [
    s.coverTwoColumns,
    s.stockpilesInColumns,
    s.gradationAcross,
    s.trialsInRows,
    s.maximumGravities,
    s.creepList,
  ]),
  layout(16, 'English, US, in groups', english, true, [
    s.coverBelow,
    s.stockpilesInRows,
    s.gradationUs,
    s.trialsGrouped,
    s.trialsInColumns,
    s.moistureStacked,
    s.creepMatrices,
  ]),
];
