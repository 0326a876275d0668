import { useState } from 'react';
import { STANDARD_ATTRIBUTES } from '#rules/rule-sets/attribute';
import { Button } from '../../../components/ui/button';
import { TextField } from '../../../components/ui/text-field';
import { type RuleField, useRuleForm } from '../lib/rule-fields';
import { Choice } from './choice';
import { ConditionsField } from './conditions-field';
import { QuantityChoice } from './quantity-choice';

const operators = [
  { value: 'equal', label: 'is' },
  { value: 'notEqual', label: 'is not' },
  { value: 'in', label: 'is one of' },
  { value: 'notIn', label: 'is none of' },
  { value: 'lessThan', label: 'is below' },
  { value: 'lessThanInclusive', label: 'is at most' },
  { value: 'greaterThan', label: 'is above' },
  { value: 'greaterThanInclusive', label: 'is at least' },
] as const;

/** One comparison of an attribute, or of a quantity of the mix. */
export function ComparisonField({
  value,
  onChange,
  name,
}: {
  value: RuleField;
  onChange: (value: unknown) => void;
  name: string;
}) {
  const { view, isDisabled } = useRuleForm();
  const facts = useFacts();
  const params = value.params as { quantity?: string; at?: RuleField } | undefined;
  const isList = value.operator === 'in' || value.operator === 'notIn';
  const unit = params ? view.quantity(params.quantity ?? '')?.unit : view.attribute(String(value.fact))?.unit;
  return (
    <div className="comparison">
      <Choice
        label={`${name}: what is compared`}
        choices={[...facts, { value: 'quantity', label: 'a quantity of the mix' }]}
        value={value.fact}
        onChange={(fact) => {
          const { params: _, ...rest } = value;
          onChange(
            fact === 'quantity' ? { ...rest, fact, params: { quantity: 'air-voids' } } : { ...rest, fact },
          );
        }}
      />
      {params ? (
        <>
          <QuantityChoice
            label={`${name}: quantity`}
            value={params.quantity}
            onChange={(quantity) => onChange({ ...value, params: { ...params, quantity } })}
          />
          <ConditionsField
            label={name}
            value={params.at}
            onChange={(at) => onChange({ ...value, params: { ...params, at: at ?? {} } })}
          />
        </>
      ) : null}
      <Choice
        label={`${name}: how`}
        choices={operators}
        value={value.operator}
        onChange={(operator) => {
          const list = operator === 'in' || operator === 'notIn';
          const values = [value.value].flat();
          onChange({ ...value, operator, value: list ? values : (values[0] ?? '') });
        }}
      />
      <ComparedValue value={value} isList={isList} name={name} onChange={onChange} />
      {unit ? <span className="mute">{unit}</span> : null}
      {isDisabled ? null : (
        <Button kind="inline" onPress={() => onChange(undefined)} aria-label={`Remove ${name}`}>
          remove
        </Button>
      )}
    </div>
  );
}

function useFacts(): { value: string; label: string }[] {
  const { view } = useRuleForm();
  const names = new Set([...STANDARD_ATTRIBUTES.map(({ name }) => name), ...view.attributeNames]);
  return [...names].map((name) => ({ value: name, label: view.attributeLabel(name).toLowerCase() }));
}

function ComparedValue({
  value,
  isList,
  name,
  onChange,
}: {
  value: RuleField;
  isList: boolean;
  name: string;
  onChange: (value: unknown) => void;
}) {
  const { view, isDisabled } = useRuleForm();
  const attribute = value.params === undefined ? view.attribute(String(value.fact)) : undefined;
  const [typed, setTyped] = useState<string | null>(null);
  const choices = attribute?.values?.map((entry) => {
    const own = typeof entry === 'object' ? entry.value : entry;
    const label = typeof entry === 'object' ? (entry.label ?? String(own)) : String(own);
    return { value: String(own), label, own };
  });
  if (choices !== undefined && !isList) {
    return (
      <Choice
        label={`${name}: value`}
        choices={choices}
        value={String(value.value)}
        onChange={(chosen) =>
          onChange({ ...value, value: choices.find((each) => each.value === chosen)?.own })
        }
      />
    );
  }
  const isNumber = attribute === undefined ? value.params !== undefined : attribute.type === 'number';
  const read = (text: string): unknown => {
    const one = (word: string) =>
      isNumber && word !== '' && Number.isFinite(Number(word)) ? Number(word) : word;
    return isList
      ? text
          .split(',')
          .map((word) => one(word.trim()))
          .filter((each) => each !== '')
      : one(text.trim());
  };
  return (
    <TextField
      label={`${name}: value`}
      hideLabel
      value={typed ?? [value.value].flat().join(', ')}
      onChange={(text) => {
        setTyped(text);
        onChange({ ...value, value: read(text) });
      }}
      onBlur={() => setTyped(null)}
      isDisabled={isDisabled}
    />
  );
}
