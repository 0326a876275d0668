import { Link } from 'react-router-dom';
import { outcomeSchema } from '#rules/engine/finding';
import type { GradationPoint } from '#shared/contracts/checks';
import { formatPlain } from '#shared/format/numbers';
import { OutcomeWord } from '../../../components/ui/outcome-word';
import { paths } from '../../../lib/paths';
import type { RevisionParams } from '../../../lib/queries/revision-query';

/** The chart's numbers: opening, US name, passing, limits, outcome and the cell each came from. */
export function GradationTable({
  points,
  params,
}: {
  points: readonly GradationPoint[];
  params: RevisionParams;
}) {
  return (
    <div className="sideways">
      <table className="table table-head-over">
        <caption className="hidden-text">Gradation of the job mix by sieve</caption>
        <thead>
          <tr>
            <th scope="col">Sieve, mm</th>
            <th scope="col">US name</th>
            <th scope="col" className="number">
              Passing, %
            </th>
            <th scope="col" className="number">
              At least
            </th>
            <th scope="col" className="number">
              At most
            </th>
            <th scope="col">Outcome</th>
            <th scope="col">Cell</th>
          </tr>
        </thead>
        <tbody>
          {[...points]
            .sort((one, other) => other.sieve - one.sieve)
            .map((point) => (
              <tr key={point.sieve}>
                <th scope="row">{formatPlain(point.sieve)}</th>
                <td>{point.usName ?? ''}</td>
                <td className="number">{formatPlain(point.passing)}</td>
                <td className="number">{point.min === null ? '' : formatPlain(point.min)}</td>
                <td className="number">{point.max === null ? '' : formatPlain(point.max)}</td>
                <td>
                  <OutcomeOf outcome={point.outcome} />
                </td>
                <td>
                  <CellOf point={point} params={params} />
                </td>
              </tr>
            ))}
        </tbody>
      </table>
    </div>
  );
}

function OutcomeOf({ outcome }: { outcome: string | null }) {
  const known = outcomeSchema.safeParse(outcome);
  return known.success ? <OutcomeWord outcome={known.data} /> : <span className="faint">no limit</span>;
}

function CellOf({ point: { sheet, cell }, params }: { point: GradationPoint; params: RevisionParams }) {
  if (sheet === null || cell === null) return null;
  return (
    <Link to={paths.reading(params.submittalId, params.number, { sheet, cell })}>
      {sheet} {cell}
    </Link>
  );
}
