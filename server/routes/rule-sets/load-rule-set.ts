import { resolvedEditionHash } from '#rules/engine/seal';
import { type ResolvedEdition, resolveEdition } from '#rules/rule-sets/resolve';
import { type Layer, parseRuleSet, type RuleSet } from '#rules/rule-sets/schema';
import { editionDocument } from '../../db/queries/editions';
import { type ListedEdition, listAgencyEditions, visibleRuleSets } from '../../db/queries/rule-sets';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { Problem } from '../../problem';

export interface LoadedRuleSet {
  agency: { id: string; name: string; timeZone: string };
  edition: ListedEdition;
  /** Every edition of the agency that the reader may see, layers among them. */
  all: ListedEdition[];
  layers: ListedEdition[];
  base: ResolvedEdition;
  resolved: ResolvedEdition;
  hash: string;
}

interface Place {
  ruleSetId: string;
  edition: string;
  /** `cvra-s-07@2026,…` in order. */
  layers: string | undefined;
}

/** An edition as it was written, where the reader's organisation may see it. */
export async function loadDocument(
  deps: Deps,
  actor: RequestActor,
  { ruleSetId, edition: name }: Pick<Place, 'ruleSetId' | 'edition'>,
): Promise<Record<string, unknown>> {
  for (const { agency, editions } of await visibleRuleSets(deps.db, actor)) {
    const edition = editions.find((each) => each.ruleSetKey === ruleSetId && each.edition === name);
    if (edition === undefined) continue;
    const place = { agencyId: agency.id, editionId: edition.id };
    const document = edition.document ?? (await editionDocument(deps.db, place));
    if (document !== null) return document;
  }
  throw new Problem('not-found');
}

/** An edition with the chosen layers applied, where the reader's organisation may see it. */
export async function loadRuleSet(deps: Deps, actor: RequestActor, place: Place): Promise<LoadedRuleSet> {
  for (const { agency, editions } of await visibleRuleSets(deps.db, actor)) {
    const edition = editions.find(
      (each) => each.ruleSetKey === place.ruleSetId && each.edition === place.edition,
    );
    if (edition === undefined) continue;
    const layers = chosenLayers(place.layers, editions);
    return { agency, edition, all: editions, layers, ...(await resolve(deps, agency.id, edition, layers)) };
  }
  throw new Problem('not-found');
}

function chosenLayers(text: string | undefined, editions: readonly ListedEdition[]): ListedEdition[] {
  const names = (text ?? '').split(',').filter((name) => name !== '');
  return names.map((name) => {
    const layer = editions.find((each) => each.layerOfKey !== null && layerName(each) === name);
    if (layer !== undefined) return layer;
    const detail = `There is no layer “${name}”.`;
    throw new Problem('invalid-input', { detail, errors: [{ pointer: '/query/layers', detail }] });
  });
}

export function layerName({ ruleSetKey, edition }: Pick<ListedEdition, 'ruleSetKey' | 'edition'>): string {
  return `${ruleSetKey}@${edition}`;
}

async function resolve(deps: Deps, agencyId: string, edition: ListedEdition, layers: ListedEdition[]) {
  // A layer alone is shown over the edition that it was made for.
  const under = edition.layerOfKey === null ? edition : await editionUnder(deps, agencyId, edition);
  const over = edition.layerOfKey === null ? layers : [edition, ...layers];
  const base = await documentOf(deps, agencyId, under);
  const documents = await Promise.all(over.map((each) => documentOf(deps, agencyId, each)));
  const alone = expectResolved(resolveEdition(base));
  const resolved = expectResolved(resolveEdition(base, documents));
  return { base: alone, resolved, hash: resolvedEditionHash(resolved) };
}

async function editionUnder(deps: Deps, agencyId: string, layer: ListedEdition): Promise<ListedEdition> {
  const all = await listAgencyEditions(deps.db, agencyId);
  const found = all.find(
    (each) => each.ruleSetKey === layer.layerOfKey && each.edition === layer.layerOfEdition,
  );
  if (found === undefined) throw new Problem('not-found');
  return found;
}

async function documentOf(deps: Deps, agencyId: string, edition: ListedEdition): Promise<RuleSet | Layer> {
  const document = edition.document ?? (await editionDocument(deps.db, { agencyId, editionId: edition.id }));
  const parsed = parseRuleSet(document);
  if (parsed.ok) return parsed.ruleSet;
  throw refused(parsed.problems);
}

function expectResolved(resolution: ReturnType<typeof resolveEdition>): ResolvedEdition {
  if (resolution.ok) return resolution.edition;
  throw refused(resolution.problems);
}

function refused(problems: { pointer: string; detail: string; fix: string }[]): Problem {
  return new Problem('rule-set-refused', {
    detail: problems[0]?.detail ?? 'The edition cannot be used.',
    errors: problems,
  });
}
