import type { ReactNode } from 'react';
import type { Evidence, Finding } from '#rules/engine/finding';
import { parseFormula } from '#shared/format/formula-tree';
import { formatPlain } from '#shared/format/numbers';
import { unitWord } from '#shared/format/units';
import { Formula } from '../../../components/ui/formula';
import { QuantitySymbol } from '../../../components/ui/quantity-symbol';
import { type Tie, tieOf } from '../lib/ties';
import { TieButton } from './tie-button';

interface StepProps {
  finding: Finding;
  ties: readonly Tie[];
  onShow: (tie: Tie) => void;
}

/** The formula of the judged value as a fraction, then the same with its values. */
export function FormulaStep({ finding, ties, onShow }: StepProps) {
  const judged = finding.evidence.find((evidence) => evidence.formula !== undefined);
  if (!judged) return null;
  return (
    <>
      <dt className={/[/∕÷]/.test(judged.formula ?? '') ? 'with-fraction' : undefined}>Formula</dt>
      <dd>
        <FormulaWithValues evidence={judged} ties={ties} onShow={onShow} />
      </dd>
    </>
  );
}

export function FormulaWithValues({
  evidence,
  ties,
  onShow,
}: {
  evidence: Evidence;
  ties: readonly Tie[];
  onShow: (tie: Tie) => void;
}) {
  const values = new Map<string, ReactNode>();
  for (const input of evidence.inputs ?? []) {
    if (!input.symbol || input.value === null || values.has(input.symbol)) continue;
    const tie = tieOf(ties, input.source);
    values.set(
      input.symbol,
      <span className="whitespace-nowrap">
        {formatPlain(input.value)} {tie ? <TieButton tie={tie} onShow={onShow} /> : null}
      </span>,
    );
  }
  const unit = unitWord(evidence.unit);
  // Words such as "mean of 3" have no places in which values could stand.
  const isSet = parseFormula(evidence.formula ?? '') !== null;
  return (
    <span className="equation">
      {evidence.symbol ? (
        <>
          <QuantitySymbol>{evidence.symbol}</QuantitySymbol> ={' '}
        </>
      ) : null}
      <Formula>{evidence.formula ?? ''}</Formula>
      {values.size > 0 && isSet ? (
        <>
          {' '}
          = <Formula values={values}>{evidence.formula ?? ''}</Formula>
        </>
      ) : null}
      {evidence.value === null ? null : (
        <span className="whitespace-nowrap">
          {' '}
          = {formatPlain(evidence.value)}
          {unit === '' ? null : ` ${unit}`}
        </span>
      )}
      <span className="origin">{evidence.origin}</span>
    </span>
  );
}
