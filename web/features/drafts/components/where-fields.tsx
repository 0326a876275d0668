import { Button } from '../../../components/ui/button';
import { Field } from '../../../components/ui/field';
import { type RuleField, useRuleForm, withField } from '../lib/rule-fields';
import { Bound } from './bound';
import { ConditionsField } from './conditions-field';
import { QuantityChoice } from './quantity-choice';

/** Which specimens count at all: those whose other quantity lies within its ends. */
export function WhereFields({
  value,
  onChange,
}: {
  value: unknown;
  onChange: (value: RuleField[] | undefined) => void;
}) {
  const { isDisabled } = useRuleForm();
  const list = Array.isArray(value) ? (value as RuleField[]) : [];
  const put = (next: RuleField[]) => onChange(next.length === 0 ? undefined : next);
  return (
    <Field label="Specimens that count">
      {list.length === 0 ? <span>all</span> : null}
      {list.map((where, index) => {
        const set = (field: string, next: unknown) =>
          put(list.toSpliced(index, 1, withField(where, field, next)));
        const name = `Condition ${index + 1} on specimens`;
        return (
          // biome-ignore lint/suspicious/noArrayIndexKey: a condition has no name but its place.
          <span key={index} className="condition">
            <QuantityChoice
              label={`${name}: quantity`}
              value={where.quantity}
              onChange={(next) => set('quantity', next)}
            />
            <ConditionsField label={name} value={where.at} onChange={(next) => set('at', next)} />
            <span className="mute">at least</span>
            <Bound label={`${name}: at least`} value={where.min} onChange={(next) => set('min', next)} />
            <span className="mute">at most</span>
            <Bound label={`${name}: at most`} value={where.max} onChange={(next) => set('max', next)} />
            {isDisabled ? null : (
              <Button
                kind="inline"
                onPress={() => put(list.toSpliced(index, 1))}
                aria-label={`Remove ${name}`}
              >
                remove
              </Button>
            )}
          </span>
        );
      })}
      {isDisabled ? null : (
        <Button
          kind="inline"
          onPress={() => put([...list, { quantity: 'air-voids', min: '6.5', max: '7.5' }])}
        >
          add a condition on specimens
        </Button>
      )}
    </Field>
  );
}
