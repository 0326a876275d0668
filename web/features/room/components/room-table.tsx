import type { RoomOfRule } from '#rules/engine/room';
import { contentWords } from '#rules/engine/room-words';

/** The chart's figures: rule, limit, from where to where it holds, and what ends it there. */
export function RoomTable({ rules }: { rules: readonly RoomOfRule[] }) {
  return (
    <div className="sideways">
      <table className="table table-head-over">
        <caption className="hidden-text">Binder contents at which each rule holds</caption>
        <thead>
          <tr>
            <th scope="col">Clause</th>
            <th scope="col">Rule</th>
            <th scope="col">Limit</th>
            <th scope="col" className="number">
              From, %
            </th>
            <th scope="col">Ended by</th>
            <th scope="col" className="number">
              To, %
            </th>
            <th scope="col">Ended by</th>
          </tr>
        </thead>
        <tbody>{rules.flatMap(rowsOf)}</tbody>
      </table>
    </div>
  );
}

const endWords = {
  below: { limit: 'the limit', trials: 'the first trial' },
  above: { limit: 'the limit', trials: 'the last trial' },
};

function rowsOf(rule: RoomOfRule) {
  const head = (
    <>
      <th scope="row">{rule.clause}</th>
      <td>{rule.title}</td>
      <td>{rule.limitWords}</td>
    </>
  );
  if (rule.holds.length === 0) {
    return [
      <tr key={rule.rule}>
        {head}
        <td colSpan={4}>{rule.state === 'computed' ? 'Nowhere within the trials.' : (rule.reason ?? '')}</td>
      </tr>,
    ];
  }
  return rule.holds.map(({ from, to, below, above }) => (
    <tr key={`${rule.rule}${from}`}>
      {head}
      <td className="number">{contentWords(from)}</td>
      <td>{endWords.below[below]}</td>
      <td className="number">{contentWords(to)}</td>
      <td>{endWords.above[above]}</td>
    </tr>
  ));
}
