import { useDeferredValue, useEffect, useState } from 'react';
import { Link, useLocation, useSearchParams } from 'react-router-dom';
import { allQuantities } from '#rules/quantities/registry';
import { cautions } from '#shared/cautions';
import { countOf } from '#shared/format/numbers';
import { limits } from '#shared/limits';
import { EmptyState } from '../../../components/ui/empty-state';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { QuantityTable } from '../../../components/ui/quantity-table';
import { RunningFoot } from '../../../components/ui/running-foot';
import { SectionHead } from '../../../components/ui/section-head';
import { TextField } from '../../../components/ui/text-field';
import { paths } from '../../../lib/paths';
import { usePageTitle } from '../../../lib/use-page-title';
import { findQuantities } from '../lib/find-quantities';
import { groupQuantities } from '../lib/group-quantities';

/** The registry as it is: what rules, workbooks and formulas mean by each quantity. */
export function QuantitiesPage() {
  usePageTitle('Quantities');
  const [search, setSearch] = useSearchParams();
  // Kept here too: the address follows a keystroke late, and a field bound to it would lose letters.
  const [text, setText] = useState(search.get('q') ?? '');
  const rows = findQuantities(allQuantities(), useDeferredValue(text));
  const find = (q: string) => {
    setText(q);
    setSearch(q === '' ? {} : { q }, { replace: true });
  };
  useAddressedQuantity();
  return (
    <PlainPage>
      <PageHead
        title="Quantities"
        rest="that rules can ask for and workbooks give"
        lede="Test methods, and precision where it says so, are from memory: verify. A value outside the plausible range is doubted when it is read, never failed for it; the ranges are common practice, no source. A rule set may declare quantities of its own."
      />
      <div className="quantity-search">
        <TextField
          label="Find a quantity"
          value={text}
          onChange={find}
          maxLength={limits.searchCharacters}
          placeholder="a name, a symbol, a test method"
        />
      </div>
      <p className="small mute" role="status">
        {text.trim() === ''
          ? countOf(rows.length, 'quantity', 'quantities')
          : `${countOf(rows.length, 'quantity', 'quantities')} of ${allQuantities().length}`}
      </p>
      {rows.length === 0 ? (
        <EmptyState title="No quantity is called that.">
          Try a symbol or a test method, or{' '}
          <Link to={paths.quantities} replace onClick={() => setText('')}>
            show all quantities
          </Link>
          .
        </EmptyState>
      ) : null}
      {groupQuantities(rows).map((group) => (
        <section key={group.title} aria-label={group.title}>
          <SectionHead title={group.title} about={group.about} />
          <QuantityTable caption={`Quantities of ${group.title.toLowerCase()}`} rows={group.rows} />
        </section>
      ))}
      <RunningFoot texts={[cautions.contract]} />
    </PlainPage>
  );
}

/** An address may name a quantity: `/quantities#air-voids`. */
function useAddressedQuantity(): void {
  const { hash } = useLocation();
  useEffect(() => {
    if (hash === '') return;
    const row = document.getElementById(decodeURIComponent(hash.slice(1)));
    row?.scrollIntoView({ block: 'start' });
    row?.focus({ preventScroll: true });
  }, [hash]);
}
