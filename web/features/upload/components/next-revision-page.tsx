import { useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { type Revision, startRevision } from '#shared/contracts/submittals';
import { editionWords } from '#shared/format/section-words';
import { Button } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { FormChoice } from '../../../components/ui/form-choice';
import { FormText } from '../../../components/ui/form-fields';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { useContractForm } from '../../../lib/form';
import { takeHandedOverFile } from '../../../lib/handed-over-file';
import { paths } from '../../../lib/paths';
import { useLaboratories } from '../../../lib/queries/laboratories-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { useSubmittal } from '../api/get-submittal';
import { useStartRevision } from '../api/upload-workbook';
import { ChosenWorkbook } from './chosen-workbook';

export function NextRevisionPage({ submittalId }: { submittalId: string }) {
  const latest = useSubmittal(submittalId);
  const next = latest.number + 1;
  usePageTitle(`Revision ${next} of ${latest.mixDesignation}`);
  return (
    <PlainPage>
      <PageHead
        kicker={
          <Link to={paths.revision(submittalId, latest.number)}>
            {latest.mixDesignation} revision {latest.number}
          </Link>
        }
        title={`Upload revision ${next}`}
        rest={latest.mixDesignation}
        lede={`It is checked as a draft against ${editionWords(latest.section.base)}. Nothing is sent until you submit.`}
      />
      {latest.abilities.startRevision ? (
        <NextRevisionForm latest={latest} />
      ) : (
        <EmptyState title="A next revision cannot be started now.">
          {latest.state === 'draft'
            ? 'One draft at a time: submit the one you have, or upload its workbook again.'
            : 'It starts once the agency has returned the one it holds, and a rejected mix needs a new submittal.'}{' '}
          <Link to={paths.revision(submittalId, latest.number)}>Open revision {latest.number}</Link>
        </EmptyState>
      )}
    </PlainPage>
  );
}

function NextRevisionForm({ latest }: { latest: Revision }) {
  const { laboratories } = useLaboratories();
  const [file, setFile] = useState(takeHandedOverFile);
  const [wasTried, setWasTried] = useState(false);
  const start = useStartRevision(latest.submittalId);
  const navigate = useNavigate();
  const { revisionNeedsReason } = latest.abilities;
  const { form, problem, onSubmit } = useContractForm({
    schema: startRevision.body!,
    defaultValues: { laboratoryId: latest.laboratory.id, reason: '' },
    submit: async (fields) => {
      if (revisionNeedsReason && !fields.reason) {
        form.setError('reason', { message: 'The mix is approved: say why it changes.' });
        return;
      }
      if (!file) return;
      const { submittalId, number } = await start(
        { laboratoryId: fields.laboratoryId, ...(fields.reason ? { reason: fields.reason } : {}) },
        file,
      );
      await navigate(paths.workbook(submittalId, number), { state: { justUploaded: true } });
    },
  });
  const { control, formState } = form;
  return (
    <form
      className="form-column"
      noValidate
      onSubmit={(event) => {
        setWasTried(true);
        return onSubmit(event);
      }}
    >
      {problem ? <ProblemNotice problem={problem} unaffected="What you entered is kept." /> : null}
      <div className="fieldset">
        <FormChoice
          control={control}
          name="laboratoryId"
          label="Laboratory"
          choices={laboratories.map(({ id, name }) => ({ value: id, label: name }))}
        />
        <FormText
          control={control}
          name="reason"
          label="Reason"
          rows={3}
          help={
            revisionNeedsReason
              ? 'needed, because the mix is approved; the approval stands until the agency decides again'
              : 'what you changed, for the agency; may stay empty'
          }
        />
      </div>
      <ChosenWorkbook file={file} onFile={setFile} missing={wasTried} />
      <div className="acts pt-4">
        <Button kind="primary" type="submit" isPending={formState.isSubmitting}>
          Upload and read
        </Button>
        <a href={latest.section.templateHref} download>
          Template of this section
        </a>
      </div>
    </form>
  );
}
