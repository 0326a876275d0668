import type { CheckResult } from '#rules/engine/finding';
import { roomWords } from '#rules/engine/room-words';
import type { RoomView } from '#shared/contracts/room';

/** The room to move of a check in figures and words, with the content that the revision before declared. */
export function roomView(
  { analysis }: Pick<CheckResult, 'analysis'>,
  before: { revision: number; result: Pick<CheckResult, 'analysis'> } | null,
): Pick<RoomView, 'room' | 'earlier'> {
  const room = analysis.roomToMove;
  const declared = before?.result.analysis.designPoint?.declaredBinderContent ?? null;
  return {
    room: room && { ...room, words: roomWords(room) },
    earlier:
      before === null || declared === null ? null : { revision: before.revision, binderContent: declared },
  };
}
