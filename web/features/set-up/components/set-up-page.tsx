import { useNavigate } from 'react-router-dom';
import { setUp } from '#shared/contracts/session';
import { limits } from '#shared/limits';
import { Button } from '../../../components/ui/button';
import { FormText } from '../../../components/ui/form-fields';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { SectionHead } from '../../../components/ui/section-head';
import { TimeZoneField } from '../../../components/ui/time-zone-field';
import { useContractForm } from '../../../lib/form';
import { paths } from '../../../lib/paths';
import { usePageTitle } from '../../../lib/use-page-title';
import { useSetUp, useSetUpLink } from '../api/set-up';

const usualReviewDays = 10;

export function SetUpPage({ token }: { token: string }) {
  usePageTitle('Set up');
  useSetUpLink(token);
  const send = useSetUp(token);
  const navigate = useNavigate();
  const { form, problem, onSubmit } = useContractForm({
    schema: setUp.body!,
    defaultValues: {
      agencyName: '',
      timeZone: Intl.DateTimeFormat().resolvedOptions().timeZone,
      reviewWorkingDays: usualReviewDays,
      name: '',
      email: '',
      password: '',
    },
    submit: async (fields) => {
      await send(fields);
      await navigate(paths.projects, { replace: true });
    },
  });
  const { control, formState } = form;
  return (
    <PlainPage>
      <PageHead
        title="Set up"
        rest="the agency and its administrator"
        lede="This page works once. People, contractors and projects follow from inside."
      />
      {problem ? <ProblemNotice problem={problem} /> : null}
      <form onSubmit={onSubmit} noValidate className="form-column">
        <SectionHead title="Agency" />
        <div className="fieldset">
          <FormText control={control} name="agencyName" label="Name" autoComplete="organization" />
          <TimeZoneField control={control} name="timeZone" />
          <FormText
            control={control}
            name="reviewWorkingDays"
            label="Time for a review"
            size="number"
            inputMode="numeric"
            number
            help="working days, Monday to Friday; the day of submission is day 0"
          />
        </div>
        <SectionHead title="Administrator" />
        <div className="fieldset">
          <FormText control={control} name="name" label="Name" autoComplete="name" />
          <FormText
            control={control}
            name="email"
            label="E-mail address"
            type="email"
            inputMode="email"
            autoComplete="username"
          />
          <FormText
            control={control}
            name="password"
            label="Password"
            type="password"
            autoComplete="new-password"
            help={`At least ${limits.passwordMinimumCharacters} characters.`}
          />
        </div>
        <div className="acts pt-3">
          <Button kind="primary" type="submit" isPending={formState.isSubmitting}>
            Make the agency and sign in
          </Button>
        </div>
      </form>
    </PlainPage>
  );
}
