import type { Finding } from '#rules/engine/finding';
import { resolvedLimitWords } from '#rules/rule-sets/limit-words';
import { withUnit } from '#shared/format/units';

export interface FindingBrief {
  /** Set in strong type; empty where the rest says it all. */
  title: string;
  rest: string;
}

type Told = Pick<Finding, 'title' | 'kind' | 'outcome' | 'observed' | 'limit' | 'reason' | 'sentence'>;

/** A finding where there is room for a few words only: value before limit, or what is missing or would decide it. */
export function findingBrief(finding: Told): FindingBrief {
  const { title, kind, outcome, observed, limit, reason, sentence } = finding;
  if (kind === 'consistency') return { title: '', rest: sentence };
  if (outcome === 'not shown' || outcome === 'undecided' || observed === null) {
    return { title: reason === '' ? title : `${title}.`, rest: reason };
  }
  const value = withUnit(observed.text, observed.unit);
  const words = limit ? resolvedLimitWords(limit) : '';
  return { title, rest: words === '' ? value : `${value}, ${words}` };
}
