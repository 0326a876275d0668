import { Checkbox } from '../../../components/ui/checkbox';
import { type BoundKind, boundKindOf, freshBound } from '../lib/bounds';
import { fieldsIn, type RuleField, useRuleForm, withField } from '../lib/rule-fields';
import { Choice } from './choice';
import { ConditionsField } from './conditions-field';
import { QuantityChoice } from './quantity-choice';
import { WrittenNumber } from './written-number';

const kinds = [
  { value: 'none', label: 'no end' },
  { value: 'number', label: 'given here' },
  { value: 'table', label: 'from a table' },
  { value: 'quantity', label: 'from a quantity' },
] as const satisfies readonly { value: BoundKind; label: string }[];

/** One end of a limit: a number, a column of a table, or another quantity of the same mix. */
export function Bound({
  label,
  value,
  onChange,
}: {
  label: string;
  value: unknown;
  onChange: (value: unknown) => void;
}) {
  const { isDisabled } = useRuleForm();
  const kind = boundKindOf(value);
  const fields = fieldsIn(value);
  return (
    <span className="bound">
      <Choice
        label={`${label}: where it is`}
        choices={kinds}
        value={kind}
        onChange={(next) => onChange(freshBound(next, value))}
      />
      {kind === 'number' ? (
        <WrittenNumber
          label={label}
          value={'value' in fields ? fields.value : value}
          onChange={(next) => onChange('value' in fields ? { ...fields, value: next ?? '0' } : next)}
        />
      ) : null}
      {kind === 'table' ? <TableColumn label={label} value={fields} onChange={onChange} /> : null}
      {kind === 'quantity' ? <OtherQuantity label={label} value={fields} onChange={onChange} /> : null}
      {kind === 'table' || kind === 'quantity' || 'value' in fields ? (
        <Checkbox
          isSelected={fields.exclusive !== true}
          onChange={(included) => onChange(withField(fields, 'exclusive', included ? undefined : true))}
          isDisabled={isDisabled}
        >
          included
        </Checkbox>
      ) : null}
    </span>
  );
}

export function TableColumn({
  label,
  value,
  onChange,
}: {
  label: string;
  value: RuleField;
  onChange: (value: RuleField) => void;
}) {
  const { view } = useRuleForm();
  const table = view.table(String(value.table));
  return (
    <>
      <Choice
        label={`${label}: table`}
        choices={view.tables.map(({ id, title }) => ({ value: id, label: title ?? id }))}
        value={value.table}
        onChange={(next) =>
          onChange({ ...value, table: next, column: view.table(next)?.columns[0]?.name ?? '' })
        }
      />
      <Choice
        label={`${label}: column`}
        choices={(table?.columns ?? []).map(({ name }) => ({ value: name, label: name }))}
        value={value.column}
        onChange={(next) => onChange({ ...value, column: next })}
      />
    </>
  );
}

function OtherQuantity({
  label,
  value,
  onChange,
}: {
  label: string;
  value: RuleField;
  onChange: (value: RuleField) => void;
}) {
  return (
    <>
      <QuantityChoice
        label={`${label}: quantity`}
        value={value.quantity}
        onChange={(next) => onChange({ ...value, quantity: next })}
      />
      <ConditionsField
        label={label}
        value={value.at}
        onChange={(next) => onChange(withField(value, 'at', next))}
      />
      <span className="mute">plus</span>
      <WrittenNumber
        label={`${label}: plus`}
        value={value.plus ?? 0}
        onChange={(next) => onChange({ ...value, plus: next ?? 0 })}
      />
    </>
  );
}
