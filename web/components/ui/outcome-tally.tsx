import type { Summary } from '#rules/engine/finding';
import { Mark } from './mark';

/** Fails, not shown and undecided as marks with counts; nothing of the three: how many pass. */
export function OutcomeTally({
  summary,
}: {
  summary: Pick<Summary, 'pass' | 'fail' | 'notShown' | 'undecided'>;
}) {
  const counts = [
    { mark: 'fail' as const, count: summary.fail },
    { mark: 'notshown' as const, count: summary.notShown },
    { mark: 'undecided' as const, count: summary.undecided },
  ].filter(({ count }) => count > 0);
  if (counts.length === 0) {
    return (
      <span className="outcome-tally">
        <span className="outcome-pass">
          <Mark name="pass" /> all {summary.pass} pass
        </span>
      </span>
    );
  }
  return (
    <span className="outcome-tally">
      {counts.map(({ mark, count }) => (
        <span key={mark}>
          <Mark name={mark} alone /> {count}
        </span>
      ))}
    </span>
  );
}
