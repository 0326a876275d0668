import { memo, useState } from 'react';
import { FileTrigger } from 'react-aria-components';
import { type DocumentRow, getDocumentFile, type ReadingView } from '#shared/contracts/readings';
import { formatDate } from '#shared/format/dates';
import { formatBytes } from '#shared/format/units';
import { limits } from '#shared/limits';
import { Button } from '../../../components/ui/button';
import { FieldErrorLine } from '../../../components/ui/field';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { hrefOf } from '../../../lib/api';
import { asProblem } from '../../../lib/problem';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useAttachFile } from '../api/attach-file';
import { useRemoveDocument } from '../api/remove-document';
import { documentFileFault, documentFileTypes } from '../lib/document-file';
import { AddDocument } from './add-document';

/** Certificates and reports: what is stated, and its file where it is enclosed. */
export const DocumentList = memo(function DocumentList({
  params,
  reading,
}: {
  params: RevisionParams;
  reading: ReadingView;
}) {
  const [isAdding, setIsAdding] = useState(false);
  const { documents, abilities } = reading;
  const enclosed = documents.filter((row) => row.file !== null).length;
  return (
    <section aria-labelledby="documents">
      <div className="side-head">
        <h2 id="documents">Certificates and reports</h2>
        <span>
          {documents.length === 0 ? 'none stated' : `${documents.length} stated, ${enclosed} enclosed`}
        </span>
      </div>
      <ul>
        {documents.map((row) => (
          <DocumentLine key={row.id} params={params} row={row} canAttach={abilities.attach} />
        ))}
      </ul>
      {abilities.attach ? (
        isAdding ? (
          <AddDocument params={params} onDone={() => setIsAdding(false)} />
        ) : (
          <Button kind="text" onPress={() => setIsAdding(true)}>
            Add a certificate or report
          </Button>
        )
      ) : null}
    </section>
  );
});

function DocumentLine({
  params,
  row,
  canAttach,
}: {
  params: RevisionParams;
  row: DocumentRow;
  canAttach: boolean;
}) {
  const attach = useAttachFile(params);
  const remove = useRemoveDocument(params);
  const [fault, setFault] = useState<string | null>(null);
  const choose = (files: FileList | null) => {
    const file = files?.[0];
    if (!file) return;
    const found = documentFileFault(file, limits.documentBytes);
    setFault(found);
    if (!found) attach.mutate({ documentId: row.id, file });
  };
  const problem = attach.error ?? remove.error;
  return (
    <li className="document">
      <p>
        <b>{row.label}</b> <span className="mute">{statedOf(row)}</span>
      </p>
      <p className="document-file">
        {row.file ? (
          <a
            href={hrefOf(getDocumentFile, { params: { ...params, documentId: row.id } })}
            target="_blank"
            rel="noreferrer"
          >
            {row.file.fileName}, {formatBytes(row.file.bytes)}
          </a>
        ) : (
          <span className="faint">stated, not enclosed</span>
        )}
        {canAttach ? (
          <FileTrigger acceptedFileTypes={documentFileTypes} onSelect={choose}>
            <Button
              kind="inline"
              isPending={attach.isPending}
              aria-label={`${row.file ? 'Replace' : 'Attach'} the file of ${row.label}`}
            >
              {row.file ? 'Replace' : 'Attach a file'}
            </Button>
          </FileTrigger>
        ) : null}
        {canAttach && (row.added || row.file) ? (
          <Button
            kind="inline"
            isPending={remove.isPending}
            onPress={() => remove.mutate({ documentId: row.id })}
            aria-label={`Remove ${row.added ? '' : 'the file of '}${row.label}`}
          >
            {row.added ? 'Remove' : 'Remove the file'}
          </Button>
        ) : null}
      </p>
      {fault ? <FieldErrorLine>{fault}</FieldErrorLine> : null}
      {problem ? (
        <ProblemNotice problem={asProblem(problem)} unaffected="The other documents stand as they were." />
      ) : null}
    </li>
  );
}

function statedOf(row: DocumentRow): string {
  const parts = [
    row.issuer,
    row.reference,
    row.date ? formatDate(row.date) : 'no date stated',
    row.validTo ? `valid to ${formatDate(row.validTo)}` : null,
    row.source ? `${row.source.sheet} ${row.source.cell}`.trim() : null,
  ];
  return parts.filter((part) => part !== null && part !== '').join(' · ');
}
