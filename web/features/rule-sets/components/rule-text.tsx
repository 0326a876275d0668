import { Link } from 'react-router-dom';
import type { RuleView, TableView } from '#shared/contracts/rule-sets';
import { slug } from '#shared/format/finding-key';
import { RichText } from '../../../components/ui/rich-text';
import { paths } from '../../../lib/paths';

const originWords = {
  read: 'read in the source',
  derived: 'derived from the source',
  memory: 'from memory, verify',
  agency: 'the agency’s own',
} as const;

/** One rule: its sentence, then what decides it, and which document supplied it. */
export function RuleText({ rule, tables }: { rule: RuleView; tables: readonly TableView[] }) {
  const used = tables.filter((table) => rule.tables.includes(table.id));
  return (
    <article className="rule-text" id={`rule-${slug(rule.id)}`} data-rule={rule.id} tabIndex={-1}>
      <h3 className="rule-sentence">
        <span className="rule-clause">{rule.clause}</span>
        <RichText>{rule.sentence}</RichText>
      </h3>
      <dl className="rule-facts">
        <Fact name="Applies" wide>
          {rule.condition ?? 'always'}
        </Fact>
        <Fact name="Severity">{rule.severity}</Fact>
        <Fact name="Rounding">{rule.rounding}</Fact>
        {rule.precision ? <Fact name="Precision">{rule.precision}</Fact> : null}
        {rule.minimumCount ? <Fact name="Specimens">at least {rule.minimumCount}</Fact> : null}
        {rule.quantity ? (
          <Fact name="Quantity">
            <Link to={rule.quantity.own ? { hash: rule.quantity.id } : paths.quantity(rule.quantity.id)}>
              {rule.quantity.label}
            </Link>
          </Fact>
        ) : null}
        {used.length > 0 ? (
          <Fact name={used.length === 1 ? 'Table' : 'Tables'}>
            {used.map((table, index) => (
              <span key={table.id}>
                {index > 0 ? ', ' : ''}
                <Link to={{ hash: `table-${slug(table.id)}` }}>{table.title}</Link>
              </span>
            ))}
          </Fact>
        ) : null}
        <Fact name="Source" wide>
          {rule.source}{' '}
          {rule.source.includes(originWords[rule.sourceOrigin]) ? null : (
            <span className={rule.sourceOrigin === 'memory' ? 'outcome-undecided' : 'origin'}>
              {originWords[rule.sourceOrigin]}
            </span>
          )}
        </Fact>
        <Fact name="Supplied by" wide>
          {rule.document}
          {rule.displaced.map((each) => (
            <span key={`${each.document}${each.text}`} className="mute">
              {' '}
              in place of <del>{each.text}</del> of {each.document}
            </span>
          ))}
          {rule.encodedBy ? <span className="mute"> · encoded by {rule.encodedBy}</span> : null}
          {rule.verifiedBy ? <span className="mute"> · verified by {rule.verifiedBy}</span> : null}
        </Fact>
        {rule.advice ? (
          <Fact name="Advice" wide>
            <RichText>{rule.advice}</RichText>
          </Fact>
        ) : null}
      </dl>
    </article>
  );
}

function Fact({ name, wide = false, children }: { name: string; wide?: boolean; children: React.ReactNode }) {
  return (
    <div className={wide ? 'rule-fact rule-fact-wide' : 'rule-fact'}>
      <dt>{name}</dt>
      <dd>{children}</dd>
    </div>
  );
}
