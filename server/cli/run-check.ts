import { evaluate } from '#rules/engine/evaluate';
import type { CheckResult } from '#rules/engine/finding';
import { readWorkbook } from '#rules/reading/interpret';
import { readAnyLayout } from '#rules/reading/read-any-layout';
import type { ReadingResult } from '#rules/reading/reading-result';
import type { AttributeValue, MixRecord } from '#rules/record';
import { parseCheckArguments } from './check-arguments';
import { findingsTable } from './findings-table';
import { InputFault } from './input-fault';
import { loadAttributes, loadEdition, loadGrid, loadMapping } from './load-check-inputs';

export interface Output {
  out(text: string): void;
  err(text: string): void;
}

/**
 * The engine from the command line: a workbook and rule sets in, findings out; no server and no database.
 * The number is the exit code: 0 nothing required is open, 1 something is, 2 the input could not be used.
 */
export async function runCheck(argv: string[], output: Output): Promise<0 | 1 | 2> {
  try {
    return await check(argv, output);
  } catch (error) {
    const line = error instanceof InputFault ? error.message : `The check broke off: ${String(error)}`;
    output.err(`${line.replace(/\s*\n\s*/g, ' ')}\n`);
    return 2;
  }
}

async function check(argv: string[], output: Output): Promise<0 | 1> {
  const given = parseCheckArguments(argv);
  const edition = await loadEdition(given.rules, given.layers);
  const attributes = await loadAttributes(given.attributes, edition);
  const grid = await loadGrid(given.workbook);
  const mapping = await loadMapping(given.mapping, grid, edition);
  const read =
    mapping === null || mapping.rest === 'headings'
      ? readAnyLayout({ grid, edition, answers: [], mapping })
      : readWorkbook({ grid, mapping, edition, answers: [] });
  const reading = withAttributes(read, attributes);
  const context = { submittedOn: given.submittedOn, lettingOn: given.lettingOn, facts: {} };
  const result = evaluate(reading.record, edition, context);
  output.out(`${given.json ? asJson(reading, result) : findingsTable(result, reading)}\n`);
  return hasOpenRequirement(result) ? 1 : 0;
}

/** Attributes that are given win without a word, so no doubt about one of them remains. */
function withAttributes(reading: ReadingResult, attributes: Record<string, AttributeValue>): ReadingResult {
  const doubts = reading.doubts.filter(
    ({ about }) => about.attribute === undefined || !(about.attribute in attributes),
  );
  const record: MixRecord = {
    ...reading.record,
    attributes: { ...reading.record.attributes, ...attributes },
    doubts,
  };
  return { ...reading, record, doubts };
}

function asJson({ record, unread, doubts, departures }: ReadingResult, check: CheckResult): string {
  const { analysis, summary, findings, seal } = check;
  const reading = { unread, doubts, ...(departures.length > 0 ? { departures } : {}) };
  return JSON.stringify({ record, reading, analysis, summary, findings, seal }, null, 2);
}

function hasOpenRequirement({ findings }: CheckResult): boolean {
  return findings.some(
    ({ severity, outcome }) =>
      severity === 'required' && (outcome === 'fail' || outcome === 'not shown' || outcome === 'undecided'),
  );
}
