import { allQuantities } from '#rules/quantities/registry';
import { ComboField } from '../../../components/ui/combo-field';
import { useRuleForm } from '../lib/rule-fields';

/** A quantity found by a part of its name or symbol; the edition's own among those of every rule set. */
export function QuantityChoice({
  label,
  value,
  onChange,
}: {
  label: string;
  value: unknown;
  onChange: (id: string) => void;
}) {
  const { view } = useRuleForm();
  const quantities = [...view.ownQuantities, ...allQuantities()];
  const wordsOf = ({ label: own, symbol }: (typeof quantities)[number]) => `${own} (${symbol})`;
  const present = typeof value === 'string' ? view.quantity(value) : undefined;
  return (
    <ComboField
      key={present?.id ?? ''}
      label={label}
      hideLabel
      name={label}
      choices={quantities.map(wordsOf)}
      value={present ? wordsOf(present) : ''}
      onChange={(words) => {
        const found = quantities.find((each) => wordsOf(each) === words);
        if (found) onChange(found.id);
      }}
    />
  );
}
