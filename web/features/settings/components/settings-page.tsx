import { useState } from 'react';
import { changeOrganisation, type Organisation } from '#shared/contracts/organisation';
import type { WaiverPolicy } from '#shared/contracts/roles';
import { limits } from '#shared/limits';
import { Button } from '../../../components/ui/button';
import { FormRadioLine, FormText } from '../../../components/ui/form-fields';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { RunningFoot } from '../../../components/ui/running-foot';
import { SectionHead } from '../../../components/ui/section-head';
import { TimeZoneField } from '../../../components/ui/time-zone-field';
import { announce } from '../../../lib/announce';
import { useContractForm } from '../../../lib/form';
import { usePageTitle } from '../../../lib/use-page-title';
import { useChangeOrganisation, useOrganisation } from '../api/organisation';

const policies: { value: WaiverPolicy; label: string }[] = [
  { value: 'nothing', label: 'nothing' },
  { value: 'advisory', label: 'advisory findings' },
  { value: 'all', label: 'all findings' },
];

export function SettingsPage() {
  const organisation = useOrganisation();
  usePageTitle('Settings');
  return (
    <PlainPage>
      <PageHead title="Settings" rest={organisation.name} />
      <SettingsForm key={organisation.version} organisation={organisation} />
      <RunningFoot texts={['A change counts from now on; what was sent before stays as it was sent.']} />
    </PlainPage>
  );
}

function SettingsForm({ organisation }: { organisation: Organisation }) {
  const change = useChangeOrganisation();
  const [isKept, setIsKept] = useState(false);
  const { form, problem, onSubmit } = useContractForm({
    schema: changeOrganisation.body!,
    defaultValues: {
      name: organisation.name,
      timeZone: organisation.timeZone,
      reviewWorkingDays: organisation.reviewWorkingDays,
      waiverPolicy: organisation.waiverPolicy,
      letterhead: organisation.letterhead,
    },
    submit: async (fields) => {
      await change(fields, organisation.version);
      announce('The settings are kept.');
      setIsKept(true);
    },
  });
  const { control, formState } = form;
  const isAgency = organisation.kind === 'agency';
  return (
    <form onSubmit={onSubmit} noValidate className="form-column">
      {problem ? (
        <ProblemNotice problem={problem} unaffected="What you entered is kept in the form." />
      ) : null}
      <div className="fieldset">
        <FormText control={control} name="name" label="Name" />
        <TimeZoneField control={control} name="timeZone" />
        {isAgency ? (
          <>
            <FormText
              control={control}
              name="reviewWorkingDays"
              label="Time for a review"
              number
              help="working days, Monday to Friday; the day of submission is day 0"
            />
            <FormRadioLine
              control={control}
              name="waiverPolicy"
              label="Reviewers may waive"
              choices={policies}
              help="above it, a signing engineer waives"
            />
          </>
        ) : null}
      </div>
      {isAgency ? (
        <>
          <SectionHead title="Letterhead" about="stands over every letter; the closing stands under it" />
          <div className="fieldset">
            <FormText control={control} name="letterhead.department" label="Department" />
            <FormText
              control={control}
              name="letterhead.address"
              label="Address"
              rows={2}
              maxLength={limits.addressCharacters}
            />
            <FormText control={control} name="letterhead.telephone" label="Telephone" />
            <FormText control={control} name="letterhead.email" label="E-mail address" inputMode="email" />
            <FormText
              control={control}
              name="letterhead.closing"
              label="Closing"
              rows={2}
              maxLength={limits.addressCharacters}
            />
          </div>
        </>
      ) : null}
      {organisation.abilities.change ? (
        <div className="acts pt-3">
          <Button kind="primary" type="submit" isPending={formState.isSubmitting}>
            Keep the settings
          </Button>
          {isKept ? <span className="small mute">Kept.</span> : null}
        </div>
      ) : (
        <p className="small mute pt-3">An administrator of {organisation.name} changes these.</p>
      )}
    </form>
  );
}
