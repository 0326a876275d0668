import { useState } from 'react';
import type { Finding } from '#rules/engine/finding';
import { colourOfMark, markOfOutcome } from '../../../components/ui/marks';
import { RichText } from '../../../components/ui/rich-text';
import { mainTie, type Tie, tiesOf } from '../lib/ties';
import { CellStep } from './cell-step';
import { CreepStep } from './creep-step';
import { FormulaStep } from './formula-step';
import { InputsStep } from './inputs-step';
import { NextStep } from './next-step';
import { RuleStep } from './rule-step';
import { SheetInPlace } from './sheet-in-place';

/** From the outcome down to the cell, on the same page; beside it the sheet as it was uploaded. */
export function EvidenceThread({ finding }: { finding: Finding }) {
  const ties = tiesOf(finding);
  const [chosen, choose] = useState<Tie | null>(null);
  const tie = chosen ?? mainTie(finding, ties);
  return (
    <div className="evidence">
      <dl className="thread">
        <dt>Finding</dt>
        <dd>
          <b className={colourOfMark[markOfOutcome[finding.outcome]]}>
            <RichText>{finding.sentence}</RichText>
          </b>{' '}
          <RichText>{finding.reason}</RichText>
        </dd>
        <RuleStep finding={finding} />
        {finding.roundingSentence ? (
          <>
            <dt>Rounding</dt>
            <dd>{finding.roundingSentence}</dd>
          </>
        ) : null}
        <FormulaStep finding={finding} ties={ties} onShow={choose} />
        {finding.kind === 'creep-compliance' ? <CreepStep finding={finding} /> : null}
        <InputsStep finding={finding} ties={ties} onShow={choose} />
        <CellStep finding={finding} ties={ties} onShow={choose} />
        <NextStep finding={finding} />
        {finding.advice ? (
          <>
            <dt>Advice</dt>
            <dd>
              <RichText>{finding.advice}</RichText>
            </dd>
          </>
        ) : null}
      </dl>
      {tie ? <SheetInPlace tie={tie} ties={ties} outcome={finding.outcome} /> : null}
    </div>
  );
}
