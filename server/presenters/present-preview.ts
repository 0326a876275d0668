import { type CheckResult, type Finding, findingKey } from '#rules/engine/finding';
import type { WordsFor } from '#rules/reading/mapping-sentence';
import { conditionsKey } from '#rules/reading/reading-log';
import { conditionsInWords } from '#rules/reading/take-words';
import type { MixRecord, Reading } from '#rules/record';
import { attributeLabel } from '#rules/rule-sets/attribute';
import type { ReadingPreview } from '#shared/contracts/corrections';

interface Judged {
  record: MixRecord;
  result: CheckResult;
}

interface Preview {
  before: Judged;
  after: Judged;
  words: WordsFor;
  learning: { learned: string[]; notLearned: string[] };
}

/** So many readings are looked through; the counts say how many there are. */
const mostShown = 200;

export function presentPreview({ before, after, words, learning }: Preview): ReadingPreview {
  const readings = changedReadings(before.record.readings, after.record.readings, words);
  const placeOf = ({ sheet, cell }: { sheet: string; cell: string }) => `${sheet}!${cell}`;
  const known = new Set(before.record.doubts.map(placeOf));
  return {
    counts: {
      added: readings.filter((each) => each.before === null).length,
      removed: readings.filter((each) => each.after === null).length,
      changed: readings.filter((each) => each.before !== null && each.after !== null).length,
    },
    readings: readings.slice(0, mostShown),
    attributes: changedAttributes(before.record, after.record, words),
    doubts: {
      before: before.record.doubts.length,
      after: after.record.doubts.length,
      raised: after.record.doubts
        .filter((doubt) => !known.has(placeOf(doubt)))
        .map(({ sheet, cell, reason }) => ({ sheet, cell, reason })),
    },
    findings: changedFindings(before.result.findings, after.result.findings),
    summary: { before: before.result.summary, after: after.result.summary },
    ...learning,
  };
}

/** "Gmb, trial B, specimen 3" */
export function readingLabel({ quantity, at }: Pick<Reading, 'quantity' | 'at'>, words: WordsFor): string {
  return [words.quantity(quantity)?.symbol ?? quantity, ...conditionsInWords(at)].join(', ');
}

function changedReadings(
  before: readonly Reading[],
  after: readonly Reading[],
  words: WordsFor,
): ReadingPreview['readings'] {
  const [earlier, later] = [byPlace(before), byPlace(after)];
  const gone = before.filter((each) => !later.has(keyOf(each)));
  const rest = after.flatMap((reading) => {
    const was = earlier.get(keyOf(reading)) ?? null;
    if (was !== null && sameValue(was, reading)) return [];
    return [{ before: was, after: reading, label: readingLabel(reading, words) }];
  });
  return [
    ...rest,
    ...gone.map((reading) => ({ before: reading, after: null, label: readingLabel(reading, words) })),
  ];
}

function byPlace(readings: readonly Reading[]): Map<string, Reading> {
  return new Map(readings.map((reading) => [keyOf(reading), reading]));
}

function keyOf({ quantity, at }: Reading): string {
  return `${quantity}|${conditionsKey(at)}`;
}

function sameValue(one: Reading, other: Reading): boolean {
  return one.value === other.value && one.qualifier === other.qualifier && one.origin === other.origin;
}

function changedAttributes(
  before: MixRecord,
  after: MixRecord,
  words: WordsFor,
): ReadingPreview['attributes'] {
  const names = new Set([...Object.keys(before.attributes), ...Object.keys(after.attributes)]);
  return [...names].flatMap((name) => {
    const [was, is] = [before.attributes[name]?.value ?? null, after.attributes[name]?.value ?? null];
    if (was === is) return [];
    const attribute = words.attribute(name);
    return [{ name, label: attribute ? attributeLabel(attribute) : name, before: was, after: is }];
  });
}

function changedFindings(before: readonly Finding[], after: readonly Finding[]): ReadingPreview['findings'] {
  const earlier = new Map(before.map((finding) => [findingKey(finding), finding]));
  const later = new Map(after.map((finding) => [findingKey(finding), finding]));
  return [...new Set([...later.keys(), ...earlier.keys()])].flatMap((key) => {
    const [was, is] = [earlier.get(key) ?? null, later.get(key) ?? null];
    const told = is ?? was;
    if (told === null || (was?.outcome === is?.outcome && was?.borderline === is?.borderline)) return [];
    const { clause, title, severity } = told;
    return [{ key, clause, title, severity, before: shown(was), after: shown(is) }];
  });
}

function shown(finding: Finding | null) {
  return finding && { outcome: finding.outcome, borderline: finding.borderline, sentence: finding.sentence };
}
