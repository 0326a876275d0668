import { useMemo } from 'react';
import { type CaseResult, caseHolds, runCase } from '#rules/authoring/run-case';
import type { RuleSetCase } from '#rules/rule-sets/schema';
import { countInFigures } from '#shared/format/numbers';
import { Gauge } from '../../../components/ui/gauge';
import { OutcomeWord } from '../../../components/ui/outcome-word';
import { useDraftInHand } from './draft-layout';

/** Cases that name the rule, judged as the draft stands; they follow while it is typed. */
export function RuleCases({ ruleId }: { ruleId: string }) {
  const { checked } = useDraftInHand();
  const results = useMemo(() => {
    if (!checked.ok) return [];
    const { edition } = checked;
    return edition.cases
      .filter(({ expected }) => expected.some(({ rule }) => rule === ruleId))
      .map((each) => ({ each, result: runCase(each, edition) }))
      .toSorted((a, b) => Number(caseHolds(a.result)) - Number(caseHolds(b.result)));
  }, [checked, ruleId]);
  const met = results.filter(({ result }) => caseHolds(result)).length;
  return (
    <>
      <h2>Cases</h2>
      <p className="small mute">
        {checked.ok
          ? `${countInFigures(met, 'case')} as expected, ${results.length - met} not. They run as you type.`
          : 'They run again once the draft can be read.'}
      </p>
      {results.map(({ each, result }) => (
        <CaseLine key={each.id} each={each} result={result} ruleId={ruleId} />
      ))}
    </>
  );
}

function CaseLine({ each, result, ruleId }: { each: RuleSetCase; result: CaseResult; ruleId: string }) {
  const found = result.findings.filter(({ rule }) => rule === ruleId);
  const unmet = result.unmet.filter(({ expected }) => expected.rule === ruleId);
  const shown = unmet[0]?.found[0] ?? found[0];
  const expected = unmet[0]?.expected ?? each.expected.find(({ rule }) => rule === ruleId);
  return (
    <div className="case-line">
      <p>{each.title}</p>
      {shown ? <OutcomeWord outcome={shown.outcome} /> : null}
      {shown ? <Gauge finding={shown} widthPx={150} /> : null}
      <p className={unmet.length > 0 ? 'small is-unmet' : 'small mute'}>
        {unmet.length > 0 ? `expected ${expected?.outcome ?? ''}` : 'as expected'}
      </p>
    </div>
  );
}
