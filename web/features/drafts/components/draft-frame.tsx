import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { cautions } from '#shared/cautions';
import { clauseParts, sectionOfClause } from '#shared/format/clause';
import { RunningFoot } from '../../../components/ui/running-foot';
import { groupBy } from '../../../lib/group-by';
import { paths } from '../../../lib/paths';
import { useShortcuts } from '../../../lib/shortcuts';
import type { DraftEditing } from '../hooks/use-working-copy';
import type { DraftRule } from '../lib/draft-rules';
import { Conflicts } from './conflicts';
import '../drafts.css';

/** Every page of a draft: its rules left, the work in the middle, cases and people right. */
export function DraftFrame({
  editing,
  rules,
  current,
  aside,
  children,
}: {
  editing: DraftEditing;
  rules: readonly DraftRule[];
  /** Id of the rule that the page is about. */
  current?: string;
  aside: ReactNode;
  children: ReactNode;
}) {
  const { draft } = editing;
  useDraftKeys(editing);
  return (
    <main id="content" className="page page-margin page-rules">
      <div className="rule-list-page draft-page">
        <DraftRuleList editing={editing} rules={rules} current={current} />
        <div className="min-w-0 rule-texts">
          <Conflicts editing={editing} />
          {children}
        </div>
        <aside className="page-aside">{aside}</aside>
      </div>
      <RunningFoot
        texts={[
          'Draft. Not in force; nothing is checked against it but its cases.',
          ...(draft.startingPoint ? [cautions.startingPoint] : [cautions.contract]),
        ]}
      />
    </main>
  );
}

function useDraftKeys({ undo, redo }: DraftEditing): void {
  useShortcuts([
    { key: 'z', ctrl: true, label: 'undo', run: () => undo?.() },
    { key: 'y', ctrl: true, label: 'redo', run: () => redo?.() },
    { key: ']', label: 'next rule', run: () => walk(1), foot: true },
    { key: '[', label: 'previous rule', run: () => walk(-1), foot: true },
  ]);
}

/** To the rule beside the present one in the list, as a press on it would. */
function walk(step: 1 | -1): void {
  const links = [...document.querySelectorAll<HTMLAnchorElement>('.rule-list a.rule-list-item')];
  const at = links.findIndex((link) => link.getAttribute('aria-current') === 'page');
  links[at + step]?.click();
}

function DraftRuleList({
  editing: { draft, document },
  rules,
  current,
}: {
  editing: DraftEditing;
  rules: readonly DraftRule[];
  current: string | undefined;
}) {
  const groups = groupBy(rules, (rule) => sectionOfClause(rule.clause) ?? '');
  const { basedOn } = draft;
  const count = (state: DraftRule['state']) => rules.filter((rule) => rule.state === state).length;
  return (
    <nav className="rule-list" aria-label="Rules of this draft">
      <p className="small mute">
        {draft.ruleSet}, edition {draft.edition}
      </p>
      <p>
        <Link to={paths.draft(draft.ruleSet, draft.id)} className="draft-title">
          {String(document.title ?? draft.title)}
        </Link>
      </p>
      <p className="small mute">
        {basedOn === null
          ? 'Draft.'
          : `Draft over ${basedOn.edition}: ${count('changed')} changed, ${count('added')} added, ${count('removed')} removed.`}
      </p>
      <ul>
        {[...groups].map(([section, inSection]) => (
          <li key={section}>
            <div className="rule-list-group">
              <span>{section}</span>
              <span />
            </div>
            <ul>
              {inSection.map((rule) => (
                <li key={`${rule.part} ${rule.state}`}>
                  <ListedRule draft={draft} rule={rule} isCurrent={rule.id === current} />
                </li>
              ))}
            </ul>
          </li>
        ))}
      </ul>
    </nav>
  );
}

function ListedRule({
  draft,
  rule,
  isCurrent,
}: {
  draft: DraftEditing['draft'];
  rule: DraftRule;
  isCurrent: boolean;
}) {
  const words = (
    <>
      <span className="rule-list-letter">{clauseParts(rule.clause).letter}</span>
      <span className="rule-list-title">{rule.title}</span>
      <span className="rule-list-state">{rule.state === 'same' ? '' : rule.state}</span>
    </>
  );
  if (rule.state === 'removed') return <span className="rule-list-item is-removed">{words}</span>;
  return (
    <Link
      className="rule-list-item"
      to={paths.draftRule(draft.ruleSet, draft.id, rule.id)}
      {...(isCurrent ? { 'aria-current': 'page' as const } : {})}
    >
      {words}
    </Link>
  );
}
