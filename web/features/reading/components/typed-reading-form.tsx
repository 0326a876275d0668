import { type ComponentProps, useState } from 'react';
import type { ReadingView } from '#shared/contracts/readings';
import { unitWord } from '#shared/format/units';
import { Button } from '../../../components/ui/button';
import { FieldErrorLine } from '../../../components/ui/field';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { SelectField } from '../../../components/ui/select-field';
import { TextField } from '../../../components/ui/text-field';
import { asProblem } from '../../../lib/problem';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useReadingChoices } from '../api/get-reading-choices';
import type { ReadingActs } from '../hooks/use-reading-acts';
import { conditionLabels, conditionNames } from '../lib/condition-words';
import { neededConditions } from '../lib/needed-conditions';
import { anAct } from '../lib/reading-act';
import { type TypedForm, typedReading } from '../lib/typed-form';
import { Proposal } from './proposal';
import { QuantityField } from './quantity-field';

/** One reading by hand. A changed one takes the place of the other, which stays on record. */
export function TypedReadingForm({
  params,
  reading,
  acts,
  start,
  replaces,
  onDone,
}: {
  params: RevisionParams;
  reading: ReadingView;
  acts: ReadingActs;
  start: TypedForm;
  /** The id of the typed reading that this one corrects. */
  replaces: string | null;
  onDone: () => void;
}) {
  const choices = useReadingChoices(params);
  const [form, setForm] = useState(start);
  const result = typedReading(form);
  const act = result.ok
    ? anAct({ typed: [result.reading], takeBack: replaces === null ? [] : [replaces] })
    : null;
  const quantity = choices.data?.quantities.find(({ id }) => id === form.quantity);
  const faults = result.ok ? {} : result.faults;
  const choose = (id: string | null) => {
    const chosen = choices.data?.quantities.find((each) => each.id === id);
    setForm({ ...form, quantity: id, unit: chosen?.unit ?? null });
  };
  return (
    <div className="typed-form">
      {choices.error ? (
        <ProblemNotice problem={asProblem(choices.error)} unaffected="Nothing was kept." />
      ) : null}
      <QuantityField
        label="Quantity"
        choices={choices.data?.quantities ?? []}
        value={form.quantity}
        onChange={choose}
      />
      {quantity ? (
        <>
          <ValueFields
            form={form}
            units={quantity.units}
            fault={faults.value}
            onChange={(part) => setForm({ ...form, ...part })}
          />
          <AtFields form={form} onChange={(at) => setForm({ ...form, at })} />
        </>
      ) : null}
      {faults.at ? <FieldErrorLine>{faults.at}</FieldErrorLine> : null}
      {act ? (
        <Proposal
          params={params}
          version={reading.version}
          act={act}
          keepLabel={replaces === null ? 'Keep it as typed' : 'Keep the change'}
          onKeep={() => acts.keep(act, `typing ${quantity?.label ?? 'a reading'}`, onDone)}
          onLeave={onDone}
          isKeeping={acts.isPending}
        />
      ) : (
        <Button kind="text" onPress={onDone}>
          Leave it
        </Button>
      )}
    </div>
  );
}

function ValueFields({
  form,
  units,
  fault,
  onChange,
}: {
  form: TypedForm;
  units: readonly string[];
  fault: string | undefined;
  onChange: (part: Partial<TypedForm>) => void;
}) {
  const named = units.filter((unit) => unitWord(unit) !== '');
  const number: Partial<ComponentProps<typeof TextField>> = { size: 'number', inputMode: 'text' };
  return (
    <>
      <TextField
        label="Value"
        value={form.value}
        onChange={(value) => onChange({ value })}
        error={fault}
        {...number}
      />
      {named.length > 0 ? (
        <SelectField
          label="Unit"
          choices={named.map((unit) => ({ value: unit, label: unit }))}
          value={form.unit}
          onChange={(unit) => onChange({ unit })}
        />
      ) : null}
      <TextField label="Method" value={form.method} onChange={(method) => onChange({ method })} />
      <TextField
        label="Tested on"
        type="date"
        value={form.testedOn}
        onChange={(testedOn) => onChange({ testedOn })}
        size="number"
      />
    </>
  );
}

function AtFields({ form, onChange }: { form: TypedForm; onChange: (at: TypedForm['at']) => void }) {
  const needed = new Set(form.quantity === null ? [] : neededConditions(form.quantity));
  const shown = conditionNames.filter((name) => needed.has(name) || form.at[name] !== undefined);
  return shown.map((name) => (
    <TextField
      key={name}
      label={conditionLabels[name]}
      value={form.at[name] ?? ''}
      onChange={(text) => onChange({ ...form.at, [name]: text })}
      size="number"
    />
  ));
}
