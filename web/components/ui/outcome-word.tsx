import type { Outcome } from '#rules/engine/finding';
import { Mark } from './mark';
import { colourOfMark, markOfOutcome, wordOfOutcome } from './marks';

/** Mark and word, which never part; then what qualifies them: borderline, waived, `3 of 5`, fitted. */
export function OutcomeWord({
  outcome,
  waived = false,
  qualifiers = [],
}: {
  outcome: Outcome;
  waived?: boolean;
  qualifiers?: readonly string[];
}) {
  const mark = waived ? 'waived' : markOfOutcome[outcome];
  const words = waived ? ['waived', ...qualifiers] : qualifiers;
  return (
    <span className={`outcome ${colourOfMark[mark]}`}>
      <Mark name={mark} />
      <span>
        <b>{wordOfOutcome[outcome]}</b>
        {words.length > 0 ? (
          <>
            {' '}
            <small>{words.join(', ')}</small>
          </>
        ) : null}
      </span>
    </span>
  );
}
