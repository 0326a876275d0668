import { unitWord } from '#shared/format/units';
import { RadioLine } from '../../../components/ui/radio-line';
import { SelectField } from '../../../components/ui/select-field';
import type { ReadingChoices } from '../api/get-reading-choices';
import { neededConditions } from '../lib/needed-conditions';
import type { SayForm } from '../lib/say-form';
import { ConditionFields } from './condition-fields';
import { QuantityField } from './quantity-field';

const kinds = [
  { value: 'reading' as const, label: 'readings of a quantity' },
  { value: 'attribute' as const, label: 'an attribute of the mix' },
  { value: 'document date' as const, label: 'the date of a document' },
  { value: 'not a reading' as const, label: 'not a reading' },
];

const asWritten = 'as written';

/** What a person says of cells: only what the chosen kind needs is asked. */
export function SayFields({
  choices,
  form,
  onChange,
}: {
  choices: ReadingChoices;
  form: SayForm;
  onChange: (form: SayForm) => void;
}) {
  return (
    <>
      <RadioLine
        label="They are"
        choices={kinds}
        value={form.kind}
        onChange={(kind) => onChange({ ...form, kind })}
        column
      />
      {form.kind === 'reading' ? <QuantitySaid choices={choices} form={form} onChange={onChange} /> : null}
      {form.kind === 'attribute' ? (
        <QuantityField
          label="Attribute"
          choices={choices.attributes.map(({ name, label }) => ({ id: name, label }))}
          value={form.attribute}
          onChange={(attribute) => onChange({ ...form, attribute })}
        />
      ) : null}
      {form.kind === 'document date' ? (
        <>
          <QuantityField
            label="Document"
            choices={choices.documents.map(({ type, label }) => ({ id: type, label }))}
            value={form.document}
            onChange={(document) => onChange({ ...form, document })}
          />
          <RadioLine
            label="Which date"
            choices={[
              { value: 'date', label: 'its own' },
              { value: 'validTo', label: 'valid to' },
            ]}
            value={form.part}
            onChange={(part) => onChange({ ...form, part })}
          />
        </>
      ) : null}
    </>
  );
}

function QuantitySaid({
  choices,
  form,
  onChange,
}: {
  choices: ReadingChoices;
  form: SayForm;
  onChange: (form: SayForm) => void;
}) {
  const quantity = choices.quantities.find(({ id }) => id === form.quantity);
  const units = (quantity?.units ?? []).filter((unit) => unitWord(unit) !== '');
  return (
    <>
      <QuantityField
        label="Quantity"
        choices={choices.quantities}
        value={form.quantity}
        onChange={(id) => onChange({ ...form, quantity: id, unit: null })}
      />
      {units.length > 0 ? (
        <SelectField
          label="Unit"
          choices={[
            { value: asWritten, label: 'as cells or headings say' },
            ...units.map((unit) => ({ value: unit, label: unit })),
          ]}
          value={form.unit ?? asWritten}
          onChange={(unit) => onChange({ ...form, unit: unit === asWritten ? null : unit })}
        />
      ) : null}
      {quantity ? (
        <ConditionFields
          needed={neededConditions(quantity.id)}
          conditions={form.conditions}
          onChange={(conditions) => onChange({ ...form, conditions })}
        />
      ) : null}
    </>
  );
}
