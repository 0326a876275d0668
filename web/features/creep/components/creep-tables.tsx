import { Link } from 'react-router-dom';
import type { CreepCurveView, CreepFindingView, CreepFitView } from '#shared/contracts/creep';
import { findingFragment } from '#shared/format/finding-key';
import { marginText, observedText } from '#shared/format/margin';
import { formatPlain, groupThousands } from '#shared/format/numbers';
import { Gauge } from '../../../components/ui/gauge';
import { OutcomeWord } from '../../../components/ui/outcome-word';
import { paths } from '../../../lib/paths';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { curveAt } from '../lib/curve-at';

/** The chart's numbers: each point with its specimen, the curve there, and the cell that it came from. */
export function PointsTable({
  curve,
  fit,
  params,
}: {
  curve: CreepCurveView;
  fit: CreepFitView | null;
  params: RevisionParams;
}) {
  return (
    <div className="sideways">
      <table className="table table-head-over">
        <caption className="hidden-text">Creep compliance by loading time and specimen</caption>
        <thead>
          <tr>
            <th scope="col" className="number">
              Loading time, s
            </th>
            <th scope="col">Specimen</th>
            <th scope="col" className="number">
              Stress, kPa
            </th>
            <th scope="col" className="number">
              D(t), 1/GPa
            </th>
            <th scope="col" className="number">
              Fitted
            </th>
            <th scope="col" className="number">
              95 % band
            </th>
            <th scope="col">Origin</th>
            <th scope="col">Cell</th>
          </tr>
        </thead>
        <tbody>
          {curve.points.map((point) => {
            const fitted = fit === null ? null : curveAt(fit.samples, point.time);
            return (
              <tr key={`${point.specimen} ${point.time} ${point.stress} ${point.value}`}>
                <th scope="row" className="number">
                  {groupThousands(formatPlain(point.time))}
                </th>
                <td>{point.specimen ?? (point.count > 1 ? `mean of ${point.count}` : '')}</td>
                <td className="number">{point.stress === null ? '' : formatPlain(point.stress)}</td>
                <td className="number">{point.value.toFixed(4)}</td>
                <td className="number">{fitted === null ? '' : fitted.estimate.toFixed(4)}</td>
                <td className="number">
                  {fitted?.lower == null || fitted.upper == null
                    ? ''
                    : `${fitted.lower.toFixed(4)} to ${fitted.upper.toFixed(4)}`}
                </td>
                <td>{point.origin === 'recomputed' ? 'computed' : point.origin}</td>
                <td>
                  {point.source === null ? null : (
                    <Link
                      to={paths.reading(params.submittalId, params.number, {
                        sheet: point.source.sheet,
                        cell: point.source.cell,
                      })}
                    >
                      {point.source.sheet} {point.source.cell}
                    </Link>
                  )}
                </td>
              </tr>
            );
          })}
        </tbody>
      </table>
    </div>
  );
}

/** The rules that stand on these tests, each leading to its finding. */
export function CreepFindings({
  findings,
  revisionPath,
}: {
  findings: readonly CreepFindingView[];
  revisionPath: string;
}) {
  if (findings.length === 0) return null;
  return (
    <div className="sideways">
      <table className="table table-head-over creep-findings">
        <caption className="hidden-text">Rules on creep compliance</caption>
        <thead>
          <tr>
            <th scope="col">Clause</th>
            <th scope="col">Creep compliance</th>
            <th scope="col">Source</th>
            <th scope="col" className="number">
              Observed
            </th>
            <th scope="col" className="number">
              Low bound
            </th>
            <th scope="col">Limits, log scale</th>
            <th scope="col" className="number">
              Margin
            </th>
            <th scope="col">Outcome</th>
          </tr>
        </thead>
        <tbody>
          {findings.map(({ finding, source, band, confidence }) => (
            <tr key={`${finding.rule}~${finding.subject}`}>
              <th scope="row">
                <Link className="plain" to={`${revisionPath}#${findingFragment(finding)}`}>
                  {finding.clause ?? finding.title}
                </Link>
              </th>
              <td>{finding.requirement}</td>
              <td>{source ?? ''}</td>
              <td className="number">
                {finding.observed === null ? '' : observedText(finding.observed)}
                {finding.observed?.statistic.includes('bound') ? (
                  <small className="block">{finding.observed.statistic}</small>
                ) : null}
              </td>
              <td className="number">
                {band?.lower == null || source === 'measured' || source === 'reported'
                  ? ''
                  : `${formatPlain(band.lower, 3)} at ${formatPlain(confidence * 100, 4)} %`}
              </td>
              <td>
                <Gauge finding={finding} widthPx={132} />
              </td>
              <td className="number">{marginText(finding)}</td>
              <td>
                <OutcomeWord
                  outcome={finding.outcome}
                  qualifiers={finding.borderline ? ['borderline'] : []}
                />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
