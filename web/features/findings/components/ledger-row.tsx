import { clauseParts } from '#shared/format/clause';
import { findingFragment } from '#shared/format/finding-key';
import { marginText, observedText } from '#shared/format/margin';
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
  // A document's date has no gauge and takes its room.
  const isWide = finding.kind === 'document' && isWords(finding);
  const classes = [
    'ledger-entry',
    finding.outcome === 'fail' ? 'outcome-fail-row' : '',
    row.moved ? 'is-changed' : '',
    isOpen ? 'is-open' : '',
  ];
  return (
    <tbody className={classes.filter((each) => each !== '').join(' ')} id={fragment}>
      <tr className="ledger-row">
        <th className="ledger-clause" scope="row">
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
        </th>
        <Requirement row={row} />
        <Observed row={row} isWide={isWide} />
        {isWide ? null : <GaugeCell row={row} />}
        <td className="ledger-margin">
          {groupThousands(marginText(finding))}
          <span className="margin-mark">{finding.borderline ? <Mark name="borderline" /> : null}</span>
        </td>
        <td className="ledger-outcome">
          <OutcomeWord
            outcome={finding.outcome}
            waived={row.waiver !== null && finding.outcome === 'fail'}
            qualifiers={outcomeQualifiers(finding)}
          />
        </td>
        <td className="ledger-notes">
          <MarginNotes row={row} isOpen={isOpen} />
        </td>
      </tr>
      {isOpen ? (
        <tr className="ledger-evidence" id={`${fragment}-evidence`}>
          <td colSpan={7}>
            <EvidenceThread finding={finding} />
          </td>
        </tr>
      ) : null}
    </tbody>
  );
}

function ClauseOf({ row: { finding } }: { row: Row }) {
  if (finding.clause === null) {
    return (
      <>
        <i>check</i>
        <span className="hidden-text">: {finding.title}</span>
      </>
    );
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
  const { before, key, after } =
    finding.clause === null
      ? { before: '', key: `${finding.title}. `, after: finding.sentence }
      : requirementParts(finding);
  return (
    <td className="ledger-sentence">
      <RichText>{before}</RichText>
      <b>
        <RichText>{key}</RichText>
      </b>
      <RichText>{after}</RichText>
      {finding.outcome === 'not applicable' ? <span className="mute"> {finding.reason}</span> : null}
    </td>
  );
}

function Observed({ row: { finding, moved }, isWide }: { row: Row; isWide: boolean }) {
  const { observed } = finding;
  const words = isWords(finding);
  const isShown =
    observed !== null && finding.outcome !== 'not shown' && finding.outcome !== 'not applicable';
  const previous = moved?.previousText ?? null;
  return (
    <td
      className={`ledger-observed${words ? ' is-words' : ''}${isWide ? ' is-wide' : ''}`}
      colSpan={isWide ? 2 : undefined}
    >
      {isShown ? (
        <>
          {words ? observed.text : groupThousands(observedText(observed))}
          {words ? null : <span className="unit-slot">{unitWord(observed.unit)}</span>}
        </>
      ) : null}
      {previous && previous !== observed?.text ? (
        <span className="observed-before">
          <span className="hidden-text">in the revision before </span>
          <del>{previous}</del>
        </span>
      ) : null}
    </td>
  );
}

function GaugeCell({ row: { finding } }: { row: Row }) {
  const widthPx = useGaugeWidth();
  return (
    <td className="ledger-gauge">
      <Gauge finding={finding} widthPx={widthPx} />
    </td>
  );
}
