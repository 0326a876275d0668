import { memo, type ReactNode, useId } from 'react';
import { Radio, RadioGroup } from 'react-aria-components';
import { RichText } from '../../../components/ui/rich-text';
import { useStable } from '../../../lib/use-stable';
import {
  choicesOf,
  doubtCountWords,
  isAt,
  type ProposedAnswer,
  type ReadingDoubt,
} from '../lib/doubt-answers';
import type { Place } from '../lib/first-place';

/** Every doubt with its letter, its cell and what the cell may mean; one answer each, which can be changed. */
export function DoubtList({
  doubts,
  cursor,
  onCursor,
  proposed,
  onPropose,
  proposalOf,
  canAnswer,
  excerptOf,
}: {
  doubts: readonly ReadingDoubt[];
  cursor: Place;
  onCursor: (place: Place) => void;
  /** The answer that is shown with what it would change, before it is kept. */
  proposed: ProposedAnswer | null;
  onPropose: (doubt: ReadingDoubt, answer: string | null) => void;
  proposalOf: (proposed: ProposedAnswer) => ReactNode;
  canAnswer: boolean;
  /** On a narrow page each doubt carries the rows around its cell. */
  excerptOf?: (doubt: ReadingDoubt) => ReactNode;
}) {
  const goTo = useStable(onCursor);
  const propose = useStable(onPropose);
  return (
    <section aria-labelledby="in-doubt">
      <div className="side-head">
        <h2 id="in-doubt">In doubt</h2>
        <span>{doubtCountWords(doubts)}</span>
      </div>
      {doubts.length === 0 ? (
        <p className="small mute py-2">Every cell that was used was read with certainty.</p>
      ) : (
        <ol>
          {doubts.map((doubt) => (
            <DoubtItem
              key={`${doubt.sheet}!${doubt.cell}!${doubt.reason}`}
              doubt={doubt}
              isCurrent={isAt(doubt, cursor)}
              cursorSheet={cursor.sheet}
              onCursor={goTo}
              shown={proposed && isAt(doubt, proposed.doubt) ? proposed.answer : doubt.answer}
              proposal={proposed && isAt(doubt, proposed.doubt) ? proposalOf(proposed) : null}
              onPropose={propose}
              canAnswer={canAnswer}
              excerpt={excerptOf?.(doubt)}
            />
          ))}
        </ol>
      )}
    </section>
  );
}

/** A cursor that moves draws the doubts that it leaves and reaches, however many there are. */
const DoubtItem = memo(function DoubtItem({
  doubt,
  isCurrent,
  cursorSheet,
  onCursor,
  shown,
  proposal,
  onPropose,
  canAnswer,
  excerpt,
}: {
  doubt: ReadingDoubt;
  isCurrent: boolean;
  cursorSheet: string;
  onCursor: (place: Place) => void;
  /** The answer that is proposed, else the one that is kept. */
  shown: string | null;
  /** What the proposed answer would change. */
  proposal: ReactNode;
  onPropose: (doubt: ReadingDoubt, answer: string | null) => void;
  canAnswer: boolean;
  excerpt: ReactNode;
}) {
  const questionId = useId();
  const goHere = () => onCursor({ sheet: doubt.sheet, cell: doubt.cell });
  return (
    <li id={doubtId(doubt)} className={isCurrent ? 'doubt is-current' : 'doubt'}>
      <span className="tie tie-doubt">{doubt.letter}</span>
      <p id={questionId}>
        <button type="button" className="cell-link" onClick={goHere}>
          {doubt.sheet === cursorSheet || doubt.sheet === '' ? doubt.cell : `${doubt.sheet} ${doubt.cell}`}
        </button>{' '}
        <RichText>{withoutCell(doubt)}</RichText>
      </p>
      {excerpt}
      <RadioGroup
        aria-labelledby={questionId}
        className="doubt-choices"
        value={shown}
        onChange={(answer) => onPropose(doubt, answer)}
        onFocus={goHere}
        isDisabled={!canAnswer}
        orientation="horizontal"
      >
        {choicesOf(doubt).map(({ answer, label }) => (
          <Radio key={answer} value={answer} className="choice choice-radio">
            {label}
          </Radio>
        ))}
      </RadioGroup>
      {proposal}
      {doubt.answer !== null && canAnswer && proposal === null ? (
        <button type="button" className="cell-link small" onClick={() => onPropose(doubt, null)}>
          Take the answer back
        </button>
      ) : null}
    </li>
  );
});

/** The cell stands before the reason already, as what leads to it. */
function withoutCell({ cell, reason }: Pick<ReadingDoubt, 'cell' | 'reason'>): string {
  return reason.startsWith(`${cell} `) ? reason.slice(cell.length + 1) : reason;
}

export function doubtId(doubt: { sheet: string; cell: string }): string {
  return `doubt-${encodeURIComponent(doubt.sheet)}-${doubt.cell}`;
}
