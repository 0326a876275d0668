import type { ReactNode } from 'react';
import { Checkbox as AriaCheckbox } from 'react-aria-components';
import { FieldErrorLine } from './field';

export function Checkbox({
  children,
  isSelected,
  onChange,
  isDisabled = false,
  error,
  label,
}: {
  /** The words beside the box; with `label` the box stands alone, as in a table. */
  children?: ReactNode;
  label?: string;
  isSelected: boolean;
  onChange: (selected: boolean) => void;
  isDisabled?: boolean;
  error?: string | undefined;
}) {
  return (
    <>
      <AriaCheckbox
        className="choice choice-check"
        isSelected={isSelected}
        onChange={onChange}
        isDisabled={isDisabled}
        isInvalid={error !== undefined}
        {...(label ? { 'aria-label': label } : {})}
      >
        <span>{children}</span>
      </AriaCheckbox>
      {error === undefined ? null : <FieldErrorLine>{error}</FieldErrorLine>}
    </>
  );
}

/** Several may be chosen; the group is named by its label. */
export function CheckboxLine<Value extends string>({
  label,
  choices,
  values,
  onChange,
  error,
}: {
  label: string;
  choices: readonly { value: Value; label: string }[];
  values: readonly Value[];
  onChange: (values: Value[]) => void;
  error?: string | undefined;
}) {
  return (
    <fieldset className="field" aria-label={label}>
      <div className="field-label" aria-hidden="true">
        {label}
      </div>
      <div className="field-control">
        <div className="choice-line">
          {choices.map((choice) => (
            <Checkbox
              key={choice.value}
              isSelected={values.includes(choice.value)}
              onChange={(selected) =>
                onChange(
                  selected ? [...values, choice.value] : values.filter((value) => value !== choice.value),
                )
              }
            >
              {choice.label}
            </Checkbox>
          ))}
        </div>
        {error === undefined ? null : <FieldErrorLine>{error}</FieldErrorLine>}
      </div>
    </fieldset>
  );
}
