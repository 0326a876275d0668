import { useState } from 'react';
import type { ReadingView } from '#shared/contracts/readings';
import { dateOfInstant, formatDate } from '#shared/format/dates';
import { countInFigures } from '#shared/format/numbers';
import { Button } from '../../../components/ui/button';
import { RichText } from '../../../components/ui/rich-text';
import { type RevisionParams, useRevision } from '../../../lib/queries/revision-query';
import type { ReadingChoices } from '../api/get-reading-choices';
import { useReadingChoices } from '../api/get-reading-choices';
import type { ReadingActs } from '../hooks/use-reading-acts';
import { anAct } from '../lib/reading-act';
import { saidWords } from '../lib/said-words';
import { CellLink } from './cell-link';
import { Proposal } from './proposal';

/** What people said cells are, by whom and when; each can be taken back, and the last act undone. */
export function SaidList({
  params,
  reading,
  acts,
}: {
  params: RevisionParams;
  reading: ReadingView;
  acts: ReadingActs;
}) {
  const { data: choices } = useReadingChoices(params);
  const { corrections } = reading;
  if (corrections.length === 0 && acts.undoes === null && acts.redoes === null) return null;
  return (
    <section aria-labelledby="said">
      <div className="side-head">
        <h2 id="said">Said by people</h2>
        <span>{corrections.length === 0 ? '' : countInFigures(corrections.length, 'block')}</span>
      </div>
      <UndoLine acts={acts} />
      <ul>
        {[...corrections].reverse().map((correction) => (
          <SaidItem
            key={correction.id}
            params={params}
            reading={reading}
            correction={correction}
            choices={choices}
            acts={acts}
          />
        ))}
      </ul>
    </section>
  );
}

function UndoLine({ acts }: { acts: ReadingActs }) {
  if (acts.undoes === null && acts.redoes === null) return null;
  return (
    <p className="undo-line">
      {acts.undoes === null ? null : (
        <Button kind="text" keyHint="U" onPress={acts.undo} isDisabled={acts.isPending}>
          Undo {acts.undoes}
        </Button>
      )}
      {acts.redoes === null ? null : (
        <Button kind="text" keyHint="R" onPress={acts.redo} isDisabled={acts.isPending}>
          Do {acts.redoes} again
        </Button>
      )}
    </p>
  );
}

function SaidItem({
  params,
  reading,
  correction,
  choices,
  acts,
}: {
  params: RevisionParams;
  reading: ReadingView;
  correction: ReadingView['corrections'][number];
  choices: ReadingChoices | undefined;
  acts: ReadingActs;
}) {
  const { timeZone } = useRevision(params).agency;
  const [isLeaving, setIsLeaving] = useState(false);
  const { id, sheet, range, says, by, at } = correction;
  const act = anAct({ takeBack: [id] });
  return (
    <li className="said">
      <p>
        <CellLink params={params} sheet={sheet} cell={range} />{' '}
        <RichText>{saidWords(says, choices)}</RichText>
      </p>
      <p className="small mute">
        {by}, {formatDate(dateOfInstant(at, timeZone))}
        {reading.abilities.answer && !isLeaving ? (
          <button type="button" className="cell-link small" onClick={() => setIsLeaving(true)}>
            Take it back
          </button>
        ) : null}
      </p>
      {isLeaving ? (
        <Proposal
          params={params}
          version={reading.version}
          act={act}
          keepLabel="Take it back"
          onKeep={() => acts.keep(act, `taking back what ${range} is`)}
          onLeave={() => setIsLeaving(false)}
          isKeeping={acts.isPending}
        />
      ) : null}
    </li>
  );
}
