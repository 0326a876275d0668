import { Field } from '../../../components/ui/field';
import { type RuleField, useRuleForm } from '../lib/rule-fields';
import { TableColumn } from './bound';
import { Choice } from './choice';
import { WrittenNumber } from './written-number';

const methods = [
  { value: 'none', label: 'none named' },
  { value: 'rounding', label: 'ASTM E29, rounding method' },
  { value: 'absolute', label: 'ASTM E29, absolute method' },
  { value: 'half-up', label: 'halves up' },
  { value: 'truncate', label: 'cut off' },
] as const;

/** How the statistic is rounded before it is held against the limit. */
export function RoundingField({ value, onChange }: { value: unknown; onChange: (value: unknown) => void }) {
  const { isDisabled } = useRuleForm();
  const rounding = typeof value === 'object' && value !== null ? (value as RuleField) : null;
  const to = rounding?.to ?? 'limit';
  const step = to === 'limit' ? 'limit' : typeof to === 'object' ? 'table' : 'number';
  return (
    <Field label="Rounding">
      <Choice
        label="Method of rounding"
        choices={methods}
        value={rounding?.method ?? 'none'}
        onChange={(method) => onChange(method === 'none' ? undefined : { ...rounding, method })}
      />
      {rounding === null || rounding.method === 'absolute' ? null : (
        <>
          <span className="mute">to</span>
          <Choice
            label="Step of rounding"
            choices={[
              { value: 'limit', label: 'the limit’s own decimals' },
              { value: 'number', label: 'a step' },
              { value: 'table', label: 'a table’s step' },
            ]}
            value={step}
            onChange={(next) =>
              onChange({
                ...rounding,
                to: next === 'limit' ? 'limit' : next === 'table' ? { table: '', column: '' } : 0.1,
              })
            }
          />
          {step === 'number' ? (
            <WrittenNumber
              label="Step"
              asNumber
              value={to}
              onChange={(next) => next !== undefined && onChange({ ...rounding, to: next })}
            />
          ) : null}
          {step === 'table' ? (
            <TableColumn
              label="Step"
              value={to as RuleField}
              onChange={(next) => onChange({ ...rounding, to: next })}
            />
          ) : null}
        </>
      )}
      {isDisabled || rounding !== null ? null : (
        <span className="field-help">a rule that names none is not rounded</span>
      )}
    </Field>
  );
}
