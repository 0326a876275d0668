import { formatDate } from '#shared/format/dates';
import { timeGaugePlaces, timeGaugeWidth } from '../lib/time-gauge';

/** The limit gauge's drawing over time: received a dot, due a tick, today fixed at the middle. */
export function TimeGauge({
  today,
  receivedOn,
  dueOn,
}: {
  today: string;
  receivedOn: string;
  dueOn: string;
}) {
  const places = timeGaugePlaces({ today, receivedOn, dueOn });
  return (
    <svg
      className="time-gauge"
      viewBox={`0 0 ${timeGaugeWidth} 20`}
      role="img"
      aria-label={`Received ${formatDate(receivedOn)}, due ${formatDate(dueOn)}`}
    >
      <path className="base" d={`M0 10H${timeGaugeWidth}`} />
      <rect
        className="lane"
        x={places.received}
        y="5.5"
        width={Math.max(places.due - places.received, 0)}
        height="9"
      />
      <path className="today" d={`M${places.today} 0V20`} />
      <path className={places.late ? 'due is-late' : 'due'} d={`M${places.due} 2V18`} />
      {places.dueOff ? <Break x={places.due} /> : null}
      <circle className="received" cx={places.received} cy="10" r="3" />
      {places.receivedOff ? <Break x={places.received} /> : null}
    </svg>
  );
}

/** Two strokes beside what lies off the scale, towards the middle. */
function Break({ x }: { x: number }) {
  const at = x < timeGaugeWidth / 2 ? x + 6 : x - 9;
  return <path className="break" d={`M${at} 6l3 8M${at + 4} 6l3 8`} />;
}
