import { Link } from 'react-router-dom';
import type { RoomView } from '#shared/contracts/room';

/** The answer in words, how it was read, and the rules with their findings. */
export function RoomAside({
  room,
  earlier,
  revisionPath,
}: Pick<RoomView, 'room' | 'earlier'> & { revisionPath: string }) {
  const hasEarlier = earlier !== null && earlier.binderContent !== room?.declaredBinderContent;
  if (room === null) return <h2>Room to move</h2>;
  return (
    <>
      <h2>What closes it</h2>
      <p>{room.words.answer}</p>
      <ul className="pt-2">
        {room.words.lines.map(({ clause, title, limit }) => (
          <li key={`${clause}${title}`} className="room-line">
            <Link className="plain" to={`${revisionPath}#${clause}`}>
              {clause}
            </Link>
            <span>
              {title}
              {limit === '' ? '' : `, ${limit}`}
            </span>
          </li>
        ))}
      </ul>
      {room.words.notes.map((note) => (
        <p key={note} className="small mute pt-2">
          {note}
        </p>
      ))}
      <p className="small mute pt-2">
        {room.room === null ? '' : 'Heavy ticks close the room; '}
        {room.room === null ? 'Dotted' : 'dotted'} ends are the ends of the trials.
        {hasEarlier ? ` The hollow dot is revision ${earlier.revision}.` : ''}
      </p>
    </>
  );
}
