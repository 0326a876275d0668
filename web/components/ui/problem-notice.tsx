import type { ReactNode } from 'react';
import type { Problem } from '../../lib/problem';

/** Place first, then remedy, then what was not affected; the request number lets an administrator find it. */
export function ProblemNotice({
  problem,
  unaffected,
  children,
}: {
  problem: Problem;
  /** What still holds: "Nothing else was affected." */
  unaffected?: string;
  /** An act that helps: a link, a button. */
  children?: ReactNode;
}) {
  return (
    <div className="problem-notice" role="alert">
      <p>
        <b>{problem.title}.</b> {isSaidElsewhere(problem) ? null : problem.detail}
      </p>
      {problem.errors.length > 0 ? (
        <ul>
          {problem.errors.map((error) => (
            <li key={`${error.pointer}${error.sheet}${error.cell}${error.detail}`}>
              {placeOf(error) ? <b>{placeOf(error)}: </b> : null}
              {error.detail} {error.fix ? <span className="mute">{error.fix}</span> : null}
            </li>
          ))}
        </ul>
      ) : null}
      <p className="mute">
        {problem.fix} {unaffected}
      </p>
      {children}
      {problem.requestId ? <p className="small faint">Request {problem.requestId}</p> : null}
    </div>
  );
}

/** A detail that only repeats the title or one of the listed faults. */
function isSaidElsewhere({ title, detail, errors }: Problem): boolean {
  return [title, ...errors.map((error) => error.detail)].some(
    (said) => said.replace(/\.$/, '') === detail.replace(/\.$/, ''),
  );
}

function placeOf(error: { sheet?: string | undefined; cell?: string | undefined }): string | null {
  if (error.sheet && error.cell) return `Sheet ${error.sheet}, cell ${error.cell}`;
  if (error.cell) return `Cell ${error.cell}`;
  return error.sheet ? `Sheet ${error.sheet}` : null;
}
