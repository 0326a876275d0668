import type { ReadingPreview } from '#shared/contracts/corrections';
import { countInFigures } from '#shared/format/numbers';
import { OutcomeWord } from '../../../components/ui/outcome-word';
import { RichText } from '../../../components/ui/rich-text';
import { changesNothing, readingCountWords, valueWords } from '../lib/preview-words';

const mostReadings = 6;
const mostFindings = 8;

/** Findings whose outcome would change, then readings, doubts, and what the mapping would remember. */
export function PreviewLines({ preview }: { preview: ReadingPreview }) {
  if (changesNothing(preview)) {
    return (
      <>
        <p className="small mute">It would change nothing.</p>
        <MappingLines preview={preview} />
      </>
    );
  }
  return (
    <>
      <ChangedFindings findings={preview.findings} />
      <ChangedReadings preview={preview} />
      <ChangedAttributes attributes={preview.attributes} />
      <ChangedDoubts doubts={preview.doubts} />
      <MappingLines preview={preview} />
    </>
  );
}

function ChangedFindings({ findings }: { findings: ReadingPreview['findings'] }) {
  if (findings.length === 0) return <p className="small">No outcome changes.</p>;
  const left = findings.length - mostFindings;
  return (
    <ul>
      {findings.slice(0, mostFindings).map(({ key, clause, title, before, after }) => (
        <li key={key} className="preview-finding">
          <span>
            <b>{clause ?? title}</b> {clause ? <RichText>{title}</RichText> : null}
          </span>
          <span className="preview-outcomes">
            {before ? (
              <span className="preview-before">
                <OutcomeWord outcome={before.outcome} />
              </span>
            ) : null}
            <span className="hidden-text"> becomes </span>
            {after ? (
              <OutcomeWord outcome={after.outcome} qualifiers={after.borderline ? ['borderline'] : []} />
            ) : (
              'no longer asked'
            )}
          </span>
          {after ? (
            <span className="small mute">
              <RichText>{after.sentence}</RichText>
            </span>
          ) : null}
        </li>
      ))}
      {left > 0 ? <li className="small mute">and {countInFigures(left, 'more finding')}</li> : null}
    </ul>
  );
}

function ChangedReadings({ preview: { readings, counts } }: { preview: ReadingPreview }) {
  const left = counts.added + counts.removed + counts.changed - Math.min(readings.length, mostReadings);
  return (
    <>
      <p className="small pt-1">{readingCountWords(counts)}</p>
      <ul>
        {readings.slice(0, mostReadings).map(({ label, before, after }) => (
          <li
            key={`${label} ${before?.source?.cell} ${after?.source?.cell} ${after?.value}`}
            className="preview-reading"
          >
            <RichText>{label}</RichText>
            <BeforeAfter before={valueWords(before)} after={valueWords(after)} />
          </li>
        ))}
        {left > 0 ? <li className="small mute">and {countInFigures(left, 'more reading')}</li> : null}
      </ul>
    </>
  );
}

function ChangedAttributes({ attributes }: { attributes: ReadingPreview['attributes'] }) {
  return (
    <ul>
      {attributes.map(({ name, label, before, after }) => (
        <li key={name} className="preview-reading">
          <span>{label}</span>
          <BeforeAfter
            before={before === null ? null : String(before)}
            after={after === null ? null : String(after)}
          />
        </li>
      ))}
    </ul>
  );
}

function BeforeAfter({ before, after }: { before: string | null; after: string | null }) {
  return (
    <span className="number">
      {before === null ? null : <del className="changed-old">{before}</del>}
      {after === null ? (
        <span className="mute">no longer read</span>
      ) : (
        <ins className="changed-new">{after}</ins>
      )}
    </span>
  );
}

function ChangedDoubts({ doubts }: { doubts: ReadingPreview['doubts'] }) {
  return (
    <>
      {doubts.before === doubts.after ? null : (
        <p className="small pt-1">
          {countInFigures(doubts.before, 'doubt')} now, {doubts.after} then.
        </p>
      )}
      <ul>
        {doubts.raised.map(({ sheet, cell, reason }) => (
          <li key={`${sheet} ${cell} ${reason}`} className="small">
            Raises a doubt at {`${sheet} ${cell}`.trim()}: <RichText>{reason}</RichText>
          </li>
        ))}
      </ul>
    </>
  );
}

function MappingLines({ preview: { learned, notLearned } }: { preview: ReadingPreview }) {
  if (learned.length + notLearned.length === 0) return null;
  return (
    <ul className="preview-learned">
      {learned.map((sentence) => (
        <li key={sentence}>
          The mapping remembers: <RichText>{sentence}</RichText>
        </li>
      ))}
      {notLearned.map((sentence) => (
        <li key={sentence}>
          For this workbook only: <RichText>{sentence}</RichText>
        </li>
      ))}
    </ul>
  );
}
