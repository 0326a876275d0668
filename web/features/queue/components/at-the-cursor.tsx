import type { Finding } from '#rules/engine/finding';
import { findingKey } from '#rules/engine/finding';
import type { QueueItem } from '#shared/contracts/queue';
import { formatDateShort } from '#shared/format/dates';
import { Button, LinkButton } from '../../../components/ui/button';
import { LoadingBars } from '../../../components/ui/loading-bars';
import { Mark } from '../../../components/ui/mark';
import { markOfOutcome } from '../../../components/ui/marks';
import { Note } from '../../../components/ui/note';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { findingBrief } from '../../../lib/finding-brief';
import { paths } from '../../../lib/paths';
import { asProblem } from '../../../lib/problem';
import { useQueueItem } from '../api/get-queue-item';

/** What a reviewer looks at before opening the findings: what is left to decide, what moved, what was noted inside. */
export function AtTheCursor({
  item,
  onTake,
  onGiveBack,
  isChanging,
}: {
  item: QueueItem;
  onTake: () => void;
  onGiveBack: () => void;
  isChanging: boolean;
}) {
  const query = useQueueItem(item.submittalId);
  return (
    <section aria-label="At the cursor">
      <p className="kicker">At the cursor</p>
      <h2 className="aside-title">
        {item.mixDesignation} revision {item.revision}
      </h2>
      <p className="small mute pb-2">{item.description}</p>
      {query.isPending ? <LoadingBars what="Reading the findings." rows={4} /> : null}
      {query.error ? <ProblemNotice problem={asProblem(query.error)} /> : null}
      {query.data ? <Details detail={query.data} /> : null}
      <div className="acts pt-4">
        <LinkButton
          kind="primary"
          className="acts-in-foot"
          keyHint="Enter"
          to={paths.revision(item.submittalId, item.revision)}
        >
          Open the findings
        </LinkButton>
        {item.abilities.take ? (
          <Button className="acts-in-foot" onPress={onTake} isPending={isChanging} keyHint="A">
            Take for review
          </Button>
        ) : null}
        {item.abilities.giveBack ? (
          <Button kind="text" onPress={onGiveBack} isPending={isChanging}>
            Give back
          </Button>
        ) : null}
      </div>
    </section>
  );
}

type Detail = NonNullable<ReturnType<typeof useQueueItem>['data']>;

function Details({ detail }: { detail: Detail }) {
  const waived = new Set(detail.waived);
  return (
    <>
      {detail.findings.length === 0 ? (
        <p className="cursor-finding">
          <Mark name="pass" />
          <span>Every finding passes clear of its limit.</span>
        </p>
      ) : (
        <ul>
          {detail.findings.map((finding) => (
            <CursorFinding
              key={findingKey(finding)}
              finding={finding}
              waived={waived.has(findingKey(finding))}
            />
          ))}
        </ul>
      )}
      {detail.changes ? (
        <div className="cursor-changes">
          <p>
            <b>Changed since revision {detail.item.revision - 1}</b>
          </p>
          <p className="mute">{detail.changes}</p>
        </div>
      ) : null}
      {detail.internalNotes.map((note) => (
        <Note
          key={`${note.by} ${note.on} ${note.text}`}
          text={note.text}
          by={note.by}
          on={formatDateShort(note.on)}
          state="internal"
        />
      ))}
    </>
  );
}

function CursorFinding({ finding, waived }: { finding: Finding; waived: boolean }) {
  const { title, rest } = findingBrief(finding);
  return (
    <li className="cursor-finding">
      <Mark name={waived ? 'waived' : markOfOutcome[finding.outcome]} alone />
      <span>
        {title ? <b>{title}</b> : null} {rest}
        {waived ? ', waived' : null}
      </span>
    </li>
  );
}
