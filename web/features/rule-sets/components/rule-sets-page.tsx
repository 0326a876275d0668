import { useSuspenseQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { cautions } from '#shared/cautions';
import type { EditionListItem } from '#shared/contracts/rule-sets';
import { EmptyState } from '../../../components/ui/empty-state';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { RunningFoot } from '../../../components/ui/running-foot';
import { SectionHead } from '../../../components/ui/section-head';
import { Sideways } from '../../../components/ui/sideways';
import { paths } from '../../../lib/paths';
import { ruleSetsQuery } from '../../../lib/queries/rule-sets-query';
import { useSession } from '../../../lib/queries/session-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { effectiveWords } from '../lib/edition-words';

/** Rule sets with their editions; layers stand under the edition they sit over. */
export function RuleSetsPage() {
  usePageTitle('Rule sets');
  const { abilities } = useSession();
  const { ruleSets } = useSuspenseQuery(ruleSetsQuery()).data;
  const titles = new Map(ruleSets.map((set) => [set.id, set.title]));
  const startingPoint = ruleSets.some((set) => set.editions.some((edition) => edition.startingPoint));
  return (
    <PlainPage>
      <PageHead title="Rule sets" rest="and their editions">
        <p className="pt-2">
          <Link to={paths.quantities}>Quantities that rules can ask for</Link>
          {abilities.writeRules ? (
            <>
              {' · '}
              <Link to={paths.newDraft()}>Begin a draft</Link>
            </>
          ) : null}
        </p>
      </PageHead>
      {ruleSets.length === 0 ? (
        <EmptyState title="No rule set is here yet.">
          It stands here once an edition is published or named by a project.{' '}
          <Link to={paths.projects}>See the projects</Link>
        </EmptyState>
      ) : null}
      {ruleSets.map((set) => (
        <section key={set.id} aria-label={set.title}>
          <SectionHead title={set.title} about={set.agency} />
          <EditionTable ruleSetId={set.id} editions={set.editions} titles={titles} />
        </section>
      ))}
      <RunningFoot
        texts={startingPoint ? [cautions.startingPoint, cautions.contract] : [cautions.contract]}
      />
    </PlainPage>
  );
}

function EditionTable({
  ruleSetId,
  editions,
  titles,
}: {
  ruleSetId: string;
  editions: readonly EditionListItem[];
  titles: ReadonlyMap<string, string>;
}) {
  return (
    <Sideways label={`Editions of ${ruleSetId}`}>
      <table className="table table-head-over edition-table">
        <caption className="hidden-text">Editions of {ruleSetId}</caption>
        <thead>
          <tr>
            <th scope="col">Edition</th>
            <th scope="col">State</th>
            <th scope="col">In effect</th>
            <th scope="col">Sits over</th>
            <th scope="col" className="number">
              Rules
            </th>
          </tr>
        </thead>
        <tbody>
          {newestFirst(editions).map((edition) => (
            <tr key={`${edition.ruleSet}@${edition.edition}`}>
              <th scope="row">
                <Link to={addressOf(edition)}>
                  {edition.ruleSet === ruleSetId ? edition.edition : `${edition.title}, ${edition.edition}`}
                </Link>
              </th>
              <td>{edition.state === 'in force' ? <b>in force</b> : edition.state}</td>
              <td>{effectiveWords(edition)}</td>
              <td>
                {edition.layerOf
                  ? `${titles.get(edition.layerOf.ruleSet) ?? edition.layerOf.ruleSet}, edition ${edition.layerOf.edition}`
                  : ''}
              </td>
              <td className="number">{edition.rules}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </Sideways>
  );
}

/** A draft leads to where it is written; everybody else's way is to read it. */
function addressOf({ ruleSet, edition, draftId }: EditionListItem): string {
  return draftId === null ? paths.ruleSet(ruleSet, edition) : paths.draft(ruleSet, draftId);
}

/** A draft without a date stands before everything that has one. */
function newestFirst(editions: readonly EditionListItem[]): EditionListItem[] {
  return [...editions].sort((one, other) => (other.from ?? '9999').localeCompare(one.from ?? '9999'));
}
