import type { CheckContext, MixRecord } from '../record';
import type { ResolvedEdition } from '../rule-sets/resolve';
import { andList, capitalised, uncapitalised } from '../rule-sets/words';
import { analyse } from './analyse';
import { attributeFact, attributeText } from './attribute-fact';
import type { Explanation } from './explanation';
import { type Finding, findingKey } from './finding';
import { roomToMove } from './room-to-move';
import { toPass } from './to-pass';
import { type World, worldOf } from './world';

/**
 * Explanations of findings, by key. Apart from the check, because it is asked of few findings and a check has to be
 * quick; the same record, edition and context give the same words.
 */
export function explainFindings(input: {
  record: MixRecord;
  edition: ResolvedEdition;
  context: CheckContext;
  findings: readonly Finding[];
}): Record<string, Explanation> {
  const { record, edition, context, findings } = input;
  const world = worldOf({ record, edition, context, analysis: analyse(record, edition.designPoint) });
  const asked = { world, room: roomToMove(world) };
  const rules = new Map(edition.rules.map((rule) => [rule.id, rule]));
  return Object.fromEntries(
    findings.flatMap((finding) => {
      const rule = rules.get(finding.rule);
      const whyThisLimit = whyThisLimitWords(world, finding);
      const ways = rule === undefined ? [] : toPass(asked, rule, finding);
      if (whyThisLimit === null && ways.length === 0) return [];
      return [[findingKey(finding), { whyThisLimit, toPass: ways }] as const];
    }),
  );
}

/** "Design traffic 12, in the row 10 to below 30: Dust proportion of Section 412, 2026 gives the limit." */
function whyThisLimitWords(world: World, { limit, outcome }: Finding): string | null {
  const from = limit?.from ?? null;
  if (limit === null || from === null || outcome === 'not applicable') return null;
  if (limit.min === null && limit.max === null && limit.oneOf === null) return null;
  const displaced = from.displaced.map(
    ({ document, text }) => ` It stands in place of ${text} of ${document}.`,
  );
  if (from.table === null) return `${from.document} sets it in the rule itself.${displaced.join('')}`;
  const keys = Object.entries(from.row ?? {}).map(([name, cell]) => keyWords(world, name, cell));
  const row = keys.length === 0 ? '' : `${capitalised(andList(keys))}: `;
  return `${row}${from.tableTitle ?? from.table} of ${from.document} gives the limit.${displaced.join('')}`;
}

function keyWords(world: World, name: string, cell: string): string {
  if (name === 'sieve') return `sieve ${cell}`;
  const label = uncapitalised(world.view.attributeLabel(name));
  const fact = attributeFact(world, name);
  const own = fact.kind === 'value' ? attributeText(world, name, fact.value) : null;
  return own === null || own === cell ? `${label} ${cell}` : `${label} ${own}, in the row ${cell}`;
}
