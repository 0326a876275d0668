import { Checkbox } from '../../../components/ui/checkbox';
import { Field } from '../../../components/ui/field';
import { TextField } from '../../../components/ui/text-field';
import { familyOf, freshLimit, limitFamilies, limitFamiliesOf } from '../lib/limits';
import { type RuleField, useRuleForm, withField } from '../lib/rule-fields';
import { Bound, TableColumn } from './bound';
import { Choice } from './choice';

/** The limit in the form that its measure can be held against. */
export function LimitField({
  value,
  kind,
  onChange,
}: {
  value: RuleField;
  /** Of the measure. */
  kind: string;
  onChange: (value: RuleField) => void;
}) {
  const { isDisabled } = useRuleForm();
  const family = familyOf(value);
  const choices = limitFamilies.filter((each) => limitFamiliesOf(kind).includes(each.value));
  const bound = (field: string, label: string) => (
    <span className="condition">
      <span className="mute">{label}</span>
      <Bound
        label={label}
        value={value[field]}
        onChange={(next) => onChange(withField(value, field, next))}
      />
    </span>
  );
  return (
    <Field label="Limit">
      <Choice
        label="Kind of limit"
        choices={choices}
        value={family}
        onChange={(next) => onChange(freshLimit(next, value))}
      />
      {family === 'ends' ? (
        <>
          {bound('min', 'at least')}
          {bound('max', 'at most')}
          <Checkbox
            isSelected={value.exclusive !== true}
            onChange={(included) => onChange(withField(value, 'exclusive', included ? undefined : true))}
            isDisabled={isDisabled}
          >
            limits included
          </Checkbox>
        </>
      ) : null}
      {family === 'target' ? (
        <>
          {bound('target', 'target')}
          {bound('tolerance', 'within ±')}
        </>
      ) : null}
      {family === 'one of' ? <OneOf value={value} onChange={onChange} /> : null}
    </Field>
  );
}

function OneOf({ value, onChange }: { value: RuleField; onChange: (value: RuleField) => void }) {
  const { isDisabled } = useRuleForm();
  const isTable = !Array.isArray(value.oneOf) && typeof value.oneOf === 'object' && value.oneOf !== null;
  return (
    <>
      <Choice
        label="Where the allowed values are"
        choices={[
          { value: 'here', label: 'given here' },
          { value: 'table', label: 'from a table' },
        ]}
        value={isTable ? 'table' : 'here'}
        onChange={(next) => onChange({ oneOf: next === 'table' ? { table: '', column: '' } : [] })}
      />
      {isTable ? (
        <TableColumn
          label="Allowed values"
          value={value.oneOf as RuleField}
          onChange={(oneOf) => onChange({ ...value, oneOf })}
        />
      ) : (
        <TextField
          label="Allowed values"
          hideLabel
          placeholder="separated by commas"
          value={Array.isArray(value.oneOf) ? value.oneOf.join(', ') : ''}
          onChange={(text) => onChange({ ...value, oneOf: text.split(',').map((word) => word.trim()) })}
          isDisabled={isDisabled}
        />
      )}
    </>
  );
}
