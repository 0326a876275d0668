import { memo, useState } from 'react';
import type { ReadingView } from '#shared/contracts/readings';
import { countInFigures } from '#shared/format/numbers';
import { Button } from '../../../components/ui/button';
import { RichText } from '../../../components/ui/rich-text';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { groupUnread } from '../lib/group-unread';
import { CellLink } from './cell-link';

const kindsAtFirst = 6;

/** What was understood, in groups, each with its first cell. */
export const Understood = memo(function Understood({
  params,
  reading,
}: {
  params: RevisionParams;
  reading: ReadingView;
}) {
  const { readings, attributes, documents } = reading.counts;
  const [showsAll, setShowsAll] = useState(false);
  const shown = showsAll ? reading.understood : reading.understood.slice(0, kindsAtFirst);
  const hidden = reading.understood.length - shown.length;
  return (
    <section aria-labelledby="understood">
      <div className="side-head">
        <h2 id="understood">Understood</h2>
        <span>{`${countInFigures(readings, 'reading')}, ${countInFigures(attributes, 'attribute')}, ${countInFigures(documents, 'document')}`}</span>
      </div>
      {reading.understood.length === 0 ? (
        <p className="small mute py-2">
          No reading was understood. The template of the section is always read.
        </p>
      ) : (
        <ul>
          {shown.map((group) => (
            <li key={`${group.label} ${group.sheet} ${group.cell}`} className="understood">
              <span>
                <RichText>{group.label}</RichText>
              </span>
              <span className="number">{group.count}</span>
              <CellLink params={params} sheet={group.sheet} cell={group.cell} />
            </li>
          ))}
        </ul>
      )}
      {hidden > 0 ? (
        <Button kind="text" onPress={() => setShowsAll(true)}>
          {`Show ${countInFigures(hidden, 'more kind')}`}
        </Button>
      ) : null}
    </section>
  );
});

/** Cells that hold something and were not used, with the reason. */
export const NotUsed = memo(function NotUsed({
  params,
  reading,
}: {
  params: RevisionParams;
  reading: ReadingView;
}) {
  const groups = groupUnread(reading.unread);
  return (
    <section aria-labelledby="not-used">
      <div className="side-head">
        <h2 id="not-used">Not used</h2>
        <span>{countInFigures(reading.unread.length, 'cell holds something', 'cells hold something')}</span>
      </div>
      {groups.length === 0 ? (
        <p className="small mute py-2">Every cell that holds something was used.</p>
      ) : (
        <ul>
          {groups.map((group) => (
            <li key={`${group.sheet} ${group.cell}`} className="not-used">
              <CellLink params={params} sheet={group.sheet} cell={group.cell} />
              <span>
                <RichText>{group.reason}</RichText>
                {group.text === null
                  ? `; ${countInFigures(group.count, 'cell')}`
                  : ` “${shortened(group.text)}”`}
              </span>
            </li>
          ))}
        </ul>
      )}
    </section>
  );
});

function shortened(text: string): string {
  return text.length > 60 ? `${text.slice(0, 57)}…` : text;
}
