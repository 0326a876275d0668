import { clauseParts } from '#shared/format/clause';
import { findingFragment } from '#shared/format/finding-key';
import { marginText } from '#shared/format/margin';
import { groupThousands } from '#shared/format/numbers';
import { unitWord } from '#shared/format/units';
import { Gauge } from '../../../components/ui/gauge';
import { Mark } from '../../../components/ui/mark';
import { OutcomeWord } from '../../../components/ui/outcome-word';
import { RichText } from '../../../components/ui/rich-text';
import { useGaugeWidth } from '../../../lib/use-gauge-width';
import type { LedgerRow as Row } from '../lib/ledger';
import { requirementParts } from '../lib/requirement-words';
import { isWords, outcomeQualifiers } from '../lib/row-words';
import { EvidenceThread } from './evidence-thread';
import { useLedger } from './ledger-context';
import { MarginNotes } from './margin-notes';

/** One finding: hanging clause, requirement, what was observed, where it stands, how it came out. */
export function LedgerRow({ row }: { row: Row }) {
  const { open, toggle } = useLedger();
  const { finding } = row;
  const isOpen = open.has(row.key);
  const fragment = findingFragment(finding);
  const classes = [
    'ledger-entry',
    finding.outcome === 'fail' ? 'outcome-fail-row' : '',
    row.moved ? 'is-changed' : '',
    isOpen ? 'is-open' : '',
  ];
  return (
    <div className={classes.filter((each) => each !== '').join(' ')} id={fragment} role="presentation">
      <div className="ledger-row" role="row">
        <div className="ledger-clause" role="rowheader">
          <button
            type="button"
            className="clause-button"
            aria-expanded={isOpen}
            aria-controls={isOpen ? `${fragment}-evidence` : undefined}
            data-row={row.key}
            onClick={() => toggle(row.key)}
          >
            <ClauseOf row={row} />
          </button>
        </div>
        <Requirement row={row} />
        <Observed row={row} />
        <GaugeCell row={row} />
        <div className="ledger-margin" role="cell">
          {marginText(finding)}
          <span className="margin-mark">{finding.borderline ? <Mark name="borderline" /> : null}</span>
        </div>
        <div className="ledger-outcome" role="cell">
          <OutcomeWord
            outcome={finding.outcome}
            waived={row.waiver !== null && finding.outcome === 'fail'}
            qualifiers={outcomeQualifiers(finding)}
          />
        </div>
        <div className="ledger-notes" role="cell">
          <MarginNotes row={row} isOpen={isOpen} />
        </div>
      </div>
      {isOpen ? (
        <div role="row" id={`${fragment}-evidence`}>
          <div role="cell" aria-colspan={7}>
            <EvidenceThread finding={finding} />
          </div>
        </div>
      ) : null}
    </div>
  );
}

function ClauseOf({ row: { finding } }: { row: Row }) {
  if (finding.clause === null) {
    return <span className="hidden-text">Open {finding.title}</span>;
  }
  const { section, letter } = clauseParts(finding.clause);
  return letter === '' ? (
    section
  ) : (
    <>
      <i>{section}</i>
      {letter}
    </>
  );
}

function Requirement({ row: { finding } }: { row: Row }) {
  const { before, key, after } = requirementParts(finding);
  return (
    <div className="ledger-sentence" role="cell">
      <RichText>{before}</RichText>
      <b>
        <RichText>{key}</RichText>
      </b>
      <RichText>{after}</RichText>
      {finding.outcome === 'not applicable' ? <span className="mute"> {finding.reason}</span> : null}
    </div>
  );
}

function Observed({ row: { finding, moved } }: { row: Row }) {
  const { observed } = finding;
  const words = isWords(finding);
  const isShown =
    observed !== null && finding.outcome !== 'not shown' && finding.outcome !== 'not applicable';
  const previous = moved?.previousText ?? null;
  return (
    <div className={`ledger-observed${words ? ' is-words' : ''}`} role="cell">
      {isShown ? (
        <>
          {words ? observed.text : groupThousands(observed.text)}
          {words ? null : <span className="unit-slot">{unitWord(observed.unit)}</span>}
        </>
      ) : null}
      {previous && previous !== observed?.text ? (
        <span className="observed-before">
          <span className="hidden-text">in the revision before </span>
          <del>{previous}</del>
        </span>
      ) : null}
    </div>
  );
}

function GaugeCell({ row: { finding } }: { row: Row }) {
  const widthPx = useGaugeWidth();
  return (
    <div className="ledger-gauge" role="cell">
      <Gauge finding={finding} widthPx={widthPx} />
    </div>
  );
}
