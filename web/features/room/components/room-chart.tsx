import { useNavigate } from 'react-router-dom';
import { holdsWords } from '#rules/engine/room-words';
import type { RoomView } from '#shared/contracts/room';
import { clauseParts } from '#shared/format/clause';
import { paths } from '../../../lib/paths';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useMediaQuery } from '../../../lib/use-media-query';
import { type RoomDot, type RoomGeometry, type RoomRow, roomGeometry } from '../lib/room-geometry';

const wide = { widthPx: 960, namesPx: 290, rowPx: 30 };
const narrow = { widthPx: 358, namesPx: 0, rowPx: 46 };

/** One row a rule over the binder contents of the trials; the room is where all of them hold. */
export function RoomChart({
  room,
  earlier,
  params,
}: Pick<RoomView, 'earlier'> & { room: NonNullable<RoomView['room']>; params: RevisionParams }) {
  const size = useMediaQuery('(max-width: 759px)') ? narrow : wide;
  const geometry = roomGeometry({ room, earlier }, params.number, size);
  return (
    <figure>
      {/* biome-ignore lint/a11y/useSemanticElements: a drawing whose trials are links is a group, and SVG has no other word for it. */}
      <svg
        className="chart"
        viewBox={`0 0 ${size.widthPx} ${geometry.heightPx}`}
        role="group"
        aria-label={`${room.words.answer} The same as a table below.`}
      >
        <Lanes geometry={geometry} />
        <Room geometry={geometry} />
        <Names geometry={geometry} />
        <Ends geometry={geometry} />
        <Designs geometry={geometry} isNameAbove={size.namesPx === 0} />
        <Axis geometry={geometry} params={params} />
      </svg>
    </figure>
  );
}

function Lanes({ geometry: { rows, frame } }: { geometry: RoomGeometry }) {
  return rows.map((row) => (
    <g key={row.rule.rule}>
      <title>{`${row.rule.clause} ${row.rule.title}, ${row.rule.limitWords}: ${holdsWords(row.rule)}`}</title>
      <path className="grid-line" d={`M0 ${row.y - rowTop(row)}H${frame.right}`} />
      {row.bars.map(({ x1, x2 }) => (
        <rect key={x1} className="lane" x={x1} y={row.y - 7} width={Math.max(1, x2 - x1)} height="14" />
      ))}
    </g>
  ));
}

/** Over the room, which lies behind the names where there is no space beside the drawing. */
function Names({ geometry: { rows, frame } }: { geometry: RoomGeometry }) {
  return rows.map(({ rule, y, nameY, words }) => (
    <g key={rule.rule}>
      <text x="0" y={nameY}>
        <tspan className="room-clause">{clauseParts(rule.clause).letter || rule.clause}</tspan> {rule.title}
      </text>
      {words === null ? null : (
        <text x={frame.left} y={y + 4} className="room-words">
          {words}
        </text>
      )}
    </g>
  ));
}

/** Distance from the middle of a bar to the hairline over its row. */
function rowTop({ nameY, y }: RoomRow): number {
  return nameY < y ? 31 : 15;
}

function Room({ geometry: { room, frame } }: { geometry: RoomGeometry }) {
  if (room === null) return null;
  return (
    <g>
      <rect
        className="room-band"
        x={room.x1}
        y={frame.top}
        width={Math.max(1, room.x2 - room.x1)}
        height={frame.bottom - frame.top}
      />
      <path
        className="room-edge"
        d={`M${room.x1} ${frame.top}V${frame.bottom}M${room.x2} ${frame.top}V${frame.bottom}`}
      />
      <text className="room-label" x={room.labelX} y={frame.top - 8} textAnchor="middle">
        {room.label}
      </text>
    </g>
  );
}

/** Ticks lie over the room, so that its edges do not hide what makes them. */
function Ends({ geometry: { rows, room } }: { geometry: RoomGeometry }) {
  return rows.flatMap(({ rule, y, bars }) =>
    bars.flatMap(({ ends }) =>
      ends.map(({ x, kind, closesRoom }, side) => (
        <g key={`${rule.rule}${x}${side === 0 ? 'from' : 'to'}`}>
          <path
            className={
              kind === 'trials'
                ? 'trial-end'
                : closesRoom
                  ? 'limit-tick room-closing'
                  : 'limit-tick room-tick'
            }
            d={`M${x} ${y - 10}v20`}
          />
          {closesRoom && room ? (
            <text
              className="direct-label"
              x={side === 0 ? x - 6 : x + 6}
              y={y + 4}
              textAnchor={side === 0 ? 'end' : 'start'}
            >
              {side === 0 ? room.from : room.to}
            </text>
          ) : null}
        </g>
      )),
    ),
  );
}

function Designs({
  geometry: { frame, designY, present, earlier },
  isNameAbove,
}: {
  geometry: RoomGeometry;
  isNameAbove: boolean;
}) {
  const top = isNameAbove ? 31 : 15;
  return (
    <g>
      <path className="grid-line" d={`M0 ${designY - top}H${frame.right}`} />
      <text x="0" y={isNameAbove ? designY - 15 : designY + 4}>
        {present === null ? 'No binder content is declared' : 'The declared design'}
      </text>
      {earlier ? <Dot dot={earlier} y={designY} className="room-dot-earlier" /> : null}
      {present ? <Dot dot={present} y={designY} className="room-dot" /> : null}
    </g>
  );
}

function Dot({ dot: { x, label, side }, y, className }: { dot: RoomDot; y: number; className: string }) {
  return (
    <>
      <circle className={className} cx={x} cy={y} r="5" />
      <text
        className="direct-label"
        x={side === 'left' ? x - 10 : x + 10}
        y={y + 4}
        textAnchor={side === 'left' ? 'end' : 'start'}
      >
        {label}
      </text>
    </>
  );
}

/** Trials under the axis, each open to the cell that states its binder content. */
function Axis({ geometry: { frame, trials }, params }: { geometry: RoomGeometry; params: RevisionParams }) {
  const navigate = useNavigate();
  return (
    <>
      <path className="axis" d={`M${frame.left} ${frame.bottom}H${frame.right}`} />
      {trials.map(({ x, content, name, source }) => {
        const open =
          source === null
            ? undefined
            : () => void navigate(paths.reading(params.submittalId, params.number, source));
        const said = `${name}, ${content} % binder`;
        return (
          // biome-ignore lint/a11y/useSemanticElements: a link inside a drawing; an SVG anchor would reload the page.
          <g
            key={name}
            className="point"
            role="link"
            tabIndex={0}
            aria-label={open ? `${said}. Open its cell.` : said}
            aria-disabled={open === undefined || undefined}
            onClick={open}
            onKeyDown={(event) => {
              if (event.key === 'Enter') open?.();
            }}
          >
            <title>{said}</title>
            <rect className="hit-area" x={x - 24} y={frame.bottom} width="48" height="40" />
            <path className="axis" d={`M${x} ${frame.bottom}v5`} />
            <text x={x} y={frame.bottom + 18} textAnchor="middle">
              {content}
            </text>
            <text x={x} y={frame.bottom + 33} textAnchor="middle">
              {name}
            </text>
          </g>
        );
      })}
      {frame.left < 100 ? null : (
        <text x="0" y={frame.bottom + 18}>
          Binder content, %
        </text>
      )}
    </>
  );
}
