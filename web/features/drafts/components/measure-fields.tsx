import { STANDARD_DOCUMENTS } from '#rules/rule-sets/document-types';
import { Checkbox } from '../../../components/ui/checkbox';
import { Field } from '../../../components/ui/field';
import { TextField } from '../../../components/ui/text-field';
import { freshMeasure, measureKinds, statistics } from '../lib/measures';
import { fieldsIn, type RuleField, useRuleForm, withField } from '../lib/rule-fields';
import { Bound } from './bound';
import { Choice } from './choice';
import { ConditionsField } from './conditions-field';
import { QuantityChoice } from './quantity-choice';
import { WhereFields } from './where-fields';
import { WrittenNumber } from './written-number';

interface Props {
  value: RuleField;
  onChange: (value: RuleField) => void;
}

/** What a rule measures: the kind, then the fields of that kind and no other. */
export function MeasureFields({ value, onChange }: Props) {
  return (
    <>
      <Field label="Measure">
        <Choice
          label="Kind of measure"
          choices={measureKinds}
          value={value.kind}
          onChange={(kind) => onChange(freshMeasure(kind, value))}
        />
        <KindFields value={value} onChange={onChange} />
      </Field>
      <WhereFields value={value.where} onChange={(where) => onChange(withField(value, 'where', where))} />
    </>
  );
}

function KindFields(props: Props) {
  switch (props.value.kind) {
    case 'gradation':
      return <GradationFields {...props} />;
    case 'creep-compliance':
      return <CreepFields {...props} />;
    case 'formula':
      return <FormulaFields {...props} />;
    case 'difference':
      return <DifferenceFields {...props} />;
    case 'attribute':
      return <AttributeFields {...props} />;
    case 'document':
      return <DocumentFields {...props} />;
    default:
      return <ReadingFields {...props} />;
  }
}

function ReadingFields({ value, onChange }: Props) {
  const set = (field: string, next: unknown) => onChange(withField(value, field, next));
  return (
    <>
      <QuantityChoice label="Quantity" value={value.quantity} onChange={(next) => set('quantity', next)} />
      <ConditionsField label="Reading" value={value.at} onChange={(next) => set('at', next)} />
      <Choice
        label="Statistic"
        choices={statistics}
        value={value.statistic ?? 'mean'}
        onChange={(next) => set('statistic', next)}
      />
      <span className="mute">of at least</span>
      <WrittenNumber
        label="Fewest results"
        asNumber
        value={value.minimumCount}
        onChange={(next) => set('minimumCount', next)}
      />
      <span className="mute">results</span>
      <Ends label="each result also" value={value.alsoEach} onChange={(next) => set('alsoEach', next)} />
      {value.statistic === 'percent-within-limits' ? (
        <Ends label="within" value={value.within} onChange={(next) => set('within', next)} />
      ) : null}
    </>
  );
}

function Ends({
  label,
  value,
  onChange,
}: {
  label: string;
  value: unknown;
  onChange: (value: unknown) => void;
}) {
  const ends = fieldsIn(value);
  const put = (field: string, next: unknown) => {
    const changed = withField(ends, field, next);
    onChange(Object.keys(changed).length === 0 ? undefined : changed);
  };
  return (
    <span className="condition">
      <span className="mute">{label} at least</span>
      <Bound label={`${label}, lower end`} value={ends.min} onChange={(next) => put('min', next)} />
      <span className="mute">at most</span>
      <Bound label={`${label}, upper end`} value={ends.max} onChange={(next) => put('max', next)} />
    </span>
  );
}

function GradationFields({ value, onChange }: Props) {
  const { view } = useRuleForm();
  return (
    <>
      <ConditionsField
        label="Gradation"
        value={value.at}
        onChange={(next) => onChange(withField(value, 'at', next))}
      />
      <span className="mute">against</span>
      <Choice
        label="Table of control points"
        choices={view.tables.map(({ id, title }) => ({ value: id, label: title ?? id }))}
        value={value.table}
        onChange={(next) => onChange({ ...value, table: next })}
      />
    </>
  );
}

function CreepFields({ value, onChange }: Props) {
  const set = (field: string, next: unknown) => onChange(withField(value, field, next));
  const number = (field: string, label: string, unit: string) => (
    <span className="condition">
      <span className="mute">{label}</span>
      <WrittenNumber label={label} asNumber value={value[field]} onChange={(next) => set(field, next)} />
      <span className="mute">{unit}</span>
    </span>
  );
  return (
    <>
      {number('temperature', 'at', '°C')}
      {number('time', 'after', 's')}
      {number('stress', 'under', 'kPa')}
      <Choice
        label="Source of the value"
        choices={[
          { value: 'either', label: 'measured, else fitted' },
          { value: 'measured', label: 'measured' },
          { value: 'fitted', label: 'fitted' },
        ]}
        value={value.source ?? 'either'}
        onChange={(next) => set('source', next)}
      />
      <Choice
        label="Model of the fit"
        choices={[
          { value: 'sigmoid', label: 'four-parameter form' },
          { value: 'power', label: 'power law' },
          { value: 'prony', label: 'Prony series' },
        ]}
        value={value.model ?? 'sigmoid'}
        onChange={(next) => set('model', next)}
      />
      {number('extrapolationDecades', 'beyond the tested times by', 'decades')}
      <Choice
        label="Which end of the band"
        choices={[
          { value: 'estimate', label: 'the estimate' },
          { value: 'upper', label: 'the upper end of the band' },
          { value: 'lower', label: 'the lower end of the band' },
        ]}
        value={value.use ?? 'estimate'}
        onChange={(next) => set('use', next)}
      />
      {number('confidence', 'confidence', '')}
    </>
  );
}

function FormulaFields({ value, onChange }: Props) {
  const { isDisabled } = useRuleForm();
  const set = (field: string, next: unknown) => onChange(withField(value, field, next));
  return (
    <>
      <TextField
        label="Formula"
        hideLabel
        value={String(value.expression ?? '')}
        onChange={(next) => onChange({ ...value, expression: next })}
        isDisabled={isDisabled}
        help="over trade symbols, such as Gse - Gsb"
      />
      <ConditionsField label="Formula" value={value.at} onChange={(next) => set('at', next)} />
      <TextField
        label="Unit of the formula"
        hideLabel
        size="number"
        placeholder="unit"
        value={String(value.unit ?? '')}
        onChange={(next) => set('unit', next)}
        isDisabled={isDisabled}
      />
    </>
  );
}

function DifferenceFields({ value, onChange }: Props) {
  const between = Array.isArray(value.between) ? value.between.join(' and ') : '';
  return (
    <>
      <QuantityChoice
        label="Quantity"
        value={value.quantity}
        onChange={(next) => onChange({ ...value, quantity: next })}
      />
      <span className="mute">between</span>
      <Choice
        label="Between"
        choices={[
          { value: 'contractor and agency', label: 'contractor and agency' },
          { value: 'reported and recomputed', label: 'reported and recomputed' },
        ]}
        value={between}
        onChange={(next) => onChange({ ...value, between: next.split(' and ') })}
      />
      <Choice
        label="Statistic"
        choices={statistics}
        value={value.statistic ?? 'mean'}
        onChange={(next) => onChange({ ...value, statistic: next })}
      />
    </>
  );
}

function AttributeFields({ value, onChange }: Props) {
  const { view } = useRuleForm();
  return (
    <Choice
      label="Attribute"
      choices={view.attributeNames.map((name) => ({
        value: name,
        label: view.attributeLabel(name).toLowerCase(),
      }))}
      value={value.attribute}
      onChange={(next) => onChange({ ...value, attribute: next })}
    />
  );
}

function DocumentFields({ value, onChange }: Props) {
  const { view, isDisabled } = useRuleForm();
  const set = (field: string, next: unknown) => onChange(withField(value, field, next));
  const types = [
    ...new Set([...STANDARD_DOCUMENTS.map(({ type }) => type), ...view.ownDocuments.map(({ type }) => type)]),
  ];
  const isDate = typeof value.on === 'string' && /^\d/.test(value.on);
  return (
    <>
      <Choice
        label="Document"
        choices={types.map((type) => ({ value: type, label: view.document(type)?.label ?? type }))}
        value={value.type}
        onChange={(next) => set('type', next)}
      />
      <Checkbox
        isSelected={value.enclosed === true}
        onChange={(next) => set('enclosed', next ? true : undefined)}
        isDisabled={isDisabled}
      >
        enclosed
      </Checkbox>
      <span className="mute">at most</span>
      <WrittenNumber
        label="Greatest age in months"
        asNumber
        value={value.maximumAgeMonths}
        onChange={(next) => set('maximumAgeMonths', next)}
      />
      <span className="mute">months old on</span>
      <Choice
        label="Counted to"
        choices={[
          { value: 'submitted', label: 'the day of submission' },
          { value: 'letting', label: 'the letting date' },
          { value: 'date', label: 'a stated date' },
        ]}
        value={isDate ? 'date' : (value.on ?? 'submitted')}
        onChange={(next) => set('on', next === 'date' ? '2026-01-01' : next)}
      />
      {isDate ? (
        <TextField
          label="Stated date"
          hideLabel
          type="date"
          value={String(value.on)}
          onChange={(next) => set('on', next)}
          isDisabled={isDisabled}
        />
      ) : null}
    </>
  );
}
