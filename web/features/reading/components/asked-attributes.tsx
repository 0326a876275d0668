import { useState } from 'react';
import type { AskedAttribute } from '#shared/contracts/readings';
import { RadioLine } from '../../../components/ui/radio-line';
import { SelectField } from '../../../components/ui/select-field';
import { TextField } from '../../../components/ui/text-field';
import { typedAttribute } from '../lib/typed-attribute';

type Value = AskedAttribute['value'];

/** What rules branch on and nobody has stated: asked here, kept as typed. */
export function AskedAttributes({
  asked,
  onKeep,
  canAnswer,
}: {
  asked: readonly AskedAttribute[];
  onKeep: (name: string, value: Value) => void;
  canAnswer: boolean;
}) {
  if (asked.length === 0) return null;
  const open = asked.filter((attribute) => attribute.value === null).length;
  return (
    <section aria-labelledby="asked">
      <div className="side-head">
        <h2 id="asked">To state</h2>
        <span>{open === 0 ? 'all stated' : `${open} open`}</span>
      </div>
      {asked.map((attribute) => (
        <AskedField
          key={attribute.name}
          attribute={attribute}
          onKeep={(value) => onKeep(attribute.name, value)}
          canAnswer={canAnswer}
        />
      ))}
    </section>
  );
}

const mostRadios = 4;

function AskedField({
  attribute,
  onKeep,
  canAnswer,
}: {
  attribute: AskedAttribute;
  onKeep: (value: Value) => void;
  canAnswer: boolean;
}) {
  const choices = choicesOf(attribute);
  const label = attribute.unit ? `${attribute.label}, ${attribute.unit}` : attribute.label;
  if (choices.length === 0) {
    return <TypedField attribute={attribute} label={label} onKeep={onKeep} canAnswer={canAnswer} />;
  }
  const shared = {
    label,
    choices,
    value: attribute.value === null ? null : String(attribute.value),
    onChange: (text: string) => onKeep(typedAttribute(attribute, text)),
    help: attribute.reason,
    isDisabled: !canAnswer,
  };
  return choices.length <= mostRadios ? <RadioLine {...shared} /> : <SelectField {...shared} />;
}

/** Kept when the field is left or Enter is pressed, so that a half-typed value is never judged. */
function TypedField({
  attribute,
  label,
  onKeep,
  canAnswer,
}: {
  attribute: AskedAttribute;
  label: string;
  onKeep: (value: Value) => void;
  canAnswer: boolean;
}) {
  const kept = attribute.value === null ? '' : String(attribute.value);
  const [text, setText] = useState(kept);
  const [error, setError] = useState<string | undefined>(undefined);
  const keep = () => {
    if (text.trim() === kept) return setError(undefined);
    const value = typedAttribute(attribute, text);
    if (value === null && text.trim() !== '') return setError(wanted(attribute.type));
    setError(undefined);
    onKeep(value);
  };
  return (
    <TextField
      label={label}
      value={text}
      onChange={setText}
      onBlur={keep}
      onKeyDown={(event) => {
        if (event.key === 'Enter') keep();
      }}
      help={attribute.reason}
      error={error}
      isDisabled={!canAnswer}
      {...(attribute.type === 'number' ? { size: 'number', inputMode: 'decimal' } : {})}
      {...(attribute.type === 'date' ? { type: 'date' } : {})}
    />
  );
}

function choicesOf(attribute: AskedAttribute): { value: string; label: string }[] {
  if (attribute.type === 'boolean') {
    return [
      { value: 'true', label: 'yes' },
      { value: 'false', label: 'no' },
    ];
  }
  return attribute.values.map((value) => ({ value: String(value), label: String(value) }));
}

function wanted(type: AskedAttribute['type']): string {
  if (type === 'number') return 'Enter a number such as 12.5.';
  return type === 'date' ? 'Enter a date.' : 'Enter the value.';
}
