import { withStandardDocuments } from '#rules/rule-sets/document-types';
import {
  addDocument,
  attachFile,
  getDocumentFile,
  getDocumentTypes,
  removeDocument,
} from '#shared/contracts/readings';
import {
  addDocument as add,
  attachFile as attach,
  removeDocument as remove,
} from '../../commands/documents/change-documents';
import { listDocuments, loadFile } from '../../db/queries/records';
import { loadResolvedEdition } from '../../db/resolved-edition';
import { Problem } from '../../problem';
import type { UploadedFile } from '../../uploaded-file';
import { route } from '../define-route';
import { expectDraft } from '../readings/expect-draft';
import { viewReading } from '../readings/view-reading';
import { expectRevision } from '../submittals/load-revision';

export const addDocumentRoute = route(addDocument, async ({ deps, params, body, files, actor }) => {
  const row = await expectDraft(deps, actor, params, null);
  const given = (text: string) => (text === '' ? null : text);
  const fields = {
    type: body.type,
    issuer: given(body.issuer),
    reference: given(body.reference),
    date: given(body.date),
    validTo: given(body.validTo),
  };
  await add(deps, { actor, row, fields, file: files.find(({ field }) => field === 'file') });
  return viewReading(deps, actor, await expectRevision(deps, actor, params));
});

export const attachFileRoute = route(attachFile, async ({ deps, params, files, version, actor }) => {
  const row = await expectDraft(deps, actor, params, version);
  await attach(deps, { actor, row, documentId: params.documentId, file: expectFile(files) });
  return viewReading(deps, actor, await expectRevision(deps, actor, params));
});

export const removeDocumentRoute = route(removeDocument, async ({ deps, params, version, actor }) => {
  const row = await expectDraft(deps, actor, params, version);
  await remove(deps, { actor, row, documentId: params.documentId });
  return viewReading(deps, actor, await expectRevision(deps, actor, params));
});

export const getDocumentFileRoute = route(getDocumentFile, async ({ deps, params, actor }) => {
  const row = await expectRevision(deps, actor, params);
  const found = (await listDocuments(deps.db, actor, row.revision.id)).find(
    ({ document }) => document.id === params.documentId,
  );
  const file = found?.file == null ? null : await loadFile(deps.db, actor, found.file.id);
  if (file === null) throw new Problem('not-found');
  return { ...file, inline: true };
});

export const getDocumentTypesRoute = route(getDocumentTypes, async ({ deps, params, actor }) => {
  const { section } = (await expectRevision(deps, actor, params)).revision;
  const edition = await loadResolvedEdition(deps.db, section.resolvedHash);
  const types = withStandardDocuments(edition.documents);
  return {
    types: types.map(({ type, label }) => ({ type, label: label ?? type })),
    asOf: deps.now().toISOString(),
  };
});

function expectFile(files: readonly UploadedFile[]): UploadedFile {
  const file = files.find(({ field }) => field === 'file');
  if (file !== undefined) return file;
  const detail = 'Choose a file.';
  throw new Problem('invalid-input', { detail, errors: [{ pointer: '/file', detail }] });
}
