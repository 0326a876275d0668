import { Link, useNavigate } from 'react-router-dom';
import { exportRuleSet, type RuleSetView } from '#shared/contracts/rule-sets';
import { countOf } from '#shared/format/numbers';
import { Checkbox } from '../../../components/ui/checkbox';
import { hrefOf } from '../../../lib/api';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/queries/session-query';
import { effectiveWords } from '../lib/edition-words';
import { WithdrawEdition } from './withdraw-edition';

/** What surrounds an edition: its layers, its template, its other editions, what proves it. */
export function RuleSetAside({ view }: { view: RuleSetView }) {
  return (
    <>
      <h2>Layers</h2>
      <LayerChoice view={view} />
      <h2>Template</h2>
      <p>
        <a href={view.templateHref} download>
          Template for {view.title}, edition {view.edition}
        </a>
      </p>
      <p className="small mute">A workbook with a place for every reading that these rules ask for.</p>
      {view.exampleHref === null ? null : (
        <p>
          <a href={view.exampleHref} download>
            The same template, filled in with an invented mix
          </a>
        </p>
      )}
      <EditionActs view={view} />
      <h2>Quantities</h2>
      <p>
        <Link to={paths.quantities}>What each quantity means</Link>
      </p>
      <p className="small mute">Unit, plausible range, test methods and formula, for every rule set.</p>
      <h2>Editions</h2>
      <ul>
        {[view, ...view.otherEditions]
          .sort((one, other) => (other.from ?? '9999').localeCompare(one.from ?? '9999'))
          .map((edition) => (
            <li key={`${edition.ruleSet}@${edition.edition}`} className="edition-line">
              {edition === view ? (
                <b>{edition.edition}</b>
              ) : (
                <Link to={paths.ruleSet(edition.ruleSet, edition.edition)}>{edition.edition}</Link>
              )}
              <span>
                {edition.state}
                <small className="mute"> {effectiveWords(edition)}</small>
              </span>
            </li>
          ))}
      </ul>
      <h2>Proof</h2>
      <p className="small mute">
        {countOf(view.ruleViews.length, 'rule')}, {countOf(view.caseCount, 'case')} kept with the edition.
        Resolved <span className="font-mono">{view.hash.slice(0, 12)}</span>.
      </p>
    </>
  );
}

/** What can be done with an edition: read it against another, take it along, begin another from it, withdraw it. */
function EditionActs({ view }: { view: RuleSetView }) {
  const { abilities } = useSession();
  const { ruleSet, edition, draftId, state } = view;
  return (
    <>
      <h2>Acts</h2>
      <ul>
        {view.otherEditions.some((other) => other.ruleSet === ruleSet) ? (
          <li>
            <Link to={paths.compareEditions(ruleSet, edition)}>Compare with another edition</Link>
          </li>
        ) : null}
        <li>
          <a href={hrefOf(exportRuleSet, { params: { ruleSetId: ruleSet, edition } })} download>
            Export as a file
          </a>
        </li>
        {abilities.writeRules && draftId !== null ? (
          <li>
            <Link to={paths.draft(ruleSet, draftId)}>Work on the draft</Link>
          </li>
        ) : null}
        {abilities.writeRules && draftId === null ? (
          <li>
            <Link to={paths.newDraft({ ruleSet, edition })}>Begin a draft from it</Link>
          </li>
        ) : null}
        {abilities.writeRules && draftId === null && state !== 'withdrawn' ? (
          <li>
            <WithdrawEdition ruleSetId={ruleSet} edition={edition} />
          </li>
        ) : null}
      </ul>
    </>
  );
}

/** Layers apply in the order listed; the later wins. */
function LayerChoice({ view }: { view: RuleSetView }) {
  const navigate = useNavigate();
  const chosen = new Set(view.layers.map((layer) => `${layer.ruleSet}@${layer.edition}`));
  if (view.availableLayers.length === 0) {
    return <p className="small mute">No supplement or special provision sits over this edition.</p>;
  }
  return (
    <div className="choice-column">
      {view.availableLayers.map((layer) => {
        const id = `${layer.ruleSet}@${layer.edition}`;
        return (
          <div key={id}>
            <Checkbox
              isSelected={chosen.has(id)}
              onChange={(selected) => {
                const next = view.availableLayers
                  .map((each) => `${each.ruleSet}@${each.edition}`)
                  .filter((each) => (each === id ? selected : chosen.has(each)));
                void navigate(paths.ruleSet(view.ruleSet, view.edition, next), { replace: true });
              }}
            >
              {layer.title}
            </Checkbox>
          </div>
        );
      })}
    </div>
  );
}
