import { type Control, Controller, type FieldValues, type Path } from 'react-hook-form';
import { TextField, type TextFieldProps } from './text-field';

type Bound = 'value' | 'defaultValue' | 'onChange' | 'onBlur' | 'name' | 'error';

/** A text field bound to a form: its value, its error, and the focus where it is the first in error. */
export function FormTextField<Values extends FieldValues, Output>({
  control,
  name,
  asNumber = false,
  emptyAsNull = false,
  ...props
}: {
  control: Control<Values, unknown, Output>;
  name: Path<Values>;
  /** The form holds a number; an empty field holds none. */
  asNumber?: boolean;
  /** An empty field means that nothing is stated. */
  emptyAsNull?: boolean;
} & Omit<TextFieldProps, Bound>) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => {
        field.ref({ focus: () => focusByName(name) });
        return (
          <TextField
            {...props}
            name={name}
            value={textOf(field.value)}
            onChange={(text) => field.onChange(readText(text, { asNumber, emptyAsNull }))}
            onBlur={field.onBlur}
            error={fieldState.error?.message}
          />
        );
      }}
    />
  );
}

function textOf(value: unknown): string {
  return value === null || value === undefined || Number.isNaN(value) ? '' : String(value);
}

function readText(
  text: string,
  how: { asNumber: boolean; emptyAsNull: boolean },
): string | number | null | undefined {
  if (text === '' && how.emptyAsNull) return null;
  if (!how.asNumber) return text;
  const number = Number(text.replace(',', '.'));
  return text.trim() === '' ? undefined : number;
}

function focusByName(name: string): void {
  document.getElementsByName(name)[0]?.focus();
}
