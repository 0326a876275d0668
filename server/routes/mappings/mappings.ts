import {
  changeMapping,
  exportMapping,
  getMapping,
  importMapping,
  listMappings,
  previewImport,
} from '#shared/contracts/mappings';
import { changeMapping as change } from '../../commands/mappings/change-mapping';
import { importMapping as keepImport, planImport } from '../../commands/mappings/import-mapping';
import {
  findMapping,
  findMappingVersion,
  listMappings as list,
  listMappingVersions,
  type MappingRow,
} from '../../db/queries/mappings';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { expectVersion } from '../../middleware/if-match';
import { allow } from '../../policies/allow';
import { changesMappings } from '../../policies/session-abilities';
import { presentMapping, presentMappingItem, sentencesOf } from '../../presenters/present-mapping';
import { Problem } from '../../problem';
import { route } from '../define-route';

const listMappingsRoute = route(listMappings, async ({ deps, actor }) => {
  const mayChange = changesMappings(actor);
  const rows = await list(deps.db, actor.organisationId);
  return {
    mappings: rows.map((row) => presentMappingItem(row, mayChange)),
    abilities: { import: mayChange },
  };
});

const getMappingRoute = route(getMapping, async ({ deps, actor, params }) =>
  viewMapping(deps, actor, await expectMapping(deps, actor, params.mappingId)),
);

const changeMappingRoute = route(changeMapping, async ({ deps, actor, params, body, version, requestId }) => {
  const row = await expectMapping(deps, actor, params.mappingId);
  allow(changesMappings(actor));
  if (row.mapping.version !== version) expectVersion(version, await viewMapping(deps, actor, row));
  await change(deps, { actor, requestId, mapping: row.mapping, version, ...body });
  return viewMapping(deps, actor, await expectMapping(deps, actor, params.mappingId));
});

const exportMappingRoute = route(exportMapping, async ({ deps, actor, params, query }) => {
  const { mapping } = await expectMapping(deps, actor, params.mappingId);
  const number = query.number ?? mapping.number;
  const found = await findMappingVersion(deps.db, actor.organisationId, { mappingId: mapping.id, number });
  if (found === null) throw new Problem('not-found');
  return {
    bytes: Buffer.from(`${JSON.stringify(found.version.document, null, 2)}\n`),
    mediaType: 'application/json',
    fileName: `${found.name} version ${number}.json`,
  };
});

const previewImportRoute = route(previewImport, async ({ deps, actor, body }) => {
  allow(changesMappings(actor));
  const plan = await planImport(deps.db, { actor, ...body });
  const { replaces, added, removed, unchanged } = plan;
  const text =
    replaces === null
      ? `It becomes a mapping of its own, “${body.name}”, for ${plan.laboratory.name}.`
      : `It becomes version ${replaces.number + 1} of “${replaces.name}”, which reads the same layout.`;
  return { replaces, added: sentencesOf(added), removed: sentencesOf(removed), unchanged, text };
});

const importMappingRoute = route(importMapping, async ({ deps, actor, body, requestId }) => {
  allow(changesMappings(actor));
  const id = await keepImport(deps, { actor, requestId, ...body });
  return viewMapping(deps, actor, await expectMapping(deps, actor, id));
});

/** One of the active organisation's; any other answers as absent. */
async function expectMapping(deps: Deps, actor: RequestActor, mappingId: string): Promise<MappingRow> {
  const row = await findMapping(deps.db, actor.organisationId, mappingId);
  if (row === null) throw new Problem('not-found');
  return row;
}

async function viewMapping(deps: Deps, actor: RequestActor, row: MappingRow) {
  const versions = await listMappingVersions(deps.db, actor.organisationId, row.mapping.id);
  return presentMapping(row, versions, changesMappings(actor));
}

export const mappingRoutes = [
  listMappingsRoute,
  getMappingRoute,
  changeMappingRoute,
  exportMappingRoute,
  previewImportRoute,
  importMappingRoute,
];
