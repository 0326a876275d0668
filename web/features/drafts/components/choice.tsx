import { SelectField } from '../../../components/ui/select-field';
import { useRuleForm } from '../lib/rule-fields';

/** A choice within a line of words: its label is heard, not seen. */
export function Choice<Value extends string>({
  label,
  choices,
  value,
  onChange,
}: {
  label: string;
  choices: readonly { value: Value; label: string }[];
  value: unknown;
  onChange: (value: Value) => void;
}) {
  const { isDisabled } = useRuleForm();
  const known = choices.find((choice) => choice.value === value);
  // What a file brought and no choice knows stays in sight until another is chosen.
  const unknown = known === undefined && typeof value === 'string' && value !== '';
  return (
    <SelectField
      label={label}
      hideLabel
      choices={unknown ? [...choices, { value: value as Value, label: value }] : choices}
      value={known?.value ?? (unknown ? (value as Value) : null)}
      onChange={onChange}
      isDisabled={isDisabled}
    />
  );
}
