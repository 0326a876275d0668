import type { Recipient, ReturnFields, ReturnView } from '#shared/contracts/returns';

/** What the form of a return starts from: the kept draft. */
export function returnValues(view: ReturnView): ReturnFields {
  return {
    disposition: view.disposition,
    reason: view.reason,
    textAbove: view.textAbove,
    textBelow: view.textBelow,
    to: view.to,
    copies: view.copies,
    included: view.items.filter((item) => item.optional && item.included).map((item) => item.key),
    findingsWorkbook: view.enclosures.findingsWorkbook,
  };
}

export function sameValues(one: ReturnFields, other: ReturnFields): boolean {
  return JSON.stringify(canonical(one)) === JSON.stringify(canonical(other));
}

/** The order in which optional items were ticked means nothing. */
function canonical(fields: ReturnFields): unknown[] {
  const people = (list: Recipient[]) => list.map(({ name, email, function: role }) => [name, email, role]);
  return [
    fields.disposition,
    fields.reason.trim(),
    fields.textAbove,
    fields.textBelow,
    people(fields.to),
    people(fields.copies),
    [...fields.included].sort(),
    fields.findingsWorkbook,
  ];
}

/** A disposition other than the recommended one needs a reason; null where nothing is missing. */
export function reasonWanted(
  fields: Pick<ReturnFields, 'disposition' | 'reason'>,
  recommended: ReturnView['recommended'],
): string | null {
  if (fields.disposition === recommended || fields.reason.trim() !== '') return null;
  return `The findings recommend "${recommended}". Say why you decide otherwise.`;
}
