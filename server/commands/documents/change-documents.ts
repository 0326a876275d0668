import { and, eq } from 'drizzle-orm';
import { withStandardDocuments } from '#rules/rule-sets/document-types';
import { limits } from '#shared/limits';
import type { Database } from '../../db/client';
import { documents } from '../../db/schema/submittals';
import type { Deps } from '../../deps';
import { Problem } from '../../problem';
import type { UploadedFile } from '../../uploaded-file';
import { changeDraft, type DraftChange } from '../readings/change-draft';
import { storeFile } from '../submittals/store-workbook';
import { documentMediaType } from './document-media-type';

export interface DocumentFields {
  type: string;
  issuer: string | null;
  reference: string | null;
  date: string | null;
  validTo: string | null;
}

/** A certificate or report that the workbook does not list, with its file where there is one. */
export async function addDocument(
  deps: Deps,
  act: DraftChange & { fields: DocumentFields; file: UploadedFile | undefined },
): Promise<void> {
  const { row, fields, file } = act;
  await changeDraft(deps, act, async (tx, { edition }) => {
    if (!withStandardDocuments(edition.documents).some(({ type }) => type === fields.type)) {
      const detail = 'Choose the kind of document from the list.';
      throw new Problem('invalid-input', { detail, errors: [{ pointer: '/type', detail }] });
    }
    const { id: revisionId, agencyId, contractorId } = row.revision;
    await tx.insert(documents).values({
      id: deps.newId(),
      revisionId,
      agencyId,
      contractorId,
      position: 1000,
      ...fields,
      source: null,
      stated: null,
      added: true,
      fileId: file === undefined ? null : await storeDocumentFile(tx, deps, act, file),
    });
    return undefined;
  });
}

export async function attachFile(
  deps: Deps,
  act: DraftChange & { documentId: string; file: UploadedFile },
): Promise<void> {
  await changeDraft(deps, act, async (tx) => {
    const document = await expectDocument(tx, act);
    const fileId = await storeDocumentFile(tx, deps, act, act.file);
    await tx
      .update(documents)
      .set({ fileId, version: document.version + 1 })
      .where(eq(documents.id, document.id));
    return undefined;
  });
}

/** Removes a row that was added on the page; of one that was read, only its file. */
export async function removeDocument(deps: Deps, act: DraftChange & { documentId: string }): Promise<void> {
  await changeDraft(deps, act, async (tx) => {
    const document = await expectDocument(tx, act);
    if (document.added) await tx.delete(documents).where(eq(documents.id, document.id));
    else {
      await tx
        .update(documents)
        .set({ fileId: null, version: document.version + 1 })
        .where(eq(documents.id, document.id));
    }
    return undefined;
  });
}

async function expectDocument(tx: Database, { row, documentId }: DraftChange & { documentId: string }) {
  const [document] = await tx
    .select()
    .from(documents)
    .where(and(eq(documents.id, documentId), eq(documents.revisionId, row.revision.id)));
  if (document === undefined) throw new Problem('not-found');
  return document;
}

async function storeDocumentFile(
  tx: Database,
  deps: Deps,
  { row, actor }: DraftChange,
  file: UploadedFile,
): Promise<string> {
  const mediaType = documentMediaType(file.bytes);
  if (mediaType === null) {
    throw new Problem('file-refused', {
      detail: `${file.fileName} is neither a PDF nor a PNG or JPEG image.`,
      fix: 'Save the document as a PDF, or as a PNG or JPEG image, and attach that.',
    });
  }
  if (file.bytes.length > limits.documentBytes) {
    throw new Problem('too-large', {
      detail: `${file.fileName} is larger than ${limits.documentBytes / 1024 / 1024} MB.`,
    });
  }
  return storeFile(tx, deps, {
    tenant: row.revision,
    kind: 'document',
    file,
    mediaType,
    createdById: actor.personId,
  });
}
