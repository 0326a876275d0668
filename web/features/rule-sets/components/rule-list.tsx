import { Link } from 'react-router-dom';
import type { RuleSetView } from '#shared/contracts/rule-sets';
import { clauseParts } from '#shared/format/clause';
import { slug } from '#shared/format/finding-key';
import type { RuleGroup } from '../lib/group-rules';

/** The edition at a glance, in its own order; what a layer took out is struck. */
export function RuleList({ view, groups }: { view: RuleSetView; groups: readonly RuleGroup[] }) {
  return (
    <nav className="rule-list" aria-label="Rules of this edition">
      <ul>
        {groups.map((group) => (
          <li key={group.section}>
            <div className="rule-list-group">
              <span>{group.section}</span>
              <span />
            </div>
            <ul>
              {group.rules.map((rule) => (
                <li key={rule.id}>
                  <Link className="rule-list-item" to={{ hash: `rule-${slug(rule.id)}` }}>
                    <span className="rule-list-letter">{clauseParts(rule.clause).letter}</span>
                    <span className="rule-list-title">{rule.title}</span>
                    <span className="rule-list-state">
                      {rule.displaced.length > 0 ? 'changed' : rule.severity === 'advisory' ? 'advisory' : ''}
                    </span>
                  </Link>
                </li>
              ))}
            </ul>
          </li>
        ))}
        {view.removed.map((rule) => (
          <li key={rule.id} className="rule-list-item is-removed">
            <span className="rule-list-letter">{clauseParts(rule.clause).letter}</span>
            <span className="rule-list-title">{rule.title}</span>
            <span className="rule-list-state">removed</span>
          </li>
        ))}
      </ul>
    </nav>
  );
}
