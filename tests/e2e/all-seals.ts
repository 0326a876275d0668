import { evaluate } from '#rules/engine/evaluate';
import { shippedEditions } from '#tests/builders/shipped-editions';

/** The seal of every case of every shipped set, by file and case. */
export function allSeals(): Record<string, string> {
  const seals: Record<string, string> = {};
  for (const { file, edition } of shippedEditions()) {
    for (const { id, record, context } of edition.cases) {
      seals[`${file} ${id}`] = evaluate(record, edition, context).seal.seal;
    }
  }
  return seals;
}
