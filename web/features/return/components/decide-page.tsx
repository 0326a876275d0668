import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { checkCautions } from '#shared/cautions';
import type { ReturnView } from '#shared/contracts/returns';
import type { Revision } from '#shared/contracts/submittals';
import { formatTime } from '#shared/format/dates';
import { findingFragment } from '#shared/format/finding-key';
import { Button } from '../../../components/ui/button';
import { PageHead } from '../../../components/ui/page-head';
import { RunningFoot } from '../../../components/ui/running-foot';
import { TwoHalves } from '../../../components/ui/two-halves';
import { announce } from '../../../lib/announce';
import { paths } from '../../../lib/paths';
import { checkQuery } from '../../../lib/queries/check-query';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useShortcuts } from '../../../lib/shortcuts';
import { useMakeReturnReady, useSendReturn } from '../api/send-return';
import { useReturnDraft } from '../hooks/use-return-draft';
import { type SigningEngineer, useSigningEngineer } from '../hooks/use-signing-engineer';
import { reasonWanted } from '../lib/return-values';
import { DecisionFields } from './decision-fields';
import { DraftProblem } from './draft-problem';
import { Enclosures } from './enclosures';
import { LetterInSight } from './letter-in-sight';
import { LetterItems } from './letter-items';
import { SendActs, sendToSignWords } from './send-acts';

export function DecidePage({
  params,
  view,
  revision,
}: {
  params: RevisionParams;
  view: ReturnView;
  revision: Revision;
}) {
  const { timeZone } = revision.agency;
  const draft = useReturnDraft(params, view);
  const { isActing, sendNow, sendToSign, error } = useSending(params, view, draft);
  const check = useQuery(checkQuery(params));
  const signing = useSigningEngineer(view);
  const edit = useEditNote(params, view);
  useShortcuts([
    ...(revision.abilities.note ? [{ key: 'e', label: 'edit the note', foot: true, run: edit }] : []),
    ...(view.abilities.send
      ? [{ key: 'Enter', ctrl: true, label: 'sign and send', foot: true, run: () => void sendNow() }]
      : []),
  ]);
  return (
    <TwoHalves
      work={
        <>
          <PageHead
            kicker={
              <>
                <Link to={paths.revision(params.submittalId, params.number)}>
                  {revision.mixDesignation} revision {revision.number}
                </Link>{' '}
                · {revision.project.number} {revision.project.title}
              </>
            }
            title="Decide and return"
          />
          <DraftProblem draft={draft} sending={error} />
          <DecisionFields view={view} form={draft.form} />
          <LetterItems
            params={params}
            items={view.items}
            form={draft.form}
            canChange={view.abilities.change}
          />
          <Enclosures form={draft.form} canChange={view.abilities.change} />
          <SendActs
            view={view}
            signing={signing}
            isActing={isActing}
            onSend={sendNow}
            onSendToSign={sendToSign}
          />
        </>
      }
      sight={
        <>
          <LetterInSight params={params} version={view.version} title="The letter as it will be sent" />
          <RunningFoot
            texts={[
              draftWords(draft.isKeeping, view.savedAt, timeZone),
              ...checkCautions(check.data?.startingPoint === true),
            ]}
            acts={
              <FootActs
                view={view}
                signing={signing}
                isActing={isActing}
                onSend={sendNow}
                onSendToSign={sendToSign}
              />
            }
          />
        </>
      }
    />
  );
}

function FootActs({
  view: { abilities, signingEngineers },
  signing: { engineer },
  isActing,
  onSend,
  onSendToSign,
}: {
  view: ReturnView;
  signing: SigningEngineer;
  isActing: boolean;
  onSend: () => void;
  onSendToSign: (signingEngineerId: string) => void;
}) {
  return (
    <>
      {abilities.makeReady && signingEngineers.length > 0 ? (
        <Button
          kind={abilities.send ? 'outlined' : 'primary'}
          isDisabled={engineer === null}
          isPending={isActing}
          onPress={() => engineer && onSendToSign(engineer.id)}
        >
          {sendToSignWords(engineer)}
        </Button>
      ) : null}
      {abilities.send ? (
        <Button kind="primary" onPress={onSend} isPending={isActing}>
          Sign and send
        </Button>
      ) : null}
    </>
  );
}

/** Notes are written where the finding stands: E goes there from the item in focus, with its note open. */
function useEditNote(params: RevisionParams, view: ReturnView): () => void {
  const navigate = useNavigate();
  return () => {
    const entry = document.activeElement?.closest<HTMLElement>('[data-item]');
    const item = view.items.find(({ key }) => key === entry?.dataset.item);
    if (!item) {
      announce('Go to a finding of the letter first.');
      return;
    }
    const address = `${paths.revision(params.submittalId, params.number)}#${findingFragment(item.finding)}`;
    void navigate(address, { state: { editNote: true } });
  };
}

type Draft = ReturnType<typeof useReturnDraft>;

/** What is entered is kept first; only then is it signed or handed on. */
function useSending(params: RevisionParams, view: ReturnView, draft: Draft) {
  const send = useSendReturn(params);
  const makeReady = useMakeReturnReady(params);
  const [isActing, setIsActing] = useState(false);
  const act = async (run: (version: number) => Promise<unknown>, done: string) => {
    if (isActing) return;
    setIsActing(true);
    const version = await settled(draft, view);
    if (version !== null) {
      await run(version).then(
        () => announce(done),
        () => undefined,
      );
    }
    setIsActing(false);
  };
  return {
    isActing,
    error: send.error ?? makeReady.error,
    sendNow: () => act((version) => send.mutateAsync({ version }), 'The return is sent.'),
    sendToSign: (signingEngineerId: string) =>
      act(
        (version) => makeReady.mutateAsync({ version, signingEngineerId }),
        'The return is with the signing engineer.',
      ),
  };
}

/** The version that holds everything entered, or null where something is still wanted. */
async function settled({ form, keep }: Draft, view: ReturnView): Promise<number | null> {
  const wanted = reasonWanted(form.getValues(), view.recommended);
  if (wanted) {
    form.setError('reason', { type: 'wanted', message: wanted });
    document.getElementsByName('reason')[0]?.focus();
    return null;
  }
  return keep();
}

function draftWords(isKeeping: boolean, savedAt: string | null, timeZone: string): string {
  if (isKeeping) return 'Not sent. Keeping the draft.';
  return savedAt
    ? `Not sent. Kept as a draft, saved ${formatTime(savedAt, timeZone)}.`
    : 'Not sent. What you enter is kept as a draft.';
}
