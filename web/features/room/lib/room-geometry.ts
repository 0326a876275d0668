import { scaleLinear } from 'd3-scale';
import type { RoomOfRule } from '#rules/engine/room';
import { contentWords, holdsWords } from '#rules/engine/room-words';
import type { RoomView } from '#shared/contracts/room';

export interface RoomSize {
  widthPx: number;
  /** Room for the rules' names left of the drawing; 0 where they stand above their bars. */
  namesPx: number;
  rowPx: number;
}

export interface RoomEnd {
  x: number;
  /** A tick where the rule closes it; dotted where the trials end. */
  kind: 'limit' | 'trials';
  /** True for the two ticks that close the room: heavier, and numbered. */
  closesRoom: boolean;
}

export interface RoomRow {
  rule: RoomOfRule;
  /** Middle of the bar. */
  y: number;
  bars: { x1: number; x2: number; ends: [RoomEnd, RoomEnd] }[];
  /** What stands in place of a bar: `left out`, `nowhere within the trials`. */
  words: string | null;
  nameY: number;
}

export interface RoomDot {
  x: number;
  label: string;
  /** Where the label stands beside its dot. */
  side: 'left' | 'right';
}

export interface RoomGeometry {
  heightPx: number;
  frame: { left: number; right: number; top: number; bottom: number };
  rows: RoomRow[];
  room: { x1: number; x2: number; label: string; labelX: number; from: string; to: string } | null;
  designY: number;
  present: RoomDot | null;
  earlier: RoomDot | null;
  trials: { x: number; content: string; name: string; source: { sheet: string; cell: string } | null }[];
}

const headPx = 24;
const axisPx = 44;
/** A half of the room's label, so that it does not leave the frame. */
const labelHalfPx = 62;

export function roomGeometry(
  { room, earlier }: Pick<RoomView, 'earlier'> & { room: NonNullable<RoomView['room']> },
  revision: number,
  { widthPx, namesPx, rowPx }: RoomSize,
): RoomGeometry {
  const { declaredBinderContent: declared, trials, rules } = room;
  const contents = [
    ...trials.map(({ binderContent }) => binderContent),
    ...[declared, earlier?.binderContent].filter((content) => content != null),
  ];
  const frame = {
    left: namesPx + 8,
    right: widthPx - 8,
    top: headPx,
    bottom: headPx + rowPx * (rules.length + 1),
  };
  const pad = (Math.max(...contents) - Math.min(...contents) || 1) * 0.04;
  const x = scaleLinear()
    .domain([Math.min(...contents) - pad, Math.max(...contents) + pad])
    .range([frame.left, frame.right]);
  const rowMiddle = (index: number) => headPx + rowPx * index + rowPx / 2 + (namesPx === 0 ? 8 : 0);
  const other = earlier !== null && earlier.binderContent !== declared ? earlier : null;
  const isRightOf = (content: number) => declared === null || declared > content;
  // A label keeps clear of the other dot, else of the room.
  const presentIsRight =
    other === null ? room.room === null || isRightOf(room.room.from - 1e-9) : isRightOf(other.binderContent);
  return {
    heightPx: frame.bottom + axisPx,
    frame,
    rows: rules.map((rule, index) => rowOf(rule, room.room, rowMiddle(index), x, namesPx === 0)),
    room: room.room && {
      x1: x(room.room.from),
      x2: x(room.room.to),
      label: `room ${contentWords(room.room.from)} to ${contentWords(room.room.to)}`,
      labelX: Math.min(
        frame.right - labelHalfPx,
        Math.max(frame.left + labelHalfPx, (x(room.room.from) + x(room.room.to)) / 2),
      ),
      from: contentWords(room.room.from),
      to: contentWords(room.room.to),
    },
    designY: rowMiddle(rules.length),
    present:
      declared === null
        ? null
        : {
            x: x(declared),
            label: `r${revision} ${contentWords(declared)}`,
            side: presentIsRight ? 'right' : 'left',
          },
    earlier: other && {
      x: x(other.binderContent),
      label: `r${other.revision} ${contentWords(other.binderContent)}`,
      side: presentIsRight ? 'left' : 'right',
    },
    trials: trials.map(({ trial, binderContent, source }) => ({
      x: x(binderContent),
      content: contentWords(binderContent),
      name: trial === 'design' ? 'design' : `trial ${trial}`,
      source: source && { sheet: source.sheet, cell: source.cell },
    })),
  };
}

function rowOf(
  rule: RoomOfRule,
  room: NonNullable<RoomView['room']>['room'],
  y: number,
  x: (content: number) => number,
  isNameAbove: boolean,
): RoomRow {
  const closes = (content: number, ids: readonly string[] | undefined, end: number | undefined) =>
    content === end && (ids ?? []).includes(rule.rule);
  const bars = rule.holds.map(({ from, to, below, above }) => ({
    x1: x(from),
    x2: x(to),
    ends: [
      { x: x(from), kind: below, closesRoom: closes(from, room?.closedBelowBy, room?.from) },
      { x: x(to), kind: above, closesRoom: closes(to, room?.closedAboveBy, room?.to) },
    ] as [RoomEnd, RoomEnd],
  }));
  const words = bars.length > 0 ? null : rule.state === 'not computed' ? 'not computed' : holdsWords(rule);
  return { rule, y, bars, words, nameY: isNameAbove ? y - 15 : y + 4 };
}
