import { Controller, type UseFormReturn, useFieldArray } from 'react-hook-form';
import { Link } from 'react-router-dom';
import { addProject, type Project } from '#shared/contracts/projects';
import { limits } from '#shared/limits';
import { Button } from '../../../components/ui/button';
import { CheckboxLine } from '../../../components/ui/checkbox';
import { Field } from '../../../components/ui/field';
import { FormText } from '../../../components/ui/form-fields';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { SectionHead } from '../../../components/ui/section-head';
import { TextField } from '../../../components/ui/text-field';
import { useContractForm } from '../../../lib/form';
import { paths } from '../../../lib/paths';
import { useContractors } from '../../../lib/queries/contractors-query';
import type { ProjectFields } from '../api/change-project';
import { ProjectFacts } from './project-facts';

export type ProjectFormState = UseFormReturn<ProjectFields, unknown, ProjectFields>;

export function ProjectForm({
  project,
  act,
  submit,
}: {
  project: Project | null;
  act: string;
  submit: (fields: ProjectFields) => Promise<unknown>;
}) {
  const { contractors } = useContractors();
  const { form, problem, onSubmit } = useContractForm<ProjectFields, ProjectFields>({
    schema: addProject.body!,
    defaultValues: valuesOf(project),
    submit,
  });
  const { control, formState } = form;
  return (
    <form onSubmit={onSubmit} noValidate className="form-column">
      {problem ? <ProblemNotice problem={problem} unaffected="What you entered is kept." /> : null}
      <div className="fieldset">
        <FormText
          control={control}
          name="number"
          label="Contract number"
          maxLength={limits.projectNumberCharacters}
          help="such as CV-2031"
        />
        <FormText control={control} name="title" label="Title" maxLength={limits.nameCharacters} />
        <Controller
          control={control}
          name="lettingOn"
          render={({ field, fieldState }) => (
            <TextField
              label="Letting date"
              type="date"
              name="lettingOn"
              value={field.value ?? ''}
              onChange={(text) => field.onChange(text === '' ? null : text)}
              onBlur={field.onBlur}
              error={fieldState.error?.message}
              help="sections are proposed from it"
            />
          )}
        />
        {contractors.length === 0 ? (
          <Field label="Contractors">
            <span className="mute">
              The agency has none yet. <Link to={paths.people}>Add one</Link>
            </span>
          </Field>
        ) : (
          <Controller
            control={control}
            name="contractorIds"
            render={({ field, fieldState }) => (
              <CheckboxLine
                label="Contractors"
                choices={contractors.map(({ id, name }) => ({ value: id, label: name }))}
                values={field.value}
                onChange={field.onChange}
                error={fieldState.error?.message}
              />
            )}
          />
        )}
      </div>
      <SectionHead title="The project states" about="attributes used where a workbook states nothing" />
      <ProjectFacts form={form} />
      <SectionHead title="Contacts" about="offered as recipients of letters" />
      <Contacts form={form} />
      <div className="acts pt-4">
        <Button kind="primary" type="submit" isPending={formState.isSubmitting}>
          {act}
        </Button>
        <Link to={project ? paths.project(project.id) : paths.projects}>Leave it</Link>
      </div>
    </form>
  );
}

function Contacts({ form }: { form: ProjectFormState }) {
  const { fields, append, remove } = useFieldArray({ control: form.control, name: 'contacts' });
  return (
    <>
      {fields.map((field, index) => (
        <div key={field.id} className="contact-row">
          <FormText
            control={form.control}
            name={`contacts.${index}.name`}
            label={`Name of contact ${index + 1}`}
            placeholder="name"
            hideLabel
          />
          <FormText
            control={form.control}
            name={`contacts.${index}.function`}
            label={`Function of contact ${index + 1}`}
            placeholder="function"
            hideLabel
          />
          <FormText
            control={form.control}
            name={`contacts.${index}.email`}
            label={`E-mail address of contact ${index + 1}`}
            placeholder="address"
            inputMode="email"
            hideLabel
          />
          <Button kind="text" onPress={() => remove(index)} aria-label={`Take contact ${index + 1} out`}>
            Take out
          </Button>
        </div>
      ))}
      <Button kind="text" onPress={() => append({ name: '', function: '', email: '' })}>
        Add a contact
      </Button>
    </>
  );
}

function valuesOf(project: Project | null): ProjectFields {
  return {
    number: project?.number ?? '',
    title: project?.title ?? '',
    lettingOn: project?.lettingOn ?? null,
    facts: project?.facts ?? {},
    contacts: project?.contacts ?? [],
    contractorIds: project?.contractors.map(({ id }) => id) ?? [],
  };
}
