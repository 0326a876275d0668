import { Field } from '../../../components/ui/field';
import { TextField } from '../../../components/ui/text-field';
import { type RuleField, useRuleForm } from '../lib/rule-fields';
import { Choice } from './choice';

const origins = [
  { value: 'agency', label: 'the agency’s own' },
  { value: 'read', label: 'read in the document' },
  { value: 'derived', label: 'derived' },
  { value: 'memory', label: 'from memory, verify' },
] as const;

/** Where the limit comes from, as findings will name it. */
export function SourceFields({
  value,
  onChange,
}: {
  value: RuleField;
  onChange: (value: RuleField) => void;
}) {
  const { isDisabled } = useRuleForm();
  const text = (field: string, label: string) => (
    <TextField
      label={`Source: ${label}`}
      hideLabel
      placeholder={label}
      value={String(value[field] ?? '')}
      onChange={(next) => onChange({ ...value, [field]: next === '' ? null : next })}
      isDisabled={isDisabled}
    />
  );
  return (
    <Field label="Source">
      <Choice
        label="Origin of the limit"
        choices={origins}
        value={value.origin ?? 'agency'}
        onChange={(origin) => onChange({ ...value, origin })}
      />
      {text('title', 'title')}
      {text('number', 'number')}
      {text('edition', 'edition')}
      {text('section', 'section')}
    </Field>
  );
}
