import { Button } from '../../../components/ui/button';
import { TextField } from '../../../components/ui/text-field';
import {
  conditionNames,
  conditionValue,
  fieldsIn,
  type RuleField,
  useRuleForm,
  withField,
} from '../lib/rule-fields';
import { Choice } from './choice';

/** The conditions that a reading must carry: its trial, temperature, time and the like. */
export function ConditionsField({
  label,
  value,
  onChange,
}: {
  label: string;
  value: unknown;
  onChange: (value: RuleField | undefined) => void;
}) {
  const { isDisabled } = useRuleForm();
  const at = fieldsIn(value);
  const free = conditionNames.filter((name) => !(name in at));
  return (
    <span className="conditions">
      {Object.entries(at).map(([name, condition]) => (
        <span key={name} className="condition">
          <span className="mute">{name}</span>
          <TextField
            label={`${label}: ${name}`}
            hideLabel
            size="number"
            value={String(condition)}
            onChange={(text) => onChange({ ...at, [name]: conditionValue(name, text) })}
            isDisabled={isDisabled}
          />
          {isDisabled ? null : (
            <Button
              kind="inline"
              onPress={() => onChange(withField(at, name, undefined))}
              aria-label={`Remove ${name} of ${label}`}
            >
              remove
            </Button>
          )}
        </span>
      ))}
      {isDisabled ? null : (
        <Choice
          label={`${label}: one more condition`}
          choices={free.map((name) => ({ value: name, label: `at ${name}` }))}
          value={null}
          onChange={(name) => onChange({ ...at, [name]: name === 'trial' ? 'design' : '' })}
        />
      )}
    </span>
  );
}
