import { Link } from 'react-router-dom';
import type { Summary } from '#rules/engine/finding';
import type { QueueItem } from '#shared/contracts/queue';
import { formatDateShort } from '#shared/format/dates';
import { Mark } from '../../../components/ui/mark';
import type { MarkName } from '../../../components/ui/marks';
import { paths } from '../../../lib/paths';
import { dueWords } from '../lib/due-words';
import type { QueueGroup } from '../lib/group-queue';
import { rowId } from '../lib/row-id';
import { TimeGauge } from './time-gauge';

export function QueueTable({
  groups,
  today,
  cursor,
  onCursor,
}: {
  groups: readonly QueueGroup[];
  today: string;
  cursor: QueueItem | null;
  onCursor: (submittalId: string) => void;
}) {
  return (
    <table className="queue-table">
      <caption className="hidden-text">
        Revisions by due date, with what their findings leave to decide
      </caption>
      <thead>
        <tr>
          <th scope="col">Due</th>
          <th scope="col">Mix</th>
          <th scope="col">Contractor and project</th>
          <th scope="col">
            <span className="time-head">
              <span>received</span>
              <span className="time-head-today">today</span>
              <span>due</span>
            </span>
          </th>
          <th scope="col">fail</th>
          <th scope="col">not shown</th>
          <th scope="col">undecided</th>
          <th scope="col">borderline</th>
          <th scope="col">Reviewer</th>
        </tr>
      </thead>
      {groups.map((group) => (
        <tbody key={group.key}>
          <tr className="queue-group">
            <th scope="rowgroup" colSpan={9}>
              {group.title} <small>{group.detail}</small>
            </th>
          </tr>
          {group.items.map((item) => (
            <QueueRow
              key={item.submittalId}
              item={item}
              today={today}
              isCursor={item.submittalId === cursor?.submittalId}
              onCursor={() => onCursor(item.submittalId)}
            />
          ))}
        </tbody>
      ))}
    </table>
  );
}

function QueueRow({
  item,
  today,
  isCursor,
  onCursor,
}: {
  item: QueueItem;
  today: string;
  isCursor: boolean;
  onCursor: () => void;
}) {
  return (
    <tr
      id={rowId(item)}
      className={isCursor ? 'queue-row is-cursor' : 'queue-row'}
      onClick={onCursor}
      onFocus={onCursor}
    >
      <DueCell item={item} />
      <th scope="row">
        <Link className="plain" to={paths.revision(item.submittalId, item.revision)}>
          {item.mixDesignation} <span>r{item.revision}</span>
        </Link>
      </th>
      <td className="queue-project">
        <b>{item.contractor.name}</b>
        <span>
          {item.project.number} {item.project.title}
        </span>
      </td>
      <td className="queue-time">
        {item.group === 'with the contractor' || !item.receivedOn || !item.dueOn ? (
          <span>{item.stands}</span>
        ) : (
          <TimeGauge today={today} receivedOn={item.receivedOn} dueOn={item.dueOn} />
        )}
      </td>
      <SummaryCells summary={item.summary} />
      <td className="queue-reviewer">
        {item.reviewer?.name ?? <span className="mute">not taken</span>}
        {item.returnState === 'ready to sign' ? <small>ready to sign</small> : null}
      </td>
    </tr>
  );
}

function DueCell({ item }: { item: QueueItem }) {
  if (item.group === 'with the contractor') {
    return (
      <td className="queue-due">
        {item.returnedOn ? `since ${formatDateShort(item.returnedOn)}` : ''}
        <small className="queue-stands">{item.stands}</small>
      </td>
    );
  }
  const late = item.group === 'late' ? 'is-late' : undefined;
  return (
    <td className="queue-due">
      {item.dueOn ? <b className={late}>{formatDateShort(item.dueOn)}</b> : null}
      {item.workingDaysLeft === null ? null : (
        <span className={late ?? 'mute'}>{dueWords(item.workingDaysLeft)}</span>
      )}
    </td>
  );
}

function SummaryCells({ summary }: { summary: Summary | null }) {
  if (!summary) return <td colSpan={4} className="queue-count mute" data-label="" />;
  if (summary.fail + summary.notShown + summary.undecided + summary.borderline === 0) {
    return (
      <td colSpan={4} className="queue-count outcome-pass">
        <Mark name="pass" /> {`all ${summary.pass} pass`}
      </td>
    );
  }
  const counts: { mark: MarkName; count: number }[] = [
    { mark: 'fail', count: summary.fail },
    { mark: 'notshown', count: summary.notShown },
    { mark: 'undecided', count: summary.undecided },
    { mark: 'borderline', count: summary.borderline },
  ];
  return counts.map(({ mark, count }) => (
    <td key={mark} className="queue-count">
      {count === 0 ? (
        <span className="queue-zero" aria-hidden="true">
          ·
        </span>
      ) : (
        <>
          <Mark name={mark} alone /> {count}
        </>
      )}
      {count === 0 ? <span className="hidden-text">none</span> : null}
    </td>
  ));
}
