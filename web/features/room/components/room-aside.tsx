import { Link } from 'react-router-dom';
import type { RoomView } from '#shared/contracts/room';

/** The answer in words, how it was read, and the rules with their findings. */
export function RoomAside({ room, revisionPath }: { room: RoomView['room']; revisionPath: string }) {
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
              {limit === '' ? '' : ` ${limit}`}
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
        Heavy ticks close the room; dotted ends are the ends of the trials. The hollow dot is the revision
        before.
      </p>
    </>
  );
}
