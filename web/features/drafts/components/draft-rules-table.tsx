import { Link, useNavigate } from 'react-router-dom';
import { partsOf } from '#rules/authoring/document-parts';
import { countInFigures } from '#shared/format/numbers';
import { Button } from '../../../components/ui/button';
import { Checkbox } from '../../../components/ui/checkbox';
import { SectionHead } from '../../../components/ui/section-head';
import { Sideways } from '../../../components/ui/sideways';
import { paths } from '../../../lib/paths';
import { useVerifyRules } from '../api/review-draft';
import { type DraftRule, freeName, isLayerDraft } from '../lib/draft-rules';
import { useDraftInHand } from './draft-layout';

/** The rules of a draft in clause order; while it is in review, each with its verification. */
export function DraftRulesTable() {
  const { editing, rules } = useDraftInHand();
  const { draft, change } = editing;
  const navigate = useNavigate();
  const ids = rules.map(({ id }) => id);
  const own = rules.filter(({ state }) => state !== 'removed');
  const isLayer = isLayerDraft(draft.document);
  const add = () => {
    const id = freeName(ids, 'new-rule');
    const list = isLayer ? 'add.rules' : 'rules';
    change([{ part: `${list}/${id}`, after: { ...emptyRule, id, clause: own.at(-1)?.clause ?? '' } }]);
    void navigate(paths.draftRule(draft.ruleSet, draft.id, id));
  };
  return (
    <>
      <SectionHead
        title="Rules"
        about={countInFigures(own.length, 'rule')}
        acts={
          draft.abilities.change ? (
            <Button kind="text" onPress={add}>
              Add a rule
            </Button>
          ) : null
        }
      />
      <Sideways label="Rules of the draft">
        <table className="table table-head-over">
          <caption className="hidden-text">Rules of the draft</caption>
          <thead>
            <tr>
              <th scope="col">Clause</th>
              <th scope="col">Rule</th>
              <th scope="col">Verified</th>
              {draft.abilities.change ? <th scope="col">Acts</th> : null}
            </tr>
          </thead>
          <tbody>
            {rules.map((rule) => (
              <RuleRow key={`${rule.part} ${rule.state}`} rule={rule} ids={ids} />
            ))}
          </tbody>
        </table>
      </Sideways>
    </>
  );
}

const emptyRule = {
  title: 'New rule',
  severity: 'required',
  measure: { kind: 'reading', quantity: 'air-voids', at: { trial: 'design' }, statistic: 'mean' },
  limit: { min: '0.0' },
  rounding: { method: 'rounding', to: 'limit' },
};

function RuleRow({ rule, ids }: { rule: DraftRule; ids: readonly string[] }) {
  const { editing, basedOn } = useDraftInHand();
  const { draft, document, change } = editing;
  const verify = useVerifyRules();
  const isRemoved = rule.state === 'removed';
  const copy = () => {
    const id = freeName(ids, `${rule.id}-copy`);
    const [list = ''] = rule.part.split('/');
    const original = partsOf(document).get(rule.part) as object;
    change([{ part: `${list}/${id}`, after: { ...original, id, encodedBy: null, verifiedBy: null } }]);
  };
  const putBack = () => change([{ part: rule.part, after: partsOf(basedOn ?? {}).get(rule.part) ?? null }]);
  return (
    <tr>
      <td>{rule.clause}</td>
      <td>
        {isRemoved ? (
          <s className="faint">{rule.title}</s>
        ) : (
          <Link to={paths.draftRule(draft.ruleSet, draft.id, rule.id)}>{rule.title}</Link>
        )}{' '}
        {rule.state === 'same' ? null : <small className="mute">{rule.state}</small>}
      </td>
      <td>
        {isRemoved ? null : draft.abilities.verify && !rule.verified ? (
          <Checkbox
            label={`${rule.title} says what the specification says`}
            isSelected={false}
            isDisabled={verify.isPending}
            onChange={() => verify.mutate({ id: draft.id, version: draft.version, rules: [rule.id] })}
          />
        ) : rule.verified ? (
          'verified'
        ) : (
          ''
        )}
        {verify.error ? <span className="field-error">{verify.error.message}</span> : null}
      </td>
      {draft.abilities.change ? (
        <td className="acts">
          {isRemoved ? (
            <Button kind="inline" onPress={putBack}>
              Put back
            </Button>
          ) : (
            <>
              <Button kind="inline" onPress={copy} aria-label={`Duplicate ${rule.title}`}>
                Duplicate
              </Button>
              <Button
                kind="inline"
                onPress={() => change([{ part: rule.part, after: null }])}
                aria-label={`Remove ${rule.title}`}
              >
                Remove
              </Button>
            </>
          )}
        </td>
      ) : null}
    </tr>
  );
}
