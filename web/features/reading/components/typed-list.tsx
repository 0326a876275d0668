import { useState } from 'react';
import type { ReadingView } from '#shared/contracts/readings';
import { dateOfInstant, formatDate } from '#shared/format/dates';
import { countInFigures } from '#shared/format/numbers';
import { Button } from '../../../components/ui/button';
import { Mark } from '../../../components/ui/mark';
import { RichText } from '../../../components/ui/rich-text';
import { type RevisionParams, useRevision } from '../../../lib/queries/revision-query';
import type { ReadingActs } from '../hooks/use-reading-acts';
import { valueWords } from '../lib/preview-words';
import { anAct, typedAgain } from '../lib/reading-act';
import { emptyTypedForm, formOfTyped } from '../lib/typed-form';
import { Proposal } from './proposal';
import { TypedReadingForm } from './typed-reading-form';

type Typed = ReadingView['typed'][number];

interface Shared {
  params: RevisionParams;
  reading: ReadingView;
  acts: ReadingActs;
}

/** Readings that no cell of the workbook gives: entered by hand, marked as typed, by whom and when. */
export function TypedList({ params, reading, acts }: Shared) {
  const [isAdding, setIsAdding] = useState(false);
  const { typed, abilities } = reading;
  return (
    <section aria-labelledby="typed-readings">
      <div className="side-head">
        <h2 id="typed-readings">Typed readings</h2>
        <span>{typed.length === 0 ? 'none' : countInFigures(typed.length, 'reading')}</span>
      </div>
      <ul>
        {typed.map((each) => (
          <TypedItem key={each.id} typed={each} params={params} reading={reading} acts={acts} />
        ))}
      </ul>
      {abilities.answer && !isAdding ? (
        <Button kind="text" onPress={() => setIsAdding(true)}>
          Type a reading
        </Button>
      ) : null}
      {isAdding ? (
        <TypedReadingForm
          params={params}
          reading={reading}
          acts={acts}
          start={emptyTypedForm}
          replaces={null}
          onDone={() => setIsAdding(false)}
        />
      ) : null}
    </section>
  );
}

function TypedItem({ typed, params, reading, acts }: Shared & { typed: Typed }) {
  const { timeZone } = useRevision(params).agency;
  const [open, setOpen] = useState<'change' | 'withdrawal' | null>(null);
  const close = () => setOpen(null);
  const act = anAct({ takeBack: [typed.id] });
  return (
    <li className="said">
      <p className="preview-reading">
        <RichText>{typed.label}</RichText>
        <span className="number">
          <b>{valueWords(typed.reading)}</b>
        </span>
      </p>
      <p className="small mute">
        typed by {typed.by}, {formatDate(dateOfInstant(typed.at, timeZone))}
        {reading.abilities.answer && open === null ? <TypedActs typed={typed} onOpen={setOpen} /> : null}
      </p>
      {typed.overruled === null ? null : (
        <p className="stale-line small">
          <Mark name="undecided" />
          <span>
            It does not count: <RichText>{typed.overruled}</RichText>
          </span>
        </p>
      )}
      {open === 'change' ? (
        <TypedReadingForm
          params={params}
          reading={reading}
          acts={acts}
          start={formOfTyped(typedAgain(typed.reading))}
          replaces={typed.id}
          onDone={close}
        />
      ) : null}
      {open === 'withdrawal' ? (
        <Proposal
          params={params}
          version={reading.version}
          act={act}
          keepLabel="Withdraw it"
          onKeep={() => acts.keep(act, `withdrawing ${typed.label}`)}
          onLeave={close}
          isKeeping={acts.isPending}
        />
      ) : null}
    </li>
  );
}

function TypedActs({ typed, onOpen }: { typed: Typed; onOpen: (form: 'change' | 'withdrawal') => void }) {
  return (
    <>
      <button
        type="button"
        className="cell-link small"
        onClick={() => onOpen('change')}
        aria-label={`Change ${typed.label}`}
      >
        Change
      </button>
      <button
        type="button"
        className="cell-link small"
        onClick={() => onOpen('withdrawal')}
        aria-label={`Withdraw ${typed.label}`}
      >
        Withdraw
      </button>
    </>
  );
}
