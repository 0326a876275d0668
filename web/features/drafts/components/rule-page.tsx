import { useState } from 'react';
import { Link, useParams } from 'react-router-dom';
import { partsOf } from '#rules/authoring/document-parts';
import { checkRule } from '#rules/rule-sets/check-rule';
import { problemsOfIssues } from '#rules/rule-sets/problem';
import { ruleSchema } from '#rules/rule-sets/schema';
import { Button } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { SectionHead } from '../../../components/ui/section-head';
import { paths } from '../../../lib/paths';
import { usePageTitle } from '../../../lib/use-page-title';
import { viewOfDraft } from '../lib/checked-draft';
import { DraftComments } from './draft-comments';
import { DraftFrame } from './draft-frame';
import { useDraftInHand } from './draft-layout';
import { DraftRemarks } from './draft-remarks';
import { JsonText } from './json-view';
import { RuleCases } from './rule-cases';
import { RuleForm } from './rule-form';
import { RuleSentence } from './rule-sentence';
import { SavedLine } from './saved-line';

type RuleFields = Record<string, unknown>;

/** One rule of a draft: how it reads, its form, its tables, and its cases as they come out now. */
export function RulePage() {
  const { ruleId = '' } = useParams();
  const { editing, rules } = useDraftInHand();
  const { draft, document, change } = editing;
  const [asText, setAsText] = useState(false);
  const listed = rules.find(({ id, state }) => id === ruleId && state !== 'removed');
  const rule = listed === undefined ? null : (partsOf(document).get(listed.part) as RuleFields);
  usePageTitle(`${listed?.title ?? ruleId}, draft ${draft.edition}`);
  const frame = (children: React.ReactNode) => (
    <DraftFrame
      editing={editing}
      rules={rules}
      current={ruleId}
      aside={
        <>
          <RuleCases ruleId={ruleId} />
          <DraftComments draftId={draft.id} rule={ruleId} mayWrite={draft.abilities.comment} />
        </>
      }
    >
      {children}
    </DraftFrame>
  );
  if (listed === undefined || rule === null) {
    return frame(
      <EmptyState title="The draft has no such rule.">
        <Link to={paths.draft(draft.ruleSet, draft.id)}>See the draft</Link>
      </EmptyState>,
    );
  }
  const set = (next: RuleFields) =>
    change(
      next.id === ruleId
        ? [{ part: listed.part, after: next }]
        : [
            { part: listed.part, after: null },
            { part: listed.part.replace(/\/.*/s, `/${String(next.id)}`), after: next },
          ],
    );
  const view = viewOfDraft(document);
  const parsed = ruleSchema.safeParse(rule);
  const problems = parsed.success
    ? checkRule(parsed.data, '', view)
    : problemsOfIssues(rule, parsed.error.issues);
  return frame(
    <>
      <div className="rule-reads">
        <p className="small mute">The rule reads, and will read so on findings and letters</p>
        <SavedLine editing={editing} />
      </div>
      <h1 className="hidden-text">{listed.title}</h1>
      <RuleSentence
        clause={listed.clause}
        rule={parsed.success && problems.length === 0 ? parsed.data : null}
        view={view}
      />
      <div className="draft-tools">
        <Button kind="text" onPress={() => setAsText(!asText)}>
          {asText ? 'Show the form' : 'Show as JSON'}
        </Button>
      </div>
      {asText ? (
        <JsonText
          label={`${listed.title} as JSON`}
          value={rule}
          isDisabled={!draft.abilities.change}
          onTakeOver={(next) => set({ ...next, id: ruleId })}
        />
      ) : (
        <RuleForm
          key={ruleId}
          rule={rule}
          view={view}
          problems={problems}
          isDisabled={!draft.abilities.change}
          onChange={set}
        />
      )}
      <SectionHead title="Proof" about={proofWords(rule)} />
      <DraftRemarks only={`/${ruleId}`} />
    </>,
  );
}

function proofWords(rule: RuleFields): string {
  const encoded =
    typeof rule.encodedBy === 'string' ? `encoded by ${rule.encodedBy}` : 'not yet encoded by anybody';
  const verified = typeof rule.verifiedBy === 'string' ? `verified by ${rule.verifiedBy}` : 'not verified';
  return `${encoded}; ${verified}`;
}
