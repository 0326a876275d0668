import type { Evidence, Finding } from '#rules/engine/finding';
import { formatPlain } from '#shared/format/numbers';
import { withUnit } from '#shared/format/units';
import { QuantitySymbol } from '../../../components/ui/quantity-symbol';
import { evidenceName, placeWords } from '../lib/evidence-words';
import { type Tie, tieOf } from '../lib/ties';
import { FormulaWithValues } from './formula-step';
import { TieButton } from './tie-button';

/** What went into the value, each with how it came about; what was itself calculated shows its own workings. */
export function InputsStep({
  finding,
  ties,
  onShow,
}: {
  finding: Finding;
  ties: readonly Tie[];
  onShow: (tie: Tie) => void;
}) {
  const [first] = finding.evidence;
  const inputs = first?.formula ? [...(first.inputs ?? []), ...finding.evidence.slice(1)] : finding.evidence;
  if (inputs.length === 0) return null;
  return (
    <>
      <dt>Inputs</dt>
      <dd>
        <InputList inputs={inputs} ties={ties} onShow={onShow} />
      </dd>
    </>
  );
}

function InputList({
  inputs,
  ties,
  onShow,
}: {
  inputs: readonly Evidence[];
  ties: readonly Tie[];
  onShow: (tie: Tie) => void;
}) {
  return (
    <ul className="input-list">
      {inputs.map((input, index) => {
        const tie = tieOf(ties, input.source);
        return (
          // biome-ignore lint/suspicious/noArrayIndexKey: the inputs of a sealed check do not move.
          <li key={index}>
            {input.formula ? (
              <FormulaWithValues evidence={input} ties={ties} onShow={onShow} />
            ) : (
              <>
                {input.symbol ? (
                  <>
                    <QuantitySymbol>{input.symbol}</QuantitySymbol> ={' '}
                  </>
                ) : (
                  `${evidenceName(input)} `
                )}
                {inputValue(input)} {tie ? <TieButton tie={tie} onShow={onShow} /> : null}{' '}
                <span className="origin">
                  {[input.origin, placeWords(input), input.method].filter(Boolean).join(', ')}
                </span>
              </>
            )}
            {input.formula && input.inputs && input.inputs.length > 0 ? (
              <details>
                <summary className="origin">workings</summary>
                <InputList inputs={input.inputs} ties={ties} onShow={onShow} />
              </details>
            ) : null}
          </li>
        );
      })}
    </ul>
  );
}

function inputValue(input: Evidence): string {
  if (input.value === null) return input.text ?? '';
  return withUnit(formatPlain(input.value), input.unit);
}
