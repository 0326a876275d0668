import { z } from 'zod';
import { type SearchResult, search } from '#shared/contracts/search';
import { slug } from '#shared/format/finding-key';
import { editionDocument } from '../../db/queries/editions';
import { type ListedEdition, visibleRuleSets } from '../../db/queries/rule-sets';
import { resultsPerKind, searchProjects, searchSubmittals } from '../../db/queries/search';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { route } from '../define-route';

export const searchRoute = route(search, async ({ deps, query: { q }, actor }) => {
  const [submittals, projects, clauses] = await Promise.all([
    searchSubmittals(deps.db, actor, q),
    searchProjects(deps.db, actor, q),
    searchClauses(deps, actor, q),
  ]);
  const results: SearchResult[] = [
    ...submittals.map(({ id, mixDesignation, project, revision }) => ({
      kind: 'submittal' as const,
      title: `${mixDesignation} revision ${revision.number}`,
      detail: [project.number, project.title, revision.description].filter((part) => part !== '').join(' · '),
      href: `/submittals/${id}/r/${revision.number}`,
    })),
    ...projects.map(({ id, number, title }) => ({
      kind: 'project' as const,
      title: number,
      detail: title,
      href: `/projects/${id}`,
    })),
    ...clauses,
  ];
  return { results };
});

async function searchClauses(deps: Deps, actor: RequestActor, q: string): Promise<SearchResult[]> {
  const wanted = q.toLowerCase();
  const found: SearchResult[] = [];
  for (const { agency, editions } of await visibleRuleSets(deps.db, actor)) {
    // The newest edition of each rule set first: that is what people mean.
    for (const edition of editions.toReversed()) {
      for (const rule of await rulesOf(deps, agency.id, edition)) {
        if (found.length >= resultsPerKind) return found;
        const matches = `${rule.clause} ${rule.title}`.toLowerCase().includes(wanted);
        if (matches) found.push(clauseResult(rule, edition));
      }
    }
  }
  return found;
}

interface NamedRule {
  id: string;
  clause: string;
  title: string;
}

function clauseResult(rule: NamedRule, edition: ListedEdition): SearchResult {
  const path = `${encodeURIComponent(edition.ruleSetKey)}/${encodeURIComponent(edition.edition)}`;
  return {
    kind: 'clause',
    title: `${rule.clause} ${rule.title}`,
    detail: `${edition.title}, edition ${edition.edition}`,
    href: `/rule-sets/${path}#rule-${slug(rule.id)}`,
  };
}

const namedRuleSchema = z.object({ id: z.string(), clause: z.string(), title: z.string() });
const ruleList = z.array(namedRuleSchema).default([]);
const documentRulesSchema = z.object({
  rules: ruleList,
  add: z.object({ rules: ruleList }).default({ rules: [] }),
  replace: z.object({ rules: ruleList }).default({ rules: [] }),
});

/** Published editions never change, so their clauses are read once. */
const rulesByEdition = new Map<string, NamedRule[]>();

async function rulesOf(deps: Deps, agencyId: string, edition: ListedEdition): Promise<NamedRule[]> {
  if (edition.draftState !== null) return namesIn(edition.document);
  const kept = rulesByEdition.get(edition.id);
  if (kept !== undefined) return kept;
  const rules = namesIn(await editionDocument(deps.db, { agencyId, editionId: edition.id }));
  rulesByEdition.set(edition.id, rules);
  return rules;
}

/** A draft may be unfinished: what cannot be read yet cannot be found. */
function namesIn(document: unknown): NamedRule[] {
  const parsed = documentRulesSchema.safeParse(document);
  if (!parsed.success) return [];
  return [...parsed.data.rules, ...parsed.data.add.rules, ...parsed.data.replace.rules];
}
