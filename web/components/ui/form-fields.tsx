import { type Control, Controller, type FieldPath, type FieldValues } from 'react-hook-form';
import { CheckboxLine } from './checkbox';
import { RadioLine } from './radio-line';
import type { Choice } from './select-field';
import { TextField, type TextFieldProps } from './text-field';

export interface Bound<Values extends FieldValues, Output> {
  control: Control<Values, unknown, Output>;
  name: FieldPath<Values>;
}

/** The kit's fields bound to a form of `useContractForm`: value, error and focus come from it. */
export function FormText<Values extends FieldValues, Output>({
  control,
  name,
  number = false,
  ...props
}: Bound<Values, Output> & Omit<TextFieldProps, 'value' | 'onChange' | 'error'> & { number?: boolean }) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <TextField
          {...props}
          name={name}
          value={field.value === null || field.value === undefined ? '' : String(field.value)}
          onChange={(text) => field.onChange(number ? numberOf(text) : text)}
          onBlur={field.onBlur}
          focusRef={field.ref}
          error={fieldState.error?.message}
          {...(number ? { inputMode: 'decimal', size: props.size ?? 'number' } : {})}
        />
      )}
    />
  );
}

export function FormRadioLine<Values extends FieldValues, Output, Value extends string>({
  control,
  name,
  ...props
}: Bound<Values, Output> & {
  label: string;
  choices: readonly Choice<Value>[];
  help?: string;
  column?: boolean;
}) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <RadioLine
          {...props}
          value={field.value ?? null}
          onChange={field.onChange}
          focusRef={field.ref}
          error={fieldState.error?.message}
        />
      )}
    />
  );
}

export function FormCheckboxLine<Values extends FieldValues, Output, Value extends string>({
  control,
  name,
  label,
  choices,
}: Bound<Values, Output> & { label: string; choices: readonly { value: Value; label: string }[] }) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <CheckboxLine
          label={label}
          choices={choices}
          values={field.value ?? []}
          onChange={field.onChange}
          error={fieldState.error?.message}
        />
      )}
    />
  );
}

/** A number that is not one stays text, so that the schema names the fault instead of a silent zero. */
function numberOf(text: string): number | string {
  const trimmed = text.trim();
  return /^-?\d+(\.\d+)?$/.test(trimmed) ? Number(trimmed) : trimmed;
}
