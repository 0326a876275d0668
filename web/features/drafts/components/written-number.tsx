import { useState } from 'react';
import { TextField } from '../../../components/ui/text-field';
import { useRuleForm } from '../lib/rule-fields';

/** A number that keeps the decimals that it is written with: 14.0 stays 14.0. */
export function WrittenNumber({
  label,
  value,
  onChange,
  asNumber = false,
  placeholder,
}: {
  label: string;
  value: unknown;
  onChange: (value: string | number | undefined) => void;
  /** Where the format takes a plain number only. */
  asNumber?: boolean;
  placeholder?: string;
}) {
  const { isDisabled } = useRuleForm();
  const [typed, setTyped] = useState<string | null>(null);
  const shown = typed ?? (value === undefined || value === null ? '' : String(value));
  const isNumber = /^-?\d+(\.\d+)?$/.test(shown);
  return (
    <TextField
      label={label}
      hideLabel
      size="number"
      inputMode="decimal"
      value={shown}
      {...(placeholder === undefined ? {} : { placeholder })}
      isDisabled={isDisabled}
      onChange={(text) => {
        setTyped(text);
        if (text.trim() === '') onChange(undefined);
        else if (/^-?\d+(\.\d+)?$/.test(text)) onChange(asNumber ? Number(text) : text);
      }}
      onBlur={() => setTyped(null)}
      error={typed !== null && typed !== '' && !isNumber ? 'Write a number such as 14.0.' : undefined}
    />
  );
}
