import { formatInstant } from '#shared/format/dates';
import { Button } from '../../../components/ui/button';
import { useSession } from '../../../lib/queries/session-query';
import type { DraftEditing } from '../hooks/use-working-copy';

/** What two authors changed at once, both versions side by side; neither is lost until one is chosen. */
export function Conflicts({ editing: { conflicts, settle } }: { editing: DraftEditing }) {
  const { timeZone } = useSession();
  return conflicts.map(({ part, present, mine, by, at }) => (
    <section key={part} className="problem-notice" role="alert" aria-label={`Two versions of ${part}`}>
      <p>
        <b>
          {by ?? 'Somebody else'} changed {part}
          {at === null ? '' : ` on ${formatInstant(at, timeZone)}`}, and so did you.
        </b>{' '}
        Both are here; the draft shows theirs until you choose.
      </p>
      <div className="two-versions">
        <Version title="Theirs" value={present} />
        <Version title="Yours" value={mine} />
      </div>
      <div className="acts pt-2">
        <Button onPress={() => settle(part, 'theirs')}>Keep theirs</Button>
        <Button onPress={() => settle(part, 'mine')}>Keep yours</Button>
      </div>
    </section>
  ));
}

function Version({ title, value }: { title: string; value: unknown }) {
  return (
    <div className="min-w-0">
      <p className="small mute">{title}</p>
      {value === null ? <p>removed</p> : <pre className="json-text">{JSON.stringify(value, null, 2)}</pre>}
    </div>
  );
}
