import { Link } from 'react-router-dom';
import type { LintRemark } from '#rules/authoring/lint/remark';
import type { DocumentProblem } from '#rules/rule-sets/problem';
import { countInFigures } from '#shared/format/numbers';
import { Mark } from '../../../components/ui/mark';
import { SectionHead } from '../../../components/ui/section-head';
import { paths } from '../../../lib/paths';
import { useDraftInHand } from './draft-layout';

interface Listed {
  level: LintRemark['level'];
  part: string;
  detail: string;
  fix: string;
}

/** Everything that stands between the draft, or one part of it, and its publishing, each leading to its place. */
export function DraftRemarks({ only }: { only?: string }) {
  const all = useListed();
  const listed = only === undefined ? all : all.filter(({ part }) => part.endsWith(only));
  const { remarks, checked } = useDraftInHand();
  const errors = listed.filter(({ level }) => level === 'error');
  const warnings = listed.filter(({ level }) => level === 'warning');
  const about =
    checked.ok && remarks === null
      ? 'looking through rules, tables and cases'
      : `${countInFigures(errors.length, 'error')} bar publishing, ${countInFigures(warnings.length, 'warning')} ask for a word`;
  return (
    <>
      <SectionHead title="To look at" about={about} />
      {listed.length === 0 && (!checked.ok || remarks !== null) ? (
        <p className="small">Nothing stands in the way.</p>
      ) : null}
      <ul className="remark-list">
        {listed.map((remark) => (
          <li key={`${remark.part}${remark.detail}`}>
            <Mark name={remark.level === 'error' ? 'fail' : 'undecided'} />
            <span>
              <b className="hidden-text">{remark.level}: </b>
              <Place part={remark.part}>{remark.detail}</Place> <span className="mute">{remark.fix}</span>
            </span>
          </li>
        ))}
      </ul>
    </>
  );
}

/** What the form cannot be read as comes first: until it can, nothing else is known. */
function useListed(): Listed[] {
  const { checked, remarks, editing } = useDraftInHand();
  if (checked.ok) return remarks ?? [];
  return checked.problems.map((problem) => ({
    level: 'error',
    part: partOfPointer(problem, editing.document),
    detail: problem.detail,
    fix: problem.fix,
  }));
}

/** `/rules/3/limit` is the rule that stands fourth. */
function partOfPointer({ pointer }: DocumentProblem, document: Record<string, unknown>): string {
  const [, list = '', index = ''] = pointer.split('/');
  const entries = document[list];
  const entry = Array.isArray(entries) ? entries[Number(index)] : undefined;
  const name = typeof entry === 'object' && entry !== null && 'id' in entry ? String(entry.id) : '';
  return name === '' ? '' : `${list}/${name}`;
}

function Place({ part, children }: { part: string; children: string }) {
  const { draft } = useDraftInHand().editing;
  const [list = '', name = ''] = part.split(/\/(.*)/s);
  if (list.endsWith('rules') && name !== '') {
    return <Link to={paths.draftRule(draft.ruleSet, draft.id, name)}>{children}</Link>;
  }
  if (list.endsWith('tables') && name !== '') {
    return <Link to={paths.draftTable(draft.ruleSet, draft.id, name)}>{children}</Link>;
  }
  return children;
}
