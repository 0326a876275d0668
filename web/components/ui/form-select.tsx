import { Controller, type FieldValues } from 'react-hook-form';
import type { Bound } from './form-fields';
import { type Choice, SelectField } from './select-field';

/** Apart from the other bound fields: a list to choose from brings a menu with it, which few pages need. */
export function FormSelect<Values extends FieldValues, Output, Value extends string>({
  control,
  name,
  ...props
}: Bound<Values, Output> & { label: string; choices: readonly Choice<Value>[]; help?: string }) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <SelectField
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
