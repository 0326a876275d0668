import type { MappingRule } from '#rules/reading/mapping';
import { mappingSentence } from '#rules/reading/mapping-sentence';
import type { MappingItem, MappingView } from '#shared/contracts/mappings';
import type { listMappingVersions, MappingRow } from '../db/queries/mappings';
import { wordsOfRegistry } from './words-for';

type Versions = Awaited<ReturnType<typeof listMappingVersions>>;

export function presentMappingItem(row: MappingRow, mayChange: boolean): MappingItem {
  const { mapping, laboratory, document, usedBy, changedBy, changedAt } = row;
  return {
    id: mapping.id,
    name: mapping.name,
    laboratory,
    number: mapping.number,
    rules: document.rules.length,
    usedBy,
    changedBy,
    changedAt: changedAt.toISOString(),
    retiredAt: mapping.retiredAt?.toISOString() ?? null,
    version: mapping.version,
    abilities: { change: mayChange },
  };
}

export function presentMapping(row: MappingRow, versions: Versions, mayChange: boolean): MappingView {
  return {
    ...presentMappingItem(row, mayChange),
    sentences: sentencesOf(row.document.rules),
    versions: versions.map(({ version, by }) => ({
      number: version.number,
      rules: version.document.rules.length,
      origin: version.origin,
      by,
      at: version.at.toISOString(),
    })),
  };
}

export function sentencesOf(rules: readonly MappingRule[]): string[] {
  return rules.map((rule) => mappingSentence(rule, wordsOfRegistry));
}
