import type { ReadingView } from '#shared/contracts/readings';
import { countInFigures } from '#shared/format/numbers';
import { Mark } from '../../../components/ui/mark';

/** Answers of the workbook before whose cell has changed: they no longer hold and are asked again. */
export function StaleAnswers({ stale }: { stale: ReadingView['stale'] }) {
  if (stale.length === 0) return null;
  return (
    <section aria-labelledby="stale-answers">
      <div className="side-head">
        <h2 id="stale-answers">No longer holds</h2>
        <span>{countInFigures(stale.length, 'answer')}</span>
      </div>
      <ul>
        {stale.map((answer) => (
          <li key={`${answer.sheet} ${answer.cell}`} className="stale-line">
            <Mark name="undecided" />
            <span>
              <b>{`${answer.sheet} ${answer.cell}`.trim()}</b> said “{answer.text}” when it was answered “
              {answer.answer}”. The cell has changed since; if it is still in doubt it stands above.
            </span>
          </li>
        ))}
      </ul>
    </section>
  );
}
