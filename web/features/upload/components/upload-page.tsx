import { useQuery } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import type { Project } from '#shared/contracts/projects';
import { uploadSubmittal } from '#shared/contracts/submittals';
import { sectionWords } from '#shared/format/section-words';
import { limits } from '#shared/limits';
import { Button } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { Field, FieldErrorLine } from '../../../components/ui/field';
import { FormChoice } from '../../../components/ui/form-choice';
import { FormText } from '../../../components/ui/form-fields';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { useContractForm } from '../../../lib/form';
import { takeHandedOverFile } from '../../../lib/handed-over-file';
import { onlyOne } from '../../../lib/only-one';
import { paths } from '../../../lib/paths';
import { asProblem } from '../../../lib/problem';
import { useLaboratories } from '../../../lib/queries/laboratories-query';
import { projectQuery, useProjects } from '../../../lib/queries/projects-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { useUploadSubmittal } from '../api/upload-workbook';
import { ChosenWorkbook } from './chosen-workbook';

export function UploadPage({ projectId }: { projectId: string | null }) {
  usePageTitle('Check a workbook');
  const { projects } = useProjects();
  const { laboratories } = useLaboratories();
  return (
    <PlainPage>
      <PageHead
        title="Check a workbook"
        lede="It becomes revision 0 of a new submittal, as a draft. Nothing is sent until you submit."
      />
      {projects.length === 0 ? (
        <EmptyState title="No project names you as a contractor yet.">
          The agency adds contractors to its projects. <Link to={paths.projects}>See the projects</Link>
        </EmptyState>
      ) : laboratories.length === 0 ? (
        <EmptyState title="No laboratory is named yet.">
          A revision names the laboratory that made the design.{' '}
          <Link to={paths.laboratories}>Add a laboratory</Link>
        </EmptyState>
      ) : (
        <UploadForm projectId={projectId ?? onlyOne(projects)?.id ?? ''} />
      )}
    </PlainPage>
  );
}

function UploadForm({ projectId }: { projectId: string }) {
  const { projects } = useProjects();
  const { laboratories } = useLaboratories();
  const [file, setFile] = useState(takeHandedOverFile);
  const [wasTried, setWasTried] = useState(false);
  const send = useUploadSubmittal();
  const navigate = useNavigate();
  const { form, problem, onSubmit } = useContractForm({
    schema: uploadSubmittal.body!,
    defaultValues: {
      projectId,
      sectionId: '',
      laboratoryId: onlyOne(laboratories)?.id ?? '',
      mixDesignation: '',
    },
    submit: async (fields) => {
      if (!file) return;
      const { submittalId, number } = await send(fields, file);
      await navigate(paths.workbook(submittalId, number), { state: { justUploaded: true } });
    },
  });
  const chosenProject = form.watch('projectId');
  const project = useQuery({ ...projectQuery(chosenProject), enabled: chosenProject !== '' });
  const sections = project.data?.sections.filter((section) => section.confirmed) ?? [];
  const chosenSection = sections.find((section) => section.id === form.watch('sectionId'));
  const soleSection = onlyOne(sections)?.id ?? '';
  const { setValue } = form;
  useEffect(() => setValue('sectionId', soleSection), [setValue, soleSection]);
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
      {project.error ? <ProblemNotice problem={asProblem(project.error)} /> : null}
      <div className="fieldset">
        <FormChoice
          control={control}
          name="projectId"
          label="Project"
          choices={projects.map(({ id, number, title }) => ({ value: id, label: `${number} ${title}` }))}
        />
        {project.data && sections.length === 0 ? <NoSection project={project.data} /> : null}
        {sections.length > 0 ? (
          <FormChoice
            control={control}
            name="sectionId"
            label="Section"
            choices={sections.map((section) => ({ value: section.id, label: sectionWords(section) }))}
          />
        ) : null}
        <FormChoice
          control={control}
          name="laboratoryId"
          label="Laboratory"
          choices={laboratories.map(({ id, name }) => ({ value: id, label: name }))}
        />
        <FormText
          control={control}
          name="mixDesignation"
          label="Mix designation"
          maxLength={limits.mixDesignationCharacters}
          help="as it stands on the design, such as BW-125-S4; unique in the project"
        />
      </div>
      <ChosenWorkbook file={file} onFile={setFile} missing={wasTried} />
      <div className="acts pt-4">
        <Button kind="primary" type="submit" isPending={formState.isSubmitting}>
          Upload and read
        </Button>
        {chosenSection ? (
          <a href={chosenSection.templateHref} download>
            Template of this section
          </a>
        ) : null}
      </div>
    </form>
  );
}

function NoSection({ project }: { project: Project }) {
  return (
    <Field label="Section">
      <FieldErrorLine>
        No section of this project is confirmed yet. Ask {project.agency.name} to confirm one.
      </FieldErrorLine>
    </Field>
  );
}
