import { type Control, Controller, type FieldPath, type FieldValues } from 'react-hook-form';
import { RadioLine } from './radio-line';
import { type Choice, SelectField } from './select-field';

const mostRadios = 4;

/** One of several: all in sight up to four, a list beyond. */
export function FormChoice<Values extends FieldValues, Output>({
  control,
  name,
  label,
  choices,
  help,
}: {
  control: Control<Values, unknown, Output>;
  name: FieldPath<Values>;
  label: string;
  choices: readonly Choice<string>[];
  help?: string;
}) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => {
        const value = field.value || null;
        const shared = {
          label,
          choices,
          value,
          onChange: field.onChange,
          focusRef: field.ref,
          error: fieldState.error ? wanted(value, label, fieldState.error.message) : undefined,
          ...(help ? { help } : {}),
        };
        return choices.length <= mostRadios ? (
          <RadioLine {...shared} column={choices.length > 1 && isLong(choices)} />
        ) : (
          <SelectField {...shared} />
        );
      }}
    />
  );
}

/** A schema calls an empty choice a malformed id; the reader has only not chosen yet. */
function wanted(value: unknown, label: string, message: string | undefined): string | undefined {
  return value === null ? `Choose the ${label.toLowerCase()}.` : message;
}

function isLong(choices: readonly Choice<string>[]): boolean {
  return choices.reduce((sum, choice) => sum + choice.label.length, 0) > 60;
}
