import { type ReactNode, useState } from 'react';
import type { EditionView } from '#rules/rule-sets/edition-view';
import type { DocumentProblem } from '#rules/rule-sets/problem';
import { Field, FieldErrorLine } from '../../../components/ui/field';
import { RadioLine } from '../../../components/ui/radio-line';
import { TextAreaField, TextField } from '../../../components/ui/text-field';
import { fieldsIn, type RuleField, RuleFormContext } from '../lib/rule-fields';
import { ConditionField } from './condition-field';
import { LimitField } from './limit-field';
import { MeasureFields } from './measure-fields';
import { RoundingField } from './rounding-field';
import { SourceFields } from './source-fields';
import { WrittenNumber } from './written-number';

/** The form of a rule, whatever it measures. What is wrong stands at its field, all of it at once. */
export function RuleForm({
  rule,
  view,
  problems,
  isDisabled,
  onChange,
}: {
  rule: RuleField;
  view: EditionView;
  problems: readonly DocumentProblem[];
  isDisabled: boolean;
  onChange: (rule: RuleField) => void;
}) {
  const [focused, setFocused] = useState<string | null>(null);
  const set = (field: string, value: unknown) => {
    const { [field]: _, ...rest } = rule;
    onChange(value === undefined ? rest : { ...rule, [field]: value });
  };
  const text = (field: string) => String(rule[field] ?? '');
  return (
    <RuleFormContext value={{ view, isDisabled }}>
      <form
        className="fieldset rule-form"
        data-focused={focused}
        onSubmit={(event) => event.preventDefault()}
        onFocus={(event) =>
          setFocused(event.target.closest('[data-rule-field]')?.getAttribute('data-rule-field') ?? null)
        }
        onBlur={() => setFocused(null)}
      >
        <FieldRow name="clause" problems={problems}>
          <TextField
            label="Clause"
            value={text('clause')}
            onChange={(next) => set('clause', next)}
            isDisabled={isDisabled}
          />
        </FieldRow>
        <FieldRow name="title" problems={problems}>
          <TextField
            label="Title"
            size="wide"
            value={text('title')}
            onChange={(next) => set('title', next)}
            isDisabled={isDisabled}
          />
        </FieldRow>
        <FieldRow name="when" problems={problems}>
          <Field label="Applies when">
            <ConditionField value={rule.when} onChange={(next) => set('when', next)} />
          </Field>
        </FieldRow>
        <FieldRow name="measure" problems={problems}>
          <MeasureFields value={fieldsIn(rule.measure)} onChange={(next) => set('measure', next)} />
        </FieldRow>
        <FieldRow name="limit" problems={problems}>
          <LimitField
            value={fieldsIn(rule.limit)}
            kind={String(fieldsIn(rule.measure).kind ?? 'reading')}
            onChange={(next) => set('limit', next)}
          />
        </FieldRow>
        <FieldRow name="rounding" problems={problems}>
          <RoundingField value={rule.rounding} onChange={(next) => set('rounding', next)} />
        </FieldRow>
        <FieldRow name="precision" problems={problems}>
          <Field label="Precision">
            <WrittenNumber
              label="Precision"
              value={fieldsIn(rule.precision).value}
              onChange={(value) =>
                set('precision', value === undefined ? undefined : { ...fieldsIn(rule.precision), value })
              }
            />
            <span className="field-help">a smaller margin is marked borderline</span>
          </Field>
        </FieldRow>
        <FieldRow name="severity" problems={problems}>
          <RadioLine
            label="Severity"
            choices={[
              { value: 'required', label: 'required' },
              { value: 'advisory', label: 'advisory' },
            ]}
            value={rule.severity === 'advisory' ? 'advisory' : 'required'}
            onChange={(next) => set('severity', next)}
            isDisabled={isDisabled}
          />
        </FieldRow>
        <FieldRow name="advice" problems={problems}>
          <TextAreaField
            label="Advice"
            rows={2}
            value={text('advice')}
            onChange={(next) => set('advice', next === '' ? null : next)}
            isDisabled={isDisabled}
          />
        </FieldRow>
        <FieldRow name="source" problems={problems}>
          <SourceFields value={fieldsIn(rule.source)} onChange={(next) => set('source', next)} />
        </FieldRow>
      </form>
    </RuleFormContext>
  );
}

function FieldRow({
  name,
  problems,
  children,
}: {
  name: string;
  problems: readonly DocumentProblem[];
  children: ReactNode;
}) {
  const own = problems.filter(({ pointer }) => pointer === `/${name}` || pointer.startsWith(`/${name}/`));
  return (
    <div data-rule-field={name}>
      {children}
      {own.map(({ pointer, detail, fix }) => (
        <FieldErrorLine key={`${pointer}${detail}`}>
          {detail} {fix}
        </FieldErrorLine>
      ))}
    </div>
  );
}
