import { useState } from 'react';
import { Link } from 'react-router-dom';
import { exportDraft } from '#shared/contracts/drafts';
import { formatInstant } from '#shared/format/dates';
import { Button } from '../../../components/ui/button';
import { PageHead } from '../../../components/ui/page-head';
import { hrefOf } from '../../../lib/api';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/queries/session-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { DraftComments } from './draft-comments';
import { DraftEntries } from './draft-entries';
import { DraftFrame } from './draft-frame';
import { DraftHead } from './draft-head';
import { useDraftInHand } from './draft-layout';
import { DraftRemarks } from './draft-remarks';
import { DraftRulesTable } from './draft-rules-table';
import { JsonView } from './json-view';
import { ReviewActs } from './review-acts';
import { SavedLine } from './saved-line';

/** A draft as a whole: its particulars, rules, tables and names, what is to be looked at, and its way to publishing. */
export function DraftPage() {
  const hand = useDraftInHand();
  const { editing, rules } = hand;
  const { draft, document } = editing;
  const [asText, setAsText] = useState(false);
  usePageTitle(`Draft ${draft.edition} of ${draft.title}`);
  return (
    <DraftFrame
      editing={editing}
      rules={rules}
      aside={
        <>
          <People />
          <DraftComments draftId={draft.id} rule={null} mayWrite={draft.abilities.comment} />
        </>
      }
    >
      <PageHead
        kicker={<Kicker />}
        title={String(document.title ?? draft.title)}
        rest={`edition ${draft.edition}, ${draft.state === 'draft' ? 'draft' : 'in review'}`}
      >
        <div className="draft-tools">
          <SavedLine editing={editing} />
          <Button kind="text" onPress={() => setAsText(!asText)}>
            {asText ? 'Show the form' : 'Show as JSON'}
          </Button>
          <a href={hrefOf(exportDraft, { params: { draftId: draft.id } })} download>
            Export
          </a>
          {draft.basedOn ? (
            <Link to={paths.compareEditions(draft.ruleSet, draft.edition, draft.basedOn.edition)}>
              Compare with {draft.basedOn.edition}
            </Link>
          ) : null}
        </div>
      </PageHead>
      {asText ? (
        <JsonView editing={editing} />
      ) : (
        <>
          <DraftHead editing={editing} />
          <DraftRemarks />
          <ReviewActs />
          <DraftRulesTable />
          <DraftEntries />
        </>
      )}
    </DraftFrame>
  );
}

function Kicker() {
  const { draft } = useDraftInHand().editing;
  return (
    <>
      <Link to={paths.ruleSets}>Rule sets</Link> · {draft.ruleSet}
      {draft.basedOn ? ` · begun from edition ${draft.basedOn.edition}` : ''}
    </>
  );
}

function People() {
  const { timeZone } = useSession();
  const { editing, rules } = useDraftInHand();
  const { createdBy, sentForReview } = editing.draft;
  const own = rules.filter(({ state }) => state !== 'removed');
  return (
    <>
      <h2>People</h2>
      <p>Begun by {createdBy.name}.</p>
      {sentForReview ? (
        <p>
          Sent for review by {sentForReview.by.name}, {formatInstant(sentForReview.at, timeZone)}.
        </p>
      ) : null}
      <p className="small mute">
        {own.filter(({ verified }) => verified).length} of {own.length} rules verified.
      </p>
    </>
  );
}
