import { useRef, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { cautions } from '#shared/cautions';
import type { QueueItem } from '#shared/contracts/queue';
import { formatDateWithWeekday } from '#shared/format/dates';
import { Button, LinkButton } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { MarginPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { RunningFoot } from '../../../components/ui/running-foot';
import { announce } from '../../../lib/announce';
import { paths } from '../../../lib/paths';
import { asProblem } from '../../../lib/problem';
import { useShortcuts } from '../../../lib/shortcuts';
import { usePageTitle } from '../../../lib/use-page-title';
import { type QueueFilters, useQueue } from '../api/get-queue';
import { useGiveBackRevision, useTakeRevision } from '../api/take-revision';
import { groupQueue } from '../lib/group-queue';
import { cursorItem, stepCursor } from '../lib/queue-cursor';
import { rowId } from '../lib/row-id';
import { AtTheCursor } from './at-the-cursor';
import { QueueFilterLine } from './queue-filter-line';
import { QueueTable } from './queue-table';
import '../queue.css';

export function QueuePage({ filters }: { filters: QueueFilters }) {
  usePageTitle('Review queue');
  const { today, items, counts, reviewWorkingDays } = useQueue(filters);
  const [chosen, setChosen] = useState<string | null>(null);
  const filterLine = useRef<HTMLElement>(null);
  const groups = groupQueue(items, filters.by);
  const inOrder = groups.flatMap((group) => group.items);
  const item = cursorItem(inOrder, chosen);
  const take = useTakeRevision();
  const giveBack = useGiveBackRevision();
  useQueueKeys({ inOrder, item, onCursor: setChosen, onTake: take.mutate, filterLine });
  const problem = take.error ?? giveBack.error;
  return (
    <MarginPage
      marginWidthPx={316}
      aside={
        item ? (
          <AtTheCursor
            key={item.submittalId}
            item={item}
            onTake={() => take.mutate(item)}
            onGiveBack={() => giveBack.mutate(item)}
            isChanging={take.isPending || giveBack.isPending}
          />
        ) : null
      }
    >
      <PageHead
        title="Review queue"
        rest={formatDateWithWeekday(today)}
        lede={`${counts.everyone} to decide, ${counts.late} late, ${counts.withContractors} with contractors`}
      >
        <QueueFilterLine ref={filterLine} filters={filters} counts={counts} />
      </PageHead>
      {problem ? (
        <ProblemNotice problem={asProblem(problem)} unaffected="The queue shows the present state." />
      ) : null}
      {items.length === 0 ? (
        <EmptyState title={emptyTitle(filters.who)}>
          {`A revision that a contractor submits stands here for ${reviewWorkingDays} working days.`}
        </EmptyState>
      ) : (
        <QueueTable groups={groups} today={today} cursor={item} onCursor={setChosen} />
      )}
      <RunningFoot
        texts={[`${reviewWorkingDays} working days from receipt.`, cautions.findings]}
        acts={item ? <FootActs item={item} onTake={() => take.mutate(item, { onError: toTheTop })} /> : null}
      />
    </MarginPage>
  );
}

/** On phones the acts of the row that was tapped last. */
function FootActs({ item, onTake }: { item: QueueItem; onTake: () => void }) {
  return (
    <>
      {item.abilities.take ? <Button onPress={onTake}>Take for review</Button> : null}
      <LinkButton kind="primary" to={paths.revision(item.submittalId, item.revision)}>
        Open {item.mixDesignation} r{item.revision}
      </LinkButton>
    </>
  );
}

/** The refusal stands at the head of the page, out of sight of the foot. */
function toTheTop(): void {
  window.scrollTo({ top: 0 });
}

function useQueueKeys(options: {
  inOrder: QueueItem[];
  item: QueueItem | null;
  onCursor: (submittalId: string) => void;
  onTake: (item: QueueItem) => void;
  filterLine: React.RefObject<HTMLElement | null>;
}) {
  const { inOrder, item, onCursor, onTake, filterLine } = options;
  const navigate = useNavigate();
  const step = (by: 1 | -1) => {
    const next = stepCursor(inOrder, item?.submittalId ?? null, by);
    if (!next) return;
    onCursor(next.submittalId);
    document.getElementById(rowId(next))?.scrollIntoView({ block: 'nearest' });
    announce(`${next.mixDesignation} revision ${next.revision}, ${next.contractor.name}`);
  };
  useShortcuts([
    { key: 'j', label: 'next', foot: true, run: () => step(1) },
    { key: 'k', label: 'previous', foot: true, run: () => step(-1) },
    {
      key: 'Enter',
      label: 'open',
      foot: true,
      run: () => item && navigate(paths.revision(item.submittalId, item.revision)),
    },
    {
      key: 'a',
      label: 'take',
      foot: true,
      run: () => item?.abilities.take && onTake(item),
    },
    {
      key: 'f',
      label: 'filter',
      foot: true,
      run: () => filterLine.current?.querySelector('a')?.focus(),
    },
  ]);
}

function emptyTitle(who: QueueFilters['who']): string {
  const titles: Record<QueueFilters['who'], string> = {
    everyone: 'No revision is waiting for a decision.',
    mine: 'You have taken no revision.',
    'not taken': 'Every submitted revision has a reviewer.',
    'to sign': 'No return is ready to sign.',
  };
  return titles[who];
}
