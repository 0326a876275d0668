import type { MixRecord } from '#rules/record';
import {
  exportRuleSet,
  getRuleSet,
  getRuleSetDocument,
  getRuleSetExample,
  getRuleSetTemplate,
  listRuleSets,
} from '#shared/contracts/rule-sets';
import { dateOfInstant } from '#shared/format/dates';
import { keepResolvedEdition } from '../../commands/projects/resolve-section';
import { editionReference } from '../../db/queries/editions';
import { type AgencyRuleSets, visibleRuleSets } from '../../db/queries/rule-sets';
import type { Deps } from '../../deps';
import { layersOf } from '../../policies/edition-dates';
import { presentEdition } from '../../presenters/present-edition';
import { ruleSetContents } from '../../presenters/rule-set-view';
import { Problem } from '../../problem';
import { route } from '../define-route';
import { exampleOf } from './example-of';
import { type LoadedRuleSet, layerName, loadDocument, loadRuleSet } from './load-rule-set';
import { ruleSetFile } from './rule-set-file';

export const listRuleSetsRoute = route(listRuleSets, async ({ deps, actor }) => {
  const agencies = await visibleRuleSets(deps.db, actor);
  return { ruleSets: agencies.flatMap((each) => ruleSetsOf(deps, each)) };
});

function ruleSetsOf(deps: Deps, { agency, editions }: AgencyRuleSets) {
  const today = dateOfInstant(deps.now().toISOString(), agency.timeZone);
  const keys = [...new Set(editions.map(({ ruleSetKey }) => ruleSetKey))];
  return keys.map((id) => {
    const own = editions.filter(({ ruleSetKey }) => ruleSetKey === id);
    return {
      id,
      title: own.at(-1)?.title ?? id,
      agency: agency.name,
      editions: own.map((edition) => presentEdition(edition, { all: editions, today })),
    };
  });
}

export const getRuleSetRoute = route(getRuleSet, async ({ deps, actor, params, query }) => {
  const loaded = await loadRuleSet(deps, actor, { ...params, layers: query.layers });
  const { agency, edition, all, layers, base, resolved, hash } = loaded;
  const today = dateOfInstant(deps.now().toISOString(), agency.timeZone);
  const others = all.filter((each) => each.ruleSetKey === edition.ruleSetKey && each.id !== edition.id);
  const over = layersOver(edition, all);
  return {
    ...presentEdition(edition, { all, today }),
    agency: agency.name,
    layers: layers.map(editionReference),
    availableLayers: over.map(editionReference),
    otherEditions: others.map((each) => presentEdition(each, { all, today })),
    ...ruleSetContents(resolved, base),
    caseCount: resolved.cases.length,
    hash,
    templateHref: workbookHref('template', params, layers),
    exampleHref: exampleOf(loaded) === null ? null : workbookHref('example', params, layers),
  };
});

export const getRuleSetTemplateRoute = route(getRuleSetTemplate, async ({ deps, actor, params, query }) =>
  sendWorkbook(deps, 'template', await loadRuleSet(deps, actor, { ...params, layers: query.layers })),
);

export const getRuleSetExampleRoute = route(getRuleSetExample, async ({ deps, actor, params, query }) => {
  const loaded = await loadRuleSet(deps, actor, { ...params, layers: query.layers });
  const example = exampleOf(loaded);
  if (example === null) throw new Problem('not-found');
  return sendWorkbook(deps, 'example', loaded, example);
});

async function sendWorkbook(
  deps: Deps,
  kind: 'template' | 'example',
  { edition, resolved }: LoadedRuleSet,
  example?: MixRecord,
) {
  // A filled-in template names this edition by its hash, so it has to be found again.
  const editionHash = await keepResolvedEdition(deps.db, deps, resolved);
  const { writeTemplate } = await import('../../workbook/write-template');
  return {
    bytes: await writeTemplate(resolved, { editionHash, ...(example ? { example } : {}) }),
    mediaType: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
    fileName: `${edition.ruleSetKey} ${edition.edition} ${kind}.xlsx`,
  };
}

export const getRuleSetDocumentRoute = route(getRuleSetDocument, async ({ deps, actor, params }) => ({
  document: await loadDocument(deps, actor, params),
}));

export const exportRuleSetRoute = route(exportRuleSet, async ({ deps, actor, params }) =>
  ruleSetFile(await loadDocument(deps, actor, params), `${params.ruleSetId} ${params.edition}`),
);

function layersOver(edition: AgencyRuleSets['editions'][number], all: AgencyRuleSets['editions']) {
  const dated = all.flatMap((each) =>
    each.effectiveFrom === null || each.draftState !== null
      ? []
      : [{ ...each, effectiveFrom: each.effectiveFrom }],
  );
  return layersOf({ ...edition, effectiveFrom: edition.effectiveFrom ?? '' }, dated);
}

function workbookHref(
  kind: 'template' | 'example',
  { ruleSetId, edition }: { ruleSetId: string; edition: string },
  layers: LoadedRuleSet['layers'],
): string {
  const path = `/api/rule-sets/${encodeURIComponent(ruleSetId)}/${encodeURIComponent(edition)}/${kind}.xlsx`;
  if (layers.length === 0) return path;
  return `${path}?layers=${encodeURIComponent(layers.map(layerName).join(','))}`;
}
