import { createHash } from 'node:crypto';
import type { Database } from '../../db/client';
import { files } from '../../db/schema/files';
import type { Deps } from '../../deps';
import { enqueueJob } from '../../jobs/enqueue-job';
import type { Actor } from '../../policies/actor';
import { Problem } from '../../problem';
import type { UploadedFile } from '../../uploaded-file';

export interface NewFile {
  tenant: { agencyId: string; contractorId: string };
  kind: (typeof files.$inferInsert)['kind'];
  file: Pick<UploadedFile, 'fileName' | 'bytes'>;
  mediaType: string;
  createdById: string;
}

/** Keeps uploaded bytes as they came, with their SHA-256. */
export async function storeFile(
  tx: Database,
  { now, newId }: Pick<Deps, 'now' | 'newId'>,
  { tenant, kind, file, mediaType, createdById }: NewFile,
): Promise<string> {
  const id = newId();
  await tx.insert(files).values({
    id,
    agencyId: tenant.agencyId,
    contractorId: tenant.contractorId,
    kind,
    fileName: plainFileName(file.fileName),
    mediaType,
    sizeBytes: file.bytes.length,
    sha256: createHash('sha256').update(file.bytes).digest('hex'),
    bytes: file.bytes,
    createdById,
    createdAt: now(),
  });
  return id;
}

export function expectWorkbook(files: readonly UploadedFile[]): UploadedFile {
  const workbook = files.find(({ field }) => field === 'workbook');
  if (workbook !== undefined) return workbook;
  const detail = 'Choose a workbook.';
  throw new Problem('invalid-input', { detail, errors: [{ pointer: '/workbook', detail }] });
}

export function workbookMediaType(fileName: string): string {
  if (/\.xlsx$/i.test(fileName)) return 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet';
  return /\.csv$/i.test(fileName) ? 'text/csv' : 'application/octet-stream';
}

interface ReadJob {
  actor: Actor;
  revisionId: string;
  fileId: string;
  fileName: string;
}

/** The work that follows an upload, written with it, so that neither stands without the other. */
export async function enqueueReading(
  tx: Database,
  { now, newId }: Pick<Deps, 'now' | 'newId'>,
  { actor, revisionId, fileId, fileName }: ReadJob,
): Promise<void> {
  await enqueueJob(tx, {
    id: newId(),
    organisationId: actor.organisationId,
    kind: 'read',
    subject: { kind: 'revision', id: revisionId },
    payload: { revisionId, fileId },
    progress: `${plainFileName(fileName)} waits to be read.`.slice(0, 300),
    createdById: actor.personId,
    createdAt: now(),
  });
}

/** The name alone, without a path or anything that does not print. */
export function plainFileName(fileName: string): string {
  const name = fileName.split(/[\\/]/).at(-1) ?? '';
  const printable = [...name].filter((sign) => sign >= ' ' && sign !== '\u007f').join('');
  return printable.trim().slice(-255) || 'workbook';
}
