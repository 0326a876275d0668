import { type Control, Controller, type FieldValues, type Path } from 'react-hook-form';
import { ComboField } from './combo-field';

/** An IANA zone, found by typing a part of its name. */
export function TimeZoneField<Values extends FieldValues, Output>({
  control,
  name,
}: {
  control: Control<Values, unknown, Output>;
  name: Path<Values>;
}) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <ComboField
          label="Time zone"
          name={name}
          choices={zones()}
          value={String(field.value ?? '')}
          onChange={field.onChange}
          onBlur={field.onBlur}
          focusRef={field.ref}
          error={fieldState.error?.message}
          help="type a part of it; dates and the review clock follow it"
        />
      )}
    />
  );
}

/** Browsers list their canonical zones, which leave `UTC` out. */
function zones(): string[] {
  return ['UTC', ...Intl.supportedValuesOf('timeZone').filter((zone) => zone !== 'UTC')];
}
