import { useState } from 'react';
import { addDocument } from '#shared/contracts/readings';
import { limits } from '#shared/limits';
import { Button } from '../../../components/ui/button';
import { FieldErrorLine } from '../../../components/ui/field';
import { FileDrop } from '../../../components/ui/file-drop';
import { FormText } from '../../../components/ui/form-fields';
import { FormSelect } from '../../../components/ui/form-select';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { useContractForm } from '../../../lib/form';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useAddDocument } from '../api/add-document';
import { useDocumentTypes } from '../api/get-document-types';
import { documentFileFault, documentFileTypes } from '../lib/document-file';

export function AddDocument({ params, onDone }: { params: RevisionParams; onDone: () => void }) {
  const types = useDocumentTypes(params);
  const add = useAddDocument(params);
  const [file, setFile] = useState<File | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  const { form, problem, onSubmit } = useContractForm({
    schema: addDocument.body!,
    defaultValues: { type: '', issuer: '', reference: '', date: '', validTo: '' },
    submit: async (fields) => {
      await add.mutateAsync({ fields, file });
      onDone();
    },
  });
  const choose = (chosen: File) => {
    const found = documentFileFault(chosen, limits.documentBytes);
    setFault(found);
    setFile(found ? null : chosen);
  };
  return (
    <form onSubmit={onSubmit} noValidate className="add-document" aria-label="Add a certificate or report">
      {problem ? <ProblemNotice problem={problem} /> : null}
      <FormSelect
        control={form.control}
        name="type"
        label="Kind"
        choices={(types.data?.types ?? []).map(({ type, label }) => ({ value: type, label }))}
      />
      <FormText control={form.control} name="issuer" label="Issuer" />
      <FormText control={form.control} name="reference" label="Reference" />
      <FormText control={form.control} name="date" label="Date" type="date" />
      <FormText control={form.control} name="validTo" label="Valid to" type="date" />
      <FileDrop
        title={file ? file.name : 'Drop its file'}
        help={file ? 'Drop another to replace it.' : 'PDF or image; may follow later.'}
        button="Choose a file"
        accept={documentFileTypes}
        onFile={choose}
      />
      {fault ? <FieldErrorLine>{fault}</FieldErrorLine> : null}
      <div className="acts pt-2">
        <Button type="submit" isPending={form.formState.isSubmitting}>
          Add it
        </Button>
        <Button kind="text" onPress={onDone}>
          Leave it
        </Button>
      </div>
    </form>
  );
}
