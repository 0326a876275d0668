import type { CreepCurveView, CreepFindingView, CreepFitView } from '#shared/contracts/creep';
import { formatPlain, groupThousands } from '#shared/format/numbers';
import { Mark } from '../../../components/ui/mark';
import { QuantitySymbol } from '../../../components/ui/quantity-symbol';
import { RadioLine } from '../../../components/ui/radio-line';
import { otherModelWords } from '../lib/other-models';

export type ModelName = CreepFitView['model'];

const modelWords: Record<ModelName, string> = {
  sigmoid: 'Sigmoid',
  power: 'Power law',
  prony: 'Prony series',
};

const formulas: Record<ModelName, string> = {
  sigmoid: 'D(t) = D∞ + (D0 − D∞) / (1 + (t/τ)^n)',
  power: 'D(t) = D0 + D1·t^m',
  prony: 'D(t) = D0 + ΣDi·(1 − exp(−t/τi))',
};

/** Why a rule is not a pass, what the curve is made of, and what was looked at before it was fitted. */
export function CreepAside({
  curve,
  fit,
  model,
  onModel,
  hasMaster,
}: {
  curve: CreepCurveView;
  fit: CreepFitView | null;
  model: ModelName;
  onModel: (model: ModelName) => void;
  hasMaster: boolean;
}) {
  const open = curve.findings.filter(
    ({ finding }) => finding.outcome !== 'pass' && finding.outcome !== 'not applicable',
  );
  return (
    <>
      {open.map((view) => (
        <Why key={`${view.finding.rule}~${view.finding.subject}`} view={view} />
      ))}
      <h2>Fit</h2>
      {curve.fits.length > 1 ? (
        <RadioLine
          label="Model"
          hideLabel
          column
          choices={curve.fits.map((each) => ({ value: each.model, label: modelWords[each.model] }))}
          value={model}
          onChange={onModel}
        />
      ) : null}
      {fit === null ? <p className="small">No curve is fitted.</p> : <FitTable curve={curve} fit={fit} />}
      {curve.problems.map((problem) => (
        <p key={problem} className="small">
          {problem}
        </p>
      ))}
      <h2>Before the fit</h2>
      <ul className="creep-remarks">
        {curve.remarks.map(({ holds, text }) => (
          <li key={text}>
            <Mark name={holds ? 'pass' : 'undecided'} />
            <span>{unbroken(text)}</span>
          </li>
        ))}
        <li>
          <Mark name={hasMaster ? 'pass' : 'notshown'} />
          <span>
            {hasMaster
              ? 'Several temperatures make a master curve'
              : 'Second temperature, for a master curve'}
          </span>
        </li>
      </ul>
    </>
  );
}

const verbs: Record<CreepFindingView['finding']['outcome'], string> = {
  pass: 'passes',
  fail: 'fails',
  'not shown': 'is not shown',
  undecided: 'is undecided',
  'not applicable': 'does not apply',
};

function Why({ view: { finding } }: { view: CreepFindingView }) {
  return (
    <section className="creep-why">
      <h2>
        Why {finding.clause ?? finding.title} {verbs[finding.outcome]}
      </h2>
      <p className="small">{finding.reason}</p>
      {finding.wouldDecide ? (
        <p className="small">
          <b>What would decide it:</b> {finding.wouldDecide}
        </p>
      ) : null}
    </section>
  );
}

function FitTable({ curve, fit }: { curve: CreepCurveView; fit: CreepFitView }) {
  const others = otherModelWords(curve, fit);
  return (
    <>
      <p className="small">{formulas[fit.model]}</p>
      <dl className="creep-fit">
        {fit.parameters.map(({ symbol, value, unit, low, high }) => (
          <div key={symbol}>
            <dt>
              <QuantitySymbol>{symbol}</QuantitySymbol>
            </dt>
            <dd>
              <b>{groupThousands(formatPlain(value, 3))}</b> {unit === '1' ? '' : unit}
              <small>
                {low === null || high === null
                  ? 'no bound'
                  : `${groupThousands(formatPlain(low, 2))} to ${groupThousands(formatPlain(high, 2))}`}
              </small>
            </dd>
          </div>
        ))}
        <div>
          <dt>
            <var>R</var>²
          </dt>
          <dd>
            <b>{fit.rSquared.toFixed(3)}</b>
            <small>
              {fit.pointCount} points, {fit.degreesOfFreedom} degrees of freedom
            </small>
          </dd>
        </div>
      </dl>
      {fit.words.map((words) => (
        <p key={words} className="small">
          {words}
        </p>
      ))}
      {others.map((words) => (
        <p key={words} className="small">
          {words}
        </p>
      ))}
      <p className="small mute">
        {fit.startsAgreeing} of {fit.starts} starts lead to this curve. Intervals and band at 95 %.
      </p>
    </>
  );
}

/** A number stays with its unit. */
function unbroken(text: string): string {
  return text.replace(/ (?=(%|s|kPa|°C)\b|%)/g, '\u00a0');
}
