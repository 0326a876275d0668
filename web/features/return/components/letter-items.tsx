import { Controller } from 'react-hook-form';
import { Link } from 'react-router-dom';
import type { ReturnItem } from '#shared/contracts/returns';
import { findingFragment } from '#shared/format/finding-key';
import { Checkbox } from '../../../components/ui/checkbox';
import { EmptyState } from '../../../components/ui/empty-state';
import { OutcomeWord } from '../../../components/ui/outcome-word';
import { RichText } from '../../../components/ui/rich-text';
import { findingBrief } from '../../../lib/finding-brief';
import { paths } from '../../../lib/paths';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { letterGroups } from '../lib/letter-groups';
import type { ReturnForm } from './decision-fields';

/** What the letter carries, in its order. What has to be said is ticked and stays so; the rest may be left out. */
export function LetterItems({
  params,
  items,
  form,
  canChange,
}: {
  params: RevisionParams;
  items: readonly ReturnItem[];
  form: ReturnForm;
  canChange: boolean;
}) {
  const groups = letterGroups(items);
  if (groups.length === 0) {
    return (
      <EmptyState title="The letter has nothing to ask.">
        Every finding passes clear of its limit, and no note is marked to be returned.
      </EmptyState>
    );
  }
  return (
    <Controller
      control={form.control}
      name="included"
      render={({ field }) => (
        <>
          {groups.map((group) => (
            <section key={group.group} aria-label={group.title}>
              <div className="letter-group">
                <h2>{group.title}</h2>
                <small>{group.detail}</small>
              </div>
              <ul>
                {group.items.map((item) => (
                  <LetterItem
                    key={item.key}
                    params={params}
                    item={item}
                    isIncluded={!item.optional || field.value.includes(item.key)}
                    canChange={canChange && item.optional}
                    onInclude={(included) =>
                      field.onChange(
                        included
                          ? [...field.value, item.key]
                          : field.value.filter((key: string) => key !== item.key),
                      )
                    }
                  />
                ))}
              </ul>
            </section>
          ))}
        </>
      )}
    />
  );
}

function LetterItem({
  params,
  item,
  isIncluded,
  canChange,
  onInclude,
}: {
  params: RevisionParams;
  item: ReturnItem;
  isIncluded: boolean;
  canChange: boolean;
  onInclude: (included: boolean) => void;
}) {
  const { finding } = item;
  const address = `${paths.revision(params.submittalId, params.number)}#${findingFragment(finding)}`;
  const { title, rest } = findingBrief(finding);
  return (
    <li className="letter-item" data-item={item.key}>
      <Checkbox
        label={`Include ${finding.clause ?? ''} ${finding.title}`}
        isSelected={isIncluded}
        isDisabled={!canChange}
        onChange={onInclude}
      />
      {finding.clause === null ? (
        <span className="letter-clause" />
      ) : (
        <Link className="plain letter-clause" to={address}>
          {finding.clause}
        </Link>
      )}
      <span>
        {title} {rest}
        {item.waived === null ? '' : `, waived: ${item.waived}`}{' '}
        {item.notes.map((note) => (
          <span key={note} className="letter-note">
            <RichText>{note}</RichText>
          </span>
        ))}
      </span>
      <OutcomeWord
        outcome={finding.outcome}
        waived={item.waived !== null}
        qualifiers={finding.borderline ? ['borderline'] : []}
      />
    </li>
  );
}
