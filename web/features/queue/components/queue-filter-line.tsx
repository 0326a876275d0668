import type { Ref } from 'react';
import { Link, useSearchParams } from 'react-router-dom';
import type { QueueFilters } from '../api/get-queue';

/** Filters are addresses: they can be kept, sent and gone back to. */
export function QueueFilterLine({
  ref,
  filters,
  counts,
}: {
  ref: Ref<HTMLElement>;
  filters: QueueFilters;
  counts: { mine: number; notTaken: number; toSign: number };
}) {
  const who: { value: QueueFilters['who']; label: string }[] = [
    { value: 'everyone', label: 'Everyone’s' },
    { value: 'mine', label: `Mine, ${counts.mine}` },
    { value: 'not taken', label: `Not taken, ${counts.notTaken}` },
    { value: 'to sign', label: `To sign, ${counts.toSign}` },
  ];
  const by: { value: QueueFilters['by']; label: string }[] = [
    { value: 'due', label: 'by due date' },
    { value: 'project', label: 'by project' },
  ];
  return (
    <nav ref={ref} className="queue-filters" aria-label="Filter the queue">
      {who.map(({ value, label }) => (
        <FilterLink key={value} change={{ who: value }} isCurrent={filters.who === value}>
          {label}
        </FilterLink>
      ))}
      <span className="queue-order">
        {by.map(({ value, label }) => (
          <FilterLink key={value} change={{ by: value }} isCurrent={filters.by === value}>
            {label}
          </FilterLink>
        ))}
      </span>
    </nav>
  );
}

function FilterLink({
  change,
  isCurrent,
  children,
}: {
  change: Partial<QueueFilters>;
  isCurrent: boolean;
  children: string;
}) {
  const [search] = useSearchParams();
  const next = new URLSearchParams(search);
  for (const [name, value] of Object.entries(change)) next.set(name, value);
  return (
    <Link to={{ search: `?${next}` }} aria-current={isCurrent ? 'true' : undefined}>
      {children}
    </Link>
  );
}
