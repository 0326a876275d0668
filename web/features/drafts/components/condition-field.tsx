import { Button } from '../../../components/ui/button';
import { type RuleField, useRuleForm } from '../lib/rule-fields';
import { Choice } from './choice';
import { ComparisonField } from './comparison-field';

type Group = 'all' | 'any';

/** When a rule applies: nothing, one comparison, or groups of them within each other. */
export function ConditionField({ value, onChange }: { value: unknown; onChange: (value: unknown) => void }) {
  const { isDisabled } = useRuleForm();
  if (value === undefined || value === null) {
    return (
      <>
        <span>always</span>
        {isDisabled ? null : (
          <Button kind="inline" onPress={() => onChange({ all: [emptyComparison] })}>
            add a condition
          </Button>
        )}
      </>
    );
  }
  return <ConditionNode value={value as RuleField} onChange={onChange} name="Condition" />;
}

const emptyComparison = { fact: 'mixType', operator: 'equal', value: '' };

function ConditionNode({
  value,
  onChange,
  name,
}: {
  value: RuleField;
  onChange: (value: unknown) => void;
  name: string;
}) {
  const { isDisabled } = useRuleForm();
  if ('not' in value) {
    return (
      <div className="condition-group">
        <span>not so that</span>
        {isDisabled ? null : (
          <Button kind="inline" onPress={() => onChange(value.not)}>
            drop the not
          </Button>
        )}
        <ConditionNode
          value={value.not as RuleField}
          name={`${name}, denied`}
          onChange={(next) => onChange(next === undefined ? undefined : { not: next })}
        />
      </div>
    );
  }
  const group: Group | null = 'all' in value ? 'all' : 'any' in value ? 'any' : null;
  if (group === null) return <ComparisonField value={value} onChange={onChange} name={name} />;
  return <GroupNode value={value} group={group} onChange={onChange} name={name} />;
}

function GroupNode({
  value,
  group,
  onChange,
  name,
}: {
  value: RuleField;
  group: Group;
  onChange: (value: unknown) => void;
  name: string;
}) {
  const { isDisabled } = useRuleForm();
  const members = Array.isArray(value[group]) ? (value[group] as RuleField[]) : [];
  const put = (next: readonly unknown[]) => onChange(next.length === 0 ? undefined : { [group]: next });
  return (
    <div className="condition-group">
      <Choice
        label={`${name}: how its parts count`}
        choices={[
          { value: 'all', label: 'all of' },
          { value: 'any', label: 'any of' },
        ]}
        value={group}
        onChange={(next) => onChange({ [next]: members })}
      />
      {isDisabled ? null : (
        <Button kind="inline" onPress={() => onChange({ not: value })}>
          deny it
        </Button>
      )}
      <ul>
        {members.map((member, index) => (
          // biome-ignore lint/suspicious/noArrayIndexKey: a part of a condition has no name but its place.
          <li key={index}>
            <ConditionNode
              value={member}
              name={`${name} ${index + 1}`}
              onChange={(next) =>
                put(
                  next === undefined
                    ? members.toSpliced(index, 1)
                    : members.toSpliced(index, 1, next as RuleField),
                )
              }
            />
          </li>
        ))}
      </ul>
      {isDisabled ? null : (
        <>
          <Button kind="inline" onPress={() => put([...members, emptyComparison])}>
            add a condition
          </Button>
          <Button kind="inline" onPress={() => put([...members, { any: [emptyComparison] }])}>
            add a group
          </Button>
        </>
      )}
    </div>
  );
}
