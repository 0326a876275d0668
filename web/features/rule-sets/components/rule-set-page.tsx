import { useSuspenseQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { useLocation, useParams, useSearchParams } from 'react-router-dom';
import { cautions } from '#shared/cautions';
import type { RuleSetView } from '#shared/contracts/rule-sets';
import { countInFigures } from '#shared/format/numbers';
import { PageHead } from '../../../components/ui/page-head';
import { QuantityTable } from '../../../components/ui/quantity-table';
import { RunningFoot } from '../../../components/ui/running-foot';
import { SectionHead } from '../../../components/ui/section-head';
import { useShortcuts } from '../../../lib/shortcuts';
import { usePageTitle } from '../../../lib/use-page-title';
import { ruleSetQuery } from '../api/get-rule-set';
import { effectiveWords, stateCaution } from '../lib/edition-words';
import { groupRules } from '../lib/group-rules';
import { LimitTable } from './limit-table';
import { RuleList } from './rule-list';
import { RuleSetAside } from './rule-set-aside';
import { RuleText } from './rule-text';

/** An edition as it reads: rules in clause order, each as its sentence with where it comes from. */
export function RuleSetPage() {
  const { ruleSetId = '', edition = '' } = useParams();
  const [search] = useSearchParams();
  const { data: view } = useSuspenseQuery(
    ruleSetQuery({ ruleSetId, edition, layers: search.get('layers') ?? '' }),
  );
  usePageTitle(`${view.title}, edition ${view.edition}`);
  useAddressedPart();
  useRuleKeys();
  const groups = groupRules(view.ruleViews);
  return (
    <main id="content" className="page page-margin page-rules">
      <div className="rule-list-page">
        <RuleList view={view} groups={groups} />
        <div className="min-w-0 rule-texts">
          <PageHead
            kicker={`${view.agency} · ${view.state} · ${effectiveWords(view)}`}
            title={view.title}
            rest={`edition ${view.edition}`}
            lede={
              view.layers.length > 0 ? `with ${view.layers.map((layer) => layer.title).join(' and ')}` : null
            }
          />
          {groups.map((group) => (
            <section key={group.section} aria-label={group.section}>
              <SectionHead title={group.section} about={countInFigures(group.rules.length, 'rule')} />
              {group.rules.map((rule) => (
                <RuleText key={rule.id} rule={rule} tables={view.tables} />
              ))}
            </section>
          ))}
          <SectionHead title="Tables" about="limits as the rules above look them up" />
          {view.tables.map((table) => (
            <LimitTable key={table.id} table={table} view={view} />
          ))}
          {view.quantities.length > 0 ? (
            <>
              <SectionHead
                title="Quantities"
                about="that this rule set declares, beside those of every rule set"
              />
              <QuantityTable
                caption={`Quantities of ${view.title}`}
                rows={view.quantities.map((quantity) => ({ quantity, names: quantity.aliases }))}
              />
            </>
          ) : null}
        </div>
        <aside className="page-aside">
          <RuleSetAside view={view} />
        </aside>
      </div>
      <RunningFoot texts={footTexts(view)} />
    </main>
  );
}

function footTexts(view: RuleSetView): string[] {
  const texts = [
    stateCaution(view.state),
    view.startingPoint ? cautions.startingPoint : null,
    cautions.contract,
  ];
  return texts.filter((text) => text !== null);
}

/** An address may name a rule or a table; the page comes to it after its data. */
function useAddressedPart(): void {
  const { hash } = useLocation();
  useEffect(() => {
    if (hash === '') return;
    const part = document.getElementById(decodeURIComponent(hash.slice(1)));
    part?.scrollIntoView({ block: 'start' });
    part?.focus({ preventScroll: true });
  }, [hash]);
}

function useRuleKeys(): void {
  useShortcuts([
    { key: ']', label: 'next rule', run: () => walk(1), foot: true },
    { key: '[', label: 'previous rule', run: () => walk(-1), foot: true },
  ]);
}

function walk(step: 1 | -1): void {
  const rules = [...document.querySelectorAll<HTMLElement>('[data-rule]')];
  const at = rules.findIndex((rule) => rule.contains(document.activeElement));
  const next = rules[Math.min(Math.max(at + step, 0), rules.length - 1)];
  next?.focus({ preventScroll: true });
  next?.scrollIntoView({ block: 'start' });
}
