import { useState } from 'react';
import type { ConditionName } from '#rules/reading/mapping';
import { SelectField } from '../../../components/ui/select-field';
import { TextField } from '../../../components/ui/text-field';
import { conditionLabels, conditionNames } from '../lib/condition-words';
import type { ConditionHow, ConditionSaid, ConditionsSaid } from '../lib/conditions-said';

const howChoices: { value: ConditionHow; label: string }[] = [
  { value: 'headings', label: 'as row and column say' },
  { value: 'all', label: 'the same for all' },
  { value: 'row', label: 'row by row' },
  { value: 'column', label: 'column by column' },
  { value: 'none', label: 'none' },
];

const textLabels: Partial<Record<ConditionHow, string>> = {
  all: 'which',
  row: 'named in column',
  column: 'named in row',
};

const asHeadings: ConditionSaid = { how: 'headings', text: '' };

/** What a quantity needs to be told of each value: its trial, its specimen, its temperature. */
export function ConditionFields({
  needed,
  conditions,
  onChange,
}: {
  needed: readonly ConditionName[];
  conditions: ConditionsSaid;
  onChange: (conditions: ConditionsSaid) => void;
}) {
  const [added, setAdded] = useState<ConditionName[]>([]);
  const shown = conditionNames.filter(
    (name) => needed.includes(name) || added.includes(name) || conditions[name] !== undefined,
  );
  const others = conditionNames.filter((name) => !shown.includes(name));
  return (
    <>
      {shown.map((name) => (
        <ConditionField
          key={name}
          name={name}
          said={conditions[name] ?? asHeadings}
          onChange={(said) => onChange({ ...conditions, [name]: said })}
        />
      ))}
      {others.length > 0 ? (
        <SelectField
          label="Also"
          placeholder="another condition"
          choices={others.map((name) => ({ value: name, label: conditionLabels[name] }))}
          value={null}
          onChange={(name) => setAdded([...added, name])}
        />
      ) : null}
    </>
  );
}

function ConditionField({
  name,
  said,
  onChange,
}: {
  name: ConditionName;
  said: ConditionSaid;
  onChange: (said: ConditionSaid) => void;
}) {
  const textLabel = textLabels[said.how];
  return (
    <div className="condition">
      <SelectField
        label={conditionLabels[name]}
        choices={howChoices}
        value={said.how}
        onChange={(how) => onChange({ how, text: '' })}
      />
      {textLabel ? (
        <TextField
          label={`${conditionLabels[name]} ${textLabel}`}
          hideLabel
          placeholder={textLabel}
          size="number"
          value={said.text}
          onChange={(text) => onChange({ ...said, text })}
        />
      ) : null}
    </div>
  );
}
