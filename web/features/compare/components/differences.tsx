import type { EditionComparison, Wording } from '#rules/authoring/compare-editions';
import { SectionHead } from '../../../components/ui/section-head';
import { Sideways } from '../../../components/ui/sideways';
import { wordDifference } from '../lib/compared-editions';

/** Rules in clause order, then tables by row, then what else an edition says. */
export function Differences({ comparison }: { comparison: EditionComparison }) {
  const { rules, tables, others } = comparison;
  if (rules.length + tables.length + others.length === 0) return <p>The two say the same.</p>;
  return (
    <>
      {rules.length > 0 ? <SectionHead title="Rules" about="old struck, new bold" /> : null}
      {rules.map((rule) => (
        <article key={`${rule.id} ${rule.kind}`} className="difference">
          <h3>
            {rule.clause} {rule.title} <small className="mute">{rule.kind}</small>
          </h3>
          <dl>
            {wordingsShown(rule.kind, rule.wordings).map((wording) => (
              <Changed key={wording.what} wording={wording} />
            ))}
          </dl>
        </article>
      ))}
      {tables.map((table) => (
        <section key={table.id} aria-label={table.title}>
          <SectionHead
            title={table.title}
            about={`${table.kind}; used by ${table.usedBy.join(', ') || 'no rule'}`}
          />
          <Sideways label={table.title}>
            <table className="table table-head-over">
              <caption className="hidden-text">{table.title}</caption>
              <thead>
                <tr>
                  <th scope="col">Row</th>
                  <th scope="col">Old</th>
                  <th scope="col">New</th>
                </tr>
              </thead>
              <tbody>
                {table.rows.map((row) => (
                  <tr key={row.what}>
                    <th scope="row">{row.what}</th>
                    <td>{row.before === null ? '' : <del>{row.before}</del>}</td>
                    <td>{row.after === null ? '' : <ins>{row.after}</ins>}</td>
                  </tr>
                ))}
              </tbody>
            </table>
          </Sideways>
        </section>
      ))}
      {others.length > 0 ? <SectionHead title="What else differs" /> : null}
      <dl className="difference">
        {others.map((wording) => (
          <Changed key={wording.what} wording={wording} />
        ))}
      </dl>
    </>
  );
}

/** Of a rule that is new or gone its sentence says it all. */
function wordingsShown(kind: string, wordings: readonly Wording[]): readonly Wording[] {
  return kind === 'changed'
    ? wordings
    : wordings.filter(({ what }) => what === 'Sentence' || what === 'Source');
}

function Changed({ wording: { what, before, after } }: { wording: Wording }) {
  return (
    <>
      <dt>{what}</dt>
      <dd>
        {before === null ? (
          <ins>{after}</ins>
        ) : after === null ? (
          <del>{before}</del>
        ) : (
          wordDifference(before, after).map(({ text, in: where }, index) =>
            where === 'both' ? (
              text
            ) : where === 'before' ? (
              // biome-ignore lint/suspicious/noArrayIndexKey: stretches of one sentence, in its order.
              <del key={index}>{text}</del>
            ) : (
              // biome-ignore lint/suspicious/noArrayIndexKey: stretches of one sentence, in its order.
              <ins key={index}>{text}</ins>
            ),
          )
        )}
      </dd>
    </>
  );
}
