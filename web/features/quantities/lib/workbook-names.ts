import type { Quantity } from '#rules/quantities/quantity';
import { aggregateWords } from '#rules/reading/words/aggregate-words';
import { performanceWords } from '#rules/reading/words/performance-words';
import { volumetricWords } from '#rules/reading/words/volumetric-words';

/** Every name under which a workbook in English, German, French or Spanish is read as this quantity, each once. */
export function workbookNames({ id, aliases }: Pick<Quantity, 'id' | 'aliases'>): string[] {
  const phrases = [volumetricWords, aggregateWords, performanceWords].flatMap(
    (words) => words[id]?.split('|') ?? [],
  );
  const names = new Map<string, string>();
  for (const name of [...aliases, ...phrases].map((each) => each.replace(/\s+/g, ' ').trim())) {
    if (name !== '' && !names.has(name.toLowerCase())) names.set(name.toLowerCase(), name);
  }
  return [...names.values()];
}
