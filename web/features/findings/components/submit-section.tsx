import { useState } from 'react';
import { Button } from '../../../components/ui/button';
import { Checkbox } from '../../../components/ui/checkbox';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { SectionHead } from '../../../components/ui/section-head';
import { announce } from '../../../lib/announce';
import { asProblem } from '../../../lib/problem';
import { useSubmitRevision } from '../api/submit-revision';
import { useLedger } from './ledger-context';

/** The declaration as it will be kept, with every doubt, fail and gap that it lists, and the one act under it. */
export function SubmitSection({ declaration, seal }: { declaration: string; seal: string }) {
  const { params, revision } = useLedger();
  const [accepted, setAccepted] = useState(false);
  const [missing, setMissing] = useState(false);
  const submit = useSubmitRevision(params, revision.version);
  const send = () => {
    if (!accepted) {
      setMissing(true);
      return;
    }
    submit.mutate(
      { declaration, accepted: true, seal },
      {
        onSuccess: () =>
          announce(`Revision ${revision.number} is submitted. A receipt is on its way by mail.`),
      },
    );
  };
  return (
    <section className="submit-section" aria-label="Submit">
      <SectionHead
        id="submit"
        title={`Submit revision ${revision.number} to ${revision.agency.name}`}
        about="the check of record is made as it arrives"
      />
      {declaration.split('\n').map((line, index) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: the lines of one fixed text.
        <p key={index} className="prose">
          {line}
        </p>
      ))}
      <Checkbox
        isSelected={accepted}
        onChange={(next) => {
          setAccepted(next);
          setMissing(false);
        }}
        error={missing ? 'Tick the declaration before submitting.' : undefined}
      >
        I declare this for {revision.contractor.name}.
      </Checkbox>
      {submit.isError ? (
        <ProblemNotice
          problem={asProblem(submit.error)}
          unaffected="Nothing was sent; the draft is as it was."
        />
      ) : null}
      <div className="acts pt-2">
        <Button kind="primary" isDisabled={submit.isPending} onPress={send}>
          Submit revision {revision.number}
        </Button>
      </div>
    </section>
  );
}
